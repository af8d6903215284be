/** Workings of the single questions, held to their own formulas by another program's arithmetic (mathjs). */
import fc from 'fast-check';
import { expect, test } from 'vitest';
import { reckon } from '#core/craft/reckon.ts';
import { explainRya, explainShape, explainSoumak, explainTakeUp, explainYarn } from '#core/craft/show-how/explain.ts';
import type { Working } from '#core/craft/show-how/working.ts';
import { answerForm } from '#core/reckoner/answer-form.ts';
import { RECKONER_DEFAULTS } from '#core/reckoner/reckoner-form.ts';
import type { Outcome } from '#core/outcome.ts';
import { cases } from '../../support/random-cases.ts';
import { expectReachable, faultsOf, workingsOf } from './follow.ts';

const between = (min: number, max: number) => fc.double({ min, max, noNaN: true });
const whole = (min: number, max: number) => fc.integer({ min, max });
const RUNS = { numRuns: cases(1000), seed: 20260821 };

/** Explained, followed, and compared with the answer to the same question; refused where that is refused. */
function holdsUp(question: Record<string, unknown>, explained: Outcome<readonly Working[]>, asked: unknown, except?: RegExp): boolean {
  const answer = reckon(question);
  expect(explained.ok, JSON.stringify(explained)).toBe(answer.ok);
  if (!answer.ok || !explained.ok) {
    if (!answer.ok && !explained.ok) expect(explained.problems.length).toBe(answer.problems.length);
    return true;
  }
  expect(faultsOf(explained.value, asked)).toEqual([]);
  expectReachable(explained.value, answer.value, except);
  return true;
}

const grist = fc.oneof(
  between(1, 20_000).map((tex) => ({ tex })),
  between(5, 2000).map((metresPer100g) => ({ metresPer100g })),
  whole(0, 7).map((number) => ({ class: number })),
  fc.record({
    text: fc.constantFrom('8/2', '2/16', '16', '4,5', '40/2', '6/6'),
    system: fc.constantFrom('nm', 'ne-cotton', 'ne-worsted', 'lea', 'run', 'denier', 'dtex', 'spun-silk', 'jute', 'yorkshire', 'grain'),
  }).map((count) => ({ count })),
);
const yarn = fc.tuple(grist, fc.record(
  { strands: whole(1, 9), ashenhurstK: between(0.75, 1), wrapsPerInch: between(1, 60), freeDiameterMm: between(0.1, 40), fibre: fc.constantFrom('silk', 'wool'), ball: fc.record({ metres: between(20, 900), grams: between(20, 200) }) },
  { requiredKeys: [] },
)).map(([thick, traits]) => ({ ...traits, ...thick }));

test('a yarn', () => {
  fc.assert(fc.property(yarn, (of) => holdsUp({ what: 'yarn', yarn: of }, explainYarn(of), of)), RUNS);
});

test('take-up', () => {
  const cloth = fc.record({ warpDiameterMm: between(0.2, 3), weftDiameterMm: between(0.2, 4), warpSpacingMm: between(1, 14), weftSpacingMm: between(0.4, 8) });
  const more = fc.oneof(fc.constant({}), fc.constantFrom({ mode: 'balanced' }, { mode: 'straight-warp' }), between(0, 5).map((weftWaveMm) => ({ weftWaveMm })));
  fc.assert(fc.property(cloth, more, (of, how) => {
    const question = { what: 'take-up', ...of, ...how };
    return holdsUp(question, explainTakeUp(question), question);
  }), RUNS);
});

test('soumak', () => {
  const questions = fc.record({ over: whole(2, 12), back: whole(1, 11), spacingMm: between(1, 14), diameterSumMm: between(0.5, 9), ends: whole(2, 400) });
  fc.assert(fc.property(questions, (of) => {
    const question = { what: 'soumak', ...of };
    return holdsUp(question, explainSoumak(question), question);
  }), RUNS);
});

test('rya', () => {
  const questions = fc.record({
    legEnds: whole(1, 4), strands: whole(1, 9), spacingMm: between(1, 14), warpDiameterMm: between(0.2, 3), strandLoftMm: between(0.3, 6), pileMm: between(5, 400), trimMm: between(0, 30),
    ends: whole(2, 400), edgeEnds: whole(0, 4), rows: whole(1, 90), cardThicknessMm: between(0.5, 9),
  });
  fc.assert(fc.property(questions, (of) => {
    const question = { what: 'rya', ...of };
    return holdsUp(question, explainRya(question), question);
  }), RUNS);
});

test('a shape', () => {
  const measures = fc.oneof(
    fc.record({ shape: fc.constantFrom('triangle', 'rectangle'), baseMm: between(1, 400), heightMm: between(0.2, 400) }),
    fc.record({ shape: fc.constant('circle'), radiusMm: between(1, 200) }),
    fc.record({ shape: fc.constant('points'), points: fc.array(fc.record({ xMm: between(-90, 90), yMm: between(-90, 90) }), { minLength: 3, maxLength: 7 }) }),
  );
  const grid = fc.record({ spacingMm: between(2, 12), pickSpacingMm: between(0.5, 5), ends: whole(2, 200), symmetric: fc.boolean() });
  fc.assert(fc.property(measures, grid, (of, on) => {
    const question = { what: 'shape', ...of, ...on, symmetric: of.shape !== 'points' && on.symmetric };
    return holdsUp(question, explainShape(question), question, /^(widths|areas)\./u);
  }), RUNS);
});

test('a yarn says where its numbers came from: measured before the label, the label before a formula', () => {
  const trustOf = (of: unknown, id: string) => workingsOf(explainYarn(of)).find((working) => working.id === id)?.trust;
  expect(trustOf({ metresPer100g: 180 }, 'tex')).toBe('label');
  expect(trustOf({ metresPer100g: 180 }, 'compressedDiameterMm')).toBe('formula');
  expect(trustOf({ metresPer100g: 180 }, 'loftDiameterMm')).toBe('formula');
  expect(trustOf({ metresPer100g: 180, wrapsPerInch: 10.5 }, 'loftDiameterMm')).toBe('measured');
  expect(trustOf({ class: 4 }, 'loftDiameterMm')).toBe('class');
  expect(trustOf({ class: 4, wrapsPerInch: 10.5 }, 'loftDiameterMm')).toBe('measured');
  expect(trustOf({ class: 4, wrapsPerInch: 10.5 }, 'compressedDiameterMm')).toBe('class');
  expect(trustOf({ class: 4, ball: { metres: 180, grams: 100 } }, 'compressedDiameterMm')).toBe('formula');
  expect(trustOf({ count: { text: '6/6', system: 'nm' } }, 'tex')).toBe('practice');
  expect(trustOf({ count: { text: '6/6', system: 'nm' }, ball: { metres: 180, grams: 100 } }, 'tex')).toBe('label');
});

test('a rod and its cord, as the reckoner asks for them', () => {
  const asked = fc.record({ 'rod-load': between(1, 99_000), 'rod-length': between(4.1, 499), rise: between(0.1, 499) });
  fc.assert(fc.property(asked, (typed) => {
    const texts = Object.fromEntries(Object.entries(typed).map(([field, value]) => [field, value.toFixed(2)]));
    const { rod } = answerForm({ ...RECKONER_DEFAULTS, ...texts });
    const workings = rod.workings?.() ?? [];
    expect(workings.map(({ id }) => id).sort()).toEqual(rod.lines.map(({ step }) => step).sort());
    const [question] = rod.asked as readonly [unknown];
    expect(faultsOf(workings, question)).toEqual([]);
  }), RUNS);
});
