import type { MarkReadInput } from '#contracts/notices.ts';
import type { Context } from '#server/context.ts';
import { found, signedIn } from '#server/errors.ts';
import { NoticeReceipt } from '#server/models/index.ts';

/**
 * Marks one notice of hers as read, or all. One that is read stays as it is.
 * @returns how many were unread.
 * @throws NOT_FOUND for somebody else's.
 */
export async function markRead(ctx: Context, { notice }: MarkReadInput): Promise<number> {
  const { userId } = signedIn(ctx);
  if (notice !== 'all') found(await NoticeReceipt.findOne({ where: { userId, publicId: notice } }));
  const [count] = await NoticeReceipt.update({ readAt: ctx.clock.now() }, { where: { userId, readAt: null, ...(notice === 'all' ? {} : { publicId: notice }) } });
  return count;
}
