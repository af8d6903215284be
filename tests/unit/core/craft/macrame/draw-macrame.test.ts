import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { amountChoices } from '#core/craft/amount-choices.ts';
import { amountKeysOf, amountOf } from '#core/craft/amounts.ts';
import { clothOf } from '#core/craft/cloth-of.ts';
import { drawCloth } from '#core/craft/cloth/draw-cloth.ts';
import { fitPiece } from '#core/craft/fit.ts';
import { drawMacrame } from '#core/craft/macrame/draw.ts';
import { EXAMPLE } from '#core/craft/macrame/example.ts';
import type { MacramePiece, Section } from '#core/craft/macrame/piece.ts';
import { yarnTable } from '#core/gathering/yarn-table.ts';
import { amountText } from '#core/units/format-amount.ts';
import { cases } from '../../../../support/random-cases.ts';
import { BRAID, hangingOf, planOf } from './a-hanging.ts';

const PLAN = planOf(EXAMPLE);
const draw = (piece: MacramePiece): string => drawCloth(clothOf(piece, planOf(piece), 'Net <b>'), { id: 'a', as: 'hanging', width: 320 });

describe('a knotted piece drawn', () => {
  test('says itself in words, in the person’s own units, with the title made safe', () => {
    expect(draw(EXAMPLE)).toContain('aria-label="Net &#60;b&#62;, knotted hanging, 6 cords on a rod, 36\u00a0cm long. From the top: body of 6 folded cords: a rib of 11 double half hitches, a net of 13 square knots');
    expect(drawCloth(clothOf(EXAMPLE, PLAN, 'Net'), { id: 'a', as: 'hanging', width: 320, units: 'in' })).toMatch(/aria-label="[^"]*in long/);
  });

  test('holds no style, no script and no broken number, and keeps within its size', () => {
    const techniques: Section[] = [
      { technique: 'alternating', rows: 400 }, { technique: 'square-knots', knots: 500, spiral: true }, { technique: 'half-hitches', rows: 40, slant: 'right' },
    ];
    fc.assert(fc.property(fc.subarray(techniques, { minLength: 1 }), fc.integer({ min: 1, max: 100 }), fc.constantFrom('rod' as const, 'ring' as const), (sections, pairs, kind) => {
      const svg = draw({ ...EXAMPLE, rod: { kind, diameterMm: 40 }, columns: [{ yarn: 'main', cords: 2 * pairs, sections }], foot: [{ technique: 'gathering', wraps: 12 }, { technique: 'fringe', heightMm: 300 }] });
      expect(svg).not.toMatch(/NaN|undefined|Infinity|\sstyle=|<script/);
      expect(svg.length).toBeLessThan(400 * 1024);
    }), { numRuns: cases(60) });
  });

  test('stretches of plain cord hang from where they are knotted, and a wrap of another yarn has its colour', () => {
    const plain = planOf(hangingOf([{ technique: 'plain', heightMm: 200 }]));
    const hung = drawMacrame({ piece: hangingOf([{ technique: 'plain', heightMm: 200 }]), plan: plain }, 'Bare');
    const strands = hung.laid.flatMap((item) => (typeof item === 'object' && 'way' in item ? [item.way] : []));
    // Four ends; each goes straight down from its place on the rod.
    const down = strands.filter((way) => way.at(-1) === 200);
    expect(down).toHaveLength(4);
    for (const way of down) expect(way[0]).toBeCloseTo(way.at(-2) ?? 0, 9);
    const gathered: MacramePiece = { ...BRAID, yarns: { ...BRAID.yarns, gold: { diameterMm: 2, colour: '#c9a83a' } }, foot: [{ technique: 'gathering', wraps: 10, yarn: 'gold' }] };
    const colours = drawMacrame({ piece: gathered, plan: planOf(gathered) }, 'Sheaf').motifs.map((strandsOf) => strandsOf[0]?.colour);
    expect(colours).toContain('#c9a83a');
  });

  test('a rib that slants to the left ends lower at its left, to the right lower at its right', () => {
    const ends = (slant: 'left' | 'right' | 'level'): number[] => {
      const piece = hangingOf([{ technique: 'half-hitches', rows: 1, slant }]);
      const { laid, motifs } = drawMacrame({ piece, plan: planOf(piece) }, 'Rib');
      // Hitches are of two turns; a lark's head is one strand.
      return laid.flatMap((item) => (typeof item === 'object' && 'motif' in item && motifs[item.motif]?.length === 2 ? [item.yMm] : []));
    };
    const [left, right, level] = [ends('left'), ends('right'), ends('level')];
    expect(left).toHaveLength(4);
    expect(left[0]).toBeGreaterThan(left[3] ?? 0);
    expect(right[3]).toBeGreaterThan(right[0] ?? 0);
    expect(level[3]).toBe(level[0]);
    expect(left[0]).toBeCloseTo(right[3] ?? 0, 9);
  });

  test('hangs from a ring as from a rod, with the ring’s own size', () => {
    const ring: MacramePiece = { ...EXAMPLE, rod: { kind: 'ring', diameterMm: 60, thickMm: 5 } };
    const { rod, words } = drawMacrame({ piece: ring, plan: planOf(ring) }, 'Net');
    expect(rod).toEqual({ kind: 'ring', diameterMm: 60, thickMm: 5 });
    expect(words.cm).toMatch(/^6 cords on a ring, /);
  });

  test('is said with every stretch it has, one knot as one, and no more than twelve columns one by one', () => {
    const words = (piece: MacramePiece): string => drawMacrame({ piece, plan: planOf(piece) }, 'Net').words.cm.replaceAll('\u00a0', ' ');
    expect(words({ ...hangingOf([{ technique: 'square-knots', knots: 1 }, { technique: 'plain', heightMm: 50 }, { technique: 'gathering', wraps: 6 }]), foot: [{ technique: 'fringe', heightMm: 100 }] }))
      .toMatch(/braid of 2 folded cords: 1 square knot, 5 cm of plain cord, a gathering knot\. Below them all ends together: 10 cm of loose ends\.$/);
    const column = { yarn: 'main', cords: 1, sections: [{ technique: 'plain', heightMm: 50 }] } as const;
    expect(words({ ...BRAID, columns: Array.from({ length: 14 }, () => column) })).toMatch(/column 12 of 1 folded cord: 5 cm of plain cord; and 2 columns more\.$/);
  });

  test('a knot is drawn once and placed wherever it comes again', () => {
    expect(draw(EXAMPLE).match(/<g id="a-knot/g)?.length).toBeLessThan(8);
    expect(draw(EXAMPLE).match(/<use href="#a-knot/g)?.length).toBeGreaterThan(30);
  });
});

describe('amounts of a knotted piece', () => {
  const words = (key: string): string => {
    const amount = amountOf(key, EXAMPLE, PLAN);
    return amount.ok ? amountText(amount.value, 'cm').replaceAll('\u00a0', ' ') : (amount.problems[0]?.message ?? '');
  };

  test.each([
    ['cords', '6 cords'], ['ends', '12 ends'], ['knots', '48 knots'], ['column.body.cut', '217.5 cm'], ['section.net.knots', '13 knots'], ['section.braids.height', '11 cm'],
    ['yarn.main', '14 m'], ['yarn.gold', 'This piece has no cord in the role “gold”.'], ['section.tips.knots', 'A stretch that is fringe has no knots.'], ['nails', 'No amount is called “nails”.'],
  ])('%s is %s', (key, expected) => {
    expect(words(key)).toBe(expected);
  });

  // Ten turns of 3 mm cord stand 30 mm high. Gold is bought in balls of 10 m.
  const SHEAF: MacramePiece = {
    ...BRAID,
    rod: { kind: 'ring', diameterMm: 60 },
    yarns: { main: { diameterMm: 3 }, gold: { diameterMm: 3, tex: 4000, label: 'Gold cord', ball: { metres: 10, grams: 40 } } },
    takes: { squareKnot: 14 },
    foot: [{ technique: 'gathering', name: 'sheaf', wraps: 10, yarn: 'gold' }, { technique: 'plain', name: 'rest', heightMm: 120 }],
  };
  const ofSheaf = (key: string) => amountOf(key, SHEAF, planOf(SHEAF));
  const told = (key: string): string => {
    const amount = ofSheaf(key);
    return amount.ok ? `${amount.value.label}: ${amountText(amount.value, 'cm').replaceAll('\u00a0', ' ')}` : (amount.problems[0]?.message ?? '');
  };

  test.each([
    ['rod.diameter', 'Width of the ring: 60 mm'],
    ['rod.length', 'This piece does not tell “rod.length”.'],
    ['yarn.gold.balls', 'Balls of Gold cord: 1 ball'],
    ['yarn.main.balls', 'How long a ball of “main” is has not been said.'],
    ['yarn.main.colour', 'A cord has no “colour”. It has mass and balls.'],
    ['column.braid.cords', 'Braid: cords: 2 cords'],
    ['column.braid.colour', 'A column has no “colour”. It has cords, cut and height.'],
    ['column.net.cords', 'This piece has no column called “net”.'],
    ['column.braid', 'No amount is called “column.braid”.'],
    ['section.rest.height', 'Rest: length: 12 cm'],
    ['section.rest.knots', 'A stretch that is plain has no knots.'],
    ['section.rest.cord', 'Only a gathering knot has a cord of its own.'],
    ['section.rest.width', 'A section has no “width”. It has height, knots, worker and cord.'],
    ['section.net.height', 'This piece has no section called “net”.'],
    ['section.rest', 'No amount is called “section.rest”.'],
    ['yarn.gold.mass.net', 'No amount is called “yarn.gold.mass.net”.'],
  ])('%s of a sheaf on a ring is told as %s', (key, expected) => {
    expect(told(key)).toBe(expected);
  });

  test('a knot of one’s own that was measured makes what hangs on it measured', () => {
    const trust = (key: string): string => {
      const amount = ofSheaf(key);
      return amount.ok ? amount.value.howReckoned.trust : '';
    };
    expect(trust('column.braid.cut')).toBe('measured');
    expect(trust('section.sheaf.height')).toBe('measured');
    const rule = amountOf('column.body.cut', EXAMPLE, PLAN);
    expect(rule.ok && rule.value.howReckoned.trust).toBe('class');
  });

  test('a cord of one’s own takes the pattern’s colour unless it says its own, and a cord nobody knots with is told', () => {
    const fitted = fitPiece(EXAMPLE, { yarns: { main: { tex: 12_000 }, lost: { tex: 100 } } });
    expect(fitted.ok && fitted.value.piece.yarns['main']).toEqual({ tex: 12_000, colour: '#ddd3bb' });
    expect(fitted.ok && fitted.value.changes[0]).toBe('Your own cord is the main cord.');
    expect(fitted.ok && fitted.warnings.map(({ code, path }) => `${code} ${path}`)).toContain('W_UNUSED /yarns/lost');
  });

  test('every key it tells can be asked for, and the lists for a teacher name them', () => {
    for (const key of amountKeysOf(EXAMPLE, PLAN)) expect(amountOf(key, EXAMPLE, PLAN).ok).toBe(true);
    expect(amountChoices(EXAMPLE, PLAN, 'cm').map(({ title }) => title)).toEqual(['Size and rod', 'Cords', 'To buy', 'Knots', 'Time']);
  });

  test('what to buy stands under its label', () => {
    expect(yarnTable(EXAMPLE, PLAN).lines).toMatchObject([{ name: 'Cotton cord', detail: '4 mm', colour: '#ddd3bb' }]);
  });

  test('a thicker cord of one’s own makes the piece longer and is told', () => {
    const fitted = fitPiece(EXAMPLE, { yarns: { main: { tex: 20_000, label: 'Dune Roving' } } });
    expect(fitted.ok && fitted.value.changes.join(' ')).toMatch(/Dune Roving is the main cord\..*instead of 36/s);
  });
});
