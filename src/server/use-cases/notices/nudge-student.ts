import type { NudgeInput } from '#contracts/notices.ts';
import { momentWords } from '#core/moment-words.ts';
import { nextNudgeAt, NUDGE_DAYS, nudgeTitle } from '#core/notices/nudge.ts';
import { titleHalves } from '#core/series/title.ts';
import { audit } from '#server/audit.ts';
import type { Context } from '#server/context.ts';
import { withTransaction } from '#server/db/transaction.ts';
import { AppError, authorize, found, signedIn } from '#server/errors.ts';
import { Enrolment, Notice, Series, Workroom } from '#server/models/index.ts';
import { mayTeachIn } from '#server/policies/workroom.ts';
import { lastNudgeOf } from '#server/queries/notices/last-nudge.ts';
import { recipientsAt } from '#server/queries/notices/recipients.ts';
import { countUse, RATE_RULES } from '#server/web/rate-limit.ts';
import { handTo, writtenBy } from './_hand-to.ts';
import { keepPostalAddress, readNoticeWords } from './_own-notice.ts';

export interface Nudged {
  readonly name: string;
  readonly byLetter: boolean;
}

/**
 * A word to one student of the teacher's own, in her page and, if she asked for that, by letter.
 * @throws NOT_FOUND for another workroom's seat or one that is closed; CONFLICT within three days of the last one.
 */
export async function nudgeStudent(ctx: Context, input: NudgeInput): Promise<Nudged> {
  const actor = signedIn(ctx);
  const seat = found(await Enrolment.findOne({ where: { publicId: input.seat, state: 'active' } }));
  const series = found(await Series.findByPk(seat.seriesId));
  authorize(mayTeachIn(actor, series.workroomId));
  const source = input.words.replace(/\r\n?/g, '\n');
  const tree = await readNoticeWords(source, series.id);
  await countUse(RATE_RULES.nudge, String(series.workroomId));
  return withTransaction(async () => {
    // The workroom's row is the lock: two presses of the button are one nudge.
    const workroom = found(await Workroom.findByPk(series.workroomId, { lock: true }));
    const now = ctx.clock.now();
    const next = nextNudgeAt(await lastNudgeOf(seat.userId, workroom.id));
    const to = found((await recipientsAt([seat.publicId], workroom.id, 'nudges'))[0]);
    if (next !== null && next > now) throw new AppError('CONFLICT', { says: `${to.name} was nudged within ${NUDGE_DAYS} days. The next word can go from ${momentWords(next, actor.timeZone)}.` });
    await keepPostalAddress(ctx, workroom, input.postalAddress);
    const notice = await Notice.create({
      workroomId: workroom.id, seriesId: series.id, authorId: actor.userId, kind: 'nudge', state: 'sent', title: nudgeTitle(titleHalves(series.title).name), source, tree, sentAt: now,
    });
    await handTo(await writtenBy(notice), to);
    await audit(ctx, 'nudge-student', { kind: 'seat', id: seat.publicId }, { notice: notice.publicId });
    return { name: to.name, byLetter: to.byLetter };
  });
}
