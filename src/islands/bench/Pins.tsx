import { useEffect, useRef, type Dispatch, type KeyboardEvent, type PointerEvent } from 'react';
import type { Answer, AnswerEvent } from '#islands/bench/answer.ts';
import { placeIn } from '#islands/bench/use-gestures.ts';
import { onPhoto, stepOnPhoto, type View } from '#islands/bench/view.ts';

interface Props {
  answer: Answer;
  change: Dispatch<AnswerEvent>;
  view: View;
  /** Width by height of the photo they are set in. */
  aspect: number;
  /** Which shot of the showing is looked at, from 1. */
  shot: number;
}

const STEP = 5;
const LARGE_STEP = 50;
const ARROWS: Readonly<Record<string, readonly [number, number]>> = { ArrowLeft: [-1, 0], ArrowRight: [1, 0], ArrowUp: [0, -1], ArrowDown: [0, 1] };

/** The pins on a photo: dragged by mouse or finger, moved by the arrow keys, further with Shift. */
export function Pins({ answer: { notes, chosen, reach }, change, view, aspect, shot }: Props) {
  useEffect(() => { if (reach === 'pin') document.getElementById(`pin-${chosen + 1}`)?.focus(); }, [reach, chosen]);
  return (
    <svg className="pins" aria-label="Pins on the photo" role="group">
      {notes.map((note, index) => (note.shot ?? 1) === shot && note.xPermille !== null && note.yPermille !== null && (
        <svg key={index} x={`${note.xPermille / 10}%`} y={`${note.yPermille / 10}%`} overflow="visible">
          <Pin {...{ index, change, view, aspect }} isChosen={index === chosen} />
        </svg>
      ))}
    </svg>
  );
}

function Pin({ index, isChosen, change, view, aspect }: Omit<Props, 'answer' | 'shot'> & { index: number; isChosen: boolean }) {
  const drag = useRef<'down' | 'moved' | null>(null);
  const toWords = () => document.getElementById(`note-${index + 1}`)?.focus();
  const press = (event: KeyboardEvent) => {
    const arrow = ARROWS[event.key];
    if (arrow !== undefined) {
      const step = event.shiftKey ? LARGE_STEP : STEP;
      const [dx, dy] = stepOnPhoto(view.turns, arrow[0] * step, arrow[1] * step);
      change({ kind: 'nudge', index, dx, dy });
    } else if (event.key === 'Delete') change({ kind: 'take-out', index });
    else if (event.key === 'Enter') toWords();
    else return;
    event.preventDefault();
  };
  const follow = (event: PointerEvent<SVGElement>) => {
    const frame = event.currentTarget.closest('.photo-frame');
    if (drag.current === null || frame === null) return;
    drag.current = 'moved';
    const place = onPhoto(view, aspect, placeIn(frame, event.clientX, event.clientY));
    if (place !== null) change({ kind: 'place', index, ...place });
  };
  return (
    <g
      id={`pin-${index + 1}`} className="pin-link pin-upright" role="button" tabIndex={0} aria-pressed={isChosen}
      aria-label={`Note ${index + 1}: move with the arrow keys, Enter goes to its words, Delete takes it out`}
      onKeyDown={press} onFocus={() => change({ kind: 'choose', index })}
      onPointerDown={(event) => { event.stopPropagation(); drag.current = 'down'; event.currentTarget.setPointerCapture(event.pointerId); }}
      onPointerMove={follow}
      onPointerUp={(event) => { event.stopPropagation(); if (drag.current === 'down') toWords(); drag.current = null; }}
      onPointerCancel={() => { drag.current = null; }}
    >
      <circle className="pin-reach" r="25" /><circle className="pin-edge" r="19" /><circle className="pin-face" r="15.5" /><text className="pin-no" dy=".36em">{index + 1}</text>
    </g>
  );
}
