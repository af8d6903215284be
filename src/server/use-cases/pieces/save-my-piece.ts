import type { MyPieceInput } from '#contracts/my-piece.ts';
import { judgeMine } from '#core/craft/my-piece/judge-mine.ts';
import { asPattern, mineOfFields } from '#core/craft/my-piece/typed-mine.ts';
import { isBegun } from '#core/craft/rest/woven-so-far.ts';
import type { Context } from '#server/context.ts';
import { withTransaction } from '#server/db/transaction.ts';
import { AppError, authorize, found } from '#server/errors.ts';
import { Enrolment, MyPieceRow, User } from '#server/models/index.ts';
import { piecesOf } from '#server/queries/pieces/pieces-of.ts';
import { seriesFor } from '#server/queries/series/series-for.ts';

const CHANGED = { says: 'Your piece was changed in another window or on another device meanwhile. What you typed still stands here. Keep it once more to have it so, or load the page again to see the other.' };

/**
 * Keeps a student's own loom, width and yarns, if the piece can be woven so, with what is woven of it; and the units she
 * chose, with her account. What is woven already can no longer change. `isBegun` says whether some of it is.
 * @throws VALIDATION with a sentence for each field; CONFLICT when another window or device changed it meanwhile.
 */
export async function saveMyPiece(ctx: Context, input: MyPieceInput): Promise<{ revision: number; isBegun: boolean }> {
  authorize(ctx.actor !== null, 'UNAUTHENTICATED');
  const { userId } = ctx.actor;
  const series = found(await seriesFor(ctx.actor, input.series, ctx.clock.now()));
  const { seat } = series;
  authorize(seat !== null);
  const { pattern, ...before } = await piecesOf(series.id, seat.enrolmentId);
  if (pattern === null) throw new AppError('CONFLICT', { says: 'This series tells no piece yet, so there is nothing to reckon for your loom.' });
  if (pattern.craft !== 'frame-loom') throw new AppError('CONFLICT', { says: 'This piece is not woven on a frame, so it asks nothing of your loom.' });
  if (before.revision !== input.revision) throw new AppError('CONFLICT', CHANGED);
  const fields: Readonly<Record<string, unknown>> = input;
  const sent = mineOfFields((name) => textOf(fields, name), pattern);
  const typed = input.asPattern === undefined ? sent : asPattern(sent, pattern);
  const judged = judgeMine(typed, pattern, before);
  if (!judged.ok) throw new AppError('VALIDATION', { fields: Object.fromEntries(judged.problems.map(({ field, says }) => [field, says])) });
  const woven = judged.halfway?.woven ?? null;
  return withTransaction(async () => {
    found(await Enrolment.findByPk(seat.enrolmentId, { lock: true }));
    const kept = await MyPieceRow.findByPk(seat.enrolmentId);
    if ((kept?.revision ?? 0) !== input.revision) throw new AppError('CONFLICT', CHANGED);
    const revision = input.revision + 1;
    if (kept === null) await MyPieceRow.create({ enrolmentId: seat.enrolmentId, data: judged.mine, woven, revision });
    else await kept.update({ data: judged.mine, woven, revision });
    await User.update({ units: typed.units }, { where: { id: userId } });
    return { revision, isBegun: woven !== null && isBegun(woven) };
  });
}

function textOf(fields: Readonly<Record<string, unknown>>, name: string): string | undefined {
  const value = Object.hasOwn(fields, name) ? fields[name] : undefined;
  return typeof value === 'string' ? value : undefined;
}
