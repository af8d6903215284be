import { useCallback, useEffect, useMemo, useState, useSyncExternalStore } from 'react';
import { outboxOf, personOfPage, type Outbox, type OutboxState } from '#islands/keeping/outbox.ts';
import { putTick, ticksHere, type TicksHere } from './tick-outbox.ts';

export interface TickedLine {
  readonly key: string;
  readonly items: readonly string[];
  readonly ticked: boolean;
}

export interface Ticks {
  readonly isTicked: (line: TickedLine) => boolean;
  readonly isUnsent: (line: TickedLine) => boolean;
  readonly tick: (line: TickedLine, ticked: boolean) => void;
  readonly here: TicksHere;
}

const NOTHING: OutboxState = { isRead: false, entries: [], waits: 'nothing', refused: [] };
const idle = (): (() => void) => () => undefined;

/**
 * The ticks of some lines of a gathering list: alive at once, kept on the device until the house has them.
 * @param asOf revision of the seat's ticks the lines were read with
 */
export function useTicks(series: string, asOf: number): Ticks {
  const [outbox, setOutbox] = useState<Outbox | null>(null);
  // Only in the browser: the server has no device to keep things on.
  useEffect(() => {
    const person = personOfPage();
    if (person !== null) setOutbox(outboxOf(person));
  }, []);
  const state = useSyncExternalStore(outbox?.subscribe ?? idle, outbox?.current ?? (() => NOTHING), () => NOTHING);
  const here = useMemo(() => ticksHere(state, series, asOf), [asOf, series, state]);
  const tick = useCallback((line: TickedLine, ticked: boolean) => {
    if (outbox !== null) putTick(outbox, { subject: 'gather', series, items: [...line.items], ticked }, asOf);
  }, [asOf, outbox, series]);
  return { isTicked: (line) => isTicked(line, here), isUnsent: ({ items }) => items.some((item) => here.unsent.has(`gather ${item}`)), tick, here };
}

/** A thing that several parts ask for is gathered as soon as one of its lines says so. */
function isTicked({ items, ticked }: TickedLine, here: TicksHere): boolean {
  const known = items.flatMap((item) => here.ticked.get(`gather ${item}`) ?? []);
  return known.includes(true) || (known.length < items.length && ticked);
}
