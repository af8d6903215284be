/** A frame or board with notches along both edges: one end lies in each. */
import { DEFAULT_ALLOWANCES } from '#core/craft/defaults.ts';
import type { LoomKind, LoomWords } from '#core/craft/looms/loom-kind.ts';

export const notchedFrame: LoomKind = {
  holder: { one: 'notch', many: 'notches' },
  warpings: ['two-nail'],
  otherWarping: 'In notches one end lies in each: the warp steps along from notch to notch, and a zigzag finds no hold.',
  rows: 1,
  leastBareMm: { top: DEFAULT_ALLOWANCES.topMm, bottom: DEFAULT_ALLOWANCES.bottomMm },
};

export const NOTCHED_FRAME_WORDS: LoomWords = {
  label: 'Notches along both edges',
  dressing: 'The warp comes up out of one notch, runs down into the one across, steps along the back to the next, and runs up again.',
  cautions: [
    'The warp lies close to the board. A stick pushed under it at both edges lifts it for the needle.',
    'Sand the notches smooth, or they fray the warp.',
    'Cardboard bends as the warp tightens, and lets it go slack.',
  ],
};
