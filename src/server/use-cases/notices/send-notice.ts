import type { SendNoticeInput } from '#contracts/notices.ts';
import { DAY_MS } from '#core/workroom/class-place.ts';
import { instantOfWall } from '#core/timetable/opening.ts';
import { audit } from '#server/audit.ts';
import type { Context } from '#server/context.ts';
import { withTransaction } from '#server/db/transaction.ts';
import { AppError, fieldError, found } from '#server/errors.ts';
import { handOutNotice } from '#server/jobs/definitions/notices.ts';
import { enqueue } from '#server/jobs/queue.ts';
import { Notice, Workroom } from '#server/models/index.ts';
import { countUse, RATE_RULES } from '#server/web/rate-limit.ts';
import { ownNotice } from './_own-notice.ts';

const LONGEST_WAIT_MS = 366 * DAY_MS;

/**
 * Sends a draft: now, or at a moment of the teacher's own clock. Who is meant is asked when it goes out.
 * @throws NOT_FOUND for another teacher's; CONFLICT when it was sent already; VALIDATION for a moment that does not work;
 * RATE_LIMITED after ten in a day.
 */
export async function sendNotice(ctx: Context, { notice: publicId, when, wall }: SendNoticeInput): Promise<Notice> {
  const known = await ownNotice(ctx, publicId);
  const workroom = found(await Workroom.findByPk(known.workroomId));
  const now = ctx.clock.now();
  const sendAt = when === 'now' ? now : momentOf(wall, workroom.timeZone, now);
  await countUse(RATE_RULES.notice, workroom.publicId);
  return withTransaction(async () => {
    const notice = found(await Notice.findByPk(known.id, { lock: true }));
    if (notice.state !== 'draft') throw new AppError('CONFLICT', { says: 'This notice was sent already. Nobody gets it twice.' });
    await notice.update({ state: 'waiting', sendAt });
    await enqueue(handOutNotice, { notice: notice.publicId }, { runAt: sendAt });
    await audit(ctx, 'send-notice', { kind: 'notice', id: notice.publicId }, { sendAt: sendAt.toISOString() });
    return notice;
  });
}

function momentOf(wall: string, timeZone: string, now: Date): Date {
  const moment = instantOfWall(wall, timeZone);
  if (moment === null) throw fieldError('wall', 'The day and time are missing. Write them like 2027-03-01 09:00.');
  if (moment <= now) throw fieldError('wall', 'This moment has passed. Choose a later one, or send it now.');
  if (moment.getTime() - now.getTime() > LONGEST_WAIT_MS) throw fieldError('wall', 'That is more than a year away. Keep it as a draft until then.');
  return moment;
}
