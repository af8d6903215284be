import type { APIRoute } from 'astro';
import { LessonCheckInput } from '#contracts/workroom.ts';
import { signedIn } from '#server/errors.ts';
import { readLessonText } from '#server/lesson-text/parse-pool.ts';
import { presentRemarks } from '#server/presenters/text-remarks.ts';
import { countUse, RATE_RULES } from '#server/web/rate-limit.ts';
import { readJson } from '#server/web/read-json.ts';
import { answering, json } from '#server/web/respond.ts';

/** Room for the longest text in letters of three bytes. */
const MOST_KIB = 900;

/** Reads a text as it would be read for publishing, and keeps nothing. */
export const POST: APIRoute = ({ request, locals: { ctx } }) =>
  answering(ctx.requestId, async () => {
    await countUse(RATE_RULES.lessonCheck, signedIn(ctx).publicId);
    const { source } = await readJson(request, LessonCheckInput, MOST_KIB);
    return json(presentRemarks(await readLessonText(source)));
  });
