/** What the reckoner's fields are called. */
import type { ReckonerField } from '#core/reckoner/reckoner-form.ts';

export const FIELD_LABELS: Readonly<Record<ReckonerField, string>> = {
  units: 'Units',

  'yarn-by': 'How thick it is, in',
  yarn: 'The number on the label',
  'ball-length': 'A ball has',
  'ball-weight': 'and weighs',
  wraps: 'Wraps in an inch',
  strands: 'Strands together',
  hand: 'In the hand it is',

  'loom-kind': 'Your loom has',
  'nail-rows': 'The warp goes round',
  width: 'Finished width',
  nails: 'From nail to nail',
  every: 'Warp round every … nail',
  warping: 'The warp goes',
  together: 'Ends worked',
  parity: 'Number of ends',
  'warp-tex': 'Warp yarn',
  'draw-in': 'Draws in by',

  height: 'Woven height',
  weave: 'What bends',
  beat: 'How rows are beaten',
  swatch: 'Rows counted',

  over: 'Over',
  back: 'Back under',
  'soumak-rows': 'Rows of soumak',
  between: 'Tabby between',

  'leg-ends': 'Ends in each leg',
  'knot-strands': 'Strands in a knot',
  pile: 'Pile hangs',
  trim: 'To trim away',
  'rya-rows': 'Rows of knots',
  'edge-ends': 'Plain at each edge',
  card: 'Card, thick',

  shape: 'Shape',
  base: 'Base',
  'shape-height': 'Height',
  radius: 'Radius',
  sides: 'Both sides step',
  'step-ends': 'A step of',
  'step-rows': 'every',

  'rod-load': 'The hanging weighs',
  'rod-length': 'The rod is long',
  rise: 'The cord rises',

  'frame-height': 'Frame, nail to nail',
  'frame-width': 'Inside width',
  fringe: 'At its foot',
  dowel: 'Rod, thick',
};
