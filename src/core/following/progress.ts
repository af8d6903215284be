/** How far a student is in a series: which parts are done, how much of the one in hand, how much cloth that makes. */
import type { PartStretch } from '#core/craft/cloth/parts-strip.ts';
import type { Standing } from '#core/timetable/opening.ts';

export type Verdict = 'waits' | 'weave-on' | 'mend-first';

/** A part as it stands for one student. */
export interface PartInHand {
  readonly number: number;
  readonly title: string;
  /** Ids of the steps of its text, in order. */
  readonly steps: readonly string[];
  /** Ids ticked; some may belong to an older text. */
  readonly ticked: ReadonlySet<string>;
  readonly isFinished: boolean;
  readonly asksForPhoto: boolean;
  /** Of the newest photo; null without one. */
  readonly verdict: Verdict | null;
  readonly standing: Standing;
}

/** A part ends with the teacher's *weave on* where it asks for a photo, else when the student says so. */
export function isDone(part: Pick<PartInHand, 'isFinished' | 'verdict'>): boolean {
  return part.isFinished || part.verdict === 'weave-on';
}

/**
 * Whether somebody has made the whole piece.
 * @param toComeCount parts that are still being written
 */
export function hasFinished(parts: readonly Pick<PartInHand, 'isFinished' | 'verdict'>[], toComeCount: number): boolean {
  return parts.length > 0 && toComeCount === 0 && parts.every(isDone);
}

export function stepsDone({ steps, ticked }: Pick<PartInHand, 'steps' | 'ticked'>): number {
  return steps.filter((id) => ticked.has(id)).length;
}

/** A part in hand is never shown as whole: the last look is missing. */
const MOST_IN_HAND = 0.96;

/** 0 to 1: of a part in hand, the share of its steps. All steps ticked is not yet done: the last look is missing. */
export function shareOf(part: PartInHand): number {
  if (isDone(part)) return 1;
  return part.steps.length === 0 ? 0 : Math.min(MOST_IN_HAND, stepsDone(part) / part.steps.length);
}

export interface HowFar {
  /** Parts done without a gap, with the share of the one that comes next: 2.5 of 7. */
  readonly done: number;
  /** The first part that is not done; undefined when all are. */
  readonly inHand: PartInHand | undefined;
}

export function howFar(parts: readonly PartInHand[]): HowFar {
  const at = parts.findIndex((part) => !isDone(part));
  const inHand = parts[at];
  return inHand === undefined ? { done: parts.length, inHand: undefined } : { done: at + shareOf(inHand), inHand };
}

/**
 * Share of the woven height, 0 to 1, that is made after `done` parts.
 * @param heights of the piece's bands, in mm, by their place
 */
export function wovenShare(done: number, stretches: readonly PartStretch[], heights: readonly number[]): number {
  const total = heights.reduce((sum, height) => sum + height, 0);
  if (total === 0) return 0;
  const woven = stretches.reduce((sum, { bands }, part) => {
    const high = bands.reduce<number>((height, band) => height + (typeof band === 'number' ? (heights[band] ?? 0) : 0), 0);
    return sum + high * Math.min(1, Math.max(0, done - part));
  }, 0);
  return Math.min(1, woven / total);
}

export interface Fell extends HowFar {
  /** Of the woven height, 0 to 1. */
  readonly share: number;
}

/**
 * Where the fell is. Parts that are done count whole, whatever was counted. In the part in hand the rows she counted say
 * how far she is and, while she counts none, the steps she ticked; with every step ticked, the further of both.
 * @param counted share of the woven height that was counted, 0 to 1
 */
export function fellOf(parts: readonly PartInHand[], stretches: readonly PartStretch[], heights: readonly number[], counted: number): Fell {
  const far = howFar(parts);
  const { inHand } = far;
  if (inHand === undefined) return { ...far, share: 1 };
  const allTicked = stepsDone(inHand) === inHand.steps.length;
  return { inHand, ...fellInHand({ at: parts.indexOf(inHand), done: far.done, allTicked }, stretches, heights, counted) };
}

/**
 * The same, of a part in hand whose steps were counted already.
 * @param inHand its place from 0, the parts done with the share of its steps, and whether all of them are ticked
 */
export function fellInHand(
  { at, done, allTicked }: { readonly at: number; readonly done: number; readonly allTicked: boolean },
  stretches: readonly PartStretch[],
  heights: readonly number[],
  counted: number,
): Omit<Fell, 'inHand'> {
  const floor = wovenShare(at, stretches, heights);
  const ticked = wovenShare(done, stretches, heights);
  if (counted <= floor) return { done, share: ticked };
  const share = allTicked ? Math.max(counted, ticked) : counted;
  const own = wovenShare(at + 1, stretches, heights) - floor;
  return { share, done: own === 0 ? done : at + Math.min(MOST_IN_HAND, (share - floor) / own) };
}
