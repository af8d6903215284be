/** One yarn in every way of counting, with both its diameters. */
import { ASHENHURST_K } from '#core/craft/defaults.ts';
import type { Fields } from '#core/craft/reading/fields.ts';
import { countFromTex, metresPer100gFromTex, yardsPerPoundFromTex } from '#core/craft/yarn/count.ts';
import { readYarn } from '#core/craft/yarn/read-yarn.ts';
import { threadOf } from '#core/craft/yarn/thread.ts';
import type { Problem } from '#core/outcome.ts';

/** Counts are those of one strand; the diameters are of all its strands together. */
export interface YarnAnswer {
  readonly tex: number;
  readonly denier: number;
  readonly nm: number;
  readonly neCotton: number;
  readonly neWorsted: number;
  readonly lea: number;
  readonly run: number;
  readonly yardsPerPound: number;
  readonly metresPer100g: number;
  readonly plies: number;
  readonly compressedDiameterMm: number;
  readonly loftDiameterMm: number;
  readonly warnings: readonly Problem[];
}

export function reckonYarn(fields: Fields): YarnAnswer | undefined {
  const yarn = readYarn(fields.group('yarn', 'Yarn'));
  fields.end();
  if (yarn === undefined) return undefined;
  const { tex, plies, compressedMm, loftMm } = threadOf(yarn, ASHENHURST_K.warp);
  return {
    tex,
    denier: countFromTex(tex, 'denier'),
    nm: countFromTex(tex, 'nm'),
    neCotton: countFromTex(tex, 'ne-cotton'),
    neWorsted: countFromTex(tex, 'ne-worsted'),
    lea: countFromTex(tex, 'lea'),
    run: countFromTex(tex, 'run'),
    yardsPerPound: yardsPerPoundFromTex(tex),
    metresPer100g: metresPer100gFromTex(tex),
    plies,
    compressedDiameterMm: compressedMm,
    loftDiameterMm: loftMm,
    warnings: fields.findings.warnings,
  };
}
