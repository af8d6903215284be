/** What a teacher wrote, handed to one person: into her page, and by letter where she asked for it. Part of the caller's transaction. */
import type { Piece } from '#core/craft/crafts.ts';
import { noticeFor } from '#core/notices/notice-for.ts';
import type { LetterKind } from '#core/notices/letter-kinds.ts';
import { titleHalves } from '#core/series/title.ts';
import { leaveKey } from '#server/auth/leave-key.ts';
import { found } from '#server/errors.ts';
import { postLetter } from '#server/mail/outbox.ts';
import { PatternPiece, Series, User, Workroom, type Notice } from '#server/models/index.ts';
import { putUp } from '#server/notices/put-up.ts';
import type { Recipient } from '#server/queries/notices/recipients.ts';

export interface Written {
  readonly notice: Notice;
  readonly series: Series;
  readonly workroom: Workroom;
  readonly author: User;
  readonly pattern: Piece | null;
}

/** Everything that is the same for everybody who gets it. */
export async function writtenBy(notice: Notice): Promise<Written> {
  const [series, workroom, author, pattern] = await Promise.all([
    Series.findByPk(notice.seriesId), Workroom.findByPk(notice.workroomId), User.findByPk(notice.authorId), PatternPiece.findByPk(notice.seriesId),
  ]);
  return { notice, series: found(series), workroom: found(workroom), author: found(author), pattern: pattern?.data ?? null };
}

/** @returns false, with nothing written, when she has it already. */
export async function handTo({ notice, series, workroom, author, pattern }: Written, to: Recipient): Promise<boolean> {
  const list: LetterKind = notice.kind === 'nudge' ? 'nudges' : 'notices';
  const { name } = titleHalves(series.title);
  const said = { title: notice.title, from: `${author.name}, ${name}`, blocks: noticeFor(notice.tree, pattern, to) };
  const dedupeKey = `notice:${notice.publicId}:${to.person}`;
  const isNew = await putUp({
    userId: to.userId, kind: notice.kind, seriesId: series.id, noticeId: notice.id, byLetter: to.byLetter, dedupeKey,
    said: { ...said, act: { label: `Go to ${name}`, href: `/series/${series.slug}` } },
  });
  if (!isNew || !to.byLetter) return isNew;
  return postLetter({
    template: 'notice',
    dedupeKey,
    to: { userId: to.userId, name: to.name, address: to.email },
    list: { workroomId: workroom.id, kind: list },
    data: {
      ...said, kind: list, seriesTitle: name, seriesSlug: series.slug, workroomName: workroom.name, workroomHandle: workroom.handle, postalAddress: workroom.postalAddress,
      leaveKey: leaveKey({ person: to.person, workroom: workroom.publicId, kind: list }),
    },
  });
}
