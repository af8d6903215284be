/** What pages of a workroom say of it. */
import { found } from '#server/errors.ts';
import { Workroom } from '#server/models/index.ts';

export interface WorkroomFacts {
  readonly id: number;
  readonly name: string;
  readonly handle: string;
  readonly timeZone: string;
  readonly currency: string;
  readonly answerDays: number;
  /** Empty until she has written one. */
  readonly postalAddress: string;
}

export async function workroomOf(id: number): Promise<WorkroomFacts> {
  const { name, handle, timeZone, currency, answerDays, postalAddress } = found(await Workroom.findByPk(id));
  return { id, name, handle, timeZone, currency, answerDays, postalAddress };
}
