import { loomFields } from '#core/trial/typed-loom.ts';
import { CheckoutForm, type CheckoutInput } from '#contracts/checkout.ts';
import { beginCheckout } from '#server/use-cases/checkout/begin-checkout.ts';
import { formAction, type Done } from './form-action.ts';

/** The way back to the price, with the loom that was typed. */
function signInFirst({ series, loom }: CheckoutInput): Done {
  const typed = loom === null ? '' : `?${new URLSearchParams(loomFields(loom).map(([name, value]) => [name, value])).toString()}`;
  return { to: `/sign-in?to=${encodeURIComponent(`/series/${series}${typed}#take`)}`, said: 'Sign in to take your seat. Then you are back at the series.' };
}

export const checkout = {
  begin: formAction(CheckoutForm, async (input, ctx) => (ctx.actor === null ? signInFirst(input) : beginCheckout(ctx, input))),
};
