/** All yarn of a piece as one would buy it: each yarn once, however many roles it plays. */
import type { Piece, Yarn } from '#core/craft/piece.ts';
import type { Plan, WarpPlan } from '#core/craft/plan-types.ts';

export interface YarnLine {
  /** `Fenwool 6/2`. */
  readonly name: string;
  /** What sets it apart from its sisters: `Slack Water`. Empty when the label says no more. */
  readonly detail: string;
  readonly colour: string | undefined;
  /** To have in hand, margins included. */
  readonly lengthMm: number;
  readonly grams: number;
}

export interface YarnTable {
  readonly lines: readonly YarnLine[];
  readonly grams: number;
}

/** The plan weighs the net length; what one buys has its margin. */
export const gramsInHand = ({ netMm, withMarginMm, massG }: WarpPlan): number => (netMm === 0 ? 0 : massG * (withMarginMm / netMm));

function lineOf(role: string, yarn: Yarn, plan: WarpPlan): YarnLine {
  const [name = '', ...detail] = (yarn.label ?? role).split(',').map((part) => part.trim());
  return { name: name === '' ? role : name, detail: detail.join(', '), colour: yarn.colour, lengthMm: plan.withMarginMm, grams: gramsInHand(plan) };
}

/** Warp first, then the weft yarns in the order in which the piece names them. */
export function yarnTable(piece: Piece, plan: Plan): YarnTable {
  const warp = lineOf('Warp', piece.warp.yarn, plan.warp);
  const wefts = Object.entries(piece.yarns).flatMap(([role, yarn]) => {
    const planned = plan.yarns[role];
    return planned === undefined || planned.withMarginMm === 0 ? [] : [lineOf(role, yarn, planned)];
  });
  const together = new Map<string, YarnLine>();
  for (const line of [warp, ...wefts]) {
    const key = `${line.name}|${line.detail}|${line.colour ?? ''}`;
    const before = together.get(key);
    together.set(key, before === undefined ? line : { ...line, lengthMm: before.lengthMm + line.lengthMm, grams: before.grams + line.grams });
  }
  const lines = [...together.values()];
  return { lines, grams: lines.reduce((sum, { grams }) => sum + grams, 0) };
}
