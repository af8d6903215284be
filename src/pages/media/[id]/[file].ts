import type { APIRoute } from 'astro';
import { found } from '#server/errors.ts';
import { mediaFor } from '#server/queries/media/media-for.ts';
import { sendCaptions } from '#server/web/send-captions.ts';
import { sendFile } from '#server/web/send-file.ts';

/**
 * A rendition of a file of a person, e.g. /media/<id>/large; the front server streams it. Captions of a video are written
 * from its lines, those of the draft for who looks after it.
 */
export const GET: APIRoute = async ({ params: { id = '', file: name = '' }, locals: { ctx } }) => {
  const { media, looksAfter, mayBeWithdrawn } = found(await mediaFor(ctx.actor, id, ctx.clock.now()));
  if (name === 'captions') return sendCaptions(found(media.detail.cues));
  if (name === 'captions-draft') return sendCaptions(found(looksAfter ? (media.draftDetail ?? media.detail).cues : null));
  return sendFile(found(media.state === 'ready' && Object.hasOwn(media.files, name) ? media.files[name] : null), mayBeWithdrawn ? 'ask-each-time' : 'keep-an-hour');
};
