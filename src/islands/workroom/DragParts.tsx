import { useEffect, useRef, useState } from 'react';
import { placeAt, type RowBox } from '#islands/workroom/drag-place.ts';

interface DragPartsProps {
  /** Id of the list whose rows carry `data-part`, `data-number` and `data-title`. */
  listId: string;
  /** Where a move is sent: the same form the buttons use. */
  action: string;
}

interface Dragged {
  readonly row: HTMLElement;
  /** Number it would have when let go; null while it has not moved. */
  to: number;
}

/**
 * Lets the rows of a list be moved by pulling them, or by Alt with an arrow while anything in a row has the focus. What
 * is let go is sent as the buttons would send it, so that the same refusals, the same words and the same way back hold.
 */
export function DragParts({ listId, action }: DragPartsProps) {
  const form = useRef<HTMLFormElement>(null);
  const [move, setMove] = useState<{ part: string; to: number } | null>(null);
  const [said, setSaid] = useState('');
  useEffect(() => { if (move !== null) form.current?.submit(); }, [move]);
  useEffect(() => {
    const list = document.getElementById(listId);
    if (list === null) return;
    const rows = (): HTMLElement[] => [...list.querySelectorAll<HTMLElement>(':scope > [data-part]')];
    let dragged: Dragged | null = null;

    const send = (row: HTMLElement, to: number): void => {
      if (to !== Number(row.dataset['number'])) setMove({ part: row.dataset['part'] ?? '', to });
    };
    const onKey = (event: KeyboardEvent): void => {
      if (event.key === 'Escape' && dragged !== null) letGo(false);
      const step = event.key === 'ArrowUp' ? -1 : event.key === 'ArrowDown' ? 1 : 0;
      const row = event.target instanceof Element ? event.target.closest<HTMLElement>('[data-part]') : null;
      if (!event.altKey || step === 0 || row === null || event.target instanceof HTMLInputElement) return;
      event.preventDefault();
      const to = Number(row.dataset['number']) + step;
      if (to < 1 || to > rows().length) setSaid(`${row.dataset['title'] ?? ''} is ${step < 0 ? 'first' : 'last'} already.`);
      else send(row, to);
    };
    const onDown = (event: PointerEvent): void => {
      const grip = event.target instanceof Element ? event.target.closest('.part-grip') : null;
      const row = grip?.closest<HTMLElement>('[data-part]') ?? null;
      if (row === null || event.button !== 0) return;
      event.preventDefault();
      list.setPointerCapture(event.pointerId);
      row.classList.add('is-dragged');
      dragged = { row, to: Number(row.dataset['number']) };
    };
    const onMove = (event: PointerEvent): void => {
      if (dragged === null) return;
      const boxes = rows().map((row): RowBox => { const { top, height } = row.getBoundingClientRect(); return { top, height }; });
      const from = Number(dragged.row.dataset['number']);
      const to = placeAt(boxes, from, event.clientY);
      if (to === dragged.to) return;
      dragged.to = to;
      for (const [index, row] of rows().entries()) {
        row.classList.toggle('drop-before', index + 1 === to && to < from);
        row.classList.toggle('drop-after', index + 1 === to && to > from);
      }
      setSaid(to === from ? 'Where it was.' : `${dragged.row.dataset['title'] ?? ''} becomes Part ${to}.`);
    };
    const letGo = (isMeant: boolean): void => {
      if (dragged === null) return;
      const { row, to } = dragged;
      dragged = null;
      row.classList.remove('is-dragged');
      for (const other of rows()) other.classList.remove('drop-before', 'drop-after');
      if (isMeant) send(row, to);
      else setSaid('Nothing was moved.');
    };
    const onUp = (): void => { letGo(true); };
    const onCancel = (): void => { letGo(false); };
    list.classList.add('can-drag');
    document.addEventListener('keydown', onKey);
    list.addEventListener('pointerdown', onDown);
    list.addEventListener('pointermove', onMove);
    list.addEventListener('pointerup', onUp);
    list.addEventListener('pointercancel', onCancel);
    return () => {
      list.classList.remove('can-drag');
      document.removeEventListener('keydown', onKey);
      list.removeEventListener('pointerdown', onDown);
      list.removeEventListener('pointermove', onMove);
      list.removeEventListener('pointerup', onUp);
      list.removeEventListener('pointercancel', onCancel);
    };
  }, [listId]);
  return (
    <>
      <p className="small quiet mt-2">Pull a part by its dots to another place, or press <kbd>Alt</kbd> with <kbd>↑</kbd> or <kbd>↓</kbd> in its row.</p>
      <p className="hide" role="status">{said}</p>
      <form method="post" action={action} ref={form} hidden>
        <input type="hidden" name="lesson" value={move?.part ?? ''} readOnly />
        <input type="hidden" name="to" value={move?.to ?? ''} readOnly />
      </form>
    </>
  );
}
