import type { APIRoute } from 'astro';
import { found } from '#server/errors.ts';
import { mediaFor } from '#server/queries/media/media-for.ts';
import { sendFile } from '#server/web/send-file.ts';

/** A rendition of a file of a person, e.g. /media/<id>/large; the front server streams it. */
export const GET: APIRoute = async ({ params, locals }) => {
  const media = found(await mediaFor(locals.ctx.actor, params.id ?? '', locals.ctx.clock.now()));
  const file = media.state === 'ready' && Object.hasOwn(media.files, params.file ?? '') ? media.files[params.file ?? ''] : undefined;
  return sendFile(found(file));
};
