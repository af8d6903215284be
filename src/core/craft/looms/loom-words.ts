/** What is said of each kind of loom: who only plans a piece loads none of it. */
import type { LoomWords } from '#core/craft/looms/loom-kind.ts';
import { NAILED_FRAME_WORDS } from '#core/craft/looms/nailed-frame.ts';
import { NOTCHED_FRAME_WORDS } from '#core/craft/looms/notched-frame.ts';
import { TWO_ROW_FRAME_WORDS } from '#core/craft/looms/two-row-frame.ts';
import type { LoomKindName } from '#core/craft/piece.ts';

export const LOOM_WORDS: Readonly<Record<LoomKindName, LoomWords>> = {
  'nailed-frame': NAILED_FRAME_WORDS,
  'notched-frame': NOTCHED_FRAME_WORDS,
  'two-row-frame': TWO_ROW_FRAME_WORDS,
};
