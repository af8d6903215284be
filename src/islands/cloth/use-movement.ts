/** A movement and the hands on it: it runs to a place and stops there, or is led by hand. */
import { useEffect, useState } from 'react';

export interface Movement {
  /** 0 before it begins, 1 when it is done. */
  readonly progress: number;
  readonly playing: boolean;
  /** Runs from `from` (where it is, when missing) to `to`, 1 at the most. */
  readonly play: (to: number, from?: number) => void;
  readonly stop: () => void;
  /** Goes to a place and stays there. */
  readonly goTo: (progress: number) => void;
}

/** @param seconds how long the whole movement takes */
export function useMovement(seconds: number): Movement {
  const [progress, setProgress] = useState(1);
  /** Where it runs to; none while it stands. */
  const [to, setTo] = useState<number | null>(null);
  useEffect(() => {
    if (to === null) return undefined;
    let before: number | undefined;
    let frame = requestAnimationFrame(function step(now) {
      const passed = before === undefined ? 0 : (now - before) / 1000 / seconds;
      before = now;
      setProgress((at) => Math.min(to, at + passed));
      frame = requestAnimationFrame(step);
    });
    return () => cancelAnimationFrame(frame);
  }, [to, seconds]);
  useEffect(() => {
    if (to !== null && progress >= to) setTo(null);
  }, [progress, to]);
  return {
    progress,
    playing: to !== null,
    play: (until, from) => {
      if (from !== undefined) setProgress(from);
      setTo(Math.min(1, until));
    },
    stop: () => setTo(null),
    goTo: (place) => {
      setTo(null);
      setProgress(place);
    },
  };
}
