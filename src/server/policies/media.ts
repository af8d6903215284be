/** Who may see a file of a person. Follows from what the file is used for. */
import type { Actor } from '#server/context.ts';
import { mayRead, worksIn, type LessonAccess } from '#server/policies/lesson.ts';

export type MediaUse =
  /** A progress photo in a student's thread. */
  | { readonly kind: 'progress-photo'; readonly studentId: number; readonly workroomId: number }
  /** A video or picture in parts of a series; `accesses` are the asker's to those parts. */
  | { readonly kind: 'lesson'; readonly workroomId: number; readonly accesses: readonly LessonAccess[] };

/** Whether somebody looks after the file, and so sees drafts of it too. */
export function looksAfterMedia(actor: Actor | null, ownerId: number, uses: readonly MediaUse[]): boolean {
  return (actor !== null && actor.userId === ownerId) || uses.some(({ workroomId }) => worksIn(actor, workroomId));
}

export function maySeeMedia(actor: Actor | null, ownerId: number, uses: readonly MediaUse[]): boolean {
  return looksAfterMedia(actor, ownerId, uses) || uses.some((use) => (use.kind === 'progress-photo' ? actor?.userId === use.studentId : use.accesses.some(mayRead)));
}
