import { UniqueConstraintError } from 'sequelize';
import type { SignUpInput } from '#contracts/people.ts';
import { issueToken } from '#server/auth/email-tokens.ts';
import { mustBeGoodPassword } from '#server/auth/new-passwords.ts';
import { hashPassword } from '#server/auth/passwords.ts';
import type { Context } from '#server/context.ts';
import { newPublicId } from '#server/db/public-id.ts';
import { withTransaction } from '#server/db/transaction.ts';
import { postLetter } from '#server/mail/outbox.ts';
import { User } from '#server/models/index.ts';
import { countUse, networkOf, noteUse, RATE_RULES } from '#server/web/rate-limit.ts';

/**
 * Opens an account and sends a link to confirm its address. Whether the address has an account already is never told to
 * whoever asks, only to its owner, by mail.
 * @throws VALIDATION at `password`; RATE_LIMITED.
 */
export async function signUp(ctx: Context, input: Omit<SignUpInput, 'to'>): Promise<void> {
  await countUse(RATE_RULES.signUp, networkOf(ctx.ip));
  const { address, key } = input.email;
  mustBeGoodPassword(input.password, { name: input.name, email: address, isSteward: false });
  // Hashed in any case, so that a taken address takes as long as a free one.
  const passwordHash = await hashPassword(input.password);
  const mayWrite = (await noteUse(RATE_RULES.letterToAddress, `sign-up ${key}`)).within;
  await withTransaction(async () => {
    const made = await createUnlessTaken({ email: address, emailKey: key, name: input.name, passwordHash, ...(input.timeZone !== undefined && { timeZone: input.timeZone }) });
    if (!mayWrite) return;
    if (made === null) await tellOwner(key);
    else await askToConfirm(made, ctx.clock.now());
  });
}

async function createUnlessTaken(person: Pick<User, 'email' | 'emailKey' | 'name' | 'passwordHash'> & { readonly timeZone?: string }): Promise<User | null> {
  try {
    return await User.create(person);
  } catch (error) {
    if (error instanceof UniqueConstraintError) return null;
    throw error;
  }
}

async function tellOwner(emailKey: string): Promise<void> {
  const owner = await User.findOne({ where: { emailKey } });
  if (owner === null || owner.suspendedAt !== null) return;
  await postLetter({ template: 'account-exists', data: {}, to: { userId: owner.id, name: owner.name, address: owner.email }, dedupeKey: `account-exists:${newPublicId()}` });
}

async function askToConfirm(user: User, now: Date): Promise<void> {
  const { token, expiresAt } = await issueToken(user, 'confirm-address', now);
  await postLetter({
    template: 'confirm-address',
    data: { token },
    to: { userId: user.id, name: user.name, address: user.email },
    dedupeKey: `confirm-address:${newPublicId()}`,
    expiresAt,
  });
}
