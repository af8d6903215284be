import { useEffect, useRef } from 'react';

/** Asks before the page is left while something is not saved. The answer is to be called when the form is sent. */
export function useUnsavedGuard(isChanged: boolean): () => void {
  const isSent = useRef(false);
  useEffect(() => {
    if (!isChanged) return;
    const ask = (event: BeforeUnloadEvent) => { if (!isSent.current) event.preventDefault(); };
    window.addEventListener('beforeunload', ask);
    return () => { window.removeEventListener('beforeunload', ask); };
  }, [isChanged]);
  return () => { isSent.current = true; };
}
