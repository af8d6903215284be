/** Answers of `POST /api/reckon`, made from the text that came in. */
import { MOST_QUESTION_BYTES, type ReckonRefusal } from '#contracts/reckon.ts';
import { reckon } from '#core/craft/reckon.ts';
import { withCautions } from '#core/craft/with-cautions.ts';
import type { Problem } from '#core/outcome.ts';

const NEVER_KEPT = { 'Cache-Control': 'no-store' } as const;

function refusal(status: ReckonRefusal['status'], title: string, requestId: string, problems: readonly Problem[] = []): Response {
  const body: ReckonRefusal = { type: 'about:blank', title, status, requestId, problems };
  return new Response(JSON.stringify(body), { status, headers: { 'Content-Type': 'application/problem+json; charset=utf-8', ...NEVER_KEPT } });
}

function parse(text: string): { readonly ok: true; readonly question: unknown } | { readonly ok: false } {
  try {
    return { ok: true, question: JSON.parse(text) };
  } catch {
    return { ok: false };
  }
}

/** 200 with the numbers as they are; 400 for what is no JSON, 413 beyond 64 KiB, 422 with every refused value. */
export function answerQuestion(text: string, requestId: string): Response {
  if (new TextEncoder().encode(text).byteLength > MOST_QUESTION_BYTES) return refusal(413, 'A question of 64 KiB at most works here.', requestId);
  const parsed = parse(text);
  if (!parsed.ok) return refusal(400, 'This is no JSON.', requestId);
  const outcome = reckon(parsed.question);
  if (!outcome.ok) return refusal(422, 'Something in this question does not work yet.', requestId, outcome.problems);
  return new Response(JSON.stringify(withCautions(outcome.value)), { headers: { 'Content-Type': 'application/json; charset=utf-8', ...NEVER_KEPT } });
}
