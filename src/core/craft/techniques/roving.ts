/** Roving inlay: unspun fibre laid over and under groups of ends, puffed up on the face. */
import type { RovingBand } from '#core/craft/piece.ts';
import type { Fields, NumberRule } from '#core/craft/reading/fields.ts';
import { BAND_HEIGHT, readName, readRole } from '#core/craft/techniques/read-rules.ts';
import { rowsOf, threadOn, type BandReport, type DressedLoom, type Technique, type TechniqueWords, type Woven } from '#core/craft/techniques/technique.ts';

/** Length of a float that rises `bulge` over a base: the arc of a parabola. */
export function bulgeArc(base: number, bulge: number): number {
  if (bulge === 0) return base;
  return Math.sqrt(base ** 2 + 16 * bulge ** 2) / 2 + (base ** 2 / (8 * bulge)) * Math.asinh((4 * bulge) / base);
}

export interface Floats {
  readonly face: number;
  readonly back: number;
  /** Ends left over beyond the last whole float. */
  readonly rest: number;
}

/** Over the first group of ends, under the next, and so on. */
export function rovingFloats(ends: number, over: number): Floats {
  const floats = Math.floor(ends / over);
  return { face: Math.ceil(floats / 2), back: Math.floor(floats / 2), rest: ends % over };
}

export interface RovingPass {
  readonly ends: number;
  readonly over: number;
  readonly spacingMm: number;
  readonly bulgeMm: number;
  readonly tailMm: number;
}

/** Roving of one pass: puffed floats on the face, straight ones behind, two tails. */
export function rovingPass({ ends, over, spacingMm, bulgeMm, tailMm }: RovingPass): number {
  const { face, back, rest } = rovingFloats(ends, over);
  const base = over * spacingMm;
  return face * bulgeArc(base, bulgeMm) + back * base + rest * spacingMm + 2 * tailMm;
}

const OVER: NumberRule = { name: 'Ends passed over', min: 1, max: 200, whole: true };
const BULGE: NumberRule = { name: 'Bulge', min: 0, max: 1000, unit: 'mm' };
const PASSES: NumberRule = { name: 'Passes', min: 1, max: 1000, whole: true };

function read(fields: Fields): RovingBand {
  const band = {
    technique: 'roving' as const,
    ...readName(fields),
    yarn: readRole(fields),
    over: fields.number('over', OVER),
    bulgeMm: fields.number('bulgeMm', BULGE),
    heightMm: fields.number('heightMm', BAND_HEIGHT),
  };
  const passes = fields.optionalNumber('passes', PASSES);
  return passes === undefined ? band : { ...band, passes };
}

function check(band: RovingBand, _heightMm: number, loom: DressedLoom, report: BandReport): void {
  if (band.over > loom.workingEnds) {
    report.reject('E_FIT', 'over', `The warp has ${String(loom.workingEnds)} ends to work with. Pass over fewer.`);
  }
}

function weave(band: RovingBand, _heightMm: number, loom: DressedLoom): Woven {
  const passMm = rovingPass({ ...band, ends: loom.workingEnds, spacingMm: loom.spacingMm, tailMm: loom.tailMm });
  return { counts: {}, uses: [rowsOf(band.yarn, 'by-the-row', band.passes ?? 1, passMm, threadOn(loom, band.yarn))], work: {} };
}

export const ROVING_WORDS: TechniqueWords = {
  label: 'Roving',
  how: 'Unspun fibre goes over some ends and under as many, and is puffed up where it lies on the face.',
  tools: [],
  cautions: ['Tear it to length, do not cut it: torn ends vanish in the cloth.', 'Weave firm tabby on both sides of it, or it slides.'],
};

export const roving: Technique<'roving'> = {
  read,
  roles: (band) => [{ key: 'yarn', role: band.yarn }],
  height: (band) => band.heightMm,
  check,
  weave,
};
