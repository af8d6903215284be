import type Stripe from 'stripe';
import type { CheckoutDesk } from './checkout-desk.ts';
import type { EventLog } from './event-log.ts';
import { newId } from './ids.ts';
import { newCharge, newTransaction, serviceFee, type PaidWith } from './payment-objects.ts';
import type { Buyer, CheckoutRecord, PaymentState } from './payment-state.ts';
import type { ServiceClock } from './service-clock.ts';
import { customerDetails } from './session-object.ts';
import { cardFor, type CardOutcome } from './test-cards.ts';

export interface CardPayment {
  readonly buyer: Buyer;
  /** Digits only. */
  readonly number: string;
  readonly expMonth: number;
  readonly expYear: number;
}

export interface AccountPayment {
  readonly buyer: Buyer;
  readonly iban: string;
  /** How the bank decides in the end. */
  readonly paid: boolean;
}

export type PayResult = { readonly kind: 'done' } | { readonly kind: 'bank-asks' } | { readonly kind: 'refused'; readonly code: string; readonly message: string };

type Refusal = Extract<CardOutcome, { kind: 'declined' }>;

/** What a buyer does on the pay page, and what the banks do in turn. */
export class BuyerDesk {
  readonly #state: PaymentState;
  readonly #clock: ServiceClock;
  readonly #log: EventLog;
  readonly #checkouts: CheckoutDesk;
  readonly #settleSeconds: number;

  /** @param settleSeconds how long a slow way of paying takes. */
  constructor(state: PaymentState, clock: ServiceClock, log: EventLog, checkouts: CheckoutDesk, settleSeconds: number) {
    this.#state = state;
    this.#clock = clock;
    this.#log = log;
    this.#checkouts = checkouts;
    this.#settleSeconds = settleSeconds;
  }

