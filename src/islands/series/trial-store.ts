/** What is being tried on this page, shared by its islands: one changes it, the list to gather follows. */
import { useSyncExternalStore } from 'react';
import type { Units } from '#core/units/units.ts';
import type { MadeOnLoom } from '#islands/series/trial.ts';

export interface Tried {
  readonly made: MadeOnLoom;
  readonly units: Units;
  /** Reckoned for a loom that was typed, not for the pattern's own. */
  readonly own: boolean;
}

let tried: Tried | null = null;
const listeners = new Set<() => void>();

/** Null: nothing that fits is being tried. */
export function setTried(next: Tried | null): void {
  tried = next;
  for (const listener of listeners) listener();
}

function subscribe(listener: () => void): () => void {
  listeners.add(listener);
  return () => { listeners.delete(listener); };
}

/** What fits and is being tried in this browser; null until something is, and on the server. */
export function useTried(): Tried | null {
  return useSyncExternalStore(subscribe, () => tried, () => null);
}
