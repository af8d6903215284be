import type { CountRowsInput, RowsCounted, RowsInput } from '#contracts/rows.ts';
import { bandKey } from '#core/craft/fitting/way.ts';
import type { Piece } from '#core/craft/crafts.ts';
import type { Context } from '#server/context.ts';
import { withTransaction } from '#server/db/transaction.ts';
import { AppError, authorize, found, signedIn } from '#server/errors.ts';
import { Enrolment, RowTally } from '#server/models/index.ts';
import { talliesFor } from '#server/queries/following/row-counts.ts';
import { piecesOf } from '#server/queries/pieces/pieces-of.ts';
import { seriesFor } from '#server/queries/series/series-for.ts';
import { setRows, writeTallies } from './_write-rows.ts';

/** More are no person's, and would fill the table. */
const MOST_DEVICES = 200;

/**
 * Takes what one device has counted at the loom, and answers with what all of them did. Devices add up: no clock is
 * asked, and what comes twice counts once. A band that the pattern no longer has is passed over, as the device may
 * have counted it before.
 */
export async function countRows(ctx: Context, { series: slug, device, tallies }: CountRowsInput): Promise<RowsCounted> {
  const { enrolmentId, keys } = await seatAtLoom(ctx, slug);
  const known = Object.fromEntries(Object.entries(tallies).filter(([key]) => keys.has(key)));
  await withTransaction(async () => {
    found(await Enrolment.findByPk(enrolmentId, { lock: true }));
    if (await RowTally.count({ where: { enrolmentId }, distinct: true, col: 'device' }) >= MOST_DEVICES && (await RowTally.count({ where: { enrolmentId, device } })) === 0) {
      throw new AppError('CONFLICT', { says: 'Rows of this piece were counted in very many browsers. Count on in one you used before.' });
    }
    await writeTallies(enrolmentId, device, known, ctx.clock.now());
  });
  return talliesFor(enrolmentId, device);
}

/** The student says outright how many rows of a band are woven. */
export async function sayRows(ctx: Context, { series: slug, band, rows }: RowsInput): Promise<void> {
  const { enrolmentId, keys } = await seatAtLoom(ctx, slug);
  authorize(keys.has(band));
  await withTransaction(async () => {
    found(await Enrolment.findByPk(enrolmentId, { lock: true }));
    await setRows(enrolmentId, band, rows, ctx.clock.now());
  });
}

async function seatAtLoom(ctx: Context, slug: string): Promise<{ enrolmentId: number; keys: ReadonlySet<string> }> {
  const series = found(await seriesFor(signedIn(ctx), slug, ctx.clock.now()));
  authorize(series.seat !== null);
  const { pattern } = await piecesOf(series.id, null);
  return { enrolmentId: series.seat.enrolmentId, keys: new Set(pattern === null ? [] : keysOf(pattern)) };
}

function keysOf(piece: Piece): string[] {
  return piece.craft === 'frame-loom' ? piece.bands.map(bandKey) : [];
}
