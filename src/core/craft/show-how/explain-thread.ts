/** How thick a yarn is: from its label to both diameters of its strands taken together. */
import { LOFT_RATIO } from '#core/craft/defaults.ts';
import type { Yarn } from '#core/craft/piece.ts';
import { from, given, standing, type Notebook } from '#core/craft/show-how/notebook.ts';
import { DEFAULTS, RULES } from '#core/craft/show-how/sources.ts';
import type { Working, WorkingInput } from '#core/craft/show-how/working.ts';
import { classOf } from '#core/craft/yarn/classes.ts';
import { COUNT_SYSTEMS, countFromTex, metresPer100gFromTex, yardsPerPoundFromTex } from '#core/craft/yarn/count.ts';
import { readCount } from '#core/craft/yarn/count-text.ts';
import { ashenhurstNumber, compressedDiameter } from '#core/craft/yarn/diameter.ts';
import { gristOf, isKnownByClass, threadOf } from '#core/craft/yarn/thread.ts';

export interface YarnPlace {
  /** Of the ids: `''`, or `yarns.A.` */
  readonly prefix: string;
  /** Where the yarn stands in what was asked, as a JSON pointer. */
  readonly path: string;
  readonly yarn: Yarn;
  /** Stands in where the yarn does not say its own K. */
  readonly defaultK: number;
}

/** The workings of a yarn that others go on from. */
export interface ThreadWorkings {
  readonly tex: Working;
  readonly compressed: Working;
  readonly loft: Working;
  readonly strandLoft: Working;
  readonly strands: WorkingInput;
}

function countInputs({ yarn }: YarnPlace, text: string): { readonly formula: string; readonly inputs: readonly WorkingInput[] } {
  const read = yarn.count && readCount(text, yarn.count.system, yarn.fibre);
  if (yarn.count === undefined || read === undefined) throw new Error(`not a count: ${text}`);
  const { kind, texOfOne, label } = COUNT_SYSTEMS[yarn.count.system];
  const trust = gristOf(yarn).trust;
  const onLabel = { source: `read from “${text}”, ${label}${read.doubt === undefined ? '' : '; sellers write such a count in more than one way'}`, trust };
  const count = standing({ symbol: 'N', name: 'count', value: read.count, unit: 'ratio' }, onLabel);
  const one = standing({ symbol: 'c', name: 'tex of a yarn whose count is 1', value: texOfOne, unit: 'tex' }, RULES.yarnNumbers);
  const single = kind === 'direct' ? 'c * N' : 'c / N';
  if (read.doubt === 'silk' || read.plies === 1) return { formula: single, inputs: [one, count] };
  const plies = standing({ symbol: 'n', name: 'plies', value: read.plies, unit: 'count' }, onLabel);
  return { formula: `n * ${single}`, inputs: [plies, one, count] };
}

function gristInputs(place: YarnPlace): { readonly formula: string; readonly inputs: readonly WorkingInput[] } {
  const { path, yarn } = place;
  if (yarn.tex !== undefined) {
    return { formula: 'T', inputs: [given({ symbol: 'T', name: 'tex', value: yarn.tex, unit: 'tex' }, `${path}/tex`, 'label')] };
  }
  if (yarn.metresPer100g !== undefined) {
    const metres = given({ symbol: 'L', name: 'metres in 100 g', value: yarn.metresPer100g, unit: 'm-per-100g' }, `${path}/metresPer100g`, 'label');
    return { formula: '100000 / L', inputs: [metres] };
  }
  if (yarn.ball === undefined) {
    if (yarn.count !== undefined) return countInputs(place, yarn.count.text);
    return { formula: '100000 / L', inputs: [standing({ symbol: 'L', name: 'metres in 100 g, middle of its class', value: classOf(yarn.class).middle.metresPer100g, unit: 'm-per-100g' }, RULES.yarnClass)] };
  }
  return {
    formula: '1000 * B / L',
    inputs: [
      given({ symbol: 'B', name: 'grams of a ball', value: yarn.ball.grams, unit: 'g' }, `${path}/ball/grams`, 'label'),
      given({ symbol: 'L', name: 'metres in a ball', value: yarn.ball.metres, unit: 'm' }, `${path}/ball/metres`, 'label'),
    ],
  };
}

/** One strand, beaten or under tension. */
function noteStrand(book: Notebook, { prefix, path, yarn, defaultK }: YarnPlace, tex: Working): Working {
  const value = yarn.ashenhurstK ?? defaultK;
  const K = { symbol: 'K', name: 'Ashenhurst’s K', value, unit: 'ratio' } as const;
  const k = yarn.ashenhurstK === undefined ? standing(K, DEFAULTS.ashenhurstK) : given(K, `${path}/ashenhurstK`, 'formula');
  const yards = book.note({
    id: `${prefix}yardsPerPound`, name: 'yards in a pound', formula: '1133980925 / 2286 / T', inputs: [from('T', tex)],
    value: yardsPerPoundFromTex(tex.value), unit: 'yd-per-lb', ...RULES.yarnNumbers,
  });
  const threads = book.note({
    id: `${prefix}threadsPerInch`, name: 'threads that lie side by side in an inch', formula: 'K * sqrt(Y)', inputs: [k, from('Y', yards)],
    value: ashenhurstNumber(tex.value, value), unit: 'per-inch', ...RULES.ashenhurst,
  });
  return book.note({
    id: `${prefix}strandCompressedMm`, name: 'thickness of a strand, beaten down', formula: '25.4 / A', inputs: [from('A', threads)],
    value: compressedDiameter(tex.value, value), unit: 'mm', ...RULES.ashenhurst,
  });
}

