import type { Dispatch } from 'react';
import { phraseKey } from '#core/workroom/bench.ts';
import type { Answer, AnswerEvent } from '#islands/bench/answer.ts';

interface Props {
  phrases: readonly string[];
  answer: Answer;
  change: Dispatch<AnswerEvent>;
  studentName: string;
}

/** Sentences said often: one press puts one in. Without script the button sends the form, which comes back with it. */
export function Phrases({ phrases, answer, change, studentName }: Props) {
  const into = answer.notes[answer.chosen] === undefined ? `your words to ${studentName}` : `note ${answer.chosen + 1}`;
  return (
    <div role="group" aria-label="Phrases">
      <p className="phrases-into small">
        {phrases.length > 0 && <><b>Phrases</b>, put into {into}. </>}
        <a href="/workroom/bench/settings#phrases">{phrases.length === 0 ? 'Write phrases that you say often' : 'Change them'}</a>
      </p>
      {phrases.length > 0 && (
        <div className="phrases">
          {phrases.map((phrase, index) => (
            <button
              key={phrase} type="submit" name="phrase" value={phrase} formNoValidate aria-keyshortcuts={phraseKey(index)}
              onClick={(event) => { event.preventDefault(); change({ kind: 'insert', phrase }); }}
            >
              {phraseKey(index) !== undefined && <span className="key only-desk" aria-hidden="true">{phraseKey(index)}</span>} {phrase}
            </button>
          ))}
        </div>
      )}
    </div>
  );
}
