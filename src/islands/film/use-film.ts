import { useCallback, useEffect, useState, type RefObject } from 'react';

export interface Film {
  readonly isPlaying: boolean;
  readonly atMs: number;
  /** How far it was ever played, before or now. */
  readonly furthestMs: number;
  readonly hasCaptions: boolean;
  readonly rate: number;
  readonly play: () => void;
  readonly pause: () => void;
  readonly jump: (ms: number) => void;
  readonly showCaptions: (shown: boolean) => void;
  readonly setRate: (rate: number) => void;
}

/** What a film element does, as state; and what can be asked of it. */
export function useFilm(element: RefObject<HTMLVideoElement | null>, seenMs: number): Film {
  const [isPlaying, setPlaying] = useState(false);
  const [atMs, setAtMs] = useState(0);
  const [furthestMs, setFurthestMs] = useState(seenMs);
  const [hasCaptions, setCaptions] = useState(true);
  const [rate, setRateNow] = useState(1);

  useEffect(() => {
    const film = element.current;
    if (film === null) return;
    const onTime = (): void => {
      const ms = Math.round(film.currentTime * 1_000);
      setAtMs(ms);
      // Only what plays is seen: jumping ahead weaves nothing.
      if (!film.seeking && !film.paused) setFurthestMs((before) => Math.max(before, ms));
    };
    const onPlay = (): void => setPlaying(true);
    const onPause = (): void => { setPlaying(false); onTime(); };
    const events = [['timeupdate', onTime], ['seeked', onTime], ['play', onPlay], ['pause', onPause], ['ended', onPause]] as const;
    for (const [name, told] of events) film.addEventListener(name, told);
    return () => { for (const [name, told] of events) film.removeEventListener(name, told); };
  }, [element]);

  // Refused where the browser wants a press on the film itself: it stands at the place all the same.
  const play = useCallback(() => { void element.current?.play().catch(() => undefined); }, [element]);
  const pause = useCallback(() => { element.current?.pause(); }, [element]);
  const jump = useCallback((ms: number) => {
    if (element.current === null) return;
    element.current.currentTime = ms / 1_000;
    setAtMs(ms);
  }, [element]);
  const showCaptions = useCallback((shown: boolean) => {
    const [track] = element.current?.textTracks ?? [];
    if (track !== undefined) track.mode = shown ? 'showing' : 'hidden';
    setCaptions(shown);
  }, [element]);
  const setRate = useCallback((next: number) => {
    if (element.current !== null) element.current.playbackRate = next;
    setRateNow(next);
  }, [element]);
  return { isPlaying, atMs, furthestMs, hasCaptions, rate, play, pause, jump, showCaptions, setRate };
}
