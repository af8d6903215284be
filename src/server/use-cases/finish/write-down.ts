import type { FinishedInput } from '#contracts/finish.ts';
import { readComposition } from '#core/fibre/composition.ts';
import type { YarnInPiece, YarnSaid } from '#core/finish/yarns-in-piece.ts';
import { amountText } from '#core/units/format-amount.ts';
import { massOf } from '#core/craft/amounts/amount-types.ts';
import { parseMass } from '#core/units/parse-mass.ts';
import type { Units } from '#core/units/units.ts';
import type { Context } from '#server/context.ts';
import { withTransaction } from '#server/db/transaction.ts';
import { AppError, signedIn } from '#server/errors.ts';
import { heldRow, writableBy } from './_finished-row.ts';

/** No hand-woven piece weighs more. */
const MOST_GRAMS = 100_000;
const LONGEST_FIBRE = 120;

/**
 * Keeps the hours, the yarn and the note of a finished piece. What stands as the plan has it is not kept: it follows the
 * plan when that changes.
 * @throws as `writableBy`; VALIDATION with a sentence at each yarn that cannot be read.
 */
export async function writeDown(ctx: Context, { series, minutes, note, typed }: FinishedInput): Promise<void> {
  const { seat, yarns } = await writableBy(ctx, series);
  const said = readYarns(typed, yarns, signedIn(ctx).units);
  await withTransaction(async () => {
    await (await heldRow(seat.enrolmentId)).update({ minutes, note, yarns: said });
  });
}

function readYarns(typed: Readonly<Record<string, string>>, yarns: readonly YarnInPiece[], units: Units): Record<string, YarnSaid> {
  const fields: Record<string, string> = {};
  const said: Record<string, YarnSaid> = {};
  for (const { key, plannedGrams, toldFibre } of yarns) {
    const grams = (typed[`grams:${key}`] ?? '').trim();
    const fibre = (typed[`fibre:${key}`] ?? '').trim();
    const own: { grams?: number; fibre?: string } = {};
    if (grams !== '' && grams !== amountText(massOf(plannedGrams), units).replaceAll('\u00a0', ' ')) {
      const read = parseMass(grams, units === 'in' ? 'oz' : 'g');
      if (!read.ok) fields[`grams:${key}`] = read.reason;
      else if (read.grams > MOST_GRAMS) fields[`grams:${key}`] = 'That is more than any piece weighs.';
      else own.grams = read.grams;
    }
    if (fibre !== toldFibre) {
      const wrong = fibre === '' ? undefined : fibreFault(fibre);
      if (wrong === undefined) own.fibre = fibre;
      else fields[`fibre:${key}`] = wrong;
    }
    if (Object.keys(own).length > 0) said[key] = own;
  }
  if (Object.keys(fields).length > 0) throw new AppError('VALIDATION', { fields });
  return said;
}

/** A sentence, where it is no composition we can put on a label. */
function fibreFault(fibre: string): string | undefined {
  if (fibre.length > LONGEST_FIBRE) return `At most ${LONGEST_FIBRE} characters work here.`;
  const read = readComposition(fibre);
  if (!read.ok) return read.reason;
  const unknown = read.shares.find((share) => share.fibre === null);
  return unknown && `“${unknown.words}” is no fibre name we know. Write the fibre itself, such as wool, cotton or flax, or leave it empty when you do not know.`;
}
