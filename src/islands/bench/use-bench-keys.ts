import { useEffect, useRef } from 'react';
import { benchKeyOf, type BenchKey } from '#islands/bench/bench-keys.ts';
import { singleKeysWork } from '#islands/ui/single-keys.ts';

export interface BenchActs extends Readonly<Record<BenchKey, () => void>> {
  /** A phrase, from 1. */
  readonly phrase: (number: number) => void;
  /** An arrow key, while the photo is closer than whole; null while arrows scroll the page. */
  readonly pan: ((dx: number, dy: number) => void) | null;
}

/** Where typing means typing. */
const WRITING = 'input, textarea, select, [contenteditable]';
const ARROWS: Readonly<Record<string, readonly [number, number]>> = { ArrowLeft: [1, 0], ArrowRight: [-1, 0], ArrowUp: [0, 1], ArrowDown: [0, -1] };

/**
 * Keys of the bench, pressed alone. They work while the focus is at the bench or nowhere, and nothing is being typed;
 * Escape ends typing.
 */
export function useBenchKeys(acts: BenchActs): void {
  const now = useRef(acts);
  useEffect(() => { now.current = acts; });
  useEffect(() => {
    const press = (event: KeyboardEvent) => {
      const { target } = event;
      if (event.defaultPrevented || event.ctrlKey || event.metaKey || event.altKey || !(target instanceof HTMLElement || target instanceof SVGElement)) return;
      if (target.closest('dialog') !== null || (target !== document.body && target.closest('main') === null)) return;
      if (target.closest(WRITING) !== null) {
        if (event.key === 'Escape') target.blur();
        return;
      }
      if (!singleKeysWork()) return;
      if (obey(now.current, event.key)) event.preventDefault();
    };
    document.addEventListener('keydown', press);
    return () => { document.removeEventListener('keydown', press); };
  }, []);
}

/** @returns whether the key means something here. */
function obey(acts: BenchActs, printed: string): boolean {
  const [arrow, key] = [ARROWS[printed], benchKeyOf(printed)];
  if (arrow !== undefined && acts.pan !== null) acts.pan(...arrow);
  else if (/^[1-9]$/.test(printed)) acts.phrase(Number(printed));
  else if (key !== undefined) acts[key]();
  else return false;
  return true;
}
