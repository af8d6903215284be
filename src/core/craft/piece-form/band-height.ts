/** Setting how high a band is with the hand on the drawing: in whole rows, or in whole millimetres where rows do not make it higher. */
import { rowHeights } from '#core/craft/frame-loom/own-heights.ts';
import { picksInHeight } from '#core/craft/picks.ts';
import type { FrameLoomPiece } from '#core/craft/piece.ts';
import type { FrameLoomPlan } from '#core/craft/plan-types.ts';
import { roundHalfUp } from '#core/craft/rounding.ts';
import { MM_PER_INCH } from '#core/units/inches.ts';
import type { Units } from '#core/units/units.ts';
import { typeIn } from './change-typed.ts';
import { fieldText } from './field-text.ts';
import type { Asked } from './asked.ts';
import type { TypedPiece } from './typed-piece.ts';

/** What the hand holds when it pulls at a band. Steps are rows of tabby, rows of knots or twists, or millimetres. */
export interface HeldBand {
  readonly band: number;
  /** `rows` are typed as a number; `picks` and `mm` as a height. */
  readonly by: 'picks' | 'rows' | 'mm';
  readonly stepMm: number;
  readonly steps: number;
  readonly heightMm: number;
  readonly least: number;
  readonly most: number;
  /** Height of the piece that grows with the band; undefined where another band gives way. */
  readonly pieceMm: number | undefined;
}

/** More steps than anybody pulls. */
const MOST_STEPS = 5_000;
const HEIGHT: Asked = { key: 'heightMm', kind: 'length', label: 'Height' };

/** The place of the band that takes what the others leave; −1 for none. */
export const fillingBand = (piece: FrameLoomPiece): number => piece.bands.findIndex((band) => 'fill' in band);

/** Of a band of a piece that can be woven; null for one that cannot be pulled: it fills, or has no height of its own. */
export function holdBand(piece: FrameLoomPiece, plan: FrameLoomPlan, index: number): HeldBand | null {
  const band = piece.bands[index];
  const heightMm = plan.bands[index]?.heightMm;
  const filling = fillingBand(piece);
  if (band === undefined || heightMm === undefined || index === filling || band.technique === 'hem-stitch') return null;
  const rowMm = rowHeights(piece)?.[index] ?? 0;
  const by = rowMm === 0 ? 'mm' : band.technique === 'tabby' ? 'picks' : 'rows';
  const stepMm = by === 'mm' ? 1 : rowMm;
  const steps = by === 'rows' && 'rows' in band ? band.rows : by === 'picks' ? picksInHeight(heightMm, rowMm) : roundHalfUp(heightMm);
  const leftMm = filling < 0 ? Infinity : (plan.bands[filling]?.heightMm ?? 0);
  return { band: index, by, stepMm, steps, heightMm, least: 1, most: Math.min(MOST_STEPS, steps + Math.floor(leftMm / stepMm + 1e-9)), pieceMm: filling < 0 ? piece.size.heightMm : undefined };
}

/** Steps within what the band may be. */
export const withinHold = ({ least, most }: HeldBand, steps: number): number => Math.max(least, Math.min(most, Math.round(steps)));

/** Height of the band in so many steps, in mm. */
export function heightAt({ by, stepMm, steps: now, heightMm }: HeldBand, steps: number): number {
  return by === 'rows' ? heightMm + (steps - now) * stepMm : steps * stepMm;
}

/** The form with the band so many steps high. Where no band fills, the piece grows with it. */
export function withHeight(typed: TypedPiece, held: HeldBand, steps: number): TypedPiece {
  const row = `bands.${String(held.band)}.`;
  const { mm, words } = held.by === 'rows' ? { mm: heightAt(held, steps), words: String(steps) } : heightText(held, steps, typed.units);
  const done = typeIn(typed, `${row}${held.by === 'rows' ? 'rows' : 'heightMm'}`, words);
  if (held.pieceMm === undefined) return done;
  const grown = held.pieceMm + mm - held.heightMm;
  return typeIn(done, 'size.heightMm', fieldText(Number(grown.toFixed(4)), HEIGHT, typed.units));
}

const FINENESS: Readonly<Record<Units, readonly number[]>> = { cm: [1, 0.1], in: [MM_PER_INCH / 16, MM_PER_INCH / 64] };

/** As short as it can be said and still be so many rows. */
function heightText(held: HeldBand, steps: number, units: Units): { readonly mm: number; readonly words: string } {
  const exact = heightAt(held, steps);
  const fit = FINENESS[units].map((fine) => Number((roundHalfUp(exact / fine) * fine).toFixed(6))).find((mm) => mm > 0 && (held.by === 'mm' || picksInHeight(mm, held.stepMm) === steps));
  const mm = fit ?? exact;
  return { mm, words: fieldText(mm, HEIGHT, units) };
}
