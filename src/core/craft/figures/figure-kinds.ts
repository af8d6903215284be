/** The technique figures a lesson can ask for by name: those of every craft. */
import { CRAFT_NAMES, CRAFTS, type CraftName } from '#core/craft/crafts.ts';

export type FigureKind = { [N in CraftName]: keyof (typeof CRAFTS)[N]['figures'] }[CraftName];

/** In the order of the crafts. */
export const FIGURE_KINDS = CRAFT_NAMES.flatMap((name) => Object.keys(CRAFTS[name].figures)) as [FigureKind, ...FigureKind[]];

export function isFigureKind(name: string): name is FigureKind {
  return FIGURE_KINDS.some((kind) => kind === name);
}
