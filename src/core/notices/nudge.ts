/** A nudge: a word to one student whose loom stands still. */
import { DAY_MS } from '#core/workroom/class-place.ts';

/** Between two nudges to one person, from one workroom. */
export const NUDGE_DAYS = 3;

/** When the next one may go; null when none has gone yet. */
export function nextNudgeAt(last: Date | null): Date | null {
  return last === null ? null : new Date(last.getTime() + NUDGE_DAYS * DAY_MS);
}

export const nudgeTitle = (series: string): string => `How is ${series} going?`;

/** Words to begin with; the teacher writes her own over them. `part` null: not known. */
export function nudgeWords({ days, part }: { readonly days: number; readonly part: { readonly number: number; readonly title: string } | null }): string {
  const where = part === null ? '' : ` at Part ${part.number}, ${part.title}`;
  const since = days < 2 ? 'Your loom stands' : `Your loom has stood still for ${days} days`;
  return `${since}${where}. That happens to everybody.\n\nIf something there does not go well, show me a photo of it: most things can be mended. If you are only busy, leave it so. What is open stays open, and the warp waits for you.`;
}
