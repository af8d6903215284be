/** What is being said of a photo, its words and pinned notes, while it is written: a state and what can happen to it, apart from any screen. */
import type { NoteInput } from '#contracts/bench.ts';
import { withPhrase } from '#core/workroom/bench.ts';

export interface Answer {
  /** To the student, above the notes. */
  readonly words: string;
  readonly notes: readonly NoteInput[];
  /** Index of the note that moves by the arrow keys and takes phrases; -1 when the words to the student do. */
  readonly chosen: number;
  /** Where the hand goes next, after a pin was put. */
  readonly reach: 'pin' | 'note' | null;
}

export type AnswerEvent =
  /** By key the pin itself is in hand next, by mouse the words of its note; a finger keeps the photo in sight. */
  | { readonly kind: 'put'; readonly xPermille: number; readonly yPermille: number; readonly shot?: number; readonly by: 'key' | 'mouse' | 'touch' }
  | { readonly kind: 'place'; readonly index: number; readonly xPermille: number; readonly yPermille: number }
  | { readonly kind: 'nudge'; readonly index: number; readonly dx: number; readonly dy: number }
  | { readonly kind: 'choose'; readonly index: number }
  | { readonly kind: 'write'; readonly words: string }
  | { readonly kind: 'write-note'; readonly index: number; readonly words: string }
  | { readonly kind: 'insert'; readonly phrase: string }
  | { readonly kind: 'take-out'; readonly index: number };

export const MOST_PINS = 20;
const REACH = { key: 'pin', mouse: 'note', touch: null } as const;

const within = (permille: number): number => Math.max(0, Math.min(1_000, Math.round(permille)));

export function newAnswer(words: string, notes: readonly NoteInput[]): Answer {
  return { words, notes, chosen: -1, reach: null };
}

export function answerAfter(answer: Answer, event: AnswerEvent): Answer {
  const { notes, chosen } = answer;
  const changed = (at: number, change: (note: NoteInput) => NoteInput): readonly NoteInput[] => notes.map((note, index) => (index === at ? change(note) : note));
  switch (event.kind) {
    case 'put':
      if (notes.length >= MOST_PINS) return answer;
      return { ...answer, notes: [...notes, { words: '', xPermille: within(event.xPermille), yPermille: within(event.yPermille), ...(event.shot !== undefined && { shot: event.shot }) }], chosen: notes.length, reach: REACH[event.by] };
    case 'place':
      return { ...answer, notes: changed(event.index, (note) => ({ ...note, xPermille: within(event.xPermille), yPermille: within(event.yPermille) })), chosen: event.index, reach: null };
    case 'nudge':
      return {
        ...answer,
        chosen: event.index,
        reach: null,
        notes: changed(event.index, (note) => (note.xPermille === null || note.yPermille === null ? note : { ...note, xPermille: within(note.xPermille + event.dx), yPermille: within(note.yPermille + event.dy) })),
      };
    case 'choose':
      return { ...answer, chosen: event.index, reach: null };
    case 'write':
      return { ...answer, words: event.words };
    case 'write-note':
      return { ...answer, notes: changed(event.index, (note) => ({ ...note, words: event.words })) };
    case 'insert':
      return notes[chosen] === undefined
        ? { ...answer, words: withPhrase(answer.words, event.phrase) }
        : { ...answer, notes: changed(chosen, (note) => ({ ...note, words: withPhrase(note.words, event.phrase) })) };
    case 'take-out':
      return { ...answer, notes: notes.filter((_note, index) => index !== event.index), chosen: -1, reach: null };
  }
}
