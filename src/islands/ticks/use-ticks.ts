import { useCallback, useEffect, useState, useSyncExternalStore } from 'react';
import { tickQueue } from './browser-queue.ts';
import type { QueueState, TickQueue } from './tick-queue.ts';

export interface TickedLine {
  readonly key: string;
  readonly items: readonly string[];
  readonly ticked: boolean;
}

export interface Ticks {
  readonly isTicked: (key: string) => boolean;
  readonly isUnsent: (key: string) => boolean;
  readonly tick: (line: TickedLine, ticked: boolean) => void;
  readonly queue: QueueState;
}

const NOTHING: QueueState = { unsent: new Set(), waits: 'nothing', refused: new Set() };
const idle = (): (() => void) => () => undefined;

/** The ticks of some lines of a gathering list: alive at once, kept on the device until the server has them. */
export function useTicks(seat: string, series: string, lines: readonly TickedLine[]): Ticks {
  const [queue, setQueue] = useState<TickQueue | null>(null);
  const [changed, setChanged] = useState<ReadonlyMap<string, boolean>>(new Map());
  // Only in the browser: the server has no device to keep things on.
  useEffect(() => {
    const mine = tickQueue(seat);
    setQueue(mine);
    setChanged(mine.kept());
    void mine.flush();
  }, [seat]);
  const state = useSyncExternalStore(queue?.subscribe ?? idle, queue?.current ?? (() => NOTHING), () => NOTHING);
  const tick = useCallback((line: TickedLine, ticked: boolean) => {
    setChanged((before) => new Map(before).set(line.key, ticked));
    queue?.put({ id: line.key, body: { subject: 'gather', series, items: line.items, ticked, changedAt: new Date().toISOString() } });
  }, [queue, series]);
  const drawn = new Map(lines.map((line) => [line.key, line.ticked]));
  const isTicked = (key: string): boolean => (state.refused.has(key) ? drawn.get(key) : (changed.get(key) ?? drawn.get(key))) ?? false;
  return { isTicked, isUnsent: (key) => state.unsent.has(key), tick, queue: state };
}
