import { useEffect, type RefObject } from 'react';
import { waitMs } from './upload-state.ts';

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
