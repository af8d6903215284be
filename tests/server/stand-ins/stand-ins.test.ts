import { mkdtemp, readFile, rm, writeFile, appendFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, afterEach, beforeAll, describe, expect, test } from 'vitest';
import { smtpTransport } from '#server/mail/smtp-transport.ts';
import { startStandIns, type StandIns } from '#stand-ins/stand-ins.ts';
import { buyerDoes, CARD, checkoutRequest, Listener, startTrial, valueOf, type Trial } from '../../support/stand-ins.ts';
import { StripePaymentService } from '#server/payments/stripe-payment-service.ts';

async function sendLetter(standIns: StandIns, change: { subject?: string; html?: string; text?: string } = {}): Promise<void> {
  const transport = smtpTransport({ url: standIns.smtpUrl });
  await transport.sendMail({
    to: { name: 'Maud Ellery', address: 'maud@weavers.example' },
    from: { name: 'Fellmark', address: 'hello@fellmark.example' },
    subject: 'Confirm your address',
    text: 'Open http://127.0.0.1:4321/confirm/abc. Thank you.\n',
    html: '<html><head><title>x</title></head><body><a href="http://127.0.0.1:4321/confirm/abc">Confirm</a><script>alert(1)</script></body></html>',
    messageId: '<m1@fellmark.example>',
    ...change,
  });
  await transport.close();
}

describe('the mail tray', () => {
  let trial: Trial;
  beforeAll(async () => {
    trial = await startTrial();
    await sendLetter(trial.standIns, { subject: 'First' });
    await sendLetter(trial.standIns, { subject: 'Second <i>&' });
  });
  afterAll(async () => {
    await trial.close();
  });
  const get = async (path: string) => {
    const response = await fetch(`${trial.standIns.url}${path}`);
    return { status: response.status, headers: response.headers, text: await response.text() };
  };
  const newest = async () => JSON.parse((await get('/mail.json')).text) as { id: string; subject: string }[];

  test('gives all mails as JSON, newest first', async () => {
    expect(await newest()).toMatchObject([
      {
        subject: 'Second <i>&',
        from: 'hello@fellmark.example',
        to: 'maud@weavers.example',
        text: 'Open http://127.0.0.1:4321/confirm/abc. Thank you.\n',
        html: expect.stringContaining('/confirm/abc') as string,
        headers: { 'message-id': '<m1@fellmark.example>', 'auto-submitted': 'auto-generated' },
      },
      { subject: 'First' },
    ]);
  });

  test('lists them on a page, with their words kept words', async () => {
    const { text } = await get('/mail');
    expect(text).toContain('Second &#60;i&#62;&#38;');
    expect(text.indexOf('Second')).toBeLessThan(text.indexOf('First'));
  });

  test('shows one mail with its addresses as links', async () => {
    const [{ id } = { id: '' }] = await newest();
    expect((await get(`/mail/${id}`)).text).toContain('<a href="http://127.0.0.1:4321/confirm/abc">http://127.0.0.1:4321/confirm/abc</a>. Thank you.');
  });

  test('shows its markup where nothing can run', async () => {
    const [{ id } = { id: '' }] = await newest();
    const shown = await get(`/mail/${id}/html`);
    expect(shown.text).toContain('<head><base target="_blank">');
    const policy = shown.headers.get('content-security-policy') ?? '';
    expect(policy).toMatch(/^sandbox (?!.*allow-scripts)/);
    expect(policy).toContain("default-src 'none'");
  });

  test('gives the whole mail as a file, and nothing for a mail that is not there', async () => {
    const [{ id } = { id: '' }] = await newest();
    expect((await get(`/mail/${id}.eml`)).text).toMatch(/^(?:.|\r\n)*Message-ID: <m1@fellmark\.example>/);
    expect((await get('/mail/none')).status).toBe(404);
  });

  test('is emptied on request', async () => {
    const response = await fetch(`${trial.standIns.url}/control/mail/clear`, { method: 'POST', headers: { 'content-type': 'application/json' }, body: '{}' });
    expect(response.status).toBe(200);
    expect(await newest()).toEqual([]);
    expect((await get('/mail')).text).toContain('No mail yet.');
  });
});

