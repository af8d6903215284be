import type { APIRoute } from 'astro';
import { openSeries } from '#server/queries/shop/open-series.ts';
import { atomFeed, FEED_LENGTH, FEED_TYPE } from '#server/web/atom-feed.ts';
import { tagOf } from '#server/web/public-address.ts';
import { answering } from '#server/web/respond.ts';
import { sendDocument } from '#server/web/xml.ts';

/** All new series. */
export const GET: APIRoute = ({ request, locals: { ctx } }) =>
  answering(ctx.requestId, async () => {
    const feed = { id: tagOf('feed', 'series'), title: 'New series at Fellmark', subtitle: 'Workshop series that make one piece, part by part.', self: '/series/feed.atom', page: '/series' };
    return sendDocument(request, atomFeed(feed, await openSeries({ limit: FEED_LENGTH })), FEED_TYPE);
  });
