import { createServer } from 'node:net';
import { afterEach, beforeEach, describe, expect, test } from 'vitest';
import { smtpTransport } from '#server/mail/smtp-transport.ts';
import type { MailTransport, OutgoingMail } from '#server/mail/transport.ts';
import { MailTray } from '#stand-ins/mail/mail-tray.ts';
import { SmtpCatcher, type MailFault } from '#stand-ins/mail/smtp-catcher.ts';

let tray: MailTray;
let catcher: SmtpCatcher;
let transport: MailTransport;

beforeEach(async () => {
  tray = new MailTray(undefined);
  catcher = new SmtpCatcher(tray);
  const port = await catcher.listen(0);
  transport = smtpTransport({ url: `smtp://127.0.0.1:${port}`, timeoutMs: 800 });
});

afterEach(async () => {
  await transport.close();
  await catcher.close();
});

const letter: OutgoingMail = {
  to: { name: 'Maud Ellery', address: 'maud@weavers.example' },
  from: { name: 'Fellmark', address: 'hello@fellmark.example' },
  subject: 'Your seat in Low Tide',
  text: 'Part 1 is open.\n',
  html: '<p>Part 1 is open.</p>',
  messageId: '<receipt-1@fellmark.example>',
};

/** The header block of the newest mail, unfolded. */
function headerBlock(): string[] {
  const raw = tray.newestFirst()[0]?.raw ?? '';
  return (raw.split('\r\n\r\n')[0] ?? '').replace(/\r\n[ \t]+/g, ' ').split('\r\n');
}

const OUR_HEADERS = ['auto-submitted', 'content-type', 'date', 'from', 'message-id', 'mime-version', 'subject', 'to'];

describe('a mail', () => {
  test('arrives with both parts, the sender’s words and the id it was given', async () => {
    const result = await transport.sendMail({ ...letter, subject: 'Überzug ✂️ 羊毛', headers: { 'Content-Language': 'en' } });
    expect(result).toMatchObject({ ok: true });
    const mail = tray.newestFirst()[0];
    expect(mail).toMatchObject({
      from: 'hello@fellmark.example',
      to: 'maud@weavers.example',
      subject: 'Überzug ✂️ 羊毛',
      text: 'Part 1 is open.\n',
      html: '<p>Part 1 is open.</p>',
      envelope: { from: 'hello@fellmark.example', to: ['maud@weavers.example'] },
    });
    expect(mail?.headers).toMatchObject({
      'message-id': '<receipt-1@fellmark.example>',
      'auto-submitted': 'auto-generated',
      'content-language': 'en',
      to: 'Maud Ellery <maud@weavers.example>',
    });
    expect(mail?.headers['content-type']).toMatch(/^multipart\/alternative/);
  });

  test('names another place for reports of failure when told to', async () => {
    await transport.sendMail({ ...letter, returnPath: 'bounce-1@fellmark.example' });
    expect(tray.newestFirst()[0]?.envelope.from).toBe('bounce-1@fellmark.example');
    expect(tray.newestFirst()[0]?.from).toBe('hello@fellmark.example');
  });
});

const SPLIT = '\r\nBcc: evil@x.example\r\n\r\nOther words';

describe('words from people cannot change where a mail goes nor what its header says', () => {
  test.each<[string, Partial<OutgoingMail>]>([
    ['a subject with a line break', { subject: `Low Tide${SPLIT}` }],
    ['a subject with a bare line feed and a zero byte', { subject: 'Low Tide\nBcc: evil@x.example\0' }],
    ['a name with a line break', { to: { ...letter.to, name: `Maud${SPLIT}` } }],
    ['a name that looks like an address and a second recipient', { to: { ...letter.to, name: 'Maud <evil@x.example>, Other <other@x.example>' } }],
    ['a name with quotes and a backslash', { to: { ...letter.to, name: '"Maud\\" <evil@x.example>' } }],
    ['a sender’s name with a line break', { from: { ...letter.from, name: `Ilse${SPLIT}` } }],
    ['a header value with a line break', { headers: { 'Content-Language': `en${SPLIT}` } }],
  ])('%s', async (_what, change) => {
    expect(await transport.sendMail({ ...letter, ...change })).toMatchObject({ ok: true });
    expect(tray.newestFirst()).toHaveLength(1);
    expect(tray.newestFirst()[0]?.envelope).toEqual({ from: 'hello@fellmark.example', to: ['maud@weavers.example'] });
    expect(tray.newestFirst()[0]).toMatchObject({ from: 'hello@fellmark.example', to: 'maud@weavers.example', text: letter.text });
    const names = headerBlock().map((line) => line.slice(0, line.indexOf(':')).toLowerCase());
    expect(names.filter((name) => name !== 'content-language').sort()).toEqual(OUR_HEADERS);
  });

  test.each<[string, Partial<OutgoingMail>]>([
    ['a recipient with a second command behind it', { to: { name: '', address: 'b@x.example\r\nRCPT TO:<evil@x.example>' } }],
    ['two recipients in one address', { to: { name: '', address: 'b@x.example, evil@x.example' } }],
    ['a recipient in angle brackets', { to: { name: '', address: 'b@x.example> <evil@x.example' } }],
    ['a recipient with a hidden sign', { to: { name: '', address: 'b@x.example\u2028' } }],
    ['a header name with a line break', { headers: { 'X-Piece\r\nBcc': 'evil@x.example' } }],
    ['a header that names a recipient', { headers: { BCC: 'evil@x.example' } }],
    ['a return path with a second command behind it', { returnPath: 'a@x.example>\r\nRCPT TO:<evil@x.example' }],
    ['a message id with a line break', { messageId: '<a@x.example>\r\nBcc: evil@x.example' }],
  ])('%s is refused before anything is sent', async (_what, change) => {
    await expect(transport.sendMail({ ...letter, ...change })).rejects.toThrow(TypeError);
    expect(tray.newestFirst()).toEqual([]);
  });

  test('a very long subject is cut at a whole character', async () => {
    await transport.sendMail({ ...letter, subject: '🧵'.repeat(300) });
    expect(tray.newestFirst()[0]?.subject).toBe(`${'🧵'.repeat(199)}…`);
    for (const line of tray.newestFirst()[0]?.raw.split('\r\n') ?? []) expect(line.length).toBeLessThanOrEqual(998);
  });

  test('words that name a file or an address stay words', async () => {
    await transport.sendMail({ ...letter, text: 'path: /etc/hostname href: http://127.0.0.1:1/', html: '<p>{"path":"/etc/hostname"}</p>' });
    expect(tray.newestFirst()[0]?.text).toBe('path: /etc/hostname href: http://127.0.0.1:1/');
  });
});

