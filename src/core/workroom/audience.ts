/** Which students of a series are meant: the same rule for the table of students and for who gets a notice. */
import { daysSince } from './class-place.ts';

export interface Audience {
  /** Place of the part in hand, from 0; null: wherever they are. */
  readonly at: number | null;
  /** At least so many whole days without a step; null: whenever. Who has finished stands still for nobody. */
  readonly stillDays: number | null;
}

interface Placed {
  readonly at: number | undefined;
  readonly lastStepAt: Date;
}

export function isMeant(student: Placed, { at, stillDays }: Audience, now: Date): boolean {
  if (at !== null && student.at !== at) return false;
  return stillDays === null || (student.at !== undefined && daysSince(student.lastStepAt, now) >= stillDays);
}
