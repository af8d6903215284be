import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { CORD_CAUTIONS } from '#core/craft/macrame/cautions.ts';
import type { MacramePiece, Section } from '#core/craft/macrame/piece.ts';
import { planPiece } from '#core/craft/plan.ts';
import { MM_PER_INCH } from '#core/units/inches.ts';
import { cases } from '../../../../support/random-cases.ts';
import { BRAID, hangingOf, planOf, refusals } from './a-hanging.ts';

describe('the plan of a knotted piece', () => {
  test('a folded cord gives two ends, and is cut to twice its longer one with tails and the lark’s head', () => {
    const { columns, ends, cords } = planOf(BRAID);
    expect({ ends, cords }).toEqual({ ends: 4, cords: 2 });
    const [column] = columns;
    expect(column?.sections[0]).toMatchObject({ knots: 86, workerMm: 4128, fillerMm: 903, heightMm: 903 });
    expect(column?.cutMm).toBeCloseTo(2 * (4128 + 50) + 2 * Math.PI * (20 + 6), 9);
  });

  test('a net has one knot fewer in every second row, and its inner ends work and rest in turn', () => {
    const { columns } = planOf(hangingOf([{ technique: 'alternating', rows: 4 }], { cords: 4 }));
    expect(columns[0]?.sections[0]).toMatchObject({ knots: 6, workerMm: 2 * 48 + 2 * 10.5, fillerMm: 2 * 48 + 2 * 10.5, heightMm: 42 });
  });

  test('a rib takes a hitch of every end but the held one', () => {
    const { columns } = planOf(hangingOf([{ technique: 'half-hitches', rows: 2 }]));
    expect(columns[0]?.sections[0]).toMatchObject({ knots: 6, workerMm: 90, heightMm: 15 });
  });

  test('a slanted rib falls by the width it crosses', () => {
    const level = planOf(hangingOf([{ technique: 'half-hitches', rows: 2 }]));
    const slanted = planOf(hangingOf([{ technique: 'half-hitches', rows: 2, slant: 'left' }]));
    expect(slanted.heightMm - level.heightMm).toBeCloseTo(slanted.widthMm, 9);
  });

  test('a shorter column hangs plain until the foot takes all ends together', () => {
    const piece: MacramePiece = {
      ...BRAID,
      columns: [
        { yarn: 'main', cords: 2, sections: [{ technique: 'plain', heightMm: 300 }] },
        { yarn: 'main', cords: 2, sections: [{ technique: 'plain', heightMm: 100 }] },
      ],
      foot: [{ technique: 'gathering', name: 'last', wraps: 8 }, { technique: 'fringe', heightMm: 150 }],
    };
    const { columns, heightMm, cut } = planOf(piece);
    expect(columns[1]?.cutMm).toBe(columns[0]?.cutMm);
    expect(heightMm).toBe(300 + 24 + 150);
    expect(cut.at(-1)).toMatchObject({ what: 'gathering-cord', where: 'last', count: 1 });
  });

  test('says when the sum of the knots and the old rule are far apart', () => {
    const spread: Section = { technique: 'square-knots', knots: 10, gapMm: 100 };
    expect(planOf(BRAID).warnings).toEqual([]);
    expect(planOf(hangingOf([spread])).warnings.map(({ code, path }) => `${code} ${path}`)).toEqual(['W_RULE /columns/0']);
  });

  test('its cautions speak of cords and children', () => {
    expect(CORD_CAUTIONS.map(({ says }) => says).join(' ')).toMatch(/strangle a small child.*follow your local rules.*qualified person/s);
  });

  test('warns of a cord nobody knots with, a ball that hardly suffices and a rod that is too short or too thin', () => {
    const warnings = (piece: MacramePiece): string[] => planOf(piece).warnings.map(({ code, path }) => `${code} ${path}`);
    expect(warnings({ ...BRAID, yarns: { ...BRAID.yarns, gold: { diameterMm: 3 } } })).toEqual(['W_UNUSED /yarns/gold']);
    expect(warnings({ ...BRAID, rod: { kind: 'rod', diameterMm: 20, lengthMm: 5 } })).toEqual(['W_DOWEL /rod/lengthMm']);
    expect(warnings({ ...BRAID, rod: { kind: 'rod', diameterMm: 0.5, lengthMm: 400 } })).toContain('W_DOWEL /rod/diameterMm');
    // Two cords of 8519.36 mm, 10 % on top: 18.74 m. One ball of 19 m leaves 26 cm, less than a tenth.
    expect(warnings({ ...BRAID, yarns: { main: { diameterMm: 3, ball: { metres: 19, grams: 100 } } } })).toEqual(['W_TIGHT /yarns/main/ball']);
    expect(warnings({ ...BRAID, yarns: { main: { diameterMm: 3, ball: { metres: 30, grams: 100 } } } })).toEqual([]);
  });

  test('hours are those of cutting, knotting and finishing, and more for a gathering knot', () => {
    const wrapped = planOf({ ...BRAID, foot: [{ technique: 'gathering', wraps: 8 }] });
    expect(wrapped.hours.likely).toBeGreaterThan(planOf(BRAID).hours.likely);
    expect(wrapped.hours.low).toBeLessThan(wrapped.hours.likely);
    expect(wrapped.knots).toBe(planOf(BRAID).knots + 1);
  });

  test('a ball on the label is counted, and a thickness that was weighed is believed', () => {
    const yarns = { main: { diameterMm: 3, tex: 4000, ball: { metres: 10, grams: 40 } } };
    const { yarns: planned, massG } = planOf({ ...BRAID, yarns });
    expect(planned['main']?.balls).toBe(2);
    expect(massG).toBeCloseTo(((planned['main']?.netMm ?? 0) / 1e6) * 4000, 9);
  });
});

