/** Amounts of one weft yarn: length, mass, balls, and how far a filled shuttle goes. */
import { countOf, lengthOf, massOf, type HowReckoned, type Reckoned } from '#core/craft/amounts/amount-types.ts';
import { beatTrust, type PlannedPiece } from '#core/craft/amounts/fixed-amounts.ts';
import { ASHENHURST_K } from '#core/craft/defaults.ts';
import { settingsOf } from '#core/craft/frame-loom/settings.ts';
import type { Yarn } from '#core/craft/piece.ts';
import type { YarnPlan } from '#core/craft/plan-types.ts';
import { techniqueOf } from '#core/craft/techniques/registry.ts';
import { leastTrust, type Trust } from '#core/craft/trust.ts';
import { threadOf } from '#core/craft/yarn/thread.ts';

export interface PlannedYarn extends PlannedPiece {
  readonly role: string;
  readonly yarn: Yarn;
  readonly yarnPlan: YarnPlan;
}

export function plannedYarn({ piece, plan }: PlannedPiece, role: string): PlannedYarn | undefined {
  const yarn = Object.hasOwn(piece.yarns, role) ? piece.yarns[role] : undefined;
  const yarnPlan = Object.hasOwn(plan.yarns, role) ? plan.yarns[role] : undefined;
  return yarn === undefined || yarnPlan === undefined ? undefined : { piece, plan, role, yarn, yarnPlan };
}

/** What the yarn is called in lists: its label, or its role. */
const nameOf = ({ yarn, role }: PlannedYarn): string => yarn.label ?? role;

/** What was measured beats the rule for how thick a yarn lies free, and the rule its class. */
export function loftTrust(yarn: Yarn): Trust {
  return threadOf(yarn, ASHENHURST_K.weft).trust.loft;
}

function lengthTrust({ piece, yarn, role }: PlannedYarn): Trust {
  const inPicks = piece.bands.some((band) => techniqueOf(band).roles(band).some((named) => named.role === role && named.picks !== undefined));
  return inPicks ? leastTrust(beatTrust(piece), loftTrust(yarn)) : loftTrust(yarn);
}

function yarnHow(of: PlannedYarn): HowReckoned {
  const { piece, plan, role, yarnPlan } = of;
  const { marginWeft } = settingsOf(piece.allowances ?? {}, piece.mode ?? 'straight-warp', piece.beat);
  const bands = plan.bands.flatMap(({ index, technique, yarnMm }) => {
    const mm = yarnMm[role];
    return mm === undefined ? [] : [{ name: piece.bands[index]?.name ?? technique, value: lengthOf(mm, 'yarn') }];
  });
  return {
    formula: 'yarn of every band + tails where a new length begins, with margin',
    inputs: [...bands, { name: 'without margin', value: lengthOf(yarnPlan.netMm, 'yarn') }, { name: 'margin', value: { kind: 'share', share: marginWeft } }],
    source: 'Peirce’s geometry of plain weave; the path of each stitch and knot',
    trust: lengthTrust(of),
  };
}

/** `yarn.<role>` itself. */
export function yarnLength(of: PlannedYarn): Reckoned {
  return { label: nameOf(of), quantity: lengthOf(of.yarnPlan.withMarginMm, 'yarn'), how: yarnHow(of) };
}

function mass(of: PlannedYarn): Reckoned {
  const { netMm, withMarginMm, massG } = of.yarnPlan;
  const how = yarnHow(of);
  return {
    label: nameOf(of),
    quantity: massOf(netMm === 0 ? 0 : massG * (withMarginMm / netMm)),
    how: { ...how, formula: `length × weight of the yarn: ${how.formula}`, trust: leastTrust(how.trust, 'label') },
  };
}

function balls(of: PlannedYarn): Reckoned | undefined {
  const { balls: count, withMarginMm } = of.yarnPlan;
  if (count === undefined || of.yarn.ball === undefined) return undefined;
  return {
    label: `Balls of ${nameOf(of)}`,
    quantity: countOf(count, 'ball', 'balls'),
    how: {
      formula: 'length with margin ÷ length of a ball, rounded up',
      inputs: [
        { name: 'length with margin', value: lengthOf(withMarginMm, 'yarn') },
        { name: 'length of a ball', value: lengthOf(of.yarn.ball.metres * 1000, 'yarn') },
      ],
      source: 'the label',
      trust: leastTrust('label', lengthTrust(of)),
    },
  };
}

/** `yarn.<role>.mass` and `yarn.<role>.balls`. */
export const YARN_AMOUNTS = { mass, balls } as const satisfies Record<string, (of: PlannedYarn) => Reckoned | undefined>;

/** The role most picks are woven with; undefined in a piece without picks. */
export function mainRole({ piece, plan }: PlannedPiece): string | undefined {
  const rows = new Map<string, number>();
  for (const { index, picks } of plan.bands) {
    const band = piece.bands[index];
    if (band === undefined || picks === undefined) continue;
    const role = 'tabbyYarn' in band ? band.tabbyYarn : band.yarn;
    rows.set(role, (rows.get(role) ?? 0) + picks);
  }
  return [...rows].sort(([, a], [, b]) => b - a)[0]?.[0];
}

export function rowsPerLoad(of: PlannedPiece): Reckoned | undefined {
  const role = mainRole(of);
  const planned = role === undefined ? undefined : plannedYarn(of, role);
  if (planned === undefined) return undefined;
  const { loadMm } = settingsOf(of.piece.allowances ?? {}, of.piece.mode ?? 'straight-warp', of.piece.beat);
  return {
    label: 'Rows from one filled shuttle',
    quantity: countOf(planned.yarnPlan.rowsPerLoad, 'row', 'rows'),
    how: {
      formula: 'yarn on the shuttle ÷ yarn in one row, rounded down',
      inputs: [
        { name: 'yarn on the shuttle', value: lengthOf(loadMm, 'yarn') },
        { name: 'yarn in one row', value: lengthOf(of.plan.weft.pickMm, 'size') },
      ],
      source: 'Peirce’s geometry of plain weave',
      trust: 'formula',
    },
  };
}
