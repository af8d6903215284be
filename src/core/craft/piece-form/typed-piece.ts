/**
 * A piece as it stands in the fields of a form: nothing but text, so that a slip is shown again as it was typed.
 * What is asked, and by which key, is in `asked-of-*.ts`; the text of a field is found under that key.
 */
import type { Units } from '#core/units/units.ts';

export type Texts = Readonly<Record<string, string>>;

/** A row that can be added, moved and taken out. `id` tells it from its sisters, wherever it stands. */
export interface TypedRow {
  readonly id: number;
  readonly texts: Texts;
}

export interface TypedBand extends TypedRow {
  readonly shapes: readonly TypedRow[];
}

export interface TypedPiece {
  /** Those of lengths that name no unit themselves. */
  readonly units: Units;
  /** What is asked once: size, loom, warp, beat, hanging, allowances. */
  readonly texts: Texts;
  readonly warpYarn: Texts;
  /** Bands and shapes name a yarn by its id, so that its role can be written anew without touching them. */
  readonly yarns: readonly TypedRow[];
  /** In the order they are woven. */
  readonly bands: readonly TypedBand[];
}

export const textOf = (texts: Texts, key: string): string => (Object.hasOwn(texts, key) ? (texts[key] ?? '') : '');

/** An id that none of the rows has. */
export const nextId = (rows: readonly TypedRow[]): number => rows.reduce((most, { id }) => Math.max(most, id), 0) + 1;
