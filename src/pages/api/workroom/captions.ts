import type { APIRoute } from 'astro';
import { KeepCues, type CuesBehind, type CuesKept, type KeepCuesInput } from '#contracts/video.ts';
import { clockWords } from '#core/moment-words.ts';
import type { Context } from '#server/context.ts';
import { AppError, signedIn } from '#server/errors.ts';
import { captionsInHand } from '#server/queries/videos/captions-in-hand.ts';
import { saveVideoDraft } from '#server/use-cases/videos/save-video-draft.ts';
import { countUse, RATE_RULES } from '#server/web/rate-limit.ts';
import { readJson } from '#server/web/read-json.ts';
import { answering, json } from '#server/web/respond.ts';

const MOST_KIB = 1_000;

/** Keeps captions by itself while they are written; 409 with the others when another window was first. */
export const POST: APIRoute = ({ request, locals: { ctx } }) =>
  answering(ctx.requestId, async () => {
    await countUse(RATE_RULES.lessonDraft, signedIn(ctx).publicId);
    return keep(ctx, await readJson(request, KeepCues, MOST_KIB));
  });

async function keep(ctx: Context, { video, revision, cues }: KeepCuesInput): Promise<Response> {
  try {
    const saved = await saveVideoDraft(ctx, { video, revision, change: { cues } });
    return json({ revision: saved.revision, savedAt: clockWords(saved.savedAt, signedIn(ctx).timeZone) } satisfies CuesKept);
  } catch (error) {
    const behind = error instanceof AppError && error.code === 'CONFLICT' ? await captionsInHand(signedIn(ctx), video) : null;
    if (behind === null) throw error;
    return json({ behind } satisfies CuesBehind, 409);
  }
}
