/** What every band needs to know of the drawing it stands in. */
import type { PathStore } from '#core/craft/cloth/markup.ts';

export interface Weave {
  readonly id: string;
  /** Width of the cloth in pixels. */
  readonly width: number;
  /** Pixels from one drawn end to the next, and how many are drawn (always even). */
  readonly end: number;
  readonly ends: number;
  /** Real working ends for each drawn one, 1 or more. */
  readonly grouped: number;
  readonly pxPerMm: number;
  readonly minPick: number;
  /** Which end of the screen the first row lies at. From the head, the piece has been turned: left is right. */
  readonly begin: 'head' | 'foot';
  readonly endsTogether: 1 | 2;
  /** Whether yarns show their plies: only near, where `defs` holds the paints for it. */
  readonly plied: boolean;
  readonly warpColour: string;
  readonly warpWidth: number;
  readonly paths: PathStore;
  readonly chance: () => number;
  /** Longest pile that may hang below its band, in pixels; strips keep it inside. */
  readonly longestPile: (bandHeight: number) => number;
}

/** Rows that can be shown in `height` pixels: all of them, or as many as have `min` pixels each; at least 2. */
export function drawnRows(rows: number, height: number, min: number): number {
  return Math.max(2, Math.min(Math.round(rows), Math.floor(height / min)));
}
