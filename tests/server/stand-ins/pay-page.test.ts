import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import type Stripe from 'stripe';
import { TEST_CARDS } from '#stand-ins/payment/test-cards.ts';
import { buyerDoes, CARD, startTrial, type Trial } from '../../support/stand-ins.ts';

let trial: Trial;

beforeAll(async () => {
  trial = await startTrial({ settleSeconds: 3600 });
});

afterAll(async () => {
  await trial.close();
});

interface Opened {
  readonly id: string;
  readonly url: string;
}

async function open(change: Stripe.Checkout.SessionCreateParams = {}): Promise<Opened> {
  const session = await trial.stripe.checkout.sessions.create({
    mode: 'payment',
    line_items: [{ quantity: 2, price_data: { currency: 'eur', unit_amount: 6800, product_data: { name: 'A seat <b>& more</b>' } } }],
    success_url: 'http://127.0.0.1:4321/done?session={CHECKOUT_SESSION_ID}',
    cancel_url: 'http://127.0.0.1:4321/series/low-tide',
    customer_email: 'amara@weavers.example',
    ...change,
  });
  return { id: session.id, url: session.url ?? '' };
}

async function stateOf({ id }: Opened): Promise<{ status: string | null; payment: string; intent: Stripe.PaymentIntent | null }> {
  const session = await trial.stripe.checkout.sessions.retrieve(id, { expand: ['payment_intent'] });
  const intent = session.payment_intent;
  return { status: session.status, payment: session.payment_status, intent: typeof intent === 'string' ? null : intent };
}

/** Kinds of the events about this checkout and its payment, in the order they happened. */
async function eventsOf(checkout: Opened): Promise<string[]> {
  const { intent } = await stateOf(checkout);
  return trial.standIns.payments.events
    .oldestFirst()
    .filter(({ data }) => JSON.stringify(data).includes(checkout.id) || (intent !== null && JSON.stringify(data).includes(intent.id)))
    .map(({ type }) => type);
}

