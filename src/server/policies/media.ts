/** Who may see a file of a person. Follows from what the file is used for. */
import type { Actor } from '#server/context.ts';
import { mayRead, worksIn, type LessonAccess } from '#server/policies/lesson.ts';

export type MediaUse =
  /** A progress photo in a student's thread. */
  | { readonly kind: 'progress-photo'; readonly studentId: number; readonly workroomId: number }
  /** The photo of a finished piece: its maker's alone, until she hangs it on the wall. */
  | { readonly kind: 'finished'; readonly onWall: boolean }
  /** A video or picture in parts of a series; `accesses` are the asker's to those parts. */
  | { readonly kind: 'lesson'; readonly workroomId: number; readonly accesses: readonly LessonAccess[] };

/** Whether somebody looks after the file, and so sees drafts of it too. */
export function looksAfterMedia(actor: Actor | null, ownerId: number, uses: readonly MediaUse[]): boolean {
  return (actor !== null && actor.userId === ownerId) || uses.some((use) => use.kind !== 'finished' && worksIn(actor, use.workroomId));
}

export function maySeeMedia(actor: Actor | null, ownerId: number, uses: readonly MediaUse[]): boolean {
  return looksAfterMedia(actor, ownerId, uses) || uses.some((use) => isOpenBy(actor, use));
}

function isOpenBy(actor: Actor | null, use: MediaUse): boolean {
  switch (use.kind) {
    case 'progress-photo':
      return actor?.userId === use.studentId;
    case 'finished':
      return use.onWall;
    case 'lesson':
      return use.accesses.some(mayRead);
  }
}
