import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import Stripe from 'stripe';
import { buyerDoes, CARD, library, startTrial, type Trial } from '../../support/stand-ins.ts';

let trial: Trial;
let stripe: Stripe;

beforeAll(async () => {
  trial = await startTrial({ settleSeconds: 3600 });
  stripe = trial.stripe;
});

afterAll(async () => {
  await trial.close();
});

const item = { quantity: 1, price_data: { currency: 'eur', unit_amount: 6800, product_data: { name: 'A seat' } } };
const plain: Stripe.Checkout.SessionCreateParams = { mode: 'payment', line_items: [item], success_url: 'http://127.0.0.1:4321/done', cancel_url: 'http://127.0.0.1:4321/back' };

/** What the library threw, in its words. */
async function refusal(call: Promise<unknown>): Promise<{ type: string; code: string | undefined; param: string | undefined; status: number | undefined; message: string }> {
  try {
    await call;
  } catch (error) {
    if (error instanceof Stripe.errors.StripeError) return { type: error.type, code: error.code, param: error.param, status: error.statusCode, message: error.message };
    throw error;
  }
  throw new Error('Nothing was refused');
}

/** A request that the library would not let through: the form as it goes over the line. */
async function raw(method: string, path: string, body = '', headers: Record<string, string> = {}): Promise<{ status: number; headers: Headers; text: string }> {
  const response = await fetch(`${trial.standIns.url}${path}`, {
    method,
    headers: { authorization: 'Bearer sk_test_trial', 'content-type': 'application/x-www-form-urlencoded', ...headers },
    ...(method === 'POST' ? { body } : {}),
  });
  return { status: response.status, headers: response.headers, text: await response.text() };
}

const PLAIN_FORM =
  'mode=payment&line_items[0][quantity]=1&line_items[0][price_data][currency]=eur&line_items[0][price_data][unit_amount]=6800&line_items[0][price_data][product_data][name]=A%20seat&success_url=http%3A%2F%2F127.0.0.1%2Fdone';

async function paidIntent(card = CARD.number): Promise<string> {
  const { id, url } = await stripe.checkout.sessions.create(plain);
  await buyerDoes(url ?? '', { ...CARD, number: card });
  const { payment_intent: intent } = await stripe.checkout.sessions.retrieve(id);
  return typeof intent === 'string' ? intent : '';
}

describe('who asks', () => {
  test('must have a key', async () => {
    expect((await raw('GET', '/v1/balance', '', { authorization: '' })).status).toBe(401);
    expect(await refusal(library(trial.standIns.url, 'sk_live_real').balance.retrieve())).toMatchObject({ type: 'StripeAuthenticationError', status: 401 });
  });

  test('may give it as a user name', async () => {
    const basic = `Basic ${Buffer.from('sk_test_trial:').toString('base64')}`;
    expect((await raw('GET', '/v1/account', '', { authorization: basic })).status).toBe(200);
  });

  test('may not speak for accounts nobody knows', async () => {
    expect(await refusal(stripe.balance.retrieve({}, { stripeAccount: 'acct_1' }))).toMatchObject({ type: 'StripePermissionError', status: 403, code: 'account_invalid' });
  });
});

describe('every kind of refusal reaches the library as its own error', () => {
  const cases = [
    [400, 'invalid_request_error', 'StripeInvalidRequestError'],
    [400, 'idempotency_error', 'StripeIdempotencyError'],
    [401, 'invalid_request_error', 'StripeAuthenticationError'],
    [402, 'card_error', 'StripeCardError'],
    [403, 'invalid_request_error', 'StripePermissionError'],
    [404, 'invalid_request_error', 'StripeInvalidRequestError'],
    [409, 'invalid_request_error', 'StripeAPIError'],
    [429, 'invalid_request_error', 'StripeRateLimitError'],
    [500, 'api_error', 'StripeAPIError'],
  ] as const;
  test.each(cases)('%d %s is %s', async (status, type, name) => {
    trial.standIns.apiFaults.set([{ kind: 'answer', path: '/v1/', times: 1, status, type, delayMs: 0 }]);
    expect(await refusal(stripe.balance.retrieve())).toMatchObject({ type: name, status });
  });

  test('a line that is cut is StripeConnectionError', async () => {
    trial.standIns.apiFaults.set([{ kind: 'hang-up-before', path: '/v1/', times: 2, status: 500, type: 'api_error', delayMs: 0 }]);
    expect((await refusal(stripe.balance.retrieve())).type).toBe('StripeConnectionError');
    trial.standIns.apiFaults.set([]);
  });
});

