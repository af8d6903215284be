import { describe, expect, test } from 'vitest';
import { actorOfToken, beginSession } from '#server/auth/sessions.ts';
import type { Context } from '#server/context.ts';
import { AuditEntry, EmailToken, Job, Mail, User, Workroom } from '#server/models/index.ts';
import { countOffice } from '#server/queries/office/count-office.ts';
import { findPersonForOffice } from '#server/queries/office/find-person.ts';
import { listAudit } from '#server/queries/office/list-audit.ts';
import { listJobs } from '#server/queries/office/list-jobs.ts';
import { listLetters } from '#server/queries/office/list-letters.ts';
import { listPeople } from '#server/queries/office/list-people.ts';
import { appointSteward } from '#server/use-cases/office/appoint-steward.ts';
import { letInTeacher } from '#server/use-cases/office/let-in-teacher.ts';
import { restorePerson } from '#server/use-cases/office/restore-person.ts';
import { sendLetterAgain } from '#server/use-cases/office/send-letter-again.ts';
import { suspendPerson } from '#server/use-cases/office/suspend-person.ts';
import { tryJobAgain } from '#server/use-cases/office/try-job-again.ts';
import { setNewPassword } from '#server/use-cases/people/set-new-password.ts';
import { contextFor, contextOf, type TestContext } from '../../support/context.ts';
import { buildEnrolment, buildUser, buildWorkroom } from '../../support/factories.ts';
import { addressOf, buildUserWithPassword, lettersTo, tokenIn } from '../../support/people.ts';

const asSteward = async (): Promise<TestContext> => contextFor(await buildUser({ isSteward: true, name: 'Pell Harrow' }));
const workroom = { workroom: 'Driftwood Looms', handle: 'driftwood-looms' };

async function deadLetter(given: Partial<{ expiresAt: Date | null; state: 'ready' | 'done' | 'dead' }> = {}): Promise<Mail> {
  return Mail.create({
    dedupeKey: `k${Math.random()}`, template: 'password-changed', toAddress: 'maud@weavers.example', toName: 'Maud', data: { token: 'a secret token' }, runAt: new Date('2026-11-01'), state: 'dead', attempts: 8, lastError: '550 no such person', ...given,
  });
}

const deadJob = (state: 'ready' | 'done' | 'dead' = 'dead'): Promise<Job> =>
  Job.create({ type: 'settle-checkout', payload: { checkoutId: 'a secret id' }, maxAttempts: 8, runAt: new Date('2026-11-01'), state, attempts: 8, lastError: 'no answer' });

describe('only a steward may', () => {
  const acts: [string, (ctx: Context) => Promise<unknown>][] = [
    ['let somebody in as a teacher', async (ctx) => letInTeacher(ctx, { person: (await buildUser()).publicId, ...workroom })],
    ['suspend somebody', async (ctx) => suspendPerson(ctx, { person: (await buildUser()).publicId, reason: 'spam' })],
    ['restore somebody', async (ctx) => restorePerson(ctx, { person: (await buildUser({ suspendedAt: new Date() })).publicId })],
    ['send a letter again', async (ctx) => sendLetterAgain(ctx, { mail: (await deadLetter()).id })],
    ['have a job tried again', async (ctx) => tryJobAgain(ctx, { job: (await deadJob()).id })],
  ];

  test.each(acts)('%s: for everybody else there is nothing there', async (_what, act) => {
    const teacher = await buildUser();
    await buildWorkroom({ ownerId: teacher.id });
    for (const ctx of [contextOf(null), await contextFor(await buildUser()), await contextFor(teacher)]) {
      await expect(act(ctx)).rejects.toMatchObject({ code: 'NOT_FOUND' });
    }
    expect(await AuditEntry.count()).toBe(0);
    await expect(act(await asSteward())).resolves.not.toThrow();
    expect(await AuditEntry.count()).toBe(1);
  });

  test.each(acts.slice(0, 3))('%s, and only with a fresh proof of herself', async (_what, act) => {
    const ctx = await asSteward();
    ctx.clock.set(new Date(ctx.clock.now().getTime() + 11 * 60_000));
    await expect(act(ctx)).rejects.toMatchObject({ code: 'PROOF_NEEDED' });
    expect(await AuditEntry.count()).toBe(0);
  });
});

