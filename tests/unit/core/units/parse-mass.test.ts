import { describe, expect, test } from 'vitest';
import { parseMass, type MassUnit } from '#core/units/parse-mass.ts';

describe('a typed weight', () => {
  test.each<[string, MassUnit, number]>([
    ['50', 'g', 50],
    ['8,5', 'g', 8.5],
    ['1 3/4', 'oz', 1.75 * 28.349523125],
    ['½ lb', 'g', 226.796185],
    ['0.6 kg', 'g', 600],
    ['0', 'g', 0],
  ])('%s in %s', (typed, unit, grams) => {
    const parsed = parseMass(typed, unit);
    expect(parsed.ok ? parsed.grams : Number.NaN).toBeCloseTo(grams, 9);
  });

  test.each([
    ['', 'Type a weight in g.'],
    ['heavy', 'Write one weight, like 12.5 or 4 7/8.'],
    ['-5', 'A weight cannot be below 0.'],
    ['5 stone', '“stone” is no unit we know. Write g, kg, oz or lb.'],
    ['1/0', 'A fraction cannot have 0 below its line.'],
    ['1'.repeat(41), 'That is too long for a weight.'],
  ])('%s is told why not', (typed, reason) => {
    expect(parseMass(typed, 'g')).toEqual({ ok: false, reason });
  });
});
