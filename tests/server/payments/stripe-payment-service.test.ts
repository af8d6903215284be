import { createHmac } from 'node:crypto';
import { afterEach, beforeEach, describe, expect, test } from 'vitest';
import { checkoutExpiry } from '#server/payments/payment-service.ts';
import { API_VERSION, StripePaymentService } from '#server/payments/stripe-payment-service.ts';
import Stripe from 'stripe';
import { SERVICE_VERSION } from '#stand-ins/payment/event-log.ts';
import { buyerDoes, CARD, checkoutRequest, startTrial, valueOf, WEBHOOK_SECRET, type Trial } from '../../support/stand-ins.ts';

let trial: Trial;

beforeEach(async () => {
  trial = await startTrial({ settleSeconds: 60 });
});

afterEach(async () => {
  await trial.close();
});

test('the version of the interface is one everywhere: pinned, the library’s, the stand-in’s', () => {
  expect(API_VERSION).toBe(Stripe.API_VERSION);
  expect(SERVICE_VERSION).toBe(API_VERSION);
});

describe('a checkout', () => {
  test('is opened with what the order says, and read back the same', async () => {
    const request = checkoutRequest({
      buyerAddress: 'amara@weavers.example',
      lines: [
        { name: 'Low Tide: a seat', description: 'Seven parts', amountMinor: 6800, quantity: 1 },
        { name: 'Kit', amountMinor: 2450, quantity: 2 },
      ],
    });
    const opened = valueOf(await trial.payments.createCheckout(request));
    expect(opened).toMatchObject({
      orderId: request.orderId,
      status: 'open',
      payment: 'unpaid',
      currency: 'EUR',
      subtotalMinor: 11_700,
      discountMinor: 0,
      taxMinor: 0,
      shippingMinor: 0,
      totalMinor: 11_700,
      live: false,
      paymentId: undefined,
      expiresAt: request.expiresAt,
    });
    expect(opened.url).toBe(`${trial.standIns.url}/pay/${opened.id}`);
    expect(valueOf(await trial.payments.readCheckout(opened.id))).toEqual(opened);
  });

  test('carries the order’s id on the payment too, and asks for the price in its own currency', async () => {
    const request = checkoutRequest();
    const { id, url = '' } = valueOf(await trial.payments.createCheckout(request));
    await buyerDoes(url, CARD);
    const session = await trial.stripe.checkout.sessions.retrieve(id, { expand: ['payment_intent', 'line_items'] });
    expect(session.metadata).toEqual({ order: request.orderId });
    expect(session.adaptive_pricing).toEqual({ enabled: false });
    expect(session.automatic_tax.enabled).toBe(false);
    expect(session.payment_intent).toMatchObject({ object: 'payment_intent', metadata: { order: request.orderId }, status: 'succeeded', amount_received: 6800 });
    expect(session.line_items?.data).toMatchObject([{ description: 'Low Tide: a seat', quantity: 1, price: { unit_amount: 6800, tax_behavior: 'inclusive' } }]);
  });

  test('is the same one when the request is repeated, even after it was paid', async () => {
    const request = checkoutRequest();
    const first = valueOf(await trial.payments.createCheckout(request));
    await buyerDoes(first.url ?? '', CARD);
    const again = valueOf(await trial.payments.createCheckout(request));
    expect(again.id).toBe(first.id);
    expect(trial.standIns.payments.checkouts.oldestFirst()).toHaveLength(1);
  });

  test('is refused when one attempt comes with two different requests', async () => {
    const request = checkoutRequest();
    await trial.payments.createCheckout(request);
    const other = await trial.payments.createCheckout({ ...request, expiresAt: new Date(request.expiresAt.getTime() + 1000) });
    expect(other).toMatchObject({ ok: false, failure: { kind: 'reused-id' } });
    expect(await trial.payments.createCheckout({ ...request, attempt: 2, expiresAt: new Date(request.expiresAt.getTime() + 1000) })).toMatchObject({ ok: true });
  });

  test('is found by its order when the answer to opening it was lost', async () => {
    const since = new Date(Date.now() - 60_000);
    const requests = [checkoutRequest(), checkoutRequest(), checkoutRequest()];
    for (const request of requests) await trial.payments.createCheckout(request);
    const found = valueOf(await trial.payments.findCheckout(requests[0]?.orderId ?? '', since));
    expect(found?.orderId).toBe(requests[0]?.orderId);
    expect(valueOf(await trial.payments.findCheckout('nobody', since))).toBeUndefined();
    expect(valueOf(await trial.payments.findCheckout(requests[0]?.orderId ?? '', new Date(Date.now() + 60_000)))).toBeUndefined();
  });

  test('can be closed while open, and not once it is paid or closed', async () => {
    const open = valueOf(await trial.payments.createCheckout(checkoutRequest()));
    expect(valueOf(await trial.payments.expireCheckout(open.id))).toMatchObject({ status: 'expired', url: undefined });
    expect(await trial.payments.expireCheckout(open.id)).toMatchObject({ ok: false, failure: { kind: 'not-possible' } });
    const paid = valueOf(await trial.payments.createCheckout(checkoutRequest()));
    await buyerDoes(paid.url ?? '', CARD);
    expect(await trial.payments.expireCheckout(paid.id)).toMatchObject({ ok: false, failure: { kind: 'not-possible' } });
    expect(valueOf(await trial.payments.readCheckout(paid.id))).toMatchObject({ status: 'complete', payment: 'paid' });
  });

  test('ends by itself at the time it was given', async () => {
    const open = valueOf(await trial.payments.createCheckout(checkoutRequest()));
    trial.standIns.clock.advance(36 * 60);
    expect(valueOf(await trial.payments.readCheckout(open.id)).status).toBe('expired');
    await trial.listener.until((all) => all.some(({ event }) => event.type === 'checkout.session.expired'));
  });

  test('begins with whole seconds, 35 minutes ahead', () => {
    expect(checkoutExpiry(new Date('2026-03-01T12:00:00.987Z'))).toEqual(new Date('2026-03-01T12:35:00.000Z'));
  });
});

