import { useEffect, useRef, type RefObject } from 'react';

interface BenchKeys {
  choose: (verdict: 'weave-on' | 'mend-first') => void;
  put: () => void;
  before: string | null;
  after: string | null;
}

/** Where typing means typing. */
const WRITING = 'input, textarea, select, [contenteditable]';

/**
 * Single keys of the bench. They work while nothing is being typed, and only on this page: W and M choose the verdict,
 * P puts a pin, J and K go to the next photo and back.
 */
export function useBenchKeys(area: RefObject<HTMLElement | null>, keys: BenchKeys): void {
  const now = useRef(keys);
  useEffect(() => { now.current = keys; });
  useEffect(() => {
    const press = (event: KeyboardEvent) => {
      if (event.ctrlKey || event.metaKey || event.altKey || (event.target instanceof Element && event.target.closest(WRITING) !== null)) return;
      if (document.documentElement.dataset.singleKeys === 'off') return;
      const { choose, put, before, after } = now.current;
      const acts: Record<string, () => void> = {
        w: () => choose('weave-on'),
        m: () => choose('mend-first'),
        p: put,
        j: () => { if (after !== null) location.assign(after); },
        k: () => { if (before !== null) location.assign(before); },
      };
      const act = acts[event.key.toLowerCase()];
      if (act === undefined || area.current === null) return;
      event.preventDefault();
      act();
    };
    document.addEventListener('keydown', press);
    return () => { document.removeEventListener('keydown', press); };
  }, [area]);
}