describe('letting a teacher in', () => {
  test('makes her a workroom, signs her out, tells her and is written down', async () => {
    const amara = await buildUser({ name: 'Amara Voss', timeZone: 'Europe/Berlin' });
    const { token } = await beginSession(amara.id, 'student', '', new Date());
    expect(await letInTeacher(await asSteward(), { person: amara.publicId, ...workroom })).toBe('Amara Voss');
    expect(await Workroom.findOne({ where: { ownerId: amara.id } })).toMatchObject({ name: 'Driftwood Looms', handle: 'driftwood-looms', timeZone: 'Europe/Berlin' });
    expect(await actorOfToken(token)).toBeNull();
    expect((await lettersTo(amara.email)).map(({ template }) => template)).toEqual(['workroom-opened']);
    expect((await listAudit(1)).rows).toMatchObject([{ by: 'Pell Harrow', action: 'let-in-teacher', subjectName: 'Amara Voss' }]);
  });

  test('says at the field that a handle is taken, and changes nothing', async () => {
    await buildWorkroom({ handle: 'driftwood-looms' });
    const amara = await buildUser();
    const { token } = await beginSession(amara.id, 'student', '', new Date());
    await expect(letInTeacher(await asSteward(), { person: amara.publicId, ...workroom })).rejects.toMatchObject({ fields: { handle: expect.any(String) } });
    expect(await actorOfToken(token)).not.toBeNull();
    expect(await Mail.count()).toBe(0);
  });

  test('is refused for whoever has a workroom, is suspended, or does not exist', async () => {
    const ctx = await asSteward();
    const teacher = await buildUser();
    await buildWorkroom({ ownerId: teacher.id });
    const suspended = await buildUser({ suspendedAt: new Date() });
    await expect(letInTeacher(ctx, { person: teacher.publicId, ...workroom })).rejects.toMatchObject({ code: 'CONFLICT' });
    await expect(letInTeacher(ctx, { person: suspended.publicId, ...workroom })).rejects.toMatchObject({ code: 'CONFLICT' });
    await expect(letInTeacher(ctx, { person: 'nobody', ...workroom })).rejects.toMatchObject({ code: 'NOT_FOUND' });
  });

  test('twice at once makes one workroom', async () => {
    const ctx = await asSteward();
    const amara = await buildUser();
    const answers = await Promise.allSettled(['one', 'two', 'three'].map((handle) => letInTeacher(ctx, { person: amara.publicId, workroom: handle, handle })));
    expect(answers.filter(({ status }) => status === 'fulfilled')).toHaveLength(1);
    expect(await Workroom.count()).toBe(1);
  });
});

describe('suspending', () => {
  test('signs her out, ends her links and keeps the reason; restoring lets her in again', async () => {
    const ctx = await asSteward();
    const jonas = await buildUser({ name: 'Jonas Pike' });
    const { token } = await beginSession(jonas.id, 'student', '', new Date());
    await EmailToken.create({ tokenHash: 'a'.repeat(64), userId: jonas.id, purpose: 'new-password', address: jonas.email, expiresAt: new Date('2027-01-01') });
    await suspendPerson(ctx, { person: jonas.publicId, reason: 'Posted somebody else’s photos' });
    expect(await actorOfToken(token)).toBeNull();
    expect(await EmailToken.count()).toBe(0);
    expect((await findPersonForOffice(jonas.publicId))?.suspendedAt).toEqual(ctx.clock.now());
    await restorePerson(ctx, { person: jonas.publicId });
    expect((await findPersonForOffice(jonas.publicId))?.suspendedAt).toBeNull();
    expect((await listAudit(1, jonas.publicId)).rows.map(({ action, detail }) => [action, detail])).toEqual([['restore-person', {}], ['suspend-person', { reason: 'Posted somebody else’s photos' }]]);
  });

  test('does not befall a steward, not even by herself', async () => {
    const ctx = await asSteward();
    await expect(suspendPerson(ctx, { person: ctx.actor?.publicId ?? '', reason: 'x' })).rejects.toMatchObject({ code: 'CONFLICT' });
  });

  test('twice is written down once', async () => {
    const ctx = await asSteward();
    const jonas = await buildUser();
    for (let n = 0; n < 2; n += 1) await suspendPerson(ctx, { person: jonas.publicId, reason: 'x' });
    expect(await AuditEntry.count()).toBe(1);
  });
});

