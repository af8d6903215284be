import { memo, useMemo, useRef } from 'react';
import type { WovenPiece } from '#core/craft/cloth/cloth-piece.ts';
import { layerCloth, type LayeredCloth, type LayeredView } from '#core/craft/cloth/draw-cloth.ts';
import { num } from '#core/craft/cloth/markup.ts';

/** The piece in layers; bands that were drawn last time are not drawn again. */
export function useLayeredCloth(piece: WovenPiece, view: LayeredView): LayeredCloth {
  const before = useRef<LayeredCloth>(undefined);
  return useMemo(() => {
    before.current = layerCloth(piece, view, before.current);
    return before.current;
  }, [piece, view]);
}

/** Where a press chooses a band, in pixels of the picture. */
export interface BandPlace {
  readonly left: number;
  readonly top: number;
  readonly width: number;
  readonly height: number;
}

interface LiveClothProps {
  readonly drawn: LayeredCloth;
  /** What a band is known by while it changes its place among the others. */
  readonly idOf: (band: number) => number | undefined;
  readonly placeOf: (band: number) => BandPlace;
  readonly onChoose: (band: number) => void;
}

/** A cloth that changes under the hands: a band that looks otherwise is put in anew, one that only lies elsewhere is moved. */
export function LiveCloth({ drawn: { width, height, layers, words }, idOf, placeOf, onChoose }: LiveClothProps) {
  return (
    <div className="cloth">
      <svg viewBox={`0 0 ${num(width)} ${num(height)}`} width={num(width)} height={num(height)} fill="none" role="img" aria-label={words}>
        {layers.map(({ of, x, y, markup }) => {
          if (typeof of !== 'number') return <Laid key={of} at={moveTo(x, y)} markup={markup} />;
          const place = placeOf(of);
          return <LaidBand key={idOf(of)} band={of} at={moveTo(x, y)} markup={markup} left={num(place.left - x)} top={num(place.top - y)} width={num(place.width)} height={num(place.height)} onChoose={onChoose} />;
        })}
      </svg>
    </div>
  );
}

const moveTo = (x: number, y: number): string => `translate(${num(x)} ${num(y)})`;

// The markup is our own: checked colours, no words, no scripts.
const Laid = memo(function Laid({ at, markup }: { readonly at?: string; readonly markup: string }) {
  const html = useMemo(() => ({ __html: markup }), [markup]);
  return <g transform={at} dangerouslySetInnerHTML={html} />;
});

interface LaidBandProps {
  readonly band: number;
  readonly at: string;
  readonly markup: string;
  /** Of what is pressed, within the band: so it goes where the band goes. */
  readonly left: string;
  readonly top: string;
  readonly width: string;
  readonly height: string;
  readonly onChoose: (band: number) => void;
}

const LaidBand = memo(function LaidBand({ band, at, markup, left, top, width, height, onChoose }: LaidBandProps) {
  return (
    <g transform={at}>
      <Laid markup={markup} />
      <rect className="band-hit" x={left} y={top} width={width} height={height} onClick={() => { onChoose(band); }} />
    </g>
  );
});
