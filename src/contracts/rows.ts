/** Rows counted at the loom. */
import { z } from 'astro/zod';
import { MOST_ROWS, type RowCounts, type Tally } from '#core/following/row-count.ts';

const series = z.string().regex(/^[a-z0-9-]{1,64}$/);
const band = z.string().regex(/^(?:[a-z0-9-]{1,64}|#\d{1,3})$/);
const tally = z.object({ rows: z.number().int().min(-MOST_ROWS).max(MOST_ROWS), version: z.number().int().min(1).max(1_000_000_000) });

/** Everything one device has counted in a series; what it sent before may come along, and counts once. */
export const CountRows = z.object({
  series,
  /** Made up by the device, once for each seat. */
  device: z.string().regex(/^[0-9a-z]{16,32}$/),
  tallies: z.record(band, tally).refine((all) => Object.keys(all).length <= 200, 'A piece has at most 200 bands.'),
});
export type CountRowsInput = z.output<typeof CountRows>;

/** The answer: what this device has counted as far as the house knows, and what all others did. By key of the band. */
export interface RowsCounted {
  readonly own: Readonly<Record<string, Tally>>;
  readonly others: RowCounts;
}

/** The number of rows that are woven of a band, as a form without script sends it. */
export const RowsForm = z.object({
  series,
  /** Of the loom side it was sent from. */
  part: z.coerce.number().int().min(1).max(200),
  step: z.coerce.number().int().min(1).max(1_000),
  band,
  /** From the field; a button that counts on sends its own number instead. */
  rows: z.union([z.string(), z.array(z.string())]).transform((sent) => (typeof sent === 'string' ? sent : (sent.at(-1) ?? ''))).pipe(
    z.string().trim().regex(/^\d{1,5}$/, `Give the rows as a number, from 0 to ${String(MOST_ROWS)}.`).transform(Number).pipe(z.number().max(MOST_ROWS, `Up to ${String(MOST_ROWS)} rows can be counted in a band.`)),
  ),
});
export type RowsInput = z.output<typeof RowsForm>;
