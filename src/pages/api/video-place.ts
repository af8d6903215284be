import type { APIRoute } from 'astro';
import { KeepPlace } from '#contracts/video.ts';
import { keepPlace } from '#server/use-cases/progress/keep-place.ts';
import { readJson } from '#server/web/read-json.ts';
import { answering, json } from '#server/web/respond.ts';

/** Keeps where a student is in a video, so that another of her devices goes on there. */
export const POST: APIRoute = ({ request, locals: { ctx } }) =>
  answering(ctx.requestId, async () => {
    await keepPlace(ctx, await readJson(request, KeepPlace));
    return json({ kept: true });
  });
