/**
 * Letters a person is sent only because she asked for them, workroom by workroom. Letters about her own doings (a
 * receipt, a verdict, an opened part) are no such kind: they always come.
 */
export const LETTER_KINDS = ['notices', 'nudges'] as const;
export type LetterKind = (typeof LETTER_KINDS)[number];

/** What she reads where she says yes. A change of these words is a new number: what was agreed to is on record by it. */
export const LETTER_WORDING = 1;
export const LETTER_WORDS: Readonly<Record<LetterKind, string>> = {
  notices: 'Notices by letter: what the teacher writes to everybody in a series',
  nudges: 'Nudges by letter: a word from the teacher when your loom has stood still',
};

export const LETTER_NAMES: Readonly<Record<LetterKind, string>> = { notices: 'Notices', nudges: 'Nudges' };
