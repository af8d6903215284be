/**
 * Rows counted at the loom, band by band, against the plan. Every device keeps a tally of its own for each band, with a
 * version that grows as it counts: tallies add up, whichever device sends first and whatever its clock says, and one
 * that is sent twice counts once.
 */

/** A band whose rows are counted as they are woven. */
export interface CountedBand {
  /** Place in the piece, 0 being woven first. */
  readonly index: number;
  /** See `bandKey`. */
  readonly key: string;
  /** `dark shore` */
  readonly words: string;
  readonly technique: string;
  /** By the plan of the piece as it is made; 1 at least. */
  readonly rows: number;
}

/** Rows woven, by key of their band; a band that is missing has none. */
export type RowCounts = Readonly<Record<string, number>>;

/** What one device has counted in one band. Below zero where it took back what another one counted. */
export interface Tally {
  readonly rows: number;
  readonly version: number;
}

/** More in one band is no count but a slip. */
export const MOST_ROWS = 20_000;

/** Of two states of one device's tally the newer one. */
export function newerTally(a: Tally, b: Tally): Tally {
  return b.version > a.version ? b : a;
}

/** Rows of a band from what the devices counted, each on its own: never below zero. */
export function rowsOf(tallies: Iterable<number>): number {
  let sum = 0;
  for (const rows of tallies) sum += rows;
  return Math.min(MOST_ROWS, Math.max(0, sum));
}

export function countIn(counts: RowCounts, { key }: Pick<CountedBand, 'key'>): number {
  return Object.hasOwn(counts, key) ? (counts[key] ?? 0) : 0;
}

/**
 * The band that is woven now: the last one with a row in it or, where that has all its rows, the one after it.
 * @param bands those to choose from, in their order; undefined when there are none
 */
export function bandInHand(bands: readonly CountedBand[], counts: RowCounts): CountedBand | undefined {
  const last = bands.findLastIndex((band) => countIn(counts, band) > 0);
  const band = bands[last];
  if (band === undefined) return bands[0];
  return countIn(counts, band) >= band.rows ? (bands[last + 1] ?? band) : band;
}

/**
 * The band to count in while a part is woven: the one in hand, as far as the part weaves it.
 * @param own keys of the bands this part weaves
 */
export function bandForPart(bands: readonly CountedBand[], own: readonly string[], counts: RowCounts): CountedBand | undefined {
  const inHand = bandInHand(bands, counts);
  const ofPart = bands.filter(({ key }) => own.includes(key));
  const [first, last] = [ofPart[0], ofPart.at(-1)];
  if (inHand === undefined || first === undefined || last === undefined) return inHand;
  return inHand.index < first.index ? first : inHand.index > last.index ? last : inHand;
}

/** `row 3 of 11 of the band “foot”`, of the band in hand; empty where no row of it is counted. */
export function rowPlaceWords(bands: readonly CountedBand[], counts: RowCounts): string {
  const band = bandInHand(bands, counts);
  const rows = band === undefined ? 0 : countIn(counts, band);
  if (band === undefined || rows === 0) return '';
  return `row ${String(rows)} of ${String(band.rows)} of ${band.key.startsWith('#') ? band.words : `the band “${band.words}”`}`;
}
