/** Hours of a plan for the eye. Hands differ, so the likely time never stands without its range near it. */
import type { Hours } from '#core/craft/plan-types.ts';
import { formatAmount, type AmountPart } from '#core/units/format-amount.ts';

/** `12½ h`, without the range that an amount of time carries at its end. */
export function likelyHours({ likely, low, high }: Hours): readonly AmountPart[] {
  return formatAmount({ kind: 'time', hours: likely, low, high }, 'cm').slice(0, -1);
}

/** `7 to 23 h`. */
export function hoursRange({ low, high }: Hours): string {
  return `${Math.floor(low)} to ${Math.ceil(high)}\u00a0h`;
}
