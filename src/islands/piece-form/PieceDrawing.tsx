import { memo, useCallback, useMemo, useRef, useState } from 'react';
import { hangingBox, loomBox, placeOfBand } from '#core/craft/cloth/cloth-box.ts';
import { wovenHeightMm, type WovenPiece } from '#core/craft/cloth/cloth-piece.ts';
import type { LayeredView } from '#core/craft/cloth/draw-cloth.ts';
import type { HeldBand } from '#core/craft/piece-form/band-height.ts';
import type { TypedPiece } from '#core/craft/piece-form/typed-piece.ts';
import type { Units } from '#core/units/units.ts';
import { LiveCloth, useLayeredCloth, type BandPlace } from '#islands/cloth/LiveCloth.tsx';
import { Choose } from '#islands/ui/Choose.tsx';
import { DrawnBands, type DrawnMade } from './DrawnBands.tsx';
import { useSame } from './keep-same.ts';
import { Ruler } from './Ruler.tsx';

interface PieceDrawingProps {
  /** Null while nothing could be woven yet. */
  readonly cloth: WovenPiece | null;
  /** What was typed comes along for the ids of its bands. */
  readonly made: (DrawnMade & { readonly typed: TypedPiece }) | null;
  /** It shows the piece as it was before something stopped working. */
  readonly isOld: boolean;
  /** Place of the chosen band among the piece's bands; −1 for none. */
  readonly chosen: number;
  readonly units: Units;
  readonly onChoose: (index: number) => void;
  readonly onPull: (held: HeldBand, steps: number) => void;
  readonly onRest: () => void;
}

type Way = 'hanging' | 'loom';
const WIDTH = 390;
/** Pixels; a lower band is pressed a little beside itself. */
const LEAST_TO_PRESS = 6;
const WAYS = [{ value: 'hanging', label: 'As it hangs' }, { value: 'loom', label: 'On the loom' }] as const;

/** The piece as it is typed, with a ruler at its side; its bands are chosen, pulled and moved on it. */
export const PieceDrawing = memo(function PieceDrawing({ cloth, made, isOld, chosen, units, onChoose, onPull, onRest }: PieceDrawingProps) {
  const [way, setWay] = useState<Way>('hanging');
  return (
    <section className="drawing" aria-label="The piece, drawn">
      <WayChoice way={way} onChoose={setWay} />
      {cloth === null || made === null ? (
        <div className="empty mt-4"><BareWarp /><p>The piece is drawn here as soon as it can be woven: size, loom, yarns and bands are what it needs.</p></div>
      ) : (
        <Stage {...{ cloth, made, way, units, chosen, isOld, onChoose, onPull, onRest }} />
      )}
      {isOld && <p className="small quiet mt-3">Drawn as it was before. It follows again when what is marked works.</p>}
      {!isOld && cloth !== null && <p className="small quiet mt-3 needs-script">Press a band to choose it. Pull its square to change the height, its dots to move it. With keys: go to the square, then arrows, with Shift ten rows at once; Alt and an arrow moves the band.{chosen >= 0 && made?.piece.bands[chosen] !== undefined && 'fill' in made.piece.bands[chosen] && ' This band fills what the others leave, so its height follows theirs.'}</p>}
    </section>
  );
});

const WayChoice = memo(function WayChoice({ way, onChoose }: { readonly way: Way; readonly onChoose: (way: Way) => void }) {
  return <Choose name="way" legend="Drawn" quietLegend options={WAYS} value={way} onChoose={onChoose} />;
});

type StageProps = Omit<PieceDrawingProps, 'cloth' | 'made'> & { readonly cloth: WovenPiece; readonly made: NonNullable<PieceDrawingProps['made']>; readonly way: Way };

function Stage({ cloth, made, way, units, chosen, isOld, onChoose, onPull, onRest }: StageProps) {
  const view = useMemo((): LayeredView => ({ id: 'piece', as: way, width: WIDTH, units }), [way, units]);
  const drawn = useLayeredCloth(cloth, view);
  const box = useSame(useMemo(() => (way === 'loom' ? loomBox(cloth, WIDTH) : hangingBox(cloth, WIDTH)), [cloth, way]));
  const places = cloth.bands.map((_, index) => placeOfBand(cloth, index, box) ?? { top: 0, height: 0 });
  const square = useRef<SVGGElement>(null);
  const choose = useCallback((index: number) => {
    // An old picture may show bands that are gone.
    if (isOld) return;
    onChoose(index);
    requestAnimationFrame(() => { square.current?.focus({ preventScroll: true }); });
  }, [onChoose, isOld]);
  const placeOf = (band: number): BandPlace => {
    const { top, height } = places[band] ?? { top: 0, height: 0 };
    return { left: box.left, top: box.top + top, width: WIDTH - 2 * box.left, height: Math.max(LEAST_TO_PRESS, height) };
  };
  return (
    <div className="stage">
      <Ruler box={box} heightMm={wovenHeightMm(cloth)} pictureHeight={drawn.height} units={units} />
      <LiveCloth drawn={drawn} idOf={(band) => made.typed.bands[band]?.id} placeOf={placeOf} onChoose={choose} />
      {!isOld && <DrawnBands {...{ made, cloth, box, places, square, chosen, onPull, onRest }} pictureWidth={WIDTH} pictureHeight={drawn.height} />}
    </div>
  );
}

function BareWarp() {
  return (
    <svg viewBox="0 0 132 54" width="132" height="54" aria-hidden="true">
      <g className="bare-warp"><path d="M6 0v46M18 0v46M30 0v46M42 0v46M54 0v46M66 0v46M78 0v46M90 0v46M102 0v46M114 0v46M126 0v46" /></g>
      <path className="fill-weld-edge" d="M0 44h132v6H0z" /><path className="fill-weld" d="M0 45h132v4H0z" />
    </svg>
  );
}
