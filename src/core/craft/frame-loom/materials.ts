/** What a woven piece is bought of: its warp and its weft yarns. */
import type { MadeOf, Material } from '#core/craft/craft.ts';
import type { FrameLoomPiece, Yarn } from '#core/craft/piece.ts';
import type { FrameLoomPlan, WarpPlan } from '#core/craft/plan-types.ts';
import { gramsInHand } from '#core/craft/purchase.ts';

function material(key: string, name: string, yarn: Yarn, plan: WarpPlan): Material {
  const { label, colour } = yarn;
  return {
    key, name, yarn, lengthMm: plan.withMarginMm, grams: gramsInHand(plan),
    ...(label === undefined ? {} : { label }), ...(colour === undefined ? {} : { colour }), ...(plan.balls === undefined ? {} : { balls: plan.balls }),
  };
}

/** Warp first, then the weft yarns in the order in which the piece names them. */
export function materials({ piece, plan }: MadeOf<FrameLoomPiece, FrameLoomPlan>): Material[] {
  const wefts = Object.entries(piece.yarns).flatMap(([role, yarn]): Material[] => {
    const planned = plan.yarns[role];
    return planned === undefined ? [] : [{ ...material(`yarn.${role}`, role, yarn, planned), role }];
  });
  return [material('warp', 'Warp', piece.warp.yarn, plan.warp), ...wefts];
}
