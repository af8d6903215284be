import { readdir, readFile } from 'node:fs/promises';
import { fileURLToPath } from 'node:url';
import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { fitPiece, type MyPiece } from '#core/craft/fit.ts';
import type { FrameLoomPiece } from '#core/craft/piece.ts';
import { planPiece } from '#core/craft/plan.ts';
import { CODE_WORDS, type Code } from '#core/craft/reading/code-words.ts';
import { reckon } from '#core/craft/reckon.ts';
import { planRest } from '#core/craft/rest/plan-rest.ts';
import { mergeShopping, type PieceToShop } from '#core/craft/shopping/merge-shopping.ts';
import type { Outcome, Problem } from '#core/outcome.ts';
import { cases } from '../../../support/random-cases.ts';
import { PLAIN_PIECE, pieceOf } from './a-piece.ts';
import { hangingOf } from './macrame/a-hanging.ts';

const told = (outcome: Outcome<unknown>): readonly Problem[] => (outcome.ok ? outcome.warnings : outcome.problems);
const CODES = Object.keys(CODE_WORDS) as Code[];
const plan = (parts: object): readonly Problem[] => told(planPiece({ ...PLAIN_PIECE, ...parts }));
const ground = (yarn: object): readonly Problem[] => plan({ yarns: { ground: yarn } });
const bands = (...first: object[]): readonly Problem[] => plan({ bands: [...first, ...PLAIN_PIECE.bands] });
const dye = (parts: object): readonly Problem[] => told(planPiece({ craft: 'dyeing', fibre: { kind: 'wool', massG: 250 }, mordant: { agent: 'alum' }, dye: { percent: 100 }, ...parts }));
const WARP = PLAIN_PIECE.warp;

/** For each code something a person may well say that brings it about. */
const PROVOKED: Readonly<Record<Code, () => readonly Problem[]>> = {
  E_NUM: () => plan({ size: { widthMm: '300', heightMm: 400 } }),
  E_RANGE: () => plan({ size: { widthMm: -3, heightMm: 400 } }),
  E_ENUM: () => plan({ craft: 'lace' }),
  E_JAM: () => ground({ tex: 20_000 }),
  E_FIT: () => plan({ loom: { ...PLAIN_PIECE.loom, insideHeightMm: 300 } }),
  E_PARITY: () => plan({ warp: { ...WARP, endCount: 61 } }),
  E_COUNT: () => plan({ warp: { ...WARP, endCount: 60.5 } }),
  W_AMBIGUOUS: () => ground({ count: { text: '2/8', system: 'ne-cotton' } }),
  W_SILK: () => ground({ fibre: 'silk', count: { text: '40/2', system: 'ne-cotton' } }),
  W_LOFT: () => ground({ tex: 556, wrapsPerInch: 40 }),
  W_LABEL: () => ground({ tex: 500, ball: { metres: 100, grams: 100 } }),
  W_CLASS: () => ground({ class: 4 }),
  W_PARITY: () => plan({}),
  W_WIDTH: () => plan({ warp: { ...WARP, endCount: 40 } }),
  W_CLAMPED: () => told(reckon({ what: 'take-up', warpDiameterMm: 0.9, weftDiameterMm: 1.5, warpSpacingMm: 4.2, weftSpacingMm: 1.2, mode: 'balanced' })),
  W_TAKE_UP: () => plan({ mode: 'measured' }),
  W_WARP_SHOWS: () => ground({ metresPer100g: 100, wrapsPerInch: 5 }),
  W_THICK: () => ground({ metresPer100g: 100, wrapsPerInch: 7.5 }),
  W_LOOSE: () => ground({ tex: 60 }),
  W_THIN: () => bands({ technique: 'tabby', yarn: 'ground', heightMm: 0 }),
  W_PLAIN_END: () => bands({ technique: 'rya', yarn: 'ground', strands: 3, legEnds: 3, pileMm: 50, trimMm: 5, rows: 1, heightMm: 6 }),
  W_SHORT_STITCH: () => bands({ technique: 'soumak', yarn: 'ground', over: 4, back: 1, rows: 1, tabbyBetween: 0, tabbyYarn: 'ground' }),
  W_SLIT: () => bands({ technique: 'tabby', yarn: 'ground', heightMm: 80, shapes: [{ shape: 'rectangle', yarn: 'ground', baseMm: 60, heightMm: 60 }] }),
  W_TIGHT: () => ground({ metresPer100g: 180, ball: { metres: 54, grams: 30 } }),
  W_SHORT: () => told(planRest(PLAIN_PIECE, { bandsDone: 0, rows: 100, leftG: { ground: 1 } })),
  W_ROOM: () => told(planRest(pieceOf({ technique: 'tabby', yarn: 'ground', heightMm: 399 }), { bandsDone: 1, heightMm: 430 })),
  W_FRINGE: () => plan({ finish: { bottom: 'twisted', fringeMm: 120 }, allowances: { bottomMm: 80 }, loom: { ...PLAIN_PIECE.loom, insideHeightMm: 700 } }),
  W_RULE: () => told(planPiece(hangingOf([{ technique: 'square-knots', knots: 10, gapMm: 100 }]))),
  W_TANNIN: () => dye({ fibre: { kind: 'cotton', massG: 200 }, mordant: { agent: 'aluminium-acetate' } }),
  W_FIBRE: () => dye({ tannin: {} }),
  W_HIGH: () => dye({ mordant: { agent: 'alum', percent: 31 } }),
  W_FIBRE_DAMAGE: () => dye({ iron: { percent: 5 } }),
  W_UNUSED: () => plan({ yarns: { ground: { metresPer100g: 180 }, lost: { tex: 400 } } }),
  W_DOWEL: () => plan({ dowel: { diameterMm: 2, lengthMm: 380 } }),
};

