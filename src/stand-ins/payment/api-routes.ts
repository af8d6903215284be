import type Stripe from 'stripe';
import { z } from 'astro/zod';
import { CURRENCIES } from '#core/money/currency.ts';
import { noSuch } from './api-error.ts';
import type { CheckoutDesk } from './checkout-desk.ts';
import { createCheckoutParameters } from './checkout-parameters.ts';
import type { Cause } from './event-log.ts';
import { expanded, type ThingFinder } from './expansion.ts';
import type { FormGroup } from './form-body.ts';
import { listPage, within } from './list-page.ts';
import { expandable, momentRange, paging, readParameters, text } from './parameters.ts';
import type { EventRecord, PaymentState } from './payment-state.ts';
import { createRefundParameters, type RefundDesk } from './refund-desk.ts';

export interface ApiCall {
  readonly form: FormGroup;
  /** The parts of the path that name a thing. */
  readonly ids: readonly string[];
  readonly cause: Cause;
}

export interface ApiRoute {
  readonly method: 'GET' | 'POST';
  /** Its groups are the call's ids. */
  readonly path: RegExp;
  readonly answer: (call: ApiCall) => object;
}

const retrieveParameters = z.object(expandable).strict();
const listParameters = z.object({ ...paging, created: momentRange.optional() }).strict();

export interface Desks {
  readonly state: PaymentState;
  readonly checkouts: CheckoutDesk;
  readonly refunds: RefundDesk;
}

/** Every address of the interface that the stand-in answers. */
export function apiRoutes({ state, checkouts, refunds }: Desks): ApiRoute[] {
  const finder = thingFinder(state);
  return [...checkoutRoutes(state, checkouts, finder), ...refundRoutes(state, refunds, finder), ...readingRoutes(state, finder), ...eventRoutes(state)];
}

function checkoutRoutes(state: PaymentState, desk: CheckoutDesk, finder: ThingFinder): ApiRoute[] {
  const find = (id: string) => mustFind(state.checkouts.get(id), 'checkout.session', id);
  const listSessions = listParameters.extend({ payment_intent: text(255).optional(), status: z.enum(['complete', 'expired', 'open']).optional() });
  return [
    {
      method: 'POST',
      path: /^\/v1\/checkout\/sessions$/,
      answer: ({ form }) => {
        const asked = readParameters(form, createCheckoutParameters);
        return expanded(desk.create(asked).session, asked.expand, finder);
      },
    },
    {
      method: 'GET',
      path: /^\/v1\/checkout\/sessions$/,
      answer: ({ form }) => {
        const asked = readParameters(form, listSessions);
        const all = state.checkouts
          .newestFirst()
          .map((record) => record.session)
          .filter((session) => within(session.created, asked.created) && matches(session.payment_intent, asked.payment_intent) && matches(session.status, asked.status));
        return expanded(listPage(all, '/v1/checkout/sessions', asked), asked.expand, finder);
      },
    },
    {
      method: 'GET',
      path: /^\/v1\/checkout\/sessions\/([^/]+)$/,
      answer: ({ form, ids: [id = ''] }) => expanded(find(id).session, readParameters(form, retrieveParameters).expand, finder),
    },
    {
      method: 'GET',
      path: /^\/v1\/checkout\/sessions\/([^/]+)\/line_items$/,
      answer: ({ form, ids: [id = ''] }) => {
        const asked = readParameters(form, z.object(paging).strict());
        return listPage(find(id).lineItems, `/v1/checkout/sessions/${id}/line_items`, asked);
      },
    },
    {
      method: 'POST',
      path: /^\/v1\/checkout\/sessions\/([^/]+)\/expire$/,
      answer: ({ form, ids: [id = ''], cause }) => {
        const asked = readParameters(form, retrieveParameters);
        return expanded(desk.expire(find(id), cause).session, asked.expand, finder);
      },
    },
  ];
}

function refundRoutes(state: PaymentState, desk: RefundDesk, finder: ThingFinder): ApiRoute[] {
  const listRefunds = listParameters.extend({ charge: text(255).optional(), payment_intent: text(255).optional() });
  return [
    {
      method: 'POST',
      path: /^\/v1\/refunds$/,
      answer: ({ form, cause }) => {
        const asked = readParameters(form, createRefundParameters);
        return expanded(desk.create(asked, cause).refund, asked.expand, finder);
      },
    },
    {
      method: 'GET',
      path: /^\/v1\/refunds$/,
      answer: ({ form }) => {
        const asked = readParameters(form, listRefunds);
        const all = state.refunds
          .newestFirst()
          .map((record) => record.refund)
          .filter((refund) => within(refund.created, asked.created) && matches(refund.charge, asked.charge) && matches(refund.payment_intent, asked.payment_intent));
        return expanded(listPage(all, '/v1/refunds', asked), asked.expand, finder);
      },
    },
    {
      method: 'GET',
      path: /^\/v1\/refunds\/([^/]+)$/,
      answer: ({ form, ids: [id = ''] }) => expanded(mustFind(state.refunds.get(id), 'refund', id).refund, readParameters(form, retrieveParameters).expand, finder),
    },
  ];
}

