/** Captions and chapters as WebVTT files (W3C WebVTT: The Web Video Text Tracks Format). */
import { inLines, type Chapter, type Cue } from '#core/captions/cues.ts';

export function captionsToVtt(cues: readonly Cue[]): string {
  return `WEBVTT\n${cues.map((cue) => block(cue.fromMs, cue.toMs, inLines(cue.words).map(escaped).join('\n'))).join('')}`;
}

/** Each chapter lasts until the next one begins, the last until the end. */
export function chaptersToVtt(chapters: readonly Chapter[], durationMs: number): string {
  const blocks = chapters.map((chapter, index) => block(chapter.atMs, chapters[index + 1]?.atMs ?? durationMs, escaped(chapter.title)));
  return `WEBVTT\n${blocks.join('')}`;
}

function block(fromMs: number, toMs: number, text: string): string {
  return `\n${timestamp(fromMs)} --> ${timestamp(toMs)}\n${text}\n`;
}

/** `hh:mm:ss.ttt` */
export function timestamp(ms: number): string {
  const all = Math.max(0, Math.round(ms));
  const pad = (value: number, digits = 2): string => String(value).padStart(digits, '0');
  return `${pad(Math.floor(all / 3_600_000))}:${pad(Math.floor(all / 60_000) % 60)}:${pad(Math.floor(all / 1000) % 60)}.${pad(all % 1000, 3)}`;
}

/** Cue text knows markup, so its signs are written out; a line cannot look like a timing either. */
function escaped(words: string): string {
  return words.replace(/&/g, '&amp;').replace(/</g, '&lt;').replace(/>/g, '&gt;');
}