describe('appointing a steward', () => {
  test('makes an account that opens by the link alone, with a password fit for a steward', async () => {
    await appointSteward(contextOf(null), { email: addressOf('pell@office.example'), name: 'Pell Harrow' });
    expect(await User.findOne()).toMatchObject({ name: 'Pell Harrow', isSteward: true, passwordHash: null });
    const token = await tokenIn('new-password', 'pell@office.example');
    await expect(setNewPassword(contextOf(null), { token, password: 'k4vq-zzp2-tm' })).rejects.toMatchObject({ code: 'VALIDATION' });
    await expect(setNewPassword(contextOf(null), { token, password: 'nine kettles on a beam' })).resolves.toBeUndefined();
    expect((await listAudit(1)).rows).toMatchObject([{ by: null, action: 'appoint-steward', subjectName: 'Pell Harrow' }]);
  });

  test('who has an account signs her out everywhere and takes the password she had', async () => {
    const amara = await buildUserWithPassword();
    const { token } = await beginSession(amara.id, 'student', '', new Date());
    await appointSteward(contextOf(null), { email: addressOf(amara.email), name: 'x' });
    await amara.reload();
    expect(amara).toMatchObject({ isSteward: true, passwordHash: null });
    expect(await actorOfToken(token)).toBeNull();
    expect(await User.count()).toBe(1);
  });
});

describe('letters and jobs that were given up', () => {
  test('go back into their queues with all their tries', async () => {
    const ctx = await asSteward();
    const [mail, job] = [await deadLetter(), await deadJob()];
    expect(await sendLetterAgain(ctx, { mail: mail.id })).toBe('Maud');
    await tryJobAgain(ctx, { job: job.id });
    await Promise.all([mail.reload(), job.reload()]);
    for (const row of [mail, job]) expect(row).toMatchObject({ state: 'ready', attempts: 0, lastError: null, runAt: ctx.clock.now() });
  });

  test('are left alone when they were not given up, are too late or unknown', async () => {
    const ctx = await asSteward();
    await expect(sendLetterAgain(ctx, { mail: (await deadLetter({ state: 'done' })).id })).rejects.toMatchObject({ code: 'CONFLICT' });
    await expect(sendLetterAgain(ctx, { mail: (await deadLetter({ expiresAt: new Date('2026-11-02') })).id })).rejects.toMatchObject({ code: 'CONFLICT' });
    await expect(tryJobAgain(ctx, { job: (await deadJob('done')).id })).rejects.toMatchObject({ code: 'CONFLICT' });
    await expect(sendLetterAgain(ctx, { mail: 0 })).rejects.toMatchObject({ code: 'NOT_FOUND' });
    await expect(tryJobAgain(ctx, { job: 0 })).rejects.toMatchObject({ code: 'NOT_FOUND' });
  });

  test('are listed without what they carry', async () => {
    await deadLetter();
    await deadJob();
    const lists = JSON.stringify([await listLetters('dead', 1, new Date()), await listJobs('dead', 1)]);
    expect(lists).toContain('550 no such person');
    expect(lists).not.toContain('secret');
  });
});

describe('the list of people', () => {
  test('finds by name, address and workroom, and takes no sign of the search as a pattern', async () => {
    const ilse = await buildUser({ name: 'Ilse Marrow', email: 'ilse@saltmarsh.example', emailKey: 'ilse@saltmarsh.example' });
    await buildWorkroom({ ownerId: ilse.id, name: 'Saltmarsh Loom Room' });
    await buildUser({ name: '100% Wool' });
    const names = async (search: string): Promise<string[]> => (await listPeople(search, 1)).rows.map(({ name }) => name);
    expect(await names('marrow')).toEqual(['Ilse Marrow']);
    expect(await names('  ilse@salt ')).toEqual(['Ilse Marrow']);
    expect(await names('loom room')).toEqual(['Ilse Marrow']);
    expect(await names('%')).toEqual(['100% Wool']);
    expect(await names('_')).toEqual([]);
    expect(await names("' OR 1=1 --")).toEqual([]);
    expect(await names('')).toHaveLength(2);
  });

  test('says what each is, and counts her seats', async () => {
    const seat = await buildEnrolment();
    const student = (await User.findByPk(seat.userId, { rejectOnEmpty: true })).email;
    const rows = (await listPeople('', 1)).rows;
    expect(rows.find(({ email }) => email === student)).toMatchObject({ seats: 1, workroom: null, confirmed: true, isSteward: false, suspended: false });
    expect(rows.find(({ workroom: name }) => name === 'Saltmarsh Loom Room')).toBeDefined();
    expect(await countOffice()).toMatchObject({ people: 2, workrooms: 1, seats: 1, letters: { waiting: 0, dead: 0, lateSeconds: 0 } });
  });

  test('comes in pages, and beyond the last one the last is shown', async () => {
    await User.bulkCreate(Array.from({ length: 51 }, (_, n) => ({ email: `m${n}@weavers.example`, emailKey: `m${n}@weavers.example`, name: `Maud ${n}` })));
    expect(await listPeople('', 99)).toMatchObject({ page: 2, pages: 2, total: 51, rows: [{ name: 'Maud 0' }] });
  });
});
