import type { PhrasesInput } from '#contracts/bench.ts';
import type { Context } from '#server/context.ts';
import { withTransaction } from '#server/db/transaction.ts';
import { AppError, authorize, found } from '#server/errors.ts';
import { StockPhrase, Workroom } from '#server/models/index.ts';
import { maySitAtBench } from '#server/policies/workroom.ts';

/**
 * Keeps the phrases of a workroom as they were written, for whoever sits at its bench.
 * @throws NOT_FOUND for another workroom; CONFLICT when somebody changed them since the form was drawn.
 */
export async function savePhrases(ctx: Context, { workroom: handle, phrases, before }: PhrasesInput): Promise<void> {
  authorize(ctx.actor !== null, 'UNAUTHENTICATED');
  const workroom = found(await Workroom.findOne({ where: { handle } }));
  authorize(maySitAtBench(ctx.actor, workroom.id));
  await withTransaction(async () => {
    found(await Workroom.findByPk(workroom.id, { lock: true }));
    const kept = await StockPhrase.findAll({ where: { workroomId: workroom.id }, order: ['position'] });
    if (kept.map(({ words }) => words).join('\n') !== before.join('\n')) {
      throw new AppError('CONFLICT', { says: 'Somebody changed these phrases since you opened them. What you wrote stands below and is not saved; open the page again in another window to see theirs.' });
    }
    await StockPhrase.destroy({ where: { workroomId: workroom.id } });
    await StockPhrase.bulkCreate(phrases.map((words, index) => ({ workroomId: workroom.id, position: index + 1, words })));
  });
}
