import { useEffect, useState } from 'react';
import type { KeepPhotos, KeptPhotos } from './kept-photos.ts';

/** What waits of one checkpoint on this device. `onGone` is called when the last of it was sent or refused. */
export function useKept(kept: KeepPhotos, lesson: string, onGone: () => void): KeptPhotos {
  const [state, setState] = useState<KeptPhotos>({ waiting: 0, refused: undefined });
  useEffect(() => {
    let before = 0;
    const look = (): void => {
      const now = kept.current(lesson);
      setState((was) => (was.waiting === now.waiting && was.refused === now.refused ? was : now));
      if (before > 0 && now.waiting === 0 && now.refused === undefined) onGone();
      before = now.waiting;
    };
    look();
    return kept.subscribe(look);
  }, [kept, lesson, onGone]);
  return state;
}
