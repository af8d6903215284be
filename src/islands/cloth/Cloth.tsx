/** The cloth inside an island: drawn in the browser exactly as the server draws it. */
import { useMemo } from 'react';
import type { ClothPiece } from '#core/craft/cloth/cloth-piece.ts';
import type { ClothView } from '#core/craft/cloth/cloth-view.ts';
import { drawCloth } from '#core/craft/cloth/draw-cloth.ts';

interface ClothProps {
  readonly piece: ClothPiece;
  /** `id` must be the same on server and browser, and only this cloth's on the page. */
  readonly view: ClothView;
  readonly className?: string;
}

export function Cloth({ piece, view, className }: ClothProps) {
  const markup = useMemo(() => ({ __html: drawCloth(piece, view) }), [piece, view]);
  // The markup is our own: checked colours, escaped words, no scripts.
  return <div className={className === undefined ? 'cloth' : `cloth ${className}`} dangerouslySetInnerHTML={markup} />;
}
