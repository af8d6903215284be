/** A movement that plays by itself: how far it is, and the hands on it. */
import { useEffect, useState } from 'react';

export interface Movement {
  /** 0 before it begins, 1 when it is done. */
  readonly progress: number;
  readonly playing: boolean;
  readonly play: () => void;
  readonly stop: () => void;
  /** Goes to a place and stays there. */
  readonly goTo: (progress: number) => void;
}

/** @param seconds how long the whole movement takes */
export function useMovement(seconds: number): Movement {
  const [progress, setProgress] = useState(1);
  const [playing, setPlaying] = useState(false);
  useEffect(() => {
    if (!playing) return undefined;
    let before: number | undefined;
    let frame = requestAnimationFrame(function step(now) {
      const passed = before === undefined ? 0 : (now - before) / 1000 / seconds;
      before = now;
      setProgress((at) => Math.min(1, at + passed));
      frame = requestAnimationFrame(step);
    });
    return () => cancelAnimationFrame(frame);
  }, [playing, seconds]);
  useEffect(() => {
    if (progress >= 1) setPlaying(false);
  }, [progress]);
  return {
    progress,
    playing,
    play: () => {
      setProgress((at) => (at >= 1 ? 0 : at));
      setPlaying(true);
    },
    stop: () => setPlaying(false),
    goTo: (to) => {
      setPlaying(false);
      setProgress(to);
    },
  };
}
