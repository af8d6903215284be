import type { APIRoute } from 'astro';
import { ShowPhotos } from '#contracts/photos.ts';
import { showPhotos } from '#server/use-cases/photos/show-photos.ts';
import { readJson } from '#server/web/read-json.ts';
import { answering, json } from '#server/web/respond.ts';

/** Shows photos that have come, together, at a checkpoint. */
export const POST: APIRoute = ({ request, locals: { ctx } }) =>
  answering(ctx.requestId, async () => json({ photo: (await showPhotos(ctx, await readJson(request, ShowPhotos))).publicId }, 201));
