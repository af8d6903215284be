/**
 * The signs of ISO 3758 in lines of our own, on a field of 40 by 32: tub, triangle, square, iron, circle; crossed out where
 * nothing of the kind may be done. Words always stand beside them.
 */
import type { CareSignName } from '#core/fibre/care.ts';

export interface CareSign {
  /** Drawn as lines. */
  readonly lines: string;
  /** Filled: the dots of an iron. */
  readonly dots?: readonly { readonly x: number; readonly y: number }[];
  readonly letters?: { readonly text: string; readonly x: number; readonly y: number };
}

const TUB = 'M4 8L8 26H32L36 8M4 10q4 4 8 0t8 0t8 0t8 0';
const TRIANGLE = 'M20 4L35 28H5z';
const SQUARE = 'M8 4H32V28H8z';
const IRON = 'M6 24H36L32 8H17M6 24q1-10 12-10h15';
const CIRCLE = 'M20 4a12 12 0 1 0 .01 0z';
const CROSS = 'M5 3L35 29M35 3L5 29';
/** Under a sign: gentle, very gentle. */
const BAR = 'M10 30.5H30';
const TWO_BARS = 'M10 29H30M10 31.5H30';
/** In the upper left corner of the square: out of the sun. */
const SHADE = 'M8 12L16 4M8 8L12 4';

const ironed = (count: number): CareSign => ({ lines: IRON, dots: Array.from({ length: count }, (_, index) => ({ x: 21 + (index - (count - 1) / 2) * 6, y: 19 })) });

export const CARE_SIGNS: Readonly<Record<CareSignName, CareSign>> = {
  'no-wash': { lines: `${TUB}${CROSS}` },
  'hand-wash': { lines: `${TUB}M11 4L19 12Q23 17 27 19M22 12L16 6M22 12q4 1 6 5` },
  'wash-30-very-mild': { lines: `${TUB}${TWO_BARS}`, letters: { text: '30', x: 20, y: 23 } },
  'wash-40': { lines: TUB, letters: { text: '40', x: 20, y: 23 } },
  'no-bleach': { lines: `${TRIANGLE}${CROSS}` },
  'no-tumble': { lines: `${SQUARE}M20 7a9 9 0 1 0 .01 0z${CROSS}` },
  'flat-in-shade': { lines: `${SQUARE}M13 18H27${SHADE}` },
  'line-in-shade': { lines: `${SQUARE}M20 9V23${SHADE}` },
  'no-iron': { lines: `${IRON}${CROSS}` },
  'iron-110': ironed(1),
  'iron-150': ironed(2),
  'iron-200': ironed(3),
  'no-clean': { lines: `${CIRCLE}${CROSS}` },
  'clean-p-mild': { lines: `${CIRCLE}${BAR}`, letters: { text: 'P', x: 20, y: 20 } },
  'clean-p': { lines: CIRCLE, letters: { text: 'P', x: 20, y: 20 } },
};
