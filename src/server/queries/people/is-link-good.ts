import { readToken, type TokenPurpose } from '#server/auth/email-tokens.ts';

/** Whether a link sent by mail still works. Looking does not use it: programs that check mail follow links too. */
export async function isLinkGood(token: string | undefined, purpose: TokenPurpose, now: Date): Promise<boolean> {
  return token !== undefined && (await readToken(token, purpose, now)) !== null;
}
