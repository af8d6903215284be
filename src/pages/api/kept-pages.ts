import type { APIRoute } from 'astro';
import { pagesToKeep } from '#server/queries/kept-pages/pages-to-keep.ts';
import { answering, json } from '#server/web/respond.ts';

/** Which pages this person's device may keep. Asked by the service worker, which takes away whatever is not named. */
export const GET: APIRoute = ({ locals: { ctx } }) =>
  answering(ctx.requestId, async () => json(await pagesToKeep(ctx.actor, ctx.clock.now())));
