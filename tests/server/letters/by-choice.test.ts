// Letters that come only by choice: saying yes, leaving by the letter's link, addresses that take none.
import { afterEach, beforeEach, describe, expect, test } from 'vitest';
import { LettersForm } from '#contracts/notices.ts';
import { LETTER_KINDS, type LetterKind } from '#core/notices/letter-kinds.ts';
import { leaveKey, readLeaveKey } from '#server/auth/leave-key.ts';
import { actorOfToken, beginSession } from '#server/auth/sessions.ts';
import { postLetter } from '#server/mail/outbox.ts';
import { sendDueMails } from '#server/mail/send-due.ts';
import { smtpTransport } from '#server/mail/smtp-transport.ts';
import { FakeMailTransport } from '#server/mail/transport.fake.ts';
import type { MailTransport } from '#server/mail/transport.ts';
import { LetterChoice, Mail, RefusedAddress, type User, type Workroom } from '#server/models/index.ts';
import { letterChoicesOf } from '#server/queries/letters/letter-choices.ts';
import { listOfKey } from '#server/queries/letters/list-of-key.ts';
import { chooseLetters } from '#server/use-cases/letters/choose-letters.ts';
import { leaveLetters } from '#server/use-cases/letters/leave-letters.ts';
import { tryAddressAgain } from '#server/use-cases/people/try-address-again.ts';
import { MailTray } from '#stand-ins/mail/mail-tray.ts';
import { SmtpCatcher } from '#stand-ins/mail/smtp-catcher.ts';
import { contextFor, contextOf } from '../../support/context.ts';
import { buildEnrolment, buildSeries, buildUser, buildWorkroom } from '../../support/factories.ts';

let maud: User;
let saltmarsh: Workroom;

beforeEach(async () => {
  maud = await buildUser({ name: 'Maud Ellery' });
  saltmarsh = await buildWorkroom({ handle: 'saltmarsh' });
  await buildEnrolment({ userId: maud.id, seriesId: (await buildSeries({ workroomId: saltmarsh.id })).id });
});

const choose = async (user: User, ...kinds: LetterKind[]): Promise<unknown> =>
  chooseLetters(await contextFor(user), LettersForm.parse({ workroom: saltmarsh.publicId, source: 'account', ...Object.fromEntries(kinds.map((kind) => [kind, 'yes'])) }));
const wanted = async (): Promise<readonly LetterKind[] | undefined> => (await letterChoicesOf(maud.id))[0]?.wanted;
const keyOf = (kind: LetterKind): string => leaveKey({ person: maud.publicId, workroom: saltmarsh.publicId, kind });

let letters = 0;
async function write(kind: LetterKind): Promise<void> {
  letters += 1;
  await postLetter({
    template: 'notice',
    dedupeKey: `letter:${letters}`,
    to: { userId: maud.id, name: maud.name, address: maud.email },
    list: { workroomId: saltmarsh.id, kind },
    data: {
      kind, title: 'Bring a cork', from: 'Ilse Marrow, Low Tide', seriesTitle: 'Low Tide', seriesSlug: 'low-tide', workroomName: 'Saltmarsh Loom Room', workroomHandle: 'saltmarsh',
      postalAddress: 'Boat shed 3\nFenmouth', leaveKey: keyOf(kind), blocks: [{ kind: 'prose', runs: [{ words: 'Push it on the ' }, { words: 'corner nails', strong: true, href: '/handbook/nails' }, { words: '.' }] }],
    },
  });
}

const post = (transport: MailTransport): Promise<number> =>
  sendDueMails({ transport, from: 'hello@fellmark.example', publicUrl: 'https://fellmark.example', now: () => new Date(), chance: () => 0.5 }, 'worker-1');
const states = async (): Promise<unknown[]> => (await Mail.findAll({ order: ['id'] })).map(({ state, lastError }) => [state, lastError]);

