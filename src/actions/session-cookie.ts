/** The cookie of a session that an action began. */
import type { ActionAPIContext } from 'astro:actions';
import { sessionCookie, type Begun } from '#server/auth/sessions.ts';

/** `stay` keeps the cookie until the session's end; else it goes when the browser is closed. */
export function giveSession(api: ActionAPIContext, { token, endsAt }: Begun, stay: boolean): void {
  const { name, options } = sessionCookie();
  api.cookies.set(name, token, { ...options, ...(stay ? { expires: endsAt } : {}) });
}

export const agentOf = (api: ActionAPIContext): string => api.request.headers.get('user-agent') ?? '';
