import { useMemo } from 'react';
import type { WovenPiece } from '#core/craft/cloth/cloth-piece.ts';
import type { ClothView } from '#core/craft/cloth/cloth-view.ts';
import { swatchOfYarn } from '#core/craft/cloth/swatch-of.ts';
import { Cloth } from '#islands/cloth/Cloth.tsx';

interface PatchProps {
  /** The band as it is woven; null while the piece cannot be reckoned, then its yarn is shown. */
  readonly patch: WovenPiece | null;
  readonly colour: string | undefined;
  readonly id: string;
}

export function Patch({ patch, colour, id }: PatchProps) {
  const plain = useMemo(() => swatchOfYarn(colour, '#d8d2c1', 8), [colour]);
  const view = useMemo((): ClothView => ({ id, as: 'swatch', width: 56, height: 44, decorative: true }), [id]);
  return <Cloth piece={patch ?? plain} view={view} className="swatch" />;
}