describe('money given back', () => {
  async function paid(card = CARD.number) {
    const { id, url = '' } = valueOf(await trial.payments.createCheckout(checkoutRequest()));
    await buyerDoes(url, { ...CARD, number: card });
    return valueOf(await trial.payments.readCheckout(id)).paymentId ?? '';
  }

  test('is given once, however often it is asked for', async () => {
    const paymentId = await paid();
    const request = { refundId: 'refund1', paymentId };
    const first = valueOf(await trial.payments.refund(request));
    expect(first).toMatchObject({ refundId: 'refund1', status: 'succeeded', amountMinor: 6800, currency: 'EUR', paymentId });
    expect(valueOf(await trial.payments.refund(request))).toEqual(first);
    expect(valueOf(await trial.payments.readRefund(first.id))).toEqual(first);
  });

  test('is done when all of it was given back before, by whatever way', async () => {
    const paymentId = await paid();
    const before = await trial.stripe.refunds.create({ payment_intent: paymentId });
    expect(valueOf(await trial.payments.refund({ refundId: 'refund1', paymentId })).id).toBe(before.id);
  });

  test('can be a part, then the rest, and never more', async () => {
    const paymentId = await paid();
    expect(valueOf(await trial.payments.refund({ refundId: 'part', paymentId, amountMinor: 1800 })).amountMinor).toBe(1800);
    expect(await trial.payments.refund({ refundId: 'much', paymentId, amountMinor: 5001 })).toMatchObject({ ok: false, failure: { kind: 'not-possible' } });
    expect(valueOf(await trial.payments.refund({ refundId: 'rest', paymentId })).amountMinor).toBe(5000);
  });

  test('may arrive later, or come back', async () => {
    const slow = valueOf(await trial.payments.refund({ refundId: 'slow', paymentId: await paid('4000000000007726') }));
    const lost = valueOf(await trial.payments.refund({ refundId: 'lost', paymentId: await paid('4000000000005126') }));
    expect([slow.status, lost.status]).toEqual(['pending', 'succeeded']);
    trial.standIns.clock.advance(61);
    expect(valueOf(await trial.payments.readRefund(slow.id)).status).toBe('succeeded');
    expect(valueOf(await trial.payments.readRefund(lost.id))).toMatchObject({ status: 'failed', failureReason: 'expired_or_canceled_card' });
    await trial.listener.until((all) => all.some(({ event }) => event.type === 'refund.failed'));
  });

  test('is not given where nothing was paid', async () => {
    expect(await trial.payments.refund({ refundId: 'none', paymentId: 'pi_none' })).toMatchObject({ ok: false, failure: { kind: 'not-found' } });
  });
});

