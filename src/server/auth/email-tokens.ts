/**
 * Links sent by mail. The link holds 32 random bytes; the table holds their hash, whose they are and for which address.
 * Only the newest of a kind works, once.
 */
import { hashToken, newToken } from '#server/auth/sessions.ts';
import { EmailToken } from '#server/models/index.ts';

export type TokenPurpose = EmailToken['purpose'];

export const TOKEN_MINUTES: Readonly<Record<TokenPurpose, number>> = { 'confirm-address': 24 * 60, 'new-password': 20 };

export interface IssuedToken {
  readonly token: string;
  readonly expiresAt: Date;
}

/** A new link for a person; older ones of the same kind stop working. Part of the caller's transaction. */
export async function issueToken(person: { readonly id: number; readonly email: string }, purpose: TokenPurpose, now: Date): Promise<IssuedToken> {
  const token = newToken();
  const expiresAt = new Date(now.getTime() + TOKEN_MINUTES[purpose] * 60_000);
  await EmailToken.destroy({ where: { userId: person.id, purpose } });
  await EmailToken.create({ tokenHash: hashToken(token), userId: person.id, purpose, address: person.email, expiresAt });
  return { token, expiresAt };
}

/** Whose link it is, without using it; null when it is unknown, used or too old. */
export async function readToken(token: string, purpose: TokenPurpose, now: Date): Promise<EmailToken | null> {
  const row = await EmailToken.findByPk(hashToken(token));
  return row !== null && row.purpose === purpose && row.expiresAt > now ? row : null;
}

/** Uses a link. Of many that come at once exactly one gets `true`: the database deletes a row once. */
export async function spendToken(row: EmailToken): Promise<boolean> {
  return (await EmailToken.destroy({ where: { tokenHash: row.tokenHash } })) === 1;
}
