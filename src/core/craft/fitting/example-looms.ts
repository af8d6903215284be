/** Looms and habits that students often have and teachers often have not, to look at a lesson with. */
import type { MyPiece } from '#core/craft/fitting/my-piece.ts';
import type { Piece } from '#core/craft/crafts.ts';
import type { Units } from '#core/units/units.ts';

export interface ExampleLoom {
  readonly name: string;
  readonly label: string;
  readonly mine: MyPiece;
  readonly units: Units;
}

const SMALL_INSIDE_MM = 300;
const SMALL_WIDTH_MM = 200;
const WIDE_PITCH_MM = 10;

/** Those that make sense for a piece; common sizes, no source. The last measures in the other units. */
export function exampleLooms(pattern: Piece | null, units: Units): ExampleLoom[] {
  const [inside, pitch] = units === 'in' ? ['about 12 in', 'about 3/8 in'] : ['30 cm', '10 mm'];
  const other: Units = units === 'in' ? 'cm' : 'in';
  const looms: ExampleLoom[] = pattern?.craft !== 'frame-loom' ? [] : [
    { name: 'loom-small', label: `A small loom, ${inside} inside`, mine: { loom: { insideWidthMm: SMALL_INSIDE_MM }, widthMm: SMALL_WIDTH_MM }, units },
    { name: 'loom-wide-nails', label: `A loom with nails ${pitch} apart`, mine: { loom: { nailPitchMm: WIDE_PITCH_MM } }, units },
  ];
  return [...looms, { name: 'other-units', label: other === 'in' ? 'Your pattern piece, in inches' : 'Your pattern piece, in centimetres', mine: {}, units: other }];
}
