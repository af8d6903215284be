/** What a dyeing tells by the keys of amounts. */
import { massOf, type Quantity, type Reckoned } from '#core/craft/amounts/amount-types.ts';
import type { KeyGroup, MadeOf } from '#core/craft/craft.ts';
import type { DyeAgent, DyePiece, DyePlan } from '#core/craft/dyeing/piece.ts';

export const AGENT_WORDS: Readonly<Record<DyeAgent, string>> = {
  alum: 'Potash alum', tartar: 'Cream of tartar', 'aluminium-acetate': 'Aluminium acetate', tannin: 'Tannin', dye: 'Dyestuff', iron: 'Iron (ferrous sulphate)',
};

export const AMOUNTS: readonly KeyGroup[] = [
  { title: 'Fibre and baths', keys: ['fibre', 'bath', 'baths'] },
  { title: 'To weigh', keys: ['agent.<agent>'] },
  { title: 'Time', keys: ['hours'] },
];

const RECIPES = 'published recipes; try a swatch';

/** The amount of a key, or a sentence why this piece has none. */
export function amountIn(key: string, { piece, plan }: MadeOf<DyePiece, DyePlan>): Reckoned | string {
  const told = (label: string, quantity: Quantity, formula: string, source: string): Reckoned => ({ label, quantity, how: { formula, inputs: [{ name: 'dry fibre', value: massOf(piece.fibre.massG) }], source, trust: 'formula' } });
  const { likely, low, high } = plan.hours;
  if (key === 'fibre') return told(piece.fibre.label ?? 'Dry fibre', massOf(piece.fibre.massG), 'as the piece says', 'the piece');
  if (key === 'bath') return told('Litres of one bath', { kind: 'count', count: Math.round(plan.bathLitres * 10) / 10, one: 'litre', many: 'litres' }, 'kilograms of dry fibre × litres a kilogram', 'common practice');
  if (key === 'baths') return told('Baths', { kind: 'count', count: plan.steps.length, one: 'bath', many: 'baths' }, 'scouring, then one for each step', RECIPES);
  if (key === 'hours') return told('Hours of work', { kind: 'time', hours: likely, low, high }, 'baths × hands at work in each, without the time it stands', 'common practice');
  const [subject, name] = key.split('.');
  const used = plan.steps.flatMap(({ agents }) => agents).find(({ agent }) => agent === name);
  if (subject !== 'agent' || name === undefined) return `No amount is called “${key}”.`;
  return used === undefined ? `This dyeing uses no “${name}”.` : told(AGENT_WORDS[used.agent], massOf(used.massG), `dry fibre × ${String(used.percent)} %`, RECIPES);
}
