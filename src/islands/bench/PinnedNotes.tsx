import { useEffect, type Dispatch } from 'react';
import type { Answer, AnswerEvent } from '#islands/bench/answer.ts';
import { Wrong } from '#islands/ui/Wrong.tsx';

interface Props {
  answer: Answer;
  change: Dispatch<AnswerEvent>;
  error: string | undefined;
  /** How many shots there are; with several, each note says which it is about. */
  shotCount: number;
}

/** The words of each pin, beside its number. The words of a pin set by mouse take the focus. */
export function PinnedNotes({ answer: { notes, chosen, reach }, change, error, shotCount }: Props) {
  useEffect(() => { if (reach === 'note') document.getElementById(`note-${chosen + 1}`)?.focus(); }, [reach, chosen]);
  if (notes.length === 0) return <p className="small quiet bench-hint">Press on the photo, or the key P, to put a pin with a note.</p>;
  return (
    <>
      <ol className="notes">
        {notes.map((note, index) => (
          <li key={index}>
            <span className="no" aria-hidden="true">{index + 1}</span>
            <div className="field">
              <label htmlFor={`note-${index + 1}`} className={shotCount > 1 ? 'small quiet' : 'hide'}>Note {index + 1}{shotCount > 1 && `, on photo ${note.shot ?? 1}`}</label>
              <div className="input">
                <textarea
                  id={`note-${index + 1}`} rows={2} maxLength={600} required value={note.words}
                  onFocus={() => change({ kind: 'choose', index })} onChange={(event) => change({ kind: 'write-note', index, words: event.target.value })}
                />
              </div>
              <button type="button" className="btn btn-quiet btn-sm" onClick={() => change({ kind: 'take-out', index })}>Take out<span className="hide"> note {index + 1}</span></button>
            </div>
          </li>
        ))}
      </ol>
      {error !== undefined && <Wrong id="notes-wrong" says={error} />}
    </>
  );
}
