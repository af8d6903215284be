/** Who may do what with a piece that is off the loom. Its maker alone, while she has the seat. */
import type { Actor } from '#server/context.ts';
import { maySeeOffice, mayTeachIn } from '#server/policies/workroom.ts';

export interface FinishFacts {
  readonly hasSeat: boolean;
  /** Every part is done, as the series counts it. */
  readonly hasFinished: boolean;
  /** She says that it is made, whatever the parts say. */
  readonly saysSo: boolean;
}

/** Photo, hours, yarn, label. */
export function mayWriteDown({ hasSeat, hasFinished, saysSo }: FinishFacts): boolean {
  return hasSeat && (hasFinished || saysSo);
}

/** A certificate says that every part is done: her own word is not enough for it. */
export function mayCertify({ hasSeat, hasFinished }: Pick<FinishFacts, 'hasSeat' | 'hasFinished'>): boolean {
  return hasSeat && hasFinished;
}

export interface WallFacts {
  /** The seat it was made on still counts. */
  readonly seatActive: boolean;
  readonly seriesPublished: boolean;
  /** She agreed, to this very photo, and did not take it back. */
  readonly agreed: boolean;
  readonly hidden: boolean;
}

/** Whether everybody sees a finished piece. The rule of the wall, of the page of the series and of the photo's file. */
export function isOnWall({ seatActive, seriesPublished, agreed, hidden }: WallFacts): boolean {
  return seatActive && seriesPublished && agreed && !hidden;
}

/** The teacher of the series looks after what is shown with it, the steward after all. */
export function mayTakeDown(actor: Actor | null, workroomId: number): boolean {
  return mayTeachIn(actor, workroomId) || maySeeOffice(actor);
}
