/** Hours that are added up from pieces of work, and what quick and slow hands make of them. */
import { PACE } from '#core/craft/defaults.ts';
import type { Hours } from '#core/craft/plan-types.ts';
import { from, standing, type Notebook, type Standing } from '#core/craft/show-how/notebook.ts';
import { DEFAULTS, RULES } from '#core/craft/show-how/sources.ts';
import type { WorkingInput, WorkingUnit } from '#core/craft/show-how/working.ts';

/** A rate nobody gave. */
export const pace = (symbol: string, name: string, value: number, unit: WorkingUnit = 'per-hour', source: Standing = DEFAULTS.pace): WorkingInput => standing({ symbol, name, value, unit }, source);

export function noteHoursInAll(book: Notebook, hours: Hours, formula: string, inputs: readonly WorkingInput[]): void {
  const likely = book.note({ id: 'hours.likely', name: 'hours of work', formula, inputs, value: hours.likely, unit: 'h', ...RULES.arithmetic });
  for (const [id, factor, words] of [['low', PACE.lowFactor, 'a quick hand'], ['high', PACE.highFactor, 'a slow hand']] as const) {
    book.note({ id: `hours.${id}`, name: `hours of work, ${words}`, formula: 'h * k', inputs: [from('h', likely), pace('k', `share that ${words} takes`, factor, 'ratio')], value: hours[id], unit: 'h', ...RULES.pace });
  }
}
