/** What the worker can do, by job type. Handlers are loaded when the first job of their kind comes. */
import type { z } from 'astro/zod';
import type { Context } from '#server/context.ts';
import type { JobDefinition } from '#server/jobs/definition.ts';
import { settleCheckout, settlePaymentEvent } from '#server/jobs/definitions/payments.ts';
import { sendPasswordLink } from '#server/jobs/definitions/people.ts';

export interface RegisteredJob {
  readonly definition: JobDefinition<unknown>;
  run(ctx: Context, payload: unknown): Promise<void>;
}

/** Binds a definition to the function that does it; the payload is checked again, since it may be older than this program. */
export function bind<P>(definition: JobDefinition<P>, load: () => Promise<(ctx: Context, payload: P) => Promise<void>>): RegisteredJob {
  const schema: z.ZodType<P> = definition.payload;
  return {
    definition: definition as JobDefinition<unknown>,
    run: async (ctx, payload) => (await load())(ctx, schema.parse(payload)),
  };
}

export const REGISTERED: readonly RegisteredJob[] = [
  bind(settlePaymentEvent, async () => {
    const { settleEvent } = await import('#server/use-cases/checkout/settle-event.ts');
    return (ctx, { eventId }) => settleEvent(ctx, eventId);
  }),
  bind(settleCheckout, async () => {
    const { settleCheckout: settle } = await import('#server/use-cases/checkout/settle-checkout.ts');
    return async (ctx, { checkoutId }) => { await settle(ctx, checkoutId); };
  }),
  bind(sendPasswordLink, async () => (await import('#server/use-cases/people/write-password-link.ts')).writePasswordLink),
];
