import { describe, expect, it } from 'vitest';
import { wovenHeightMm } from '#core/craft/cloth/cloth-piece.ts';
import { drawCloth } from '#core/craft/cloth/draw-cloth.ts';
import { partsStripOf, spreadOverParts } from '#core/craft/cloth/parts-strip.ts';
import { SOUMAK, wovenPiece } from './pieces.ts';

describe('the strip beside a list of parts', () => {
  it('gives every part a stretch of the same height', () => {
    const strip = partsStripOf(wovenPiece(), [{ bands: [] }, { bands: ['shore', 'dunes'] }, { bands: ['sky'] }]);
    expect(wovenHeightMm(strip)).toBe(180);
    expect(strip.bands[0]).toMatchObject({ technique: 'heading', heightMm: 60 });
    expect((strip.bands[1]?.heightMm ?? 0) + (strip.bands[2]?.heightMm ?? 0)).toBe(60);
  });

  it('shows a part that names no band of the piece as work that is not yet cloth', () => {
    expect(partsStripOf(wovenPiece(), [{ bands: ['nowhere'] }]).bands[0]?.technique).toBe('heading');
  });

  it('spreads the bands over the parts when nobody said which part weaves which', () => {
    const parts = spreadOverParts(wovenPiece(), 7);
    expect(parts).toHaveLength(7);
    expect([parts[0], parts[1], parts[6]]).toEqual([{ bands: [] }, { bands: [] }, { bands: [] }]);
    expect(parts.flatMap((part) => part.bands)).toEqual([1, 2, 3, 4, 5, 6, 7, 8]);
  });

  it.each([[1, 0, 0], [2, 0, 0], [3, 1, 0], [4, 1, 1], [5, 2, 1]])('of %i parts leaves %i to begin with and %i to finish', (count, before, after) => {
    const parts = spreadOverParts(wovenPiece(), count);
    expect(parts).toHaveLength(count);
    expect(parts.flatMap(({ bands }, index) => (bands.length === 0 ? [index] : []))).toEqual([...Array(before).keys(), ...Array.from({ length: after }, () => count - 1)]);
  });

  it('takes a band by its place where it has no name', () => {
    expect(partsStripOf(wovenPiece(), [{ bands: [5] }]).bands[0]).toMatchObject({ technique: 'roving', heightMm: 60 });
  });

  it('shows a part with pile as pile, and soumak in as many rows as there is room for', () => {
    expect(partsStripOf(wovenPiece(), [{ bands: ['fringe', 'shore'] }]).bands).toMatchObject([{ technique: 'rya', heightMm: 60, rows: 4, pileMm: 30 }]);
    const rowsOf = (rows: number): unknown => partsStripOf(wovenPiece({ bands: [{ ...SOUMAK, rows }] }), [{ bands: ['ridge'] }]).bands[0];
    expect([rowsOf(1), rowsOf(5), rowsOf(90)]).toMatchObject([{ rows: 2 }, { rows: 5 }, { rows: 10 }]);
  });

  it('draws shapes broader than true, about their own middle', () => {
    const [dunes] = partsStripOf(wovenPiece(), [{ bands: ['dunes'] }]).bands;
    if (dunes?.technique !== 'tabby') throw new Error('the dunes are tabby');
    const [first] = dunes.shapes[0]?.spans ?? [];
    expect(((first?.from ?? 0) + (first?.to ?? 0)) / 2).toBeCloseTo((20 * 10) / 66, 9);
    expect((first?.to ?? 0) - (first?.from ?? 0)).toBeCloseTo((1.4 * 40 * 10) / 66, 9);
  });

  it('is drawn without a broken number', () => {
    expect(drawCloth(partsStripOf(wovenPiece(), spreadOverParts(wovenPiece(), 7)), { id: 'a', as: 'strip', width: 36, height: 420 })).not.toMatch(/NaN|Infinity|undefined/);
  });
});
