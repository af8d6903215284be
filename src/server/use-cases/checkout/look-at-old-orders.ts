import { Op } from 'sequelize';
import type { Context } from '#server/context.ts';
import { settleCheckout } from '#server/jobs/definitions/payments.ts';
import { enqueue } from '#server/jobs/queue.ts';
import { Order } from '#server/models/index.ts';

const MINUTE_MS = 60_000;
const SLOT_MS = 5 * MINUTE_MS;

/** Asks for every order that has waited for more than ten minutes to be looked at: a message can be lost altogether. */
export async function lookAtOldOrders(ctx: Context): Promise<void> {
  const now = ctx.clock.now().getTime();
  const orders = await Order.findAll({ where: { state: 'pending', sessionId: { [Op.not]: null }, createdAt: { [Op.lt]: new Date(now - 10 * MINUTE_MS) } }, limit: 200 });
  const slot = Math.floor(now / SLOT_MS);
  for (const { sessionId } of orders) {
    if (sessionId !== null) await enqueue(settleCheckout, { checkoutId: sessionId }, { uniqueKey: `old-order:${sessionId}:${slot}` });
  }
}
