import { useEffect, useRef, useState, type KeyboardEvent, type PointerEvent } from 'react';
import { Button } from '#islands/ui/Button.tsx';
import { Dialog } from '#islands/ui/Dialog.tsx';
import { Wrong } from '#islands/ui/Wrong.tsx';
import { cornerAt, CORNERS, isUncut, placeOf, turned, UNCUT, type Corner, type Cut } from './cut.ts';
import { cutOut, drawTurned, readUpright } from './draw-cut.ts';

interface CutPhotoProps {
  file: File;
  /** With another file in its place, or without one when it stays as it was. */
  onDone: (cut?: File) => void;
}

const STEP = 10;
const LARGE_STEP = 100;
const ARROWS: Readonly<Record<string, readonly [number, number]>> = { ArrowLeft: [-1, 0], ArrowRight: [1, 0], ArrowUp: [0, -1], ArrowDown: [0, 1] };
const UNREADABLE = 'This browser cannot open the photo to cut it. It can be sent as it is.';
const hundredths = (permille: number): number => Math.round(permille / 10);

/** Cuts and turns a photo before it is sent: corners by mouse, finger or arrow keys. What is cut off never leaves the device. */
export function CutPhoto({ file, onDone }: CutPhotoProps) {
  const [cut, setCut] = useState(UNCUT);
  const [photo, setPhoto] = useState<ImageBitmap | null>(null);
  const [fault, setFault] = useState<string>();
  const canvas = useRef<HTMLCanvasElement>(null);
  useEffect(() => {
    let gone = false;
    readUpright(file).then((read) => { if (gone) read.close(); else setPhoto(read); }, () => { if (!gone) setFault(UNREADABLE); });
    return () => { gone = true; };
  }, [file]);
  useEffect(() => () => photo?.close(), [photo]);
  const { turns } = cut;
  useEffect(() => { if (canvas.current !== null && photo !== null) drawTurned(canvas.current, photo, turns); }, [photo, turns]);

  const use = async (): Promise<void> => {
    if (photo === null || isUncut(cut)) { onDone(); return; }
    const made = await cutOut(photo, cut, file.name);
    if (made === null) setFault(UNREADABLE);
    else onDone(made);
  };
  return (
    <Dialog open title="Cut and turn" onClose={() => onDone()} acts={<><Button onClick={() => onDone()}>As it was</Button><Button kind="act" onClick={() => void use()}>Use this</Button></>}>
      <p className="small quiet">Pull the corners, or move one with the arrow keys, further with Shift. What you cut off stays with you.</p>
      <div className="cut-photo">
        <canvas ref={canvas} role="img" aria-label={`${file.name}, ${turns === 0 ? 'not turned' : `turned by ${turns * 90} degrees`}`} />
        <Corners cut={cut} change={setCut} />
      </div>
      <p className="row">
        <Button small glyph="turn" onClick={() => setCut(turned)}>Turn by a quarter</Button>
        <Button small kind="quiet" onClick={() => setCut((was) => ({ ...UNCUT, turns: was.turns }))}>The whole photo</Button>
      </p>
      <p className="small" role="status">{`Keeps ${hundredths(cut.right - cut.left)} % of the width and ${hundredths(cut.bottom - cut.top)} % of the height.`}</p>
      {fault !== undefined && <div role="alert"><Wrong id="cut-wrong" says={fault} /></div>}
    </Dialog>
  );
}

function Corners({ cut, change }: { cut: Cut; change: (next: (was: Cut) => Cut) => void }) {
  const press = (corner: Corner) => (event: KeyboardEvent): void => {
    const arrow = ARROWS[event.key];
    if (arrow === undefined) return;
    event.preventDefault();
    const step = event.shiftKey ? LARGE_STEP : STEP;
    change((was) => { const { x, y } = placeOf(was, corner); return cornerAt(was, corner, x + arrow[0] * step, y + arrow[1] * step); });
  };
  const pull = (corner: Corner) => (event: PointerEvent<SVGElement>): void => {
    const box = event.currentTarget.closest('.cut-photo')?.getBoundingClientRect();
    if (box === undefined || !event.currentTarget.hasPointerCapture(event.pointerId)) return;
    const [x, y] = [((event.clientX - box.left) / box.width) * 1_000, ((event.clientY - box.top) / box.height) * 1_000];
    change((was) => cornerAt(was, corner, x, y));
  };
  const percent = (permille: number): string => `${permille / 10}%`;
  const { left, top, right, bottom } = cut;
  return (
    <svg className="pins" role="group" aria-label="Corners of what is kept">
      {[[0, 0, 1_000, top], [0, bottom, 1_000, 1_000], [0, top, left, bottom], [right, top, 1_000, bottom]].map(([x1 = 0, y1 = 0, x2 = 0, y2 = 0], index) => (
        <rect key={index} className="cut-off" x={percent(x1)} y={percent(y1)} width={percent(x2 - x1)} height={percent(y2 - y1)} />
      ))}
      <rect className="cut-edge" x={percent(left)} y={percent(top)} width={percent(right - left)} height={percent(bottom - top)} />
      {CORNERS.map((corner) => (
        <svg key={corner} x={percent(placeOf(cut, corner).x)} y={percent(placeOf(cut, corner).y)} overflow="visible">
          <g
            className="pin-link" role="button" tabIndex={0} aria-label={`The ${corner} corner: move with the arrow keys`}
            onKeyDown={press(corner)} onPointerDown={(event) => event.currentTarget.setPointerCapture(event.pointerId)} onPointerMove={pull(corner)}
          >
            <circle className="pin-reach" r="25" /><circle className="pin-edge" r="12" /><circle className="pin-face" r="8" />
          </g>
        </svg>
      ))}
    </svg>
  );
}
