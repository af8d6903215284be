import { describe, expect, test } from 'vitest';
import { amountKeysOf, amountOf, type Amount } from '#core/craft/amounts.ts';
import type { Input } from '#core/craft/amounts/amount-types.ts';
import { AMOUNTS } from '#core/craft/frame-loom/amounts.ts';
import { leastTrust } from '#core/craft/trust.ts';
import type { FrameLoomPiece } from '#core/craft/piece.ts';
import { amountText } from '#core/units/format-amount.ts';
import { pieceWith, planOf, PLAIN_PIECE } from './a-piece.ts';

const PIECE: FrameLoomPiece = pieceWith({
  warp: { yarn: { tex: 400, ball: { metres: 250, grams: 100 } }, parity: 'even' },
  dowel: { diameterMm: 12 },
  yarns: {
    ground: { metresPer100g: 180, label: 'Fenwool 6/2', wrapsPerInch: 10, ball: { metres: 90, grams: 50 } },
    fringe: { metresPer100g: 100 },
  },
  bands: [
    { name: 'fringe-low', technique: 'rya', yarn: 'fringe', strands: 3, legEnds: 1, pileMm: 150, trimMm: 10, rows: 2, heightMm: 12 },
    { name: 'ridge', technique: 'soumak', yarn: 'fringe', over: 4, back: 2, rows: 3, tabbyBetween: 1, tabbyYarn: 'ground' },
    { name: 'fluff', technique: 'roving', yarn: 'fringe', over: 4, bulgeMm: 5, heightMm: 20 },
    { name: 'sky', technique: 'tabby', yarn: 'ground', fill: true },
  ],
});
const PLAN = planOf(PIECE);

const amount = (key: string, piece: FrameLoomPiece = PIECE): Amount => {
  const outcome = amountOf(key, piece, planOf(piece));
  if (!outcome.ok) throw new Error(outcome.problems[0]?.message);
  return outcome.value;
};
const words = (key: string): string => amountText(amount(key), 'cm').replaceAll('\u00a0', ' ');
const whyNot = (key: string): string => {
  const outcome = amountOf(key, PIECE, PLAN);
  return outcome.ok ? 'it is told' : `${outcome.problems[0]?.code ?? ''} ${outcome.problems[0]?.message ?? ''}`;
};

test.each([
  ['ends', '62 ends'],
  ['nails', '32 nails'],
  ['spacing', '5 mm'],
  ['width', '30 cm'],
  ['height', '40 cm'],
  ['wound-width', '31 cm'],
  ['loom.width', '35 cm'],
  ['loom.height', '50.9 cm'],
  ['warp', '36 m'],
  ['warp.mass', '14 g'],
  ['warp.balls', '1 ball'],
  ['yarn.ground', '96 m'],
  ['yarn.ground.mass', '53 g'],
  ['yarn.ground.balls', '2 balls'],
  ['yarn.fringe', '79 m'],
  ['band.fringe-low.height', '1.2 cm'],
  ['band.fringe-low.rows', '2 rows'],
  ['band.fringe-low.knots', '62 knots'],
  ['band.fringe-low.strands', '186 strands'],
  ['band.fringe-low.cut', '35.5 cm'],
  ['band.ridge.stitches', '90 stitches'],
  ['band.ridge.rows', '3 rows'],
  ['band.sky.rows', '249 rows'],
  ['band.sky.height', '36 cm'],
  ['band.sky.yarn', '82 m'],
  ['spacer.width', '32.5 cm'],
  ['spacer.height', '6 cm'],
  ['dowel.length', '38 cm'],
  ['dowel.diameter', '12 mm'],
  ['cord', '72 cm'],
  ['pick', '33 cm'],
  ['rows-per-load', '24 rows'],
])('%s is %s', (key, text) => {
  expect(words(key)).toBe(text);
});

