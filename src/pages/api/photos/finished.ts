import type { APIContext, APIRoute } from 'astro';
import { PHOTO_LIMITS, PHOTO_TOO_LARGE } from '#core/photo/limits.ts';
import { AppError } from '#server/errors.ts';
import { showFinished } from '#server/use-cases/finish/show-finished.ts';
import { withMultipart, type ReceivedForm } from '#server/web/multipart.ts';
import { photoFaultCookie, writePhotoFault } from '#server/web/photo-fault.ts';
import { answering, json, knownError, wantsPage } from '#server/web/respond.ts';

const LIMITS = { field: 'photo', maxBytes: PHOTO_LIMITS.maxBytes, tooLargeSays: PHOTO_TOO_LARGE };

/** Takes the photo of a finished piece from a form. A program gets JSON, a browser goes back to the page with the sentence. */
export const POST: APIRoute = (context) => {
  const { request, locals: { ctx } } = context;
  const work = (): Promise<Response> => withMultipart(request, ctx.services.media, LIMITS, (form) => takeFrom(form, context));
  return wantsPage(request) ? work() : answering(ctx.requestId, work);
};

async function takeFrom({ fields: { series = '' }, file, fault }: ReceivedForm, { request, cookies, redirect, locals: { ctx } }: APIContext): Promise<Response> {
  const back = wantsPage(request) && /^[a-z0-9-]{1,64}$/.test(series) ? `/series/${series}/finish#photo` : null;
  try {
    if (fault !== null) throw fault;
    if (file === null) throw new AppError('VALIDATION', { says: 'No photo came with this form. Choose one and send it again.' });
    await showFinished(ctx, { series, file });
    return back === null ? json({}, 201) : redirect(back, 303);
  } catch (error) {
    const known = knownError(error);
    if (back === null || known.code === 'BUG' || known.code === 'NOT_FOUND') throw error;
    const { name, options } = photoFaultCookie();
    cookies.set(name, writePhotoFault({ says: known.says, words: '' }), options);
    return redirect(back, 303);
  }
}
