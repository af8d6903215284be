import { memo, useDeferredValue, useMemo } from 'react';
import { clothPieceOf } from '#core/craft/cloth/cloth-piece-of.ts';
import type { PieceSection } from '#core/reckoner/answer-piece.ts';
import type { Units } from '#core/units/units.ts';
import { Cloth } from '#islands/cloth/Cloth.tsx';
import { Flag } from '#islands/ui/Flag.tsx';

/** The piece as it will hang, and that it fits. Its picture follows in the frame after the numbers. */
export const PieceSum = memo(function PieceSum({ made, units }: { made: NonNullable<PieceSection['made']>; units: Units }) {
  const drawn = useDeferredValue(made);
  const cloth = useMemo(() => clothPieceOf(drawn.piece, drawn.plan, 'This piece'), [drawn]);
  const view = useMemo(() => ({ id: 'reckoned', as: 'hanging', width: 220, units }) as const, [units]);
  return (
    <div className="mb-5 grid gap-4">
      <Cloth piece={cloth} view={view} />
      <p><Flag kind="on">It fits this frame</Flag></p>
    </div>
  );
});