test('the amount to have in hand is with margin, for length and mass alike', () => {
  const { withMarginMm, netMm, massG } = PLAN.yarns['ground'] ?? { withMarginMm: 0, netMm: 1, massG: 0 };
  expect(amount('yarn.ground')).toMatchObject({ kind: 'length', mm: withMarginMm, label: 'Fenwool 6/2' });
  expect(amount('yarn.ground.mass')).toMatchObject({ kind: 'mass', grams: expect.closeTo((massG * withMarginMm) / netMm, 9) as unknown });
});

test('every amount says how it was got: formula, what went in, source and trust', () => {
  for (const key of amountKeysOf(PIECE, PLAN)) {
    const { howReckoned, label } = amount(key);
    expect(label, key).not.toBe('');
    expect(howReckoned.formula, key).not.toBe('');
    expect(howReckoned.source, key).not.toBe('');
    expect(['measured', 'label', 'formula', 'class'], key).toContain(howReckoned.trust);
  }
});

describe('what went into an amount', () => {
  const inWords = (input: Input): string =>
    input.kind === 'number' ? input.value.toFixed(2) : input.kind === 'share' ? `${(input.share * 100).toFixed(2)} %` : amountText(input, 'cm').replaceAll('\u00a0', ' ');
  const went = (key: string, piece?: FrameLoomPiece): Record<string, string> =>
    Object.fromEntries(amount(key, piece).howReckoned.inputs.map(({ name, value }) => [name, inWords(value)]));

  // 300/0.98 = 306.12 mm at 5 mm are 61.22 ends, 62 for an even number. They go over 520 mm and half round each of 63
  // nails: 32.77 m, 36.05 with a tenth on top, 13.1 g of 400 tex.
  // A row is 61 gaps of 5 mm with 6.65 % of take-up and a turn, 328.48 mm: two between the soumak are 0.66 m, 249 of the
  // sky 81.8 m, and 11 loads leave two tails of 50 mm each: 83.55 m, with 15 % 96.1 m.
  test.each<[string, Record<string, string>]>([
    ['ends', { 'width on the loom': '31 cm', 'from nail to nail': '10 mm', 'before rounding': '61.22' }],
    ['nails', { 'warp ends': '62 ends', 'on the lower rail': '31 nails' }],
    ['spacing', { 'from nail to nail': '10 mm', 'every so-many-th nail': '1.00', 'ends worked together': '1.00' }],
    ['width', {}],
    ['wound-width', { 'warp ends': '62 ends' }],
    ['loom.width', { nails: '32 nails', 'from nail to nail': '10 mm' }],
    ['loom.height', { 'height on the loom': '41 cm', above: '4 cm', below: '6 cm' }],
    ['warp', { 'warp ends': '62 ends', 'height of the frame': '52 cm', 'without margin': '33 m', margin: '10.00 %' }],
    ['warp.balls', { 'length with margin': '36 m' }],
    ['yarn.ground', { ridge: '0.7 m', sky: '82 m', 'without margin': '84 m', margin: '15.00 %' }],
    ['yarn.ground.balls', { 'length with margin': '96 m', 'length of a ball': '90 m' }],
    ['band.fringe-low.height', {}],
    ['band.sky.rows', { height: '36 cm' }],
    ['band.fringe-low.knots', { 'working ends': '62 ends' }],
    ['band.fringe-low.strands', { knots: '62 knots' }],
    ['band.fringe-low.cut', { pile: '15 cm', trim: '1 cm' }],
    ['band.sky.yarn', { 'working ends': '62 ends' }],
    ['spacer.width', { 'width of the warp': '31 cm' }],
    ['spacer.height', {}],
    ['dowel.length', { width: '30 cm' }],
    ['dowel.diameter', { 'mass of the piece': '128 g', 'thinnest that does not sag': '7 mm' }],
    ['cord', {}],
    ['hours', { 'warp ends': '62 ends' }],
    ['mass', { warp: '13 g' }],
    ['pick', { 'working ends': '62 ends', 'take-up': '6.65 %' }],
    ['rows-per-load', { 'yarn on the shuttle': '8 m', 'yarn in one row': '33 cm' }],
  ])('%s: %j', (key, inputs) => {
    expect(went(key)).toEqual(inputs);
  });

  test('is this piece’s own: nails left out, ends in pairs, loads and margins it says itself', () => {
    const own: FrameLoomPiece = { ...PIECE, loom: { ...PIECE.loom, nailPitchMm: 5, everyNthNail: 2 }, warp: { ...PIECE.warp, endsTogether: 2 }, allowances: { loadMm: 5000, marginWarp: 0.2, marginWeft: 0.3 }, mode: 'balanced' };
    expect(went('spacing', own)).toEqual({ 'from nail to nail': '5 mm', 'every so-many-th nail': '2.00', 'ends worked together': '2.00' });
    expect(went('rows-per-load', own)).toMatchObject({ 'yarn on the shuttle': '5 m' });
    expect(went('warp', own)).toMatchObject({ margin: '20.00 %' });
    expect(went('yarn.ground', own)).toMatchObject({ margin: '30.00 %' });
  });

  test('a band without a name goes in under its technique', () => {
    expect(went('yarn.ground', PLAIN_PIECE)).toHaveProperty('sky');
    const [{ name: _, ...unnamed }] = PLAIN_PIECE.bands;
    expect(went('yarn.ground', pieceWith({ bands: [unnamed] }))).toHaveProperty('tabby');
  });
});

