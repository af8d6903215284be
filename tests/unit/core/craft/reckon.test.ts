import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { reckon, type Answers, type Question } from '#core/craft/reckon.ts';
import { cases } from '../../../support/random-cases.ts';
import { PLAIN_PIECE } from './a-piece.ts';

type Asked = Readonly<Record<string, unknown>>;

function answerTo(question: Asked): Answers[Question] & Record<string, unknown> {
  const outcome = reckon(question);
  if (!outcome.ok) throw new Error(JSON.stringify(outcome.problems));
  return outcome.value as Answers[Question] & Record<string, unknown>;
}
const refusals = (question: unknown): string[] => {
  const outcome = reckon(question);
  return outcome.ok ? [] : outcome.problems.map(({ code, path }) => `${code} ${path}`);
};
/** The question with one more or other value; undefined takes a key out. */
const but = (question: Asked, key: string, value: unknown): Asked => Object.fromEntries(Object.entries({ ...question, [key]: value }).filter(([, kept]) => kept !== undefined));

const YARN = { what: 'yarn', yarn: { tex: 500, wrapsPerInch: 10 } };
const TAKE_UP = { what: 'take-up', warpDiameterMm: 0.9, weftDiameterMm: 1.5, warpSpacingMm: 4.2, weftSpacingMm: 1.8 };
const SOUMAK = { what: 'soumak', over: 4, back: 2, spacingMm: 5, diameterSumMm: 4.18807977, ends: 62 };
const RYA = {
  what: 'rya', legEnds: 1, strands: 3, spacingMm: 5, warpDiameterMm: 0.8014131, strandLoftMm: 3.386667, pileMm: 150, trimMm: 10, ends: 62, edgeEnds: 0, rows: 2, cardThicknessMm: 2,
};
const TRIANGLE = { what: 'shape', shape: 'triangle', baseMm: 150, heightMm: 100, spacingMm: 5, pickSpacingMm: 1.4456241, ends: 62, symmetric: true };
const CIRCLE = { what: 'shape', shape: 'circle', radiusMm: 60, spacingMm: 5, pickSpacingMm: 1.5, ends: 62, symmetric: false };
const POINTS = { what: 'shape', shape: 'points', points: [{ xMm: 0, yMm: 0 }, { xMm: 100, yMm: 0 }, { xMm: 100, yMm: 60 }, { xMm: 50, yMm: 20 }, { xMm: 0, yMm: 60 }], spacingMm: 5, pickSpacingMm: 2, ends: 62 };
const LENGTH = { what: 'length-text', mm: 138.1125, system: 'imperial', round: 'nearest' };
const PIECE = { what: 'piece', piece: PLAIN_PIECE };

describe('each question is answered with exactly what it promises', () => {
  test.each<[Asked, string[]]>([
    [YARN, ['tex', 'denier', 'nm', 'neCotton', 'neWorsted', 'lea', 'run', 'yardsPerPound', 'metresPer100g', 'plies', 'compressedDiameterMm', 'loftDiameterMm', 'warnings']],
    [TAKE_UP, ['waveMm', 'weft', 'warp', 'warnings']],
    [SOUMAK, ['stitchMm', 'ratio', 'stitches', 'rowMm']],
    [RYA, ['bundleMm', 'wrapMm', 'cutMm', 'knotsPerRow', 'strands', 'yarnMm', 'cardMm', 'cardExactMm']],
    [TRIANGLE, ['rows', 'widths', 'endsTotal', 'areaMm2', 'trueAreaMm2']],
    [CIRCLE, ['rows', 'widths', 'endsTotal', 'areaMm2', 'trueAreaMm2']],
    [POINTS, ['rows', 'widths', 'areas', 'endsTotal', 'areaMm2', 'trueAreaMm2']],
    [LENGTH, ['text']],
    [PIECE, ['ends', 'loom', 'weft', 'warp', 'yarns', 'bands', 'cut', 'massG', 'hours', 'warnings']],
  ])('$what', (question, keys) => {
    expect(Object.keys(answerTo(question)).sort()).toEqual([...keys].sort());
  });

  test('in values that can be written as JSON and come back the same', () => {
    for (const question of [YARN, TAKE_UP, SOUMAK, RYA, TRIANGLE, CIRCLE, POINTS, LENGTH, PIECE]) {
      const answer = answerTo(question);
      expect(JSON.parse(JSON.stringify(answer))).toEqual(answer);
    }
  });
});

