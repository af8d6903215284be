/** What a yarn is made of, as its label says it: `wool`, `80 % wool, 20 % nylon`, `wool 80, nylon`. Shares are by mass. */
import { fibreNamed, type FibreName } from '#core/fibre/fibres.ts';

export interface FibreShare {
  /** Null for a word that names no fibre we know. */
  readonly fibre: FibreName | null;
  readonly words: string;
  readonly percent: number;
}

export type Composition = { readonly ok: true; readonly shares: readonly FibreShare[] } | { readonly ok: false; readonly reason: string };

const HOW = 'Write each fibre with its per cent, like “80 % wool, 20 % nylon”.';
const MOST_FIBRES = 12;
const BIT = /^(?:(?<before>\d{1,3}(?:[.,]\d+)?)\s*%?\s*)?(?<words>[^\d%]+?)(?:\s*(?<after>\d{1,3}(?:[.,]\d+)?)\s*%?)?$/;

const no = (reason: string): Composition => ({ ok: false, reason });

/** Bits of the text; `80 % wool 20 % nylon` has no comma between. */
const bitsOf = (text: string): string[] =>
  text.replace(/(?<=\p{L})\s+(?=\d+(?:[.,]\d+)?\s*%\s*\p{L})/gu, '; ').split(/\s*(?:;|\/|\+|&|\n|,(?!\d)|\band\b)\s*/i).filter((bit) => bit !== '');

/**
 * Reads a composition. One fibre may stand without its per cent: it is the rest. The shares come to 100; the reason, when
 * they do not, is a sentence for who typed it.
 */
export function readComposition(text: string): Composition {
  const bits = bitsOf(text.trim());
  if (bits.length === 0) return no(HOW);
  if (bits.length > MOST_FIBRES) return no(`At most ${String(MOST_FIBRES)} fibres work here.`);
  const read: { words: string; percent: number | null }[] = [];
  for (const bit of bits) {
    const { before, words, after } = BIT.exec(bit)?.groups ?? {};
    if (words === undefined || (before !== undefined && after !== undefined)) return no(HOW);
    const typed = before ?? after;
    read.push({ words: words.trim(), percent: typed === undefined ? null : Number(typed.replace(',', '.')) });
  }
  const said = read.reduce((sum, { percent }) => sum + (percent ?? 0), 0);
  const open = read.filter(({ percent }) => percent === null).length;
  if (open > 1) return no(`How much of each is missing. ${HOW}`);
  const rest = Math.round((100 - said) * 100) / 100;
  if (open === 0 ? rest !== 0 : rest <= 0) return no(`That comes to ${String(Math.round(said * 100) / 100)} %. All fibres of a yarn come to 100 % together.`);
  return { ok: true, shares: read.map(({ words, percent }) => ({ fibre: fibreNamed(words), words, percent: percent ?? rest })) };
}
