/** The yarns that are in a finished piece: what the plan says of them, and what their maker says of her own. */
import { craftOf, isMadeIn } from '#core/craft/crafts.ts';
import type { MadeFor } from '#core/craft/made-for.ts';
import { readComposition } from '#core/fibre/composition.ts';
import type { YarnIn } from '#core/fibre/content.ts';

/** What she says of one yarn: how much is in the piece, and what it is made of. What is missing stays as planned. */
export interface YarnSaid {
  readonly grams?: number;
  readonly fibre?: string;
}

export interface YarnInPiece {
  /** Of the amount that speaks of it: `warp`, `yarn.sky`. */
  readonly key: string;
  readonly name: string;
  readonly colour: string | undefined;
  /** By the plan, without margins. */
  readonly plannedGrams: number;
  /** As the yarn's own description has it; empty where it says nothing. */
  readonly toldFibre: string;
}

type Made = Pick<MadeFor, 'piece' | 'plan'>;

function netGrams(key: string, made: Made): number | undefined {
  if (!isMadeIn('frame-loom', made)) return undefined;
  return key === 'warp' ? made.plan.warp.massG : made.plan.yarns[key.replace(/^yarn\./, '')]?.massG;
}

function fibreOf(role: string | undefined, key: string, { piece }: Made): string {
  if (piece.craft === 'dyeing') return '';
  if (piece.craft === 'frame-loom' && key === 'warp') return piece.warp.yarn.fibre ?? '';
  const yarns: Readonly<Record<string, { readonly fibre?: string } | undefined>> = piece.yarns;
  return role === undefined ? '' : (yarns[role]?.fibre ?? '');
}

/**
 * In the order of the shopping list. Where a plan tells no mass without its margin, the mass of the piece is shared out as
 * what is bought. Two roles of one yarn, such as a row of several strands, stay two.
 */
export function yarnsInPiece(made: Made): YarnInPiece[] {
  const { piece } = made;
  if (piece.craft === 'dyeing') {
    const { label, kind, colour, massG } = piece.fibre;
    return [{ key: 'fibre', name: label ?? 'What was dyed', colour, plannedGrams: massG, toldFibre: kind.startsWith('other-') ? '' : kind }];
  }
  const materials = craftOf(piece).materials(made);
  const bought = materials.reduce((sum, { grams }) => sum + grams, 0);
  return materials.map(({ key, role, name, label, colour, grams }) => ({
    key, colour,
    name: label === undefined ? name : materials.some((other) => other.key !== key && other.label === label) ? `${label} (${name.toLowerCase()})` : label,
    plannedGrams: netGrams(key, made) ?? (bought === 0 ? 0 : (made.plan.massG * grams) / bought),
    toldFibre: fibreOf(role, key, made),
  }));
}

/** What is in the piece by her own word, else by the plan. */
export function yarnsUsed(yarns: readonly YarnInPiece[], said: Readonly<Record<string, YarnSaid>>): YarnIn[] {
  return yarns.map(({ key, plannedGrams, toldFibre }) => {
    const { grams = plannedGrams, fibre = toldFibre } = (Object.hasOwn(said, key) ? said[key] : undefined) ?? {};
    const read = readComposition(fibre);
    return { grams, shares: read.ok ? read.shares : null };
  });
}