test('yarn that no band is woven with weighs nothing', () => {
  expect(amount('yarn.spare.mass', { ...PIECE, yarns: { ...PIECE.yarns, spare: { tex: 300 } } })).toMatchObject({ grams: 0 });
});

test('rows from one shuttle are those of the yarn with most rows', () => {
  // The thicker sand lies in 40 mm, the ground in the other 360: 24 rows of 328 mm go on 8 m, as without it.
  const piece = pieceWith({ yarns: { sand: { tex: 2000 }, ground: { metresPer100g: 180 } }, bands: [{ technique: 'tabby', name: 'dune', yarn: 'sand', heightMm: 40 }, ...PLAIN_PIECE.bands] });
  const { yarns } = planOf(piece);
  expect(amount('rows-per-load', piece)).toMatchObject({ count: yarns['ground']?.rowsPerLoad ?? 0 });
  expect(yarns['ground']?.rowsPerLoad).not.toBe(0);
});

test.each([
  ['band.fringe-low.knots', 'Fringe low: knots'], ['band.ridge.stitches', 'Ridge: stitches'], ['band.sky.yarn', 'Sky: Fenwool 6/2'], ['band.fluff.yarn', 'Fluff: fringe'], ['yarn.fringe', 'fringe'],
])('%s is labelled %s', (key, label) => {
  expect(amount(key).label).toBe(label);
});

test('every kind of amount is told by this piece, written out by role and band', () => {
  const keys = amountKeysOf(PIECE, PLAN);
  for (const key of AMOUNTS.flatMap((group) => group.keys)) {
    const pattern = new RegExp(`^${key.replaceAll('.', '\\.').replace('<role>', '[a-z]+').replace('<name>', '[a-z-]+')}$`, 'u');
    expect(keys.some((written) => pattern.test(written)), key).toBe(true);
  }
  expect(keys).not.toContain('yarn.fringe.balls');
  expect(keys).not.toContain('band.fluff.rows');
});