describe('the pay page', () => {
  test('shows what is bought, what it costs, and that nothing is taken', async () => {
    const { url } = await open();
    const response = await fetch(url);
    const text = await response.text();
    expect(text).toContain('Pay €136.00');
    expect(text).toContain('A seat &#60;b&#62;&#38; more&#60;/b&#62;');
    expect(text).toContain('Nothing is taken here.');
    expect(text).toContain('value="amara@weavers.example"');
    expect(response.headers.get('content-security-policy')).toContain("default-src 'none'");
    expect(response.headers.get('content-security-policy')).toContain('form-action \'self\' http://127.0.0.1:4321;');
    expect(text).not.toMatch(/<script|style=|onclick/);
  });

  test('leads to the shop’s address with the checkout’s id in it once a card is taken', async () => {
    const checkout = await open();
    const answer = await buyerDoes(checkout.url, CARD);
    expect(answer).toMatchObject({ status: 303, location: `http://127.0.0.1:4321/done?session=${checkout.id}` });
    expect(await stateOf(checkout)).toMatchObject({ status: 'complete', payment: 'paid', intent: { status: 'succeeded' } });
    expect(await eventsOf(checkout)).toEqual(['payment_intent.created', 'charge.succeeded', 'payment_intent.succeeded', 'checkout.session.completed']);
  });

  test('takes nothing a second time', async () => {
    const checkout = await open();
    await buyerDoes(checkout.url, CARD);
    expect((await buyerDoes(checkout.url, CARD)).text).toContain('Nothing is taken a second time');
    expect((await trial.stripe.charges.list({ payment_intent: (await stateOf(checkout)).intent?.id ?? '' })).data).toHaveLength(1);
  });

  test('leads back without paying when it is closed, and can be opened again', async () => {
    const checkout = await open();
    expect(await buyerDoes(checkout.url, { do: 'close' })).toMatchObject({ status: 303, location: 'http://127.0.0.1:4321/series/low-tide' });
    expect(await stateOf(checkout)).toMatchObject({ status: 'open', payment: 'unpaid', intent: null });
    expect((await buyerDoes(checkout.url, CARD)).status).toBe(303);
  });

  test('stays, with the bank’s words, when the bank says no; another card may be tried', async () => {
    const checkout = await open();
    expect((await buyerDoes(checkout.url, { ...CARD, do: 'decline' })).text).toContain('The bank said no');
    expect(await stateOf(checkout)).toMatchObject({ status: 'open', intent: { status: 'requires_payment_method', last_payment_error: { code: 'card_declined', decline_code: 'generic_decline' } } });
    expect((await buyerDoes(checkout.url, CARD)).status).toBe(303);
    expect(await eventsOf(checkout)).toEqual([
      'payment_intent.created',
      'charge.failed',
      'payment_intent.payment_failed',
      'charge.succeeded',
      'payment_intent.succeeded',
      'checkout.session.completed',
    ]);
  });

  test('fills in a test card and keeps what was typed', async () => {
    const { url } = await open();
    const { text } = await buyerDoes(url, { ...CARD, number: '', fill: '378282246310005', name: 'Amara "V" Voss' });
    expect(text).toContain('value="3782 8224 6310 005"');
    expect(text).toContain('value="1234"');
    expect(text).toContain('value="Amara &#34;V&#34; Voss"');
  });

  test('says for each field what is wrong, and keeps what was typed', async () => {
    const { url } = await open();
    const { text } = await buyerDoes(url, { ...CARD, email: 'amara', number: '4242 4242 4242 4241', expiry: '13/34', cvc: '12' });
    for (const sentence of ['This is not a mail address.', 'its last digit does not fit', 'Type month and year like 12/34.', 'The security code has three digits']) expect(text).toContain(sentence);
    expect(text).toContain('aria-invalid="true"');
    expect(text).toContain('value="4242 4242 4242 4241"');
    expect(text).toContain('<a href="#expiry">Type month and year like 12/34.</a>');
    expect(text.match(/autofocus/g)).toHaveLength(1);
    expect(text).toMatch(/<input id="email"[^>]* autofocus>/);
  });

  test.each([
    ['01/20', 'This month is over.'],
    ['0', 'Type month and year like 12/34.'],
    ['', 'The expiry is missing.'],
  ])('does not take %j as an expiry', async (expiry, sentence) => {
    const { url } = await open();
    expect((await buyerDoes(url, { ...CARD, expiry })).text).toContain(sentence);
  });

  test.each(['12/34', '1234', '12 / 2034', '12-34'])('takes %j as an expiry', async (expiry) => {
    const { url } = await open();
    expect((await buyerDoes(url, { ...CARD, expiry })).status).toBe(303);
  });

  test('ends with its checkout, and says so', async () => {
    const checkout = await open();
    await trial.stripe.checkout.sessions.expire(checkout.id);
    const { text } = await buyerDoes(checkout.url, CARD);
    expect(text).toContain('Nothing was taken.');
    expect(text).toContain('href="http://127.0.0.1:4321/series/low-tide"');
    expect(await eventsOf(checkout)).toEqual(['checkout.session.expired']);
  });

  test('is nowhere for a checkout nobody opened', async () => {
    const response = await fetch(`${trial.standIns.url}/pay/cs_test_none`);
    expect(response.status).toBe(404);
    expect(await response.text()).toContain('There is nothing to pay at this address.');
  });

  test('asks for nothing where there is nothing to pay', async () => {
    const checkout = await open({ line_items: [{ quantity: 1, price_data: { currency: 'eur', unit_amount: 0, product_data: { name: 'A gift' } } }] });
    expect((await fetch(checkout.url).then((response) => response.text()))).not.toContain('Card number');
    expect((await buyerDoes(checkout.url, { do: 'free', email: 'amara@weavers.example' })).status).toBe(303);
    expect(await stateOf(checkout)).toMatchObject({ status: 'complete', payment: 'no_payment_required', intent: null });
  });

  test('cannot be talked into giving a seat for nothing', async () => {
    const checkout = await open();
    await buyerDoes(checkout.url, { do: 'free', email: 'amara@weavers.example' });
    expect(await stateOf(checkout)).toMatchObject({ status: 'open', payment: 'unpaid' });
  });
});

