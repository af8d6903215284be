import { useEffect, useState } from 'react';

/** `asked`: not answered yet. `never`: this browser cannot. `refused`: not now, for instance on a low battery. */
export type Awake = 'asked' | 'awake' | 'refused' | 'never';

/** Keeps the screen awake. Browsers let go of the lock when the page is hidden; it is asked for again when the page is seen. */
export function useScreenAwake(): Awake {
  const [awake, setAwake] = useState<Awake>('asked');
  useEffect(() => {
    if (!('wakeLock' in navigator)) {
      setAwake('never');
      return;
    }
    let lock: WakeLockSentinel | null = null;
    let over = false;
    const hold = async (): Promise<void> => {
      if (document.visibilityState !== 'visible' || (lock !== null && !lock.released)) return;
      try {
        const held = await navigator.wakeLock.request('screen');
        if (over) {
          await held.release();
          return;
        }
        lock = held;
        setAwake('awake');
        held.addEventListener('release', () => { if (!over) setAwake('asked'); });
      } catch {
        // Everything else works as before.
        setAwake('refused');
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
