/** How long something has waited, in words. */
const MINUTE_MS = 60_000;
const NO_BREAK = '\u00a0';
const unit = (value: number, word: string): string => `${String(value)}${NO_BREAK}${word}`;

/** `20 min`, `11 h`, `1 day 13 h`, `9 days`. */
export function waitedWords(since: Date, now: Date): string {
  const minutes = Math.max(0, Math.floor((now.getTime() - since.getTime()) / MINUTE_MS));
  if (minutes < 60) return unit(Math.max(1, minutes), 'min');
  const hours = Math.floor(minutes / 60);
  if (hours < 24) return unit(hours, 'h');
  const days = Math.floor(hours / 24);
  const rest = hours % 24;
  const whole = unit(days, days === 1 ? 'day' : 'days');
  return days >= 7 || rest === 0 ? whole : `${whole} ${unit(rest, 'h')}`;
}

const SMALL = ['No', 'One', 'Two', 'Three', 'Four', 'Five', 'Six', 'Seven', 'Eight', 'Nine', 'Ten', 'Eleven', 'Twelve'] as const;

/** `Three`, as a sentence begins; figures from 13 on. */
export const countWord = (count: number): string => SMALL[count] ?? String(count);

/** The middle one of the values, or halfway between the two in the middle; undefined of none. */
export function middleOf(values: readonly number[]): number | undefined {
  const sorted = values.toSorted((a, b) => a - b);
  const half = Math.floor(sorted.length / 2);
  const [before, after] = [sorted[half - 1], sorted[half]];
  if (after === undefined) return undefined;
  return sorted.length % 2 === 1 || before === undefined ? after : (before + after) / 2;
}
