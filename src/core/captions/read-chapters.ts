/** Chapters as a teacher types them: a line each, its time and then its title. */
import { chapterFaults } from '#core/captions/caption-faults.ts';
import { clockTime } from '#core/captions/clock-time.ts';
import type { Chapter } from '#core/captions/cues.ts';

export type ChapterReading = { readonly ok: true; readonly chapters: readonly Chapter[] } | { readonly ok: false; readonly says: string };

/** `6:40` or `1:02:05` as milliseconds; null for what is no such time. */
export function msOfClock(text: string): number | null {
  const [, hours = '0', minutes = '', seconds = ''] = /^(?:(\d{1,2}):(?=\d{2}:))?(\d{1,3}):([0-5]\d)$/.exec(text.trim()) ?? [];
  return minutes === '' ? null : ((Number(hours) * 60 + Number(minutes)) * 60 + Number(seconds)) * 1_000;
}

/** Empty lines are passed over. The sentence names the line. */
export function readChapters(text: string, durationMs: number | null): ChapterReading {
  const chapters: (Chapter & { line: number })[] = [];
  for (const [at, line] of text.split(/\r?\n/).entries()) {
    if (line.trim() === '') continue;
    const [, time = '', title = ''] = /^\s*(\S+)\s+(.+?)\s*$/.exec(line) ?? [];
    const atMs = msOfClock(time);
    if (atMs === null) return { ok: false, says: `Line ${at + 1}: begin with a time, then the title, like 1:10 Tie on at the corner nail.` };
    chapters.push({ atMs, title, line: at + 1 });
  }
  const [fault] = chapterFaults(chapters, durationMs);
  if (fault !== undefined) return { ok: false, says: `Line ${chapters[fault.index]?.line ?? chapters.length}: ${fault.says}` };
  return { ok: true, chapters: chapters.map(({ atMs, title }) => ({ atMs, title })) };
}

export function writeChapters(chapters: readonly Chapter[]): string {
  return chapters.map(({ atMs, title }) => `${clockTime(atMs)} ${title}`).join('\n');
}
