import { describe, expect, test } from 'vitest';
import { passwordFits } from '#server/auth/passwords.ts';
import { actorOfToken, beginSession } from '#server/auth/sessions.ts';
import { AuditEntry, EmailToken, Job, Mail, Session, type User } from '#server/models/index.ts';
import { askNewPassword } from '#server/use-cases/people/ask-new-password.ts';
import { changePassword } from '#server/use-cases/people/change-password.ts';
import { forgetOldLinks } from '#server/use-cases/people/forget-old-links.ts';
import { proveSelf } from '#server/use-cases/people/prove-self.ts';
import { setNewPassword } from '#server/use-cases/people/set-new-password.ts';
import { contextFor, contextOf, type TestContext } from '../../support/context.ts';
import { buildUser } from '../../support/factories.ts';
import { addressOf, buildUserWithPassword, GOOD_PASSWORD, lettersTo, OTHER_PASSWORD, tokenIn, writeAskedLinks } from '../../support/people.ts';

const MINUTE_MS = 60_000;

async function linkFor(user: User, ctx: TestContext = contextOf(null)): Promise<string> {
  await askNewPassword(ctx, { email: addressOf(user.email) });
  await writeAskedLinks(ctx);
  return tokenIn('new-password', user.email);
}

async function opens(user: User, password: string): Promise<boolean> {
  await user.reload();
  return passwordFits(password, user.passwordHash);
}

describe('asking for a new password', () => {
  test('sends a link to the owner of the address', async () => {
    const user = await buildUserWithPassword();
    expect(await linkFor(user)).toMatch(/^[A-Za-z0-9_-]{43}$/);
    expect((await lettersTo(user.email)).map(({ template }) => template)).toEqual(['new-password']);
  });

  test('does the same in the request whether or not anybody has the address, and writes nobody who has not', async () => {
    const suspended = await buildUserWithPassword({ suspendedAt: new Date() });
    const known = await buildUserWithPassword();
    for (const address of ['nobody@weavers.example', suspended.email, known.email]) await askNewPassword(contextOf(null), { email: addressOf(address) });
    expect(await Job.count()).toBe(3);
    await writeAskedLinks(contextOf(null));
    expect((await Mail.findAll()).map(({ toAddress }) => toAddress)).toEqual([known.email]);
  });

  test('six times in an hour writes five letters, and the fifth link works still', async () => {
    const user = await buildUserWithPassword();
    for (let n = 0; n < 6; n += 1) await askNewPassword(contextOf(null), { email: addressOf(user.email) });
    await writeAskedLinks(contextOf(null));
    expect(await lettersTo(user.email)).toHaveLength(5);
    await expect(setNewPassword(contextOf(null), { token: await tokenIn('new-password', user.email), password: OTHER_PASSWORD })).resolves.toBeUndefined();
  });

  test('for many addresses from one network is refused after thirty an hour', async () => {
    for (let n = 0; n < 30; n += 1) await askNewPassword(contextOf(null), { email: addressOf(`m${n}@weavers.example`) });
    await expect(askNewPassword(contextOf(null), { email: addressOf('m31@weavers.example') })).rejects.toMatchObject({ code: 'RATE_LIMITED' });
  });
});

