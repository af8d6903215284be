import type { APIRoute } from 'astro';
import { PieceDraftForm, type PieceDraftBehind, type PieceDraftInput, type PieceDraftKept } from '#contracts/piece.ts';
import { clockWords } from '#core/moment-words.ts';
import type { Context } from '#server/context.ts';
import { AppError, signedIn } from '#server/errors.ts';
import { otherPiece } from '#server/queries/workroom/other-piece.ts';
import { savePieceDraft } from '#server/use-cases/workroom/save-piece-draft.ts';
import { countUse, RATE_RULES } from '#server/web/rate-limit.ts';
import { readJson } from '#server/web/read-json.ts';
import { answering, json } from '#server/web/respond.ts';

/** Room for the richest piece: two hundred bands full of shapes. */
const MOST_KIB = 900;

/** Keeps the form of a pattern piece by itself while it is filled in; 409 with the other's texts when another window was first. */
export const POST: APIRoute = ({ request, locals: { ctx } }) =>
  answering(ctx.requestId, async () => {
    await countUse(RATE_RULES.pieceDraft, signedIn(ctx).publicId);
    return keep(ctx, await readJson(request, PieceDraftForm, MOST_KIB));
  });

async function keep(ctx: Context, input: PieceDraftInput): Promise<Response> {
  const actor = signedIn(ctx);
  try {
    const { revision, savedAt } = await savePieceDraft(ctx, input);
    return json({ revision, savedAt: clockWords(savedAt, actor.timeZone) } satisfies PieceDraftKept);
  } catch (error) {
    const behind = error instanceof AppError && error.code === 'CONFLICT' ? await otherPiece(actor, input.series) : null;
    if (behind === null) throw error;
    return json({ behind } satisfies PieceDraftBehind, 409);
  }
}
