/** A film as stretches to draw: one for each chapter, with how much of it is woven. */
import type { Chapter } from '#contracts/media.ts';

export interface Stretch {
  readonly title: string | null;
  readonly fromMs: number;
  readonly toMs: number;
  /** 0 to 1. */
  readonly woven: number;
}

/** One stretch for the whole when there are no chapters; what lies before the first chapter belongs to it. */
export function stretchesOf(chapters: readonly Chapter[], durationMs: number, furthestMs: number): Stretch[] {
  const heads = chapters.length === 0 ? [{ atMs: 0, title: null }] : chapters;
  return heads.map(({ title }, index) => {
    const fromMs = index === 0 ? 0 : (heads[index]?.atMs ?? 0);
    const toMs = Math.max(fromMs + 1, heads[index + 1]?.atMs ?? durationMs);
    return { title, fromMs, toMs, woven: Math.min(1, Math.max(0, (furthestMs - fromMs) / (toMs - fromMs))) };
  });
}

/** `3 of 6 chapters watched`; how far, when there are none. */
export function watchedWords(stretches: readonly Stretch[]): string {
  if (stretches.length < 2) return `${Math.round((stretches[0]?.woven ?? 0) * 100)} % watched`;
  return `${stretches.filter(({ woven }) => woven > 0.98).length} of ${stretches.length} chapters watched`;
}

/** The stretch that plays at a moment, by its place. */
export function stretchAt(stretches: readonly Stretch[], atMs: number): number {
  return Math.max(0, stretches.findLastIndex(({ fromMs }) => fromMs <= atMs));
}
