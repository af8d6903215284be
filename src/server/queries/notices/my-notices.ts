/** What one person is told in her page, newest first. */
import type { Said, ToldKind } from '#core/notices/said.ts';
import type { Actor } from '#server/context.ts';
import { NoticeReceipt } from '#server/models/index.ts';

export interface MyNotice {
  readonly publicId: string;
  readonly kind: ToldKind;
  readonly said: Said;
  readonly byLetter: boolean;
  readonly at: Date;
  readonly isRead: boolean;
}

export interface MyNotices {
  readonly rows: readonly MyNotice[];
  readonly page: number;
  readonly pages: number;
}

export const NOTICES_ON_PAGE = 20;

/** One page of them, from 1; beyond the last page the last one is given. */
export async function myNotices(actor: Actor, asked: number): Promise<MyNotices> {
  const where = { userId: actor.userId };
  const pages = Math.max(1, Math.ceil((await NoticeReceipt.count({ where })) / NOTICES_ON_PAGE));
  const page = Math.min(Math.max(1, asked), pages);
  const rows = await NoticeReceipt.findAll({ where, order: [['id', 'DESC']], limit: NOTICES_ON_PAGE, offset: (page - 1) * NOTICES_ON_PAGE });
  return { rows: rows.map(asNotice), page, pages };
}

/** The newest of those she has not marked as read. */
export async function unreadNotices(actor: Actor, most: number): Promise<MyNotice[]> {
  if (actor.unreadNotices === 0) return [];
  return (await NoticeReceipt.findAll({ where: { userId: actor.userId, readAt: null }, order: [['id', 'DESC']], limit: most })).map(asNotice);
}

function asNotice({ publicId, kind, said, byLetter, createdAt, readAt }: NoticeReceipt): MyNotice {
  return { publicId, kind, said, byLetter, at: createdAt, isRead: readAt !== null };
}
