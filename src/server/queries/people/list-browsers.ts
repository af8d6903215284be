import { browserWords } from '#core/browser-words.ts';
import type { Actor } from '#server/context.ts';
import { Session } from '#server/models/index.ts';

export interface SignedInBrowser {
  /** Hash of its token: names it in a form, opens nothing. */
  readonly session: string;
  readonly name: string;
  readonly since: Date;
  /** True within a tenth of the session's idle time. */
  readonly lastUsed: Date;
  readonly isThisOne: boolean;
}

/** The browsers in which `actor` is signed in now: this one first, then the one used last. */
export async function listBrowsers(actor: Actor, now: Date): Promise<SignedInBrowser[]> {
  const sessions = await Session.findAll({ where: { userId: actor.userId }, order: [['expiresAt', 'DESC']] });
  const browsers = sessions
    .filter(({ expiresAt }) => expiresAt > now)
    .map(({ id, device, createdAt, expiresAt, idleSeconds }): SignedInBrowser => ({
      session: id,
      name: browserWords(device),
      since: createdAt,
      lastUsed: new Date(Math.max(createdAt.getTime(), expiresAt.getTime() - idleSeconds * 1_000)),
      isThisOne: id === actor.sessionId,
    }));
  return [...browsers.filter(({ isThisOne }) => isThisOne), ...browsers.filter(({ isThisOne }) => !isThisOne)];
}
