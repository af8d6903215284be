import type { TakeBackInput } from '#contracts/bench.ts';
import { audit } from '#server/audit.ts';
import type { Context } from '#server/context.ts';
import { withTransaction } from '#server/db/transaction.ts';
import { AppError, authorize, found } from '#server/errors.ts';
import { HeldVerdict, ProgressPhoto } from '#server/models/index.ts';
import { photoAtBench } from './_at-bench.ts';

/**
 * Takes back one's own verdict before the student learns of it. Words and pins stay on the bench with the photo.
 * @throws NOT_FOUND for another one's verdict; CONFLICT when it has gone out.
 */
export async function takeBackVerdict(ctx: Context, { photo: publicId }: TakeBackInput): Promise<void> {
  const { actor, photo } = await photoAtBench(ctx, publicId);
  await withTransaction(async () => {
    const { verdict } = found(await ProgressPhoto.findByPk(photo.id, { lock: true }));
    if (verdict !== 'waits') throw new AppError('CONFLICT', { says: 'That verdict has gone out. Write to the student when it needs another word.' });
    const held = found(await HeldVerdict.findByPk(photo.id));
    authorize(held.byId === actor.userId);
    if (held.goesOutAt === null) return;
    await held.update({ goesOutAt: null });
    await audit(ctx, 'verdict-taken-back', { kind: 'photo', id: publicId });
  });
}
