/** A frame with a row of nails along its upper and its lower rail. */
import { DEFAULT_ALLOWANCES } from '#core/craft/defaults.ts';
import type { LoomKind, LoomWords } from '#core/craft/looms/loom-kind.ts';

export const nailedFrame: LoomKind = {
  holder: { one: 'nail', many: 'nails' },
  warpings: ['zigzag', 'two-nail'],
  rows: 1,
  leastBareMm: { top: DEFAULT_ALLOWANCES.topMm, bottom: DEFAULT_ALLOWANCES.bottomMm },
};

export const NAILED_FRAME_WORDS: LoomWords = {
  label: 'A row of nails above and below',
  dressing: 'The warp is tied to the first nail, runs down and up round the nails, and is tied to the last.',
  cautions: [
    'Pre-bore the holes, or the rail splits along the row of nails.',
    'Ends of a zigzag meet in pairs at every nail. Spacing rows at both edges set them even.',
    'Nails stand out: keep the frame face down or capped when nobody weaves on it.',
  ],
};
