import type { APIRoute } from 'astro';
import { PHOTO_LIMITS } from '#server/media/photo.ts';
import { postPhoto } from '#server/use-cases/photos/post-photo.ts';
import { AppError } from '#server/errors.ts';
import { withMultipart } from '#server/web/multipart.ts';
import { answering, json } from '#server/web/respond.ts';

const TOO_LARGE = 'This photo is larger than 25 MB. Send it smaller: most phones ask for a size when they share a picture.';

/** Takes a progress photo. A browser without JavaScript is sent back to the part; an island gets JSON. */
export const POST: APIRoute = ({ request, locals: { ctx }, redirect }) =>
  answering(ctx.requestId, () => withMultipart(request, ctx.services.media, { field: 'photo', maxBytes: PHOTO_LIMITS.maxBytes, tooLargeSays: TOO_LARGE }, async ({ fields, file }) => {
    const { series = '', lesson = '', words = '', back = '' } = fields;
    if (file === null) throw new AppError('VALIDATION', { says: 'No photo came with this form. Choose one and send it again.' });
    const photo = await postPhoto(ctx, { series, lesson, words, path: file.path, originalName: file.originalName });
    return /^[1-9][0-9]?$/.test(back) ? redirect(`/series/${series}/${back}#checkpoint`, 303) : json({ photo: photo.publicId }, 201);
  }));
