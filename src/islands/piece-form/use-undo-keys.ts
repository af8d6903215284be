import { useEffect } from 'react';

/** Control Z undoes, Control Y and Control Shift Z do it again, wherever the hands are: the fields' own memory knows nothing of rows and drags. */
export function useUndoKeys(undo: () => void, redo: () => void): void {
  useEffect(() => {
    const onKey = (event: KeyboardEvent) => {
      if (!(event.ctrlKey || event.metaKey) || event.altKey) return;
      // Fields of another form have their own memory.
      if (event.target instanceof Element && event.target.matches('input, select, textarea') && event.target.closest('.piece-form') === null) return;
      const key = event.key.toLowerCase();
      if (key !== 'z' && key !== 'y') return;
      event.preventDefault();
      if (key === 'y' || event.shiftKey) redo();
      else undo();
    };
    document.addEventListener('keydown', onKey);
    return () => { document.removeEventListener('keydown', onKey); };
  }, [undo, redo]);
}
