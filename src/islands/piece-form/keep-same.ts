/** Plain data that says the same is kept as the same object, so that what shows it is not drawn anew. */
import { useRef } from 'react';

/** Whether two values of plain data (no circles, no classes but Map) say the same. */
export function saysSame(a: unknown, b: unknown): boolean {
  if (Object.is(a, b)) return true;
  if (typeof a !== 'object' || typeof b !== 'object' || a === null || b === null) return false;
  if (a instanceof Map && b instanceof Map) return a.size === b.size && [...a].every(([key, value]) => b.has(key) && saysSame(value, b.get(key)));
  const keys = Object.keys(a);
  return keys.length === Object.keys(b).length && keys.every((key) => saysSame(Reflect.get(a, key), Reflect.get(b, key)));
}

/** `next`, or what was kept before where that says the same. */
export function useSame<T>(next: T): T {
  const kept = useRef(next);
  if (!saysSame(kept.current, next)) kept.current = next;
  return kept.current;
}

/** The same for each entry by itself. */
export function useSameEntries<K, V>(next: ReadonlyMap<K, V>): ReadonlyMap<K, V> {
  const kept = useRef(next);
  const before = kept.current;
  if (before === next) return next;
  const together = new Map([...next].map(([key, value]) => { const old = before.get(key); return [key, old !== undefined && saysSame(old, value) ? old : value] as const; }));
  kept.current = together;
  return together;
}
