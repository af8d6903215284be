import { AccountForm, ChangePasswordForm, ConfirmForm, EndSessionForm, ForgottenForm, NewPasswordForm, NothingForm, ProveForm, SignInForm, SignUpForm } from '#contracts/people.ts';
import { knownDeviceCookie, sessionCookie } from '#server/auth/sessions.ts';
import { askNewPassword } from '#server/use-cases/people/ask-new-password.ts';
import { changePassword } from '#server/use-cases/people/change-password.ts';
import { confirmAddress } from '#server/use-cases/people/confirm-address.ts';
import { endOneSession } from '#server/use-cases/people/end-one-session.ts';
import { endOtherSessions } from '#server/use-cases/people/end-other-sessions.ts';
import { proveSelf } from '#server/use-cases/people/prove-self.ts';
import { resendConfirmation } from '#server/use-cases/people/resend-confirmation.ts';
import { setNewPassword } from '#server/use-cases/people/set-new-password.ts';
import { signIn } from '#server/use-cases/people/sign-in.ts';
import { signUp } from '#server/use-cases/people/sign-up.ts';
import { tryAddressAgain } from '#server/use-cases/people/try-address-again.ts';
import { updateAccount } from '#server/use-cases/people/update-account.ts';
import { safeReturn } from '#server/web/gate.ts';
import { formAction } from './form-action.ts';
import { agentOf, giveSession } from './session-cookie.ts';

export const people = {
  signIn: formAction(SignInForm, async ({ stay, to, ...input }, ctx, api) => {
    const known = knownDeviceCookie();
    const signedIn = await signIn(ctx, input, { agent: agentOf(api), mark: api.cookies.get(known.name)?.value });
    giveSession(api, signedIn, stay);
    api.cookies.set(known.name, signedIn.mark, known.options);
    return { to: safeReturn(to, '/loom') };
  }),

  signUp: formAction(SignUpForm, async ({ to, ...input }, ctx) => {
    await signUp(ctx, input);
    const back = safeReturn(to, '/loom');
    return {
      to: back === '/loom' ? '/sign-in' : `/sign-in?to=${encodeURIComponent(back)}`,
      said: `A letter is on its way to ${input.email.address}. Open the link in it, so that we know it reaches you. Sign in meanwhile.`,
    };
  }),

  confirmAddress: formAction(ConfirmForm, async (input, ctx) => {
    const address = await confirmAddress(ctx, input);
    return { to: ctx.actor === null ? '/sign-in' : '/account', said: `${address} is confirmed. Letters reach you there.` };
  }),

  resendConfirmation: formAction(NothingForm, async (_input, ctx, api) => {
    const address = await resendConfirmation(ctx);
    const said = address === null ? 'Your address is confirmed already.' : `A letter is on its way to ${address}. Its link works for 24 hours, once.`;
    return { to: safeReturn(api.url.pathname, '/account'), said };
  }),

  tryAddressAgain: formAction(NothingForm, async (_input, ctx) => {
    const was = await tryAddressAgain(ctx);
    return { to: '/account#address', said: was ? 'Letters are sent there again. If one comes back, it is said here.' : 'Letters go there already.' };
  }),

  askNewPassword: formAction(ForgottenForm, async (input, ctx) => {
    await askNewPassword(ctx, input);
    return { to: '/sign-in', said: `A link is on its way to ${input.email.address}. It works for 20 minutes, once. If none comes, no account has this address.` };
  }),

  setNewPassword: formAction(NewPasswordForm, async (input, ctx, api) => {
    await setNewPassword(ctx, input);
    api.cookies.delete(sessionCookie().name, { path: '/' });
    return { to: '/sign-in', said: 'Your new password is set, and every browser is signed out. Sign in with it.' };
  }),

  changePassword: formAction(ChangePasswordForm, async (input, ctx, api) => {
    giveSession(api, await changePassword(ctx, input, agentOf(api)), true);
    return { to: '/account', said: 'Your password is changed. Every other browser is signed out.' };
  }),

  prove: formAction(ProveForm, async ({ to, ...input }, ctx, api) => {
    giveSession(api, await proveSelf(ctx, input, agentOf(api)), true);
    return { to: safeReturn(to, '/account') };
  }),

  updateAccount: formAction(AccountForm, async (input, ctx) => {
    await updateAccount(ctx, input);
    return { to: '/account', said: 'Saved.' };
  }),

  endSession: formAction(EndSessionForm, async ({ session }, ctx) => {
    const wasThisOne = await endOneSession(ctx, session);
    return wasThisOne ? { to: '/', said: 'Signed out.' } : { to: '/account#browsers', said: 'That browser is signed out.' };
  }),

  endOtherSessions: formAction(NothingForm, async (_input, ctx) => {
    const count = await endOtherSessions(ctx);
    return { to: '/account#browsers', said: count === 1 ? '1 other browser is signed out.' : `${count} other browsers are signed out.` };
  }),
};