describe('saying yes', () => {
  test('needs somebody signed in who has or had a seat there', async () => {
    const input = LettersForm.parse({ workroom: saltmarsh.publicId, source: 'account', notices: 'yes' });
    await expect(chooseLetters(contextOf(null), input)).rejects.toMatchObject({ code: 'UNAUTHENTICATED' });
    await expect(choose(await buildUser(), 'notices')).rejects.toMatchObject({ code: 'NOT_FOUND' });
    expect(await LetterChoice.count()).toBe(0);
  });

  test('is nobody’s who has not said so', async () => {
    expect(await wanted()).toEqual([]);
  });

  test('is kept with its time, its words and where it was said; again changes nothing; no is kept beside it', async () => {
    await choose(maud, 'notices');
    await choose(maud, 'notices');
    expect(await wanted()).toEqual(['notices']);
    await choose(maud, 'nudges');
    expect(await wanted()).toEqual(['nudges']);
    const rows = await LetterChoice.findAll({ order: ['id'] });
    expect(rows.map(({ kind, isWanted, wording, source, createdAt }) => [kind, isWanted, wording, source, createdAt.toISOString()])).toEqual([
      ['notices', true, 1, 'account', '2026-12-01T10:00:00.000Z'],
      ['notices', false, 1, 'account', '2026-12-01T10:00:00.000Z'],
      ['nudges', true, 1, 'account', '2026-12-01T10:00:00.000Z'],
    ]);
  });
});

describe('leaving by the letter’s link', () => {
  test('a key that was changed anywhere is no key', async () => {
    await choose(maud, ...LETTER_KINDS);
    const key = keyOf('notices');
    const swap = (at: number): string => `${key.slice(0, at)}${key[at] === 'a' ? 'b' : 'a'}${key.slice(at + 1)}`;
    const other = await buildUser();
    const changed = [...Array.from({ length: key.length }, (_, at) => swap(at)), key.replace('notices', 'nudges'), key.replace(maud.publicId, other.publicId), `${key}a`, key.slice(1), key.toUpperCase(), '', 'nothing', '%00'];
    expect(changed.filter((one) => readLeaveKey(one) !== null)).toEqual([]);
    for (const one of [swap(0), swap(key.length - 2), 'nothing']) await expect(leaveLetters(contextOf(null), one)).rejects.toMatchObject({ code: 'NOT_FOUND' });
    expect(await wanted()).toEqual(['notices', 'nudges']);
  });

  test('looking at it changes nothing', async () => {
    await choose(maud, 'notices');
    expect(await listOfKey(keyOf('notices'))).toEqual({ kind: 'notices', workroom: 'Saltmarsh Loom Room', isWanted: true });
    expect(await wanted()).toEqual(['notices']);
  });

  test('works signed out, ends that kind only, and may be done twice', async () => {
    await choose(maud, ...LETTER_KINDS);
    await leaveLetters(contextOf(null), keyOf('nudges'));
    await leaveLetters(contextOf(null), keyOf('nudges'));
    expect(await wanted()).toEqual(['notices']);
    expect(await LetterChoice.count({ where: { source: 'letter' } })).toBe(1);
    expect(await listOfKey(keyOf('nudges'))).toMatchObject({ isWanted: false });
  });

  test('stops the letter that waits, not only later ones', async () => {
    await choose(maud, ...LETTER_KINDS);
    await write('notices');
    await write('nudges');
    await leaveLetters(contextOf(null), keyOf('notices'));
    const transport = new FakeMailTransport();
    await post(transport);
    expect(transport.sent).toHaveLength(1);
    expect(await states()).toEqual([['dropped', 'these letters were left'], ['done', null]]);
  });

  test('what was never asked for is not sent, nor what goes to somebody suspended', async () => {
    await write('notices');
    await choose(maud, 'nudges');
    await write('nudges');
    await maud.update({ suspendedAt: new Date() });
    const transport = new FakeMailTransport();
    await post(transport);
    expect([transport.tried.length, await states()]).toEqual([0, [['dropped', 'the account is closed or suspended'], ['dropped', 'the account is closed or suspended']]]);
  });
});

