/**
 * The ways in which a pattern can be fitted to a student's loom, each with what it comes to: the piece, its plan and
 * what changes, or why it does not fit so.
 */
import type { FittedPiece } from '#core/craft/fit.ts';
import { fitWoven } from '#core/craft/frame-loom/fit-woven.ts';
import { roomOnLoom } from '#core/craft/frame-loom/room.ts';
import { changePiece } from '#core/craft/fitting/change-piece.ts';
import { spacingOf, strandsAsTight } from '#core/craft/fitting/coarsen.ts';
import { lowerTo } from '#core/craft/fitting/leave-out.ts';
import type { MyPiece } from '#core/craft/fitting/my-piece.ts';
import type { FitWay } from '#core/craft/fitting/way.ts';
import type { FrameLoomPiece } from '#core/craft/piece.ts';
import type { Outcome, Problem } from '#core/outcome.ts';
import { MM_PER_INCH } from '#core/units/inches.ts';
import type { Units } from '#core/units/units.ts';

/** What a person chooses between. `leave-first` and `leave-last` say from which end bands are left out. */
export const WAY_IDS = ['as-it-is', 'narrower', 'leave-last', 'leave-first', 'leave-chosen', 'doubled', 'fewer-nails', 'scaled'] as const;
export type WayId = (typeof WAY_IDS)[number];

export interface WayToFit {
  readonly id: WayId;
  /** What is kept when it is chosen; undefined for the pattern as it is on her loom. */
  readonly way: FitWay | undefined;
  readonly outcome: Outcome<FittedPiece<FrameLoomPiece>>;
}

/** Narrower than this nobody would call it the same piece. */
export const LEAST_WIDTH_MM = 80;
/** How many steps narrower than the room are tried: the number of ends is made even only after it. */
const TRIES = 12;
/** A loom must hold a twentieth more before a larger piece is worth a word. */
const WORTH_GROWING = 1.05;
const LEAST_FACTOR = 0.3;
const MOST_FACTOR = 2;
/** Ends may stand so many times further apart before another yarn is another piece. */
const MOST_NAILS = 3;

/** Sizes come in steps that are read off a rule. */
export const stepMm = (units: Units): number => (units === 'in' ? MM_PER_INCH / 4 : 5);

const refused = (message: string, path = '/loom'): Outcome<never> => ({ ok: false, problems: [{ code: 'E_FIT', path, message }] });

interface Asked {
  readonly pattern: FrameLoomPiece;
  /** Without a way. */
  readonly mine: MyPiece;
  readonly units: Units;
  readonly base: Outcome<FittedPiece<FrameLoomPiece>>;
  /** The pattern on her loom, not yet fitted. */
  readonly onLoom: FrameLoomPiece;
}

const isAt = (path: string) => (problem: Problem): boolean => problem.code === 'E_FIT' && problem.path === path;
const stands = ({ base }: Asked, path: string): boolean => !base.ok && base.problems.some(isAt(path));
const isTooNarrow = (asked: Asked): boolean => stands(asked, '/loom/insideWidthMm');
const isTooLow = (asked: Asked): boolean => stands(asked, '/loom/insideHeightMm') || stands(asked, '/bands');

const fitIn = ({ pattern, mine, units }: Asked, way: FitWay): Outcome<FittedPiece<FrameLoomPiece>> => fitWoven(pattern, { ...mine, way }, units);

/**
 * The widest piece that her loom holds, in whole steps of a rule; undefined where the loom does not tell its width or
 * nothing worth weaving fits. `others` are the problems it may still have.
 */
export function widestOn(pattern: FrameLoomPiece, mine: MyPiece, units: Units): number | undefined {
  const roomMm = roomOnLoom(changePiece(pattern, mine)).widthMm;
  if (roomMm === undefined) return undefined;
  const step = stepMm(units);
  for (let steps = Math.floor(roomMm / step + 1e-9), tries = 0; tries < TRIES && steps * step >= LEAST_WIDTH_MM; steps -= 1, tries += 1) {
    const fitted = fitWoven(pattern, { ...mine, way: { kind: 'narrower', widthMm: steps * step } }, units);
    if (fitted.ok || !fitted.problems.some(isAt('/loom/insideWidthMm'))) return steps * step;
  }
  return undefined;
}

function narrower(asked: Asked): WayToFit[] {
  if (!isTooNarrow(asked)) return [];
  const widthMm = widestOn(asked.pattern, asked.mine, asked.units);
  if (widthMm === undefined) return [{ id: 'narrower', way: undefined, outcome: refused('The loom is too narrow for this piece, however few ends it has. A wider loom is needed.', '/loom/insideWidthMm') }];
  const way: FitWay = { kind: 'narrower', widthMm };
  return [{ id: 'narrower', way, outcome: fitIn(asked, way) }];
}

function leavingOut(asked: Asked, id: 'leave-last' | 'leave-first' | 'leave-chosen', order: 'first' | 'last' | readonly string[]): WayToFit {
  const { pattern, mine, units, onLoom } = asked;
  const widthMm = isTooNarrow(asked) ? widestOn(pattern, mine, units) : undefined;
  const lower = lowerTo(onLoom, roomOnLoom(onLoom).heightMm, order, stepMm(units));
  if (lower === undefined) {
    const words = id === 'leave-chosen' ? 'What is left is still too high for the loom, or nothing is left. Choose other bands.' : 'The loom is too low: no bands of this piece fit between its rails. A higher loom is needed.';
    return { id, way: undefined, outcome: refused(words, '/loom/insideHeightMm') };
  }
  const way: FitWay = { kind: 'fewer-bands', ...lower, ...(typeof order === 'string' ? { from: order } : {}), ...(widthMm === undefined ? {} : { widthMm }) };
  return { id, way, outcome: fitIn(asked, way) };
}

