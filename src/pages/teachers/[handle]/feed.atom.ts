import type { APIRoute } from 'astro';
import { found } from '#server/errors.ts';
import { openSeries } from '#server/queries/shop/open-series.ts';
import { teacherNamed } from '#server/queries/shop/teacher-page.ts';
import { atomFeed, FEED_LENGTH, FEED_TYPE } from '#server/web/atom-feed.ts';
import { tagOf } from '#server/web/public-address.ts';
import { answering } from '#server/web/respond.ts';
import { sendDocument } from '#server/web/xml.ts';

/** One teacher's new series. */
export const GET: APIRoute = ({ request, params: { handle = '' }, locals: { ctx } }) =>
  answering(ctx.requestId, async () => {
    const { publicId, teacherName, workroomName, handle: spelled } = found(await teacherNamed(handle));
    const feed = { id: tagOf('feed', publicId), title: `New series by ${teacherName}`, subtitle: workroomName, self: `/teachers/${spelled}/feed.atom`, page: `/teachers/${spelled}` };
    return sendDocument(request, atomFeed(feed, await openSeries({ handle: spelled, limit: FEED_LENGTH })), FEED_TYPE);
  });
