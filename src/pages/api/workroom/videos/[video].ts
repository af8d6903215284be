import type { APIRoute } from 'astro';
import { found, signedIn } from '#server/errors.ts';
import { videoInHand } from '#server/queries/videos/video-desk.ts';
import { answering, json } from '#server/web/respond.ts';
import { onItsWay } from '#server/web/video-progress.ts';

/** How a video of the asker's stands, for the page that watches it. */
export const GET: APIRoute = ({ params: { video = '' }, locals: { ctx } }) =>
  answering(ctx.requestId, async () => json(await onItsWay(ctx, found(await videoInHand(signedIn(ctx), video)))));
