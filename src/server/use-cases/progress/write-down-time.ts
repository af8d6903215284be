import type { ChangeTimeInput, WriteTimeInput } from '#contracts/weaving-time.ts';
import { dayIn } from '#core/timetable/day-in.ts';
import type { Context } from '#server/context.ts';
import { AppError, authorize, found, signedIn } from '#server/errors.ts';
import { Enrolment, WeavingTime } from '#server/models/index.ts';
import { seriesFor } from '#server/queries/series/series-for.ts';

/** No piece is woven for longer; a seat with more is filled by a program. */
const MOST_ENTRIES = 2_000;

/** Writes down how long she wove on a day. The same form once more changes nothing. */
export async function writeDownTime(ctx: Context, { series: slug, entry, day, woven }: WriteTimeInput): Promise<void> {
  const actor = signedIn(ctx);
  const now = ctx.clock.now();
  const series = found(await seriesFor(actor, slug, now));
  authorize(series.seat !== null);
  if (day > dayIn(now, actor.timeZone)) throw new AppError('VALIDATION', { fields: { day: 'That day is still to come.' } });
  const { enrolmentId } = series.seat;
  if (await WeavingTime.count({ where: { enrolmentId } }) >= MOST_ENTRIES) throw new AppError('CONFLICT', { says: 'So many times are written down that no more fit. Take some out, or add up their hours in one.' });
  await WeavingTime.bulkCreate([{ publicId: entry, enrolmentId, day, minutes: woven }], { ignoreDuplicates: true });
}

/** Changes what she wrote down, or takes it out where it is 0. */
export async function changeTime(ctx: Context, { entry, woven }: ChangeTimeInput): Promise<{ isTakenOut: boolean }> {
  const { userId } = signedIn(ctx);
  const row = found(await WeavingTime.findOne({ where: { publicId: entry } }));
  const seat = found(await Enrolment.findByPk(row.enrolmentId));
  authorize(seat.userId === userId && seat.state === 'active');
  if (woven === 0) await row.destroy();
  else await row.update({ minutes: woven });
  return { isTakenOut: woven === 0 };
}
