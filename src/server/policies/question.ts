/** Who may ask, see, answer, change, take out and report words on a part. The one place of these rules. */
import type { Actor } from '#server/context.ts';
import { worksIn, type LessonAccess } from '#server/policies/lesson.ts';
import { mayPost } from '#server/policies/person.ts';
import { mayTeachIn } from '#server/policies/workroom.ts';

/** A question as the rules see it. */
export interface QuestionFacts {
  readonly workroomId: number;
  readonly askerId: number;
  readonly isForClass: boolean;
  readonly isTakenOut: boolean;
  /** What the person who looks may do with the part it stands on. */
  readonly access: LessonAccess;
}

/** A question's or an answer's words as the rules see them. */
export interface WordsFacts {
  readonly kind: 'question' | 'answer';
  readonly workroomId: number;
  readonly authorId: number;
  /** Whether the question, or the one that was answered, has an answer. */
  readonly isAnswered: boolean;
  /** Who took them out; null while they stand. */
  readonly takenOutById: number | null;
  /** Whether the person who looks sees the question they belong to. */
  readonly isSeen: boolean;
}

/** Ask on a part: who has a seat and the part open. */
export function mayAsk(actor: Actor | null, access: LessonAccess): boolean {
  return actor !== null && access.may === 'follow';
}

/** A question to the teacher is between both and her helpers; one to the class is for whoever has the part open by a seat. */
export function maySeeQuestion(actor: Actor | null, facts: QuestionFacts): boolean {
  if (actor === null) return false;
  if (worksIn(actor, facts.workroomId) || actor.userId === facts.askerId) return true;
  return facts.isForClass && !facts.isTakenOut && facts.access.may === 'follow';
}

export function mayAnswer(actor: Actor | null, workroomId: number): boolean {
  return worksIn(actor, workroomId);
}

/** Own words only: a question until it is answered, since an answer stands to the words it was given to. */
export function mayChangeWords(actor: Actor | null, facts: WordsFacts): boolean {
  return isStanding(facts) && isOwn(actor, facts) && (facts.kind === 'answer' || !facts.isAnswered);
}

/** Own words, and in her workroom the teacher everybody's. */
export function mayTakeOutWords(actor: Actor | null, facts: WordsFacts): boolean {
  return isStanding(facts) && looksAfter(actor, facts);
}

/** Whoever took them out puts them back. */
export function mayPutBackWords(actor: Actor | null, facts: WordsFacts): boolean {
  return actor !== null && facts.takenOutById === actor.userId && looksAfter(actor, facts);
}

/** Words of somebody else that one sees. */
export function mayReportWords(actor: Actor | null, facts: WordsFacts): boolean {
  return mayPost(actor) && facts.isSeen && isStanding(facts) && actor?.userId !== facts.authorId;
}

const isStanding = ({ takenOutById }: WordsFacts): boolean => takenOutById === null;

/** Who helps no longer has no say in what she answered. */
function isOwn(actor: Actor | null, { kind, authorId, workroomId }: WordsFacts): boolean {
  return actor !== null && actor.userId === authorId && (kind === 'question' || worksIn(actor, workroomId));
}

function looksAfter(actor: Actor | null, facts: WordsFacts): boolean {
  return isOwn(actor, facts) || mayTeachIn(actor, facts.workroomId);
}