describe('a knotted piece that cannot be made', () => {
  test.each<[string, unknown, string[]]>([
    ['three folded cords for square knots', hangingOf([{ technique: 'square-knots', knots: 3 }], { cords: 3 }), ['E_PARITY /columns/0/cords']],
    ['a section after a fringe', hangingOf([{ technique: 'fringe', heightMm: 100 }, { technique: 'plain', heightMm: 10 }]), ['E_FIT /columns/0/sections/0']],
    ['a foot where the cords have ended in a fringe', { ...hangingOf([{ technique: 'fringe', heightMm: 100 }]), foot: [{ technique: 'plain', heightMm: 10 }] }, ['E_FIT /columns/0/sections']],
    ['a role that is not there', hangingOf([{ technique: 'plain', heightMm: 10 }], { yarn: 'gold' }), ['E_ENUM /columns/0/yarn']],
    ['knots and a height', hangingOf([{ technique: 'square-knots', knots: 3, heightMm: 10 } as never]), ['E_ENUM /columns/0/sections/0/heightMm']],
    ['a knot of a tight cord', { ...BRAID, takes: { squareKnot: 9 } }, ['E_RANGE /takes/squareKnot']],
    ['an unknown key', { ...BRAID, rods: 2 }, ['E_ENUM /rods']],
    ['a number as text', hangingOf([{ technique: 'plain', heightMm: '10' } as never]), ['E_NUM /columns/0/sections/0/heightMm']],
    ['two sections of one name', hangingOf([{ technique: 'plain', name: 'a', heightMm: 10 }, { technique: 'plain', name: 'a', heightMm: 10 }]), ['E_ENUM /columns/0/sections/1/name']],
    ['a piece longer than a house', hangingOf([{ technique: 'plain', heightMm: 20_000 }, { technique: 'plain', heightMm: 20_000 }]), ['E_RANGE /columns']],
    ['a ring without a hole', { ...BRAID, rod: { kind: 'ring', diameterMm: 12, thickMm: 6 } }, ['E_FIT /rod/thickMm']],
    ['a name that is taken, told at its own column though the one before cannot be read', { ...BRAID, columns: [...BRAID.columns, 3, ...BRAID.columns] }, ['E_ENUM /columns/1', 'E_ENUM /columns/2/name', 'E_ENUM /columns/2/sections/0/name']],
  ])('%s', (_, piece, problems) => {
    expect(refusals(piece)).toEqual(problems);
  });
});

