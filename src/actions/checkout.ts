import { CheckoutForm } from '#contracts/checkout.ts';
import { beginCheckout } from '#server/use-cases/checkout/begin-checkout.ts';
import { formAction } from './form-action.ts';

export const checkout = {
  begin: formAction(CheckoutForm, async (input, ctx) => ({ to: (await beginCheckout(ctx, input)).payUrl })),
};
