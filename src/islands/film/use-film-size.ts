import { useEffect, useRef, useState, type RefObject } from 'react';

const KEPT = 'fellmark-small-films';

export interface FilmSize {
  readonly isSmall: boolean;
  readonly toggle: () => void;
}

/** Which of two sizes of a film is played, as this browser's person chose it last; changing it goes on at the same place. */
export function useFilmSize(element: RefObject<HTMLVideoElement | null>, hasSmall: boolean): FilmSize {
  const [isSmall, setSmall] = useState(false);
  /** Where to go on once the other film is there. */
  const goOn = useRef<{ readonly seconds: number; readonly isPlaying: boolean; readonly rate: number } | null>(null);
  useEffect(() => {
    const film = element.current;
    const place = goOn.current;
    if (film === null || place === null) return;
    goOn.current = null;
    film.addEventListener('loadedmetadata', () => {
      // She may have gone on to a place of hers meanwhile.
      if (place.seconds > 0) film.currentTime = place.seconds;
      film.playbackRate = place.rate;
      // Refused where the browser wants a press on the film itself: it stands at the place all the same.
      if (place.isPlaying) void film.play().catch(() => undefined);
    }, { once: true });
    film.load();
  }, [element, isSmall]);
  // Stands behind the effect that loads: before it, the large film would be loaded for the choice of the small one.
  useEffect(() => { if (hasSmall && isKept()) { goOn.current = { seconds: 0, isPlaying: false, rate: 1 }; setSmall(true); } }, [hasSmall]);
  const toggle = (): void => {
    const film = element.current;
    if (film !== null) goOn.current = { seconds: film.currentTime, isPlaying: !film.paused, rate: film.playbackRate };
    keep(!isSmall);
    setSmall(!isSmall);
  };
  return { isSmall, toggle };
}

/** A browser may refuse to keep anything: then the choice holds for this page. */
function isKept(): boolean {
  try {
    return localStorage.getItem(KEPT) === 'yes';
  } catch {
    return false;
  }
}

function keep(isSmall: boolean): void {
  try {
    if (isSmall) localStorage.setItem(KEPT, 'yes');
    else localStorage.removeItem(KEPT);
  } catch {
    // It holds for this page.
  }
}
