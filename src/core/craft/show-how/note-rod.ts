/** The rod a piece hangs from and its cord: the thinnest that does not sag, how long, how hard it pulls. */
import { HANGING } from '#core/craft/defaults.ts';
import { from, given, standing, WEIGHS_NOTHING, type Notebook } from '#core/craft/show-how/notebook.ts';
import { DEFAULTS, RULES } from '#core/craft/show-how/sources.ts';
import type { Working, WorkingInput } from '#core/craft/show-how/working.ts';

/** The sag of 5mgL³/(384EI) with I = πd⁴/64, solved for d. */
const LEAST_ROD = '1000 * (64 / pi * 5 * (m / 1000 * 9.80665) * (s / 1000)^2 * q / (384 * E))^(1 / 4)';

/** `mass` under the symbol `m`, `span` under `s`. */
export function noteLeastRod(book: Notebook, id: string, name: string, mass: WorkingInput, span: WorkingInput, value: number): Working {
  return book.note({
    id, name, formula: LEAST_ROD,
    inputs: [mass, span, standing({ symbol: 'q', name: 'span over sag', value: HANGING.sagLimit, unit: 'ratio' }, DEFAULTS.sagLimit), standing({ symbol: 'E', name: 'stiffness of the wood', value: HANGING.modulusPa, unit: 'Pa' }, DEFAULTS.modulus)],
    value, unit: 'mm', ...RULES.beam,
  });
}

/** `length` of the rod under the symbol `l`. */
export function noteSpan(book: Notebook, id: string, length: WorkingInput, value: number): Working {
  const inset = standing({ symbol: 'i', name: 'from a dowel end to its knot', value: HANGING.cordInsetMm, unit: 'mm' }, DEFAULTS.cord, WEIGHS_NOTHING);
  return book.note({ id, name: 'between the places where the cord is tied', formula: 'l - 2 * i', inputs: [length, inset], value, unit: 'mm', ...RULES.arithmetic });
}

/** `span` under the symbol `s`, how high the cord rises under `v`. */
export function noteCord(book: Notebook, id: string, span: WorkingInput, rise: WorkingInput, value: number): void {
  const knot = standing({ symbol: 'k', name: 'cord of one knot', value: HANGING.cordKnotMm, unit: 'mm' }, DEFAULTS.cord, WEIGHS_NOTHING);
  book.note({ id, name: 'hanging cord', formula: '2 * hypot(s / 2, v) + 2 * k', inputs: [span, rise, knot], value, unit: 'mm', ...RULES.euclid });
}

/** `mass` under the symbol `m`, `span` under `s`, how high the cord rises under `v`. */
export function noteCordTension(book: Notebook, id: string, mass: WorkingInput, span: WorkingInput, rise: WorkingInput, value: number): void {
  book.note({ id, name: 'pull on the cord', formula: 'm / 1000 * 9.80665 / (2 * sin(atan2(2 * v, s)))', inputs: [mass, rise, span], value, unit: 'N', ...RULES.forces });
}

/** `mass` under the symbol `m`. */
export function noteFixing(book: Notebook, id: string, mass: WorkingInput, value: number): void {
  const times = standing({ symbol: 'k', name: 'times the piece', value: HANGING.fixingFactor, unit: 'ratio' }, DEFAULTS.fixing, WEIGHS_NOTHING);
  book.note({ id, name: 'what the fixing in the wall must hold', formula: 'k * m', inputs: [times, mass], value, unit: 'g', ...RULES.arithmetic });
}

export interface AskedRod {
  readonly massG: number;
  readonly lengthMm: number;
  /** How high the cord rises over the rod. */
  readonly riseMm: number;
  /** From one thickness that is sold to the next. */
  readonly stockStepMm: number;
}

export interface AnsweredRod {
  readonly spanMm: number;
  readonly minDiameterMm: number;
  readonly stockMm: number;
  readonly cordMm: number;
  readonly cordTensionN: number;
  readonly fixingHoldsG: number;
}

/** The workings of a rod by itself; ids are the answer's own keys. */
export function noteRod(book: Notebook, asked: AskedRod, rod: AnsweredRod): void {
  const mass = given({ symbol: 'm', name: 'what hangs on it', value: asked.massG, unit: 'g' }, '/massG', 'measured');
  const rise = given({ symbol: 'v', name: 'how high the cord rises', value: asked.riseMm, unit: 'mm' }, '/riseMm', 'counted');
  const span = from('s', noteSpan(book, 'spanMm', given({ symbol: 'l', name: 'length of the rod', value: asked.lengthMm, unit: 'mm' }, '/lengthMm', 'counted'), rod.spanMm));
  const least = noteLeastRod(book, 'minDiameterMm', 'thinnest rod that does not sag', mass, span, rod.minDiameterMm);
  book.note({
    id: 'stockMm', name: 'thickness to buy', formula: 'ceil(max(d, t) / q - 1e-9) * q',
    inputs: [
      from('d', least), standing({ symbol: 't', name: 'thinnest that is sold straight', value: HANGING.leastStockMm, unit: 'mm' }, DEFAULTS.stock),
      standing({ symbol: 'q', name: 'from one thickness to the next', value: asked.stockStepMm, unit: 'mm' }, DEFAULTS.stock),
    ],
    value: rod.stockMm, unit: 'mm', ...RULES.arithmetic,
  });
  noteCord(book, 'cordMm', span, rise, rod.cordMm);
  noteCordTension(book, 'cordTensionN', mass, span, rise, rod.cordTensionN);
  noteFixing(book, 'fixingHoldsG', mass, rod.fixingHoldsG);
}
