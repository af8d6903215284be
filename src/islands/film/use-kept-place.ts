import { useEffect, useRef } from 'react';
import type { KeepPlaceInput } from '#contracts/video.ts';
import type { Film } from './use-film.ts';

export type SendPlace = (input: KeepPlaceInput) => void;

/** While it plays, the place is told this often; and when it is paused or the page is left. */
const TELL_EVERY_MS = 15_000;
/** Less than this is no news. */
const LEAST_MS = 2_000;

export const sendPlace: SendPlace = (input) => {
  void fetch('/api/video-place', { method: 'POST', keepalive: true, headers: { 'content-type': 'application/json' }, body: JSON.stringify(input) }).catch(() => undefined);
};

/** Keeps where a student is in a film, for her other devices. Without a seat there is nobody to keep it for. */
export function useKeptPlace(film: Pick<Film, 'atMs' | 'isPlaying'>, keep: Omit<KeepPlaceInput, 'placeMs'> | null, send: SendPlace): void {
  const now = useRef(film.atMs);
  now.current = film.atMs;
  const told = useRef(0);
  const { isPlaying } = film;
  const wasPlaying = useRef(false);
  useEffect(() => {
    if (keep === null) return;
    const tell = (): void => {
      if (Math.abs(now.current - told.current) < LEAST_MS) return;
      told.current = now.current;
      send({ ...keep, placeMs: now.current });
    };
    const onHide = (): void => { if (document.visibilityState === 'hidden') tell(); };
    document.addEventListener('visibilitychange', onHide);
    if (wasPlaying.current && !isPlaying) tell();
    wasPlaying.current = isPlaying;
    const timer = isPlaying ? setInterval(tell, TELL_EVERY_MS) : undefined;
    return () => {
      document.removeEventListener('visibilitychange', onHide);
      clearInterval(timer);
    };
  }, [isPlaying, keep, send]);
}