describe('a test card', () => {
  const decided = TEST_CARDS.filter(({ challenge }) => !challenge);
  test.each(decided.map((card) => [card.number, card.what, card.outcome] as const))('%s: %s', async (number, _what, outcome) => {
    const checkout = await open();
    const answer = await buyerDoes(checkout.url, { ...CARD, number, cvc: number.startsWith('37') ? '1234' : '123' });
    const { status, intent } = await stateOf(checkout);
    if (outcome.kind === 'approved') {
      expect(answer.status).toBe(303);
      expect(status).toBe('complete');
    } else {
      expect(answer.text).toContain('Nothing was taken. Try another card.');
      expect(status).toBe('open');
      expect(intent?.last_payment_error).toMatchObject({ type: 'card_error', code: outcome.code });
    }
  });

  test.each(TEST_CARDS.filter(({ challenge }) => challenge).map((card) => [card.number, card.what, card.outcome] as const))('%s: %s', async (number, _what, outcome) => {
    const checkout = await open();
    expect(await buyerDoes(checkout.url, { ...CARD, number })).toMatchObject({ status: 303, location: `/pay/${checkout.id}/bank` });
    expect(await stateOf(checkout)).toMatchObject({ status: 'open', intent: { status: 'requires_action' } });
    expect(await fetch(`${checkout.url}/bank`).then((response) => response.text())).toContain('Is this you, paying €136.00');
    const answer = await buyerDoes(`${checkout.url}/bank`, { do: 'yes' });
    expect(answer.status).toBe(outcome.kind === 'approved' ? 303 : 200);
    expect((await stateOf(checkout)).status).toBe(outcome.kind === 'approved' ? 'complete' : 'open');
  });

  test('whose owner tells the bank no is not charged, and may try again', async () => {
    const checkout = await open();
    await buyerDoes(checkout.url, { ...CARD, number: '4000002500003155' });
    expect((await buyerDoes(`${checkout.url}/bank`, { do: 'no' })).text).toContain('Nothing was taken');
    expect(await stateOf(checkout)).toMatchObject({ status: 'open', intent: { last_payment_error: { code: 'payment_intent_authentication_failure' } } });
    expect((await buyerDoes(checkout.url, CARD)).status).toBe(303);
    expect((await eventsOf(checkout)).filter((type) => type === 'payment_intent.requires_action')).toHaveLength(1);
  });

  test('nobody documented is turned down', async () => {
    const checkout = await open();
    expect((await buyerDoes(checkout.url, { ...CARD, number: '4111 1111 1111 1111' })).text).toContain('used a non test card');
  });
});

describe('a bank account', () => {
  test.each([
    ['that pays in the end', 'DE89370400440532013000', 'succeeded', 'paid', 'checkout.session.async_payment_succeeded'],
    ['that does not pay in the end', 'DE62370400440532013001', 'requires_payment_method', 'unpaid', 'checkout.session.async_payment_failed'],
  ])('%s completes the checkout at once and settles later', async (_what, account, intent, payment, last) => {
    const own = await startTrial({ settleSeconds: 3600 });
    const { id, url } = await own.stripe.checkout.sessions.create({
      mode: 'payment',
      line_items: [{ quantity: 1, price_data: { currency: 'eur', unit_amount: 6800, product_data: { name: 'A seat' } } }],
      success_url: 'http://127.0.0.1:4321/done',
    });
    expect((await buyerDoes(url ?? '', { do: 'debit', email: 'amara@weavers.example', account })).status).toBe(303);
    expect(await own.stripe.checkout.sessions.retrieve(id)).toMatchObject({ status: 'complete', payment_status: 'unpaid' });
    await own.listener.until((all) => all.some(({ event }) => event.type === 'checkout.session.completed'));
    own.standIns.clock.advance(3601);
    const settled = await own.stripe.checkout.sessions.retrieve(id, { expand: ['payment_intent'] });
    expect(settled).toMatchObject({ payment_status: payment, payment_intent: { status: intent } });
    await own.listener.until((all) => all.some(({ event }) => event.type === last));
    await own.close();
  });
});
