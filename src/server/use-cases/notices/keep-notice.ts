import type { NoticeDraftInput } from '#contracts/notices.ts';
import type { Context } from '#server/context.ts';
import { withTransaction } from '#server/db/transaction.ts';
import { AppError, fieldError, found, signedIn } from '#server/errors.ts';
import { Notice, Workroom } from '#server/models/index.ts';
import { classOf } from '#server/queries/workroom/class-of.ts';
import { ownSeries } from '#server/use-cases/workroom/_own-series.ts';
import { keepPostalAddress, ownNotice, readNoticeWords } from './_own-notice.ts';

/**
 * Keeps a notice as a draft: a new one, or over one that was not sent. Nobody gets it by this.
 * @throws NOT_FOUND for another teacher's series or notice; VALIDATION at the field; CONFLICT when it is on its way.
 */
export async function keepNotice(ctx: Context, input: NoticeDraftInput): Promise<Notice> {
  const actor = signedIn(ctx);
  const series = await ownSeries(ctx, input.series);
  const known = input.notice === undefined ? null : await ownNotice(ctx, input.notice);
  const source = input.words.replace(/\r\n?/g, '\n');
  const tree = await readNoticeWords(source, series.id);
  const kept = { seriesId: series.id, title: input.title, source, tree, atLessonId: await partAt(series.workroomId, series.id, input.part), stillDays: input.still };
  return withTransaction(async () => {
    await keepPostalAddress(ctx, found(await Workroom.findByPk(series.workroomId, { lock: true })), input.postalAddress);
    if (known === null) return Notice.create({ ...kept, workroomId: series.workroomId, authorId: actor.userId, kind: 'notice' });
    const draft = found(await Notice.findByPk(known.id, { lock: true }));
    if (draft.state !== 'draft') throw new AppError('CONFLICT', { says: 'This notice is on its way already. Take it back first, or write another one.' });
    return draft.update(kept);
  });
}

/** The part by its number, as students count. */
async function partAt(workroomId: number, seriesId: number, number: number | null): Promise<number | null> {
  if (number === null) return null;
  const part = (await classOf([workroomId])).find(({ id }) => id === seriesId)?.parts[number - 1];
  if (part === undefined) throw fieldError('part', 'This series has no such part.');
  return part.id;
}
