/**
 * Who may read a lesson. The one place of the rule: pages, media, photos and ticks all ask here.
 */
import type { Standing } from '#core/timetable/opening.ts';
import type { Actor } from '#server/context.ts';

export interface LessonFacts {
  readonly workroomId: number;
  readonly seriesPublished: boolean;
  readonly lessonPublished: boolean;
  readonly isPreview: boolean;
  /** The asker's seat in this series, if she has one. */
  readonly seat: { readonly active: boolean; readonly standing: Standing } | null;
}

export type LessonAccess =
  /** Looks after the series: sees drafts. */
  | { readonly may: 'look-after' }
  /** Has a seat and the part is open. */
  | { readonly may: 'follow' }
  /** Free to read. */
  | { readonly may: 'preview' }
  /** Has a seat, but the part is not open yet. */
  | { readonly may: 'wait'; readonly standing: Standing }
  /** The series may be seen, this part belongs to a seat. */
  | { readonly may: 'buy' }
  /** Must look as if there were nothing. */
  | { readonly may: 'nothing' };

export function worksIn(actor: Actor | null, workroomId: number): boolean {
  return actor !== null && (actor.workroomId === workroomId || actor.helpsInWorkroomIds.includes(workroomId));
}

export function lessonAccess(actor: Actor | null, facts: LessonFacts): LessonAccess {
  if (worksIn(actor, facts.workroomId)) return { may: 'look-after' };
  if (!facts.lessonPublished) return { may: 'nothing' };
  if (actor !== null && facts.seat?.active === true) {
    return facts.seat.standing.open || facts.isPreview ? { may: 'follow' } : { may: 'wait', standing: facts.seat.standing };
  }
  if (!facts.seriesPublished) return { may: 'nothing' };
  return facts.isPreview ? { may: 'preview' } : { may: 'buy' };
}

/** True when the text, video and files of the lesson may leave the server to the asker. */
export function mayRead(access: LessonAccess): boolean {
  return access.may === 'look-after' || access.may === 'follow' || access.may === 'preview';
}