describe('a request that does not work', () => {
  test.each<[string, string, string, string | undefined]>([
    ['an unknown parameter', `${PLAIN_FORM}&colour=woad`, 'colour', 'parameter_unknown'],
    ['an unknown parameter inside another', `${PLAIN_FORM}&line_items[0][price_data][fringe]=1`, 'line_items[0][price_data][fringe]', 'parameter_unknown'],
    ['one the stand-in cannot honour', `${PLAIN_FORM}&automatic_tax[enabled]=true`, 'automatic_tax[enabled]', 'parameter_not_supported'],
    ['nothing where something must be', 'mode=payment&success_url=http%3A%2F%2F127.0.0.1', 'line_items', 'parameter_missing'],
    ['an empty text', `${PLAIN_FORM}&client_reference_id=`, 'client_reference_id', 'parameter_invalid_empty'],
    ['no whole number', PLAIN_FORM.replace('6800', '68.00'), 'line_items[0][price_data][unit_amount]', 'parameter_invalid_integer'],
    ['a negative amount', PLAIN_FORM.replace('6800', '-1'), 'line_items[0][price_data][unit_amount]', 'parameter_invalid_integer'],
    ['a currency in capitals', PLAIN_FORM.replace('eur', 'EUR'), 'line_items[0][price_data][currency]', 'currency_not_supported'],
    ['no address to come back to', PLAIN_FORM.replace('http%3A%2F%2F127.0.0.1%2Fdone', 'done'), 'success_url', 'url_invalid'],
    ['no mail address', `${PLAIN_FORM}&customer_email=amara`, 'customer_email', 'email_invalid'],
    ['a mode that is none', PLAIN_FORM.replace('mode=payment', 'mode=gift'), 'mode', 'parameter_invalid'],
    ['an end that is too near', `${PLAIN_FORM}&expires_at=${Math.floor(Date.now() / 1000) + 1700}`, 'expires_at', 'parameter_invalid'],
    ['an end that is too far', `${PLAIN_FORM}&expires_at=${Math.floor(Date.now() / 1000) + 90_000}`, 'expires_at', 'parameter_invalid'],
    ['a value that is also a group', `${PLAIN_FORM}&metadata=a&metadata[b]=c`, 'metadata[b]', 'parameter_invalid'],
    ['fifty-one notes', `${PLAIN_FORM}&${Array.from({ length: 51 }, (_, n) => `metadata[k${n}]=v`).join('&')}`, 'metadata', 'metadata_keys'],
    ['a note that is too long', `${PLAIN_FORM}&metadata[a]=${'x'.repeat(501)}`, 'metadata', 'metadata_value_length'],
    ['something shown whole that has no whole', `${PLAIN_FORM}&expand[0]=cancel_url`, 'expand', 'parameter_invalid'],
  ])('(%s) is refused and named', async (_what, form, param, code) => {
    const answer = await raw('POST', '/v1/checkout/sessions', form);
    expect(answer.status).toBe(400);
    expect(JSON.parse(answer.text)).toMatchObject({ error: { type: 'invalid_request_error', param, code, message: expect.stringMatching(/./) as string } });
  });

  test('(two currencies, too little to pay) is refused', async () => {
    const krona = { ...item, price_data: { ...item.price_data, currency: 'sek' } };
    expect(await refusal(stripe.checkout.sessions.create({ ...plain, line_items: [item, krona] }))).toMatchObject({ code: 'currency_mismatch' });
    const little = { ...item, price_data: { ...item.price_data, unit_amount: 49 } };
    expect(await refusal(stripe.checkout.sessions.create({ ...plain, line_items: [little] }))).toMatchObject({ code: 'amount_too_small' });
  });

  test('(for a thing that is not there, at an address that is none) is not found', async () => {
    expect(await refusal(stripe.checkout.sessions.retrieve('cs_test_none'))).toMatchObject({ type: 'StripeInvalidRequestError', status: 404, code: 'resource_missing', param: 'id' });
    expect((await raw('GET', '/v1/looms')).status).toBe(404);
    expect((await raw('GET', '/v1/refunds/%zz')).status).toBe(404);
  });
});

