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

/** The teacher ends anybody's helping in her workroom, who helps her own. */
export function mayEndHelp(actor: Actor | null, { workroomId, helperId }: { readonly workroomId: number; readonly helperId: number }): boolean {
  return mayTeachIn(actor, workroomId) || (actor !== null && actor.userId === helperId && actor.helpsInWorkroomIds.includes(workroomId));
}

export function maySeeOffice(actor: Actor | null): boolean {
  return actor !== null && actor.isSteward;
}
