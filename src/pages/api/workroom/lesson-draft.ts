import type { APIRoute } from 'astro';
import { LessonDraftForm, type DraftBehind, type DraftKept, type LessonDraftInput } from '#contracts/workroom.ts';
import { clockWords } from '#core/moment-words.ts';
import type { Context } from '#server/context.ts';
import { AppError, signedIn } from '#server/errors.ts';
import { presentRemarks } from '#server/presenters/text-remarks.ts';
import { draftOf } from '#server/queries/workroom/draft-of.ts';
import { saveLessonDraft } from '#server/use-cases/workroom/save-lesson-draft.ts';
import { countUse, RATE_RULES } from '#server/web/rate-limit.ts';
import { readJson } from '#server/web/read-json.ts';
import { answering, json } from '#server/web/respond.ts';

/** Room for the longest text in letters of three bytes. */
const MOST_KIB = 900;

/** Keeps a draft by itself while it is being written; 409 with the other text when another window was first. */
export const POST: APIRoute = ({ request, locals: { ctx } }) =>
  answering(ctx.requestId, async () => {
    await countUse(RATE_RULES.lessonDraft, signedIn(ctx).publicId);
    return keep(ctx, await readJson(request, LessonDraftForm, MOST_KIB));
  });

async function keep(ctx: Context, input: LessonDraftInput): Promise<Response> {
  const actor = signedIn(ctx);
  try {
    const { revision, savedAt, reading } = await saveLessonDraft(ctx, input);
    return json({ revision, savedAt: clockWords(savedAt, actor.timeZone), ...presentRemarks(reading) } satisfies DraftKept);
  } catch (error) {
    const behind = error instanceof AppError && error.code === 'CONFLICT' ? await draftOf(actor, input.lesson) : null;
    if (behind === null) throw error;
    return json({ behind } satisfies DraftBehind, 409);
  }
}
