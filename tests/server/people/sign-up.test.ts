import { describe, expect, test } from 'vitest';
import { passwordFits } from '#server/auth/passwords.ts';
import { EmailToken, User } from '#server/models/index.ts';
import { confirmAddress } from '#server/use-cases/people/confirm-address.ts';
import { resendConfirmation } from '#server/use-cases/people/resend-confirmation.ts';
import { signUp } from '#server/use-cases/people/sign-up.ts';
import { contextFor, contextOf } from '../../support/context.ts';
import { buildUser } from '../../support/factories.ts';
import { addressOf, GOOD_PASSWORD, lettersTo, tokenIn } from '../../support/people.ts';

const maud = { name: 'Maud Ellery', email: addressOf('Maud@Weavers.example'), password: GOOD_PASSWORD };
const DAY_MS = 86_400_000;

describe('opening an account', () => {
  test('keeps the name, the address as typed and a hash of the password, and sends a link', async () => {
    await signUp(contextOf(null), maud);
    const user = await User.findOne({ where: { emailKey: 'maud@weavers.example' }, rejectOnEmpty: true });
    expect(user).toMatchObject({ name: 'Maud Ellery', email: 'Maud@weavers.example', emailConfirmedAt: null, isSteward: false });
    expect(await passwordFits(GOOD_PASSWORD, user.passwordHash)).toBe(true);
    const letters = await lettersTo('Maud@weavers.example');
    expect(letters.map(({ template }) => template)).toEqual(['confirm-address']);
  });

  test('keeps the time zone of her browser, and the house’s own where none was told', async () => {
    await signUp(contextOf(null), { ...maud, timeZone: 'America/New_York' });
    await signUp(contextOf(null), { ...maud, email: addressOf('ada@weavers.example') });
    const zones = await User.findAll({ order: [['id', 'ASC']] });
    expect(zones.map(({ timeZone }) => timeZone)).toEqual(['America/New_York', 'UTC']);
  });

  test('keeps the token of the link as a hash only', async () => {
    await signUp(contextOf(null), maud);
    const token = await tokenIn('confirm-address', 'Maud@weavers.example');
    expect(token).toMatch(/^[A-Za-z0-9_-]{43}$/);
    expect((await EmailToken.findAll()).map(({ tokenHash }) => tokenHash)).not.toContain(token);
  });

  test.each([
    ['too short', 'kettle'],
    ['common', 'qwertyuiop123'],
    ['made of her own name', 'maudellery1999'],
  ])('with a password that is %s is refused at its field, and nothing is written', async (_what, password) => {
    await expect(signUp(contextOf(null), { ...maud, password })).rejects.toMatchObject({ code: 'VALIDATION', fields: { password: expect.any(String) } });
    expect(await User.count()).toBe(0);
  });

  test('with a taken address answers the same, changes nothing and tells the owner by mail', async () => {
    const owner = await buildUser({ email: 'maud@weavers.example', emailKey: 'maud@weavers.example', name: 'Maud' });
    expect(await signUp(contextOf(null), { ...maud, name: 'Somebody Else' })).toBeUndefined();
    expect(await User.count()).toBe(1);
    await owner.reload();
    expect(owner).toMatchObject({ name: 'Maud', passwordHash: null });
    expect((await lettersTo('maud@weavers.example')).map(({ template }) => template)).toEqual(['account-exists']);
  });

  test('twenty times at once with one address makes one account', async () => {
    const answers = await Promise.allSettled(Array.from({ length: 20 }, () => signUp(contextOf(null), maud)));
    expect(answers.map(({ status }) => status)).not.toContain('rejected');
    expect(await User.count()).toBe(1);
  });

  test('is slowed down for one network, not for another', async () => {
    const flood = { ...contextOf(null), ip: '203.0.113.7' };
    for (let n = 0; n < 60; n += 1) await signUp(flood, { ...maud, email: addressOf(`m${n}@weavers.example`), password: 'short' }).catch(() => undefined);
    await expect(signUp(flood, maud)).rejects.toMatchObject({ code: 'RATE_LIMITED' });
    await expect(signUp({ ...flood, ip: '198.51.100.7' }, maud)).resolves.toBeUndefined();
  });

  test('takes as long with a taken address as with a free one', async () => {
    const took = async (address: string, n: number): Promise<number> => {
      const start = performance.now();
      await signUp({ ...contextOf(null), ip: `10.${n}.0.1` }, { ...maud, email: addressOf(address) });
      return performance.now() - start;
    };
    const free: number[] = [];
    const taken: number[] = [];
    for (let n = 0; n < 25; n += 1) {
      await buildUser({ email: `taken${n}@weavers.example`, emailKey: `taken${n}@weavers.example` });
      free.push(await took(`free${n}@weavers.example`, n));
      taken.push(await took(`taken${n}@weavers.example`, n));
    }
    // Without the hash for a taken address it would take less than half.
    expect(Math.abs(median(free) - median(taken))).toBeLessThan(Math.max(10, 0.35 * median(free)));
  });

  test('again and again with somebody’s address writes her at most five letters an hour', async () => {
    for (let n = 0; n < 8; n += 1) await signUp(contextOf(null), maud);
    expect(await lettersTo('Maud@weavers.example')).toHaveLength(5);
  });
});

