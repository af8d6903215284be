/** How a yarn bends between two crossings, and how long that makes it. */
import { straightPart, type WaveRange } from '#core/craft/crimp.ts';
import { from, type Notebook } from '#core/craft/show-how/notebook.ts';
import { RULES } from '#core/craft/show-how/sources.ts';
import type { Working, WorkingInput } from '#core/craft/show-how/working.ts';

/** Both spacings and the sum of both diameters, each under the symbol it has in every formula here. */
export interface Crossed {
  /** From end to end. */
  readonly p1: WorkingInput;
  /** From row to row. */
  readonly p2: WorkingInput;
  readonly D: WorkingInput;
}

/** A root that a jam brings to 0, or by rounding a hair below it. */
const rootOf = (square: string, isOverZero: boolean): string => (isOverZero ? `sqrt(${square})` : `sqrt(max(0, ${square}))`);

const as = (symbol: string, input: WorkingInput): WorkingInput => ({ ...input, symbol });

export function noteWaveRange(book: Notebook, ids: { readonly min: string; readonly max: string }, { p1, p2, D }: Crossed, range: WaveRange): { readonly min: Working; readonly max: Working } {
  const min = book.note({
    id: ids.min, name: 'lowest wave of the weft', formula: rootOf('D * D - p2 * p2', range.min > 0), inputs: [D, as('p2', p2)],
    value: range.min, unit: 'mm', ...RULES.peirce,
  });
  const max = book.note({
    id: ids.max, name: 'highest wave of the weft', formula: `max(a, D - ${rootOf('D * D - p1 * p1', Number(D.value) > Number(p1.value))})`, inputs: [from('a', min), D, as('p1', p1)],
    value: range.max, unit: 'mm', ...RULES.peirce,
  });
  return { min, max };
}

export interface BentYarn {
  /** Of the ids: `weft.` */
  readonly prefix: string;
  /** As in `straight part of the weft`. */
  readonly of: string;
  /** What the length between two crossings is called: `stepMm` in a plan, `lengthMm` in an answer. */
  readonly lengthId: 'stepMm' | 'lengthMm';
  readonly spacing: WorkingInput;
  readonly D: WorkingInput;
  readonly wave: WorkingInput;
  readonly lengthMm: number;
  readonly angleRad: number;
  readonly crimp: number;
}

/** Straight part, angle, length and crimp; answers the workings of the latter two. */
export function noteBend(book: Notebook, yarn: BentYarn): { readonly length: Working; readonly crimp: Working } {
  const { prefix, of } = yarn;
  const [p, D, h] = [as('p', yarn.spacing), yarn.D, as('h', yarn.wave)];
  const straightMm = straightPart(Number(yarn.spacing.value), Number(yarn.D.value), Number(yarn.wave.value)) ?? 0;
  const straight = book.note({
    id: `${prefix}straightMm`, name: `straight part of the ${of} between two crossings`, formula: rootOf('p * p + h * h - 2 * D * h', straightMm > 0), inputs: [p, D, h],
    value: straightMm, unit: 'mm', ...RULES.peirce,
  });
  const angle = book.note({
    id: `${prefix}angleRad`, name: `steepest angle of the ${of}`, formula: 'max(0, atan2(D, L) - atan2(D - h, p))', inputs: [D, from('L', straight), h, p],
    value: yarn.angleRad, unit: 'rad', ...RULES.peirce,
  });
  const length = book.note({
    id: `${prefix}${yarn.lengthId}`, name: `${of} from one crossing to the next`, formula: 'L + D * theta', inputs: [from('L', straight), D, from('theta', angle)],
    value: yarn.lengthMm, unit: 'mm', ...RULES.peirce,
  });
  const crimp = book.note({
    id: `${prefix}crimp`, name: `take-up of the ${of}`, formula: 'l / p - 1', inputs: [from('l', length), p],
    value: yarn.crimp, unit: 'share', ...RULES.peirce,
  });
  return { length, crimp };
}
