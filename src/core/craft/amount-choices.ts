/** The amounts a piece tells, for a teacher to choose from by name: each with what it is at present. */
import { amountKeysOf, amountOf } from '#core/craft/amounts.ts';
import type { Piece } from '#core/craft/piece.ts';
import type { Plan } from '#core/craft/plan-types.ts';
import { amountText } from '#core/units/format-amount.ts';
import type { Units } from '#core/units/units.ts';

export interface AmountChoice {
  readonly key: string;
  /** `Fenwool 6/2, Estuary (shore)`: what it is, and whose where two could be taken for one. */
  readonly label: string;
  /** `29 m`: of the pattern piece. */
  readonly text: string;
}

export interface AmountGroup {
  readonly title: string;
  readonly choices: readonly AmountChoice[];
}

const TITLES = ['Size and loom', 'Warp', 'Yarns', 'Bands', 'Tools and time'] as const;

function titleOf(key: string): (typeof TITLES)[number] {
  const [subject] = key.split('.');
  if (subject === 'warp' || subject === 'ends' || subject === 'spacing') return 'Warp';
  if (subject === 'yarn') return 'Yarns';
  if (subject === 'band') return 'Bands';
  return subject === 'width' || subject === 'height' || subject === 'wound-width' || subject === 'loom' || subject === 'nails' ? 'Size and loom' : 'Tools and time';
}

/** Groups in the order in which a loom is set up; empty groups are left out. */
export function amountChoices(piece: Piece, plan: Plan, units: Units): AmountGroup[] {
  const choices = amountKeysOf(piece, plan).flatMap((key) => {
    const amount = amountOf(key, piece, plan);
    return amount.ok ? [{ key, label: labelOf(key, amount.value.label), text: amountText(amount.value, units) }] : [];
  });
  return TITLES.map((title) => ({ title, choices: choices.filter(({ key }) => titleOf(key) === title) })).filter((group) => group.choices.length > 0);
}

/** Two roles may have yarn of one name, so the role is told with it. */
function labelOf(key: string, label: string): string {
  const [subject, role] = key.split('.');
  return subject === 'yarn' && role !== undefined ? `${label} (${role})` : label;
}
