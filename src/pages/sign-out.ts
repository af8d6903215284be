import type { APIRoute } from 'astro';
import { sessionCookie } from '#server/auth/sessions.ts';
import { signOut } from '#server/use-cases/people/sign-out.ts';
import { saidCookie } from '#server/web/said.ts';

/** Signs out. The browser forgets what it kept of pages, so that Back shows none of hers. */
export const POST: APIRoute = async ({ locals, cookies, redirect }) => {
  await signOut(locals.ctx);
  cookies.delete(sessionCookie().name, { path: '/' });
  const said = saidCookie();
  cookies.set(said.name, 'Signed out.', said.options);
  const response = redirect('/sign-in', 303);
  response.headers.set('Clear-Site-Data', '"cache"');
  return response;
};

/** Looking at an address changes nothing; the button in the menu does. */
export const GET: APIRoute = ({ redirect }) => redirect('/account', 303);
