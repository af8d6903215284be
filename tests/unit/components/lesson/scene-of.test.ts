import { readdirSync, readFileSync } from 'node:fs';
import { describe, expect, test } from 'vitest';
import { clockTime } from '#core/captions/clock-time.ts';
import { stepInHand } from '#components/lesson/scene.ts';
import { sceneOf, type SceneSources } from '#components/lesson/scene-of.ts';
import type { SeriesMediaFile } from '#contracts/media.ts';
import type { FrameLoomPiece } from '#core/craft/piece.ts';
import { planPiece } from '#core/craft/plan.ts';
import { factsOf } from '#core/lesson-text/lesson-facts.ts';
import { parseLessonText } from '#core/lesson-text/parse-lesson-text.ts';

const folder = new URL('../../../../content/series/low-tide/', import.meta.url);
const piece = JSON.parse(readFileSync(new URL('piece.json', folder), 'utf8')) as FrameLoomPiece;
const planned = planPiece(piece);
if (!planned.ok) throw new Error('Low Tide can be woven.');
const plan = planned.value;

function sources(source: string, extra: Partial<SceneSources> = {}): SceneSources {
  const read = parseLessonText(source);
  if (!read.ok) throw new Error(read.problems[0]?.reason);
  return { facts: factsOf(read.tree), made: { piece, plan, halfway: null }, units: 'cm', media: [], ticked: [], ...extra };
}

const file = { key: 'x/y', contentType: 'video/mp4', byteCount: 1 };
const video: SeriesMediaFile = {
  kind: 'video', durationMs: 60_000, isDraft: false,
  name: 'dress-the-loom',
  title: 'Dress the loom',
  publicId: 'v'.repeat(26),
  files: { video: file },
  detail: { chapters: [{ atMs: 0, title: 'Begin' }], cues: [{ fromMs: 0, toMs: 900, words: 'Wind the warp.' }] },
};

describe('the scene of a lesson', () => {
  test('holds its amounts in the units of the person, with how each was reckoned', () => {
    const cm = sceneOf(sources('<Amount of="width"/>')).amounts['width'];
    const inches = sceneOf(sources('<Amount of="width"/>', { units: 'in' })).amounts['width'];
    expect(cm?.parts.map(({ text }) => text).join('')).toBe(`${String(piece.size.widthMm / 10)}\u00a0cm`);
    expect(inches?.parts.some(({ kind, text }) => kind === 'unit' && text === 'in')).toBe(true);
    expect(cm?.label).not.toBe('');
    expect(cm?.how.source).not.toBe('');
  });

  test('holds only what the lesson asks for and what there is', () => {
    const scene = sceneOf(sources('<Amount of="ends"/> <Amount of="yarn.nobody"/>\n\n<Figure of="tabby"/>\n\n<Video name="other"/>'));
    expect([Object.keys(scene.amounts), Object.keys(scene.figures), Object.keys(scene.videos)]).toEqual([['ends'], ['tabby'], []]);
    expect(scene.figures['tabby']?.svg).toMatch(/^<svg /);
  });

  test('holds no amounts and figures before the piece is described', () => {
    const { made: _none, ...rest } = sources('<Amount of="ends"/>\n\n<Figure of="tabby"/>');
    expect(sceneOf(rest)).toMatchObject({ amounts: {}, figures: {} });
  });

  test('gives a video the addresses of what was made of it', () => {
    expect(sceneOf(sources('<Video name="dress-the-loom"/>', { media: [video] })).videos['dress-the-loom']).toEqual({
      durationMs: 60_000,
      title: 'Dress the loom',
      src: `/media/${video.publicId}/video`,
      type: 'video/mp4',
      captions: `/media/${video.publicId}/captions`,
      chapters: [{ atMs: 0, title: 'Begin' }],
      cues: [{ fromMs: 0, toMs: 900, words: 'Wind the warp.' }],
    });
  });

  test('gives a picture only when its size is known, and never a video as a picture', () => {
    const picture: SeriesMediaFile = { ...video, kind: 'picture', name: 'loom', files: { large: { ...file, width: 1200, height: 900 } } };
    const text = '![A loom](loom)';
    expect(sceneOf(sources(text, { media: [picture] })).pictures['loom']).toEqual({ src: `/media/${video.publicId}/large`, width: 1200, height: 900 });
    expect(sceneOf(sources(text, { media: [{ ...picture, files: { large: file } }] })).pictures).toEqual({});
    expect(sceneOf(sources(text, { media: [{ ...video, name: 'loom' }] })).pictures).toEqual({});
  });
});

describe('Low Tide', () => {
  const lessons = readdirSync(folder).filter((name) => name.endsWith('.mdx'));

  test.each(lessons)('%s finds each of its amounts and figures in the piece', (name) => {
    const from = sources(readFileSync(new URL(name, folder), 'utf8'));
    const scene = sceneOf(from);
    expect(Object.keys(scene.amounts).sort()).toEqual([...from.facts.amounts].sort());
    expect(Object.values(scene.amounts).filter(({ parts }) => parts.length === 0)).toEqual([]);
    expect(Object.keys(scene.figures).sort()).toEqual([...from.facts.figures].sort());
  });
});

describe('small things', () => {
  test('the step in hand is the first that is not done, where steps can be ticked', () => {
    const scene = { ...sceneOf(sources('')), ticked: new Set(['a', 'c']) };
    const stepForm = { action: '/', series: 's', lesson: 'l' };
    expect(stepInHand(['a', 'b', 'c'], scene)).toBeUndefined();
    expect(stepInHand(['a', 'b', 'c'], { ...scene, stepForm })).toBe('b');
    expect(stepInHand(['a', 'c'], { ...scene, stepForm })).toBeUndefined();
  });

  test.each([[0, '0:00'], [59_999, '0:59'], [400_000, '6:40'], [3_725_000, '1:02:05']])('%i ms is %s', (ms, words) => {
    expect(clockTime(ms)).toBe(words);
  });
});
