import { useEffect } from 'react';

/** A finger goes further than this across, and much less up or down. */
const LEAST_PX = 56;
const FLAT = 0.6;
/** Nearer to the edge of the glass the browser has its own swipe. */
const EDGE_PX = 24;

/** Tells a swipe of one finger across what `selector` finds: `next` from right to left, `back` the other way. */
export function useSwipe(selector: string, onSwipe: (turn: 'back' | 'next') => void): void {
  useEffect(() => {
    const place = document.querySelector<HTMLElement>(selector);
    if (place === null) return;
    let from: { readonly id: number; readonly x: number; readonly y: number } | null = null;
    let fingers = 0;
    const down = (event: PointerEvent): void => {
      if (event.pointerType !== 'touch') return;
      fingers += 1;
      const isField = event.target instanceof Element && event.target.closest('input, select, textarea') !== null;
      const isEdge = event.clientX < EDGE_PX || event.clientX > window.innerWidth - EDGE_PX;
      from = fingers > 1 || isField || isEdge ? null : { id: event.pointerId, x: event.clientX, y: event.clientY };
    };
    const up = (event: PointerEvent): void => {
      if (event.pointerType !== 'touch') return;
      fingers = Math.max(0, fingers - 1);
      if (from?.id !== event.pointerId || event.type === 'pointercancel') return;
      const [across, along] = [event.clientX - from.x, event.clientY - from.y];
      from = null;
      if (Math.abs(across) >= LEAST_PX && Math.abs(along) <= Math.abs(across) * FLAT) onSwipe(across < 0 ? 'next' : 'back');
    };
    place.addEventListener('pointerdown', down);
    window.addEventListener('pointerup', up);
    window.addEventListener('pointercancel', up);
    return () => {
      place.removeEventListener('pointerdown', down);
      window.removeEventListener('pointerup', up);
      window.removeEventListener('pointercancel', up);
    };
  }, [selector, onSwipe]);
}
