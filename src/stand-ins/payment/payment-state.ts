import type Stripe from 'stripe';
import { Journal, type JournalLine } from '#stand-ins/journal.ts';
import type { CardOutcome } from './test-cards.ts';

/** A checkout with what the service knows of it but does not show. */
export interface CheckoutRecord {
  readonly id: string;
  readonly session: Stripe.Checkout.Session;
  readonly lineItems: Stripe.LineItem[];
  readonly intentMetadata: Stripe.Metadata;
  readonly description: string | null;
  readonly statementSuffix: string | null;
  /** A card whose bank wants to be asked first, and what comes after a yes. */
  readonly challenge: { readonly last4: string; readonly brand: string; readonly then: CardOutcome; readonly buyer: Buyer } | null;
  /** A slow way of paying: when it ends, and how. */
  readonly settling: { readonly at: number; readonly paid: boolean } | null;
}

export interface Buyer {
  readonly name: string;
  readonly email: string;
  readonly country: string;
}

export interface RefundRecord {
  readonly id: string;
  readonly refund: Stripe.Refund;
  /** A refund that is not over yet: when it ends, and how. */
  readonly settling: { readonly at: number; readonly paid: boolean } | null;
}

export interface ChargeRecord {
  readonly id: string;
  readonly charge: Stripe.Charge;
  /** How the card behaves when money is given back. */
  readonly refunds: 'at-once' | 'later' | 'fail-later';
}

/** An event as it is sent: fixed when it happens. */
export interface EventRecord extends Omit<Stripe.EventBase, 'data'> {
  readonly data: { readonly object: unknown; readonly previous_attributes?: unknown };
}

export interface Delivery {
  readonly id: string;
  readonly eventId: string;
  /** Tries made so far. */
  readonly tries: number;
  readonly dueAtMs: number;
  readonly state: 'waiting' | 'delivered' | 'given-up';
}

/** An answer kept under an idempotency key. */
export interface SavedAnswer {
  readonly id: string;
  readonly fingerprint: string;
  readonly status: number;
  readonly body: string;
  readonly requestId: string;
  readonly createdAt: number;
}

/** Things of one kind by their ids, in the order they came; every change goes to the journal. */
export class Shelf<T extends { readonly id: string }> {
  readonly #things = new Map<string, T>();
  readonly #kind: string;
  readonly #journal: Journal;

  constructor(kind: string, journal: Journal, kept: readonly JournalLine[]) {
    this.#kind = kind;
    this.#journal = journal;
    for (const line of kept) {
      // This class wrote the line from a T; nobody else writes the journal.
      if (line.kind === kind) this.#things.set(line.id, line.value as T);
    }
  }

  get(id: string): T | undefined {
    return this.#things.get(id);
  }

  put(thing: T): T {
    this.#things.set(thing.id, thing);
    this.#journal.append({ kind: this.#kind, id: thing.id, value: thing });
    return thing;
  }

  remove(id: string): void {
    if (this.#things.delete(id)) this.#journal.append({ kind: this.#kind, id, value: null });
  }

  oldestFirst(): T[] {
    return [...this.#things.values()];
  }

  newestFirst(): T[] {
    return this.oldestFirst().reverse();
  }
}

/** Everything the payment stand-in knows. */
export class PaymentState {
  readonly checkouts: Shelf<CheckoutRecord>;
  readonly intents: Shelf<Stripe.PaymentIntent>;
  readonly charges: Shelf<ChargeRecord>;
  readonly refunds: Shelf<RefundRecord>;
  readonly transactions: Shelf<Stripe.BalanceTransaction>;
  readonly events: Shelf<EventRecord>;
  readonly deliveries: Shelf<Delivery>;
  readonly answers: Shelf<SavedAnswer>;

  /** @param file where it is kept between starts; none for a state that forgets. */
  constructor(file: string | undefined) {
    const journal = new Journal(file);
    const kept = journal.read();
    journal.compact(kept);
    this.checkouts = new Shelf('checkout', journal, kept);
    this.intents = new Shelf('payment-intent', journal, kept);
    this.charges = new Shelf('charge', journal, kept);
    this.refunds = new Shelf('refund', journal, kept);
    this.transactions = new Shelf('balance-transaction', journal, kept);
    this.events = new Shelf('event', journal, kept);
    this.deliveries = new Shelf('delivery', journal, kept);
    this.answers = new Shelf('answer', journal, kept);
  }
}
