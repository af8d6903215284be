import type { APIRoute } from 'astro';
import { sendSeriesFolder } from '#server/web/series-folder-door.ts';

/** A series as a zip to keep; with `?films=on` its films as well. */
export const GET: APIRoute = ({ params: { slug = '' }, url, locals: { ctx } }) => sendSeriesFolder(ctx, slug, url.searchParams.get('films') === 'on');
