import type { APIRoute } from 'astro';
import { answerQuestion } from '#server/web/answer-question.ts';
import { countUse, networkOf, RATE_RULES } from '#server/web/rate-limit.ts';
import { answering } from '#server/web/respond.ts';

/** The reckoner for programs: no account needed, the same core as the page and the lessons. */
export const POST: APIRoute = ({ request, locals: { ctx } }) =>
  answering(ctx.requestId, async () => {
    await countUse(RATE_RULES.reckon, networkOf(ctx.ip));
    return answerQuestion(await request.text(), ctx.requestId);
  });

export const ALL: APIRoute = () => new Response(null, { status: 405, headers: { Allow: 'POST', 'Cache-Control': 'no-store' } });
