/**
 * Linear density: how heavy a yarn is for its length. Everything goes through tex
 * (grams in a kilometre) and out again; there are no pairwise tables.
 *
 * Definitions by ASTM D2260; one inch is 25.4 mm, one yard 0.9144 m and one pound
 * 453.59237 g exactly.
 */
import type { CountSystem } from '#core/craft/piece.ts';

export const METRES_PER_YARD = 0.9144;
export const GRAMS_PER_POUND = 453.59237;
const GRAMS_PER_GRAIN = 0.06479891;

/** tex × yards per pound: 1133980925/2286. */
export const TEX_YARDS_PER_POUND = (1000 * GRAMS_PER_POUND) / METRES_PER_YARD;

/** Fine silk to jumbo roving. */
export const TEX_RANGE = { min: 1, max: 200_000 } as const;

interface SystemFacts {
  /** As it is said in a list of choices. */
  readonly label: string;
  /** `direct`: mass of a fixed length, thicker is more. `indirect`: length of a fixed mass, thicker is less. */
  readonly kind: 'direct' | 'indirect';
  /** tex of a yarn whose count is 1. */
  readonly texOfOne: number;
}

const hanksPerPound = (yards: number): number => TEX_YARDS_PER_POUND / yards;

export const COUNT_SYSTEMS: Readonly<Record<CountSystem, SystemFacts>> = {
  'ne-cotton': { label: 'cotton count (840 yd hanks in a pound)', kind: 'indirect', texOfOne: hanksPerPound(840) },
  'spun-silk': { label: 'spun silk (840 yd hanks in a pound)', kind: 'indirect', texOfOne: hanksPerPound(840) },
  'ne-worsted': { label: 'worsted count (560 yd hanks in a pound)', kind: 'indirect', texOfOne: hanksPerPound(560) },
  nm: { label: 'Nm (kilometres in a kilogram)', kind: 'indirect', texOfOne: 1000 },
  lea: { label: 'linen lea (300 yd in a pound)', kind: 'indirect', texOfOne: hanksPerPound(300) },
  run: { label: 'woollen run (1600 yd in a pound)', kind: 'indirect', texOfOne: hanksPerPound(1600) },
  yorkshire: { label: 'Yorkshire skein (256 yd in a pound)', kind: 'indirect', texOfOne: hanksPerPound(256) },
  denier: { label: 'denier (grams in 9000 m)', kind: 'direct', texOfOne: 1 / 9 },
  dtex: { label: 'decitex (grams in 10 000 m)', kind: 'direct', texOfOne: 1 / 10 },
  jute: {
    label: 'jute (pounds in a spyndle of 14 400 yd)',
    kind: 'direct',
    texOfOne: (1000 * GRAMS_PER_POUND) / (14_400 * METRES_PER_YARD),
  },
  grain: {
    label: 'American grain (grains in 120 yd)',
    kind: 'direct',
    texOfOne: (1000 * GRAMS_PER_GRAIN) / (120 * METRES_PER_YARD),
  },
};

/** tex of a count; `count` > 0. */
export function texFromCount(count: number, system: CountSystem): number {
  const { kind, texOfOne } = COUNT_SYSTEMS[system];
  return kind === 'direct' ? count * texOfOne : texOfOne / count;
}

/** The count of a yarn in another system; `tex` > 0. */
export function countFromTex(tex: number, system: CountSystem): number {
  const { kind, texOfOne } = COUNT_SYSTEMS[system];
  return kind === 'direct' ? tex / texOfOne : texOfOne / tex;
}

export function texFromMetresPer100g(metres: number): number {
  return 100_000 / metres;
}

export function metresPer100gFromTex(tex: number): number {
  return 100_000 / tex;
}

export function yardsPerPoundFromTex(tex: number): number {
  return TEX_YARDS_PER_POUND / tex;
}

export function texFromYardsPerPound(yards: number): number {
  return TEX_YARDS_PER_POUND / yards;
}

/** An ounce is a sixteenth of a pound. */
export function texFromYardsPerOunce(yards: number): number {
  return texFromYardsPerPound(16 * yards);
}

/** A label that says so many metres in so many grams. */
export function texFromBall(ball: { readonly metres: number; readonly grams: number }): number {
  return (1000 * ball.grams) / ball.metres;
}

/**
 * tex of several yarns, equal or not, twisted together. Twist takes up length, so the same
 * mass lies in less of it: `twistContraction` is the share that is lost, from 0 to less than 0.2.
 */
export function texOfFolded(strandTex: readonly number[], twistContraction = 0): number {
  return strandTex.reduce((sum, tex) => sum + tex, 0) / (1 - twistContraction);
}

/** The share of their length that strands lost when they became a yarn of this tex. */
export function twistContraction(strandTex: readonly number[], foldedTex: number): number {
  return 1 - strandTex.reduce((sum, tex) => sum + tex, 0) / foldedTex;
}
