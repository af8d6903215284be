/** What the figures of knotting have in common: the colours of their cords, and how thick the piece's cord is. */
import { shade, yarnColour } from '#core/craft/cloth/colour.ts';
import type { Figure, FigureInput } from '#core/craft/figures/figure.ts';
import type { MacramePiece, MacramePlan } from '#core/craft/macrame/piece.ts';

export type KnotInput = FigureInput<MacramePiece, MacramePlan>;
export type KnotFigure = Figure<MacramePiece, MacramePlan>;

const UNDYED = '#ddd3bb';

/** The cord that moves in the first cord's colour; the one it is knotted round is darker, and both are named beside it. */
export function cordColours({ piece }: KnotInput): { readonly working: string; readonly other: string; readonly still: string } {
  const [first] = Object.values(piece.yarns);
  const working = first?.colour === undefined ? UNDYED : yarnColour(first.colour);
  return { working, other: shade(working, 0.34), still: shade(working, 0.14) };
}

/** Thickness of a cord in a figure. */
export const THICK = 15;
