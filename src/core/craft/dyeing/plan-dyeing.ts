/** Reading a dyeing and reckoning its baths. */
import { PACE } from '#core/craft/defaults.ts';
import { agentMass, bathLitres } from '#core/craft/dyeing/bath.ts';
import type { DyeAgent, DyePiece, DyePlan, DyeStep, FibreKind } from '#core/craft/dyeing/piece.ts';
import type { Fields, NumberRule } from '#core/craft/reading/fields.ts';
import type { Findings } from '#core/craft/reading/findings.ts';
import { present } from '#core/craft/reading/present.ts';
import { readColour } from '#core/craft/yarn/read-yarn.ts';

const KINDS = ['wool', 'silk', 'other-protein', 'cotton', 'linen', 'other-cellulose'] as const satisfies readonly FibreKind[];
const CELLULOSE: readonly FibreKind[] = ['cotton', 'linen', 'other-cellulose'];
const AGENTS = ['alum', 'aluminium-acetate', 'none'] as const;
/** Metals we give no recipe for. */
const REFUSED = /copper|chrom|tin\b|dichromate|stannous/i;

/** Per cent of the dry fibre, as practice and published recipes have it. */
export const USUAL = { alum: 15, tartar: 6, 'aluminium-acetate': 8, tannin: 8, iron: 2 } as const;
const HIGH_PERCENT = 30;
const IRON_HARMS_PERCENT = 4;
/** Common practice: litres a kilogram. */
export const LIQUOR_RATIO = 30;
/** Common practice: hands at work in a bath, without the hours in which it stands. */
export const HOURS_A_BATH = 0.75;

const percentRule = (name: string, max: number): NumberRule => ({ name, min: 'over-zero', max });

function readAgent(fields: Fields): DyePiece['mordant']['agent'] {
  const said = fields.take('agent');
  if (typeof said === 'string' && REFUSED.test(said)) {
    fields.reject('E_ENUM', 'agent', 'Copper, chrome and tin are poisonous to people and waters, so we give no recipe with them. Alum for wool and silk, aluminium acetate for cotton and linen, give clear colours without.');
    return 'none';
  }
  return fields.choice('agent', 'Mordant', AGENTS);
}

function readFibre(fields: Fields): DyePiece['fibre'] {
  const group = fields.group('fibre', 'Fibre');
  const fibre = {
    kind: group.choice('kind', 'Kind of fibre', KINDS),
    massG: group.number('massG', { name: 'Mass of the dry fibre', min: 'over-zero', max: 100_000, unit: 'g' }),
    ...present({ label: group.optionalText('label', { name: 'Label', maxLength: 120 }), colour: readColour(group) }),
  };
  group.end();
  return fibre;
}

function readPercent(fields: Fields, key: 'tartar' | 'tannin' | 'iron', name: string): number | undefined {
  const group = fields.optionalGroup(key, name);
  if (group === undefined) return undefined;
  const percent = group.optionalNumber('percent', percentRule(name, 100)) ?? USUAL[key];
  group.end();
  return percent;
}

export interface Dyeing {
  readonly fibre: DyePiece['fibre'];
  readonly percents: Readonly<Partial<Record<DyeAgent, number>>>;
  readonly mordant: DyePiece['mordant']['agent'];
  readonly liquorRatio: number;
}

