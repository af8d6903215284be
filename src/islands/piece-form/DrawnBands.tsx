import { useEffect, useId, useMemo, useRef, type KeyboardEvent, type PointerEvent, type RefObject } from 'react';
import { lengthOf } from '#core/craft/amounts/amount-types.ts';
import type { ClothBox } from '#core/craft/cloth/cloth-box.ts';
import type { WovenPiece } from '#core/craft/cloth/cloth-piece.ts';
import { fillingBand, holdBand, withinHold, type HeldBand } from '#core/craft/piece-form/band-height.ts';
import type { FrameLoomPiece } from '#core/craft/piece.ts';
import type { FrameLoomPlan } from '#core/craft/plan-types.ts';
import { amountText } from '#core/units/format-amount.ts';
import { glyphs } from '#islands/ui/glyphs.ts';
import { useHands, useShown } from './hands.ts';
import { useRowDrag } from './use-row-drag.ts';

export interface Place {
  readonly top: number;
  readonly height: number;
}

export interface DrawnMade {
  readonly piece: FrameLoomPiece;
  readonly plan: FrameLoomPlan;
}

interface DrawnBandsProps {
  readonly made: DrawnMade;
  readonly cloth: WovenPiece;
  readonly box: ClothBox;
  readonly pictureWidth: number;
  readonly pictureHeight: number;
  /** Place of the chosen band; −1 for none. */
  readonly chosen: number;
  /** Of each band, from the upper edge of the cloth. */
  readonly places: readonly Place[];
  /** Gets the chosen band's square. */
  readonly square: RefObject<SVGGElement | null>;
  readonly onPull: (held: HeldBand, steps: number) => void;
  readonly onRest: () => void;
}

/** Room at the right of the picture for the mark and the square. */
const MARGIN = 14;
/** A finger's. */
const REACH = 44;
const LEAP = 10;

/** Over the drawn piece: the chosen band is pulled to another height at its square, to another place at its dots. */
export function DrawnBands({ made, cloth, box, places, square, pictureWidth, pictureHeight, chosen, onPull, onRest }: DrawnBandsProps) {
  const { act } = useHands();
  const area = useRef<SVGSVGElement>(null);
  const count = cloth.bands.length;
  const bandAt = (number: number): number => (box.begin === 'head' ? number - 1 : count - number);
  const numberOf = (index: number): number => (box.begin === 'head' ? index + 1 : count - index);
  const placeOf = (number: number) => places[bandAt(number)] ?? { top: 0, height: 0 };
  const [heldRow, grip] = useRowDrag(
    () => {
      const { top = 0, height = 1 } = area.current?.getBoundingClientRect() ?? {};
      const scale = height / pictureHeight;
      return places.map((_, at) => placeOf(at + 1)).map((place) => ({ top: top + (box.top + place.top) * scale, height: place.height * scale }));
    },
    (from, to) => { act({ do: 'move-band', band: bandAt(from), to: bandAt(to) }); },
  );
  const own = places[chosen];
  return (
    <svg ref={area} className="drawn-bands" viewBox={`0 0 ${String(pictureWidth + MARGIN)} ${String(pictureHeight)}`} width={pictureWidth + MARGIN} height={pictureHeight}>
      {own !== undefined && (
        <>
          <path className="fill-weld-edge" d={`M${String(pictureWidth + 5)} ${(box.top + own.top).toFixed(1)}h7v${Math.max(5, own.height).toFixed(1)}h-7z`} />
          <path className="fill-weld" d={`M${String(pictureWidth + 6)} ${(box.top + own.top).toFixed(1)}h5v${Math.max(5, own.height).toFixed(1)}h-5z`} />
          <g className="band-grip" onPointerDown={(event) => { grip.down(event, numberOf(chosen)); }} onPointerMove={grip.move} onPointerUp={grip.up} onPointerCancel={grip.cancel} aria-hidden="true">
            <rect className="reach" x={box.left - 22} y={box.top + own.top + own.height / 2 - REACH / 2} width={REACH} height={REACH} />
            <rect className="knob" x={box.left - 12} y={box.top + own.top + own.height / 2 - 12} width="24" height="24" />
            <path className="dots" d={glyphs.grip} transform={`translate(${String(box.left - 10)} ${(box.top + own.top + own.height / 2 - 10).toFixed(1)})`} />
          </g>
          <HeightSquare ref={square} {...{ made, cloth, box, pictureWidth, chosen, onPull, onRest }} place={own} />
        </>
      )}
      {heldRow !== null && <Drop y={box.top + (heldRow.to <= heldRow.from ? placeOf(heldRow.to).top : placeOf(heldRow.to).top + placeOf(heldRow.to).height)} from={box.left} to={pictureWidth - box.left} />}
    </svg>
  );
}

function Drop({ y, from, to }: { readonly y: number; readonly from: number; readonly to: number }) {
  return <path className="drop" d={`M${String(from - 6)} ${y.toFixed(1)}H${String(to + 6)}`} />;
}

