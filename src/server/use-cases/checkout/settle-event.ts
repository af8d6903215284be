import type { Context } from '#server/context.ts';
import { found } from '#server/errors.ts';
import { settleCheckout } from '#server/jobs/definitions/payments.ts';
import { enqueue } from '#server/jobs/queue.ts';
import { withTransaction } from '#server/db/transaction.ts';
import { PaymentEvent } from '#server/models/index.ts';

/**
 * Takes from a stored event only what it is about and asks for that thing to be looked at; what is not about a checkout
 * is kept and counted. The order in which events come therefore does not matter.
 */
export async function settleEvent(ctx: Context, eventId: string): Promise<void> {
  await withTransaction(async () => {
    const event = found(await PaymentEvent.findByPk(eventId, { lock: true }));
    if (event.handledAt !== null) return;
    const isCheckout = event.type.startsWith('checkout.session.');
    if (isCheckout) await enqueue(settleCheckout, { checkoutId: event.objectId }, { uniqueKey: `settle:${eventId}` });
    await event.update({ handledAt: ctx.clock.now(), outcome: isCheckout ? 'looked-at' : 'kept' });
  });
}