describe('what is sent', () => {
  test('is read in every writing the library has for it', async () => {
    const answer = await raw('POST', '/v1/checkout/sessions', `${PLAIN_FORM.replaceAll('[', '%5B').replaceAll(']', '%5D')}&expand[]=line_items&metadata[note]=a+b%26c&metadata[gone]=`);
    expect(JSON.parse(answer.text)).toMatchObject({ metadata: { note: 'a b&c' }, line_items: { object: 'list', data: [{ description: 'A seat' }] } });
  });

  test('comes back in the form the library’s types promise', async () => {
    const session = await stripe.checkout.sessions.create({ ...plain, client_reference_id: 'order', metadata: { order: 'x' } });
    expect(session).toMatchObject({ object: 'checkout.session', mode: 'payment', status: 'open', payment_status: 'unpaid', ui_mode: 'hosted_page', payment_intent: null });
    expect(session.id).toMatch(/^cs_test_[0-9A-Za-z]{58}$/);
    expect(session.lastResponse).toMatchObject({ statusCode: 200, apiVersion: Stripe.API_VERSION, requestId: expect.stringMatching(/^req_\w{14}$/) as string });
    expect(session.line_items).toBeUndefined();
  });

  test('is followed from thing to thing', async () => {
    const intent = await paidIntent();
    const [session] = (await stripe.checkout.sessions.list({ payment_intent: intent, expand: ['data.payment_intent.latest_charge.balance_transaction'] })).data;
    expect(session?.payment_intent).toMatchObject({
      object: 'payment_intent',
      latest_charge: { object: 'charge', paid: true, payment_method_details: { card: { brand: 'visa', last4: '4242' } }, balance_transaction: { amount: 6800, fee: 127, net: 6673 } },
    });
    const [byCharge] = (await stripe.balanceTransactions.list({ type: 'charge', limit: 1 })).data;
    expect(byCharge?.source).toMatch(/^ch_/);
    const balance = await stripe.balance.retrieve();
    expect(balance.pending.find(({ currency }) => currency === 'eur')?.amount).toBeGreaterThanOrEqual(6673);
  });
});

