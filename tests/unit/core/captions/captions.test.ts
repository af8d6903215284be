import { describe, expect, it } from 'vitest';
import { cuesFor, inLines } from '#core/captions/cues.ts';
import { progressAt, timeStoryboard, type Storyboard } from '#core/captions/storyboard.ts';
import { captionsToVtt, chaptersToVtt, timestamp } from '#core/captions/web-vtt.ts';

describe('captions', () => {
  it('show a short one whole', () => {
    expect(cuesFor('Tie on at the first nail.', 1000, 4000)).toEqual([{ fromMs: 1000, toMs: 4000, words: 'Tie on at the first nail.' }]);
  });

  it('part a long one at the end of a sentence, without a gap', () => {
    const cues = cuesFor('Go down to the lower nail, round it, and up again to the next. Keep the thread straight and calm, not hard. It should sing.', 0, 9000);
    expect(cues.map((cue) => cue.words)).toEqual([
      'Go down to the lower nail, round it, and up again to the next.',
      'Keep the thread straight and calm, not hard. It should sing.',
    ]);
    expect(cues[0]?.toMs).toBe(cues[1]?.fromMs);
    expect(cues[1]?.toMs).toBe(9000);
  });

  it('never need more than two lines', () => {
    const long = 'word '.repeat(200);
    for (const cue of cuesFor(long, 0, 60_000)) {
      expect(cue.words.length).toBeLessThanOrEqual(84);
      expect(inLines(cue.words).length).toBeLessThanOrEqual(2);
    }
  });

  it('say nothing for nothing', () => {
    expect(cuesFor('  ', 0, 1000)).toEqual([]);
  });
});

describe('a WebVTT file', () => {
  it('has times, lines and escaped signs', () => {
    expect(captionsToVtt([{ fromMs: 0, toMs: 3_723_004, words: 'Over <one> & under the next, and again the other way about' }])).toBe(
      'WEBVTT\n\n00:00:00.000 --> 01:02:03.004\nOver &lt;one&gt; &amp; under the next,\nand again the other way about\n',
    );
  });

  it('lets each chapter last until the next', () => {
    expect(chaptersToVtt([{ atMs: 0, title: 'Tie on' }, { atMs: 4000, title: 'Wind' }], 9000)).toBe(
      'WEBVTT\n\n00:00:00.000 --> 00:00:04.000\nTie on\n\n00:00:04.000 --> 00:00:09.000\nWind\n',
    );
  });

  it('writes times in full', () => {
    expect(timestamp(61_005)).toBe('00:01:01.005');
  });
});

describe('a storyboard', () => {
  const board: Storyboard = {
    title: 'Dress the loom',
    scenes: [
      { figure: 'warping', from: 0, to: 0.5, seconds: 4, caption: 'Tie on.', chapter: 'Wind' },
      { figure: 'warping', from: 0.5, to: 1, seconds: 6, caption: 'Go on.' },
      { cloth: 'loom', from: 0, to: 0, seconds: 2, caption: 'Done.', chapter: 'Look' },
    ],
  };
  const timing = timeStoryboard(board);

  it('is as long as its scenes', () => {
    expect(timing.durationMs).toBe(12_000);
    expect(timing.cues.map((cue) => cue.fromMs)).toEqual([0, 4000, 10_000]);
  });

  it('begins chapters where it says so, and keeps them for the scenes that follow', () => {
    expect(timing.chapters).toEqual([{ atMs: 0, title: 'Wind' }, { atMs: 10_000, title: 'Look' }]);
    expect(timing.scenes.map((scene) => scene.chapter)).toEqual(['Wind', 'Wind', 'Look']);
  });

  it('moves first and then rests', () => {
    const second = timing.scenes[1];
    if (second === undefined) throw new Error('no second scene');
    expect(progressAt(second, 4000)).toBe(0.5);
    expect(progressAt(second, 4000 + 1800)).toBeCloseTo(0.75);
    expect(progressAt(second, 9000)).toBe(1);
    expect(progressAt(second, 10_000)).toBe(1);
  });
});
