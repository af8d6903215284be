/** What the whole piece takes of each yarn: bands, tails, loads, margin, mass, balls. */
import type { WovenBand } from '#core/craft/frame-loom/add-up.ts';
import { loadsFor, mainRow, strandsOnShuttle } from '#core/craft/frame-loom/count-yarn.ts';
import type { Yarn } from '#core/craft/piece.ts';
import type { FrameLoomPlan } from '#core/craft/plan-types.ts';
import { combinedUncertainty, CUT_STRANDS_MARGIN, marginFor, UNCERTAINTIES, type Uncertainties } from '#core/craft/purchase.ts';
import { below } from '#core/craft/reading/findings.ts';
import type { DressedWorkings, ToldUse } from '#core/craft/show-how/bands/band.ts';
import type { NotedBand } from '#core/craft/show-how/explain-bands.ts';
import { ofRole } from '#core/craft/show-how/explain-weft.ts';
import { noteBought } from '#core/craft/show-how/note-bought.ts';
import { from, standing, sumOf, WEIGHS_NOTHING } from '#core/craft/show-how/notebook.ts';
import { setting } from '#core/craft/show-how/on-loom.ts';
import { DEFAULTS, RULES } from '#core/craft/show-how/sources.ts';
import type { Working, WorkingInput } from '#core/craft/show-how/working.ts';

interface PlacedUse extends ToldUse {
  readonly index: number;
}

const sum = (inputs: readonly WorkingInput[]): number => inputs.reduce((total, { value }) => total + Number(value), 0);

/** Each band's thread under the band's own symbol. */
const threadsOf = (uses: readonly PlacedUse[], of: (use: PlacedUse) => Working = (use) => use.thread): readonly WorkingInput[] => uses.map((use) => from(`b${String(use.index)}`, of(use)));

/** Each band's thread times its strands, and the same added up. */
function yarnOf(uses: readonly PlacedUse[]): { readonly formula: string; readonly inputs: readonly WorkingInput[]; readonly value: number } {
  const parts = uses.map(({ index, thread, strands }) => ({ thread: from(`b${String(index)}`, thread), strands: strands && { ...strands, symbol: `m${String(index)}` } }));
  return {
    formula: parts.length === 0 ? '0' : parts.map((part) => (part.strands === undefined ? part.thread.symbol : `${part.thread.symbol} * ${part.strands.symbol}`)).join(' + '),
    inputs: parts.flatMap((part) => (part.strands === undefined ? [part.thread] : [part.thread, part.strands])),
    value: parts.reduce((total, part) => total + Number(part.thread.value) * Number(part.strands?.value ?? 1), 0),
  };
}

/** Yarn of all bands, by the way it is woven; answers the working of each way. */
function noteKinds(on: DressedWorkings, role: string, uses: readonly PlacedUse[]): readonly Working[] {
  const full = uses.flatMap((use) => (use.full === undefined ? [] : [{ ...use, thread: use.full }]));
  if (full.length > 0) {
    const inputs = threadsOf(full);
    on.book.note({ id: `yarns.${role}.fullRowsMm`, name: 'thread of all tabby rows from edge to edge', formula: sumOf(inputs), inputs, value: sum(inputs), unit: 'mm', ...RULES.arithmetic });
  }
  return [...new Set(uses.map(({ kind }) => kind))].map((kind) =>
    on.book.note({ id: `yarns.${role}.${kind}Mm`, name: `yarn of all bands of ${KIND_WORDS[kind]}`, ...yarnOf(uses.filter((use) => use.kind === kind)), unit: 'mm', ...RULES.arithmetic }));
}

const KIND_WORDS: Readonly<Record<ToldUse['kind'], string>> = {
  tabby: 'tabby', soumak: 'soumak', rya: 'rya', roving: 'roving', hemStitch: 'hem-stitch', loopPile: 'loop pile', twining: 'twining',
};

