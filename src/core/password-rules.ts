/**
 * Which passwords are taken. Length is what makes one strong; no signs are demanded (NIST SP 800-63B-4 §3.1.1), but what
 * everybody tries first is refused: common passwords, what is easily guessed of this person or place, and patterns.
 */

/** Code points, counted in normalised form. */
export const SHORTEST_PASSWORD = 12;
/** For people whose account opens everybody's things. */
export const SHORTEST_STEWARD_PASSWORD = 15;
export const LONGEST_PASSWORD = 256;

export interface PasswordSurroundings {
  readonly isSteward: boolean;
  /** What others know of the person: her name, her address. */
  readonly ownWords: readonly string[];
  /** Whether many people use `text` (lower case) as a password, or as the body of one. */
  readonly isCommon: (text: string) => boolean;
}

export type PasswordVerdict =
  | { readonly ok: true }
  | { readonly ok: false; readonly reason: 'short' | 'long' | 'common' | 'pattern' | 'known'; readonly says: string };

/** Words that stand on this site's own pages, which whoever guesses here tries first. */
const SITE_WORDS = ['fellmark', 'password', 'weaving', 'weaver', 'woven', 'weave', 'loom', 'macrame', 'fiber', 'fibre', 'workshop', 'textile', 'yarn'];
/** Less than this, beside what is known or common, and the whole is guessed in no time. */
const ENOUGH_OF_ONES_OWN = 8;
/** Shorter parts of a name stand in too many words by chance. */
const SHORTEST_OWN_WORD = 4;
const FEWEST_SIGNS = 5;

const refuse = (reason: Exclude<PasswordVerdict, { ok: true }>['reason'], says: string): PasswordVerdict => ({ ok: false, reason, says });

/** Judges a password that somebody wants to have; the sentence says what would work. */
export function judgePassword(password: string, { isSteward, ownWords, isCommon }: PasswordSurroundings): PasswordVerdict {
  const signs = Array.from(password.normalize('NFKC'));
  const shortest = isSteward ? SHORTEST_STEWARD_PASSWORD : SHORTEST_PASSWORD;
  if (signs.length < shortest) return refuse('short', `This has ${signs.length} characters. At least ${shortest} work; three or four words in a row are easy to keep.`);
  if (signs.length > LONGEST_PASSWORD) return refuse('long', `This has ${signs.length} characters. At most ${LONGEST_PASSWORD} work.`);
  const folded = signs.join('').toLowerCase();
  if (isPattern(Array.from(folded))) return refuse('pattern', 'This repeats or counts up, so it is soon guessed. Take a few words that have nothing to do with each other.');
  if (isCommonInside(folded, isCommon)) return refuse('common', 'Many people use this password, so it is tried first. Take a few words that have nothing to do with each other.');
  if (isOfKnownWords(folded, [...SITE_WORDS, ...partsOf(ownWords)])) return refuse('known', 'This is made of your name, your address or words of this site, so it is soon guessed. Put words of your own in it.');
  return { ok: true };
}

/** Few different signs, one piece over and over, or a run such as 12345678 through most of it. */
function isPattern(signs: readonly string[]): boolean {
  if (new Set(signs).size < FEWEST_SIGNS) return true;
  const text = signs.join('');
  // A text that is a shorter one repeated is found in its own double before its end.
  if ((text + text).indexOf(text, 1) < text.length) return true;
  const steps = signs.slice(1).map((sign, at) => (sign.codePointAt(0) ?? 0) - (signs[at]?.codePointAt(0) ?? 0));
  const runs = steps.filter((step, at) => Math.abs(step) <= 1 && (step === steps[at - 1] || step === steps[at + 1]));
  return runs.length >= steps.length * 0.75;
}

/** Common as a whole, or a common one with little put before or behind it, once or twice. */
function isCommonInside(folded: string, isCommon: (text: string) => boolean): boolean {
  if (isCommon(folded)) return true;
  const body = folded.replace(/^[^\p{L}]+|[^\p{L}]+$/gu, '');
  if (body.length < SHORTEST_OWN_WORD || folded.length - body.length >= ENOUGH_OF_ONES_OWN) return false;
  const half = body.slice(0, body.length / 2);
  return isCommon(body) || (half.length >= SHORTEST_OWN_WORD && body === half + half && isCommon(half));
}

function partsOf(words: readonly string[]): string[] {
  return words
    .flatMap((word) => word.normalize('NFKC').toLowerCase().split(/[^\p{L}\p{N}]+/u))
    .filter((part) => part.length >= SHORTEST_OWN_WORD);
}

/** Whether taking out every known word leaves hardly a letter or figure. */
function isOfKnownWords(folded: string, known: readonly string[]): boolean {
  const longestFirst = [...known].sort((a, b) => b.length - a.length);
  const rest = longestFirst.reduce((text, word) => text.replaceAll(word, ' '), folded);
  return rest !== folded && Array.from(rest.replace(/[^\p{L}\p{N}]/gu, '')).length < ENOUGH_OF_ONES_OWN;
}
