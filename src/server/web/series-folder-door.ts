/** A series' way out of the house and into it, as a zip. */
import { randomUUID } from 'node:crypto';
import { sizeWords } from '#core/video/limits.ts';
import { FOLDER_LIMITS } from '#core/series-folder/limits.ts';
import type { Context } from '#server/context.ts';
import { AppError, signedIn } from '#server/errors.ts';
import { displayName } from '#server/media/display-name.ts';
import { receiveFolder } from '#server/use-cases/series-folder/receive-folder.ts';
import { takeSeries } from '#server/use-cases/series-folder/take-series.ts';
import { withMultipart } from '#server/web/multipart.ts';
import { countUse, RATE_RULES } from '#server/web/rate-limit.ts';
import { knownError } from '#server/web/respond.ts';
import { sendFile } from '#server/web/send-file.ts';

const MOST = sizeWords(FOLDER_LIMITS.maxZipBytes);

/** The zip of a series of the asker's, streamed by the front server as a file to keep. */
export async function sendSeriesFolder(ctx: Context, slug: string, withFilms: boolean): Promise<Response> {
  await countUse(RATE_RULES.seriesFolder, signedIn(ctx).publicId);
  const answer = sendFile(await takeSeries(ctx, { slug, withFilms }));
  answer.headers.set('Content-Disposition', `attachment; filename="${slug}.zip"`);
  // It is the draft of this moment, and gone in a day or two.
  answer.headers.set('Cache-Control', 'private, no-store, no-transform');
  return answer;
}

export type BringInAnswer =
  | { readonly ok: true; readonly to: string }
  | { readonly ok: false; readonly status: number; readonly summary: string; readonly problems: readonly string[] };

/** A key for one form: pressed twice, it comes in once. */
export function newPressKey(): string {
  return randomUUID();
}

const PRESS_KEY = /^[0-9a-f-]{36}$/;

/** Takes the form of the page that brings a series in. Bugs pass through. */
export async function answerBringIn(ctx: Context, request: Request): Promise<BringInAnswer> {
  try {
    await countUse(RATE_RULES.seriesFolder, signedIn(ctx).publicId);
    await ctx.services.media.requireRoom(2 * Number(request.headers.get('content-length') ?? 0));
    const limits = { field: 'folder', maxBytes: FOLDER_LIMITS.maxZipBytes, tooLargeSays: `This zip is larger than ${MOST}. Take the series along without films, and send those one by one, in their parts.` };
    const publicId = await withMultipart(request, ctx.services.media, limits, ({ fields, file, fault }) => {
      if (fault !== null) throw fault;
      if (file === null || file.byteCount === 0) throw new AppError('VALIDATION', { says: 'No file came with this form. Choose a zip and send it again.' });
      const { key = '' } = fields;
      return receiveFolder(ctx, { path: file.path, fileName: displayName(file.originalName), byteCount: file.byteCount, pressKey: PRESS_KEY.test(key) ? key : newPressKey() });
    });
    return { ok: true, to: `/workroom/series/bring-in/${publicId}` };
  } catch (error) {
    const known = knownError(error);
    if (known.code === 'BUG') throw error;
    return { ok: false, status: known.status, summary: known.says, problems: Object.entries(known.fields).map(([file, says]) => (file === 'zip' ? says : `${file}: ${says}`)) };
  }
}