const RUNS = { numRuns: cases(1200), seed: 20261201 };
const mm = (most: number) => fc.double({ min: 1, max: most, noNaN: true });
const sections = fc.array(
  fc.oneof(
    fc.record({ technique: fc.constant('square-knots' as const), knots: fc.integer({ min: 1, max: 60 }), gapMm: fc.double({ min: 0, max: 50, noNaN: true }) }),
    fc.record({ technique: fc.constant('alternating' as const), rows: fc.integer({ min: 1, max: 30 }) }),
    fc.record({ technique: fc.constant('half-hitches' as const), rows: fc.integer({ min: 1, max: 12 }), slant: fc.constantFrom('level' as const, 'left' as const, 'right' as const) }),
    fc.record({ technique: fc.constant('plain' as const), heightMm: mm(400) }),
    fc.record({ technique: fc.constant('gathering' as const), wraps: fc.integer({ min: 1, max: 20 }) }),
  ),
  { minLength: 1, maxLength: 6 },
);
const hangings = fc.record({ list: sections, pairs: fc.integer({ min: 1, max: 12 }), diameterMm: fc.double({ min: 0.6, max: 12, noNaN: true }) }).map(({ list, pairs, diameterMm }): MacramePiece => ({
  ...hangingOf(list, { cords: 2 * pairs }),
  yarns: { main: { diameterMm } },
}));
const need = (piece: MacramePiece): number => {
  const planned = planPiece(piece);
  return planned.ok ? (planned.value.yarns['main']?.withMarginMm ?? 0) : Number.POSITIVE_INFINITY;
};

describe('whatever a knotted piece is', () => {
  test('more cords, one section more and more margin never need less cord', () => {
    fc.assert(fc.property(hangings, (piece) => {
      const [column] = piece.columns;
      if (column === undefined) return;
      const before = need(piece);
      expect(need({ ...piece, columns: [{ ...column, cords: column.cords + 2 }] })).toBeGreaterThanOrEqual(before);
      expect(need({ ...piece, columns: [{ ...column, sections: [...column.sections, { technique: 'plain', heightMm: 5 }] }] })).toBeGreaterThanOrEqual(before);
      expect(need({ ...piece, allowances: { margin: 0.3 } })).toBeGreaterThanOrEqual(before);
    }), RUNS);
  });

  test('every length scales with the piece when all lengths do', () => {
    fc.assert(fc.property(hangings, fc.double({ min: 0.5, max: 3, noNaN: true }), (piece, k) => {
      const [column] = piece.columns;
      const { main } = piece.yarns;
      if (column === undefined || main === undefined || !('diameterMm' in main)) return;
      const grown = JSON.parse(JSON.stringify(column.sections), (key, value: unknown) => (key.endsWith('Mm') && typeof value === 'number' ? value * k : value)) as Section[];
      const small = planPiece({ ...piece, allowances: { tailMm: 50 } });
      const large = planPiece({ ...piece, yarns: { main: { diameterMm: main.diameterMm * k } }, rod: { kind: 'rod', diameterMm: 20 * k }, columns: [{ ...column, sections: grown }], allowances: { tailMm: 50 * k } } satisfies MacramePiece);
      if (!small.ok || !large.ok) return;
      expect(large.value.columns[0]?.cutMm).toBeCloseTo((small.value.columns[0]?.cutMm ?? 0) * k, 6);
      expect(large.value.heightMm).toBeCloseTo(small.value.heightMm * k, 6);
    }), RUNS);
  });

  test('typed in inches it comes to the same', () => {
    fc.assert(fc.property(hangings, (piece) => {
      const inches = JSON.parse(JSON.stringify(piece), (key, value: unknown) => (key.endsWith('Mm') && typeof value === 'number' ? (value / MM_PER_INCH) * MM_PER_INCH : value)) as MacramePiece;
      const [metric, imperial] = [planPiece(piece, 'cm'), planPiece(inches, 'in')];
      expect(imperial.ok).toBe(metric.ok);
      if (metric.ok && imperial.ok) {
        expect(imperial.value.knots).toBe(metric.value.knots);
        expect(imperial.value.yarns['main']?.netMm).toBeCloseTo(metric.value.yarns['main']?.netMm ?? 0, 6);
      }
    }), RUNS);
  });

  test('nothing a person may send makes it throw', () => {
    fc.assert(fc.property(fc.jsonValue({ maxDepth: 5 }), fc.constantFrom('rod', 'yarns', 'columns', 'foot', 'takes', 'allowances', 'seed'), (nonsense, key) => {
      const planned = planPiece({ ...BRAID, [key]: nonsense });
      if (!planned.ok) expect(planned.problems.length).toBeGreaterThan(0);
    }), { ...RUNS, numRuns: cases(2000) });
  });
});
