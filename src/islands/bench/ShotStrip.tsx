import type { Answer } from '#islands/bench/answer.ts';
import type { Shown } from '#islands/bench/PhotoFrame.tsx';

interface Props {
  shots: readonly Shown[];
  /** Index of the one in the frame. */
  at: number;
  lookAt: (index: number) => void;
  answer: Answer;
}

const pinWords = (count: number): string => (count === 0 ? '' : count === 1 ? ', one pin' : `, ${count} pins`);

/** The photos that were shown together, to take one after the other into the frame. */
export function ShotStrip({ shots, at, lookAt, answer: { notes } }: Props) {
  return (
    <div className="bench-shots" role="group" aria-label={`${shots.length} photos shown together`}>
      {shots.map((shot, index) => (
        <button key={shot.src} type="button" className="bench-shot" aria-pressed={index === at} onClick={() => lookAt(index)}>
          <img src={shot.src} alt="" width="76" height="57" loading="lazy" />
          <span className="small">{`Photo ${index + 1}${pinWords(notes.filter((note) => (note.shot ?? 1) === index + 1).length)}`}</span>
        </button>
      ))}
    </div>
  );
}
