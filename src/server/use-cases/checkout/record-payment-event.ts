import { UniqueConstraintError } from 'sequelize';
import type { Context } from '#server/context.ts';
import { withTransaction } from '#server/db/transaction.ts';
import { settlePaymentEvent } from '#server/jobs/definitions/payments.ts';
import { enqueue } from '#server/jobs/queue.ts';
import { PaymentEvent } from '#server/models/index.ts';
import type { EventRefusal } from '#server/payments/payment-service.ts';
import { API_VERSION } from '#server/payments/stripe-payment-service.ts';

export type EventReceipt = { readonly ok: true; readonly isNew: boolean } | { readonly ok: false; readonly reason: EventRefusal };

/**
 * Keeps what the payment service tells us, once, together with the job that acts on it; so it can be answered at once
 * and nothing is lost whatever dies afterwards. Throws only when the database does not answer.
 */
export async function recordPaymentEvent(ctx: Context, rawBody: string, signature: string | null): Promise<EventReceipt> {
  const verdict = ctx.services.payments.verifyEvent(rawBody, signature, ctx.clock.now());
  if (!verdict.ok) {
    console.warn(JSON.stringify({ level: 'warn', requestId: ctx.requestId, message: 'payment event refused', reason: verdict.reason }));
    return verdict;
  }
  const { event, clockSkewSeconds } = verdict;
  if (Math.abs(clockSkewSeconds) > 60) console.warn(JSON.stringify({ level: 'warn', message: 'clocks differ from the payment service', clockSkewSeconds }));
  try {
    await withTransaction(async () => {
      await PaymentEvent.create({ id: event.id, type: event.type, apiVersion: event.foreignVersion ? 'other' : API_VERSION, isLive: event.live, objectId: event.about.id, payload: event });
      await enqueue(settlePaymentEvent, { eventId: event.id }, { uniqueKey: `payment-event:${event.id}` });
    });
    return { ok: true, isNew: true };
  } catch (error) {
    if (error instanceof UniqueConstraintError) return { ok: true, isNew: false };
    throw error;
  }
}
