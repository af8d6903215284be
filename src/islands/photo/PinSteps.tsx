import { useCallback, useEffect, useState } from 'react';
import { IconButton } from '#islands/ui/Button.tsx';

interface PinStepsProps {
  /** Id of the showing on the page; its pins lead to `<photo>-note-<number>`. */
  photo: string;
  /** Words of the notes, in the order of their pins. */
  notes: readonly string[];
}

/** Where an arrow key leads from note `at`; null for other keys. */
function stepOf(key: string, at: number, count: number): number | null {
  switch (key) {
    case 'ArrowRight': case 'ArrowDown': return Math.min(count, at + 1);
    case 'ArrowLeft': case 'ArrowUp': return Math.max(1, at - 1);
    case 'Home': return 1;
    case 'End': return count;
    default: return null;
  }
}

/**
 * Goes from pin to pin of a photo, with the words of each beside it: by the arrow keys on a pin or on these buttons.
 * Without script the pins are links to their notes.
 */
export function PinSteps({ photo, notes }: PinStepsProps) {
  const [live, setLive] = useState(false);
  const [at, setAt] = useState(0);
  useEffect(() => setLive(true), []);
  const pinOf = useCallback((number: number) => document.getElementById(photo)?.querySelector<SVGAElement>(`a[href="#${photo}-note-${number}"]`) ?? null, [photo]);
  const go = useCallback((number: number) => {
    setAt(number);
    pinOf(number)?.focus();
  }, [pinOf]);

  useEffect(() => {
    const pins = notes.map((_words, index) => pinOf(index + 1));
    const ends = pins.map((pin, index) => {
      const onFocus = (): void => setAt(index + 1);
      const onKey = (event: KeyboardEvent): void => {
        const next = stepOf(event.key, index + 1, notes.length);
        if (next === null || event.altKey || event.ctrlKey || event.metaKey) return;
        event.preventDefault();
        go(next);
      };
      pin?.addEventListener('focus', onFocus);
      pin?.addEventListener('keydown', onKey);
      return () => { pin?.removeEventListener('focus', onFocus); pin?.removeEventListener('keydown', onKey); };
    });
    return () => { for (const end of ends) end(); };
  }, [notes, pinOf, go]);
  useEffect(() => {
    notes.forEach((_words, index) => {
      if (index + 1 === at) pinOf(index + 1)?.setAttribute('aria-current', 'true');
      else pinOf(index + 1)?.removeAttribute('aria-current');
    });
  }, [notes, pinOf, at]);

  if (!live) return null;
  return (
    <div className="pin-steps no-print" role="group" aria-label="Notes on this photo, one after the other">
      <IconButton glyph="back" label={at <= 1 ? 'This is the first note' : 'Note before'} off={at <= 1} onClick={() => go(at - 1)} />
      <IconButton glyph="next" label={at >= notes.length ? 'This is the last note' : 'Next note'} off={at >= notes.length} onClick={() => go(at + 1)} />
      <p className="small" role="status">{at === 0 ? `${notes.length} notes. Arrow keys go from one to the next.` : <><b>Note {at} of {notes.length}:</b> {notes[at - 1]}</>}</p>
    </div>
  );
}