describe('what a question leaves out or gets wrong', () => {
  const NEEDED: readonly (readonly [Asked, readonly string[]])[] = [
    [TAKE_UP, ['warpDiameterMm', 'weftDiameterMm', 'warpSpacingMm', 'weftSpacingMm']],
    [SOUMAK, ['over', 'back', 'spacingMm', 'diameterSumMm', 'ends']],
    [RYA, ['legEnds', 'strands', 'spacingMm', 'warpDiameterMm', 'strandLoftMm', 'pileMm', 'trimMm', 'ends', 'edgeEnds', 'rows', 'cardThicknessMm']],
    [TRIANGLE, ['baseMm', 'heightMm', 'spacingMm', 'pickSpacingMm', 'ends']],
    [CIRCLE, ['radiusMm', 'spacingMm', 'pickSpacingMm', 'ends']],
    [LENGTH, ['mm']],
  ];
  const numbers = NEEDED.flatMap(([question, keys]) => keys.map((key) => [String(question['what']), key, question] as const));

  test.each(numbers)('%s needs %s as a number', (_, key, question) => {
    for (const value of [undefined, null, '5', Number.NaN, true, []]) expect(refusals(but(question, key, value)), JSON.stringify(value)).toEqual([`E_NUM /${key}`]);
  });

  test.each(numbers)('%s refuses a %s below zero or beyond all measure', (_, key, question) => {
    for (const value of [-1, 1e308]) expect(refusals(but(question, key, value))).toEqual([`E_RANGE /${key}`]);
  });

  const MAY_BE_NONE = new Set(['trimMm', 'edgeEnds', 'mm']);

  test.each(numbers)('%s takes zero for %s only where nothing can be meant', (_, key, question) => {
    expect(refusals(but(question, key, 0))).toEqual(MAY_BE_NONE.has(key) ? [] : [`E_RANGE /${key}`]);
  });

  test.each([[SOUMAK, 'over'], [SOUMAK, 'back'], [SOUMAK, 'ends'], [RYA, 'legEnds'], [RYA, 'strands'], [RYA, 'ends'], [RYA, 'edgeEnds'], [RYA, 'rows'], [TRIANGLE, 'ends']] as const)(
    '%j needs a whole number for %s',
    (question, key) => {
      const refused = refusals(but(question, key, Number((question as Asked)[key]) + 0.5));
      expect(refused).toEqual([`E_COUNT /${key}`]);
    },
  );

  test.each([YARN, TAKE_UP, SOUMAK, RYA, TRIANGLE, CIRCLE, POINTS, LENGTH, PIECE])('a key nobody knows is refused: %j', (question) => {
    expect(refusals({ ...question, colour: 'red' })).toEqual(['E_ENUM /colour']);
  });

  test.each<[Asked, string, unknown]>([
    [TAKE_UP, 'mode', 'loose'],
    [TRIANGLE, 'shape', 'star'],
    [TRIANGLE, 'symmetric', 1],
    [TRIANGLE, 'symmetric', undefined],
    [LENGTH, 'system', 'roman'],
    [LENGTH, 'round', 'down'],
    [LENGTH, 'round', undefined],
    [YARN, 'yarn', undefined],
    [YARN, 'yarn', [500]],
    [PIECE, 'piece', 'a hanging'],
    [PIECE, 'piece', undefined],
  ])('%j: %s cannot be %s', (question, key, value) => {
    expect(refusals(but(question, key, value))).toEqual([`E_ENUM /${key}`]);
  });

  test.each([null, 7, 'yarn', [], {}, { what: 'prices' }, { what: ['yarn'] }, undefined])('%j is no question', (value) => {
    expect(refusals(value)).toHaveLength(1);
  });
});

