/** What can be set about the benches where somebody sits: the phrases of each, and the promise of her own. */
import type { Actor } from '#server/context.ts';
import { Workroom } from '#server/models/index.ts';
import { phrasesOfWorkroom } from './phrases-of.ts';
import { workroomsOf } from '#server/policies/workroom.ts';

export interface BenchSettings {
  readonly handle: string;
  readonly name: string;
  readonly answerDays: number;
  /** Her own, not one she helps in. */
  readonly isOwn: boolean;
  readonly phrases: readonly string[];
}

export async function benchSettings(actor: Actor): Promise<BenchSettings[]> {
  const workrooms = await Workroom.findAll({ where: { id: workroomsOf(actor) }, order: ['id'] });
  return Promise.all(workrooms.map(async ({ id, handle, name, answerDays }) => ({ handle, name, answerDays, isOwn: id === actor.workroomId, phrases: await phrasesOfWorkroom(id) })));
}