/** Undefined if anything was refused. Refuses keys it does not know. */
export function readDyeing(fields: Fields): Dyeing | undefined {
  const { findings } = fields;
  fields.take('craft');
  return findings.soundly(() => {
    const fibre = readFibre(fields);
    const group = fields.group('mordant', 'Mordant');
    const mordant = readAgent(group);
    const given = group.optionalNumber('percent', percentRule('Mordant', 100));
    group.end();
    const dye = fields.group('dye', 'Dye');
    const dyePercent = dye.number('percent', percentRule('Dyestuff', 1000));
    dye.optionalText('label', { name: 'Label', maxLength: 120 });
    readColour(dye);
    dye.end();
    const percents = present({
      dye: dyePercent,
      ...(mordant === 'none' ? {} : { [mordant]: given ?? USUAL[mordant] }),
      tartar: readPercent(fields, 'tartar', 'Cream of tartar'),
      tannin: readPercent(fields, 'tannin', 'Tannin'),
      iron: readPercent(fields, 'iron', 'Iron'),
    });
    const liquorRatio = fields.optionalNumber('liquorRatio', { name: 'Litres of bath for a kilogram', min: 10, max: 100 }) ?? LIQUOR_RATIO;
    fields.end();
    checkFibre(fibre.kind, mordant, percents, findings);
    return { fibre, percents, mordant, liquorRatio };
  });
}

function checkFibre(kind: FibreKind, mordant: DyePiece['mordant']['agent'], percents: Dyeing['percents'], findings: Findings): void {
  if (CELLULOSE.includes(kind)) {
    if (percents.tartar !== undefined) findings.reject('E_ENUM', '/tartar', 'Cream of tartar is for wool. Cotton and linen do without it.');
    if (mordant === 'alum') findings.reject('E_ENUM', '/mordant/agent', 'Cotton and linen hardly take potash alum. Tannin first, then aluminium acetate, works.');
    if (mordant === 'aluminium-acetate' && percents.tannin === undefined) findings.warn('W_TANNIN', '/tannin', 'Cotton and linen hold the mordant better after a bath of tannin.');
  } else if (mordant === 'aluminium-acetate' || percents.tannin !== undefined) {
    findings.warn('W_FIBRE', mordant === 'aluminium-acetate' ? '/mordant/agent' : '/tannin', 'Tannin and aluminium acetate are for cotton and linen. Wool and silk need only alum.');
  }
  for (const [agent, percent] of Object.entries(percents)) {
    if (agent !== 'dye' && percent > HIGH_PERCENT) findings.warn('W_HIGH', pathOf(agent), `More than ${String(HIGH_PERCENT)} % of the fibre is wasted: it stays in the bath, or makes the wool sticky.`);
  }
  if ((percents.iron ?? 0) > IRON_HARMS_PERCENT) findings.warn('W_FIBRE_DAMAGE', '/iron/percent', `More than ${String(IRON_HARMS_PERCENT)} % of iron makes fibre harsh and brittle. 1 to ${String(IRON_HARMS_PERCENT)} % darken it enough.`);
}

const pathOf = (agent: string): string => (agent === 'alum' || agent === 'aluminium-acetate' ? '/mordant/percent' : `/${agent}/percent`);

/** Reads a dyeing and reckons it; undefined, with a problem among the findings, if it cannot be done. */
export function planDyeing(fields: Fields): Omit<DyePlan, 'warnings'> | undefined {
  const dyeing = readDyeing(fields);
  return dyeing && reckonDyeing(dyeing);
}

/** The plan of a dyeing that has been read. */
export function reckonDyeing({ fibre: { massG }, percents, liquorRatio }: Dyeing): Omit<DyePlan, 'warnings'> {
  const litres = bathLitres(massG, liquorRatio);
  const bath = (step: DyeStep['step'], ...agents: DyeAgent[]): DyeStep[] => {
    const used = agents.flatMap((agent) => {
      const percent = percents[agent];
      return percent === undefined ? [] : [{ agent, percent, massG: agentMass(massG, percent) }];
    });
    return used.length === 0 && agents.length > 0 ? [] : [{ step, agents: used, bathLitres: litres }];
  };
  const steps = [...bath('scour'), ...bath('tannin', 'tannin'), ...bath('mordant', 'alum', 'aluminium-acetate', 'tartar'), ...bath('dye', 'dye'), ...bath('iron', 'iron')];
  const likely = steps.length * HOURS_A_BATH;
  return { craft: 'dyeing', steps, bathLitres: litres, massG, hours: { likely, low: likely * PACE.lowFactor, high: likely * PACE.highFactor } };
}