describe('an address that takes no letters', () => {
  const refusal = { ok: false, reason: 'address-refused', replyCode: 550, message: 'no such mailbox' } as const;

  async function confirm(): Promise<void> {
    letters += 1;
    await postLetter({ template: 'confirm-address', data: { token: 't' }, dedupeKey: `letter:${letters}`, to: { userId: maud.id, name: maud.name, address: maud.email } });
  }

  test('is asked once; then only letters of the door are tried, and one that arrives ends it', async () => {
    await choose(maud, 'notices');
    const transport = new FakeMailTransport();
    transport.answerNext(refusal);
    for (let index = 0; index < 2; index += 1) {
      await write('notices');
      await post(transport);
    }
    expect(await states()).toEqual([['dead', 'no such mailbox'], ['dropped', 'the address takes no letters']]);
    expect(transport.tried).toHaveLength(1);
    await confirm();
    await post(transport);
    expect([transport.sent.length, await RefusedAddress.count()]).toEqual([1, 0]);
  });

  test('is told to her on every page, until she has it tried again', async () => {
    const refused = async (): Promise<boolean | undefined> => (await actorOfToken((await beginSession(maud.id, 'student', '', new Date())).token))?.addressRefused;
    expect(await refused()).toBe(false);
    await RefusedAddress.create({ addressKey: maud.emailKey, reply: '550' });
    expect(await refused()).toBe(true);
    await expect(tryAddressAgain(contextOf(null))).rejects.toMatchObject({ code: 'UNAUTHENTICATED' });
    expect(await tryAddressAgain(await contextFor(maud))).toBe(true);
    expect(await refused()).toBe(false);
    expect(await tryAddressAgain(await contextFor(maud))).toBe(false);
    for (let index = 0; index < 3; index += 1) await tryAddressAgain(await contextFor(maud));
    await expect(tryAddressAgain(await contextFor(maud))).rejects.toMatchObject({ code: 'RATE_LIMITED' });
  });
});

describe('on the wire', () => {
  let tray: MailTray;
  let catcher: SmtpCatcher;
  let transport: MailTransport;
  beforeEach(async () => {
    tray = new MailTray(undefined);
    catcher = new SmtpCatcher(tray);
    transport = smtpTransport({ url: `smtp://127.0.0.1:${await catcher.listen(0)}`, timeoutMs: 2_000 });
  });
  afterEach(async () => {
    await transport.close();
    await catcher.close();
  });
  /** Header lines as they came, unfolded. */
  const lines = (): string[] => (tray.newestFirst()[0]?.raw ?? '').split('\r\n\r\n')[0]?.replace(/\r\n[ \t]+/g, ' ').split('\r\n') ?? [];

  test('a notice carries what leaves its list by one press, its list’s id, and no more of the kind', async () => {
    await choose(maud, 'notices');
    await write('notices');
    await post(transport);
    expect(lines().filter((line) => /^list-/i.test(line)).toSorted()).toEqual([
      'List-ID: <notices.saltmarsh.fellmark.example>',
      'List-Unsubscribe-Post: List-Unsubscribe=One-Click',
      `List-Unsubscribe: <https://fellmark.example/leave/${keyOf('notices')}>`,
    ]);
    expect(lines()).toEqual(expect.arrayContaining(['Auto-Submitted: auto-generated', 'Content-Language: en']));
  });

  test('and says in both of its parts who writes, from where, why she has it and how it ends', async () => {
    await choose(maud, 'notices');
    await write('notices');
    await post(transport);
    const mail = tray.newestFirst()[0];
    for (const part of [mail?.text ?? '', mail?.html ?? '']) {
      for (const said of ['Ilse Marrow, Low Tide writes:', 'Saltmarsh Loom Room, Boat shed 3, Fenmouth', 'because you asked for notices of Saltmarsh Loom Room', `https://fellmark.example/leave/${keyOf('notices')}`, 'https://fellmark.example/handbook/nails']) expect(part).toContain(said);
    }
    expect(mail?.html).toContain('<a href="https://fellmark.example/handbook/nails"><strong>corner nails</strong></a>');
  });

  test('a letter about her own doings has none of it', async () => {
    await postLetter({ template: 'workroom-opened', data: { workroom: 'A' }, dedupeKey: 'w', to: { userId: maud.id, name: maud.name, address: maud.email } });
    await post(transport);
    expect(lines().filter((line) => /^list-/i.test(line))).toEqual([]);
    expect(tray.newestFirst()[0]?.text).not.toContain('Leave');
  });
});
