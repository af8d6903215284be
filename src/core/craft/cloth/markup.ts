/**
 * The few pieces of SVG text that every drawing is made of.
 *
 * A woven picture has thousands of crossings. It stays small because one path carries many threads, numbers keep one
 * decimal, and a path that is drawn more than once (shadow, body, light) is kept once and re-used.
 */

/** One decimal, without a leading zero: `-0.25` becomes `-.3`. */
export function num(value: number): string {
  return short(Math.round(value * 10) / 10);
}

/** Two decimals, for dashes, where a tenth of a pixel adds up over a hundred ends. */
export function fine(value: number): string {
  return short(Math.round(value * 100) / 100);
}

function short(value: number): string {
  const text = String(value === 0 ? 0 : value);
  // Asked for ten thousand times in a drawing: a pattern takes twice as long.
  return text.startsWith('0.') ? text.slice(1) : text.startsWith('-0.') ? `-${text.slice(2)}` : text;
}

/** Words of a person, made safe to stand in markup or in an attribute. */
export function escapeWords(words: string): string {
  return words.replace(/[&<>"'`]/g, (sign) => `&#${sign.charCodeAt(0)};`);
}

export const ROUND = ' stroke-linecap="round"';

/** A dash pattern that begins `start` px into the line. */
export function dashes(on: number, off: number, start: number): string {
  return ` stroke-dasharray="${fine(on)} ${fine(off)}" stroke-dashoffset="${fine(-start)}"`;
}

export function moved(x: number, y: number): string {
  return ` transform="translate(${num(x)} ${num(y)})"`;
}

export function box(x: number, y: number, width: number, height: number, fill: string): string {
  return `<path d="M${num(x)} ${num(y)}h${num(width)}v${num(height)}h${num(-width)}z" fill="${fill}"/>`;
}

/** Draws lines in one colour and thickness. */
export interface Strokes {
  readonly stroke: (d: string, colour: string, width: number, more?: string) => string;
}

const lookOf = (colour: string, width: number, more: string): string => ` stroke="${colour}" stroke-width="${num(width)}"${more}`;

/** Every line written out where it lies: longer, but it needs no ids, so a part of the drawing can be changed by itself. */
export const WRITTEN_OUT: Strokes = {
  stroke: (d, colour, width, more = '') => (d === '' ? '' : `<path d="${d}"${lookOf(colour, width, more)}/>`),
};

/** A path shorter than this costs less written twice than kept. */
const WORTH_KEEPING = 90;

/** Keeps long lines in `defs`, under ids that begin with `prefix`. */
export class PathStore implements Strokes {
  readonly #prefix: string;
  readonly #kept = new Map<string, string>();

  constructor(prefix: string) {
    this.#prefix = prefix;
  }

  stroke(d: string, colour: string, width: number, more = ''): string {
    if (d === '') return '';
    if (d.length < WORTH_KEEPING) return WRITTEN_OUT.stroke(d, colour, width, more);
    let id = this.#kept.get(d);
    if (id === undefined) {
      id = `${this.#prefix}-${this.#kept.size.toString(36)}`;
      this.#kept.set(d, id);
    }
    return `<use href="#${id}"${lookOf(colour, width, more)}/>`;
  }

  /** What `defs` must hold for the strokes drawn so far. */
  defs(): string {
    let all = '';
    for (const [d, id] of this.#kept) all += `<path id="${id}" d="${d}"/>`;
    return all;
  }
}
