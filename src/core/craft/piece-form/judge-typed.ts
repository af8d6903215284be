/** What a form comes to: the piece and its plan, or a sentence at every field that stands in the way. */
import type { FrameLoomPiece } from '#core/craft/piece.ts';
import { planWoven } from '#core/craft/frame-loom/plan-woven.ts';
import type { FrameLoomPlan } from '#core/craft/plan-types.ts';
import type { Problem } from '#core/outcome.ts';
import { BEAT_BY, SWATCH_BEAT } from './asked-of-piece.ts';
import { fieldOfPlace } from './field-names.ts';
import { readTyped, type Fault } from './read-typed.ts';
import { textOf, type TypedPiece } from './typed-piece.ts';

export interface Found {
  /** Name of the field it is about; `bands`, `yarns` or '' for what belongs to no single one. */
  readonly field: string;
  readonly says: string;
  /** `reckoned`: the engine found it in what could be read. */
  readonly kind: Fault['kind'] | 'reckoned';
  /** Of what the engine found. */
  readonly code?: string;
}

export type Judgement =
  | { readonly ok: true; readonly piece: FrameLoomPiece; readonly plan: FrameLoomPlan; readonly warnings: readonly Found[] }
  | { readonly ok: false; readonly problems: readonly Found[] };

/**
 * Reads and reckons what stands in the form. Texts that cannot be read are told in the form's own words; for them the
 * engine's complaint, that a value is missing there, is left out.
 */
export function judgeTyped(typed: TypedPiece): Judgement {
  const { piece: read, faults } = readTyped(typed);
  // It may lack anything yet: planning it tells what.
  const piece = read as FrameLoomPiece;
  const plan = planWoven(piece, typed.units);
  if (plan.ok && faults.size === 0) return { ok: true, piece, plan: plan.value, warnings: placed(plan.warnings, typed) };
  const own = [...faults].map(([field, fault]): Found => ({ field, ...fault }));
  const engine = plan.ok ? [] : placed(plan.problems, typed);
  const told = new Set(faults.keys());
  const also = engine.filter(({ field }) => !told.has(field) && !hides(faults, field, typed));
  return { ok: false, problems: [...own, ...onePerField(also)] };
}

function placed(problems: readonly Problem[], typed: TypedPiece): Found[] {
  return problems.map(({ path, message, code }) => ({ field: fieldOfPlace(path, typed), says: message, kind: 'reckoned', code }));
}

function onePerField(found: readonly Found[]): Found[] {
  return [...new Map(found.toReversed().map((one) => [one.field, one])).values()].toReversed();
}

/** A yarn or a swatch that cannot be read is told at its own field; what the engine says of the gap that leaves is nothing new. */
function hides(faults: ReadonlyMap<string, Fault>, field: string, { yarns }: TypedPiece): boolean {
  if (field === 'yarns') return yarns.some(({ texts }) => textOf(texts, 'role').trim() === '');
  if (field === BEAT_BY.key) return faults.has(SWATCH_BEAT.key);
  const whole = /^(warp\.yarn|yarns\.\d+)\.(?:role|grist)$/.exec(field)?.[1];
  return whole !== undefined && ['by', 'grist', 'wrapsPerInch'].some((key) => faults.has(`${whole}.${key}`));
}
