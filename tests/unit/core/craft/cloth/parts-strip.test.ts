import { describe, expect, it } from 'vitest';
import { wovenHeightMm } from '#core/craft/cloth/cloth-piece.ts';
import { partsStripOf, spreadOverParts } from '#core/craft/cloth/parts-strip.ts';
import { wovenPiece } from './pieces.ts';

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
});
