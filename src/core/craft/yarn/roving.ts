/** Unspun fibre: weigh a metre of it. */
import { diameterFromVolume, specificVolume } from '#core/craft/yarn/diameter.ts';

/** Fibre densities in g/cm³ (Morton and Hearle). */
export const FIBRE_DENSITY = {
  cotton: 1.52,
  wool: 1.31,
  flax: 1.5,
  silk: 1.34,
  acrylic: 1.17,
  polyester: 1.38,
  nylon: 1.14,
} as const;

/** Common practice: roving is three parts fibre in a hundred, 0.02 to 0.05. */
const ROVING_PACKING = 0.03;

export function texFromGramsPerMetre(grams: number): number {
  return 1000 * grams;
}

/** Diameter in mm of roving that lies free. Measuring is better. */
export function rovingDiameter(tex: number, fibre: keyof typeof FIBRE_DENSITY = 'wool', packing = ROVING_PACKING): number {
  return diameterFromVolume(tex, specificVolume(FIBRE_DENSITY[fibre], packing));
}
