/**
 * Reads a WebVTT file (W3C WebVTT: The Web Video Text Tracks Format) into plain lines, strictly: every place that does
 * not fit is told by its line. Only words and times are taken. Notes, styles, regions, places on the screen and markup
 * are left behind; who speaks is kept as words. What is shown later is written anew from these lines.
 */
import { captionFaults, CAPTION_LIMITS, type CaptionFault } from '#core/captions/caption-faults.ts';
import type { Cue } from '#core/captions/cues.ts';

export interface VttProblem {
  /** Line of the file, from 1. */
  readonly line: number;
  readonly says: string;
}

export type VttReading = { readonly ok: true; readonly cues: readonly Cue[] } | { readonly ok: false; readonly problems: readonly VttProblem[] };

const MOST_PROBLEMS = 20;
const TIME = /^(?:(\d{2,}):)?([0-5]\d):([0-5]\d)\.(\d{3})$/;
const ARROW = '-->';

interface Block {
  readonly line: number;
  readonly lines: readonly string[];
}

/** `durationMs` of the video the lines belong to; null while it is not known. */
export function readVtt(text: string, durationMs: number | null): VttReading {
  const lines = text.replace(/^\uFEFF/, '').split(/\r\n|\r|\n/);
  if (!/^WEBVTT(?:[ \t].*)?$/.test(lines[0] ?? '')) return { ok: false, problems: [{ line: 1, says: noSignature(lines) }] };
  if (lines.some((line) => line.includes('\0') || line.includes('\uFFFD'))) return { ok: false, problems: [{ line: lines.findIndex((line) => /[\0\uFFFD]/.test(line)) + 1, says: 'This file is not written in UTF-8. Save it as UTF-8 and send it again.' }] };
  const cues: (Cue & { line: number })[] = [];
  const problems: VttProblem[] = [];
  for (const block of blocksOf(lines)) {
    const read = readBlock(block);
    if (read === null) continue;
    if ('says' in read) problems.push(read);
    else cues.push(read);
    if (cues.length > CAPTION_LIMITS.maxCues) return { ok: false, problems: [{ line: block.line, says: `At most ${CAPTION_LIMITS.maxCues.toLocaleString('en-GB')} lines of captions work.` }] };
  }
  const lineOf = ({ index, says }: CaptionFault): VttProblem => ({ line: cues[index]?.line ?? 1, says });
  problems.push(...captionFaults(cues, durationMs).map(lineOf));
  if (cues.length === 0 && problems.length === 0) problems.push({ line: 1, says: 'There is no line of captions in this file.' });
  if (problems.length > 0) return { ok: false, problems: problems.sort((a, b) => a.line - b.line).slice(0, MOST_PROBLEMS) };
  return { ok: true, cues: cues.map(({ fromMs, toMs, words }) => ({ fromMs, toMs, words })) };
}

/** Stretches of lines without an empty one, after the head of the file. */
function blocksOf(lines: readonly string[]): Block[] {
  const blocks: { line: number; lines: string[] }[] = [];
  let open = false;
  for (const [at, line] of lines.entries()) {
    if (line === '') open = false;
    else if (open) blocks.at(-1)?.lines.push(line);
    else {
      blocks.push({ line: at + 1, lines: [line] });
      open = true;
    }
  }
  return blocks.slice(1);
}

/** Null for what is no line of captions: notes, styles, regions. */
function readBlock({ line, lines }: Block): (Cue & { line: number }) | VttProblem | null {
  const [first = '', second = ''] = lines;
  if (/^(?:NOTE|STYLE|REGION)(?:[ \t]|$)/.test(first)) return null;
  const at = first.includes(ARROW) ? 0 : second.includes(ARROW) ? 1 : null;
  if (at === null) return { line, says: 'There is no time over these words. It is written like 00:01.500 --> 00:04.000.' };
  const [from, to] = (lines[at] ?? '').split(ARROW).map((side) => msOf(side.trim().split(/[ \t]/)[0] ?? ''));
  if (from == null || to == null) return { line: line + at, says: 'This time cannot be read. It is written like 00:01.500 --> 00:04.000.' };
  const said = lines.slice(at + 1);
  const misplaced = said.findIndex((words) => words.includes(ARROW));
  if (misplaced !== -1) return { line: line + at + 1 + misplaced, says: 'A time stands among the words. Put an empty line before it.' };
  return { line: line + at, fromMs: from, toMs: to, words: plainWords(said.join(' ')) };
}

function msOf(text: string): number | null {
  const [, hours = '0', minutes = '', seconds = '', ms = ''] = TIME.exec(text) ?? [];
  return minutes === '' ? null : ((Number(hours) * 60 + Number(minutes)) * 60 + Number(seconds)) * 1_000 + Number(ms);
}

/** The words as they are heard: tags gone, but for who speaks; what was written as a sign of markup is the sign itself. */
function plainWords(text: string): string {
  return text
    .replace(/<v(?:\.[^\s>]*)?\s+([^<>]+)>/g, (_tag, speaker: string) => `${speaker.trim()}: `)
    .replace(/<[^<>]*>/g, '')
    .replace(/[<>]/g, '')
    .replace(/&(amp|lt|gt|nbsp|lrm|rlm);/g, (_sign, name: 'amp' | 'lt' | 'gt' | 'nbsp' | 'lrm' | 'rlm') => SIGNS[name])
    // Control and direction signs could turn a line round, or hide a part of it.
    .replace(/[\p{Cc}\u200E\u200F\u202A-\u202E\u2066-\u2069]/gu, ' ')
    .replace(/\s+/g, ' ')
    .trim();
}

const SIGNS = { amp: '&', lt: '<', gt: '>', nbsp: ' ', lrm: '', rlm: '' } as const;

function noSignature(lines: readonly string[]): string {
  const isSrt = lines.slice(0, 20).some((line) => /^\d{2}:\d{2}:\d{2},\d{3} --> /.test(line));
  return isSrt ? 'This is an SRT file. Most programs that write it can save WebVTT as well; send that.' : 'This is no WebVTT file: its first line must be WEBVTT.';
}
