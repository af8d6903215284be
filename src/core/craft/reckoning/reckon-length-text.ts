/** A length as it is written for makers. */
import type { Fields } from '#core/craft/reading/fields.ts';
import { lengthText } from '#core/units/format-amount.ts';

export interface LengthTextAnswer {
  readonly text: string;
}

export function reckonLengthText(fields: Fields): LengthTextAnswer | undefined {
  const read = fields.findings.soundly(() => ({
    mm: fields.number('mm', { name: 'Length', min: 0, max: 1e9, unit: 'mm' }),
    system: fields.choice('system', 'System', ['imperial', 'metric']),
    round: fields.choice('round', 'Rounding', ['nearest', 'up']),
  }));
  fields.end();
  return read && { text: lengthText(read.mm, read.system, read.round) };
}
