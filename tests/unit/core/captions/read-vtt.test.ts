import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { captionFaults, chapterFaults } from '#core/captions/caption-faults.ts';
import { readVtt } from '#core/captions/read-vtt.ts';
import { inOrder, shiftCues } from '#core/captions/shift-cues.ts';
import { cueAt, transcriptOf } from '#core/captions/transcript.ts';
import { captionsToVtt } from '#core/captions/web-vtt.ts';

const cue = (words: string, time = '00:01.000 --> 00:02.000'): string => `WEBVTT\n\n${time}\n${words}\n`;
const MINUTE = 60_000;
function cuesOf(text: string) {
  const reading = readVtt(text, MINUTE);
  if (!reading.ok) throw new Error(reading.problems.map(({ line, says }) => `${line}: ${says}`).join('\n'));
  return reading.cues;
}

describe('a WebVTT file', () => {
  test.each([
    ['with a signature alone on its line', 'WEBVTT\n\n00:01.000 --> 00:02.000\nOver one.', 'Over one.'],
    ['with a title, a byte order mark and the ends of lines of another system', '\uFEFFWEBVTT - Rya fringe\r\n\r\n1\r\n00:00:01.000 --> 00:00:02.000 align:start line:0\r\nOver one,\r\nunder the next.\r\n', 'Over one, under the next.'],
    ['with names of lines, notes, styles and regions', 'WEBVTT\nKind: captions\n\nNOTE made in spring\n\nSTYLE\n::cue { background: url(http://x.example) }\n\nREGION\nid:a\n\nfirst\n00:01.000 --> 00:02.000\nOver one.', 'Over one.'],
    ['with markup', cue('<b>Over</b> <i.loud>one</i>, <c.yellow>under</c> <00:01.500>the <lang en>next</lang>.'), 'Over one, under the next.'],
    ['with two voices', cue('<v Ilse Marrow>Over one.</v> <v.loud Wren>And under?</v>'), 'Ilse Marrow: Over one. Wren: And under?'],
    ['with a script', cue('<script>alert(1)</script>Over one.'), 'alert(1)Over one.'],
    ['with signs written out', cue('4 &lt; 5 &amp; 6 &gt; 5'), '4 < 5 & 6 > 5'],
    ['with a sign that turns the line round', cue('Over \u202Eone.'), 'Over one.'],
  ])('%s gives plain words', (_what, text, words) => {
    expect(cuesOf(text).map((one) => one.words)).toEqual([words]);
  });

  test('is written anew without anything but words and times, and reads the same again', () => {
    const words = fc.string({ unit: fc.constantFrom('a', 'B', ' ', '<', '>', '&', '-', 'é', '語'), minLength: 1, maxLength: 80 }).map((text) => `x${text}`.replace(/\s+/g, ' ').replaceAll('-->', '').trim());
    const lines = fc.array(fc.record({ fromMs: fc.nat(50_000), forMs: fc.integer({ min: 1, max: 9_000 }), words }), { minLength: 1, maxLength: 20 });
    fc.assert(fc.property(lines, (some) => {
      const cues = inOrder(some.map(({ fromMs, forMs, words: said }) => ({ fromMs, toMs: fromMs + forMs, words: said })));
      expect(cuesOf(captionsToVtt(cues))).toEqual(cues);
    }));
  });

  test.each([
    ['nothing', '', 1, 'no WebVTT'],
    ['an SRT file', '1\n00:00:01,000 --> 00:00:02,000\nOver one.\n', 1, 'SRT'],
    ['an end before its beginning', cue('Over one.', '00:05.000 --> 00:04.000'), 3, 'before it begins'],
    ['a time that is none', cue('Over one.', '1 --> 2'), 3, 'cannot be read'],
    ['61 seconds', cue('Over one.', '00:01.000 --> 00:61.000'), 3, 'cannot be read'],
    ['words without a time', 'WEBVTT\n\nOver one.\n', 3, 'no time over these words'],
    ['a time among the words', 'WEBVTT\n\n00:01.000 --> 00:02.000\nOver one.\n00:02.000 --> 00:03.000\nUnder.', 5, 'among the words'],
    ['no words', cue('<b></b>'), 3, 'no words'],
    ['lines out of order', 'WEBVTT\n\n00:05.000 --> 00:06.000\nB\n\n00:01.000 --> 00:02.000\nA', 6, 'before the one above'],
    ['a line after the end of the video', cue('Over one.', '01:01.000 --> 01:02.000'), 3, 'after the video'],
    ['a line that nobody reads in time', cue('Over one. '.repeat(60)), 3, 'At most 500'],
    ['letters of an old system', cue('\uFFFDber'), 4, 'UTF-8'],
    ['only a head', 'WEBVTT\n', 1, 'no line of captions'],
    ['fifty thousand lines', `WEBVTT\n${Array.from({ length: 50_000 }, (_, at) => `\n00:00:${String(at % 50).padStart(2, '0')}.000 --> 00:00:59.000\nx\n`).join('')}`, 1, '5,000'],
  ])('with %s is refused at its line', (_what, text, line, says) => {
    const reading = readVtt(text, MINUTE);
    expect(reading.ok).toBe(false);
    if (!reading.ok) expect(reading.problems.some((problem) => problem.says.includes(says) && (line === 1 || problem.line === line)), JSON.stringify(reading.problems.slice(0, 3))).toBe(true);
  });

  test('a second behind the end of the video is let be: words fade out', () => {
    expect(readVtt(cue('Over one.', '00:59.000 --> 01:01.000'), MINUTE).ok).toBe(true);
    expect(readVtt(cue('Over one.', '00:59.000 --> 01:01.001'), MINUTE).ok).toBe(false);
  });
});

describe('captions', () => {
  const cues = [{ fromMs: 1_000, toMs: 2_000, words: 'a' }, { fromMs: 3_000, toMs: 4_000, words: 'b' }];

  test('are shifted together, and back, but for what would begin before the film', () => {
    expect(shiftCues(shiftCues(cues, 700), -700)).toEqual(cues);
    expect(shiftCues(cues, -1_800)).toEqual([{ fromMs: 0, toMs: 500, words: 'a' }, { fromMs: 1_200, toMs: 2_200, words: 'b' }]);
  });

  test('are found by the place that plays', () => {
    expect([0, 1_000, 2_500, 3_000, 99_000].map((at) => cueAt(cues, at))).toEqual([-1, 0, 0, 1, 1]);
  });

  test('make a transcript under the chapters in which they are said', () => {
    const chapters = [{ atMs: 500, title: 'Begin' }, { atMs: 2_500, title: 'Go on' }, { atMs: 9_000, title: 'Nothing is said' }];
    expect(transcriptOf(cues, chapters).map(({ title, cues: said }) => [title, said.map(({ words }) => words)])).toEqual([['Begin', ['a']], ['Go on', ['b']]]);
    expect(transcriptOf(cues, [])).toHaveLength(1);
  });

  test('and chapters name what cannot stand, by its place in the list', () => {
    expect(captionFaults([...cues, { fromMs: 2_000, toMs: 1_000, words: ' ' }], 2_500).map(({ index }) => index)).toEqual([1, 2]);
    expect(chapterFaults([{ atMs: 0, title: 'A' }, { atMs: 0, title: 'B' }, { atMs: 9_000, title: '' }, { atMs: 9_500, title: 'C' }], 9_400).map(({ index }) => index)).toEqual([1, 2, 3]);
  });
});
