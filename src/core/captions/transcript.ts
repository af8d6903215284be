/** The spoken words as a text to read and search, made from captions and chapters. */
import type { Chapter, Cue } from '#core/captions/cues.ts';

export interface TranscriptStretch {
  /** Null before the first chapter. */
  readonly title: string | null;
  readonly atMs: number;
  readonly cues: readonly Cue[];
}

/** Cues under the chapter in which they begin, in order; chapters in which nothing is said are left out. */
export function transcriptOf(cues: readonly Cue[], chapters: readonly Chapter[]): TranscriptStretch[] {
  const heads = [{ title: null, atMs: 0 }, ...chapters];
  return heads
    .map(({ title, atMs }, index) => {
      const untilMs = heads[index + 1]?.atMs ?? Infinity;
      return { title, atMs, cues: cues.filter(({ fromMs }) => fromMs >= atMs && fromMs < untilMs) };
    })
    .filter((stretch) => stretch.cues.length > 0);
}

/** The place of the cue heard at a moment; the last one that has begun, while nothing is said; -1 before the first. */
export function cueAt(cues: readonly Cue[], atMs: number): number {
  return cues.findLastIndex(({ fromMs }) => fromMs <= atMs);
}
