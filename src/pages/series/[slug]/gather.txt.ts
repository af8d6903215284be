import type { APIRoute } from 'astro';
import { madeFor } from '#core/craft/made-for.ts';
import { CRAFTS } from '#core/craft/crafts.ts';
import { listText } from '#core/gathering/list-text.ts';
import { gatherRows, partRows } from '#core/gathering/rows.ts';
import { titleHalves } from '#core/series/title.ts';
import { found } from '#server/errors.ts';
import { gatheringLines } from '#server/queries/gathering/gathering-lines.ts';
import { piecesOf } from '#server/queries/pieces/pieces-of.ts';
import { seriesFor } from '#server/queries/series/series-for.ts';

/** The gathering list as plain text: of the whole series, or of `?part=`. */
export const GET: APIRoute = async ({ params: { slug = '' }, url, locals: { ctx } }) => {
  const series = found(await seriesFor(ctx.actor, slug, ctx.clock.now()));
  const enrolmentId = series.seat?.enrolmentId ?? null;
  const [pieces, lines] = await Promise.all([piecesOf(series.id, enrolmentId), gatheringLines(series.parts, enrolmentId)]);
  const units = ctx.actor?.units ?? 'cm';
  const shownFor = { made: madeFor(pieces.pattern, pieces.mine, units, pieces.woven), pattern: pieces.pattern, units };
  const part = series.parts.find(({ number }) => String(number) === url.searchParams.get('part'));
  const { name } = titleHalves(series.title);
  const text = listText(part === undefined ? gatherRows(lines, shownFor) : partRows(lines, part.number, shownFor), {
    title: `Gather for ${part === undefined ? name : `${name}, Part ${String(part.number)}`}`,
    material: CRAFTS[series.craft].words.material,
  });
  return new Response(text, { headers: { 'Content-Type': 'text/plain; charset=utf-8' } });
};
