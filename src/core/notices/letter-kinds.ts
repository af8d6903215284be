/**
 * Letters that a person chooses, workroom by workroom. Those of `LETTER_KINDS` come only because she asked for them. Letters
 * about answers (to a photo, to a question) come at once until she chooses otherwise. What else is about her own doings (a
 * receipt, an opened part) is no such kind: it always comes.
 */
export const LETTER_KINDS = ['notices', 'nudges'] as const;
export type LetterKind = (typeof LETTER_KINDS)[number];

/** Everything that can be left by a letter's link. */
export const LIST_KINDS = [...LETTER_KINDS, 'answers'] as const;
export type ListKind = (typeof LIST_KINDS)[number];

/** What she reads where she says yes. A change of these words is a new number: what was agreed to is on record by it. */
export const LETTER_WORDING = 1;
export const LETTER_WORDS: Readonly<Record<LetterKind, string>> = {
  notices: 'Notices by letter: what the teacher writes to everybody in a series',
  nudges: 'Nudges by letter: a word from the teacher when your loom has stood still',
};

export const LETTER_NAMES: Readonly<Record<ListKind, string>> = { notices: 'Notices', nudges: 'Nudges', answers: 'Answers' };

/** How often letters about answers come. */
export const ANSWER_PACES = ['at-once', 'daily', 'never'] as const;
export type AnswerPace = (typeof ANSWER_PACES)[number];
