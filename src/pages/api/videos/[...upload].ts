import type { APIRoute } from 'astro';
import { answerVideoUpload } from '#server/web/video-uploads.ts';

/** Takes videos piece by piece: the tus protocol, to begin, look, go on and take back. */
export const ALL: APIRoute = ({ request, locals: { ctx } }) => answerVideoUpload(ctx, request);
