/** Dyeing with plants. */
import { massOf } from '#core/craft/amounts/amount-types.ts';
import type { Craft, MadeOf, Material } from '#core/craft/craft.ts';
import { AGENT_WORDS, AMOUNTS, amountIn } from '#core/craft/dyeing/amounts.ts';
import { DYE_CAUTIONS } from '#core/craft/dyeing/cautions.ts';
import { drawDyeing } from '#core/craft/dyeing/draw.ts';
import type { DyePiece, DyePlan } from '#core/craft/dyeing/piece.ts';
import { planDyeing, readDyeing } from '#core/craft/dyeing/plan-dyeing.ts';
import { amountText } from '#core/units/format-amount.ts';
import type { Units } from '#core/units/units.ts';

type Made = MadeOf<DyePiece, DyePlan>;

const materials = ({ plan }: Made): Material[] => plan.steps.flatMap(({ agents }) => agents.map(({ agent, massG }) => ({ key: `agent.${agent}`, name: AGENT_WORDS[agent], grams: massG })));
const fibre = ({ piece }: Made, units: Units): string => `${amountText(massOf(piece.fibre.massG), units)} of ${piece.fibre.label ?? piece.fibre.kind.replace('other-', '')}`;

export const DYEING: Craft<DyePiece, DyePlan> = {
  words: {
    label: 'Natural dyeing', hours: 'at the pots', needs: 'No loom, pots that never touch food', material: 'To weigh', allMaterial: 'All of it together', made: 'dyed', search: 'natural dyeing dye plants mordant',
  },
  cautions: DYE_CAUTIONS,
  example: { craft: 'dyeing', fibre: { kind: 'wool', massG: 250 }, mordant: { agent: 'alum' }, tartar: {}, dye: { percent: 100, label: 'Weld', colour: '#c9a83a' }, iron: {} },
  plan: planDyeing,
  read: readDyeing,
  amounts: AMOUNTS,
  ownNames: () => ({ agent: Object.keys(AGENT_WORDS) }),
  amount: amountIn,
  materials,
  roleOfKey: () => undefined,
  draw: drawDyeing,
  change: (pattern) => pattern,
  tellChanges: () => [],
  summary: (made, units) => `${fibre(made, units)}, ${String(made.plan.steps.length)} baths`,
  size: fibre,
  leastInsideMm: () => undefined,
};
