import type { Context } from '#server/context.ts';
import { settleCheckout } from '#server/jobs/definitions/payments.ts';
import { enqueue } from '#server/jobs/queue.ts';
import { Order } from '#server/models/index.ts';

const PATIENCE_MS = 12_000;

/**
 * The buyer came back from the pay page. Nothing is granted by that; but should the payment service's own message be
 * slow or lost, the checkout is looked at soon by itself.
 */
export async function askForSettlement(ctx: Context, checkoutId: string): Promise<void> {
  const order = ctx.actor === null ? null : await Order.findOne({ where: { sessionId: checkoutId, userId: ctx.actor.userId, state: 'pending' } });
  if (order === null) return;
  await enqueue(settleCheckout, { checkoutId }, { uniqueKey: `came-back:${checkoutId}`, runAt: new Date(ctx.clock.now().getTime() + PATIENCE_MS) });
}
