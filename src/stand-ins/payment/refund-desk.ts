import type Stripe from 'stripe';
import { z } from 'astro/zod';
import { ApiError, badParameter, noSuch } from './api-error.ts';
import type { Cause, EventLog } from './event-log.ts';
import { newId } from './ids.ts';
import { newRefund, newTransaction } from './payment-objects.ts';
import { expandable, metadata, neverTrue, text, whole } from './parameters.ts';
import type { ChargeRecord, PaymentState, RefundRecord } from './payment-state.ts';
import type { ServiceClock } from './service-clock.ts';

export const createRefundParameters = z
  .object({
    ...expandable,
    payment_intent: text(255).optional(),
    charge: text(255).optional(),
    amount: whole(1, 99_999_999).optional(),
    reason: z.enum(['duplicate', 'fraudulent', 'requested_by_customer']).optional(),
    metadata: metadata.optional(),
    // Charges here are not shared with anybody, so there is nothing to take back from others.
    reverse_transfer: neverTrue.optional(),
    refund_application_fee: neverTrue.optional(),
  })
  .strict();

type RefundAsked = z.output<typeof createRefundParameters>;

/** Gives money back. */
export class RefundDesk {
  readonly #state: PaymentState;
  readonly #clock: ServiceClock;
  readonly #log: EventLog;
  readonly #settleSeconds: number;

  constructor(state: PaymentState, clock: ServiceClock, log: EventLog, settleSeconds: number) {
    this.#state = state;
    this.#clock = clock;
    this.#log = log;
    this.#settleSeconds = settleSeconds;
  }

  create(asked: RefundAsked, cause: Cause): RefundRecord {
    const kept = this.#chargeFor(asked);
    const { charge } = kept;
    const left = charge.amount_captured - charge.amount_refunded;
    if (left <= 0) throw new ApiError(400, `Charge ${charge.id} has already been refunded.`, { code: 'charge_already_refunded' });
    const amount = asked.amount ?? left;
    if (amount > left) {
      throw new ApiError(400, `Refund amount (${amount}) is greater than unrefunded amount on charge (${left})`, { param: 'amount', code: 'amount_too_large' });
    }
    const id = newId(charge.id.startsWith('py_') ? 'pyr' : 're');
    const later = kept.refunds === 'later';
    const refund = newRefund({
      id,
      created: this.#clock.now(),
      amount,
      charge,
      reason: asked.reason ?? null,
      metadata: asked.metadata ?? {},
      status: later ? 'pending' : 'succeeded',
      transactionId: this.#book(id, -amount, charge, charge.id.startsWith('py_') ? 'payment_refund' : 'refund'),
    });
    const settling = kept.refunds === 'at-once' ? null : { at: this.#clock.now() + this.#settleSeconds, paid: later };
    const record = this.#state.refunds.put({ id, refund, settling });
    const given = this.#giveBack(kept, amount);
    this.#log.happened({ type: 'refund.created', object: refund }, cause);
    this.#log.happened({ type: 'charge.refunded', object: given }, cause);
    return record;
  }

  settleDue(): void {
    for (const record of this.#state.refunds.oldestFirst()) {
      if (record.settling !== null && record.settling.at <= this.#clock.now()) this.settle(record, record.settling.paid);
    }
  }

  /** Ends a refund that was on its way. A failed one puts the money back with the shop. */
  settle(record: RefundRecord, paid: boolean): void {
    const { refund } = record;
    const { pending_reason: _waited, ...over } = refund;
    if (paid) {
      const done = this.#state.refunds.put({ ...record, settling: null, refund: { ...over, status: 'succeeded' } });
      this.#log.happened({ type: 'refund.updated', object: done.refund });
      this.#log.happened({ type: 'charge.refund.updated', object: done.refund });
      return;
    }
    const kept = typeof refund.charge === 'string' ? this.#state.charges.get(refund.charge) : undefined;
    if (!kept) throw new TypeError(`The charge of ${record.id} is gone`);
    const back = this.#book(refund.id, refund.amount, kept.charge, 'refund_failure');
    this.#giveBack(kept, -refund.amount);
    const failed = this.#state.refunds.put({
      ...record,
      settling: null,
      refund: { ...over, status: 'failed', failure_reason: 'expired_or_canceled_card', failure_balance_transaction: back },
    });
    this.#log.happened({ type: 'refund.updated', object: failed.refund });
    this.#log.happened({ type: 'charge.refund.updated', object: failed.refund });
    this.#log.happened({ type: 'refund.failed', object: failed.refund });
  }

  #chargeFor(asked: RefundAsked): ChargeRecord {
    const { charge: chargeId, payment_intent: intentId } = asked;
    if (chargeId !== undefined && intentId !== undefined) throw badParameter('charge', 'Only one of these parameters can be provided: charge, payment_intent.');
    if (chargeId !== undefined) {
      const charge = this.#state.charges.get(chargeId);
      if (!charge) throw noSuch('charge', chargeId, 'charge');
      return refundable(charge);
    }
    if (intentId === undefined) throw badParameter('payment_intent', 'One of the following params should be provided for this request: payment_intent or charge.', 'parameter_missing');
    const intent = this.#state.intents.get(intentId);
    if (!intent) throw noSuch('payment_intent', intentId, 'payment_intent');
    const charge = typeof intent.latest_charge === 'string' ? this.#state.charges.get(intent.latest_charge) : undefined;
    if (!charge) throw new ApiError(400, `This PaymentIntent (${intentId}) does not have a successful charge to refund.`, { code: 'payment_intent_unexpected_state' });
    return refundable(charge);
  }

  #giveBack(kept: ChargeRecord, amount: number): Stripe.Charge {
    const given = kept.charge.amount_refunded + amount;
    const charge = { ...kept.charge, amount_refunded: given, refunded: given === kept.charge.amount };
    return this.#state.charges.put({ ...kept, charge }).charge;
  }

  #book(source: string, amount: number, charge: Stripe.Charge, type: 'refund' | 'payment_refund' | 'refund_failure'): string {
    const id = newId('txn');
    this.#state.transactions.put(newTransaction({ id, created: this.#clock.now(), amount, fee: 0, currency: charge.currency, source, type }));
    return id;
  }
}

function refundable(kept: ChargeRecord): ChargeRecord {
  if (kept.charge.status === 'succeeded') return kept;
  const code = kept.charge.status === 'failed' ? 'charge_not_refundable' : 'pending_charge_not_refundable';
  throw new ApiError(400, `Charge ${kept.charge.id} cannot be refunded: it is ${kept.charge.status}.`, { code });
}