describe('a request under a key', () => {
  test('is carried out once, and answered the same to the octet', async () => {
    const headers = { 'idempotency-key': 'once' };
    const first = await raw('POST', '/v1/checkout/sessions', PLAIN_FORM, headers);
    const again = await raw('POST', '/v1/checkout/sessions', PLAIN_FORM.split('&').reverse().join('&'), headers);
    expect(again.text).toBe(first.text);
    expect(again.status).toBe(200);
    expect([first.headers.get('idempotent-replayed'), again.headers.get('idempotent-replayed')]).toEqual([null, 'true']);
    expect(again.headers.get('idempotency-key')).toBe('once');
    expect(again.headers.get('request-id')).toBe(first.headers.get('request-id'));
  });

  test('is refused with other words, or at another address', async () => {
    await stripe.checkout.sessions.create(plain, { idempotencyKey: 'words' });
    expect(await refusal(stripe.checkout.sessions.create({ ...plain, metadata: { a: 'b' } }, { idempotencyKey: 'words' }))).toMatchObject({ type: 'StripeIdempotencyError', status: 400 });
    expect(await refusal(stripe.refunds.create({ charge: 'ch_1' }, { idempotencyKey: 'words' }))).toMatchObject({ type: 'StripeIdempotencyError' });
  });

  test('that fails is answered with the same failure again', async () => {
    trial.standIns.apiFaults.set([{ kind: 'fail-after', path: '/v1/', times: 1, status: 500, type: 'api_error', delayMs: 0 }]);
    const first = await raw('POST', '/v1/checkout/sessions', PLAIN_FORM, { 'idempotency-key': 'fails' });
    const again = await raw('POST', '/v1/checkout/sessions', PLAIN_FORM, { 'idempotency-key': 'fails' });
    expect([first.status, again.status]).toEqual([500, 500]);
    expect(again.text).toBe(first.text);
  });

  test('that never began leaves the key unused', async () => {
    await raw('POST', '/v1/checkout/sessions', 'mode=payment', { 'idempotency-key': 'unused' });
    expect((await raw('POST', '/v1/checkout/sessions', PLAIN_FORM, { 'idempotency-key': 'unused' })).status).toBe(200);
  });

  test('is in conflict with itself while it is under way', async () => {
    trial.standIns.apiFaults.set([{ kind: 'slow', path: '/v1/', times: 1, status: 500, type: 'api_error', delayMs: 200 }]);
    const first = raw('POST', '/v1/checkout/sessions', PLAIN_FORM, { 'idempotency-key': 'slow' });
    await new Promise((resolve) => setTimeout(resolve, 60));
    const second = await raw('POST', '/v1/checkout/sessions', PLAIN_FORM, { 'idempotency-key': 'slow' });
    expect(second.status).toBe(409);
    expect(second.headers.get('stripe-should-retry')).toBe('true');
    expect(JSON.parse(second.text)).toMatchObject({ error: { code: 'idempotency_key_in_use', type: 'invalid_request_error' } });
    expect((await first).status).toBe(200);
  });

  test('of any length up to 255 signs', async () => {
    expect((await raw('POST', '/v1/checkout/sessions', PLAIN_FORM, { 'idempotency-key': 'k'.repeat(255) })).status).toBe(200);
    expect((await raw('POST', '/v1/checkout/sessions', PLAIN_FORM, { 'idempotency-key': 'k'.repeat(256) })).status).toBe(400);
  });

  test('is forgotten after a day', async () => {
    const own = await startTrial();
    const first = await own.stripe.checkout.sessions.create(plain, { idempotencyKey: 'day' });
    own.standIns.clock.advance(24 * 3600 - 60);
    expect((await own.stripe.checkout.sessions.create(plain, { idempotencyKey: 'day' })).id).toBe(first.id);
    own.standIns.clock.advance(120);
    expect((await own.stripe.checkout.sessions.create(plain, { idempotencyKey: 'day' })).id).not.toBe(first.id);
    await own.close();
  });
});

