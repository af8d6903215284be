/** The phrases of a workroom, in their order. */
import { StockPhrase } from '#server/models/index.ts';

export async function phrasesOfWorkroom(workroomId: number): Promise<string[]> {
  const rows = await StockPhrase.findAll({ where: { workroomId }, order: ['position'] });
  return rows.map(({ words }) => words);
}