/** Which edge goes with the hand: that on the side of the band that gives way; where none does, the free end of the piece. */
function edgeOf(piece: FrameLoomPiece, chosen: number, { begin, free }: ClothBox): 'upper' | 'lower' {
  const filling = fillingBand(piece);
  if (filling < 0) return free === 'foot' ? 'lower' : 'upper';
  return (chosen < filling) === (begin === 'foot') ? 'upper' : 'lower';
}

interface HeightSquareProps extends Pick<DrawnBandsProps, 'made' | 'cloth' | 'box' | 'pictureWidth' | 'chosen' | 'onPull' | 'onRest'> {
  readonly place: Place;
  readonly ref: RefObject<SVGGElement | null>;
}

interface Pull {
  readonly held: HeldBand;
  readonly y: number;
  readonly pxPerStep: number;
}

/** The square at the moving edge of the chosen band: pulled, or a slider by keys. */
function HeightSquare({ made: { piece, plan }, cloth, box, pictureWidth, chosen, place, ref, onPull, onRest }: HeightSquareProps) {
  const { act } = useHands();
  const { units } = useShown();
  const label = useId();
  const held = useMemo(() => holdBand(piece, plan, chosen), [piece, plan, chosen]);
  const pull = useRef<Pull | null>(null);
  useEffect(() => onRest, [onRest]);
  if (held === null) return null;
  const edge = edgeOf(piece, chosen, box);
  const y = box.top + place.top + (edge === 'upper' ? 0 : place.height);
  const heightMm = cloth.bands[chosen]?.heightMm ?? held.heightMm;
  const words = `${amountText(lengthOf(heightMm, heightMm < 10 ? 'fine' : 'size'), units)}${held.by === 'mm' ? '' : `, ${String(held.steps)} ${held.steps === 1 ? 'row' : 'rows'}`}`;

  const to = (steps: number) => {
    const wanted = withinHold(held, steps);
    if (wanted !== held.steps) onPull(held, wanted);
  };
  const onKeyDown = (event: KeyboardEvent) => {
    const isUp = event.key === 'ArrowUp' || event.key === 'ArrowRight';
    const step = isUp ? 1 : event.key === 'ArrowDown' || event.key === 'ArrowLeft' ? -1 : event.key === 'PageUp' ? LEAP : event.key === 'PageDown' ? -LEAP : 0;
    if (event.altKey && Math.abs(step) === 1) act({ do: isUp === (box.begin === 'foot') ? 'later' : 'sooner', band: chosen });
    else if (step !== 0) to(held.steps + step * (event.shiftKey ? LEAP : 1));
    else if (event.key === 'Home') to(held.least);
    else if (event.key === 'End') to(held.most);
    else return;
    event.preventDefault();
  };
  const onPointerDown = (event: PointerEvent<SVGGElement>) => {
    if (event.button !== 0) return;
    event.preventDefault();
    event.currentTarget.setPointerCapture(event.pointerId);
    event.currentTarget.focus({ preventScroll: true });
    const drawnPx = event.currentTarget.ownerSVGElement?.getBoundingClientRect().width ?? 0;
    const scale = drawnPx > 0 ? drawnPx / (pictureWidth + MARGIN) : 1;
    pull.current = { held, y: event.clientY, pxPerStep: held.stepMm * box.pxPerMm * scale };
  };
  const onPointerMove = (event: PointerEvent) => {
    if (pull.current === null) return;
    const { held: begun, y: from, pxPerStep } = pull.current;
    const pulled = ((edge === 'upper' ? from - event.clientY : event.clientY - from)) / pxPerStep;
    const wanted = withinHold(begun, begun.steps + pulled);
    if (wanted !== held.steps) onPull(begun, wanted);
  };
  const letGo = () => {
    if (pull.current === null) return;
    pull.current = null;
    onRest();
  };
  return (
    <g
      ref={ref} className="band-square" role="slider" tabIndex={0} aria-labelledby={label} aria-orientation="vertical" aria-valuemin={held.least} aria-valuemax={held.most} aria-valuenow={held.steps} aria-valuetext={words}
      aria-keyshortcuts="Alt+ArrowUp Alt+ArrowDown" onKeyDown={onKeyDown} onBlur={onRest} onPointerDown={onPointerDown} onPointerMove={onPointerMove} onPointerUp={letGo} onPointerCancel={letGo}
    >
      <title id={label}>Height of band {chosen + 1}</title>
      <path className="edge" d={`M${String(box.left - 6)} ${y.toFixed(1)}H${String(pictureWidth + 2)}`} />
      <rect className="reach" x={pictureWidth - REACH / 2 - 4} y={y - REACH / 2} width={REACH} height={REACH} />
      <rect className="knob" x={pictureWidth - 14} y={y - 10} width="20" height="20" />
      <g className="says" aria-hidden="true">
        <rect x={pictureWidth - 24 - words.length * 7.4} y={y - 13} width={words.length * 7.4 + 6} height="26" />
        <text x={pictureWidth - 21} y={y + 5} textAnchor="end">{words}</text>
      </g>
    </g>
  );
}