function readingRoutes(state: PaymentState, finder: ThingFinder): ApiRoute[] {
  const listCharges = listParameters.extend({ payment_intent: text(255).optional() });
  const listTransactions = listParameters.extend({ source: text(255).optional(), type: text(100).optional(), currency: text(3).optional() });
  const retrieve = (what: string, get: (id: string) => object | undefined) => (call: ApiCall) => {
    const [id = ''] = call.ids;
    return expanded(mustFind(get(id), what, id), readParameters(call.form, retrieveParameters).expand, finder);
  };
  return [
    {
      method: 'GET',
      path: /^\/v1\/payment_intents$/,
      answer: ({ form }) => {
        const asked = readParameters(form, listParameters);
        const all = state.intents.newestFirst().filter((intent) => within(intent.created, asked.created));
        return expanded(listPage(all, '/v1/payment_intents', asked), asked.expand, finder);
      },
    },
    { method: 'GET', path: /^\/v1\/payment_intents\/([^/]+)$/, answer: retrieve('payment_intent', (id) => state.intents.get(id)) },
    {
      method: 'GET',
      path: /^\/v1\/charges$/,
      answer: ({ form }) => {
        const asked = readParameters(form, listCharges);
        const all = state.charges
          .newestFirst()
          .map((record) => record.charge)
          .filter((charge) => within(charge.created, asked.created) && matches(charge.payment_intent, asked.payment_intent));
        return expanded(listPage(all, '/v1/charges', asked), asked.expand, finder);
      },
    },
    { method: 'GET', path: /^\/v1\/charges\/([^/]+)$/, answer: retrieve('charge', (id) => state.charges.get(id)?.charge) },
    {
      method: 'GET',
      path: /^\/v1\/balance_transactions$/,
      answer: ({ form }) => {
        const asked = readParameters(form, listTransactions);
        const all = state.transactions
          .newestFirst()
          .filter((one) => within(one.created, asked.created) && matches(one.source, asked.source) && matches(one.type, asked.type) && matches(one.currency, asked.currency));
        return expanded(listPage(all, '/v1/balance_transactions', asked), asked.expand, finder);
      },
    },
    { method: 'GET', path: /^\/v1\/balance_transactions\/([^/]+)$/, answer: retrieve('balance_transaction', (id) => state.transactions.get(id)) },
    { method: 'GET', path: /^\/v1\/balance$/, answer: () => balanceOf(state) },
    { method: 'GET', path: /^\/v1\/account$/, answer: () => ACCOUNT },
  ];
}

function eventRoutes(state: PaymentState): ApiRoute[] {
  const listEvents = listParameters.extend({
    type: text(100).optional(),
    types: z.array(text(100)).max(20).optional(),
    delivery_success: z.enum(['true', 'false']).optional(),
  });
  const shown = (event: EventRecord): EventRecord => ({ ...event, pending_webhooks: deliveriesOf(state, event.id).filter(({ state: stage }) => stage === 'waiting').length });
  return [
    {
      method: 'GET',
      path: /^\/v1\/events$/,
      answer: ({ form }) => {
        const asked = readParameters(form, listEvents);
        const types = asked.types ?? (asked.type === undefined ? undefined : [asked.type]);
        const all = state.events
          .newestFirst()
          .filter((event) => within(event.created, asked.created) && (types === undefined || types.some((type) => isOfType(event.type, type))))
          .filter((event) => asked.delivery_success === undefined || isDelivered(state, event.id) === (asked.delivery_success === 'true'));
        const page = listPage(all, '/v1/events', asked);
        return { ...page, data: page.data.map(shown) };
      },
    },
    {
      method: 'GET',
      path: /^\/v1\/events\/([^/]+)$/,
      answer: ({ form, ids: [id = ''] }) => {
        readParameters(form, retrieveParameters);
        return shown(mustFind(state.events.get(id), 'event', id));
      },
    },
  ];
}

const ACCOUNT = {
  id: 'acct_standin',
  object: 'account',
  charges_enabled: true,
  country: 'DE',
  default_currency: 'eur',
  details_submitted: true,
  email: null,
  metadata: {},
  payouts_enabled: true,
  type: 'standard',
} satisfies Stripe.Account;

function balanceOf(state: PaymentState): Stripe.Balance {
  const pending = CURRENCIES.map((currency) => currency.toLowerCase()).flatMap((currency) => {
    const lines = state.transactions.oldestFirst().filter((line) => line.currency === currency);
    return lines.length === 0 ? [] : [{ currency, amount: lines.reduce((sum, line) => sum + line.net, 0) }];
  });
  return { object: 'balance', available: pending.map(({ currency }) => ({ currency, amount: 0 })), livemode: false, pending };
}

function thingFinder(state: PaymentState): ThingFinder {
  return {
    byId(id) {
      return (
        state.checkouts.get(id)?.session ?? state.intents.get(id) ?? state.charges.get(id)?.charge ?? state.refunds.get(id)?.refund ?? state.transactions.get(id)
      );
    },
    listOf(kind, id, field) {
      if (kind === 'checkout.session' && field === 'line_items') {
        return listPage(state.checkouts.get(id)?.lineItems ?? [], `/v1/checkout/sessions/${id}/line_items`, { limit: 100 });
      }
      if (kind === 'charge' && field === 'refunds') {
        const all = state.refunds.newestFirst().map((record) => record.refund);
        return listPage(all.filter((refund) => refund.charge === id), `/v1/charges/${id}/refunds`, {});
      }
      return undefined;
    },
  };
}

function mustFind<T>(thing: T | undefined, what: string, id: string): T {
  if (thing === undefined) throw noSuch(what, id);
  return thing;
}

function matches(value: unknown, asked: string | undefined): boolean {
  return asked === undefined || value === asked;
}

/** `refund.*` stands for every type that begins so. */
function isOfType(type: string, asked: string): boolean {
  return asked.endsWith('*') ? type.startsWith(asked.slice(0, -1)) : type === asked;
}

function deliveriesOf(state: PaymentState, eventId: string) {
  return state.deliveries.oldestFirst().filter((delivery) => delivery.eventId === eventId);
}

function isDelivered(state: PaymentState, eventId: string): boolean {
  return deliveriesOf(state, eventId).every((delivery) => delivery.state === 'delivered');
}
