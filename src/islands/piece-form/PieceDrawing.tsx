import { useMemo, useState } from 'react';
import { hangingBox, loomBox, placeOfBand, type BandPlace, type ClothBox } from '#core/craft/cloth/cloth-box.ts';
import { wovenHeightMm, type WovenPiece } from '#core/craft/cloth/cloth-piece.ts';
import type { ClothView } from '#core/craft/cloth/cloth-view.ts';
import { drawCloth } from '#core/craft/cloth/draw-cloth.ts';
import type { Units } from '#core/units/units.ts';
import { Choose } from '#islands/ui/Choose.tsx';
import { Ruler } from './Ruler.tsx';

interface PieceDrawingProps {
  /** Null while nothing could be woven yet. */
  readonly cloth: WovenPiece | null;
  /** It shows the piece as it was before something stopped working. */
  readonly isOld: boolean;
  /** Place of the chosen band among the piece's bands; −1 for none. */
  readonly chosen: number;
  readonly units: Units;
}

type Way = 'hanging' | 'loom';
const WIDTH = 390;
const WAYS = [{ value: 'hanging', label: 'As it hangs' }, { value: 'loom', label: 'On the loom' }] as const;

/** The piece as it is typed, with a ruler at its side and a mark at the band in hand. */
export function PieceDrawing({ cloth, isOld, chosen, units }: PieceDrawingProps) {
  const [way, setWay] = useState<Way>('hanging');
  return (
    <section className="drawing" aria-label="The piece, drawn">
      <Choose name="way" legend="Drawn" quietLegend options={WAYS} value={way} onChoose={setWay} />
      {cloth === null ? (
        <div className="empty mt-4"><BareWarp /><p>The piece is drawn here as soon as it can be woven: size, loom, yarns and bands are what it needs.</p></div>
      ) : (
        <Stage {...{ cloth, way, units }} chosen={isOld ? -1 : chosen} />
      )}
      {isOld && <p className="small quiet mt-3">Drawn as it was before. It follows again when what is marked works.</p>}
    </section>
  );
}

function Stage({ cloth, way, units, chosen }: { readonly cloth: WovenPiece; readonly way: Way; readonly units: Units; readonly chosen: number }) {
  const view = useMemo((): ClothView => ({ id: 'piece', as: way, width: WIDTH, units }), [way, units]);
  const markup = useMemo(() => drawCloth(cloth, view), [cloth, view]);
  const box = way === 'loom' ? loomBox(cloth, WIDTH) : hangingBox(cloth, WIDTH);
  const height = Number(/ height="([\d.]+)"/.exec(markup)?.[1] ?? 0);
  const place = placeOfBand(cloth, chosen, box);
  // The markup is our own: checked colours, escaped words, no scripts.
  return (
    <div className="stage">
      <Ruler box={box} heightMm={wovenHeightMm(cloth)} pictureHeight={height} units={units} />
      <div className="cloth" dangerouslySetInnerHTML={{ __html: markup }} />
      {place !== undefined && <Mark place={place} box={box} height={height} />}
    </div>
  );
}

/** A weld thread beside the band in hand. Decorative: the row of the band says the same. */
function Mark({ place, box, height }: { readonly place: BandPlace; readonly box: ClothBox; readonly height: number }) {
  const top = box.top + place.top;
  const high = Math.max(5, place.height);
  return (
    <svg className="band-mark" viewBox={`0 0 14 ${String(height)}`} width="14" height={height} aria-hidden="true">
      <path className="fill-weld-edge" d={`M5 ${top.toFixed(1)}h7v${high.toFixed(1)}h-7z`} />
      <path className="fill-weld" d={`M6 ${top.toFixed(1)}h5v${high.toFixed(1)}h-5z`} />
    </svg>
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