describe('when the service', () => {
  const setFaults = (...faults: Parameters<typeof trial.standIns.apiFaults.set>[0]) => {
    trial.standIns.apiFaults.set(faults);
  };
  const fault = { path: '/v1/', times: 1, status: 500, type: 'api_error', delayMs: 100 } as const;

  test.each([
    ['fails twice before doing anything', { ...fault, kind: 'answer', times: 2 }],
    ['is in conflict with itself', { ...fault, kind: 'answer', status: 409 }],
    ['asks for patience four times (429)', { ...fault, kind: 'answer', status: 429, times: 4 }],
    ['hangs up before doing anything', { ...fault, kind: 'hang-up-before' }],
    ['hangs up after having done it', { ...fault, kind: 'hang-up-after' }],
  ] as const)('%s, one checkout is opened all the same', async (_what, trouble) => {
    setFaults(trouble);
    expect(await trial.payments.createCheckout(checkoutRequest())).toMatchObject({ ok: true });
    expect(trial.standIns.payments.checkouts.oldestFirst()).toHaveLength(1);
  });

  test('does it but answers 500, the checkout is found all the same', async () => {
    setFaults({ ...fault, kind: 'fail-after' });
    const request = checkoutRequest();
    const opened = valueOf(await trial.payments.createCheckout(request));
    expect(opened).toMatchObject({ orderId: request.orderId, status: 'open', expiresAt: request.expiresAt });
    expect(valueOf(await trial.payments.createCheckout(request)).id).toBe(opened.id);
    expect(trial.standIns.payments.checkouts.oldestFirst()).toHaveLength(1);
  });

  test.each([
    ['keeps failing', { ...fault, kind: 'answer', times: 50 }, 'unreachable'],
    ['keeps asking for patience', { ...fault, kind: 'answer', status: 429, times: 50 }, 'unreachable'],
    ['knows nothing of it', { ...fault, kind: 'answer', status: 404, type: 'invalid_request_error', code: 'resource_missing' }, 'not-found'],
    ['does not know our key', { ...fault, kind: 'answer', status: 401, type: 'invalid_request_error' }, 'misconfigured'],
    ['forbids it', { ...fault, kind: 'answer', status: 403, type: 'invalid_request_error' }, 'misconfigured'],
    ['says a card was refused', { ...fault, kind: 'answer', status: 402, type: 'card_error', code: 'card_declined' }, 'not-possible'],
  ] as const)('%s, the answer says so', async (_what, trouble, kind) => {
    setFaults(trouble);
    expect(await trial.payments.readCheckout('cs_test_1')).toMatchObject({ ok: false, failure: { kind } });
  });

  test('is not there at all, it is unreachable', async () => {
    const nowhere = new StripePaymentService({ secretKey: 'sk_test_trial', webhookSecrets: [], url: 'http://127.0.0.1:1' });
    expect(await nowhere.readCheckout('cs_test_1')).toMatchObject({ ok: false, failure: { kind: 'unreachable' } });
  });
});

