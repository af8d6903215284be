/** Steps that acts on a notice share: whose it is, and what may be read in its words. */
import { amountOf } from '#core/craft/amounts.ts';
import { madeFor } from '#core/craft/made-for.ts';
import type { LessonTree } from '#core/lesson-text/tree.ts';
import { unsayable } from '#core/notices/notice-text.ts';
import { audit } from '#server/audit.ts';
import type { Context } from '#server/context.ts';
import { authorize, fieldError, found, signedIn } from '#server/errors.ts';
import { readLessonText } from '#server/lesson-text/parse-pool.ts';
import { Notice, PatternPiece, type Workroom } from '#server/models/index.ts';
import { mayTeachIn } from '#server/policies/workroom.ts';

/** The notice with this public id, for its workroom's teacher only; nudges are no notices here. */
export async function ownNotice(ctx: Context, publicId: string): Promise<Notice> {
  const actor = signedIn(ctx);
  const notice = found(await Notice.findOne({ where: { publicId, kind: 'notice' } }));
  authorize(mayTeachIn(actor, notice.workroomId));
  return notice;
}

/** @throws VALIDATION at `words` for what cannot be read, a letter cannot say, or no plan of this series gives. */
export async function readNoticeWords(source: string, seriesId: number): Promise<LessonTree> {
  const reading = await readLessonText(source);
  if (!reading.ok) throw fieldError('words', reading.problems.slice(0, 3).map(({ line, reason }) => `Line ${line}: ${reason}`).join(' '));
  const why = unsayable(reading.tree);
  if (why !== null) throw fieldError('words', why);
  const made = reading.amounts.length === 0 ? null : madeFor((await PatternPiece.findByPk(seriesId))?.data ?? null, {}, 'cm');
  const unknown = reading.amounts.find((key) => made === null || !amountOf(key, made.piece, made.plan).ok);
  if (unknown !== undefined) throw fieldError('words', `No plan of this series gives “${unknown}”. The names of its amounts stand below, and beside the text of each part.`);
  return reading.tree;
}

/** A letter to many says where its sender is found by post. Keeps what was typed, or asks for it. */
export async function keepPostalAddress(ctx: Context, workroom: Workroom, typed: string): Promise<void> {
  if (typed === '' && workroom.postalAddress === '') throw fieldError('postalAddress', 'Your postal address is missing. It stands at the foot of such letters, and is asked for once.');
  if (typed === '' || typed === workroom.postalAddress) return;
  await workroom.update({ postalAddress: typed });
  await audit(ctx, 'change-postal-address', { kind: 'workroom', id: workroom.publicId });
}
