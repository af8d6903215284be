import type { APIRoute } from 'astro';
import { answerPhotoUpload } from '#server/web/photo-uploads.ts';

/** Takes photos piece by piece: the tus protocol, to begin, look, go on and take back. */
export const ALL: APIRoute = ({ request, locals: { ctx } }) => answerPhotoUpload(ctx, request);
