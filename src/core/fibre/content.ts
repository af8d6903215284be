/** What a whole piece is made of: the shares of all its yarns by the mass that is in it. */
import type { FibreShare } from '#core/fibre/composition.ts';
import { fibreWords, type FibreName } from '#core/fibre/fibres.ts';

export interface YarnIn {
  /** Of this yarn in the piece. */
  readonly grams: number;
  /** Null while nobody said what it is made of. */
  readonly shares: readonly FibreShare[] | null;
}

export interface ContentRow {
  /** Null for all of which nobody knows the fibre. */
  readonly fibre: FibreName | null;
  /** Whole per cents; those of all rows come to 100. A trace may be 0 and is then less than half a per cent. */
  readonly percent: number;
}

/**
 * Rows with the largest share first, what is unknown last. Whole per cents by the largest remainder: each is rounded
 * down, and what is missing to 100 goes to those that lost most, so that the label never comes to 99 or 101.
 * Empty when the piece holds nothing.
 */
export function fibreContent(yarns: readonly YarnIn[]): ContentRow[] {
  const grams = new Map<FibreName | null, number>();
  for (const yarn of yarns) {
    for (const { fibre, percent } of yarn.shares ?? [{ fibre: null, percent: 100 }]) {
      grams.set(fibre, (grams.get(fibre) ?? 0) + (yarn.grams * percent) / 100);
    }
  }
  const held = [...grams].filter(([, mass]) => mass > 0);
  const total = held.reduce((sum, [, mass]) => sum + mass, 0);
  const exact = held.map(([fibre, mass]) => ({ fibre, exact: (mass / total) * 100 }));
  const missing = 100 - exact.reduce((sum, row) => sum + Math.floor(row.exact), 0);
  const byRemainder = exact.toSorted((a, b) => (b.exact % 1) - (a.exact % 1) || b.exact - a.exact);
  const raised = new Set(byRemainder.slice(0, missing));
  return exact
    .map((row) => ({ ...row, percent: Math.floor(row.exact) + (raised.has(row) ? 1 : 0) }))
    .toSorted((a, b) => Number(a.fibre === null) - Number(b.fibre === null) || b.exact - a.exact)
    .map(({ fibre, percent }) => ({ fibre, percent }));
}

/** `81 % wool`; a trace is told as less than one per cent. */
export function contentWords({ fibre, percent }: ContentRow): string {
  const name = fibre === null ? 'fibre not known' : fibreWords(fibre);
  return percent === 0 ? `less than 1\u00a0% ${name}` : `${String(percent)}\u00a0% ${name}`;
}