describe('a list', () => {
  test('is newest first, and turned page by page in both directions', async () => {
    const own = await startTrial();
    const made: string[] = [];
    for (let n = 0; n < 25; n += 1) made.unshift((await own.stripe.checkout.sessions.create(plain)).id);
    const first = await own.stripe.checkout.sessions.list();
    expect(first).toMatchObject({ object: 'list', url: '/v1/checkout/sessions', has_more: true });
    expect(first.data.map(({ id }) => id)).toEqual(made.slice(0, 10));
    const all = await own.stripe.checkout.sessions.list({ limit: 7 }).autoPagingToArray({ limit: 100 });
    expect(all.map(({ id }) => id)).toEqual(made);
    const newer = await own.stripe.checkout.sessions.list({ limit: 3, ending_before: made[10] ?? '' });
    expect(newer.data.map(({ id }) => id)).toEqual(made.slice(7, 10));
    const backwards = await own.stripe.checkout.sessions.list({ limit: 4, ending_before: made[24] ?? '' }).autoPagingToArray({ limit: 100 });
    expect(backwards.map(({ id }) => id)).toEqual(made.slice(0, 24).reverse());
    await own.close();
  });

  test('is narrowed by time and state, and refuses what it cannot do', async () => {
    const soon = Math.floor(Date.now() / 1000) + 3600;
    expect((await stripe.checkout.sessions.list({ created: { gte: soon } })).data).toEqual([]);
    for (const session of (await stripe.checkout.sessions.list({ status: 'open', limit: 100 })).data) expect(session.status).toBe('open');
    expect((await raw('GET', '/v1/checkout/sessions?limit=0')).status).toBe(400);
    expect((await raw('GET', '/v1/checkout/sessions?limit=101')).status).toBe(400);
    expect((await raw('GET', '/v1/checkout/sessions?starting_after=a&ending_before=b')).status).toBe(400);
    expect((await raw('GET', '/v1/checkout/sessions?starting_after=cs_test_none')).status).toBe(400);
  });

  test('of events can be narrowed by kind and by whether they arrived', async () => {
    await paidIntent();
    await trial.listener.until((all) => all.some(({ event }) => event.type === 'checkout.session.completed'));
    const completed = await stripe.events.list({ types: ['checkout.session.completed', 'checkout.session.expired'] });
    expect(new Set(completed.data.map(({ type }) => type))).toEqual(new Set(['checkout.session.completed']));
    expect((await stripe.events.list({ type: 'payment_intent.*' })).data.every(({ type }) => type.startsWith('payment_intent.'))).toBe(true);
    const one = await stripe.events.retrieve(completed.data[0]?.id ?? '');
    expect(one).toMatchObject({ object: 'event', api_version: Stripe.API_VERSION, livemode: false, data: { object: { object: 'checkout.session' } } });
  });
});

describe('money', () => {
  test('given back is seen on the charge and in the account', async () => {
    const intent = await paidIntent();
    const refund = await stripe.refunds.create({ payment_intent: intent, amount: 1000, metadata: { refund: 'a' }, expand: ['charge.refunds'] });
    expect(refund).toMatchObject({ amount: 1000, status: 'succeeded', charge: { amount_refunded: 1000, refunded: false, refunds: { data: [{ id: refund.id }] } } });
    await stripe.refunds.create({ payment_intent: intent });
    expect(await refusal(stripe.refunds.create({ payment_intent: intent }))).toMatchObject({ code: 'charge_already_refunded', status: 400 });
    expect((await stripe.refunds.list({ payment_intent: intent })).data.map(({ amount }) => amount)).toEqual([5800, 1000]);
    const lines = await stripe.balanceTransactions.list({ type: 'refund', limit: 2 });
    expect(lines.data.map(({ amount, fee }) => [amount, fee])).toEqual([
      [-5800, 0],
      [-1000, 0],
    ]);
  });

  test('cannot be given back in larger parts, from nowhere, or on behalf of others', async () => {
    const intent = await paidIntent();
    expect(await refusal(stripe.refunds.create({ payment_intent: intent, amount: 6801 }))).toMatchObject({ param: 'amount' });
    expect(await refusal(stripe.refunds.create({}))).toMatchObject({ code: 'parameter_missing' });
    expect(await refusal(stripe.refunds.create({ payment_intent: intent, reverse_transfer: true }))).toMatchObject({ code: 'parameter_not_supported' });
    expect(await refusal(stripe.refunds.create({ charge: 'ch_none' }))).toMatchObject({ code: 'resource_missing', param: 'charge' });
  });
});
