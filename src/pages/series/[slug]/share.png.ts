import type { APIRoute } from 'astro';
import { found } from '#server/errors.ts';
import { sharePictureOf } from '#server/queries/shop/share-pictures.ts';
import { answering } from '#server/web/respond.ts';
import { SEND_HEADER } from '#server/web/send-file.ts';

/** The picture of an open series, for everybody. It is drawn by the worker; here it is only sent. */
export const GET: APIRoute = ({ params: { slug = '' }, locals: { ctx } }) =>
  answering(ctx.requestId, async () => {
    const { fileKey } = found(await sharePictureOf(slug));
    return new Response(null, { headers: { [SEND_HEADER]: fileKey, 'Content-Type': 'image/png', 'Cache-Control': 'public, max-age=3600, no-transform' } });
  });