describe('news', () => {
  const now = new Date('2026-03-01T12:00:00Z');
  const seconds = now.getTime() / 1000;
  const body = JSON.stringify({
    id: 'evt_1',
    object: 'event',
    api_version: API_VERSION,
    created: seconds,
    livemode: false,
    type: 'checkout.session.completed',
    data: { object: { object: 'checkout.session', id: 'cs_test_1', client_reference_id: 'order-é', payment_intent: 'pi_1' } },
  });
  const proof = (secret: string, time = seconds, text = body) => createHmac('sha256', secret).update(`${time}.${text}`).digest('hex');
  const signed = (time = seconds, text = body) => `t=${time},v1=${proof(WEBHOOK_SECRET, time, text)}`;
  const service = new StripePaymentService({ secretKey: 'sk_test_trial', webhookSecrets: ['whsec_new', WEBHOOK_SECRET] });
  const verdict = (header: string | null, text = body) => {
    const outcome = service.verifyEvent(text, header, now);
    return outcome.ok ? 'believed' : outcome.reason;
  };

  test('is believed when it is signed, and says what it is about', () => {
    expect(service.verifyEvent(body, signed(), now)).toEqual({
      ok: true,
      secretIndex: 1,
      clockSkewSeconds: 0,
      event: {
        id: 'evt_1',
        type: 'checkout.session.completed',
        createdAt: now,
        live: false,
        foreignVersion: false,
        about: { kind: 'checkout.session', id: 'cs_test_1', paymentId: 'pi_1', orderId: 'order-é' },
      },
    });
  });

  test('is signed as the service’s library signs', () => {
    const header = Stripe.webhooks.generateTestHeaderString({ payload: body, secret: WEBHOOK_SECRET, timestamp: seconds });
    expect(verdict(header)).toBe('believed');
  });

  test.each([
    [-299, 'believed'],
    [-300, 'believed'],
    [-302, 'too-old'],
    [299, 'believed'],
    [300, 'believed'],
    [302, 'from-the-future'],
    [3600, 'from-the-future'],
  ])('%d seconds off is %s', (offset, expected) => {
    expect(verdict(signed(seconds + offset))).toBe(expected);
  });

  test.each([
    ['nothing', null, 'unsigned'],
    ['an empty header', '', 'unsigned'],
    ['no time', `v1=${'0'.repeat(64)}`, 'malformed-signature'],
    ['two times', `t=${seconds},${signed()}`, 'malformed-signature'],
    ['no proof', `t=${seconds}`, 'malformed-signature'],
    ['an older scheme only', `t=${seconds},v0=${proof(WEBHOOK_SECRET)}`, 'malformed-signature'],
    ['a short proof', `t=${seconds},v1=abcd`, 'malformed-signature'],
    ['somebody else’s secret', `t=${seconds},v1=${proof('whsec_other')}`, 'wrong-signature'],
    ['an empty secret', `t=${seconds},v1=${proof('')}`, 'wrong-signature'],
    ['another time than was signed', `t=${seconds + 1},v1=${proof(WEBHOOK_SECRET)}`, 'wrong-signature'],
  ])('signed with %s is not believed', (_what, header, reason) => {
    expect(verdict(header)).toBe(reason);
  });

  test('is believed while one secret takes the other’s place', () => {
    expect(verdict(`t=${seconds},v1=${proof('whsec_new')},v1=${proof('whsec_gone')}`)).toBe('believed');
    expect(verdict(`t=${seconds},v1=${proof('whsec_gone')},v1=${proof(WEBHOOK_SECRET)}`)).toBe('believed');
    expect(verdict(`t=${seconds},v1=${proof('whsec_gone')},v1=${proof('whsec_older')}`)).toBe('wrong-signature');
  });

  test.each([
    ['one space more', `${body} `],
    ['another order of keys', JSON.stringify(Object.fromEntries(Object.entries(JSON.parse(body) as object).reverse()))],
    ['another line end', body.replace('{', '{\r\n')],
    ['the same letter written otherwise', body.replace('é', '\\u00e9')],
  ])('changed by %s is not believed', (_what, changed) => {
    expect(verdict(signed(), changed)).toBe('wrong-signature');
  });

  test.each([['not json'], ['{}'], ['[]'], ['null'], [JSON.stringify({ object: 'event', id: 'evt_1' })], [body.replace('"evt_1"', '"1; drop"')]])(
    'that is signed but no event (%s) is unreadable',
    (text) => {
      expect(verdict(signed(seconds, text), text)).toBe('unreadable');
    },
  );

  test('of a kind nobody knows yet, or of another version, is believed and marked', () => {
    const strange = body.replace('checkout.session.completed', 'loom.dressed').replace(API_VERSION, '2019-01-01');
    expect(service.verifyEvent(strange, signed(seconds, strange), now)).toMatchObject({ ok: true, event: { type: 'loom.dressed', foreignVersion: true } });
  });
});
