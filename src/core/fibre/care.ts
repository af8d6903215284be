/**
 * How a hand-woven piece is looked after: the five lines of ISO 3758 in their order, each by the fibre that bears least.
 * Common practice for each fibre, on the careful side; nobody knows how a yarn was dyed, so nothing is bleached or tumbled.
 */
import { FIBRES, type FibreKind, type FibreName } from '#core/fibre/fibres.ts';

/** From what bears least to what bears most. */
export const WASHES = ['no-wash', 'hand-wash', 'wash-30-very-mild', 'wash-40'] as const;
export const DRYINGS = ['flat-in-shade', 'line-in-shade'] as const;
export const IRONS = ['no-iron', 'iron-110', 'iron-150', 'iron-200'] as const;
export const CLEANINGS = ['no-clean', 'clean-p-mild', 'clean-p'] as const;

export type CareSignName = (typeof WASHES)[number] | 'no-bleach' | 'no-tumble' | (typeof DRYINGS)[number] | (typeof IRONS)[number] | (typeof CLEANINGS)[number];

interface Bears {
  readonly wash: (typeof WASHES)[number];
  readonly dry: (typeof DRYINGS)[number];
  readonly iron: (typeof IRONS)[number];
  readonly clean: (typeof CLEANINGS)[number];
}

const BEARS: Readonly<Record<FibreKind, Bears>> = {
  'animal-hair': { wash: 'hand-wash', dry: 'flat-in-shade', iron: 'iron-150', clean: 'clean-p-mild' },
  silk: { wash: 'hand-wash', dry: 'flat-in-shade', iron: 'iron-110', clean: 'clean-p-mild' },
  plant: { wash: 'wash-40', dry: 'line-in-shade', iron: 'iron-200', clean: 'clean-p' },
  'coarse-plant': { wash: 'no-wash', dry: 'flat-in-shade', iron: 'iron-110', clean: 'no-clean' },
  regenerated: { wash: 'wash-30-very-mild', dry: 'line-in-shade', iron: 'iron-150', clean: 'clean-p-mild' },
  acetate: { wash: 'hand-wash', dry: 'line-in-shade', iron: 'iron-110', clean: 'clean-p-mild' },
  acrylic: { wash: 'wash-30-very-mild', dry: 'flat-in-shade', iron: 'iron-110', clean: 'clean-p-mild' },
  synthetic: { wash: 'wash-30-very-mild', dry: 'line-in-shade', iron: 'iron-110', clean: 'clean-p-mild' },
  'melts-early': { wash: 'hand-wash', dry: 'line-in-shade', iron: 'no-iron', clean: 'no-clean' },
  'not-textile': { wash: 'no-wash', dry: 'flat-in-shade', iron: 'no-iron', clean: 'no-clean' },
};

const CARE_WORDS: Readonly<Record<CareSignName, string>> = {
  'no-wash': 'Do not wash. Shake it out, or brush the dust off softly.',
  'hand-wash': 'Wash by hand only, cool, at most 30\u00a0°C, without rubbing or wringing.',
  'wash-30-very-mild': 'Wash at 30\u00a0°C at most, in the gentlest programme.',
  'wash-40': 'Wash at 40\u00a0°C at most.',
  'no-bleach': 'Do not bleach.',
  'no-tumble': 'Do not tumble dry.',
  'flat-in-shade': 'Dry flat, out of the sun.',
  'line-in-shade': 'Dry on a line, out of the sun.',
  'no-iron': 'Do not iron or steam.',
  'iron-110': 'Iron cool, at most 110\u00a0°C, without steam.',
  'iron-150': 'Iron warm, at most 150\u00a0°C, under a damp cloth. Never iron a pile flat.',
  'iron-200': 'Iron hot, at most 200\u00a0°C.',
  'no-clean': 'Do not dry-clean.',
  'clean-p-mild': 'Gentle dry cleaning by a professional, who is told what it is made of.',
  'clean-p': 'Dry cleaning by a professional, who is told what it is made of.',
};

export interface CareLine {
  readonly sign: CareSignName;
  readonly words: string;
}

const least = <T extends string>(order: readonly [T, ...T[]], borne: readonly T[]): T => order.find((one) => borne.includes(one)) ?? order[0];

/**
 * Washing, bleaching, drying (in the machine, then in the air), ironing, professional care.
 * @param fibres of the piece; null among them, or none at all, where one is not known: then nothing is promised.
 */
export function careFor(fibres: readonly (FibreName | null)[]): CareLine[] {
  const borne = (fibres.length === 0 ? [null] : fibres).map((fibre) => BEARS[fibre === null ? 'not-textile' : FIBRES[fibre]]);
  const signs: CareSignName[] = [
    least(WASHES, borne.map(({ wash }) => wash)), 'no-bleach', 'no-tumble', least(DRYINGS, borne.map(({ dry }) => dry)),
    least(IRONS, borne.map(({ iron }) => iron)), least(CLEANINGS, borne.map(({ clean }) => clean)),
  ];
  return signs.map((sign) => ({ sign, words: CARE_WORDS[sign] }));
}
