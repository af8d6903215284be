import { afterEach, describe, expect, test } from 'vitest';
import { NO_FAULTS, seededChance, WebhookFaults } from '#stand-ins/payment/webhook-faults.ts';
import { buyerDoes, CARD, checkoutRequest, startTrial, valueOf, WEBHOOK_SECRET, type Trial } from '../../support/stand-ins.ts';

const open: Trial[] = [];

afterEach(async () => {
  for (const trial of open.splice(0)) await trial.close();
});

async function begin(faults: Partial<WebhookFaults> = {}, change: Parameters<typeof startTrial>[0] = {}): Promise<Trial> {
  const trial = await startTrial(change);
  open.push(trial);
  trial.standIns.webhooks.faults = { ...NO_FAULTS, ...faults };
  return trial;
}

async function sell(trial: Trial): Promise<string> {
  const { id, url = '' } = valueOf(await trial.payments.createCheckout(checkoutRequest()));
  await buyerDoes(url, CARD);
  return id;
}

/** What one paid checkout tells the shop. */
const NEWS_OF_A_SALE = ['payment_intent.created', 'charge.succeeded', 'payment_intent.succeeded', 'checkout.session.completed'];
const sorted = (types: readonly string[]) => [...types].sort();

describe('news of a sale', () => {
  test('arrives signed, so that the shop believes it', async () => {
    const trial = await begin();
    const id = await sell(trial);
    await trial.listener.until((all) => all.length === 4);
    expect(sorted(trial.listener.types())).toEqual(sorted(NEWS_OF_A_SALE));
    for (const { body, signature } of trial.listener.received) {
      expect(trial.payments.verifyEvent(body, signature, new Date())).toMatchObject({ ok: true });
      expect(trial.stripe.webhooks.constructEvent(body, signature, WEBHOOK_SECRET)).toMatchObject({ object: 'event' });
    }
    const completed = trial.listener.received.find(({ event }) => event.type === 'checkout.session.completed');
    const verdict = trial.payments.verifyEvent(completed?.body ?? '', completed?.signature, new Date());
    expect(verdict).toMatchObject({ event: { foreignVersion: false, live: false, about: { kind: 'checkout.session', id } } });
  });

  test('is signed by each of two secrets while one takes the other’s place', async () => {
    const trial = await begin({}, { webhookSecrets: ['whsec_next', WEBHOOK_SECRET] });
    await sell(trial);
    await trial.listener.until((all) => all.length === 4);
    const [first] = trial.listener.received;
    expect(first?.signature.match(/v1=/g)).toHaveLength(2);
    expect(trial.payments.verifyEvent(first?.body ?? '', first?.signature, new Date())).toMatchObject({ ok: true });
  });

  test.each([[500], [503], [404], [302]])('comes again after %d, the same to the octet', async (status) => {
    const trial = await begin();
    trial.listener.answers.push(status, status, status, status, status);
    await sell(trial);
    await trial.listener.until((all) => all.length === 4);
    expect(sorted(trial.listener.types())).toEqual(sorted(NEWS_OF_A_SALE));
    expect(trial.listener.tried).toHaveLength(9);
    expect(new Set(trial.listener.tried.map(({ body }) => body))).toEqual(new Set(trial.listener.received.map(({ body }) => body)));
    await expect.poll(() => trial.standIns.webhooks.counts()).toEqual({ waiting: 0, delivered: 4, 'given-up': 0 });
  });

  test('is given up after the last try, and can still be asked for', async () => {
    const trial = await begin({ drop: 1 }, { retrySeconds: [0.01, 0.01] });
    await sell(trial);
    await expect.poll(() => trial.standIns.webhooks.counts(), { timeout: 3000 }).toEqual({ waiting: 0, delivered: 0, 'given-up': 4 });
    expect(trial.listener.received).toEqual([]);
    const missed = await trial.stripe.events.list({ delivery_success: false });
    expect(sorted(missed.data.map(({ type }) => type))).toEqual(sorted(NEWS_OF_A_SALE));
    expect((await trial.stripe.events.list({ delivery_success: true })).data).toEqual([]);
  });
});

describe('with faults', () => {
  test('duplicate: each comes twice under one id', async () => {
    const trial = await begin({ duplicate: 1, seed: 7 });
    await sell(trial);
    await trial.listener.until((all) => all.length === 8, 8000);
    const times = new Map<string, number>();
    for (const { event } of trial.listener.received) times.set(event.id, (times.get(event.id) ?? 0) + 1);
    expect([...times.values()]).toEqual([2, 2, 2, 2]);
  });

  test('reorder: all come, in another order than they happened', async () => {
    const trial = await begin({ reorder: 1, seed: 3 });
    await sell(trial);
    await trial.listener.until((all) => all.length === 4);
    expect(sorted(trial.listener.types())).toEqual(sorted(NEWS_OF_A_SALE));
    expect(trial.listener.types()).not.toEqual(NEWS_OF_A_SALE);
  });

  test('delay: none comes before its time', async () => {
    const trial = await begin({ delayMs: 400 });
    await sell(trial);
    await new Promise((resolve) => setTimeout(resolve, 250));
    expect(trial.listener.received).toEqual([]);
    await trial.listener.until((all) => all.length === 4);
  });

  test('drop: what was lost on the way comes later', async () => {
    const trial = await begin({ drop: 0.5, seed: 11 }, { retrySeconds: Array.from({ length: 20 }, () => 0.05) });
    await sell(trial);
    await trial.listener.until((all) => all.length === 4);
    expect(sorted(trial.listener.types())).toEqual(sorted(NEWS_OF_A_SALE));
  });

  test('drop until told otherwise: nothing comes, then everything does', async () => {
    const trial = await begin({ drop: 1 }, { retrySeconds: Array.from({ length: 50 }, () => 0.1) });
    await sell(trial);
    await new Promise((resolve) => setTimeout(resolve, 300));
    expect(trial.listener.received).toEqual([]);
    trial.standIns.webhooks.faults = NO_FAULTS;
    await trial.listener.until((all) => all.length === 4);
  });

  test('all at once: every event arrives at least once, whatever the seed', async () => {
    const trial = await begin({ duplicate: 0.5, reorder: 0.5, drop: 0.4, delayMs: 20, seed: 42 }, { retrySeconds: Array.from({ length: 30 }, () => 0.05) });
    const sales = await Promise.all([sell(trial), sell(trial), sell(trial), sell(trial)]);
    const all = () => new Set(trial.listener.received.filter(({ event }) => event.type === 'checkout.session.completed').map(({ event }) => (event.data.object as { id: string }).id));
    await trial.listener.until(() => all().size === sales.length, 10_000);
    expect(all()).toEqual(new Set(sales));
  });
});

describe('chance', () => {
  test('is the same for the same seed, spread over the whole range, and within it', () => {
    const draws = (seed: number) => Array.from({ length: 4000 }, seededChance(seed));
    expect(draws(5)).toEqual(draws(5));
    expect(draws(5)).not.toEqual(draws(6));
    const all = draws(1);
    expect(Math.min(...all)).toBeGreaterThanOrEqual(0);
    expect(Math.max(...all)).toBeLessThan(1);
    for (let tenth = 0; tenth < 10; tenth += 1) {
      expect(all.filter((draw) => Math.floor(draw * 10) === tenth).length).toBeGreaterThan(300);
    }
  });
});