/** One strand lying free: from wraps where they were counted. */
function noteStrandLoft(book: Notebook, { prefix, path, yarn }: YarnPlace, strand: Working, value: number): Working {
  const what = { id: `${prefix}strandLoftMm`, name: 'thickness of a strand, lying free', value, unit: 'mm' } as const;
  if (yarn.wrapsPerInch !== undefined) {
    const wraps = given({ symbol: 'w', name: 'wraps in an inch', value: yarn.wrapsPerInch, unit: 'per-inch' }, `${path}/wrapsPerInch`, 'measured');
    return book.note({ ...what, formula: '25.4 / w', inputs: [wraps], ...RULES.wraps });
  }
  if (yarn.freeDiameterMm !== undefined) {
    const measured = given({ symbol: 'd', name: 'thickness of a strand, measured', value: yarn.freeDiameterMm, unit: 'mm' }, `${path}/freeDiameterMm`, 'measured');
    return book.note({ ...what, formula: 'd', inputs: [measured], ...RULES.asGiven });
  }
  if (yarn.class !== undefined && isKnownByClass(yarn)) {
    const wraps = standing({ symbol: 'w', name: 'wraps in an inch, middle of its class', value: classOf(yarn.class).middle.wrapsPerInch, unit: 'per-inch' }, RULES.yarnClass);
    return book.note({ ...what, formula: '25.4 / w', inputs: [wraps], ...RULES.wraps });
  }
  const ratio = standing({ symbol: 'k', name: 'loft over beaten thickness', value: LOFT_RATIO, unit: 'ratio' }, RULES.loftRatio);
  return book.note({ ...what, formula: 'k * d', inputs: [ratio, from('d', strand)], ...RULES.loftRatio });
}

/** Writes down tex and both diameters; the yarn has been read. */
export function noteThread(book: Notebook, place: YarnPlace): ThreadWorkings {
  const { prefix, path, yarn, defaultK } = place;
  const thread = threadOf(yarn, defaultK);
  const tex = book.note({ id: `${prefix}tex`, name: 'grams in a kilometre of one strand', ...gristInputs(place), value: thread.tex, unit: 'tex', ...RULES.yarnNumbers });
  const strand = noteStrand(book, place, tex);
  const strandLoft = noteStrandLoft(book, place, strand, thread.strandLoftMm);
  const m = { symbol: 'm', name: 'strands together', value: thread.strands, unit: 'count' } as const;
  const strands = yarn.strands === undefined ? standing(m, DEFAULTS.oneStrand) : given(m, `${path}/strands`, 'counted');
  const together = (id: string, name: string, one: Working, value: number): Working =>
    book.note({ id: `${prefix}${id}`, name, formula: 'sqrt(m) * d', inputs: [strands, from('d', one)], value, unit: 'mm', ...RULES.together });
  return {
    tex,
    compressed: together('compressedDiameterMm', 'thickness, beaten down', strand, thread.compressedMm),
    loft: together('loftDiameterMm', 'thickness, lying free', strandLoft, thread.loftMm),
    strandLoft,
    strands,
  };
}

/** The count of one strand in each system that is in use, by the key the answer has it under. */
const COUNTS = { denier: 'denier', nm: 'nm', neCotton: 'ne-cotton', neWorsted: 'ne-worsted', lea: 'lea', run: 'run' } as const;

/** The same yarn in every other way of counting it. */
export function noteCounts(book: Notebook, tex: Working): void {
  book.note({
    id: 'metresPer100g', name: 'metres in 100 g', formula: '100000 / T', inputs: [from('T', tex)],
    value: metresPer100gFromTex(tex.value), unit: 'm-per-100g', ...RULES.yarnNumbers,
  });
  for (const [id, system] of Object.entries(COUNTS)) {
    const { kind, label, texOfOne } = COUNT_SYSTEMS[system];
    const one = standing({ symbol: 'c', name: 'tex of a yarn whose count is 1', value: texOfOne, unit: 'tex' }, RULES.yarnNumbers);
    book.note({
      id, name: label, formula: kind === 'direct' ? 'T / c' : 'c / T', inputs: [from('T', tex), one],
      value: countFromTex(tex.value, system), unit: 'ratio', ...RULES.yarnNumbers,
    });
  }
}

/** Plies as the label tells them; 1 where it does not. */
export function notePlies(book: Notebook, yarn: Yarn): void {
  const { plies, trust } = gristOf(yarn);
  const read = standing({ symbol: 'n', name: 'plies', value: plies, unit: 'count' }, { source: yarn.count === undefined ? 'not told' : `read from “${yarn.count.text}”`, trust });
  book.note({ id: 'plies', name: 'plies', formula: 'n', inputs: [read], value: plies, unit: 'count', ...RULES.asGiven });
}
