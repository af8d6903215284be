/**
 * Reading a count off a label. Which of the two numbers of `8/2` tells the plies
 * differs by trade: cotton and linen write the count first, worsted, woollen and
 * metric yarns mostly write the plies first, and shops are not always faithful to it.
 */
import type { CountSystem } from '#core/craft/piece.ts';
import { texFromCount } from '#core/craft/yarn/count.ts';

export interface ReadCount {
  readonly count: number;
  readonly plies: number;
  /** Of the yarn as it is, all plies together. */
  readonly tex: number;
  /** Why the reading should be confirmed by the person, if it should. */
  readonly doubt?: 'which-is-plies' | 'silk';
}

const COUNT_TEXT = /^\s*(\d{1,6}(?:[.,]\d{1,6})?)\s*(?:\/\s*(\d{1,4})\s*)?$/;

interface TwoNumbers {
  readonly count: number;
  readonly plies: number;
  readonly doubtful: boolean;
}

/** Cotton and linen: `8/2` is two plies of 8. A small number before a larger one is most likely the plies after all. */
function countFirst(a: number, b: number): TwoNumbers {
  const liesReversed = a >= 2 && a <= 4 && b > a && Number.isInteger(a);
  return liesReversed ? { count: b, plies: a, doubtful: true } : { count: a, plies: b, doubtful: false };
}

/** Worsted, woollen and metric: the smaller number is the plies, in whichever place. */
function smallerIsPlies(a: number, b: number): TwoNumbers {
  const doubtful = a === b || (a <= 6 && b <= 6);
  return b <= a ? { count: a, plies: b, doubtful } : { count: b, plies: a, doubtful };
}

/** Denier, decitex, jute, grain: the weight first. More than a dozen "plies" are more likely filaments of one thread. */
function weightFirst(a: number, b: number): TwoNumbers {
  return b > 12 ? { count: a, plies: 1, doubtful: true } : { count: a, plies: b, doubtful: false };
}

const READERS: Readonly<Record<Exclude<CountSystem, 'spun-silk'>, (a: number, b: number) => TwoNumbers>> = {
  'ne-cotton': countFirst,
  lea: countFirst,
  'ne-worsted': smallerIsPlies,
  run: smallerIsPlies,
  nm: smallerIsPlies,
  yorkshire: smallerIsPlies,
  denier: weightFirst,
  dtex: weightFirst,
  jute: weightFirst,
  grain: weightFirst,
};

/**
 * Reads `16`, `8/2` or `2/16`. Answers undefined for anything else, zero included.
 *
 * Spun silk counted in the cotton system names the folded yarn by the old English rule
 * (40/2 is 40 hanks of two 80s, J. T. Taylor p. 239), yet many sellers now write it as
 * other yarns: read by the old rule, and to be asked.
 */
export function readCount(text: string, system: CountSystem, fibre?: string): ReadCount | undefined {
  const match = COUNT_TEXT.exec(text);
  if (match?.[1] === undefined) return undefined;
  const first = Number(match[1].replace(',', '.'));
  const second = match[2] === undefined ? 1 : Number(match[2]);
  if (first === 0 || second === 0) return undefined;
  if (match[2] === undefined) return { count: first, plies: 1, tex: texFromCount(first, system) };
  // Sellers of silk write the cotton count, too.
  if (system === 'spun-silk' || (system === 'ne-cotton' && /\bsilk\b/i.test(fibre ?? ''))) {
    return { count: first, plies: second, tex: texFromCount(first, system), doubt: 'silk' };
  }
  const { count, plies, doubtful } = READERS[system](first, second);
  const tex = plies * texFromCount(count, system);
  return doubtful ? { count, plies, tex, doubt: 'which-is-plies' } : { count, plies, tex };
}
