/**
 * The engine of each craft by itself, without its words, figures and drawings: what a
 * browser loads to reckon a piece. `crafts.ts` hangs everything else on the same names.
 */
import type { CraftName, CRAFTS } from '#core/craft/crafts.ts';
import { planDyeing } from '#core/craft/dyeing/plan-dyeing.ts';
import { planFrameLoom } from '#core/craft/frame-loom/plan-frame-loom.ts';
import { planMacrame } from '#core/craft/macrame/plan-macrame.ts';
import { planHeddle } from '#core/craft/rigid-heddle/plan-heddle.ts';

export const PLANNERS: { readonly [N in CraftName]: (typeof CRAFTS)[N]['plan'] } = {
  'frame-loom': planFrameLoom,
  macrame: planMacrame,
  dyeing: planDyeing,
  'rigid-heddle': planHeddle,
};

export const PLANNED_CRAFTS = Object.keys(PLANNERS) as [CraftName, ...CraftName[]];
