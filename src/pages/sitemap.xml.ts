import type { APIRoute } from 'astro';
import { getCollection } from 'astro:content';
import { openParts, openSeries } from '#server/queries/shop/open-series.ts';
import { taughtTechniques } from '#server/queries/shop/technique-page.ts';
import { answering } from '#server/web/respond.ts';
import { placesOf, sitemap } from '#server/web/sitemap.ts';
import { sendDocument } from '#server/web/xml.ts';

const MOST = 20_000;

export const GET: APIRoute = ({ request, locals: { ctx } }) =>
  answering(ctx.requestId, async () => {
    const [series, parts, taught, handbook] = [await openSeries({ limit: MOST }), await openParts(MOST), await taughtTechniques(), await getCollection('handbook')];
    const own = ['/', '/series', '/gifts', '/wall', '/handbook', '/reckoner', ...taught.map(({ key }) => `/techniques/${encodeURIComponent(key)}`), ...handbook.map(({ id }) => `/handbook/${id}`).toSorted()].map((path) => ({ path }));
    return sendDocument(request, sitemap([...own, ...placesOf(series, parts)]), 'application/xml; charset=utf-8');
  });
