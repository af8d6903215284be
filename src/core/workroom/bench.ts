/** What holds at the bench: how long a verdict can be taken back, which phrases have keys, when an answer is late. */

/** How long a verdict waits before the student learns of it, in milliseconds. */
export const HOLD_MS = 10_000;

export const MOST_PHRASES = 20;
export const LONGEST_PHRASE = 300;

/** The key that puts in the phrase at `index`, from 0; undefined for those beyond the ninth. */
export const phraseKey = (index: number): string | undefined => (index < 9 ? String(index + 1) : undefined);

/** Phrases written one a line, in their order; empty lines and repeated ones go. */
export function phrasesOf(text: string): string[] {
  return [...new Set(text.split('\n').map((line) => line.trim().replace(/\s+/g, ' ')).filter((line) => line !== ''))];
}

/** `phrase` behind what is written already, as the next sentence. */
export function withPhrase(words: string, phrase: string): string {
  const before = words.trimEnd();
  if (before === '') return phrase;
  return `${before}${/[.!?:…]$/.test(before) ? '' : '.'} ${phrase}`;
}

const DAY_MS = 86_400_000;

/** True when an answer promised within `answerDays` days has not come. */
export function isLate(postedAt: Date, answerDays: number, now: Date): boolean {
  return now.getTime() - postedAt.getTime() > answerDays * DAY_MS;
}
