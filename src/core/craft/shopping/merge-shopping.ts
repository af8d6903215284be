/**
 * One list to shop by for several pieces: the same yarn is added up before it is rounded
 * to balls, and what can be used again (rods, cards) is asked for once.
 */
import type { FrameLoomPiece, Yarn } from '#core/craft/piece.ts';
import { planPiece } from '#core/craft/plan.ts';
import type { FrameLoomPlan, WarpPlan } from '#core/craft/plan-types.ts';
import { ballsFor } from '#core/craft/purchase.ts';
import { Fields } from '#core/craft/reading/fields.ts';
import { below, Findings } from '#core/craft/reading/findings.ts';
import { present } from '#core/craft/reading/present.ts';
import { asItComesOut, planOfRest } from '#core/craft/rest/as-it-comes-out.ts';
import { NOTHING_WOVEN, type WovenSoFar } from '#core/craft/rest/woven-so-far.ts';
import { roundUpTo } from '#core/craft/rounding.ts';
import { gristOf } from '#core/craft/yarn/thread.ts';
import { fail, type Outcome, type Problem } from '#core/outcome.ts';
import { lengthOf } from '#core/craft/amounts/amount-types.ts';
import { amountText } from '#core/units/format-amount.ts';
import type { Units } from '#core/units/units.ts';

export interface ShoppingYarn {
  /** As on the label; a role's name where there is none. */
  readonly name: string;
  readonly colour?: string;
  readonly tex: number;
  readonly isWarp: boolean;
  readonly netMm: number;
  /** To have in hand: every piece with its own margin. */
  readonly withMarginMm: number;
  /** Of the length with margin. */
  readonly massG: number;
  /** Whole balls of it, where the ball tells its length. */
  readonly balls?: { readonly count: number; readonly leftOverMm: number };
  /** Names of the pieces it is for. */
  readonly pieces: readonly string[];
}

export type ShoppingToolKind = 'rod' | 'spacer-card' | 'dowel' | 'cord';

export interface ShoppingTool {
  readonly kind: ShoppingToolKind;
  /** Thickness of a rod or dowel, height of a card. */
  readonly acrossMm?: number;
  readonly lengthMm?: number;
  /** How many: rods and cards are used again, dowels and cords stay in the piece. */
  readonly count: number;
  readonly pieces: readonly string[];
}

export interface Shopping {
  /** Warps first, then wefts, each in the order of the pieces. */
  readonly yarns: readonly ShoppingYarn[];
  /** Rods, cards, dowels, cords. */
  readonly tools: readonly ShoppingTool[];
}

export interface PieceToShop {
  readonly name: string;
  readonly piece: unknown;
  /** How far it is woven: only what is still to weave is shopped for then. */
  readonly woven?: WovenSoFar;
}

interface Planned {
  readonly name: string;
  readonly piece: FrameLoomPiece;
  readonly plan: FrameLoomPlan;
}

const MOST_PIECES = 50;

interface Wanted {
  readonly key: string;
  readonly yarn: Yarn;
  readonly name: string;
  readonly isWarp: boolean;
  readonly plan: WarpPlan;
  readonly piece: string;
}

/** What makes two yarns one to buy: label, fineness, colour and ball; without label and colour nothing does. */
function keyOf(yarn: Yarn, isWarp: boolean, otherwise: string): string {
  const known = yarn.label?.trim().toLowerCase() ?? (yarn.colour === undefined ? otherwise : '');
  return JSON.stringify([known, gristOf(yarn).tex, yarn.colour?.toLowerCase(), yarn.ball, yarn.label === undefined && isWarp]);
}

function wantedIn({ name, piece, plan }: Planned): Wanted[] {
  const warp: Wanted = { key: keyOf(piece.warp.yarn, true, `${name} warp`), yarn: piece.warp.yarn, name: piece.warp.yarn.label ?? 'Warp', isWarp: true, plan: plan.warp, piece: name };
  const wefts = Object.entries(piece.yarns).flatMap(([role, yarn]): Wanted[] => {
    const own = plan.yarns[role];
    return own === undefined || own.netMm === 0 ? [] : [{ key: keyOf(yarn, false, `${name} ${role}`), yarn, name: yarn.label ?? role, isWarp: false, plan: own, piece: name }];
  });
  return [...(plan.warp.netMm === 0 ? [] : [warp]), ...wefts];
}

/** Of one yarn: at least one piece wants it. */
type Same = [Wanted, ...Wanted[]];

function addYarn(same: Readonly<Same>, index: number, findings: Findings): ShoppingYarn {
  const [first] = same;
  const total = (of: (plan: WarpPlan) => number): number => same.reduce((sum, { plan }) => sum + of(plan), 0);
  const { tex } = gristOf(first.yarn);
  const withMarginMm = total((plan) => plan.withMarginMm);
  const balls = first.yarn.ball && ballsFor(withMarginMm, first.yarn.ball.metres);
  if (balls?.tight === true) {
    const rest = amountText(lengthOf(balls.leftOverMm, 'yarn'), findings.units);
    findings.warn('W_TIGHT', below('/yarns', index), `Only ${rest} of ${first.name} would be left of the last ball. One ball more of the same dye lot is safer.`);
  }
  return {
    name: first.name,
    tex,
    isWarp: same.some(({ isWarp }) => isWarp),
    netMm: total((plan) => plan.netMm),
    withMarginMm,
    massG: (withMarginMm / 1e6) * tex,
    pieces: [...new Set(same.map(({ piece }) => piece))],
    ...present({ colour: first.yarn.colour, balls: balls && { count: balls.count, leftOverMm: balls.leftOverMm } }),
  };
}

