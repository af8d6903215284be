import type { Band, FrameLoomPiece } from '#core/craft/piece.ts';
import { planPiece } from '#core/craft/plan.ts';
import type { FrameLoomPlan } from '#core/craft/plan-types.ts';
import type { Problem } from '#core/outcome.ts';

/** A small hanging that can be woven as it is: 62 ends at 5 mm, one plain band that fills it. */
export const PLAIN_PIECE = {
  craft: 'frame-loom',
  size: { widthMm: 300, heightMm: 400 },
  loom: { nailPitchMm: 10, warping: 'zigzag', insideHeightMm: 520 },
  warp: { yarn: { tex: 400 }, parity: 'even' },
  beat: { picksPerWeftDiameter: 0.7 },
  yarns: { ground: { metresPer100g: 180 } },
  bands: [{ technique: 'tabby', name: 'sky', yarn: 'ground', fill: true }],
} as const satisfies FrameLoomPiece;

/** The plain piece with other parts put in their place. */
export const pieceWith = (parts: Partial<FrameLoomPiece>): FrameLoomPiece => ({ ...PLAIN_PIECE, ...parts });

/** The plain piece with more bands under its filling one. */
export const pieceOf = (...bands: Band[]): FrameLoomPiece => pieceWith({ bands: [...bands, ...PLAIN_PIECE.bands] });

/** Of a frame-loom piece, read as one from whatever was handed in. */
export function planOf(piece: unknown): FrameLoomPlan {
  const planned = planPiece(piece as FrameLoomPiece);
  if (!planned.ok) throw new Error(JSON.stringify(planned.problems, null, 1));
  return planned.value;
}

export function problemsOf(piece: unknown): readonly Problem[] {
  const planned = planPiece(piece);
  return planned.ok ? [] : planned.problems;
}

/** As `CODE /path`, in the order they were found. */
export const refusals = (piece: unknown): string[] => problemsOf(piece).map(({ code, path }) => `${code} ${path}`);
export const warningsOf = (piece: unknown): string[] => planOf(piece).warnings.map(({ code, path }) => `${code} ${path}`);
