import { describe, expect, it } from 'vitest';
import { lengthWords } from '#core/craft/figures/length-words.ts';
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

describe('lengths in a figure', () => {
  it.each([
    [5, 'cm', '5 mm'],
    [9.8, 'cm', '9.8 mm'],
    [425, 'cm', '42.5 cm'],
    [5, 'in', '3/16 in'],
    [25.4, 'in', '1 in'],
    [425, 'in', '16 3/4 in'],
    [0, 'in', '0 in'],
  ] as const)('says %d mm in %s as "%s"', (mm, units, text) => {
    expect(lengthWords(mm, units)).toBe(text);
  });
});
