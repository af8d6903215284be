import { describe, expect, it } from 'vitest';
import { countWords, lengthWords } from '#core/craft/figures/length-words.ts';
import { Scene } from '#core/craft/figures/kit/scene.ts';
import { stageOf, stages } from '#core/craft/figures/kit/stages.ts';
import { cutAt, heading, lengthOf, trail } from '#core/craft/figures/kit/trail.ts';

describe('a trail', () => {
  it('can be cut anywhere along its way', () => {
    const way = trail(0, 0).to(10, 0).to(10, 10);
    expect(cutAt(way.points, 15)).toEqual([{ x: 0, y: 0 }, { x: 10, y: 0 }, { x: 10, y: 5 }]);
    expect(cutAt(way.points, 99)).toEqual(way.points);
  });

  it('knows where it is heading', () => {
    expect(heading(trail(0, 0).to(0, 8).points)).toEqual({ x: 0, y: 1 });
    expect(heading([])).toEqual({ x: 1, y: 0 });
  });

  it('is as long round a circle as the circle is', () => {
    expect(lengthOf(trail(10, 0).round(0, 0, 10, 0, 4).points)).toBeCloseTo(20 * Math.PI, 0);
  });
});

describe('movements one after another', () => {
  it('begin when the one before is done', () => {
    expect(stages(0.5, [1, 1])).toEqual([1, 0]);
    expect(stages(0.25, [1, 1])).toEqual([0.5, 0]);
    expect(stages(1, [1, 3])).toEqual([1, 1]);
    expect(stageOf(0.5, 2, 4)).toBe(0);
    expect(stageOf(0.625, 2, 4)).toBe(0.5);
  });
});

describe('a scene', () => {
  it('draws what lies higher later, and keeps the order within a level', () => {
    expect(new Scene('a').add(30, 'c').add(10, 'a').add(10, 'b').markup()).toBe('abc');
  });
});

describe('amounts in a figure', () => {
  it('are written as in the text beside it', () => {
    expect(lengthWords(425, 'cm', 'least')).toBe('42.5\u00a0cm');
    expect(lengthWords(357.7, 'cm', 'cut')).toBe('36\u00a0cm');
    expect(countWords(1, 'nail', 'nails')).toBe('1 nail');
  });
});
