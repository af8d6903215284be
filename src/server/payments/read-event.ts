import { z } from 'astro/zod';
import type { PaymentEvent } from './payment-service.ts';

/** What we take of an event. Everything else may change with the service's versions without our noticing. */
const EventBody = z.object({
  object: z.literal('event'),
  id: z.string().regex(/^evt_\w{1,250}$/),
  type: z.string().min(1).max(100),
  created: z.number().int(),
  livemode: z.boolean(),
  api_version: z.string().nullish(),
  data: z.object({
    object: z.object({
      object: z.string().max(100),
      id: z.string().max(255).catch(''),
      payment_intent: z.string().max(255).nullish().catch(undefined),
      client_reference_id: z.string().max(255).nullish().catch(undefined),
    }),
  }),
});

/** Reads the body of an event whose signature held. `undefined` when it is no event. */
export function readEvent(rawBody: string, ourVersion: string): PaymentEvent | undefined {
  const parsed = EventBody.safeParse(jsonOf(rawBody));
  if (!parsed.success) return undefined;
  const { id, type, created, livemode, api_version: version, data } = parsed.data;
  const about = data.object;
  return {
    id,
    type,
    createdAt: new Date(created * 1000),
    live: livemode,
    foreignVersion: version !== ourVersion,
    about: {
      kind: about.object,
      id: about.id,
      paymentId: about.object === 'payment_intent' ? about.id : (about.payment_intent ?? undefined),
      orderId: about.client_reference_id ?? undefined,
    },
  };
}

function jsonOf(text: string): unknown {
  try {
    return JSON.parse(text);
  } catch {
    return undefined;
  }
}
