/** A series' way out of the house and into it, as a zip. */
import { sizeWords } from '#core/video/limits.ts';
import { FOLDER_LIMITS } from '#core/series-folder/limits.ts';
import type { Context } from '#server/context.ts';
import { AppError, signedIn } from '#server/errors.ts';
import { bringInSeries, type BroughtIn } from '#server/use-cases/series-folder/bring-in-series.ts';
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
  | { readonly ok: true; readonly to: string; readonly said: string }
  | { readonly ok: false; readonly status: number; readonly summary: string; readonly problems: readonly string[] };

/** Takes the form of the page that brings a series in. Bugs pass through. */
export async function answerBringIn(ctx: Context, request: Request): Promise<BringInAnswer> {
  try {
    await countUse(RATE_RULES.seriesFolder, signedIn(ctx).publicId);
    await ctx.services.media.requireRoom(2 * Number(request.headers.get('content-length') ?? 0));
    const limits = { field: 'folder', maxBytes: FOLDER_LIMITS.maxZipBytes, tooLargeSays: `This zip is larger than ${MOST}. Take the series along without films, and send those one by one, in their parts.` };
    const came = await withMultipart(request, ctx.services.media, limits, ({ file, fault }) => {
      if (fault !== null) throw fault;
      if (file === null || file.byteCount === 0) throw new AppError('VALIDATION', { says: 'No file came with this form. Choose a zip and send it again.' });
      return bringInSeries(ctx, { path: file.path });
    });
    return { ok: true, to: `/workroom/series/${came.slug}`, said: saidOf(came) };
  } catch (error) {
    const known = knownError(error);
    if (known.code === 'BUG') throw error;
    return { ok: false, status: known.status, summary: known.says, problems: Object.entries(known.fields).map(([file, says]) => (file === 'zip' ? says : `${file}: ${says}`)) };
  }
}

const MOST_SAID = 400;

function saidOf({ title, partCount, filmCount, toMend }: BroughtIn): string {
  const parts = partCount === 1 ? 'one part' : `${partCount} parts`;
  const films = filmCount === 0 ? '' : ` ${filmCount === 1 ? 'Its film is' : `Its ${filmCount} films are`} being made ready.`;
  const mend = toMend.map(({ file, says }) => ` To mend in ${file}: ${says}`).join('');
  const said = `“${title}” is here as a draft, with ${parts}.${films}${mend}`;
  return said.length > MOST_SAID ? `${said.slice(0, MOST_SAID)}…` : said;
}