const leavesNone = ({ way }: WayToFit): boolean => way?.kind === 'fewer-bands' && way.leaveOut.length === 0;
const NONE_CHOSEN: WayToFit = { id: 'leave-chosen', way: undefined, outcome: refused('Tick the bands you would rather do without.', '/bands') };

function fewerBands(asked: Asked, chosen: readonly string[]): WayToFit[] {
  if (!isTooLow(asked)) return chosen.length === 0 ? [] : [leavingOut(asked, 'leave-chosen', chosen)];
  const last = leavingOut(asked, 'leave-last', 'last');
  // Where the filling band gives way alone, both ends come to the same.
  const first = leavesNone(last) ? [] : [leavingOut(asked, 'leave-first', 'first')];
  return [last, ...first, chosen.length === 0 ? NONE_CHOSEN : leavingOut(asked, 'leave-chosen', chosen)];
}

function coarserBy(asked: Asked, id: 'doubled' | 'fewer-nails', part: { readonly endsTogether?: 2; readonly everyNthNail?: number }): WayToFit {
  const loose: FitWay = { kind: 'coarser', ...part, strands: {} };
  const strands = strandsAsTight(asked.pattern, changePiece(asked.pattern, { ...asked.mine, way: loose }));
  const way: FitWay = { ...loose, strands };
  return { id, way, outcome: fitIn(asked, way) };
}

/** Ends further apart make no piece smaller, but a thick yarn may need them, and a simple piece goes quicker with them. */
function coarser(asked: Asked): WayToFit[] {
  const { onLoom, pattern } = asked;
  const nth = onLoom.loom.everyNthNail ?? 1;
  const ways: WayToFit[] = [];
  if ((onLoom.warp.endsTogether ?? 1) === 1) ways.push(coarserBy(asked, 'doubled', { endsTogether: 2 }));
  if (spacingOf(onLoom) <= spacingOf(pattern) * MOST_NAILS) ways.push(coarserBy(asked, 'fewer-nails', { everyNthNail: Math.min(50, nth + 1) }));
  return ways;
}

/** How many times the piece goes into the room her loom has, in hundredths, rounded down. */
function factorFor({ onLoom }: Asked): number {
  const { widthMm, heightMm } = roomOnLoom(onLoom);
  const wide = widthMm === undefined ? 1 : widthMm / onLoom.size.widthMm;
  return Math.floor(Math.min(wide, heightMm / onLoom.size.heightMm, MOST_FACTOR) * 100 + 1e-9) / 100;
}

function scaled(asked: Asked): WayToFit[] {
  const most = factorFor(asked);
  if (asked.base.ok && most < WORTH_GROWING) return [];
  if (!asked.base.ok && !isTooNarrow(asked) && !isTooLow(asked)) return [];
  for (let hundredths = Math.round(Math.min(most, asked.base.ok ? MOST_FACTOR : 1) * 100), tries = 0; tries < TRIES && hundredths >= LEAST_FACTOR * 100; hundredths -= 1, tries += 1) {
    const way: FitWay = { kind: 'scaled', factor: hundredths / 100 };
    const outcome = fitIn(asked, way);
    if (outcome.ok || !outcome.problems.every(({ code, path }) => code === 'E_FIT' && path.startsWith('/loom'))) return [{ id: 'scaled', way, outcome }];
  }
  return [{ id: 'scaled', way: undefined, outcome: refused('Made so small, little of this piece would be left. A larger loom is needed.') }];
}

/** Whether a way can help: what is wrong is the loom's room or a yarn too thick for its spacing, not something mistyped. */
const canBeHelped = (base: Outcome<FittedPiece<FrameLoomPiece>>): boolean => base.ok || base.problems.every(({ code }) => code === 'E_FIT' || code === 'E_JAM');

/**
 * Every way that may be chosen for this loom; the pattern as it is comes first. `chosen` are the keys of bands she would
 * rather leave out herself. `mine.way` is not looked at. Where something mistyped stands in the way there is only the
 * first, with its problems.
 */
export function waysToFit(pattern: FrameLoomPiece, { way: _, ...mine }: MyPiece, units: Units = 'cm', chosen: readonly string[] = []): readonly WayToFit[] {
  const base = fitWoven(pattern, mine, units);
  const asItIs: WayToFit = { id: 'as-it-is', way: undefined, outcome: base };
  if (!canBeHelped(base)) return [asItIs];
  const asked: Asked = { pattern, mine, units, base, onLoom: changePiece(pattern, mine) };
  return [asItIs, ...narrower(asked), ...fewerBands(asked, chosen), ...scaled(asked), ...coarser(asked)];
}

/** The choice that a kept way came from. */
export function wayIdOf(way: FitWay | undefined): WayId {
  if (way === undefined) return 'as-it-is';
  switch (way.kind) {
    case 'fewer-bands':
      return way.from === undefined ? 'leave-chosen' : `leave-${way.from}`;
    case 'coarser':
      return way.endsTogether === 2 ? 'doubled' : 'fewer-nails';
    default:
      return way.kind;
  }
}

/** Whether her loom is smaller than the piece needs, or holds a larger one: then the ways are worth showing. */
export function isWorthChoosing(ways: readonly WayToFit[], mine: MyPiece): boolean {
  const [asItIs, ...others] = ways;
  if (asItIs === undefined || others.length === 0) return false;
  return mine.way !== undefined || !asItIs.outcome.ok || (mine.loom !== undefined && others.some(({ id }) => id === 'scaled'));
}
