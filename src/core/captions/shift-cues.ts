/** Moving captions in time. */
import type { Cue } from '#core/captions/cues.ts';

/** All cues later by `byMs` (earlier when negative). None begins before 0: what would be cut off there keeps half a second. */
export function shiftCues(cues: readonly Cue[], byMs: number): Cue[] {
  return cues.map(({ fromMs, toMs, words }) => {
    const from = Math.max(0, fromMs + byMs);
    return { fromMs: from, toMs: Math.max(from + 500, toMs + byMs), words };
  });
}

/** In the order in which they are said. */
export function inOrder(cues: readonly Cue[]): Cue[] {
  return [...cues].sort((a, b) => a.fromMs - b.fromMs || a.toMs - b.toMs);
}
