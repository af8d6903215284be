/** What the worker can do, by job type. Handlers are loaded when the first job of their kind comes. */
import type { z } from 'astro/zod';
import type { Context } from '#server/context.ts';
import type { JobDefinition } from '#server/jobs/definition.ts';
import { sendVerdict } from '#server/jobs/definitions/bench.ts';
import { handOutNotice } from '#server/jobs/definitions/notices.ts';
import { settleCheckout, settlePaymentEvent } from '#server/jobs/definitions/payments.ts';
import { bringInFolder } from '#server/jobs/definitions/series-folder.ts';
import { processVideo } from '#server/jobs/definitions/videos.ts';
import { sendPasswordLink } from '#server/jobs/definitions/people.ts';

/** How a job is held while it is done. */
export interface Held {
  /** Aborts when the worker stops or another one took the job over; long jobs listen to it. */
  readonly signal: AbortSignal;
}

export interface RegisteredJob {
  readonly definition: JobDefinition<unknown>;
  run(ctx: Context, payload: unknown, held: Held): Promise<void>;
  /** Called once when all tries failed, so that whoever waits for it learns of it. */
  gaveUp?(ctx: Context, payload: unknown): Promise<void>;
}

/** Binds a definition to the function that does it; the payload is checked again, since it may be older than this program. */
export function bind<P>(
  definition: JobDefinition<P>,
  load: () => Promise<(ctx: Context, payload: P, held: Held) => Promise<void>>,
  loadGaveUp?: () => Promise<(ctx: Context, payload: P) => Promise<void>>,
): RegisteredJob {
  const schema: z.ZodType<P> = definition.payload;
  return {
    definition: definition as JobDefinition<unknown>,
    run: async (ctx, payload, held) => (await load())(ctx, schema.parse(payload), held),
    ...(loadGaveUp && { gaveUp: async (ctx: Context, payload: unknown) => (await loadGaveUp())(ctx, schema.parse(payload)) }),
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
  bind(
    processVideo,
    async () => {
      const { makeVideoReady } = await import('#server/use-cases/videos/make-video-ready.ts');
      return (ctx, { video }, { signal }) => makeVideoReady(ctx, video, signal);
    },
    async () => {
      const { giveUpVideo } = await import('#server/use-cases/videos/give-up-video.ts');
      return (ctx, { video }) => giveUpVideo(ctx, video);
    },
  ),
  bind(
    bringInFolder,
    async () => (await import('#server/use-cases/series-folder/bring-in-folder.ts')).bringInFolder,
    async () => (await import('#server/use-cases/series-folder/bring-in-folder.ts')).giveUpFolder,
  ),
  bind(
    sendVerdict,
    async () => (await import('#server/use-cases/bench/send-verdict.ts')).sendVerdict,
    async () => (await import('#server/use-cases/bench/send-verdict.ts')).bringBackVerdict,
  ),
  bind(handOutNotice, async () => (await import('#server/use-cases/notices/hand-out-notice.ts')).handOutNotice),
  bind(sendPasswordLink, async () => (await import('#server/use-cases/people/write-password-link.ts')).writePasswordLink),
];