describe('choosing a new password by a link', () => {
  test('changes it, signs every browser out, signs nobody in and tells the owner', async () => {
    const user = await buildUserWithPassword();
    const { token: session } = await beginSession(user.id, 'student', '', new Date());
    await setNewPassword(contextOf(null), { token: await linkFor(user), password: OTHER_PASSWORD });
    expect([await opens(user, GOOD_PASSWORD), await opens(user, OTHER_PASSWORD)]).toEqual([false, true]);
    expect(await actorOfToken(session)).toBeNull();
    expect(await Session.count()).toBe(0);
    expect((await lettersTo(user.email)).map(({ template }) => template)).toEqual(['new-password', 'password-changed']);
  });

  test('works once', async () => {
    const user = await buildUserWithPassword();
    const token = await linkFor(user);
    await setNewPassword(contextOf(null), { token, password: OTHER_PASSWORD });
    await expect(setNewPassword(contextOf(null), { token, password: GOOD_PASSWORD })).rejects.toMatchObject({ code: 'GONE' });
    expect(await opens(user, OTHER_PASSWORD)).toBe(true);
  });

  test('works for exactly one of twenty who use the link at once', async () => {
    const user = await buildUserWithPassword();
    const token = await linkFor(user);
    const passwords = Array.from({ length: 20 }, (_, n) => `tide number ${n} of grey wool`);
    const answers = await Promise.allSettled(passwords.map((password) => setNewPassword(contextOf(null), { token, password })));
    expect(answers.filter(({ status }) => status === 'fulfilled')).toHaveLength(1);
    const winner = passwords[answers.findIndex(({ status }) => status === 'fulfilled')] ?? '';
    expect(await opens(user, winner)).toBe(true);
    expect((await lettersTo(user.email)).filter(({ template }) => template === 'password-changed')).toHaveLength(1);
  });

  test('does not work after twenty minutes, nor with an older link than the newest', async () => {
    const user = await buildUserWithPassword();
    const older = await linkFor(user);
    const newer = await linkFor(user);
    await expect(setNewPassword(contextOf(null), { token: older, password: OTHER_PASSWORD })).rejects.toMatchObject({ code: 'GONE' });
    const late = contextOf(null);
    late.clock.set(new Date(late.clock.now().getTime() + 20 * MINUTE_MS));
    await expect(setNewPassword(late, { token: newer, password: OTHER_PASSWORD })).rejects.toMatchObject({ code: 'GONE' });
    expect(await opens(user, GOOD_PASSWORD)).toBe(true);
  });

  test('does not work with a link that confirms an address', async () => {
    const user = await buildUserWithPassword();
    const token = await linkFor(user);
    await EmailToken.update({ purpose: 'confirm-address' }, { where: {} });
    await expect(setNewPassword(contextOf(null), { token, password: OTHER_PASSWORD })).rejects.toMatchObject({ code: 'GONE' });
  });

  test('refuses a bad password at its field, and the link is still good', async () => {
    const user = await buildUserWithPassword();
    const token = await linkFor(user);
    await expect(setNewPassword(contextOf(null), { token, password: 'kettle' })).rejects.toMatchObject({ code: 'VALIDATION' });
    await expect(setNewPassword(contextOf(null), { token, password: OTHER_PASSWORD })).resolves.toBeUndefined();
  });

  test('asks a steward for fifteen characters', async () => {
    const user = await buildUserWithPassword({ isSteward: true });
    await expect(setNewPassword(contextOf(null), { token: await linkFor(user), password: 'k4vq-zzp2-tm' })).rejects.toMatchObject({ fields: { password: expect.stringContaining('At least 15') } });
  });

  test('confirms the address it came to', async () => {
    const user = await buildUserWithPassword({ emailConfirmedAt: null });
    await setNewPassword(contextOf(null), { token: await linkFor(user), password: OTHER_PASSWORD });
    await user.reload();
    expect(user.emailConfirmedAt).not.toBeNull();
  });
});

test('links that have ended are forgotten, others are kept', async () => {
  const [early, late] = [await buildUserWithPassword(), await buildUserWithPassword()];
  await linkFor(early);
  const ctx = contextOf(null);
  ctx.clock.set(new Date(ctx.clock.now().getTime() + 21 * MINUTE_MS));
  await linkFor(late, ctx);
  await forgetOldLinks(ctx);
  expect((await EmailToken.findAll()).map(({ userId }) => userId)).toEqual([late.id]);
});

