import { describe, expect, test } from 'vitest';
import { AccountForm } from '#contracts/people.ts';
import { actorOfToken, beginSession, hashToken } from '#server/auth/sessions.ts';
import { requireProof } from '#server/auth/step-up.ts';
import { User } from '#server/models/index.ts';
import { mayBuy, mayPost } from '#server/policies/person.ts';
import { endOneSession } from '#server/use-cases/people/end-one-session.ts';
import { endOtherSessions } from '#server/use-cases/people/end-other-sessions.ts';
import { updateAccount } from '#server/use-cases/people/update-account.ts';
import { actorOf, contextFor, contextOf } from '../../support/context.ts';
import { buildUser } from '../../support/factories.ts';

const NOW = new Date();

describe('the account', () => {
  test('keeps name, units, light and time zone of the person who asks, and of nobody else', async () => {
    const [maud, jonas] = [await buildUser(), await buildUser({ name: 'Jonas Pike' })];
    await updateAccount(await contextFor(maud), { name: 'Maud', units: 'in', scheme: 'dark', timeZone: 'Europe/Berlin' });
    await Promise.all([maud.reload(), jonas.reload()]);
    expect(maud).toMatchObject({ name: 'Maud', units: 'in', scheme: 'dark', timeZone: 'Europe/Berlin' });
    expect(jonas).toMatchObject({ name: 'Jonas Pike', units: 'cm' });
  });

  test('takes nothing else from its form: no role, no address, no confirmation', async () => {
    const maud = await buildUser({ emailConfirmedAt: null });
    const posted = { name: 'Maud', units: 'cm', scheme: 'system', timeZone: 'UTC', isSteward: '1', is_steward: '1', email: 'other@weavers.example', emailConfirmedAt: '2026-01-01', id: '1', suspendedAt: '' };
    await updateAccount(await contextFor(maud), AccountForm.parse(posted));
    await maud.reload();
    expect(maud).toMatchObject({ isSteward: false, email: maud.email, emailConfirmedAt: null });
    expect(await User.count()).toBe(1);
  });

  test('is not for visitors', async () => {
    await expect(updateAccount(contextOf(null), { name: 'X', units: 'cm', scheme: 'light', timeZone: 'UTC' })).rejects.toMatchObject({ code: 'UNAUTHENTICATED' });
  });
});

describe('signed-in browsers', () => {
  test('are signed out one by one, or all others at once', async () => {
    const maud = await buildUser();
    const tokens = [];
    for (let n = 0; n < 4; n += 1) tokens.push((await beginSession(maud.id, 'student', `browser ${n}`, NOW)).token);
    const [mine = '', second = '', ...others] = tokens;
    const ctx = contextOf(await actorOfToken(mine));
    expect(await endOneSession(ctx, hashToken(second))).toBe(false);
    expect(await actorOfToken(second)).toBeNull();
    expect(await endOtherSessions(ctx)).toBe(2);
    for (const token of others) expect(await actorOfToken(token)).toBeNull();
    expect(await actorOfToken(mine)).not.toBeNull();
    expect(await endOneSession(ctx, hashToken(mine))).toBe(true);
  });

  test('of another person cannot be signed out: there is nothing there', async () => {
    const { token } = await beginSession((await buildUser()).id, 'student', '', NOW);
    const stranger = await contextFor(await buildUser());
    await expect(endOneSession(stranger, hashToken(token))).rejects.toMatchObject({ code: 'NOT_FOUND' });
    await expect(endOneSession(stranger, '')).rejects.toMatchObject({ code: 'NOT_FOUND' });
    await endOtherSessions(stranger);
    expect(await actorOfToken(token)).not.toBeNull();
  });
});

describe('an unconfirmed address', () => {
  test('may neither buy nor post; a confirmed one may; a visitor may not', async () => {
    const unconfirmed = await actorOf(await buildUser({ emailConfirmedAt: null }));
    const confirmed = await actorOf(await buildUser());
    expect([unconfirmed, confirmed, null].map((actor) => [mayBuy(actor), mayPost(actor)])).toEqual([[false, false], [true, true], [false, false]]);
  });
});

describe('a proof of oneself', () => {
  test('holds for ten minutes', async () => {
    const ctx = await contextFor(await buildUser());
    const proved = ctx.actor?.provedAt.getTime() ?? 0;
    ctx.clock.set(new Date(proved + 10 * 60_000));
    expect(requireProof(ctx)).toBe(ctx.actor);
    expect(() => requireProof(ctx, 5)).toThrow(expect.objectContaining({ code: 'PROOF_NEEDED' }));
    ctx.clock.set(new Date(proved + 10 * 60_000 + 1));
    expect(() => requireProof(ctx)).toThrow(expect.objectContaining({ code: 'PROOF_NEEDED' }));
  });

  test('is asked of nobody who is not signed in', () => {
    expect(() => requireProof(contextOf(null))).toThrow(expect.objectContaining({ code: 'UNAUTHENTICATED' }));
  });
});
