import { z } from 'astro/zod';

const chance = z.number().min(0).max(1).default(0);

/** How news goes astray on its way. Chances are from 0 to 1; the same seed gives the same fate to the same run of news. */
export const WebhookFaults = z
  .object({
    /** Sent a second time, somewhat later. */
    duplicate: chance,
    /** Held back up to two seconds, so that later news overtakes it. */
    reorder: chance,
    /** A try that never arrives; the next one comes by the usual schedule. */
    drop: chance,
    /** Added to every try. */
    delayMs: z.number().int().min(0).max(600_000).default(0),
    seed: z.number().int().default(1),
  })
  .strict();
export type WebhookFaults = z.infer<typeof WebhookFaults>;

export const NO_FAULTS: WebhookFaults = { duplicate: 0, reorder: 0, drop: 0, delayMs: 0, seed: 1 };

/**
 * Numbers from 0 up to 1 that look like chance and repeat for the same seed (mulberry32: one 32-bit state, good enough to
 * scatter a few hundred messages).
 */
export function seededChance(seed: number): () => number {
  let state = seed >>> 0;
  return () => {
    state = (state + 0x6d2b79f5) >>> 0;
    let mixed = Math.imul(state ^ (state >>> 15), state | 1);
    mixed ^= mixed + Math.imul(mixed ^ (mixed >>> 7), mixed | 61);
    return ((mixed ^ (mixed >>> 14)) >>> 0) / 4_294_967_296;
  };
}