function mergeYarns(pieces: readonly Planned[], findings: Findings): ShoppingYarn[] {
  const wanted = pieces.flatMap(wantedIn);
  const together = new Map<string, Same>();
  for (const want of [...wanted.filter(({ isWarp }) => isWarp), ...wanted.filter(({ isWarp }) => !isWarp)]) {
    const same = together.get(want.key);
    if (same === undefined) together.set(want.key, [want]);
    else same.push(want);
  }
  return [...together.values()].map((same, index) => addYarn(same, index, findings));
}

function toolsOf({ name, piece, plan }: Planned): ShoppingTool[] {
  const rods = piece.bands.flatMap((band): ShoppingTool[] => (band.technique === 'loop-pile' && band.rodMm !== undefined ? [{ kind: 'rod', acrossMm: band.rodMm, count: 1, pieces: [name] }] : []));
  const { spacerCard, dowel, cordMm } = plan.cut;
  return [
    ...rods,
    { kind: 'spacer-card', acrossMm: roundUpTo(spacerCard.heightMm, 1), lengthMm: roundUpTo(spacerCard.widthMm, 1), count: 1, pieces: [name] },
    ...(dowel === undefined ? [] : [{ kind: 'dowel' as const, acrossMm: Math.max(piece.dowel?.diameterMm ?? 0, dowel.minDiameterMm), lengthMm: dowel.lengthMm, count: 1, pieces: [name] }]),
    ...(cordMm === undefined ? [] : [{ kind: 'cord' as const, lengthMm: cordMm, count: 1, pieces: [name] }]),
  ];
}

const STAYS_IN_PIECE: ReadonlySet<ShoppingToolKind> = new Set(['dowel', 'cord']);
const TOOL_ORDER: readonly ShoppingToolKind[] = ['rod', 'spacer-card', 'dowel', 'cord'];

function mergeTools(pieces: readonly Planned[]): ShoppingTool[] {
  const together = new Map<string, ShoppingTool>();
  for (const tool of pieces.flatMap(toolsOf)) {
    const key = JSON.stringify([tool.kind, tool.acrossMm, tool.lengthMm]);
    const before = together.get(key);
    together.set(key, before === undefined ? tool : {
      ...before,
      count: STAYS_IN_PIECE.has(tool.kind) ? before.count + tool.count : 1,
      pieces: [...new Set([...before.pieces, ...tool.pieces])],
    });
  }
  return TOOL_ORDER.flatMap((kind) => [...together.values()].filter((tool) => tool.kind === kind));
}

/** What was said of how far it is may not belong to the piece any more: then all of it is shopped for. */
function stillToWeave(planned: Planned, woven: WovenSoFar, units: Units): Planned {
  const comes = asItComesOut(planned, woven, units);
  return !comes.ok || comes.value.halfway === null ? planned : { ...planned, plan: planOfRest(planned, comes.value.halfway) };
}

/** One piece with its plan; undefined, with problems, if it cannot be woven. Its warnings are told with its own plan. */
function planOne(value: unknown, path: string, findings: Findings, problems: Problem[]): Planned | undefined {
  const fields = Fields.of(value, path, 'A piece to shop for', findings);
  const name = fields.text('name', { name: 'Name of the piece', maxLength: 200 });
  const piece = fields.take('piece');
  const woven = (fields.take('woven') ?? NOTHING_WOVEN) as WovenSoFar;
  fields.end();
  // Only what is woven is merged as yet; the cords of other crafts are cut one by one.
  const craft = typeof piece === 'object' && piece !== null ? Reflect.get(piece, 'craft') as unknown : undefined;
  if (craft !== undefined && craft !== 'frame-loom') {
    problems.push({ code: 'E_ENUM', path: `${path}/piece/craft`, message: 'Only woven pieces can be put on one list.' });
    return undefined;
  }
  const planned = planPiece(piece as FrameLoomPiece, findings.units);
  if (planned.ok) return stillToWeave({ name, piece: piece as FrameLoomPiece, plan: planned.value }, woven, findings.units);
  problems.push(...planned.problems.map((problem) => ({ ...problem, path: `${path}/piece${problem.path}` })));
  return undefined;
}

/**
 * The list for all these pieces together; an empty one for none. Never throws for what a person may send: problems of a
 * piece lie below `/pieces/<place>/piece`.
 */
export function mergeShopping(pieces: readonly PieceToShop[], units: Units = 'cm'): Outcome<Shopping> {
  const findings = Findings.in(units);
  const problems: Problem[] = [];
  const isNone = Array.isArray(pieces) && pieces.length === 0;
  const list = isNone ? [] : Fields.of({ pieces }, '', 'Pieces', findings).list('pieces', 'Pieces', MOST_PIECES);
  const planned = list.flatMap((value, index) => planOne(value, below('/pieces', index), findings, problems) ?? []);
  const read = findings.outcome(true);
  if (!read.ok || problems.length > 0) return fail([...(read.ok ? [] : read.problems), ...problems]);
  return findings.outcome({ yarns: mergeYarns(planned, findings), tools: mergeTools(planned) });
}
