import type { MyPieceInput } from '#contracts/my-piece.ts';
import type { Piece, Plan } from '#core/craft/crafts.ts';
import { cordsOfFields, judgeCords, typeCords } from '#core/craft/macrame/my-piece.ts';
import { judgeMine, type MineFound } from '#core/craft/my-piece/judge-mine.ts';
import { INSIDE_WIDTH } from '#core/craft/my-piece/asked-of-mine.ts';
import { LOOM_NAME, loomOfMine, MISSING_WIDTH, readLoomName, type OwnLoom } from '#core/craft/my-piece/own-loom.ts';
import { asPattern, mineOfFields } from '#core/craft/my-piece/typed-mine.ts';
import type { MyPiece } from '#core/craft/fit.ts';
import { countedBands, countsAt } from '#core/following/counted-bands.ts';
import { isBegun, NOTHING_WOVEN, type WovenSoFar } from '#core/craft/rest/woven-so-far.ts';
import type { Units } from '#core/units/units.ts';
import type { Context } from '#server/context.ts';
import { withTransaction } from '#server/db/transaction.ts';
import { AppError, authorize, found } from '#server/errors.ts';
import { Enrolment, MyPieceRow, User } from '#server/models/index.ts';
import { piecesOf } from '#server/queries/pieces/pieces-of.ts';
import { seriesFor } from '#server/queries/series/series-for.ts';
import { writeLoom } from '#server/use-cases/looms/_write-loom.ts';
import { setRows } from '#server/use-cases/progress/_write-rows.ts';

const CHANGED = { says: 'Your piece was changed in another window or on another device meanwhile. What you typed still stands here. Keep it once more to have it so, or load the page again to see the other.' };

/**
 * Keeps a student's own loom, width and yarns, or cord and rod, if the piece can be made so, with what is woven of it; and the units she
 * chose, with her account, and her loom on her list where she named it. What is woven already can no longer change. `isBegun` says whether some of it is.
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
  if (before.revision !== input.revision) throw new AppError('CONFLICT', CHANGED);
  const { units, judged } = judge(input, pattern, before);
  if (!judged.ok) throw new AppError('VALIDATION', { fields: Object.fromEntries(judged.problems.map(({ field, says }) => [field, says])) });
  const named = loomToKeep(input, pattern, judged.mine);
  const woven = judged.halfway?.woven ?? null;
  return withTransaction(async () => {
    found(await Enrolment.findByPk(seat.enrolmentId, { lock: true }));
    const kept = await MyPieceRow.findByPk(seat.enrolmentId);
    if ((kept?.revision ?? 0) !== input.revision) throw new AppError('CONFLICT', CHANGED);
    const revision = input.revision + 1;
    if (kept === null) await MyPieceRow.create({ enrolmentId: seat.enrolmentId, data: judged.mine, woven, revision });
    else await kept.update({ data: judged.mine, woven, revision });
    if (named !== null) await writeLoom(userId, named);
    // What she says of how far she is holds for the row counter, too; saying nothing new leaves it as she counted.
    const said = woven ?? NOTHING_WOVEN;
    if (judged.made !== undefined && placeOf(said) !== placeOf(before.woven)) {
      for (const [band, rows] of Object.entries(countsAt(countedBands(judged.made), said))) await setRows(seat.enrolmentId, band, rows, ctx.clock.now());
    }
    await User.update({ units }, { where: { id: userId } });
    return { revision, isBegun: woven !== null && isBegun(woven) };
  });
}

/** The loom she gave a name to; null for none. @throws VALIDATION at the name or at the width nobody told. */
function loomToKeep(input: MyPieceInput, pattern: Piece, mine: MyPiece): { readonly name: string; readonly loom: OwnLoom } | null {
  const typed = textOf(input, LOOM_NAME) ?? '';
  if (pattern.craft !== 'frame-loom' || typed.trim() === '' || input.asPattern !== undefined) return null;
  const faults = new Map<string, string>();
  const [name, loom] = [readLoomName(typed, faults), loomOfMine(pattern, mine)];
  if (loom === undefined) faults.set(INSIDE_WIDTH.key, MISSING_WIDTH);
  if (name === undefined || loom === undefined) throw new AppError('VALIDATION', { fields: Object.fromEntries(faults) });
  return { name, loom };
}

const placeOf = ({ bandsDone, rows = 0 }: WovenSoFar): string => `${String(bandsDone)} ${String(rows)}`;

interface Judged {
  readonly units: Units;
  readonly judged: { readonly ok: true; readonly mine: MyPiece; readonly halfway?: { readonly woven: WovenSoFar } | null | undefined; readonly made?: { readonly piece: Piece; readonly plan: Plan } } | { readonly ok: false; readonly problems: readonly MineFound[] };
}

/** What she sent, read as her pattern's craft asks it. */
function judge(input: MyPieceInput, pattern: Piece, before: { readonly mine: MyPiece; readonly woven: WovenSoFar }): Judged {
  const fields: Readonly<Record<string, unknown>> = input;
  const ask = (name: string): string | undefined => textOf(fields, name);
  if (pattern.craft === 'macrame') {
    const sent = cordsOfFields(ask, pattern);
    return { units: sent.units, judged: judgeCords(input.asPattern === undefined ? sent : typeCords({}, pattern, sent.units), pattern) };
  }
  if (pattern.craft !== 'frame-loom') throw new AppError('CONFLICT', { says: 'This piece is made as its pattern has it, so it asks nothing of yours.' });
  const sent = mineOfFields(ask, pattern);
  const judged = judgeMine(input.asPattern === undefined ? sent : asPattern(sent, pattern), pattern, before);
  return { units: sent.units, judged: judged.ok ? { ...judged, made: judged.fitted } : judged };
}

function textOf(fields: Readonly<Record<string, unknown>>, name: string): string | undefined {
  const value = Object.hasOwn(fields, name) ? fields[name] : undefined;
  return typeof value === 'string' ? value : undefined;
}
