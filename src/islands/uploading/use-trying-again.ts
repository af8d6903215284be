import { useEffect, type RefObject } from 'react';

/** Between tries while there is no signal: 4 s, 8 s, 16 s, then every 30 s. */
export const waitMs = (tries: number): number => Math.min(30_000, 2_000 * 2 ** tries);

/** Takes up an upload that was dropped: after a wait that grows with `tries`, or as soon as there is a line again. */
export function useTryingAgain(upload: RefObject<{ again(): void } | null>, tries: number): void {
  useEffect(() => {
    if (tries === 0) return;
    const again = (): void => { upload.current?.again(); };
    const timer = setTimeout(again, waitMs(tries));
    window.addEventListener('online', again);
    return () => {
      clearTimeout(timer);
      window.removeEventListener('online', again);
    };
  }, [upload, tries]);
}
