/** Cords that stand for a knotted piece whose own description is not written yet. */
import type { CordPiece } from '#core/craft/cloth/cloth-piece.ts';

const OAT = '#ddd3bb';

/** Three square-knotted cords side by side, the middle one open in places. */
export function plainCords(title: string): CordPiece {
  return {
    kind: 'cords',
    title,
    thing: 'plant hanger',
    widthMm: 150,
    lengthMm: 760,
    seed: 2,
    cords: [
      { colour: OAT, widthMm: 46, knotted: 0.86 },
      { colour: OAT, widthMm: 46, knotted: 0.7, run: 6 },
      { colour: OAT, widthMm: 46, knotted: 0.9 },
    ],
  };
}
