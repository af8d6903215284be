/** Where the students of a series are, as their teacher sees it: part, fell line, and for how long nothing has moved. */
import type { CountedCloth } from '#core/following/counted-cloth.ts';
import { fellInHand, isDone, type Verdict } from '#core/following/progress.ts';

/** What one student has done of one part. */
export interface PartOfOne {
  readonly isFinished: boolean;
  /** Of her newest photo. */
  readonly verdict: Verdict | null;
  readonly steps: number;
  /** May be more than there are steps now, when the text has lost some. */
  readonly ticked: number;
}

export interface ClassPlace {
  /** Place of the part in hand, from 0; undefined when all are done. */
  readonly at: number | undefined;
  /** Parts done without a gap, with the share of the one in hand: 2.5. */
  readonly done: number;
  /** Of the part in hand. */
  readonly verdict: Verdict | null;
}

/** All steps ticked is not yet done: the last look is missing. */
const ALMOST = 0.96;

/**
 * The rows she counted say how far she is in the part in hand, as they do on her own loom.
 * @param cloth null where she counted none, or her piece is not woven in bands: then the steps she ticked say it
 */
export function classPlace(parts: readonly PartOfOne[], cloth: CountedCloth | null): ClassPlace {
  const at = parts.findIndex((part) => !isDone(part));
  const part = parts[at];
  if (part === undefined) return { at: undefined, done: parts.length, verdict: null };
  const share = part.steps === 0 ? 0 : Math.min(ALMOST, part.ticked / part.steps);
  const ticked = at + share;
  const done = cloth === null ? ticked : fellInHand({ at, done: ticked, allTicked: part.ticked >= part.steps }, cloth.stretches, cloth.heights, cloth.counted).done;
  return { at, done, verdict: part.verdict };
}

export const DAY_MS = 86_400_000;
/** After so many days without a step a student is shown as standing still. */
export const STILL_DAYS = 14;

/** Whole days since the last step. */
export const daysSince = (moment: Date, now: Date): number => Math.max(0, Math.floor((now.getTime() - moment.getTime()) / DAY_MS));

export interface ClassCount {
  readonly moving: number;
  readonly still: number;
}

interface Placed {
  readonly at: number | undefined;
  readonly lastStepAt: Date;
}

/** How many are at each of `count` parts; those who have finished are in none. */
export function countByPart(students: readonly Placed[], count: number, now: Date): readonly ClassCount[] {
  return Array.from({ length: count }, (_, part) => {
    const here = students.filter(({ at }) => at === part);
    const still = here.filter(({ lastStepAt }) => daysSince(lastStepAt, now) >= STILL_DAYS).length;
    return { moving: here.length - still, still };
  });
}
