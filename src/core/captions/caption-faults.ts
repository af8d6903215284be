/** What captions and chapters must be, wherever they come from: a file, the editor, another house. */
import type { Chapter, Cue } from '#core/captions/cues.ts';
import { clockTime } from '#core/captions/clock-time.ts';

export const CAPTION_LIMITS = { maxCues: 5_000, maxSigns: 500, maxFileBytes: 900_000, maxChapters: 60, maxTitleSigns: 80 } as const;

/** The end of the last words may lie a little behind the picture. */
const LEEWAY_MS = 1_000;

export interface CaptionFault {
  /** Which one in the list, from 0. */
  readonly index: number;
  readonly says: string;
}

/** Every cue that cannot stand as it is. `durationMs` of the video; null while it is not known. */
export function captionFaults(cues: readonly Cue[], durationMs: number | null): CaptionFault[] {
  const faults = cues.flatMap((cue, index) => {
    const says = cueFault(cue, cues[index - 1], durationMs);
    return says === null ? [] : [{ index, says }];
  });
  return cues.length > CAPTION_LIMITS.maxCues ? [{ index: CAPTION_LIMITS.maxCues, says: `At most ${CAPTION_LIMITS.maxCues.toLocaleString('en-GB')} lines work.` }, ...faults] : faults;
}

function cueFault({ fromMs, toMs, words }: Cue, before: Cue | undefined, durationMs: number | null): string | null {
  if (words.trim() === '') return 'This line has no words.';
  if (words.length > CAPTION_LIMITS.maxSigns) return `This line has ${words.length} signs. At most ${CAPTION_LIMITS.maxSigns} work: make two of it.`;
  if (!(toMs > fromMs)) return `This line ends at ${clockTime(toMs)}, before it begins.`;
  if (before !== undefined && fromMs < before.fromMs) return `This line begins at ${clockTime(fromMs)}, before the one above it.`;
  return durationMs !== null && toMs > durationMs + LEEWAY_MS ? `This line ends at ${clockTime(toMs)}, after the video (${clockTime(durationMs)}).` : null;
}

/** Every chapter that cannot stand as it is. */
export function chapterFaults(chapters: readonly Chapter[], durationMs: number | null): CaptionFault[] {
  const faults = chapters.flatMap(({ atMs, title }, index): CaptionFault[] => {
    const before = chapters[index - 1];
    if (title.trim() === '') return [{ index, says: 'This chapter has no title.' }];
    if (title.length > CAPTION_LIMITS.maxTitleSigns) return [{ index, says: `At most ${CAPTION_LIMITS.maxTitleSigns} signs work in a title.` }];
    if (before !== undefined && atMs <= before.atMs) return [{ index, says: `This chapter begins at ${clockTime(atMs)}, not after the one above it.` }];
    return durationMs !== null && atMs >= durationMs ? [{ index, says: `This chapter begins at ${clockTime(atMs)}, after the video (${clockTime(durationMs)}).` }] : [];
  });
  return chapters.length > CAPTION_LIMITS.maxChapters ? [{ index: CAPTION_LIMITS.maxChapters, says: `At most ${CAPTION_LIMITS.maxChapters} chapters work.` }, ...faults] : faults;
}
