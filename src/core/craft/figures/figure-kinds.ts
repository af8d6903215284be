/**
 * The technique figures a lesson can ask for by name, by craft. They stand apart from the crafts themselves, so that a
 * page which reckons and draws a piece loads none of them.
 */
import type { CraftName, PieceIn, PlanIn } from '#core/craft/crafts.ts';
import type { Figure } from '#core/craft/figures/figure.ts';
import { FIGURES as OF_WEAVING } from '#core/craft/frame-loom/figures.ts';
import { FIGURES as OF_KNOTTING } from '#core/craft/macrame/figures.ts';

/** A craft without a line here has no figures. */
export const FIGURES = { 'frame-loom': OF_WEAVING, macrame: OF_KNOTTING } as const satisfies {
  readonly [N in CraftName]?: Readonly<Record<string, Figure<PieceIn<N>, PlanIn<N>>>>;
};

export type FigureCraft = keyof typeof FIGURES;
export type FigureKind = { [N in FigureCraft]: keyof (typeof FIGURES)[N] }[FigureCraft];

/** In the order of the crafts. */
export const FIGURE_KINDS = Object.values(FIGURES).flatMap((figures) => Object.keys(figures)) as [FigureKind, ...FigureKind[]];

export function isFigureKind(name: string): name is FigureKind {
  return FIGURE_KINDS.some((kind) => kind === name);
}
