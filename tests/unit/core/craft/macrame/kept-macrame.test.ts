import { describe, expect, test } from 'vitest';
import type { HungPiece, HungStrand } from '#core/craft/cloth/cloth-piece.ts';
import { drawMacrame } from '#core/craft/macrame/draw.ts';
import { EXAMPLE } from '#core/craft/macrame/example.ts';
import type { Column, MacramePiece, Section } from '#core/craft/macrame/piece.ts';
import { expectKept } from '../../../../support/kept.ts';
import { tellFindings, tellPiece } from '../../../../support/tell-piece.ts';
import { BRAID, hangingOf, planOf } from './a-hanging.ts';

const file = (name: string): URL => new URL(`../../../../fixtures/macrame/${name}.json`, import.meta.url);

const GOLD = { diameterMm: 2, tex: 3000, colour: '#c9a83a', label: 'Gold cord', ball: { metres: 50, grams: 150 } } as const;
const column = (cords: number, ...sections: readonly Section[]): Column => ({ yarn: 'main', cords, sections });

/** One for each way a knotted piece can differ. */
const PIECES: Readonly<Record<string, MacramePiece>> = {
  'the example': EXAMPLE,
  'a braid to a height': BRAID,
  'knots with bare cord between': hangingOf([{ technique: 'square-knots', knots: 6, gapMm: 20 }]),
  'a turning column': hangingOf([{ technique: 'square-knots', knots: 20, spiral: true, name: 'turning' }], { cords: 4 }),
  'a height with gaps': hangingOf([{ technique: 'square-knots', heightMm: 200, gapMm: 15 }]),
  'a net of an odd number of rows': hangingOf([{ technique: 'alternating', rows: 5, gapMm: 8, name: 'net' }], { cords: 6 }),
  'a net of many rows': hangingOf([{ technique: 'alternating', rows: 40 }], { cords: 8 }),
  'ribs that slant': hangingOf([{ technique: 'half-hitches', rows: 2, slant: 'left' }, { technique: 'half-hitches', rows: 3, slant: 'right', name: 'rib' }, { technique: 'half-hitches', rows: 30 }], { cords: 5 }),
  'a gathering knot in a column': hangingOf([{ technique: 'plain', heightMm: 80 }, { technique: 'gathering', wraps: 9, name: 'sheaf' }, { technique: 'fringe', heightMm: 60 }], { cords: 3 }),
  'three columns over a foot': {
    ...BRAID, yarns: { main: BRAID.yarns['main'] ?? GOLD, gold: GOLD },
    columns: [column(2, { technique: 'square-knots', knots: 12 }), { ...column(4, { technique: 'alternating', rows: 3 }), name: 'middle', yarn: 'gold' }, column(2, { technique: 'plain', heightMm: 40 })],
    foot: [{ technique: 'plain', heightMm: 30 }, { technique: 'gathering', wraps: 12, yarn: 'gold', name: 'sheaf' }, { technique: 'fringe', heightMm: 150 }],
  },
  'a ring': { ...BRAID, rod: { kind: 'ring', diameterMm: 50, thickMm: 5 }, columns: [column(8, { technique: 'square-knots', knots: 4 }, { technique: 'gathering', wraps: 60 })] },
  'a small ring of no said thickness': { ...BRAID, rod: { kind: 'ring', diameterMm: 20 }, columns: [column(12, { technique: 'square-knots', knots: 4 })] },
  'a long rod and a cord told by its grist': { ...hangingOf([{ technique: 'square-knots', knots: 8 }]), rod: { kind: 'rod', diameterMm: 12, lengthMm: 500 }, yarns: { main: { tex: 2000, strands: 2 } } },
  'own numbers': { ...hangingOf([{ technique: 'square-knots', knots: 8 }, { technique: 'half-hitches', rows: 2 }, { technique: 'alternating', rows: 2 }], { cords: 4 }), takes: { squareKnot: 14, squareRise: 3, doubleHalfHitch: 13 }, allowances: { margin: 0.25, tailMm: 80 }, seed: 3 },
  'more ends than a picture shows': hangingOf([{ technique: 'half-hitches', rows: 1 }, { technique: 'alternating', rows: 4 }, { technique: 'fringe', heightMm: 80 }], { cords: 50 }),
  'more knots than a picture shows': hangingOf([{ technique: 'square-knots', knots: 900, gapMm: 2 }]),
};

const strandText = ({ colour, widthMm, way }: HungStrand): string => `${colour} ${widthMm.toFixed(2)} mm: ${way.map((at) => at.toFixed(1)).join(' ')}`;

/** A drawing as lines, from the back to the front. */
const linesOf = ({ widthMm, heightMm, motifs, laid, words }: HungPiece): unknown => ({
  size: `${widthMm.toFixed(2)} × ${heightMm.toFixed(2)}`,
  words: words.in,
  motifs: motifs.map((strands) => strands.map(strandText)),
  laid: laid.map((item) => (item === 'rod' ? item : 'motif' in item ? `motif ${String(item.motif)} at ${item.xMm.toFixed(2)} ${item.yMm.toFixed(2)}` : strandText(item))),
});

describe.each(Object.entries(PIECES))('a knotted piece: %s', (name, piece) => {
  test('is reckoned and told as it was found right', () => {
    expectKept(file('told'), name, tellPiece(piece));
  });

  test('is drawn as it was found good', () => {
    const drawn = linesOf(drawMacrame({ piece, plan: planOf(piece) }, name)) as { laid: readonly string[] };
    expectKept(file('drawn'), name, drawn.laid.length > 140 ? { ...drawn, laid: [String(drawn.laid.length), ...drawn.laid.filter((_, index) => index % 17 === 0)] } : drawn);
  });
});

