import type { Context } from '#server/context.ts';
import { withTransaction } from '#server/db/transaction.ts';
import { found } from '#server/errors.ts';
import { Notice } from '#server/models/index.ts';
import { recipientsOf, type Recipient } from '#server/queries/notices/recipients.ts';
import { handTo, writtenBy } from './_hand-to.ts';

/** So many people in one transaction: few enough that nobody else waits for it. */
const AT_ONCE = 25;

/**
 * Hands a notice out whose moment has come, a few people at a time. Whoever has it already is passed over, so that it may
 * be begun again after a worker died, and by two at once. One that was taken back, or put off, is left alone.
 */
export async function handOutNotice(ctx: Context, { notice: publicId }: { readonly notice: string }): Promise<void> {
  const known = found(await Notice.findOne({ where: { publicId } }));
  if (!(await begin(ctx, known.id))) return;
  const people = await recipientsOf(known, ctx.clock.now());
  for (let from = 0; from < people.length; from += AT_ONCE) await handToSome(known.id, people.slice(from, from + AT_ONCE));
  await Notice.update({ state: 'sent', sentAt: ctx.clock.now() }, { where: { id: known.id, state: 'sending' } });
}

/** @returns false when there is nothing to hand out. */
async function begin(ctx: Context, id: number): Promise<boolean> {
  return withTransaction(async () => {
    const notice = found(await Notice.findByPk(id, { lock: true }));
    if (notice.state === 'sending') return true;
    if (notice.state !== 'waiting' || notice.sendAt === null || notice.sendAt > ctx.clock.now()) return false;
    await notice.update({ state: 'sending' });
    return true;
  });
}

async function handToSome(id: number, people: readonly Recipient[]): Promise<void> {
  await withTransaction(async () => {
    const written = await writtenBy(found(await Notice.findByPk(id, { lock: true })));
    for (const person of people) await handTo(written, person);
  });
}
