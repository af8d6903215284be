/** Dye baths. Everything goes by the mass of the dry fibre, weighed before it is wetted. */

/** Grams of an agent used at so many per cent of the fibre. */
export function agentMass(fibreG: number, percentOfFibre: number): number {
  return (fibreG * percentOfFibre) / 100;
}

/** Litres of bath for a liquor ratio in litres a kilogram. */
export function bathLitres(fibreG: number, liquorRatio: number): number {
  return (fibreG / 1000) * liquorRatio;
}
