/** What every band needs to know of the drawing it stands in. */
import type { Strokes } from '#core/craft/cloth/markup.ts';
import { tabbyFace, wayOfRow, type Ends } from '#core/craft/interlacement/lay.ts';

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
  /** 1 where an odd number of picks is drawn below this band, whose first one goes on from them: over where the one before went under. */
  readonly firstRow: 0 | 1;
  readonly endsTogether: 1 | 2;
  /** Whether yarns show their plies: only near, where `defs` holds the paints for it. */
  readonly plied: boolean;
  /** Whether it is seen how colours meet: not in what is as small as a swatch or a strip. */
  readonly joined: boolean;
  readonly warpColour: string;
  readonly warpWidth: number;
  readonly paths: Strokes;
  /** A band's own run of numbers, so that one that changes leaves the others as they are. */
  readonly chance: () => number;
  /** Longest pile that may hang below its band, in pixels; strips keep it inside. */
  readonly longestPile: (bandHeight: number) => number;
}

/** Real working ends in the picture. */
export const realEnds = ({ ends, grouped }: Pick<Weave, 'ends' | 'grouped'>): number => Math.round(ends * grouped);

/** Where real ends lie on the screen, in pixels from the left. */
export function stretchOf({ first, last }: Ends, weave: Pick<Weave, 'width' | 'ends' | 'grouped' | 'begin'>): { readonly x0: number; readonly x1: number } {
  const step = weave.width / realEnds(weave);
  const [from, to] = [first * step, (last + 1) * step];
  return weave.begin === 'head' ? { x0: weave.width - to, x1: weave.width - from } : { x0: from, x1: to };
}

/** Groups of ends as a picture can show them: where two drawn ends have no room in one, so many neighbours together as make it. */
export function groupsShown(groups: readonly Ends[], { end, width, ends, grouped }: Pick<Weave, 'end' | 'width' | 'ends' | 'grouped'>): readonly Ends[] {
  const [widest = 1] = groups.map(({ first, last }) => last - first + 1);
  const together = Math.ceil((2 * end) / (widest * (width / realEnds({ ends, grouped }))) - 0.01);
  if (together <= 1) return groups;
  const shown: Ends[] = [];
  for (let at = 0; at < groups.length; at += together) {
    const [first, last] = [groups[at], groups[Math.min(at + together, groups.length) - 1]];
    if (first !== undefined && last !== undefined) shown.push({ first: Math.min(first.first, last.first), last: Math.max(first.last, last.last) });
  }
  return shown;
}

/**
 * Rows that can be shown in `height` pixels: all of them, or as many as have `min` pixels each; at least 2. Where rows stand
 * for several they are even in number, so that the band above begins as it did while this one grows.
 */
export function drawnRows(rows: number, height: number, min: number): number {
  const fitting = Math.floor(height / min);
  return Math.max(2, Math.min(Math.round(rows), fitting < rows ? fitting - (fitting % 2) : fitting));
}

/** Which row of the cloth the screen's row `index` (from above) of `count` is. */
export function rowOnScreen(index: number, count: number, { begin, firstRow }: Pick<Weave, 'begin' | 'firstRow'>): number {
  return firstRow + (begin === 'head' ? index : count - 1 - index);
}

/** The first drawn end from the left of the screen that a row goes over: 0 or 1. */
export function firstOver(row: number, { begin, ends }: Pick<Weave, 'begin' | 'ends'>): 0 | 1 {
  return tabbyFace(begin === 'head' ? ends - 1 : 0, row) === 'front' ? 0 : 1;
}

/** The edge of the screen a row ends at, where the thread turns into the next one. */
export function turnSide(row: number, { begin }: Pick<Weave, 'begin'>): 'left' | 'right' {
  return (wayOfRow(row) === 'right') === (begin === 'foot') ? 'right' : 'left';
}