describe('trust', () => {
  test('a counted swatch makes rows and their yarn measured, a rule of thumb leaves them reckoned', () => {
    const swatch = { ...PIECE, beat: { picksPerCm: 7 } };
    expect(amount('band.sky.rows').howReckoned.trust).toBe('formula');
    expect(amount('band.sky.rows', swatch).howReckoned.trust).toBe('measured');
    expect(amount('yarn.ground', swatch).howReckoned.trust).toBe('measured');
    expect(amount('yarn.ground.mass', swatch).howReckoned.trust).toBe('label');
    expect(amount('yarn.fringe', swatch).howReckoned.trust).toBe('formula');
    expect(amount('yarn.ground').howReckoned.trust).toBe('formula');
    // What lies in picks of wrapped yarn is as sure as its swatch; pile is as sure as how thick the yarn was found to lie.
    expect(amount('band.sky.yarn', swatch).howReckoned.trust).toBe('measured');
    expect(amount('band.sky.yarn').howReckoned.trust).toBe('formula');
    expect(amount('band.ridge.yarn', swatch).howReckoned.trust).toBe('formula');
    const wrapped: FrameLoomPiece = { ...PIECE, yarns: { ...PIECE.yarns, fringe: { metresPer100g: 100, wrapsPerInch: 7 } } };
    expect(amount('band.fringe-low.cut', wrapped).howReckoned.trust).toBe('measured');
    expect(amount('band.fringe-low.cut').howReckoned.trust).toBe('formula');
    // None of it lies in picks, so how close those are beaten does not matter.
    expect(amount('yarn.fringe', wrapped).howReckoned.trust).toBe('measured');
  });

  test('is that of the least certain input', () => {
    expect(leastTrust('measured')).toBe('measured');
    expect(leastTrust('measured', 'class', 'label')).toBe('class');
    expect(leastTrust('label', 'measured')).toBe('label');
  });
});

describe('an amount that is not told says why', () => {
  test.each([
    ['weft', 'E_ENUM No amount is called “weft”.'],
    ['', 'E_ENUM No amount is called “”.'],
    ['constructor', 'E_ENUM No amount is called “constructor”.'],
    ['yarn.sky', 'E_ENUM This piece has no yarn in the role “sky”.'],
    ['yarn.constructor', 'E_ENUM This piece has no yarn in the role “constructor”.'],
    ['yarn.ground.colour', 'E_ENUM A yarn has no “colour”. It has mass and balls.'],
    ['yarn.fringe.balls', 'E_ENUM How long a ball of “fringe” is has not been said.'],
    ['yarn', 'E_ENUM No amount is called “yarn”.'],
    ['yarn.ground.mass.net', 'E_ENUM No amount is called “yarn.ground.mass.net”.'],
    ['band.sky', 'E_ENUM No amount is called “band.sky”.'],
    ['band.dune.height', 'E_ENUM This piece has no band called “dune”.'],
    ['band.sky.knots', 'E_ENUM A band of tabby has no knots.'],
    ['band.sky.strands', 'E_ENUM A band of tabby has no strands.'],
    ['band.sky.cut', 'E_ENUM A band of tabby has no cut.'],
    ['band.sky.stitches', 'E_ENUM A band of tabby has no stitches.'],
    ['band.fluff.rows', 'E_ENUM A band of roving has no rows.'],
    ['band.sky.toString', 'E_ENUM A band has no “toString”. It has height, rows, knots, stitches, strands, cut, yarn.'],
    ['frame.sky.height', 'E_ENUM No amount is called “frame.sky.height”.'],
    ['loom.depth', 'E_ENUM No amount is called “loom.depth”.'],
  ])('%s: %s', (key, reason) => {
    expect(whyNot(key)).toBe(reason);
  });

  test('a piece without dowel, balls or picks does not tell theirs', () => {
    const bare = pieceWith({ size: { widthMm: 300, heightMm: 12 }, bands: [{ technique: 'rya', yarn: 'ground', strands: 3, legEnds: 1, pileMm: 50, trimMm: 0, rows: 1, heightMm: 12 }] });
    for (const key of ['dowel.length', 'dowel.diameter', 'cord', 'warp.balls', 'rows-per-load']) expect(amountOf(key, bare, planOf(bare)).ok, key).toBe(false);
    expect(amountOf('rows-per-load', PLAIN_PIECE, planOf(PLAIN_PIECE)).ok).toBe(true);
  });
});
