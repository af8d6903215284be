/** Whether a pattern fits the loom somebody typed, what it would be there, and if not, why not and what would. */
import type { FittedPiece, MyPiece } from '#core/craft/fit.ts';
import { fitWoven } from '#core/craft/frame-loom/fit-woven.ts';
import { widestOn } from '#core/craft/fitting/ways-to-fit.ts';
import { lengthOf } from '#core/craft/amounts/amount-types.ts';
import type { FrameLoomPiece } from '#core/craft/piece.ts';
import type { Problem } from '#core/outcome.ts';
import { amountText } from '#core/units/format-amount.ts';
import type { Units } from '#core/units/units.ts';
import { readTypedLoom, type LoomFaults, type TypedLoom } from './typed-loom.ts';

export type Trial =
  /** Something typed cannot be used. */
  | { readonly ok: false; readonly fields: LoomFaults }
  | { readonly ok: true; readonly fits: true; readonly mine: MyPiece; readonly fitted: FittedPiece<FrameLoomPiece>; readonly warnings: readonly Problem[]; readonly freeMm: number; readonly narrowed: boolean }
  /** `codes` are those of the problems that `says` tells; `widest` is the piece as wide as the loom allows at this spacing; null when nothing worth weaving fits. */
  | { readonly ok: true; readonly fits: false; readonly says: string; readonly codes: readonly string[]; readonly widest: FittedPiece<FrameLoomPiece> | null };

/** The engine's own limit: a loom on which any pattern has room. */
const BOUNDLESS_MM = 20_000;

/**
 * Tries `pattern` on the loom that was typed. `title` is how the piece is spoken of. Every sentence is in the person's
 * units and says what would work.
 */
export function tryOnLoom(pattern: FrameLoomPiece, title: string, typed: TypedLoom): Trial {
  const read = readTypedLoom(typed);
  if (!read.ok) return { ok: false, fields: read.fields };
  const { units, ends } = typed;
  const onLoom: MyPiece = { loom: read.loom, endsTogether: ends };
  const asPattern = fitWoven(pattern, onLoom, units);
  if (asPattern.ok) return fitting(onLoom, asPattern.value, asPattern.warnings, read.loom.insideWidthMm, false);
  if (!isTooWide(asPattern.problems)) return { ok: true, fits: false, says: sentences(asPattern.problems), codes: codesOf(asPattern.problems), widest: null };
  const widest = widestThatFits(pattern, onLoom, units);
  if (typed.narrower && widest !== null) return fitting(widest.mine, widest.fitted, widest.warnings, read.loom.insideWidthMm, true);
  return { ok: true, fits: false, says: tooWide(pattern, title, onLoom, units, widest?.mine.widthMm ?? null), codes: codesOf(asPattern.problems), widest: widest?.fitted ?? null };
}

function fitting(mine: MyPiece, fitted: FittedPiece<FrameLoomPiece>, warnings: readonly Problem[], insideWidthMm: number, narrowed: boolean): Trial {
  const once = [...new Map(warnings.map((warning) => [warning.message, warning])).values()];
  return { ok: true, fits: true, mine, fitted, warnings: once, freeMm: (insideWidthMm - fitted.plan.ends.woundWidthMm) / 2, narrowed };
}

const isTooWide = (problems: readonly Problem[]): boolean => problems.every(({ code, path }) => code === 'E_FIT' && path === '/loom/insideWidthMm');
const codesOf = (problems: readonly Problem[]): readonly string[] => [...new Set(problems.map(({ code }) => code))];
const sentences = (problems: readonly Problem[]): string => [...new Set(problems.map(({ message }) => message))].join(' ');

interface Widest {
  readonly mine: MyPiece;
  readonly fitted: FittedPiece<FrameLoomPiece>;
  readonly warnings: readonly Problem[];
}

function widestThatFits(pattern: FrameLoomPiece, onLoom: MyPiece, units: Units): Widest | null {
  const widthMm = widestOn(pattern, onLoom, units);
  if (widthMm === undefined) return null;
  const mine: MyPiece = { ...onLoom, widthMm };
  const fit = fitWoven(pattern, mine, units);
  return fit.ok ? { mine, fitted: fit.value, warnings: fit.warnings } : null;
}

function tooWide(pattern: FrameLoomPiece, title: string, onLoom: MyPiece, units: Units, widestMm: number | null): string {
  const size = (mm: number): string => amountText(lengthOf(mm, 'size'), units);
  const inside = onLoom.loom?.insideWidthMm ?? 0;
  const pitch = onLoom.loom?.nailPitchMm ?? 0;
  const onAny = fitWoven(pattern, { ...onLoom, loom: { ...onLoom.loom, insideWidthMm: BOUNDLESS_MM } }, units);
  const needs = onAny.ok ? ` ${title} needs ${amountText(lengthOf(onAny.value.plan.loom.insideWidthNeededMm, 'least'), units)}.` : '';
  const so = widestMm === null ? ' It is too narrow for this piece.' : ` With nails at ${amountText(lengthOf(pitch, 'fine'), units)} it would be ${size(widestMm)} wide.`;
  return `Your loom is ${size(inside)} inside.${needs}${so}`;
}
