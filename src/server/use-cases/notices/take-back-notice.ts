import { audit } from '#server/audit.ts';
import type { Context } from '#server/context.ts';
import { withTransaction } from '#server/db/transaction.ts';
import { AppError, found } from '#server/errors.ts';
import { Notice } from '#server/models/index.ts';
import { ownNotice } from './_own-notice.ts';

/**
 * Makes a draft again of a notice that waits for its moment.
 * @throws NOT_FOUND for another teacher's; CONFLICT once it goes out: what was said cannot be unsaid.
 */
export async function takeBackNotice(ctx: Context, publicId: string): Promise<void> {
  const known = await ownNotice(ctx, publicId);
  await withTransaction(async () => {
    const notice = found(await Notice.findByPk(known.id, { lock: true }));
    if (notice.state === 'draft') return;
    if (notice.state !== 'waiting') throw new AppError('CONFLICT', { says: 'This notice is out already. Write another one to put it right.' });
    await notice.update({ state: 'draft', sendAt: null });
    await audit(ctx, 'take-back-notice', { kind: 'notice', id: notice.publicId });
  });
}