describe('what is wrong with a knotted piece', () => {
  const cords = (many: number): MacramePiece['yarns'] => Object.fromEntries(Array.from({ length: many }, (_, index) => [`cord-${String(index)}`, { diameterMm: 3 }]));
  test.each<[string, unknown]>([
    ['sixty-one kinds of cord', { ...BRAID, yarns: cords(61) }],
    ['sixty kinds of cord, none of them the one it hangs', { ...BRAID, yarns: cords(60) }],
    ['a role that begins with a figure', { ...BRAID, yarns: { ...BRAID.yarns, '1st': { diameterMm: 3 } } }],
    ['a role of two words', { ...BRAID, yarns: { ...BRAID.yarns, 'two words': { diameterMm: 3 } } }],
    ['a name in capitals', hangingOf([{ technique: 'plain', heightMm: 10, name: 'Crown' }])],
    ['an empty name', hangingOf([{ technique: 'plain', heightMm: 10, name: '' }])],
    ['a column and a section of one name', hangingOf([{ technique: 'plain', heightMm: 10, name: 'braid' }])],
    ['no columns', { ...BRAID, columns: [] }],
    ['sixty-one columns', { ...BRAID, columns: Array.from({ length: 61 }, () => column(1, { technique: 'plain', heightMm: 10 })) }],
    ['no sections', hangingOf([])],
    ['sixty-one sections', hangingOf(Array.from({ length: 61 }, () => ({ technique: 'plain', heightMm: 10 }) as const))],
    ['no cords', hangingOf([{ technique: 'plain', heightMm: 10 }], { cords: 0 })],
    ['half a cord', hangingOf([{ technique: 'plain', heightMm: 10 }], { cords: 1.5 })],
    ['too many ends', { ...BRAID, columns: [column(150, { technique: 'plain', heightMm: 10 }), column(60, { technique: 'plain', heightMm: 10 })] }],
    ['too many knots', hangingOf([{ technique: 'square-knots', knots: 9000 }, { technique: 'square-knots', knots: 9000 }], { cords: 4 })],
    ['a knot more than one may ask for', hangingOf([{ technique: 'square-knots', knots: 10_001 }])],
    ['no rows', hangingOf([{ technique: 'alternating', rows: 0 }], { cords: 4 })],
    ['a net of four ends', hangingOf([{ technique: 'alternating', rows: 3 }])],
    ['a net of ten ends', hangingOf([{ technique: 'alternating', rows: 3 }], { cords: 5 })],
    ['a rib of one cord', hangingOf([{ technique: 'half-hitches', rows: 1 }], { cords: 1 })],
    ['a slant upwards', hangingOf([{ technique: 'half-hitches', rows: 1, slant: 'up' } as never])],
    ['a gap below nothing', hangingOf([{ technique: 'square-knots', knots: 3, gapMm: -1 }])],
    ['a gap of a metre and more', hangingOf([{ technique: 'alternating', rows: 3, gapMm: 1001 }], { cords: 4 })],
    ['no turns', hangingOf([{ technique: 'gathering', wraps: 0 }])],
    ['a gathering knot in a cord nobody has', hangingOf([{ technique: 'gathering', wraps: 5, yarn: 'gold' }])],
    ['neither knots nor a height', hangingOf([{ technique: 'square-knots' } as never])],
    ['a technique of weaving', hangingOf([{ technique: 'soumak', rows: 3 } as never])],
    ['knots in the foot', { ...BRAID, foot: [{ technique: 'square-knots', knots: 3 }] }],
    ['a foot below columns that end in a fringe', { ...hangingOf([{ technique: 'fringe', heightMm: 10 }]), foot: [{ technique: 'plain', heightMm: 10 }] }],
    ['a foot that goes on after its fringe', { ...BRAID, foot: [{ technique: 'fringe', heightMm: 10 }, { technique: 'plain', heightMm: 10 }] }],
    ['a foot of another kind', { ...BRAID, foot: 'fringe' }],
    ['a cord of no thickness', { ...BRAID, yarns: { main: { diameterMm: 0.4 } } }],
    ['a cord as thick as a rope', { ...BRAID, yarns: { main: { diameterMm: 61 } } }],
    ['a cord that says nothing', { ...BRAID, yarns: { main: {} } }],
    ['a cord with a colour of its own words', { ...BRAID, yarns: { main: { diameterMm: 3, colour: 'gold' } } }],
    ['a cord with too long a label', { ...BRAID, yarns: { main: { diameterMm: 3, label: 'x'.repeat(121), fibre: 'y'.repeat(61) } } }],
    ['a cord with a key nobody knows', { ...BRAID, yarns: { main: { diameterMm: 3, twist: 'S' } } }],
    ['a rod of no thickness', { ...BRAID, rod: { kind: 'rod', diameterMm: 0 } }],
    ['a branch', { ...BRAID, rod: { kind: 'branch', diameterMm: 20 } }],
    ['a ring with a length', { ...BRAID, rod: { kind: 'ring', diameterMm: 60, lengthMm: 200 } }],
    ['a ring that is thicker than is usual', { ...BRAID, rod: { kind: 'ring', diameterMm: 16 } }],
    ['takes out of what was measured', { ...BRAID, takes: { squareKnot: 21, squareRise: 1, doubleHalfHitch: 26, loops: 2 } }],
    ['more margin than cord', { ...BRAID, allowances: { margin: 1.1, tailMm: -1, spare: 1 } }],
    ['half a seed', { ...BRAID, seed: 0.5 }],
  ])('%s is told in its place', (name, piece) => {
    const found = tellFindings(piece);
    expect(found.length).toBeGreaterThan(0);
    expectKept(file('refused'), name, found);
  });
});
