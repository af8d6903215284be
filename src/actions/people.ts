import type { ActionAPIContext } from 'astro:actions';
import { SignInForm } from '#contracts/people.ts';
import { sessionCookie, type Begun } from '#server/auth/sessions.ts';
import { signIn } from '#server/use-cases/people/sign-in.ts';
import { safeReturn } from '#server/web/gate.ts';
import { formAction } from './form-action.ts';

function giveCookie(api: ActionAPIContext, { token, endsAt }: Begun): void {
  const { name, options } = sessionCookie();
  api.cookies.set(name, token, { ...options, expires: endsAt });
}

export const people = {
  signIn: formAction(SignInForm, async (input, ctx, api) => {
    giveCookie(api, await signIn(ctx, input, api.request.headers.get('user-agent') ?? ''));
    return { to: safeReturn(input.to, '/loom') };
  }),
};
