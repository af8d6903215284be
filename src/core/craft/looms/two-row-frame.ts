/** A frame with two rows of nails along each rail, set half a pitch aside: for two spacings. */
import { DEFAULT_ALLOWANCES } from '#core/craft/defaults.ts';
import type { LoomKind, LoomWords } from '#core/craft/looms/loom-kind.ts';

export const twoRowFrame: LoomKind = {
  holder: { one: 'nail', many: 'nails' },
  warpings: ['zigzag', 'two-nail'],
  rows: 2,
  leastBareMm: { top: DEFAULT_ALLOWANCES.topMm, bottom: DEFAULT_ALLOWANCES.bottomMm },
};

export const TWO_ROW_FRAME_WORDS: LoomWords = {
  label: 'Two rows of nails above and below',
  dressing: 'The warp goes round inner and outer nails by turns, or round the inner ones alone for ends twice as far apart.',
  cautions: [
    'Measure the pitch along one row. Both rows together stand half of it apart.',
    'Ends round outer nails are longer than their neighbours: wind them as tightly, or they hang loose.',
    'Stagger the rows, so that no two nails sit in one line of the grain, and pre-bore the holes.',
  ],
};