describe('the controls', () => {
  let trial: Trial;
  beforeAll(async () => {
    trial = await startTrial();
  });
  afterAll(async () => {
    await trial.close();
  });
  const set = async (name: string, body: unknown, type = 'application/json') => {
    const response = await fetch(`${trial.standIns.url}/control/${name}`, { method: 'POST', headers: { 'content-type': type }, body: JSON.stringify(body) });
    return { status: response.status, answer: (await response.json()) as unknown };
  };

  test('set the faults of news; what is left out is none', async () => {
    expect(await set('webhooks', { duplicate: 0.5, seed: 9 })).toEqual({ status: 200, answer: { duplicate: 0.5, reorder: 0, drop: 0, delayMs: 0, seed: 9 } });
    expect(trial.standIns.webhooks.faults).toMatchObject({ duplicate: 0.5, seed: 9 });
    await set('webhooks', {});
    expect(trial.standIns.webhooks.faults).toMatchObject({ duplicate: 0, drop: 0 });
  });

  test('set the mail server’s mood', async () => {
    expect((await set('mail', { mode: 'refuse', times: 1 })).status).toBe(200);
    expect(trial.standIns.smtp.fault).toMatchObject({ mode: 'refuse', times: 1 });
    await set('mail', { mode: 'ok' });
  });

  test('move time on', async () => {
    const opened = valueOf(await trial.payments.createCheckout(checkoutRequest()));
    await set('clock', { advanceSeconds: 3600 });
    expect(valueOf(await trial.payments.readCheckout(opened.id)).status).toBe('expired');
  });

  test('settle what is on its way', async () => {
    const { id, url = '' } = valueOf(await trial.payments.createCheckout(checkoutRequest({ expiresAt: new Date((Math.floor(Date.now() / 1000) + 3600 + 2100) * 1000) })));
    await buyerDoes(url, { do: 'debit', email: 'amara@weavers.example', account: 'DE62370400440532013001' });
    expect(await set('settle', { id, outcome: 'succeeded' })).toEqual({ status: 200, answer: { waiting: [] } });
    expect(valueOf(await trial.payments.readCheckout(id))).toMatchObject({ status: 'complete', payment: 'paid' });
  });

  test.each<[string, unknown]>([
    ['webhooks', { drop: 2 }],
    ['webhooks', { lose: 1 }],
    ['mail', { mode: 'sulk' }],
    ['clock', { advanceSeconds: -5 }],
    ['payments', { faults: [{ kind: 'sulk' }] }],
  ])('refuse nonsense: %s %j', async (name, body) => {
    expect((await set(name, body)).status).toBe(422);
  });

  test('take nothing from a form of another page', async () => {
    expect((await set('webhooks', { drop: 1 }, 'text/plain')).status).toBe(415);
    expect(trial.standIns.webhooks.faults.drop).toBe(0);
    expect((await set('none', {})).status).toBe(404);
  });
});

describe('between two starts', () => {
  let folder = '';
  const running: { close(): Promise<void> }[] = [];
  beforeAll(async () => {
    folder = await mkdtemp(join(tmpdir(), 'stand-ins-'));
  });
  afterEach(async () => {
    for (const one of running.splice(0)) await one.close();
  });
  afterAll(async () => {
    await rm(folder, { recursive: true });
  });

  async function start(listener: Listener): Promise<{ standIns: StandIns; payments: StripePaymentService }> {
    const standIns = await startStandIns({ httpPort: 0, smtpPort: 0, folder, webhookUrl: listener.url, webhookSecrets: ['whsec_trial'], retrySeconds: [60] });
    return { standIns, payments: new StripePaymentService({ secretKey: 'sk_test_trial', webhookSecrets: ['whsec_trial'], url: standIns.url }) };
  }

  test('checkouts, kept answers, news that is due and mails survive', async () => {
    const listener = await Listener.start();
    running.push(listener);
    const first = await start(listener);
    const request = checkoutRequest();
    const opened = valueOf(await first.payments.createCheckout(request));
    const sold = valueOf(await first.payments.createCheckout(checkoutRequest()));
    listener.answers.push(503, 503, 503, 503);
    await buyerDoes(sold.url ?? '', CARD);
    await sendLetter(first.standIns);
    while (listener.answers.length > 0) await new Promise((resolve) => setTimeout(resolve, 20));
    await first.standIns.close();
    await appendFile(join(folder, 'payments.jsonl'), '{"kind":"checkout","id":"cut o');

    const second = await start(listener);
    running.push(second.standIns);
    expect(valueOf(await second.payments.readCheckout(opened.id))).toMatchObject({ status: 'open', totalMinor: 6800 });
    expect(valueOf(await second.payments.createCheckout(request)).id).toBe(opened.id);
    expect(valueOf(await second.payments.readCheckout(sold.id))).toMatchObject({ status: 'complete', payment: 'paid' });
    expect(second.standIns.tray.newestFirst().map(({ subject }) => subject)).toEqual(['Confirm your address']);
    expect(listener.received).toEqual([]);
    second.standIns.clock.advance(61);
    second.standIns.webhooks.wake();
    await listener.until((all) => all.length === 4);
  });

  test('the file is written small again', async () => {
    const listener = await Listener.start();
    running.push(listener);
    const before = (await readFile(join(folder, 'payments.jsonl'), 'utf8')).split('\n').length;
    running.push((await start(listener)).standIns);
    const after = (await readFile(join(folder, 'payments.jsonl'), 'utf8')).split('\n').length;
    expect(after).toBeLessThanOrEqual(before);
    expect(after).toBeGreaterThan(5);
  });

  test('a file that holds nonsense is passed over', async () => {
    await writeFile(join(folder, 'mail.jsonl'), 'nonsense\n{"kind":"mail","id":"x","value":{"id":"x"}}\n');
    const listener = await Listener.start();
    running.push(listener);
    const { standIns } = await start(listener);
    running.push(standIns);
    expect(standIns.tray.newestFirst()).toEqual([]);
  });
});

test('a port that is taken is named', async () => {
  const trial = await startTrial();
  const port = Number(new URL(trial.standIns.url).port);
  await expect(startStandIns({ httpPort: port, smtpPort: 0, webhookUrl: trial.listener.url, webhookSecrets: ['whsec_trial'] })).rejects.toMatchObject({ code: 'EADDRINUSE', port });
  await trial.close();
});

test('a body that is too large is refused', async () => {
  const trial = await startTrial();
  const response = await fetch(`${trial.standIns.url}/v1/checkout/sessions`, { method: 'POST', body: 'a'.repeat(1024 * 1024 + 1) });
  expect(response.status).toBe(413);
  await trial.close();
});
