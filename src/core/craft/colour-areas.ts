/** Weft of one row that several colours share, by the way neighbouring colours meet. */
import type { ShapeJoin } from '#core/craft/piece.ts';
import type { PickGeometry } from '#core/craft/picks.ts';

/** What lies beside an area: the selvedge, or another colour joined in some way. */
export type Edge = 'selvedge' | ShapeJoin;

export interface ColourArea {
  readonly ends: number;
  readonly left: Edge;
  readonly right: Edge;
}

type Step = Pick<PickGeometry, 'stepMm' | 'turnMm'>;

/**
 * Yarn one edge of an area costs beyond the steps between its ends. At a slit or a
 * selvedge the weft turns (every second row, so half a turn a row); dovetailed colours
 * turn on a shared end, which lends each of them half a step; interlocked ones hook into
 * each other in the gap.
 */
function edgeLength(edge: Edge, step: Step, weftDiameterMm: number): number {
  switch (edge) {
    case 'selvedge':
    case 'slit':
      return step.turnMm / 2;
    case 'dovetail':
      return (step.turnMm + step.stepMm) / 2;
    case 'interlock':
      return step.stepMm / 2 + (Math.PI * weftDiameterMm) / 4;
  }
}

/**
 * Weft of one area of one row; an area without ends needs none. Over a whole row of q
 * areas and E ends this comes to (E − q)l + qt with slits, (E − 1)l + qt dovetailed and
 * (E − 1)l + t + (q − 1)πd/2 interlocked.
 */
export function areaLength(area: ColourArea, step: Step, weftDiameterMm: number): number {
  if (area.ends === 0) return 0;
  return (
    (area.ends - 1) * step.stepMm + edgeLength(area.left, step, weftDiameterMm) + edgeLength(area.right, step, weftDiameterMm)
  );
}
