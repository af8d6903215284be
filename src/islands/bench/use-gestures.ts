import { useEffect, useRef, type PointerEvent, type RefObject } from 'react';
import type { Place } from '#islands/bench/view.ts';

interface Hands {
  /** Pressed and let go at one place. */
  press: (at: Place, by: 'mouse' | 'touch') => void;
  /** Dragged by shares of the frame. */
  drag: (dx: number, dy: number) => void;
  /** Two fingers, or the wheel: closer by `factor` about `at`. */
  pinch: (factor: number, at: Place) => void;
  /** Whether the wheel goes closer by itself; otherwise it scrolls the page, unless Ctrl is held. */
  isClose: boolean;
}

/** A hand that trembles less than this still presses. */
const STILL_PX = 6;

/** Press, drag, pinch and wheel on a frame, told in shares of it from its middle. */
export function useGestures(frame: RefObject<HTMLElement | null>, hands: Hands) {
  const now = useRef(hands);
  const fingers = useRef(new Map<number, { x: number; y: number }>());
  const start = useRef<{ x: number; y: number } | null>(null);
  useEffect(() => { now.current = hands; });
  useEffect(() => {
    const element = frame.current;
    if (element === null) return;
    // React listens to wheels passively, which could not keep the page from scrolling.
    const turn = (event: WheelEvent) => {
      if (!now.current.isClose && !event.ctrlKey) return;
      event.preventDefault();
      now.current.pinch(2 ** (-event.deltaY / 300), placeIn(element, event.clientX, event.clientY));
    };
    element.addEventListener('wheel', turn, { passive: false });
    return () => { element.removeEventListener('wheel', turn); };
  }, [frame]);

  const middle = () => {
    const [a, b] = [...fingers.current.values()];
    return a === undefined || b === undefined ? null : { x: (a.x + b.x) / 2, y: (a.y + b.y) / 2, apart: Math.hypot(a.x - b.x, a.y - b.y) };
  };
  return {
    onPointerDown: (event: PointerEvent<HTMLElement>) => {
      if (event.button !== 0) return;
      start.current = fingers.current.size === 0 ? { x: event.clientX, y: event.clientY } : null;
      fingers.current.set(event.pointerId, { x: event.clientX, y: event.clientY });
      event.currentTarget.setPointerCapture(event.pointerId);
    },
    onPointerMove: (event: PointerEvent<HTMLElement>) => {
      const before = fingers.current.get(event.pointerId);
      if (before === undefined) return;
      const [here, box] = [{ x: event.clientX, y: event.clientY }, event.currentTarget.getBoundingClientRect()];
      const wasApart = middle();
      fingers.current.set(event.pointerId, here);
      const isApart = middle();
      if (wasApart !== null && isApart !== null) {
        now.current.pinch(isApart.apart / Math.max(1, wasApart.apart), placeIn(event.currentTarget, isApart.x, isApart.y));
        now.current.drag((isApart.x - wasApart.x) / box.width, (isApart.y - wasApart.y) / box.height);
        return;
      }
      if (start.current !== null && Math.hypot(here.x - start.current.x, here.y - start.current.y) < STILL_PX) return;
      start.current = null;
      now.current.drag((here.x - before.x) / box.width, (here.y - before.y) / box.height);
    },
    onPointerUp: (event: PointerEvent<HTMLElement>) => {
      if (!fingers.current.delete(event.pointerId) || start.current === null) return;
      start.current = null;
      now.current.press(placeIn(event.currentTarget, event.clientX, event.clientY), event.pointerType === 'touch' ? 'touch' : 'mouse');
    },
    onPointerCancel: (event: PointerEvent<HTMLElement>) => {
      fingers.current.delete(event.pointerId);
      start.current = null;
    },
  };
}

/** A point of the screen as a place in the frame. */
export function placeIn(frame: Element, clientX: number, clientY: number): Place {
  const { left, top, width, height } = frame.getBoundingClientRect();
  return { x: (clientX - left) / width - 0.5, y: (clientY - top) / height - 0.5 };
}
