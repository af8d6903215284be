import type { OwnLoomInput } from '#contracts/own-looms.ts';
import { judgeLoomForm, loomFormOfFields } from '#core/craft/my-piece/own-loom.ts';
import type { Context } from '#server/context.ts';
import { withTransaction } from '#server/db/transaction.ts';
import { AppError, authorize } from '#server/errors.ts';
import { writeLoom } from './_write-loom.ts';

/**
 * Puts a loom on a person's list, or changes one that is on it. Pieces that are planned already keep their measures.
 * @throws VALIDATION with a sentence for each field; NOT_FOUND for a loom that is not hers.
 */
export async function keepOwnLoom(ctx: Context, input: OwnLoomInput): Promise<{ readonly name: string }> {
  authorize(ctx.actor !== null, 'UNAUTHENTICATED');
  const { userId } = ctx.actor;
  const fields: Readonly<Record<string, unknown>> = input;
  const judged = judgeLoomForm(loomFormOfFields((name) => {
    const value = Object.hasOwn(fields, name) ? fields[name] : undefined;
    return typeof value === 'string' ? value : undefined;
  }));
  if (!judged.ok) throw new AppError('VALIDATION', { fields: Object.fromEntries(judged.faults) });
  const { name, loom } = judged;
  await withTransaction(() => writeLoom(userId, { name, loom, publicId: input.loom }));
  return { name };
}
