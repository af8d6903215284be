import { useEffect, useState } from 'react';
import { Glyph } from '#islands/ui/Glyph.tsx';

interface LoomSideKeysProps {
  /** Addresses of the steps around this one; null at the ends. */
  back: string | null;
  next: string | null;
}

/** Space and arrows turn the steps, and the screen stays awake while the page is seen. Links do it without script. */
export function LoomSideKeys({ back, next }: LoomSideKeysProps) {
  const awake = useScreenAwake();
  useEffect(() => {
    const onKey = (event: KeyboardEvent): void => {
      if (event.altKey || event.ctrlKey || event.metaKey || event.shiftKey) return;
      const onControl = event.target instanceof Element && event.target.closest('a, button, input, select, textarea, summary') !== null;
      const forward = event.key === 'ArrowRight' || (event.key === ' ' && !onControl);
      const to = forward ? next : event.key === 'ArrowLeft' ? back : null;
      if (to === null) return;
      event.preventDefault();
      window.location.assign(to);
    };
    document.addEventListener('keydown', onKey);
    return () => document.removeEventListener('keydown', onKey);
  }, [back, next]);
  return (
    <span role="status" className="row">
      {awake && <><Glyph name="wake" /><span className="only-desk">Screen stays awake</span></>}
    </span>
  );
}

/** Browsers let go of the lock when the page is hidden; it is asked for again when the page is seen. */
function useScreenAwake(): boolean {
  const [awake, setAwake] = useState(false);
  useEffect(() => {
    let lock: WakeLockSentinel | null = null;
    let over = false;
    const hold = async (): Promise<void> => {
      if (!('wakeLock' in navigator) || document.visibilityState !== 'visible') return;
      try {
        const held = await navigator.wakeLock.request('screen');
        if (over) {
          await held.release();
          return;
        }
        lock = held;
        setAwake(true);
        held.addEventListener('release', () => { setAwake(false); });
      } catch {
        // Refused, for instance on a low battery: everything else works as before.
      }
    };
    const seen = (): void => { void hold(); };
    document.addEventListener('visibilitychange', seen);
    void hold();
    return () => {
      over = true;
      document.removeEventListener('visibilitychange', seen);
      void lock?.release();
    };
  }, []);
  return awake;
}
