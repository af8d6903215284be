import type { TakeOutLoomInput } from '#contracts/own-looms.ts';
import type { Context } from '#server/context.ts';
import { withTransaction } from '#server/db/transaction.ts';
import { authorize, found } from '#server/errors.ts';
import { OwnLoomRow } from '#server/models/index.ts';
import { writeLoom } from './_write-loom.ts';

/** Takes a loom off a person's list, or puts it back. @throws NOT_FOUND for one that is not hers; VALIDATION where the list is full. */
export async function takeOutLoom(ctx: Context, { loom: publicId, back }: TakeOutLoomInput): Promise<{ readonly name: string }> {
  authorize(ctx.actor !== null, 'UNAUTHENTICATED');
  const { userId } = ctx.actor;
  return withTransaction(async () => {
    const row = found(await OwnLoomRow.findOne({ where: { userId, publicId }, lock: true }));
    if (back === undefined) await row.update({ takenOutAt: ctx.clock.now() });
    else await writeLoom(userId, { name: row.name, loom: row.data, publicId });
    return { name: row.name };
  });
}
