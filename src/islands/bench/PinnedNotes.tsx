import { useEffect, useRef, type Dispatch } from 'react';
import type { PinEvent, Pins } from '#islands/bench/pins.ts';
import { Wrong } from '#islands/ui/Wrong.tsx';

/** The words of each pin, beside its number. A new pin's words take the focus. */
export function PinnedNotes({ pins, change, error }: { pins: Pins; change: Dispatch<PinEvent>; error: string | undefined }) {
  const count = useRef(pins.notes.length);
  useEffect(() => {
    if (pins.notes.length > count.current) document.getElementById(`note-${pins.notes.length}`)?.focus();
    count.current = pins.notes.length;
  }, [pins.notes.length]);
  if (pins.notes.length === 0) return <p className="small quiet bench-hint">Press on the photo, or the key P, to put a pin with a note.</p>;
  return (
    <>
      <ol className="notes">
        {pins.notes.map((note, index) => (
          <li key={index}>
            <span className="no" aria-hidden="true">{index + 1}</span>
            <div className="field">
              <label htmlFor={`note-${index + 1}`} className="hide">Note {index + 1}</label>
              <div className="input"><textarea id={`note-${index + 1}`} rows={2} maxLength={600} required value={note.words} onChange={(event) => change({ kind: 'write', index, words: event.target.value })} /></div>
              <button type="button" className="btn btn-quiet btn-sm" onClick={() => change({ kind: 'take-out', index })}>Take out<span className="hide"> note {index + 1}</span></button>
            </div>
          </li>
        ))}
      </ol>
      {error !== undefined && <Wrong id="notes-wrong" says={error} />}
    </>
  );
}