describe('what is impossible', () => {
  test.each<[Asked, string]>([
    [{ ...SOUMAK, back: 4 }, 'E_RANGE /back'],
    [{ ...SOUMAK, ends: 3 }, 'E_FIT /ends'],
    [{ ...RYA, ends: 2, edgeEnds: 1 }, 'E_FIT /ends'],
    [{ ...RYA, ends: 10, edgeEnds: 20 }, 'E_FIT /ends'],
    [{ ...RYA, pileMm: 1, trimMm: 0, cardThicknessMm: 100 }, 'E_FIT /cardThicknessMm'],
    [{ ...TRIANGLE, baseMm: 320 }, 'E_FIT /baseMm'],
    [{ ...CIRCLE, radiusMm: 160 }, 'E_FIT /radiusMm'],
    [{ ...POINTS, ends: 18 }, 'E_FIT /points'],
    [{ ...POINTS, symmetric: true }, 'E_ENUM /symmetric'],
    [{ ...TRIANGLE, heightMm: 20_000, pickSpacingMm: 0.1 }, 'E_RANGE /pickSpacingMm'],
    [{ ...TRIANGLE, radiusMm: 5 }, 'E_ENUM /radiusMm'],
    [{ ...TAKE_UP, warpSpacingMm: 2 }, 'E_JAM /warpSpacingMm'],
    [{ ...TAKE_UP, warpDiameterMm: 1, weftDiameterMm: 1, warpSpacingMm: 1.7, weftSpacingMm: 1.7, mode: 'balanced' }, 'E_JAM /warpSpacingMm'],
    [{ ...TAKE_UP, weftWaveMm: 2.5 }, 'E_RANGE /weftWaveMm'],
    [{ ...TAKE_UP, weftWaveMm: 1.5 }, 'E_JAM /weftWaveMm'],
  ])('%j', (question, refusal) => {
    expect(refusals(question)).toEqual([refusal]);
  });
});

describe('take-up', () => {
  test('leaves the warp straight unless told otherwise', () => {
    expect(answerTo(TAKE_UP)).toMatchObject({ warp: { angleRad: 0, crimp: 0, lengthMm: 1.8 } });
  });

  test('bends both alike in balanced cloth, as far as they go, and says when they do not', () => {
    expect(answerTo({ ...TAKE_UP, weftSpacingMm: 4.2, mode: 'balanced' })).toMatchObject({ warnings: [] });
    expect(answerTo({ ...TAKE_UP, mode: 'balanced' })).toMatchObject({ warnings: [{ code: 'W_CLAMPED', path: '/mode' }] });
  });

  test('takes a given wave at either end of what is possible', () => {
    const { waveMm } = answerTo(TAKE_UP) as Answers['take-up'];
    for (const weftWaveMm of [waveMm.min, waveMm.max]) expect(refusals({ ...TAKE_UP, weftWaveMm })).toEqual([]);
  });

  test('any cloth that can be woven has yarns no shorter than their way', () => {
    const some = fc.double({ min: 0.1, max: 5, noNaN: true });
    fc.assert(
      fc.property(some, some, some, some, fc.constantFrom('straight-warp', 'balanced'), (warpDiameterMm, weftDiameterMm, warpSpacingMm, weftSpacingMm, mode) => {
        const outcome = reckon({ what: 'take-up', warpDiameterMm, weftDiameterMm, warpSpacingMm, weftSpacingMm, mode });
        if (!outcome.ok) return outcome.problems.length === 1 && outcome.problems[0]?.code === 'E_JAM';
        const { weft, warp } = outcome.value as Answers['take-up'];
        return weft.crimp >= -1e-9 && warp.crimp >= -1e-9;
      }),
      { numRuns: cases(1500), seed: 17 },
    );
  });
});

describe('rya', () => {
  test('leaves plain ends at the edges without a knot', () => {
    expect(answerTo({ ...RYA, edgeEnds: 3 })).toMatchObject({ knotsPerRow: 28, strands: 168 });
    expect(answerTo({ ...RYA, ends: 61 })).toMatchObject({ knotsPerRow: 30 });
  });
});

