import { z } from 'astro/zod';
import { defineJob } from '#server/jobs/definition.ts';

/** Acts on one stored event of the payment service. */
export const settlePaymentEvent = defineJob({ type: 'settle-payment-event', payload: z.object({ eventId: z.string() }), maxAttempts: 12 });

/** Looks at one checkout and does what its state means. */
export const settleCheckout = defineJob({ type: 'settle-checkout', payload: z.object({ checkoutId: z.string() }), maxAttempts: 12 });
