/** Who may do what in a workroom. A helper looks after photos and questions; money and publishing are the teacher's. */
import type { Actor } from '#server/context.ts';
import { worksIn } from '#server/policies/lesson.ts';

/** The workrooms in which somebody teaches or helps. */
export function workroomsOf(actor: Actor): number[] {
  return [...(actor.workroomId === null ? [] : [actor.workroomId]), ...actor.helpsInWorkroomIds];
}

/** Design, write, price, publish, see money. */
export function mayTeachIn(actor: Actor | null, workroomId: number): boolean {
  return actor !== null && actor.workroomId === workroomId;
}

/** See waiting photos and give verdicts. */
export function maySitAtBench(actor: Actor | null, workroomId: number): boolean {
  return worksIn(actor, workroomId);
}

export function maySeeOffice(actor: Actor | null): boolean {
  return actor !== null && actor.isSteward;
}
