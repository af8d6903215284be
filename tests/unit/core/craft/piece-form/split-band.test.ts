import { describe, expect, test } from 'vitest';
import { changeTyped, readAct, actText } from '#core/craft/piece-form/change-typed.ts';
import { judgeTyped } from '#core/craft/piece-form/judge-typed.ts';
import { splitBand } from '#core/craft/piece-form/split-band.ts';
import { typePiece } from '#core/craft/piece-form/type-piece.ts';
import { typeIn } from '#core/craft/piece-form/change-typed.ts';
import type { Band, FrameLoomPiece, Shape } from '#core/craft/piece.ts';
import { pieceOf, pieceWith, planOf } from '../a-piece.ts';

const shape = (bottomMm: number, heightMm: number): Shape => ({ shape: 'rectangle', yarn: 'ground', baseMm: 50, bottomMm, heightMm });
const split = (piece: FrameLoomPiece, band = 0) => {
  const judged = judgeTyped(changeTyped(typePiece(piece, 'cm'), { do: 'split-band', band }));
  return judged.ok ? judged : expect.fail(JSON.stringify(judged.problems));
};
const refused = (piece: FrameLoomPiece, band = 0): string | true => { const done = splitBand(typePiece(piece, 'cm'), band); return done.ok || done.says; };

describe('a band split in two', () => {
  test('of tabby has all its rows, half in each, the name in the first', () => {
    const whole = pieceOf({ technique: 'tabby', name: 'foot', yarn: 'ground', heightMm: 30 });
    const { piece, plan } = split(whole);
    const rows = planOf(whole).bands[0]?.picks ?? 0;
    const [first = 0, second = 0] = plan.bands.map(({ picks }) => picks);
    expect(first + second).toBe(rows);
    expect(Math.abs(first - second)).toBeLessThanOrEqual(1);
    expect(piece.bands.slice(0, 2).map((band) => band.name)).toEqual(['foot', undefined]);
    expect((plan.bands[0]?.heightMm ?? 0) + (plan.bands[1]?.heightMm ?? 0)).toBeCloseTo(30, 6);
  });

  test('that fills goes on filling as the second', () => {
    const { piece, plan } = split(pieceOf(), 0);
    expect(piece.bands.map((band) => 'fill' in band)).toEqual([false, true]);
    expect(Math.abs((plan.bands[0]?.heightMm ?? 0) - 200)).toBeLessThan(2);
  });

  test('is cut where no shape stands, and shapes go with their half', () => {
    const { piece } = split(pieceOf({ technique: 'tabby', yarn: 'ground', heightMm: 100, shapes: [shape(0, 70), shape(80, 15)] }));
    const [first, second] = piece.bands;
    expect(first?.technique === 'tabby' && first.heightMm).toBeGreaterThanOrEqual(70);
    expect(first?.technique === 'tabby' && first.shapes?.map(({ heightMm }) => heightMm)).toEqual([70]);
    const foot = second?.technique === 'tabby' ? second.shapes?.[0]?.bottomMm : undefined;
    expect((first?.technique === 'tabby' ? (first.heightMm ?? 0) : 0) + (foot ?? 0)).toBeCloseTo(80, 4);
  });

  test.each<[string, Band, unknown, unknown]>([
    ['knots', { technique: 'rya', yarn: 'ground', strands: 3, legEnds: 1, pileMm: 80, trimMm: 5, rows: 3, heightMm: 12 }, { rows: 2, heightMm: 8 }, { rows: 1, heightMm: 4 }],
    ['loops', { technique: 'loop-pile', yarn: 'ground', rodMm: 8, rows: 4, heightMm: 20 }, { rows: 2, heightMm: 10 }, { rows: 2, heightMm: 10 }],
    ['roving', { technique: 'roving', yarn: 'ground', over: 2, bulgeMm: 12, heightMm: 40, passes: 2 }, { passes: 1, heightMm: 20 }, { passes: 1, heightMm: 20 }],
    ['twining', { technique: 'twining', yarn: 'ground', rows: 3 }, { rows: 2 }, { rows: 1 }],
  ])('of %s shares its rows', (_, band, first, second) => {
    expect(split(pieceOf(band)).piece.bands.slice(0, 2)).toMatchObject([first, second]);
  });

  test('of soumak loses the tabby between its halves; where no band fills, the piece gets lower by as much', () => {
    const soumak = { technique: 'soumak', yarn: 'ground', over: 4, back: 2, rows: 5, tabbyBetween: 2, tabbyYarn: 'ground' } as const;
    const high = planOf(pieceOf(soumak)).bands[0]?.heightMm ?? 0;
    const { piece, plan } = split(pieceWith({ size: { widthMm: 300, heightMm: high + 20 }, bands: [soumak, { technique: 'tabby', yarn: 'ground', heightMm: 20 }] }));
    expect(piece.bands.slice(0, 2)).toMatchObject([{ rows: 3 }, { rows: 2 }]);
    expect(piece.size.heightMm).toBeCloseTo(plan.bands.reduce((sum, { heightMm }) => sum + heightMm, 0), 1);
    expect(piece.size.heightMm).toBeLessThan(high + 20);
  });

  test('is refused in words where there is nothing to split', () => {
    expect(refused(pieceOf({ technique: 'twining', yarn: 'ground', rows: 1 }))).toBe('It has one row only.');
    expect(refused(pieceOf({ technique: 'hem-stitch', yarn: 'ground', bundleEnds: 2, reachPicks: 2 }))).toBe('A hem-stitch has nothing to split.');
    expect(refused(pieceOf({ technique: 'tabby', yarn: 'ground', heightMm: 60, shapes: [shape(0, 60)] }))).toBe('Its shapes leave no row to split it at.');
    expect(refused(pieceOf(), 7)).toBe('There is no such band.');
    const unwoven = typeIn(typePiece(pieceOf(), 'cm'), 'size.widthMm', 'wide');
    expect(splitBand(unwoven, 0)).toEqual({ ok: false, says: 'A band can be split once the piece can be woven.' });
    expect(changeTyped(unwoven, { do: 'split-band', band: 0 })).toBe(unwoven);
  });
});

test('a band is pulled to any place, and beyond the last to none', () => {
  const form = typePiece(pieceOf({ technique: 'tabby', yarn: 'ground', heightMm: 30 }, { technique: 'twining', yarn: 'ground', rows: 2 }), 'cm');
  const ids = (band: number, to: number) => changeTyped(form, { do: 'move-band', band, to }).bands.map(({ id }) => id);
  expect([ids(0, 2), ids(2, 0), ids(1, 1), ids(0, 3), ids(7, 0)]).toEqual([[2, 3, 1], [3, 1, 2], [1, 2, 3], [1, 2, 3], [1, 2, 3]]);
  const act = { do: 'move-band', band: 2, to: 0 } as const;
  expect([readAct(actText(act)), readAct('move-band:1'), readAct('split-band:3')]).toEqual([act, null, { do: 'split-band', band: 3 }]);
});
