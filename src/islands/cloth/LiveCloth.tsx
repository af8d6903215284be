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

interface LiveClothProps {
  readonly drawn: LayeredCloth;
  /** What a band is known by while it changes its place among the others. */
  readonly idOf: (band: number) => number | undefined;
}

/** A cloth that changes under the hands: a band that looks otherwise is put in anew, one that only lies elsewhere is moved. */
export function LiveCloth({ drawn: { width, height, layers, words }, idOf }: LiveClothProps) {
  return (
    <div className="cloth">
      <svg viewBox={`0 0 ${num(width)} ${num(height)}`} width={num(width)} height={num(height)} fill="none" role="img" aria-label={words}>
        {layers.map(({ of, x, y, markup }) => <Laid key={typeof of === 'number' ? idOf(of) : of} at={`translate(${num(x)} ${num(y)})`} markup={markup} />)}
      </svg>
    </div>
  );
}

// The markup is our own: checked colours, no words, no scripts.
const Laid = memo(function Laid({ at, markup }: { readonly at: string; readonly markup: string }) {
  const html = useMemo(() => ({ __html: markup }), [markup]);
  return <g transform={at} dangerouslySetInnerHTML={html} />;
});