/** Loads to fill, and how far one goes. Answers the working of those that begin and end inside the cloth. */
function noteLoads(on: DressedWorkings, role: string, uses: readonly PlacedUse[], woven: readonly WovenBand[], plan: FrameLoomPlan): Working {
  const { book } = on;
  const load = setting(on, 'l', 'loadMm', WEIGHS_NOTHING);
  const own = woven.flatMap((band) => band.woven.uses.filter((use) => use.role === role));
  const carried = (carry: ToldUse['carry'], id: string, name: string): Working => {
    const inputs = threadsOf(uses.filter((use) => use.carry === carry));
    return book.note({ id: `yarns.${role}.${id}`, name, formula: sumOf(inputs), inputs, value: sum(inputs), unit: 'mm', ...RULES.arithmetic });
  };
  const shuttle = carried('shuttle', 'shuttleMm', 'thread that comes off a shuttle or butterfly');
  const byTheRow = carried('by-the-row', 'byTheRowMm', 'thread that is laid in row by row');
  const loads = loadsFor(own, on.piece.settings.loadMm);
  const joined = book.note({
    id: `yarns.${role}.joinedLoads`, name: 'loads that begin and end inside the cloth', formula: 'ceil(x / l - 1e-9)', inputs: [from('x', shuttle), load], value: loads.joined, unit: 'count', ...RULES.wholeNumbers,
  });
  book.note({
    id: `yarns.${role}.loads`, name: 'loads to fill', formula: 'n + ceil(x / l - 1e-9)', inputs: [from('n', joined), from('x', byTheRow), load], value: loads.count, unit: 'count', ...RULES.wholeNumbers,
  });
  const rowMm = mainRow(own);
  const row = uses.find((use) => use.row?.value === rowMm)?.row;
  const goes = row === undefined ? { formula: '0', inputs: [] } : { formula: 'floor(l / r)', inputs: [load, from('r', row)] };
  book.note({ id: `yarns.${role}.rowsPerLoad`, name: 'rows one load weaves', ...goes, value: plan.yarns[role]?.rowsPerLoad ?? 0, unit: 'count', ...RULES.count });
  return joined;
}

const PARTS = { width: 'W', height: 'H', picks: 'n', crimp: 'c', tex: 'T' } as const satisfies Record<keyof Uncertainties, string>;

/** What to buy on top so that it suffices in 95 of 100 pieces, from what the yarn's length is made of. */
function noteMargin(on: DressedWorkings, role: string, uses: readonly PlacedUse[]): number {
  if (uses.length > 0 && uses.every(({ carry }) => carry === 'cut')) {
    const cut = standing({ symbol: 'M', name: 'margin of strands that are cut', value: CUT_STRANDS_MARGIN, unit: 'share' }, DEFAULTS.ryaMargin);
    return on.book.note({ id: `yarns.${role}.likelyMargin`, name: 'margin that suffices in 95 of 100 pieces', formula: 'M', inputs: [cut], value: CUT_STRANDS_MARGIN, unit: 'share', ...RULES.margins }).value;
  }
  const { beat } = on.piece.laid;
  const swatch = beat !== 'as-ends' && beat.picksPerCm !== undefined;
  const parts: Uncertainties = ![...on.piece.laid.picks.values()].some(({ pick }) => pick.role === role) ? UNCERTAINTIES.rowsGiven : swatch ? UNCERTAINTIES.swatch : UNCERTAINTIES.unmeasured;
  const names = { width: 'width', height: 'height', picks: swatch ? 'rows, counted on a swatch' : 'rows, by the rule', crimp: 'take-up', tex: 'the yarn’s weight' };
  const inputs = (Object.keys(PARTS) as (keyof Uncertainties)[]).map((part) => standing({ symbol: `u${PARTS[part]}`, name: `what ${names[part]} may differ by`, value: parts[part], unit: 'share' }, DEFAULTS.uncertainty));
  const combined = on.book.note({
    id: `yarns.${role}.uncertainty`, name: 'what the yarn’s length may differ by', formula: `sqrt(${inputs.map(({ symbol }) => `${symbol}^2`).join(' + ')})`, inputs, value: combinedUncertainty(parts), unit: 'share', ...RULES.errors,
  });
  return on.book.note({
    id: `yarns.${role}.likelyMargin`, name: 'margin that suffices in 95 of 100 pieces', formula: '1.645 * u', inputs: [from('u', combined)], value: marginFor(parts), unit: 'share', ...RULES.coverage,
  }).value;
}

