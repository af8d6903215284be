import { beforeEach, describe, expect, test } from 'vitest';
import type { DatabaseSession } from 'lucia';
import { lucia, sessionAdapter } from '#server/auth/lucia.ts';
import { actorOfToken, beginSession, hashToken, LIFETIMES } from '#server/auth/sessions.ts';
import { statementListeners } from '#server/db/sequelize.ts';
import { Session, WorkroomHelper, type User } from '#server/models/index.ts';
import { buildUser, buildWorkroom } from '../../support/factories.ts';

const DAY_MS = 86_400_000;
const IDLE_SECONDS = 3_600;
let user: User;
const soon = (ms: number): Date => new Date(Date.now() + ms);

function session(id: string, given: Partial<DatabaseSession> = {}): DatabaseSession {
  return { id: id.repeat(64), userId: user.id, expiresAt: soon(30 * 60_000), attributes: { endsAt: soon(DAY_MS), idleSeconds: IDLE_SECONDS, provedAt: soon(0), device: 'a browser' }, ...given };
}

beforeEach(async () => {
  user = await buildUser({ name: 'Maud Ellery' });
});

describe('the store that Lucia keeps sessions in', () => {
  test('gives nothing for a session that is not there', async () => {
    expect(await sessionAdapter.getSessionAndUser('x'.repeat(64))).toEqual([null, null]);
  });

  test('gives back a session as it was kept, with its person', async () => {
    const kept = session('a');
    await sessionAdapter.setSession(kept);
    const [found, person] = await sessionAdapter.getSessionAndUser(kept.id);
    expect(found).toEqual(kept);
    expect(person).toEqual({
      id: user.id,
      attributes: { publicId: user.publicId, name: 'Maud Ellery', email: user.email, addressConfirmed: true, addressRefused: false, isSteward: false, workroomId: null, workroomName: null, helpsInWorkroomIds: [], units: 'cm', timeZone: 'UTC', scheme: 'system', unreadNotices: 0 },
    });
  });

  test('gives all sessions of one person, and none of another', async () => {
    const other = await buildUser();
    for (const kept of [session('a'), session('b'), session('c', { userId: other.id })]) await sessionAdapter.setSession(kept);
    expect((await sessionAdapter.getUserSessions(user.id)).map(({ id }) => id.charAt(0)).sort()).toEqual(['a', 'b']);
  });

  test('moves the end of a session on, by its own idle time', async () => {
    await sessionAdapter.setSession(session('a', { expiresAt: soon(60_000) }));
    await sessionAdapter.updateSessionExpiration('a'.repeat(64), soon(60 * DAY_MS));
    const [found] = await sessionAdapter.getSessionAndUser('a'.repeat(64));
    expect(Math.abs((found?.expiresAt.getTime() ?? 0) - soon(IDLE_SECONDS * 1_000).getTime())).toBeLessThan(5_000);
  });

  test('deletes one session, all of a person, or what has run out', async () => {
    const old = session('d', { expiresAt: new Date(Date.now() - 1_000) });
    for (const kept of [session('a'), session('b'), old]) await sessionAdapter.setSession(kept);
    const left = async (): Promise<string[]> => (await Session.findAll()).map(({ id }) => id.charAt(0)).sort();
    await sessionAdapter.deleteExpiredSessions();
    expect(await left()).toEqual(['a', 'b']);
    await sessionAdapter.deleteSession('a'.repeat(64));
    expect(await left()).toEqual(['b']);
    await sessionAdapter.deleteUserSessions(user.id);
    expect(await left()).toEqual([]);
    await expect(sessionAdapter.deleteSession('a'.repeat(64))).resolves.toBeUndefined();
  });
});

describe('a session', () => {
  test('never slides past its end, however often it is used', async () => {
    const endsAt = soon(20 * 60_000);
    await sessionAdapter.setSession(session('a', { expiresAt: soon(60_000), attributes: { ...session('a').attributes, endsAt } }));
    await lucia.validateSession('a'.repeat(64));
    expect((await Session.findByPk('a'.repeat(64)))?.expiresAt).toEqual(endsAt);
  });

  test('is written to at most once in a tenth of its idle time', async () => {
    await sessionAdapter.setSession(session('a', { expiresAt: soon(IDLE_SECONDS * 1_000) }));
    const before = (await Session.findByPk('a'.repeat(64)))?.expiresAt;
    await lucia.validateSession('a'.repeat(64));
    expect((await Session.findByPk('a'.repeat(64)))?.expiresAt).toEqual(before);
  });

  test('that was not used for its idle time is over, and so is one past its end', async () => {
    const { token } = await beginSession(user.id, 'trusted', '', new Date());
    await Session.update({ expiresAt: new Date(Date.now() - 1) }, { where: {} });
    expect(await actorOfToken(token)).toBeNull();
    const long = await beginSession(user.id, 'student', '', new Date(Date.now() - LIFETIMES.student.wholeSeconds * 1_000 - 1));
    expect(long.endsAt.getTime()).toBeLessThan(Date.now());
    expect(await actorOfToken(long.token)).toBeNull();
  });

  test('is found by its token alone, never by what stands in the table', async () => {
    const { token } = await beginSession(user.id, 'student', '', new Date());
    expect(await actorOfToken(hashToken(token))).toBeNull();
    for (const forged of [undefined, '', 'x', `${token}x`, token.toUpperCase(), `${token.slice(0, -1)} `, "' OR '1'='1"]) expect(await actorOfToken(forged)).toBeNull();
    expect(await actorOfToken(token)).not.toBeNull();
  });

  test('knows the roles of its person as they are now, in one statement a request', async () => {
    const { token } = await beginSession(user.id, 'student', '', new Date());
    const own = await buildWorkroom({ ownerId: user.id });
    const others = [await buildWorkroom(), await buildWorkroom()];
    for (const { id } of others) await WorkroomHelper.create({ workroomId: id, userId: user.id });
    await user.update({ isSteward: true });
    const statements: string[] = [];
    const listen = (sql: string): void => { statements.push(sql); };
    statementListeners.add(listen);
    const actor = await actorOfToken(token);
    statementListeners.delete(listen);
    expect(actor).toMatchObject({ isSteward: true, workroomId: own.id, helpsInWorkroomIds: others.map(({ id }) => id) });
    expect(statements.filter((sql) => sql.includes('SELECT'))).toHaveLength(1);
  });
});
