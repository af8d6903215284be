import type { APIRoute } from 'astro';
import type { PicturePutIn } from '#contracts/media.ts';
import { AppError } from '#server/errors.ts';
import { PHOTO_LIMITS } from '#core/photo/limits.ts';
import { putInPicture } from '#server/use-cases/pictures/put-in-picture.ts';
import { withMultipart } from '#server/web/multipart.ts';
import { answering, json } from '#server/web/respond.ts';

const LIMITS = { field: 'picture', maxBytes: PHOTO_LIMITS.maxBytes, tooLargeSays: 'This picture is larger than 25 MB. Make it smaller first.' };

/** Takes a picture for a part's text, with what it shows in words. */
export const POST: APIRoute = ({ request, locals: { ctx } }) =>
  answering(ctx.requestId, () => withMultipart(request, ctx.services.media, LIMITS, async ({ fields, file, fault }) => {
    if (fault !== null) throw fault;
    if (file === null) throw new AppError('VALIDATION', { says: 'No picture came with this form. Choose one and send it again.' });
    const { lesson = '', alt = '' } = fields;
    return json({ name: await putInPicture(ctx, { lesson, alt, path: file.path, originalName: file.originalName }) } satisfies PicturePutIn, 201);
  }));
