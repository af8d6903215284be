/** The nearest known word to one that is not known: what a slip of the finger meant. */

/** No shorter word is corrected: too many words are near it. */
const SHORTEST = 4;
/** From so many letters on two slips are forgiven. */
const TWO_SLIPS_FROM = 7;

/**
 * @param stem small letters, perhaps without an ending
 * @returns the known word, or the beginning of one, that the fewest slips make of it; undefined where none is near
 */
export function nearestWord(stem: string, known: Iterable<string>): string | undefined {
  if (stem.length < SHORTEST) return undefined;
  const most = stem.length >= TWO_SLIPS_FROM ? 2 : 1;
  let best: { readonly word: string; readonly slips: number } | undefined;
  for (const word of known) {
    if (Math.abs(word.length - stem.length) > most + 2 || word.length < SHORTEST - 1) continue;
    // The stem has lost its ending; the word has not.
    const slips = Math.min(slipsBetween(stem, word), slipsBetween(stem, word.slice(0, stem.length)));
    if (slips <= most && (best === undefined || slips < best.slips || (slips === best.slips && isCloser(word, best.word, stem)))) best = { word, slips };
  }
  return best?.word;
}

/** Of two equally near words the one that begins alike, then the shorter, then the first by letters. */
function isCloser(word: string, than: string, stem: string): boolean {
  const rank = (one: string): string => `${one.startsWith(stem.slice(0, 2)) ? 0 : 1} ${String(one.length).padStart(3, '0')} ${one}`;
  return rank(word) < rank(than);
}

/** Letters put in, left out, changed, or neighbours that changed places (optimal string alignment). */
export function slipsBetween(a: string, b: string): number {
  let [before, row]: [number[], number[]] = [[], Array.from({ length: b.length + 1 }, (_, at) => at)];
  for (let i = 1; i <= a.length; i++) {
    const next = [i];
    for (let j = 1; j <= b.length; j++) {
      const same = a[i - 1] === b[j - 1] ? 0 : 1;
      const swapped = i > 1 && j > 1 && a[i - 1] === b[j - 2] && a[i - 2] === b[j - 1] ? (before[j - 2] ?? Infinity) + 1 : Infinity;
      next.push(Math.min((row[j] ?? Infinity) + 1, (next[j - 1] ?? Infinity) + 1, (row[j - 1] ?? Infinity) + same, swapped));
    }
    [before, row] = [row, next];
  }
  return row[b.length] ?? Infinity;
}