describe('every code', () => {
  test('that the engine names anywhere has its words', async () => {
    const core = fileURLToPath(new URL('../../../../src/core/craft/', import.meta.url));
    const files = (await readdir(core, { recursive: true })).filter((name) => name.endsWith('.ts'));
    const sources = await Promise.all(files.map((name) => readFile(`${core}${name}`, 'utf8')));
    const named = new Set(sources.flatMap((source) => [...source.matchAll(/'([EW]_[A-Z_]+)'/gu)].map(([, code = '']) => code)));
    expect([...named].filter((code) => !Object.hasOwn(CODE_WORDS, code))).toEqual([]);
    expect(CODES.filter((code) => !named.has(code))).toEqual([]);
  });

  test.each(CODES)('%s can be brought about, and its message is a sentence without signs of a program', (code) => {
    const found = PROVOKED[code]().filter((problem) => problem.code === code);
    expect(found).not.toEqual([]);
    for (const { message } of found) {
      expect(message).toMatch(/^[“A-Z0-9].*[.?!]$/u);
      expect(message).not.toMatch(/undefined|NaN|null|\[object|\/[a-z]|[A-Z]_[A-Z]/u);
    }
  });

  test.each(CODES)('%s says what it means and what to do, each in whole sentences', (code) => {
    const { title, means, toDo } = CODE_WORDS[code];
    expect(title).not.toMatch(/[.:]$/u);
    for (const words of [means, toDo]) expect(words).toMatch(/^[A-Z].*\.$/u);
  });
});

describe('whatever is sent, there is an answer and never an exception', () => {
  const KEYS = ['craft', 'size', 'widthMm', 'heightMm', 'loom', 'nailPitchMm', 'warping', 'insideHeightMm', 'kind', 'warp', 'yarn', 'tex', 'count', 'text', 'beat', 'picksPerCm', 'yarns', 'ground', 'bands', 'technique', 'shapes', 'way', 'leaveOut', 'strands', 'factor', 'bandsDone', 'rows', 'leftG', 'name', 'piece', '__proto__', 'constructor', 'prototype', 'toString', 'hasOwnProperty'];
  const hostile = fc.oneof(
    fc.constantFrom<unknown>(Number.NaN, Number.POSITIVE_INFINITY, Number.NEGATIVE_INFINITY, 1e308, -1e308, 5e-324, -0, 0, '', '300', 'NaN', null, true, [], {}, undefined, 'constructor', '__proto__'),
    fc.double(), fc.string({ maxLength: 8 }), fc.constantFrom(...KEYS),
  );
  const anything = fc.letrec((tie) => ({
    value: fc.oneof({ depthSize: 'small', withCrossShrink: true }, hostile, fc.array(tie('value'), { maxLength: 4 }), fc.array(fc.tuple(fc.constantFrom(...KEYS), tie('value')), { maxLength: 5 }).map(asJson)),
  })).value;

  /** As `JSON.parse` makes it: `__proto__` is a key like any other. */
  function asJson(entries: readonly (readonly [string, unknown])[]): unknown {
    return Object.fromEntries(entries);
  }

  /** A sound piece in which one place, however deep, holds something else. */
  function spoil(value: unknown, path: readonly number[], put: unknown): unknown {
    const [step, ...rest] = path;
    if (step === undefined || typeof value !== 'object' || value === null) return put;
    const keys = Object.keys(value);
    const key = keys[step % Math.max(1, keys.length)];
    if (key === undefined) return put;
    if (Array.isArray(value)) return value.map((one: unknown, index) => (String(index) === key ? spoil(one, rest, put) : one));
    return { ...value, [key]: spoil(Reflect.get(value, key), rest, put) };
  }
  const SOUND: FrameLoomPiece = pieceOf(
    { technique: 'rya', yarn: 'ground', strands: 3, legEnds: 1, pileMm: 50, trimMm: 5, rows: 1, heightMm: 6 },
    { technique: 'tabby', yarn: 'ground', heightMm: 90, shapes: [{ shape: 'triangle', yarn: 'ground', baseMm: 60, heightMm: 60 }] },
  );
  const spoilt = fc.tuple(fc.array(fc.nat({ max: 9 }), { minLength: 1, maxLength: 5 }), anything).map(([path, put]) => spoil(SOUND, path, put));
  const RUNS = { numRuns: cases(2000), seed: 20261201 };

  function isAnswer(outcome: Outcome<unknown>): boolean {
    if (outcome.ok) return !JSON.stringify(outcome.value, (_key, value: unknown) => (typeof value === 'number' && !Number.isFinite(value) ? 'not finite' : value)).includes('not finite');
    return outcome.problems.length > 0 && outcome.problems.every(({ code }) => Object.hasOwn(CODE_WORDS, code) && code.startsWith('E_'));
  }

  test('of a piece', () => {
    fc.assert(fc.property(fc.oneof(anything, spoilt), (piece) => isAnswer(planPiece(piece))), RUNS);
  });

  test('of a student’s piece', () => {
    fc.assert(fc.property(fc.oneof(fc.constant<unknown>(SOUND), spoilt, anything), anything, (pattern, mine) => isAnswer(fitPiece(pattern as FrameLoomPiece, mine as MyPiece))), RUNS);
    const sound = { loom: { insideWidthMm: 300, nailPitchMm: 8 }, widthMm: 200, yarns: { ground: { tex: 500 } }, way: { kind: 'scaled', factor: 0.8 } };
    fc.assert(fc.property(fc.array(fc.nat({ max: 9 }), { minLength: 1, maxLength: 3 }), anything, (path, put) => isAnswer(fitPiece(SOUND, spoil(sound, path, put) as MyPiece))), RUNS);
  });

  test('of what is woven', () => {
    fc.assert(fc.property(fc.oneof(fc.constant<unknown>(SOUND), spoilt), fc.oneof(anything, fc.record({ bandsDone: fc.oneof(fc.nat({ max: 4 }), hostile), rows: hostile, heightMm: hostile, leftG: anything })), (piece, woven) => isAnswer(planRest(piece, woven))), RUNS);
  });

  test('of several pieces, and of any question', () => {
    fc.assert(fc.property(fc.oneof(anything, fc.array(fc.record({ name: fc.constantFrom<unknown>('A', '', 3), piece: spoilt }), { maxLength: 3 })), (pieces) => isAnswer(mergeShopping(pieces as PieceToShop[]))), RUNS);
    fc.assert(fc.property(fc.oneof(anything, fc.record({ what: fc.constantFrom('yarn', 'take-up', 'soumak', 'rya', 'shape', 'length-text', 'piece'), yarn: anything, piece: spoilt, mm: hostile, ends: hostile })), (question) => isAnswer(reckon(question))), RUNS);
  });

  test('of a yarn role that is called like a part of the program itself', () => {
    for (const role of ['constructor', 'toString', 'hasOwnProperty']) {
      const piece = { ...PLAIN_PIECE, yarns: { [role]: { tex: 400 } }, bands: [{ technique: 'tabby', yarn: role, fill: true }] };
      const outcome = planPiece(piece);
      expect(outcome.ok ? [] : outcome.problems.map(({ code, path }) => `${code} ${path}`)).toEqual([`E_ENUM /yarns/${role}`]);
    }
  });

  test('of ten thousand bands and of JSON a thousand deep', () => {
    const many = { ...PLAIN_PIECE, bands: Array.from({ length: 10_000 }, () => PLAIN_PIECE.bands[0]) };
    let deep: unknown = 1;
    for (let depth = 0; depth < 1000; depth += 1) deep = { bands: [deep] };
    for (const piece of [many, deep, { ...PLAIN_PIECE, size: deep }]) {
      for (const outcome of [planPiece(piece), fitPiece(piece as FrameLoomPiece, {}), planRest(piece, { bandsDone: 0 }), mergeShopping([{ name: 'A', piece }])]) expect(outcome.ok).toBe(false);
    }
  });
});
