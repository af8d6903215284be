/** How far up a piece the fell is, for a picture of it. */
import type { Made } from '#core/craft/fitting/tell-changes.ts';
import type { WovenSoFar } from '#core/craft/rest/woven-so-far.ts';

/** Of the woven height, 0..1, by the heights of the plan. */
export function wovenShare({ piece, plan }: Made, { bandsDone, rows = 0 }: WovenSoFar): number {
  const all = plan.bands.reduce((sum, { heightMm }) => sum + heightMm, 0);
  const done = plan.bands.slice(0, bandsDone).reduce((sum, { heightMm }) => sum + heightMm, 0);
  const [inHand, band] = [plan.bands[bandsDone], piece.bands[bandsDone]];
  const rowsOfBand = rowsIn(inHand, band);
  const part = inHand === undefined || rowsOfBand === undefined ? 0 : inHand.heightMm * Math.min(1, rows / rowsOfBand);
  return all > 0 ? Math.min(1, (done + part) / all) : 0;
}

/** Rows of a band that are counted as they are woven; undefined where there are none. */
export function rowsIn(planned: Made['plan']['bands'][number] | undefined, band: Made['piece']['bands'][number] | undefined): number | undefined {
  if (planned === undefined || band === undefined) return undefined;
  const rows = band.technique === 'tabby' ? planned.picks : 'rows' in band ? band.rows : undefined;
  return rows === 0 ? undefined : rows;
}
