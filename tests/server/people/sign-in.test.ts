import { hash } from '@node-rs/argon2';
import { describe, expect, test } from 'vitest';
import { hashPassword, needsRehash } from '#server/auth/passwords.ts';
import { actorOfToken, beginSession, hashToken } from '#server/auth/sessions.ts';
import { markKnown } from '#server/auth/known-device.ts';
import { Session, type User } from '#server/models/index.ts';
import { signIn } from '#server/use-cases/people/sign-in.ts';
import { signOut } from '#server/use-cases/people/sign-out.ts';
import { noteUse, RATE_RULES } from '#server/web/rate-limit.ts';
import { contextOf, type TestContext } from '../../support/context.ts';
import { buildUser, buildWorkroom } from '../../support/factories.ts';
import { addressOf, buildUserWithPassword, GOOD_PASSWORD } from '../../support/people.ts';

const NOW = new Date();
const from = (ip: string): TestContext => ({ ...contextOf(null, {}, NOW), ip });
const here = (): TestContext => from('192.0.2.1');
const browser = { agent: 'a browser' };
const with_ = (user: User, password = GOOD_PASSWORD) => ({ email: addressOf(user.email), password });

describe('signing in', () => {
  test('gives a session whose token opens the account, and keeps its hash only', async () => {
    const user = await buildUserWithPassword();
    const { token } = await signIn(here(), with_(user), browser);
    expect(await actorOfToken(token)).toMatchObject({ userId: user.id, name: user.name, isSteward: false, workroomId: null });
    expect((await Session.findAll()).map(({ id }) => id)).toEqual([hashToken(token)]);
  });

  test('takes the address however it is written', async () => {
    const user = await buildUserWithPassword({ email: 'maud@weavers.example', emailKey: 'maud@weavers.example' });
    const { token } = await signIn(here(), { email: addressOf(' MAUD@Weavers.Example '), password: GOOD_PASSWORD }, browser);
    expect(await actorOfToken(token)).toMatchObject({ userId: user.id });
  });

  test('takes a password typed with the same letters put together differently', async () => {
    const user = await buildUserWithPassword({ passwordHash: await hashPassword('Flüsse und Webkämme') });
    await expect(signIn(here(), with_(user, 'Flüsse und Webkämme'.normalize('NFD')), browser)).resolves.toBeDefined();
  });

  test('says the same for a wrong password, an unknown address, an account without a password and a suspended one', async () => {
    const user = await buildUserWithPassword();
    const suspended = await buildUserWithPassword({ suspendedAt: NOW });
    const tries = [with_(user, 'wrong wrong wrong'), { email: addressOf('nobody@weavers.example'), password: GOOD_PASSWORD }, with_(await buildUser()), with_(suspended)];
    for (const input of tries) {
      await expect(signIn(here(), input, browser)).rejects.toMatchObject({
        code: 'VALIDATION', fields: { password: 'Address and password do not belong together. Try again, or have a link sent.' },
      });
    }
    expect(await Session.count()).toBe(0);
  });

  test('ends the session this browser had, and never uses a token that was planted', async () => {
    const user = await buildUserWithPassword();
    const { token: planted } = await beginSession((await buildUser()).id, 'student', '', NOW);
    const ctx = { ...here(), actor: await actorOfToken(planted) };
    const { token } = await signIn(ctx, with_(user), browser);
    expect(token).not.toBe(planted);
    expect(await actorOfToken(planted)).toBeNull();
  });

  test('lasts two weeks unused for a student, an hour for whoever opens other people’s things', async () => {
    const student = await buildUserWithPassword();
    const teacher = await buildUserWithPassword();
    await buildWorkroom({ ownerId: teacher.id });
    const steward = await buildUserWithPassword({ isSteward: true });
    for (const user of [student, teacher, steward]) await signIn(here(), with_(user), browser);
    const idle = new Map((await Session.findAll()).map(({ userId, idleSeconds }) => [userId, idleSeconds]));
    expect([student, teacher, steward].map(({ id }) => idle.get(id))).toEqual([14 * 86_400, 3_600, 3_600]);
  });

  test('renews a hash made with older numbers', async () => {
    const user = await buildUserWithPassword();
    const { createHmac } = await import('node:crypto');
    const { config } = await import('#server/config.ts');
    const peppered = createHmac('sha256', config().secret).update(GOOD_PASSWORD).digest('base64');
    await user.update({ passwordHash: await hash(peppered, { memoryCost: 8_192, timeCost: 2, parallelism: 1 }) });
    await signIn(here(), with_(user), browser);
    await user.reload();
    expect(needsRehash(user.passwordHash ?? '')).toBe(false);
    await expect(signIn(here(), with_(user), browser)).resolves.toBeDefined();
  });

  test('takes as long for an unknown address as for a known one', async () => {
    const user = await buildUserWithPassword();
    const took = async (input: ReturnType<typeof with_>, ip: string): Promise<number> => {
      const start = performance.now();
      await signIn(from(ip), input, browser).catch(() => undefined);
      return performance.now() - start;
    };
    const known: number[] = [];
    const unknown: number[] = [];
    for (let n = 0; n < 40; n += 1) {
      known.push(await took(with_(user, 'wrong wrong wrong'), `10.0.${n}.1`));
      unknown.push(await took({ email: addressOf('nobody@weavers.example'), password: 'wrong wrong wrong' }, `10.1.${n}.1`));
    }
    // Without the hash against nothing the unknown one would take less than a fifth.
    expect(Math.abs(median(known) - median(unknown))).toBeLessThan(Math.max(10, 0.3 * median(known)));
  });
});

