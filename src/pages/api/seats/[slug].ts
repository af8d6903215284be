import type { APIRoute } from 'astro';
import { signedIn } from '#server/errors.ts';
import { seatStanding } from '#server/queries/shop/seat-standing.ts';
import { answering, json } from '#server/web/respond.ts';

/** How it stands with the asker's own seat, for the page that waits for it. */
export const GET: APIRoute = ({ locals: { ctx }, params, url }) =>
  answering(ctx.requestId, async () => json({ standing: (await seatStanding(signedIn(ctx), params.slug ?? '', url.searchParams.get('checkout'))).standing }));
