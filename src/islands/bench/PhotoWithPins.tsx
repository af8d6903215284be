import type { Dispatch, KeyboardEvent, MouseEvent } from 'react';
import type { PinEvent, Pins } from '#islands/bench/pins.ts';

interface Props {
  photo: { src: string; width: number; height: number; alt: string };
  pins: Pins;
  change: Dispatch<PinEvent>;
}

const STEP = 5;
const LARGE_STEP = 50;
const ARROWS: Readonly<Record<string, readonly [number, number]>> = { ArrowLeft: [-1, 0], ArrowRight: [1, 0], ArrowUp: [0, -1], ArrowDown: [0, 1] };

/** A press on the photo puts a pin there; a pin in focus moves by the arrow keys, further with Shift. */
export function PhotoWithPins({ photo, pins, change }: Props) {
  const put = (event: MouseEvent<HTMLElement>) => {
    const box = event.currentTarget.getBoundingClientRect();
    change({ kind: 'put', xPermille: ((event.clientX - box.left) / box.width) * 1_000, yPermille: ((event.clientY - box.top) / box.height) * 1_000 });
  };
  return (
    <div className="photo pins-can-be-set" onClick={put}>
      <img src={photo.src} alt={photo.alt} width={photo.width} height={photo.height} />
      <svg className="pins" aria-label="Pins on the photo" role="group">
        {pins.notes.map((note, index) => note.xPermille !== null && note.yPermille !== null && (
          <svg key={index} x={`${note.xPermille / 10}%`} y={`${note.yPermille / 10}%`} overflow="visible">
            <Pin index={index} change={change} />
          </svg>
        ))}
      </svg>
    </div>
  );
}

function Pin({ index, change }: { index: number; change: Dispatch<PinEvent> }) {
  const move = (event: KeyboardEvent) => {
    const arrow = ARROWS[event.key];
    if (arrow !== undefined) {
      event.preventDefault();
      const step = event.shiftKey ? LARGE_STEP : STEP;
      change({ kind: 'choose', index });
      change({ kind: 'nudge', dx: arrow[0] * step, dy: arrow[1] * step });
    } else if (event.key === 'Delete') change({ kind: 'take-out', index });
    else if (event.key === 'Enter') document.getElementById(`note-${index + 1}`)?.focus();
  };
  return (
    <g
      className="pin-link" role="button" tabIndex={0} aria-label={`Note ${index + 1}: move with the arrow keys, Enter goes to its words, Delete takes it out`}
      onKeyDown={move} onFocus={() => change({ kind: 'choose', index })} onClick={(event) => { event.stopPropagation(); document.getElementById(`note-${index + 1}`)?.focus(); }}
    >
      <circle className="pin-reach" r="25" /><circle className="pin-edge" r="19" /><circle className="pin-face" r="15.5" /><text className="pin-no" dy=".36em">{index + 1}</text>
    </g>
  );
}