describe('guessing at a password', () => {
  const fail = (ctx: TestContext, user: User): Promise<unknown> => signIn(ctx, with_(user, 'wrong wrong wrong'), browser).catch((error: unknown) => error);

  test('must wait after five tries, and longer each time', async () => {
    const user = await buildUserWithPassword();
    for (let n = 0; n < 5; n += 1) expect(await fail(here(), user)).toMatchObject({ code: 'VALIDATION' });
    expect(await fail(here(), user)).toMatchObject({ code: 'VALIDATION' });
    const refused = await fail(here(), user);
    expect(refused).toMatchObject({ code: 'RATE_LIMITED', says: expect.stringMatching(/^Some tries did not fit\. Wait \d+ seconds?, then try again\.$/) });
  });

  test('is not helped by trying many at once', async () => {
    const user = await buildUserWithPassword();
    const answers = await Promise.all(Array.from({ length: 25 }, () => fail(here(), user)));
    expect(answers.filter((answer) => (answer as { code: string }).code === 'VALIDATION').length).toBeLessThanOrEqual(6);
  });

  test('at many accounts from one network ends after thirty an hour', async () => {
    for (let n = 0; n < 30; n += 1) await signIn(here(), { email: addressOf(`m${n}@weavers.example`), password: 'wrong wrong wrong' }, browser).catch(() => undefined);
    await expect(signIn(here(), { email: addressOf('m31@weavers.example'), password: 'wrong wrong wrong' }, browser)).rejects.toMatchObject({ code: 'RATE_LIMITED' });
  });

  test('from fifty networks stops after a hundred in a row, but never the owner in a browser she used before', async () => {
    const user = await buildUserWithPassword();
    const { mark } = await signIn(here(), with_(user), browser);
    for (let n = 0; n < 100; n += 1) await fail(from(`10.0.${n % 50}.9`), user);
    // Even the right password is not tried from elsewhere.
    await expect(signIn(from('10.9.9.9'), with_(user), browser)).rejects.toMatchObject({ code: 'RATE_LIMITED' });
    await expect(signIn(from('10.0.1.9'), with_(user), { ...browser, mark })).resolves.toBeDefined();
  }, 60_000);

  test('is slowed even with a mark of another account, a forged one or an old one', async () => {
    const user = await buildUserWithPassword();
    const good = markKnown(user.emailKey, NOW);
    const marks = [markKnown('other@weavers.example', NOW), `${good.slice(0, -1)}${good.endsWith('A') ? 'B' : 'A'}`, markKnown(user.emailKey, new Date(NOW.getTime() - 366 * 86_400_000)), 'x'];
    for (let n = 0; n <= RATE_RULES.signInInARow.limit; n += 1) await noteUse(RATE_RULES.signInInARow, user.emailKey);
    for (const mark of marks) await expect(signIn(from('10.7.7.7'), with_(user), { ...browser, mark }), mark).rejects.toMatchObject({ code: 'RATE_LIMITED' });
  });

  test('by many people who do know their passwords is no guessing', async () => {
    const user = await buildUserWithPassword();
    for (let n = 0; n < 35; n += 1) await signIn(here(), with_(user), browser);
    expect(await Session.count()).toBe(35);
  });
});

describe('signing out', () => {
  test('ends the session, and no other', async () => {
    const user = await buildUserWithPassword();
    const first = await signIn(here(), with_(user), browser);
    const second = await signIn(here(), with_(user), browser);
    await signOut({ ...here(), actor: await actorOfToken(first.token) });
    expect(await actorOfToken(first.token)).toBeNull();
    expect(await actorOfToken(second.token)).not.toBeNull();
  });

  test('of somebody who is signed out already does nothing', async () => {
    await expect(signOut(here())).resolves.toBeUndefined();
  });

  test('happens to a suspended person at once', async () => {
    const user = await buildUserWithPassword();
    const { token } = await signIn(here(), with_(user), browser);
    await user.update({ suspendedAt: NOW });
    expect(await actorOfToken(token)).toBeNull();
  });
});


function median(numbers: number[]): number {
  return [...numbers].sort((a, b) => a - b)[Math.floor(numbers.length / 2)] ?? 0;
}