function noteYarn(on: DressedWorkings, role: string, yarn: Yarn, bands: readonly NotedBand[], woven: readonly WovenBand[], plan: FrameLoomPlan): Working {
  const uses = bands.flatMap(({ index, uses: own }) => own.filter((use) => use.role === role).map((use) => ({ ...use, index })));
  const own = plan.yarns[role];
  if (own === undefined) throw new Error(`no plan of the yarn ${role}`);
  const { tex } = ofRole(on.weft.threads, role);
  const kinds = noteKinds(on, role, uses).map((kind, at) => from(`k${String(at)}`, kind));
  const inBands = on.book.note({ id: `yarns.${role}.bandsMm`, name: 'yarn of all bands', formula: sumOf(kinds), inputs: kinds, value: sum(kinds), unit: 'mm', ...RULES.arithmetic });
  const joined = noteLoads(on, role, uses, woven, plan);
  const wound = yarnOf(uses.filter(({ carry }) => carry === 'shuttle'));
  const threads = threadsOf(uses.filter(({ carry }) => carry === 'shuttle'));
  const strands = on.book.note({
    id: `yarns.${role}.strandsWound`, name: 'strands wound together, on average', formula: sum(threads) === 0 ? '0' : `(${wound.formula}) / (${sumOf(threads)})`, inputs: sum(threads) === 0 ? [] : wound.inputs,
    value: strandsOnShuttle(woven.flatMap((band) => band.woven.uses.filter((use) => use.role === role))), unit: 'ratio', ...RULES.arithmetic,
  });
  const tails = on.book.note({
    id: `yarns.${role}.tailsMm`, name: 'yarn of the tails where a new load begins', formula: 'n * 2 * t * m', inputs: [from('n', joined, WEIGHS_NOTHING), setting(on, 't', 'tailMm', WEIGHS_NOTHING), from('m', strands, WEIGHS_NOTHING)],
    value: joined.value * 2 * on.piece.settings.tailMm * strands.value, unit: 'mm', ...RULES.arithmetic,
  });
  const margin = noteMargin(on, role, uses);
  const net = on.book.note({
    id: `yarns.${role}.netMm`, name: 'yarn in the piece, without margin', formula: 'b + t', inputs: [from('b', inBands), from('t', tails)], value: own.netMm, unit: 'mm', ...RULES.arithmetic, margin,
  });
  return noteBought(on.book, { id: `yarns.${role}`, path: below('/yarns', role), ball: yarn.ball, net, tex, margin: setting(on, 'M', 'marginWeft', WEIGHS_NOTHING), plan: own });
}

/** Warp and every yarn; answers the workings of their masses in the piece. */
export function noteYarns(on: DressedWorkings, bands: readonly NotedBand[], woven: readonly WovenBand[], plan: FrameLoomPlan): readonly Working[] {
  const { warp, piece } = on;
  const masses = [noteBought(on.book, {
    id: 'warp', path: '/warp/yarn', ball: piece.warp.yarn.ball, net: warp.net, tex: warp.thread.tex, margin: setting(on, 'M', 'marginWarp', WEIGHS_NOTHING), plan: plan.warp,
  })];
  for (const [role, yarn] of piece.yarns) {
    if (yarn !== undefined) masses.push(noteYarn(on, role, yarn, bands, woven, plan));
  }
  return masses;
}
