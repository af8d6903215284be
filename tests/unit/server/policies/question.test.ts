import { describe, expect, test } from 'vitest';
import type { Actor } from '#server/context.ts';
import type { LessonAccess } from '#server/policies/lesson.ts';
import { mayAnswer, mayAsk, mayChangeWords, mayPutBackWords, mayReportWords, maySeeQuestion, mayTakeOutWords, type WordsFacts } from '#server/policies/question.ts';

const WORKROOM = 7;
const person = (userId: number, given: Partial<Actor> = {}): Actor => ({
  userId, publicId: String(userId), name: '', email: '', addressConfirmed: true, addressRefused: false, isSteward: false, workroomId: null, workroomName: null,
  helpsInWorkroomIds: [], units: 'cm', timeZone: 'UTC', scheme: 'system', unreadNotices: 0, sessionId: '', provedAt: new Date(0), ...given,
});

/** Who looks, and what each may do with the part the question stands on. */
const PEOPLE = {
  visitor: [null, 'buy'],
  asker: [person(1), 'follow'],
  classmate: [person(2), 'follow'],
  'classmate whose part is shut': [person(3), 'wait'],
  'student without a seat': [person(4), 'buy'],
  'reader of a free part': [person(5), 'preview'],
  teacher: [person(6, { workroomId: WORKROOM }), 'look-after'],
  helper: [person(8, { helpsInWorkroomIds: [WORKROOM] }), 'look-after'],
  'other teacher': [person(9, { workroomId: 10 }), 'buy'],
  'helper elsewhere': [person(11, { helpsInWorkroomIds: [10] }), 'buy'],
  steward: [person(12, { isSteward: true }), 'buy'],
} as const satisfies Record<string, readonly [Actor | null, LessonAccess['may']]>;
type Who = keyof typeof PEOPLE;
const EVERYBODY = Object.keys(PEOPLE) as Who[];

const accessOf = (who: Who): LessonAccess => {
  const may = PEOPLE[who][1];
  return may === 'wait' ? { may, standing: { open: false, until: 'verdict', lesson: 'x' } } : { may };
};
const those = (may: (actor: Actor | null, who: Who) => boolean): Who[] => EVERYBODY.filter((who) => may(PEOPLE[who][0], who));
const question = (given: Partial<Parameters<typeof maySeeQuestion>[1]>) => (actor: Actor | null, who: Who): boolean =>
  maySeeQuestion(actor, { workroomId: WORKROOM, askerId: 1, isForClass: false, isTakenOut: false, access: accessOf(who), ...given });
const words = (given: Partial<WordsFacts>): WordsFacts => ({ kind: 'question', workroomId: WORKROOM, authorId: 1, isAnswered: false, takenOutById: null, isSeen: true, ...given });

describe('who may', () => {
  test('ask: who has a seat and the part open', () => {
    expect(those((actor, who) => mayAsk(actor, accessOf(who)))).toEqual(['asker', 'classmate']);
  });

  test('see a question to the teacher: both, and her helpers', () => {
    expect(those(question({}))).toEqual(['asker', 'teacher', 'helper']);
  });

  test('see a question to the class: whoever has that part open by a seat besides', () => {
    expect(those(question({ isForClass: true }))).toEqual(['asker', 'classmate', 'teacher', 'helper']);
  });

  test('see one that was taken out: no classmate', () => {
    expect(those(question({ isForClass: true, isTakenOut: true }))).toEqual(['asker', 'teacher', 'helper']);
  });

  test('answer: the teacher and her helpers', () => {
    expect(those((actor) => mayAnswer(actor, WORKROOM))).toEqual(['teacher', 'helper']);
  });

  test('change a question: its asker, until it is answered', () => {
    expect(those((actor) => mayChangeWords(actor, words({})))).toEqual(['asker']);
    expect(those((actor) => mayChangeWords(actor, words({ isAnswered: true })))).toEqual([]);
  });

  test('change an answer: whoever gave it, while she works there', () => {
    for (const [who, id] of [['teacher', 6], ['helper', 8]] as const) expect(those((actor) => mayChangeWords(actor, words({ kind: 'answer', authorId: id, isAnswered: true })))).toEqual([who]);
    expect(mayChangeWords(person(8), words({ kind: 'answer', authorId: 8, isAnswered: true }))).toBe(false);
    expect(mayTakeOutWords(person(8), words({ kind: 'answer', authorId: 8, isAnswered: true }))).toBe(false);
  });

  test('take words out: whose they are, and the teacher', () => {
    expect(those((actor) => mayTakeOutWords(actor, words({ isAnswered: true })))).toEqual(['asker', 'teacher']);
    expect(those((actor) => mayTakeOutWords(actor, words({ kind: 'answer', authorId: 8 })))).toEqual(['teacher', 'helper']);
    expect(those((actor) => mayTakeOutWords(actor, words({ takenOutById: 6 })))).toEqual([]);
  });

  test('put words back: whoever took them out', () => {
    expect(those((actor) => mayPutBackWords(actor, words({ takenOutById: 1 })))).toEqual(['asker']);
    expect(those((actor) => mayPutBackWords(actor, words({ takenOutById: 6 })))).toEqual(['teacher']);
    expect(those((actor) => mayPutBackWords(actor, words({ takenOutById: 12 })))).toEqual([]);
    expect(those((actor) => mayPutBackWords(actor, words({})))).toEqual([]);
  });

  test('report words: who sees them and did not write them, with an address that is confirmed', () => {
    expect(those((actor, who) => mayReportWords(actor, words({ isSeen: question({ isForClass: true })(actor, who) })))).toEqual(['classmate', 'teacher', 'helper']);
    expect(mayReportWords(person(2, { addressConfirmed: false }), words({}))).toBe(false);
    expect(mayReportWords(person(2), words({ takenOutById: 1 }))).toBe(false);
  });
});
