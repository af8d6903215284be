import { useCallback, useEffect, useMemo, useRef, useState, type PointerEvent } from 'react';
import { placeAt, type RowBox } from '#islands/workroom/drag-place.ts';

/** Numbers as the rows stand on the screen, 1 for the uppermost. */
export interface HeldRow {
  readonly from: number;
  /** Where it would stand, let go now. */
  readonly to: number;
}

/** What the handle of a row does; `number` is the row's own on the screen. */
export interface RowGrip {
  readonly down: (event: PointerEvent, number: number) => void;
  readonly move: (event: PointerEvent) => void;
  readonly up: () => void;
  readonly cancel: () => void;
}

/** Pulls one of several rows to another place. `boxesOf` tells where they lie, from the top; Escape lets go of nothing. */
export function useRowDrag(boxesOf: () => readonly RowBox[], onDrop: (from: number, to: number) => void): readonly [HeldRow | null, RowGrip] {
  const [held, setHeld] = useState<HeldRow | null>(null);
  const now = useRef<HeldRow | null>(null);
  const tools = useRef({ boxesOf, onDrop });
  tools.current = { boxesOf, onDrop };
  const hold = useCallback((next: HeldRow | null) => {
    now.current = next;
    setHeld(next);
  }, []);
  const grip = useMemo((): RowGrip => ({
    down: (event, number) => {
      if (event.button !== 0) return;
      event.preventDefault();
      event.currentTarget.setPointerCapture(event.pointerId);
      hold({ from: number, to: number });
    },
    move: (event) => {
      if (now.current === null) return;
      const { from } = now.current;
      const to = placeAt(tools.current.boxesOf(), from, event.clientY);
      if (to !== now.current.to) hold({ from, to });
    },
    up: () => {
      const dropped = now.current;
      hold(null);
      if (dropped !== null && dropped.to !== dropped.from) tools.current.onDrop(dropped.from, dropped.to);
    },
    cancel: () => { hold(null); },
  }), [hold]);
  const isHeld = held !== null;
  useEffect(() => {
    if (!isHeld) return;
    const onKey = (event: KeyboardEvent) => { if (event.key === 'Escape') hold(null); };
    document.addEventListener('keydown', onKey);
    return () => { document.removeEventListener('keydown', onKey); };
  }, [isHeld, hold]);
  return [held, grip];
}
