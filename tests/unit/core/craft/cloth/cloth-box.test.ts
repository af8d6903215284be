import { describe, expect, test } from 'vitest';
import { hangingBox, loomBox, placeOfBand } from '#core/craft/cloth/cloth-box.ts';
import { clothPieceOf } from '#core/craft/cloth/cloth-piece-of.ts';
import { drawCloth } from '#core/craft/cloth/draw-cloth.ts';
import { pieceOf, planOf } from '../a-piece.ts';

const pattern = pieceOf({ technique: 'tabby', yarn: 'ground', heightMm: 40 }, { technique: 'twining', yarn: 'ground', rows: 4 });
const cloth = clothPieceOf(pattern, planOf(pattern), 'Plain');

/** Where the drawing itself puts its bands: the shift of the last group that is shifted from the head of the picture. */
function drawnAt(as: 'hanging' | 'loom', width: number): { left: number; top: number } {
  const markup = drawCloth(cloth, { id: 'c', as, width, decorative: true });
  const shifts = [...markup.matchAll(/<g transform="translate\(([\d.]+) ([\d.]+)\)">/g)].map(([, x, y]) => ({ left: Number(x), top: Number(y) }));
  const left = shifts[0]?.left ?? 0;
  // Bands are shifted within their cloth, by nothing across; the cloth is across by the inset, or lies in a group that is.
  const clothShift = as === 'hanging' ? shifts.filter((shift) => shift.left === left && shift.top > 0).at(-1) : shifts.find((shift) => shift.left === 0 && shift.top > 0);
  return { left, top: clothShift?.top ?? 0 };
}

describe('where the cloth lies in its picture', () => {
  test.each([390, 240, 120])('as it hangs, %i px wide', (width) => {
    const box = hangingBox(cloth, width);
    const drawn = drawnAt('hanging', width);
    expect([box.left, box.top]).toEqual([expect.closeTo(drawn.left, 0), expect.closeTo(drawn.top, 0)]);
  });

  test.each([390, 240])('on the loom, %i px wide', (width) => {
    const box = loomBox(cloth, width);
    const drawn = drawnAt('loom', width);
    expect([box.left, box.top]).toEqual([expect.closeTo(drawn.left, 0), expect.closeTo(drawn.top, 0)]);
  });

  test('bands lie on each other, the first one at the foot, or at the head of a turned piece', () => {
    const box = hangingBox(cloth, 390);
    const places = [0, 1, 2].map((index) => placeOfBand(cloth, index, box));
    expect(places[0]).toEqual({ top: expect.closeTo(box.height - 40 * box.pxPerMm, 6), height: expect.closeTo(40 * box.pxPerMm, 6) });
    expect(places[2]?.top).toBeCloseTo(0, 6);
    expect(placeOfBand(cloth, 0, hangingBox({ ...cloth, turned: true }, 390))?.top).toBe(0);
    expect([placeOfBand(cloth, 3, box), placeOfBand(cloth, -1, box)]).toEqual([undefined, undefined]);
  });
});
