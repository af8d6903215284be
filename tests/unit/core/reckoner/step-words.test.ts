import { describe, expect, test } from 'vitest';
import { answerForm } from '#core/reckoner/answer-form.ts';
import type { AnswerLine } from '#core/reckoner/answer-line.ts';
import { changeUnits, RECKONER_DEFAULTS } from '#core/reckoner/reckoner-form.ts';
import { givenAt, stepFormula, stepsBetween, stepValue } from '#core/reckoner/step-words.ts';
import { expectClose } from '../../../reference/close.ts';

const PARTS = ['yarn', 'sett', 'cloth', 'soumak', 'rya', 'shape', 'piece'] as const;
const FORM = { ...RECKONER_DEFAULTS, fringe: 'rya', wraps: '10', 'ball-length': '90', 'ball-weight': '50' };

/** A line's number in the unit workings are written in. */
function numberOf({ value }: AnswerLine): number | undefined {
  switch (value.kind) {
    case 'length': return value.mm;
    case 'mass': return value.grams;
    case 'count': return value.count;
    case 'share': return value.share;
    case 'time': return value.hours;
    case 'number': return value.unit === 'cm²' ? value.value * 100 : value.value;
    default: return undefined;
  }
}

describe.each(PARTS)('%s', (part) => {
  const section = answerForm(FORM)[part];
  const workings = section.workings?.() ?? [];
  const byId = new Map(workings.map((working) => [working.id, working]));
  const pairs = section.lines.flatMap((line) => {
    const working = line.step === undefined ? undefined : byId.get(line.step);
    return working === undefined ? [] : [[line.label, line, working] as const];
  });

  test('shows how most of what it answers was got', () => {
    expect(pairs.length).toBeGreaterThanOrEqual(2);
  });

  test.each(pairs)('%s is the number its working gives', (_, line, working) => {
    expectClose(numberOf(line) ?? Number.NaN, working.value, 1e-9);
  });

  test('every working on the way has a place to go to, and every input says where it was given', () => {
    const shown = new Set(pairs.map(([, line]) => line.step ?? ''));
    const reachable = new Set([...shown, ...stepsBetween(workings, shown).map(({ id }) => id)]);
    for (const id of reachable) {
      for (const { from, path, source, name } of byId.get(id)?.inputs ?? []) {
        if (from !== undefined) expect(reachable).toContain(from);
        else if (path === undefined) expect(source, name).not.toBe('');
        else if (!path.includes('/bands/')) expect(givenAt(part, path), path).toBeDefined();
      }
    }
  });
});

test('a step is written as a person would write it', () => {
  expect(stepFormula('sqrt(p * p + h * h - 2 * D * h)')).toBe('√(p × p + h × h − 2 × D × h)');
  expect(stepFormula('H / ((1 - lambda) * (1 - sigma))')).toBe('H ÷ ((1 − λ) × (1 − σ))');
  expect(stepValue(328.48158089, 'mm')).toBe('328.4816 mm');
  expect(stepValue([3, 2, 1], 'count')).toBe('3, 2, 1');
  expect(stepValue(-0.5, 'ratio')).toBe('−0.5');
});

test('workings are in the units they were reckoned in, whatever a person’s own', () => {
  const inches = answerForm(changeUnits(RECKONER_DEFAULTS, 'in')).sett.workings?.().find(({ id }) => id === 'ends.spacingMm');
  expect(inches?.unit).toBe('mm');
});
