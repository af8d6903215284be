/**
 * Captions as timed words.
 *
 * A caption stays short enough to read at a glance: at most two lines of {@link LINE_LENGTH} signs. A longer one is shown
 * as several, each for as long as its share of the words.
 */

export interface Cue {
  readonly fromMs: number;
  readonly toMs: number;
  readonly words: string;
}

export interface Chapter {
  readonly atMs: number;
  readonly title: string;
}

/** Signs in one line that a player can show large without breaking it again. */
const LINE_LENGTH = 42;
const MOST_SIGNS = 2 * LINE_LENGTH;

/** Cues for `words` that are said between two moments, in order and without a gap. Words are trimmed; none give no cue. */
export function cuesFor(words: string, fromMs: number, toMs: number): Cue[] {
  const parts = split(words.trim().replace(/\s+/g, ' '));
  const total = parts.reduce((sum, part) => sum + part.length, 0);
  let said = 0;
  return parts.map((part) => {
    const from = fromMs + ((toMs - fromMs) * said) / total;
    said += part.length;
    return { fromMs: Math.round(from), toMs: Math.round(fromMs + ((toMs - fromMs) * said) / total), words: part };
  });
}

/** Ends of sentences are the best places to part, then pauses within them, then any space. */
function split(words: string): string[] {
  if (words === '') return [];
  if (words.length <= MOST_SIGNS) return [words];
  const middle = words.length / 2;
  const places = [/[.:;?] /g, /, /g, / /g].map((sign) => nearest(words, sign, middle));
  const place = places.find((at) => at !== undefined && at > words.length * 0.2 && at < words.length * 0.8) ?? places.at(-1);
  if (place === undefined) return [words];
  return [...split(words.slice(0, place).trim()), ...split(words.slice(place).trim())];
}

/** Where the text may be parted after a sign, as near to `middle` as there is. */
function nearest(words: string, sign: RegExp, middle: number): number | undefined {
  let best: number | undefined;
  for (const found of words.matchAll(sign)) {
    const at = found.index + found[0].length;
    if (best === undefined || Math.abs(at - middle) < Math.abs(best - middle)) best = at;
  }
  return best;
}

/** A cue's words in one or two lines, the break as near to the middle as a space allows. */
export function inLines(words: string): string[] {
  if (words.length <= LINE_LENGTH) return [words];
  const at = nearest(words, / /g, words.length / 2);
  return at === undefined ? [words] : [words.slice(0, at).trim(), words.slice(at).trim()];
}
