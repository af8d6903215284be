/** The amounts a piece tells, for a teacher to choose from by name: each with what it is at present. */
import { amountOf, keysTold } from '#core/craft/amounts.ts';
import { craftOf, type Piece, type Plan } from '#core/craft/crafts.ts';
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

/** Groups in the order of the craft; empty groups are left out. */
export function amountChoices(piece: Piece, plan: Plan, units: Units): AmountGroup[] {
  return craftOf(piece).amounts.flatMap(({ title, keys }) => {
    const choices = keysTold(keys, piece, plan).flatMap((key): AmountChoice[] => {
      const amount = amountOf(key, piece, plan);
      return amount.ok ? [{ key, label: labelOf(key, amount.value.label), text: amountText(amount.value, units) }] : [];
    });
    return choices.length === 0 ? [] : [{ title, choices }];
  });
}

/** Two roles may have yarn of one name, so the role is told with it. */
function labelOf(key: string, label: string): string {
  const [subject, role] = key.split('.');
  return subject === 'yarn' && role !== undefined ? `${label} (${role})` : label;
}
