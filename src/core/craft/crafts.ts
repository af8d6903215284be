/**
 * Every craft a piece can be made in. A further one is a further line here and in `planners.ts`, and its folder beside
 * this file; its figures, if any have been drawn, are a line in `figures/figure-kinds.ts`.
 */
import type { Craft, MadeOf } from '#core/craft/craft.ts';
import { DYEING } from '#core/craft/dyeing/craft.ts';
import { FRAME_LOOM } from '#core/craft/frame-loom/craft.ts';
import { MACRAME } from '#core/craft/macrame/craft.ts';
import { RIGID_HEDDLE } from '#core/craft/rigid-heddle/craft.ts';

export const CRAFTS = {
  'frame-loom': FRAME_LOOM,
  macrame: MACRAME,
  dyeing: DYEING,
  'rigid-heddle': RIGID_HEDDLE,
} as const;

export type CraftName = keyof typeof CRAFTS;

export const CRAFT_NAMES = Object.keys(CRAFTS) as [CraftName, ...CraftName[]];

/** The piece of one craft, and its plan. */
export type PieceIn<N extends CraftName> = (typeof CRAFTS)[N] extends Craft<infer P, infer _L> ? P : never;
export type PlanIn<N extends CraftName> = (typeof CRAFTS)[N] extends Craft<infer _P, infer L> ? L : never;

/** A piece of any craft; its `craft` tells which. */
export type Piece = { [N in CraftName]: PieceIn<N> }[CraftName];
export type Plan = { [N in CraftName]: PlanIn<N> }[CraftName];

/** The plan a piece of this kind has. */
export type PlanFor<P extends Piece> = P extends Piece ? PlanIn<P['craft']> : never;
/** A piece with the plan that was reckoned from it. */
export type Made<P extends Piece = Piece> = P extends Piece ? MadeOf<P, PlanFor<P>> : never;

export function craftOf({ craft }: { readonly craft: CraftName }): Craft<Piece, Plan> {
  return CRAFTS[craft];
}

/** Narrows a piece with its plan to those of one craft. */
export function isMadeIn<N extends CraftName, M extends MadeOf<Piece, Plan>>(name: N, made: M): made is M & MadeOf<PieceIn<N>, PlanIn<N>> {
  return made.piece.craft === name;
}