describe('confirming an address', () => {
  async function signedUp(): Promise<{ user: User; token: string }> {
    await signUp(contextOf(null), maud);
    const user = await User.findOne({ rejectOnEmpty: true });
    return { user, token: await tokenIn('confirm-address', user.email) };
  }

  test('works once', async () => {
    const { user, token } = await signedUp();
    const ctx = contextOf(null);
    expect(await confirmAddress(ctx, { token })).toBe('Maud@weavers.example');
    await user.reload();
    expect(user.emailConfirmedAt).toEqual(ctx.clock.now());
    await expect(confirmAddress(ctx, { token })).rejects.toMatchObject({ code: 'GONE' });
  });

  test('works for exactly one of twenty who open the link at once', async () => {
    const { token } = await signedUp();
    const answers = await Promise.allSettled(Array.from({ length: 20 }, () => confirmAddress(contextOf(null), { token })));
    expect(answers.filter(({ status }) => status === 'fulfilled')).toHaveLength(1);
  });

  test('does not work with a link older than a day', async () => {
    const { user, token } = await signedUp();
    const ctx = contextOf(null);
    ctx.clock.set(new Date(ctx.clock.now().getTime() + DAY_MS));
    await expect(confirmAddress(ctx, { token })).rejects.toMatchObject({ code: 'GONE' });
    await user.reload();
    expect(user.emailConfirmedAt).toBeNull();
  });

  test('does not confirm an address that is no longer hers', async () => {
    const { user, token } = await signedUp();
    await user.update({ email: 'new@weavers.example', emailKey: 'new@weavers.example' });
    await expect(confirmAddress(contextOf(null), { token })).rejects.toMatchObject({ code: 'GONE' });
    await user.reload();
    expect(user.emailConfirmedAt).toBeNull();
  });

  test.each(['', 'nonsense', 'A'.repeat(43)])('does not work with the token %j', async (token) => {
    await expect(confirmAddress(contextOf(null), { token })).rejects.toMatchObject({ code: 'GONE' });
  });

  test('is asked for again from the account, and the older link stops working', async () => {
    const { user, token } = await signedUp();
    expect(await resendConfirmation(await contextFor(user))).toBe('Maud@weavers.example');
    const newer = await tokenIn('confirm-address', user.email);
    expect(newer).not.toBe(token);
    await expect(confirmAddress(contextOf(null), { token })).rejects.toMatchObject({ code: 'GONE' });
    await expect(confirmAddress(contextOf(null), { token: newer })).resolves.toBe('Maud@weavers.example');
  });

  test('is not asked for again once it is done, nor by a visitor, nor more than five times an hour', async () => {
    const confirmed = await buildUser();
    expect(await resendConfirmation(await contextFor(confirmed))).toBeNull();
    await expect(resendConfirmation(contextOf(null))).rejects.toMatchObject({ code: 'UNAUTHENTICATED' });
    const ctx = await contextFor(await buildUser({ emailConfirmedAt: null }));
    for (let n = 0; n < 5; n += 1) await resendConfirmation(ctx);
    await expect(resendConfirmation(ctx)).rejects.toMatchObject({ code: 'RATE_LIMITED' });
  });
});

function median(numbers: number[]): number {
  return [...numbers].sort((a, b) => a - b)[Math.floor(numbers.length / 2)] ?? 0;
}
