import type { APIContext, APIRoute } from 'astro';
import { PHOTO_LIMITS, PHOTO_TOO_LARGE, TOO_MANY_SHOTS } from '#core/photo/limits.ts';
import { AppError } from '#server/errors.ts';
import { postPhoto } from '#server/use-cases/photos/post-photo.ts';
import { withMultipart, type ReceivedForm } from '#server/web/multipart.ts';
import { photoFaultCookie, writePhotoFault } from '#server/web/photo-fault.ts';
import { answering, json, knownError, wantsPage } from '#server/web/respond.ts';

const LIMITS = { field: 'photo', maxBytes: PHOTO_LIMITS.maxBytes, tooLargeSays: PHOTO_TOO_LARGE, most: { files: PHOTO_LIMITS.maxShots, says: TOO_MANY_SHOTS } };

/**
 * Takes progress photos that come whole with a form, shown together. A program gets JSON. A browser without JavaScript
 * names the part in `back` and is sent back there, with the sentence and its words when they were not taken.
 */
export const POST: APIRoute = (context) => {
  const { request, locals: { ctx } } = context;
  const work = (): Promise<Response> => withMultipart(request, ctx.services.media, LIMITS, (form) => takeFrom(form, context));
  return wantsPage(request) ? work() : answering(ctx.requestId, work);
};

async function takeFrom({ fields, files, fault }: ReceivedForm, context: APIContext): Promise<Response> {
  const { series = '', lesson = '', words = '', back = '' } = fields;
  const toPart = /^[1-9][0-9]?$/.test(back) && /^[a-z0-9-]{1,64}$/.test(series) ? `/series/${series}/${back}#checkpoint` : null;
  try {
    if (fault !== null) throw fault;
    if (files.length === 0) throw new AppError('VALIDATION', { says: 'No photo came with this form. Choose one and send it again.' });
    const photo = await postPhoto(context.locals.ctx, { series, lesson, words, files });
    return toPart === null ? json({ photo: photo.publicId }, 201) : context.redirect(toPart, 303);
  } catch (error) {
    const known = knownError(error);
    if (toPart === null || known.code === 'BUG') throw error;
    const { name, options } = photoFaultCookie();
    context.cookies.set(name, writePhotoFault({ says: known.says, words }), options);
    return context.redirect(toPart, 303);
  }
}
