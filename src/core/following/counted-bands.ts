/** The bands of a piece whose rows are counted, and how far up the piece the counted rows reach. */
import { isMadeIn, type Piece, type Plan } from '#core/craft/crafts.ts';
import { bandWords } from '#core/craft/fitting/tell-changes.ts';
import { bandKey } from '#core/craft/fitting/way.ts';
import { rowsIn, wovenShare } from '#core/craft/rest/woven-share.ts';
import { NOTHING_WOVEN, type WovenSoFar } from '#core/craft/rest/woven-so-far.ts';
import { countIn, type CountedBand, type RowCounts } from './row-count.ts';

interface AnyMade {
  readonly piece: Piece;
  readonly plan: Plan;
}

/** In the order they are woven; none for a craft that has no rows. */
export function countedBands(made: AnyMade): CountedBand[] {
  if (!isMadeIn('frame-loom', made)) return [];
  const { piece, plan } = made;
  return piece.bands.flatMap((band, index) => {
    const rows = rowsIn(plan.bands[index], band);
    return rows === undefined ? [] : [{ index, key: bandKey(band, index), words: bandWords(band, index), technique: band.technique, rows }];
  });
}

/** What lies below the last band with a row in it is taken to be woven. */
export function wovenByCount(bands: readonly CountedBand[], counts: RowCounts): WovenSoFar {
  const band = bands.findLast((one) => countIn(counts, one) > 0);
  if (band === undefined) return NOTHING_WOVEN;
  const rows = countIn(counts, band);
  return rows >= band.rows ? { bandsDone: band.index + 1 } : { bandsDone: band.index, rows };
}

/** The counts that say the same as `said`, for the bands from which her place is told. */
export function countsAt(bands: readonly CountedBand[], { bandsDone, rows = 0 }: WovenSoFar): RowCounts {
  const below = bands.findLast(({ index }) => index < bandsDone);
  return Object.fromEntries([
    ...(below === undefined ? [] : [[below.key, below.rows] as const]),
    ...bands.filter(({ index }) => index >= bandsDone).map(({ key, index }) => [key, index === bandsDone ? rows : 0] as const),
  ]);
}

/**
 * Share of the woven height, 0 to 1, that she counted, or said in *My piece* to have woven: the further of both.
 * 0 for a craft that has no rows.
 */
export function countedShare(made: AnyMade, counts: RowCounts, said: WovenSoFar): number {
  if (!isMadeIn('frame-loom', made)) return 0;
  return Math.max(wovenShare(made, wovenByCount(countedBands(made), counts)), wovenShare(made, said));
}