describe('a yarn', () => {
  test('of several strands lies thicker, and counts as one of them', () => {
    const one = answerTo({ what: 'yarn', yarn: { tex: 500 } });
    const four = answerTo({ what: 'yarn', yarn: { tex: 500, strands: 4 } });
    expect(four['tex']).toBe(500);
    expect(four['compressedDiameterMm']).toBeCloseTo(2 * Number(one['compressedDiameterMm']), 12);
  });

  test('says of one strand what it is plied of', () => {
    expect(answerTo({ what: 'yarn', yarn: { count: { text: '12/6', system: 'ne-cotton' } } })).toMatchObject({ plies: 6 });
    expect(answerTo(YARN)).toMatchObject({ plies: 1 });
  });
});

test('no change of one value in a sound question makes it throw, and it is refused once or answered', () => {
  const questions = [YARN, TAKE_UP, SOUMAK, RYA, TRIANGLE, CIRCLE, LENGTH] as readonly Asked[];
  const values = fc.oneof(fc.double(), fc.integer(), fc.string(), fc.constantFrom<unknown>(null, true, [], {}, -0, 1e308, 5e-324));
  fc.assert(
    fc.property(fc.constantFrom(...questions), fc.nat(20), values, (question, at, value) => {
      const keys = Object.keys(question);
      const key = keys[at % keys.length] ?? 'what';
      fc.pre(key !== 'what');
      return refusals(but(question, key, value)).length <= 1;
    }),
    { numRuns: cases(3000), seed: 23 },
  );
});

describe('at the very limit', () => {
  const told = (question: Asked): string => {
    const outcome = reckon(question);
    return outcome.ok ? '' : outcome.problems.map(({ message }) => message.replaceAll('\u00a0', ' ')).join(' ');
  };

  test('a shape may be half an end wider than the cloth, which is rounding, and no more', () => {
    // 62 ends of 5 mm: 310 mm.
    for (const baseMm of [309, 310, 312.5]) expect(refusals({ ...TRIANGLE, baseMm })).toEqual([]);
    expect(told({ ...TRIANGLE, baseMm: 312.6 })).toBe('The shape is wider than the cloth, which takes 31 cm.');
  });

  test('twenty thousand rows are stepped out, and not one more', () => {
    expect(answerTo({ ...TRIANGLE, heightMm: 20_000, pickSpacingMm: 1 })['rows']).toBe(20_000);
    expect(told({ ...TRIANGLE, heightMm: 20_000, pickSpacingMm: 0.9999 })).toBe('That would be 20002 rows. Up to 20000 work.');
  });

  test('a stitch may take every end there is, and one knot fills two of them', () => {
    expect(answerTo({ ...SOUMAK, ends: 4 })).toMatchObject({ stitches: 1 });
    expect(answerTo({ ...RYA, ends: 2 })).toMatchObject({ knotsPerRow: 1, strands: 6 });
    expect(told({ ...RYA, legEnds: 2, ends: 3 })).toBe('One knot needs 4 ends beside the plain ones at the edges.');
  });

  test('points are woven as they are drawn: a slope on one side only', () => {
    // A right-angled triangle of 20 ends and 30 rows: each row loses two thirds of an end at its right.
    const { areas = [] } = answerTo({ ...POINTS, points: [{ xMm: 0, yMm: 0 }, { xMm: 100, yMm: 0 }, { xMm: 0, yMm: 60 }] }) as Answers['shape'];
    expect(areas).toHaveLength(30);
    for (const row of areas) for (const { start } of row) expect(start).toBe(0);
    expect([0, 15, 29].map((row) => areas[row]?.[0]?.ends ?? 0)).toEqual([20, 10, 0]);
    expect(told({ ...POINTS, symmetric: true })).toBe('Points are woven as they are drawn, so both sides cannot be made alike. Leave this out, or say false.');
    expect(refusals({ ...POINTS, symmetric: false })).toEqual([]);
  });
});
