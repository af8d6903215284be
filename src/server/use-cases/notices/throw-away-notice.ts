import type { Context } from '#server/context.ts';
import { withTransaction } from '#server/db/transaction.ts';
import { AppError, found } from '#server/errors.ts';
import { Notice } from '#server/models/index.ts';
import { ownNotice } from './_own-notice.ts';

/**
 * Throws a draft away that nobody has got.
 * @throws NOT_FOUND for another teacher's; CONFLICT for one that waits or is out.
 */
export async function throwAwayNotice(ctx: Context, publicId: string): Promise<void> {
  const known = await ownNotice(ctx, publicId);
  await withTransaction(async () => {
    const notice = found(await Notice.findByPk(known.id, { lock: true }));
    if (notice.state !== 'draft') throw new AppError('CONFLICT', { says: 'This notice is no draft any more, so it stays.' });
    await notice.destroy();
  });
}
