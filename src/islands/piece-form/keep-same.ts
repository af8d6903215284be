/** Plain data that says the same is kept as the same object, so that what shows it is not drawn anew. */
import { dequal } from 'dequal';
import { useRef } from 'react';

/** `next`, or what was kept before where that says the same. */
export function useSame<T>(next: T): T {
  const kept = useRef(next);
  if (!dequal(kept.current, next)) kept.current = next;
  return kept.current;
}

/** The same for each entry by itself. */
export function useSameEntries<K, V>(next: ReadonlyMap<K, V>): ReadonlyMap<K, V> {
  const kept = useRef(next);
  const before = kept.current;
  if (before === next) return next;
  const together = new Map([...next].map(([key, value]) => { const old = before.get(key); return [key, old !== undefined && dequal(old, value) ? old : value] as const; }));
  kept.current = together;
  return together;
}
