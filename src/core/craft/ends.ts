/** How many warp ends a width takes. */
import type { EndsTogether, Parity } from '#core/craft/piece.ts';
import { roundHalfUp } from '#core/craft/rounding.ts';

export const END_RANGE = { min: 4, max: 2000 } as const;

/**
 * Width on the loom that draws in to the finished width. Shrinking is divided out:
 * adding the same share would fall short (10 in at 20 % needs 12.5 in, not 12).
 */
export function widthBeforeDrawIn(finishedMm: number, drawIn: number): number {
  return finishedMm / (1 - drawIn);
}

/** Ends before rounding. No end is added for the edge: the weft's loft at both selvedges makes up for it. */
export function rawEnds(loomWidthMm: number, endsPerMm: number): number {
  return loomWidthMm * endsPerMm;
}

/** Whether this many ends can be worked `together` at a time with the parity the pattern asks. */
export function endsSuit(ends: number, together: EndsTogether, parity: Parity): boolean {
  if (ends % together !== 0) return false;
  if (parity === 'any') return true;
  return (ends / together) % 2 === (parity === 'even' ? 0 : 1);
}

/** Doubled ends whose number of pairs must be even come round every fourth end. */
const MOST_RAISED = 3;

/** Whole ends, raised one by one until every demand holds. */
export function endsFor(raw: number, together: EndsTogether, parity: Parity): { readonly count: number; readonly raisedBy: number } {
  const rounded = roundHalfUp(raw);
  let raisedBy = 0;
  while (raisedBy < MOST_RAISED && !endsSuit(rounded + raisedBy, together, parity)) raisedBy += 1;
  return { count: rounded + raisedBy, raisedBy };
}
