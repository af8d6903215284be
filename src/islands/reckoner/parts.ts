/** The parts of the reckoner's page, in their order. */
import type { ReckonerField } from '#core/reckoner/reckoner-form.ts';

export type PartName = 'yarn' | 'sett' | 'cloth' | 'soumak' | 'rya' | 'shape' | 'rod' | 'piece';

export interface PartWords {
  readonly name: PartName;
  readonly title: string;
  /** What it is for, and what of the others it takes. */
  readonly says: string;
  /** What is told of it on paper. */
  readonly fields: readonly ReckonerField[];
  /** What is asked in it besides. */
  readonly besides?: readonly ReckonerField[];
}

export const PARTS: readonly PartWords[] = [
  {
    name: 'yarn', title: 'One yarn', says: 'Every way its thickness is told, and how thick it lies.',
    fields: ['yarn-by', 'yarn', 'ball-length', 'ball-weight', 'wraps', 'strands', 'hand'],
  },
  {
    name: 'sett', title: 'Ends and spacing', says: 'From a width and a loom to warp ends, and whether that yarn suits them.',
    fields: ['width', 'nails', 'every', 'together', 'parity', 'warp-tex', 'draw-in'],
    besides: ['loom-kind', 'nail-rows', 'warping'],
  },
  { name: 'cloth', title: 'How much yarn', says: 'Plain cloth of that yarn on those ends.', fields: ['height', 'swatch'], besides: ['beat', 'weave'] },
  { name: 'soumak', title: 'Soumak', says: 'Ridges of that yarn: over some ends, back under fewer.', fields: ['over', 'back', 'soumak-rows', 'between'] },
  { name: 'rya', title: 'Rya', says: 'Knots of that yarn: what to cut, and the card to cut it on.', fields: ['pile', 'trim', 'knot-strands', 'leg-ends', 'rya-rows', 'edge-ends', 'card'] },
  { name: 'shape', title: 'Shapes', says: 'In whole ends and rows of that cloth.', fields: ['shape', 'base', 'shape-height', 'radius'], besides: ['sides', 'step-ends', 'step-rows'] },
  { name: 'rod', title: 'Rod and cord', says: 'What holds a hanging up.', fields: ['rod-load', 'rod-length', 'rise'] },
  { name: 'piece', title: 'A whole hanging', says: 'All of the above in one. Amounts are those to have in hand, with a reserve.', fields: ['frame-height', 'frame-width', 'dowel'], besides: ['fringe'] },
];
