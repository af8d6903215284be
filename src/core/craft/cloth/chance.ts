/** Repeatable chance: the same seed always gives the same run of numbers, on every machine. */

/**
 * A source of numbers from 0 up to (not including) 1, by a linear congruence of 32 bits.
 * Good enough to keep a band from looking printed; not for anything that must be unguessable.
 */
export function chanceFrom(seed: number): () => number {
  let state = Math.trunc(seed) >>> 0 || 1;
  return () => {
    state = (Math.imul(state, 1664525) + 1013904223) >>> 0;
    return state / 4294967296;
  };
}

/** A seed for one of many things that are varied each by itself: of the whole's own seed and the thing's name (FNV-1a). */
export function seedFrom(seed: number, name: string): number {
  let sum = (Math.trunc(seed) >>> 0) ^ 0x811c9dc5;
  for (let at = 0; at < name.length; at++) sum = Math.imul(sum ^ name.charCodeAt(at), 0x01000193);
  return sum >>> 0;
}