  payByCard(open: CheckoutRecord, payment: CardPayment): PayResult {
    const card = cardFor(payment.number);
    const paidWith: PaidWith = {
      kind: 'card',
      brand: card.brand,
      last4: payment.number.slice(-4),
      expMonth: payment.expMonth,
      expYear: payment.expYear,
      asked: false,
    };
    if (!card.challenge) return this.#decide(open, payment.buyer, paidWith, card.outcome);
    const { record, intent } = this.#checkouts.intentOf(open);
    const waiting = this.#state.intents.put({
      ...intent,
      status: 'requires_action',
      payment_method: newId('pm'),
      next_action: { type: 'use_stripe_sdk', use_stripe_sdk: {} },
    });
    this.#state.checkouts.put({ ...record, challenge: { last4: paidWith.last4, brand: paidWith.brand, then: card.outcome, buyer: payment.buyer } });
    this.#log.happened({ type: 'payment_intent.requires_action', object: waiting });
    return { kind: 'bank-asks' };
  }

  /** The buyer's answer to the bank's question. */
  answerBank(open: CheckoutRecord, yes: boolean): PayResult {
    const { challenge } = open;
    if (!challenge) return { kind: 'refused', code: 'payment_intent_unexpected_state', message: 'The bank has not asked anything.' };
    const record = this.#state.checkouts.put({ ...open, challenge: null });
    const year = new Date(this.#clock.nowMs()).getUTCFullYear() + 3;
    const paidWith: PaidWith = { kind: 'card', brand: challenge.brand, last4: challenge.last4, expMonth: 12, expYear: year, asked: true };
    if (yes) return this.#decide(record, challenge.buyer, paidWith, challenge.then);
    const message = 'We are unable to authenticate your payment method. Please choose a different payment method and try again.';
    return this.#refuseIntent(record, { kind: 'declined', code: 'payment_intent_authentication_failure', declineCode: null, message }, null);
  }

  /** A bank debit: the checkout is complete, the money comes or does not come later. */
  payByAccount(open: CheckoutRecord, payment: AccountPayment): PayResult {
    const { record, intent } = this.#checkouts.intentOf(open);
    const paidWith: PaidWith = { kind: 'account', last4: payment.iban.slice(-4), country: payment.iban.slice(0, 2) };
    const charge = this.#charge(intent, payment.buyer, paidWith, 'pending', null);
    const processing = this.#state.intents.put({ ...intent, status: 'processing', payment_method: charge.payment_method, latest_charge: charge.id, last_payment_error: null });
    this.#log.happened({ type: 'charge.pending', object: charge });
    this.#log.happened({ type: 'payment_intent.processing', object: processing });
    this.#complete(record, payment.buyer, 'unpaid', { at: this.#clock.now() + this.#settleSeconds, paid: payment.paid });
    return { kind: 'done' };
  }

  /** A checkout that costs nothing. */
  takeForNothing(open: CheckoutRecord, buyer: Buyer): PayResult {
    this.#complete(open, buyer, 'no_payment_required', null);
    return { kind: 'done' };
  }

  /** Ends the slow payments whose time has come. */
  settleDue(): void {
    for (const record of this.#state.checkouts.oldestFirst()) {
      if (record.settling !== null && record.settling.at <= this.#clock.now()) this.settle(record, record.settling.paid);
    }
  }

  settle(record: CheckoutRecord, paid: boolean): void {
    const { session } = record;
    const intent = typeof session.payment_intent === 'string' ? this.#state.intents.get(session.payment_intent) : undefined;
    const kept = typeof intent?.latest_charge === 'string' ? this.#state.charges.get(intent.latest_charge) : undefined;
    if (!intent || !kept) throw new TypeError(`Nothing is on its way for ${record.id}`);
    const { charge } = kept;
    if (paid) {
      const transaction = this.#bookIn(charge.id, charge.amount, charge.currency, 'payment');
      const done = this.#state.charges.put({ ...kept, charge: { ...charge, status: 'succeeded', paid: true, balance_transaction: transaction } });
      const succeeded = this.#state.intents.put({ ...intent, status: 'succeeded', amount_received: intent.amount });
      this.#log.happened({ type: 'charge.succeeded', object: done.charge });
      this.#log.happened({ type: 'payment_intent.succeeded', object: succeeded });
    } else {
      const message = 'The customer has notified their bank that this payment was unauthorized.';
      const failed = this.#state.charges.put({ ...kept, charge: { ...charge, status: 'failed', captured: false, amount_captured: 0, failure_code: 'generic_decline', failure_message: message } });
      const refused = this.#state.intents.put({ ...intent, status: 'requires_payment_method', last_payment_error: { type: 'card_error', code: 'generic_decline', message, charge: charge.id } });
      this.#log.happened({ type: 'charge.failed', object: failed.charge });
      this.#log.happened({ type: 'payment_intent.payment_failed', object: refused });
    }
    const settled = this.#state.checkouts.put({ ...record, settling: null, session: paid ? { ...session, payment_status: 'paid' } : session });
    this.#log.happened({ type: paid ? 'checkout.session.async_payment_succeeded' : 'checkout.session.async_payment_failed', object: settled.session });
  }

  #decide(open: CheckoutRecord, buyer: Buyer, paidWith: PaidWith, outcome: CardOutcome): PayResult {
    const { record, intent } = this.#checkouts.intentOf(open);
    if (outcome.kind === 'declined') {
      const failed = this.#charge(intent, buyer, paidWith, 'failed', outcome);
      this.#log.happened({ type: 'charge.failed', object: failed });
      return this.#refuseIntent(record, outcome, failed);
    }
    const charge = this.#charge(intent, buyer, paidWith, 'succeeded', null, outcome.refunds);
    const succeeded = this.#state.intents.put({
      ...intent,
      status: 'succeeded',
      amount_received: intent.amount,
      payment_method: charge.payment_method,
      latest_charge: charge.id,
      last_payment_error: null,
      next_action: null,
    });
    this.#log.happened({ type: 'charge.succeeded', object: charge });
    this.#log.happened({ type: 'payment_intent.succeeded', object: succeeded });
    this.#complete(record, buyer, 'paid', null);
    return { kind: 'done' };
  }

  #refuseIntent(record: CheckoutRecord, refusal: Refusal, charge: Stripe.Charge | null): PayResult {
    const { intent } = this.#checkouts.intentOf(record);
    const refused = this.#state.intents.put({
      ...intent,
      status: 'requires_payment_method',
      payment_method: null,
      next_action: null,
      ...(charge === null ? {} : { latest_charge: charge.id }),
      last_payment_error: {
        type: 'card_error',
        code: refusal.code,
        ...(refusal.declineCode === null ? {} : { decline_code: refusal.declineCode }),
        ...(charge === null ? {} : { charge: charge.id }),
        message: refusal.message,
      },
    });
    this.#log.happened({ type: 'payment_intent.payment_failed', object: refused });
    return { kind: 'refused', code: refusal.declineCode ?? refusal.code, message: refusal.message };
  }

  #charge(
    intent: Stripe.PaymentIntent,
    buyer: Buyer,
    paidWith: PaidWith,
    status: 'succeeded' | 'pending' | 'failed',
    refusal: Refusal | null,
    refunds?: 'later' | 'fail-later',
  ): Stripe.Charge {
    const id = newId(paidWith.kind === 'card' ? 'ch' : 'py');
    const transactionId = status === 'succeeded' ? this.#bookIn(id, intent.amount, intent.currency, 'charge') : null;
    const methodId = typeof intent.payment_method === 'string' ? intent.payment_method : (intent.payment_method?.id ?? newId('pm'));
    const receiptUrl = `https://receipts.example/${id}`;
    const charge = newCharge({ id, created: this.#clock.now(), intent, buyer, paidWith, methodId, status, refusal, transactionId, receiptUrl });
    this.#state.charges.put({ id, charge, refunds: paidWith.kind === 'account' ? 'later' : (refunds ?? 'at-once') });
    return charge;
  }

  #bookIn(source: string, amount: number, currency: string, type: 'charge' | 'payment'): string {
    const id = newId('txn');
    this.#state.transactions.put(newTransaction({ id, created: this.#clock.now(), amount, fee: serviceFee(amount), currency, source, type }));
    return id;
  }

  #complete(record: CheckoutRecord, buyer: Buyer, payment: 'paid' | 'unpaid' | 'no_payment_required', settling: CheckoutRecord['settling']): void {
    const complete = this.#state.checkouts.put({
      ...record,
      challenge: null,
      settling,
      session: { ...record.session, status: 'complete', payment_status: payment, url: null, customer_details: customerDetails(buyer) },
    });
    this.#log.happened({ type: 'checkout.session.completed', object: complete.session });
  }
}