describe('when the server', () => {
  test.each<[string, MailFault, { reason: string; replyCode: number | undefined }]>([
    ['puts us off (451), we come back later', { mode: 'greylist', delayMs: 0 }, { reason: 'later', replyCode: 451 }],
    ['is overloaded (421), we come back later', { mode: 'overload', delayMs: 0 }, { reason: 'later', replyCode: 421 }],
    ['knows no such recipient (550), the address is refused', { mode: 'refuse', delayMs: 0 }, { reason: 'address-refused', replyCode: 550 }],
    ['does not want the mail (554), the mail is refused', { mode: 'refuse-mail', delayMs: 0 }, { reason: 'mail-refused', replyCode: 554 }],
    ['cuts the line in the middle, we come back later', { mode: 'drop-mid-data', delayMs: 0 }, { reason: 'later', replyCode: undefined }],
    ['cuts the line instead of answering, we come back later', { mode: 'drop-after-data', delayMs: 0 }, { reason: 'later', replyCode: undefined }],
    ['answers too slowly, we come back later', { mode: 'slow', delayMs: 1500 }, { reason: 'later', replyCode: undefined }],
    ['offers an encryption nobody can trust, we come back later', { mode: 'tls-failure', delayMs: 0 }, { reason: 'later', replyCode: undefined }],
  ])('%s', async (_what, fault, refusal) => {
    catcher.fault = fault;
    expect(await transport.sendMail(letter)).toMatchObject({ ok: false, ...refusal });
  });

  test('is not there, we come back later', async () => {
    const port = await freePort();
    const nowhere = smtpTransport({ url: `smtp://127.0.0.1:${port}`, timeoutMs: 1000 });
    expect(await nowhere.sendMail(letter)).toMatchObject({ ok: false, reason: 'later', replyCode: undefined });
    await nowhere.close();
  });

  test('is somewhere else, mail does not go there unencrypted', async () => {
    const elsewhere = smtpTransport({ url: `smtp://127.0.0.1:${await catcherPort()}`, requireTls: true, timeoutMs: 1000 });
    expect(await elsewhere.sendMail(letter)).toMatchObject({ ok: false, reason: 'later' });
    expect(tray.newestFirst()).toEqual([]);
    await elsewhere.close();
  });
});

describe('no mail is lost, and a second copy comes only after a lost answer', () => {
  test.each<[string, MailFault, number]>([
    ['no fault', { mode: 'ok', delayMs: 0 }, 1],
    ['a late answer', { mode: 'slow', delayMs: 50, times: 1 }, 1],
    ['a putting off', { mode: 'greylist', delayMs: 0 }, 1],
    ['an overload', { mode: 'overload', delayMs: 0, times: 2 }, 1],
    ['a line cut in the middle', { mode: 'drop-mid-data', delayMs: 0, times: 1 }, 1],
    ['a failed encryption', { mode: 'tls-failure', delayMs: 0, times: 1 }, 1],
    ['an answer lost on the way', { mode: 'drop-after-data', delayMs: 0, times: 1 }, 2],
  ])('after %s', async (_what, fault, copies) => {
    catcher.fault = fault;
    let tries = 0;
    while (!(await transport.sendMail(letter)).ok) {
      tries += 1;
      expect(tries).toBeLessThan(5);
    }
    expect(tray.newestFirst()).toHaveLength(copies);
    for (const mail of tray.newestFirst()) expect(mail.headers['message-id']).toBe(letter.messageId);
  });
});

async function freePort(): Promise<number> {
  const server = createServer();
  await new Promise<void>((resolve) => {
    server.listen(0, '127.0.0.1', resolve);
  });
  const address = server.address();
  await new Promise((resolve) => server.close(resolve));
  return typeof address === 'object' && address !== null ? address.port : 0;
}

async function catcherPort(): Promise<number> {
  const second = new SmtpCatcher(tray);
  const port = await second.listen(0);
  extraCatchers.push(second);
  return port;
}

const extraCatchers: SmtpCatcher[] = [];
afterEach(async () => {
  for (const extra of extraCatchers.splice(0)) await extra.close();
});