describe('changing the password', () => {
  test('with the old one gives a new session and ends all others', async () => {
    const user = await buildUserWithPassword();
    const now = new Date();
    const { token: old } = await beginSession(user.id, 'student', '', now);
    const { token } = await changePassword({ ...(await contextFor(user)), actor: await actorOfToken(old), clock: { now: () => now } }, { oldPassword: GOOD_PASSWORD, password: OTHER_PASSWORD }, 'a browser');
    expect(await actorOfToken(old)).toBeNull();
    expect(await actorOfToken(token)).toMatchObject({ userId: user.id });
    expect(await opens(user, OTHER_PASSWORD)).toBe(true);
    expect((await lettersTo(user.email)).map(({ template }) => template)).toEqual(['password-changed']);
  });

  test('makes a link that was asked for useless', async () => {
    const user = await buildUserWithPassword();
    const token = await linkFor(user);
    await changePassword(await contextFor(user), { oldPassword: GOOD_PASSWORD, password: OTHER_PASSWORD }, '');
    await expect(setNewPassword(contextOf(null), { token, password: GOOD_PASSWORD })).rejects.toMatchObject({ code: 'GONE' });
  });

  test.each([
    ['a wrong old one', { oldPassword: 'wrong wrong wrong', password: OTHER_PASSWORD }, 'oldPassword'],
    ['the same one again', { oldPassword: GOOD_PASSWORD, password: GOOD_PASSWORD }, 'password'],
    ['a short one', { oldPassword: GOOD_PASSWORD, password: 'kettle' }, 'password'],
  ])('with %s is refused at its field, and nothing changes', async (_what, input, field) => {
    const user = await buildUserWithPassword();
    await expect(changePassword(await contextFor(user), input, '')).rejects.toMatchObject({ code: 'VALIDATION', fields: { [field]: expect.any(String) } });
    expect(await opens(user, GOOD_PASSWORD)).toBe(true);
    expect(await Mail.count()).toBe(0);
  });

  test('is not for visitors, and guessing at the old one ends after ten tries', async () => {
    await expect(changePassword(contextOf(null), { oldPassword: GOOD_PASSWORD, password: OTHER_PASSWORD }, '')).rejects.toMatchObject({ code: 'UNAUTHENTICATED' });
    const ctx = await contextFor(await buildUserWithPassword());
    for (let n = 0; n < 10; n += 1) await changePassword(ctx, { oldPassword: 'wrong', password: OTHER_PASSWORD }, '').catch(() => undefined);
    await expect(changePassword(ctx, { oldPassword: GOOD_PASSWORD, password: OTHER_PASSWORD }, '')).rejects.toMatchObject({ code: 'RATE_LIMITED' });
  });
});

describe('proving oneself', () => {
  test('replaces the session by one that was just proved', async () => {
    const user = await buildUserWithPassword();
    const now = new Date();
    const { token: old } = await beginSession(user.id, 'student', '', new Date(now.getTime() - 60 * MINUTE_MS));
    const actor = await actorOfToken(old);
    const { token } = await proveSelf({ ...contextOf(actor), clock: { now: () => now } }, { password: GOOD_PASSWORD }, '');
    expect(await actorOfToken(old)).toBeNull();
    expect((await actorOfToken(token))?.provedAt).toEqual(now);
  });

  test('with a wrong password is refused, and the session stays', async () => {
    const ctx = await contextFor(await buildUserWithPassword());
    await expect(proveSelf(ctx, { password: 'wrong' }, '')).rejects.toMatchObject({ fields: { password: expect.any(String) } });
    await expect(proveSelf(contextOf(null), { password: 'wrong' }, '')).rejects.toMatchObject({ code: 'UNAUTHENTICATED' });
  });
});

test('no password and no token is written anywhere but a token in its own letter', async () => {
  const user = await buildUserWithPassword();
  const token = await linkFor(user);
  await setNewPassword(contextOf(null), { token, password: OTHER_PASSWORD });
  await changePassword(await contextFor(await buildUser({ passwordHash: user.passwordHash })), { oldPassword: 'wrong', password: GOOD_PASSWORD }, '').catch(() => undefined);
  const rows = JSON.stringify([await Job.findAll(), await AuditEntry.findAll(), await Session.findAll(), await EmailToken.findAll(), await Mail.findAll({ where: { template: 'password-changed' } })]);
  for (const secret of [token, GOOD_PASSWORD, OTHER_PASSWORD, 'wrong']) expect(rows).not.toContain(secret);
  expect(JSON.stringify(await Mail.findAll({ where: { template: 'new-password' } }))).toContain(token);
});
