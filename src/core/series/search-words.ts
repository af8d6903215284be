/**
 * Finding series by what somebody typed. Forms of one word find each other (*warping* finds *warp*), the nearest come
 * first, and a word that nothing has, typed badly, is taken for the one that was meant.
 */
import { nearestWord } from '#core/handbook/nearest-word.ts';
import { isCommonWord, stemOf } from '#core/questions/like-words.ts';

/** What is known of a series by words; what stands first weighs most. */
export interface SearchedTexts {
  readonly title: string;
  readonly techniques: readonly string[];
  readonly teacherName: string;
  readonly workroomName: string;
  readonly summary: string;
}

const MOST_TERMS = 6;

/** Without regard to case and accents. */
const plain = (text: string): string => text.normalize('NFD').replace(/\p{M}/gu, '').toLowerCase();
const wordsOf = (text: string): string[] => plain(text).match(/[\p{L}\p{N}]+/gu) ?? [];

/** At most six things to look for: stems of words, anything else as it was typed. Words of every sentence are passed over, unless there are no others. */
export function searchTerms(typed: string): string[] {
  const pieces = typed.normalize('NFC').split(/\s+/u).filter((piece) => piece !== '');
  const telling = pieces.filter((piece) => !isCommonWord(piece.toLowerCase()) && !/^\p{L}{1,2}$/u.test(piece));
  return [...new Set((telling.length > 0 ? telling : pieces).map((piece) => (/^\p{L}+$/u.test(piece) ? stemOf(piece.toLowerCase()) : piece)))].slice(0, MOST_TERMS);
}

const WEIGHTS: readonly [weight: number, words: (texts: SearchedTexts) => string][] = [
  [8, ({ title }) => title],
  [4, ({ techniques }) => techniques.join(' ')],
  [3, ({ teacherName, workroomName }) => `${teacherName} ${workroomName}`],
  [1, ({ summary }) => summary],
];

/** How near a series is to what is looked for: the more the further ahead. A term counts where it begins a word. */
export function nearness(terms: readonly string[], texts: SearchedTexts): number {
  return WEIGHTS.reduce((sum, [weight, of]) => {
    const words = wordsOf(of(texts));
    return sum + weight * terms.filter((term) => words.some((word) => word.startsWith(plain(term)))).length;
  }, 0);
}

/**
 * What was typed, with each word that nothing in `vocabulary` has changed into the nearest one there.
 * @returns null when there is nothing to change
 */
export function meantBy(typed: string, vocabulary: readonly string[]): string | null {
  const known = [...new Set(vocabulary.flatMap(wordsOf))].toSorted();
  const mended = typed.split(/\s+/u).filter((piece) => piece !== '').map((piece) => {
    const word = plain(piece);
    if (!/^\p{L}+$/u.test(word) || known.some((other) => other.includes(stemOf(word)))) return piece;
    return nearestWord(word, known) ?? piece;
  });
  const meant = mended.join(' ');
  return meant === typed.split(/\s+/u).filter((piece) => piece !== '').join(' ') ? null : meant;
}
