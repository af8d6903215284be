import type { APIRoute } from 'astro';
import { recordPaymentEvent } from '#server/use-cases/checkout/record-payment-event.ts';
import { json } from '#server/web/respond.ts';

/** Where the payment service tells us news. The signature is over the text exactly as it arrives, so nothing reads it before. */
export const POST: APIRoute = async ({ request, locals }) => {
  const receipt = await recordPaymentEvent(locals.ctx, await request.text(), request.headers.get('stripe-signature'));
  return receipt.ok ? json({ received: true }) : json({ received: false, reason: receipt.reason }, 400);
};
