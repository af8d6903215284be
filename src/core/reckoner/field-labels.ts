/** What the reckoner's fields are called. */
import type { ReckonerField } from '#core/reckoner/reckoner-form.ts';

export const FIELD_LABELS: Readonly<Record<ReckonerField, string>> = {
  units: 'Units',
  'yarn-by': 'How thick it is, in',
  yarn: 'The number on the label',
  'ball-metres': 'A ball has',
  'ball-grams': 'and weighs',
  wraps: 'Wraps in an inch',
  strands: 'Strands together',
  hand: 'In the hand it is',
  width: 'Finished width',
  nails: 'From nail to nail',
  warping: 'The warp goes',
  together: 'Ends worked',
  parity: 'Number of ends',
  'warp-tex': 'Warp yarn',
  'draw-in': 'Draws in by',
  height: 'Woven height',
  'frame-height': 'Frame, nail to nail',
  'frame-width': 'Inside width',
  beat: 'How rows are beaten',
  swatch: 'Rows counted',
  fringe: 'At its foot',
  pile: 'Fringe hangs',
  'fringe-strands': 'Strands in a knot',
  dowel: 'Dowel',
};
