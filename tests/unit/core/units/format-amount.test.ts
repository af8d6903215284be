import { describe, expect, test } from 'vitest';
import type { Input, LengthUse } from '#core/craft/amounts/amount-types.ts';
import { amountText, formatAmount, lengthText } from '#core/units/format-amount.ts';

const length = (mm: number, use: LengthUse): Input => ({ kind: 'length', mm, use });
const inch = 25.4;

describe('lengths in centimetres', () => {
  test.each<[number, LengthUse, string]>([
    [300, 'size', '30\u00a0cm'],
    [99.4, 'size', '9.9\u00a0cm'],
    [99.6, 'size', '10\u00a0cm'],
    [104, 'size', '10\u00a0cm'],
    [105, 'size', '11\u00a0cm'],
    [12.34, 'size', '1.2\u00a0cm'],
    [0, 'size', '0\u00a0cm'],
    [-12, 'size', '\u22121.2\u00a0cm'],
    [-0.01, 'size', '0\u00a0cm'],
    [5, 'fine', '5\u00a0mm'],
    [3.175, 'fine', '3.2\u00a0mm'],
    [12.4, 'fine', '12\u00a0mm'],
    [508.1633, 'least', '50.9\u00a0cm'],
    [350, 'least', '35\u00a0cm'],
    [6.19475, 'fine-least', '7\u00a0mm'],
    [364.2805, 'cut', '36.5\u00a0cm'],
    [365, 'cut', '36.5\u00a0cm'],
    [86_152, 'yarn', '86\u00a0m'],
    [6316, 'yarn', '6.3\u00a0m'],
    [9960, 'yarn', '10\u00a0m'],
  ])('%f mm as %s reads %s', (mm, use, text) => {
    expect(amountText(length(mm, use), 'cm')).toBe(text);
  });
});

describe('lengths in inches', () => {
  test.each<[number, LengthUse, string]>([
    [16.06942 * inch, 'size', '16\u20091/16\u00a0in'],
    [28.19579 * inch, 'size', '28\u20093/16\u00a0in'],
    [13.77953 * inch, 'least', '13\u200913/16\u00a0in'],
    [14.34175 * inch, 'cut', '14\u20093/8\u00a0in'],
    [12 * inch, 'size', '12\u00a0in'],
    [0.1968504 * inch, 'fine', '3/16\u00a0in'],
    [0.243888 * inch, 'fine-least', '1/4\u00a0in'],
    [0, 'size', '0\u00a0in'],
    [94.2174 * 914.4, 'yarn', '94.2\u00a0yd'],
  ])('%f mm as %s reads %s', (mm, use, text) => {
    expect(amountText(length(mm, use), 'in')).toBe(text);
  });

  test('the fraction stands by itself, a thin space after the whole, so that type can set it small', () => {
    expect(formatAmount(length(19.6875 * inch, 'size'), 'in')).toEqual([
      { kind: 'number', text: '19' },
      { kind: 'text', text: '\u2009' },
      { kind: 'fraction', text: '11/16' },
      { kind: 'text', text: '\u00a0' },
      { kind: 'unit', text: 'in' },
    ]);
    expect(formatAmount(length(0.5 * inch, 'size'), 'in')[0]).toEqual({ kind: 'fraction', text: '1/2' });
  });
});

describe('other amounts', () => {
  test.each<[Input, string, string]>([
    [{ kind: 'mass', grams: 47.8624 }, '48\u00a0g', '1.7\u00a0oz'],
    [{ kind: 'mass', grams: 0.42 }, '0.4\u00a0g', '0\u00a0oz'],
    [{ kind: 'mass', grams: 999.6 }, '1\u00a0kg', '35.3\u00a0oz'],
    [{ kind: 'mass', grams: 1250 }, '1.3\u00a0kg', '44.1\u00a0oz'],
    [{ kind: 'count', count: 62, one: 'end', many: 'ends' }, '62\u00a0ends', '62\u00a0ends'],
    [{ kind: 'count', count: 1, one: 'ball', many: 'balls' }, '1\u00a0ball', '1\u00a0ball'],
    [{ kind: 'time', hours: 0.75, low: 0.4, high: 1.4 }, '50\u00a0min (0\u00a0to\u00a02)', '50\u00a0min (0\u00a0to\u00a02)'],
    [{ kind: 'time', hours: 1.6, low: 1, high: 3 }, '1\u00a0h\u00a040 (1\u00a0to\u00a03)', '1\u00a0h\u00a040 (1\u00a0to\u00a03)'],
    [{ kind: 'time', hours: 2, low: 1.2, high: 3.6 }, '2\u00a0h (1\u00a0to\u00a04)', '2\u00a0h (1\u00a0to\u00a04)'],
    [{ kind: 'time', hours: 6.512, low: 3.91, high: 11.7 }, '6½\u00a0h (3\u00a0to\u00a012)', '6½\u00a0h (3\u00a0to\u00a012)'],
    [{ kind: 'time', hours: 12.1, low: 7.26, high: 21.8 }, '12\u00a0h (7\u00a0to\u00a022)', '12\u00a0h (7\u00a0to\u00a022)'],
    [{ kind: 'size', widthMm: 325, heightMm: 60, use: 'least' }, '32.5\u00a0×\u00a06\u00a0cm', '12\u200913/16\u00a0×\u00a02\u20093/8\u00a0in'],
    [{ kind: 'number', value: 61.22449 }, '61.22', '61.22'],
    [{ kind: 'number', value: 147.635, unit: 'tex' }, '147.64\u00a0tex', '147.64\u00a0tex'],
    [{ kind: 'share', share: 0.15 }, '15\u202f%', '15\u202f%'],
    [{ kind: 'share', share: 0.06651584 }, '6.7\u202f%', '6.7\u202f%'],
  ])('%j', (input, metric, imperial) => {
    expect(amountText(input, 'cm')).toBe(metric);
    expect(amountText(input, 'in')).toBe(imperial);
  });
});

describe('a bare length', () => {
  test.each([
    [138.1125, 'imperial', 'nearest', '5 7/16'],
    [138.2, 'imperial', 'up', '5 1/2'],
    [11.1125, 'imperial', 'nearest', '7/16'],
    [25.4, 'imperial', 'up', '1'],
    [0, 'imperial', 'nearest', '0'],
    [12.5, 'metric', 'nearest', '13'],
    [364.28, 'metric', 'nearest', '364'],
    [364.28, 'metric', 'up', '365'],
  ] as const)('%f mm, %s, %s, is %s', (mm, system, round, text) => {
    expect(lengthText(mm, system, round)).toBe(text);
  });
});
