/** The rod a piece hangs from: the thinnest that does not sag. */
import { HANGING } from '#core/craft/defaults.ts';
import { from, standing, type Notebook } from '#core/craft/show-how/notebook.ts';
import { DEFAULTS, RULES } from '#core/craft/show-how/sources.ts';
import type { Working, WorkingInput } from '#core/craft/show-how/working.ts';

/** The sag of 5mgL³/(384EI) with I = πd⁴/64, solved for d. */
const LEAST_ROD = '1000 * (64 / pi * 5 * (m / 1000 * 9.80665) * (s / 1000)^2 * q / (384 * E))^(1 / 4)';

/** `span` under the symbol `s`. */
export function noteLeastRod(book: Notebook, id: string, name: string, mass: Working, span: WorkingInput, value: number): void {
  book.note({
    id, name, formula: LEAST_ROD,
    inputs: [from('m', mass), span, standing({ symbol: 'q', name: 'span over sag', value: HANGING.sagLimit, unit: 'ratio' }, DEFAULTS.sagLimit), standing({ symbol: 'E', name: 'stiffness of the wood', value: HANGING.modulusPa, unit: 'Pa' }, DEFAULTS.modulus)],
    value, unit: 'mm', ...RULES.beam,
  });
}
