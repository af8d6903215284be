import { describe, expect, test } from 'vitest';
import { hangingBox, loomBox, placeOfBand } from '#core/craft/cloth/cloth-box.ts';
import { clothPieceOf } from '#core/craft/cloth/cloth-piece-of.ts';
import { layerCloth } from '#core/craft/cloth/draw-cloth.ts';
import { pieceOf, planOf } from '../a-piece.ts';

const pattern = pieceOf({ technique: 'tabby', yarn: 'ground', heightMm: 40 }, { technique: 'twining', yarn: 'ground', rows: 4 });
const cloth = clothPieceOf(pattern, planOf(pattern), 'Plain');

/** Where the drawing itself puts the band at the head of the cloth. */
function drawnAt(as: 'hanging' | 'loom', width: number): { left: number; top: number } {
  const band = layerCloth(cloth, { id: 'c', as, width }).layers.find(({ of }) => of === cloth.bands.length - 1);
  return { left: band?.x ?? 0, top: band?.y ?? 0 };
}

describe('where the cloth lies in its picture', () => {
  test.each([390, 240, 120])('as it hangs, %i px wide', (width) => {
    const box = hangingBox(cloth, width);
    const drawn = drawnAt('hanging', width);
    expect([box.left, box.top]).toEqual([expect.closeTo(drawn.left, 6), expect.closeTo(drawn.top, 6)]);
  });

  test.each([390, 240])('on the loom, %i px wide', (width) => {
    const box = loomBox(cloth, width);
    const drawn = drawnAt('loom', width);
    expect([box.left, box.top]).toEqual([expect.closeTo(drawn.left, 6), expect.closeTo(drawn.top, 6)]);
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
