/** How much both yarns of a plain weave bend, and how long that makes them. */
import { weftWaveRange, waveOf, type Wave, type WaveRange } from '#core/craft/crimp.ts';
import { admitsWave } from '#core/craft/given-wave.ts';
import { chooseWeftWave } from '#core/craft/picks.ts';
import type { Weave } from '#core/craft/weave.ts';
import type { Fields } from '#core/craft/reading/fields.ts';
import { fineLength, PICK_SPACING, SPACING, WARP_DIAMETER } from '#core/craft/reckoning/rules.ts';
import { LONGEST_MM } from '#core/craft/techniques/read-rules.ts';
import type { Problem } from '#core/outcome.ts';

export interface TakeUpAnswer {
  /** Heights the weft's wave can have. */
  readonly waveMm: WaveRange;
  readonly weft: Wave;
  readonly warp: Wave;
  readonly warnings: readonly Problem[];
}

interface Cloth {
  readonly d1: number;
  readonly d2: number;
  /** d₁ + d₂ */
  readonly D: number;
  readonly p1: number;
  readonly p2: number;
}

function readCloth(fields: Fields): Cloth {
  const d1 = fields.number('warpDiameterMm', WARP_DIAMETER);
  const d2 = fields.number('weftDiameterMm', fineLength('Thickness of the weft'));
  return {
    d1,
    d2,
    D: d1 + d2,
    p1: fields.number('warpSpacingMm', SPACING),
    p2: fields.number('weftSpacingMm', PICK_SPACING),
  };
}

/** The wave as given, or as the mode chooses it; undefined where the yarns jam or the given one is refused. */
function weftWave(given: number | undefined, { D, p1, p2 }: Cloth, range: WaveRange, mode: TakeUpMode, fields: Fields): number | undefined {
  const admitted = given === undefined || admitsWave(given, { diameterSumMm: D, warpSpacingMm: p1, weftSpacingMm: p2 }, fields.pathOf('weftWaveMm'), fields.findings);
  if (!admitted) return undefined;
  const chosen = chooseWeftWave(range, D, given === undefined ? { mode } : { mode: 'given', weftWaveMm: given });
  if (chosen?.clamped === true) {
    fields.findings.warn('W_CLAMPED', '/mode', 'Warp and weft cannot bend alike in so close a cloth. The nearest that is possible is reckoned.');
  }
  return chosen?.heightMm;
}

/** What decides the wave where it is not given. */
type TakeUpMode = (Weave & { readonly mode: 'straight-warp' | 'balanced' })['mode'];

export interface TakeUpQuestion {
  readonly cloth: Cloth;
  readonly weftWaveMm: number | undefined;
  readonly mode: TakeUpMode;
}

export function readTakeUp(fields: Fields): TakeUpQuestion | undefined {
  const { findings } = fields;
  const cloth = findings.soundly(() => readCloth(fields));
  const weftWaveMm = fields.optionalNumber('weftWaveMm', { name: 'Height of the weft’s wave', min: 0, max: LONGEST_MM, unit: 'mm' });
  const mode = fields.optionalChoice('mode', 'Mode', ['straight-warp', 'balanced']) ?? 'straight-warp';
  fields.end();
  return cloth === undefined || findings.count > 0 ? undefined : { cloth, weftWaveMm, mode };
}

export interface TakeUp {
  readonly range: WaveRange;
  /** Of the weft's wave. */
  readonly heightMm: number;
  readonly weft: Wave;
  readonly warp: Wave;
}

/** Both waves; undefined, with a problem among the findings, where the yarns jam or the given wave is refused. */
export function bendBoth({ cloth, weftWaveMm, mode }: TakeUpQuestion, fields: Fields): TakeUp | undefined {
  const range = weftWaveRange(cloth.D, cloth.p1, cloth.p2);
  const heightMm = range && weftWave(weftWaveMm, cloth, range, mode, fields);
  const weft = heightMm === undefined ? undefined : waveOf(cloth.p1, cloth.D, heightMm);
  const warp = heightMm === undefined ? undefined : waveOf(cloth.p2, cloth.D, cloth.D - heightMm);
  if (fields.findings.count > 0) return undefined;
  if (range === undefined || heightMm === undefined || weft === undefined || warp === undefined) {
    fields.reject('E_JAM', 'warpSpacingMm', 'Yarns this thick cannot lie so close. Set the ends further apart, or take thinner yarn.');
    return undefined;
  }
  return { range, heightMm, weft, warp };
}

export function reckonTakeUp(fields: Fields): TakeUpAnswer | undefined {
  const question = readTakeUp(fields);
  const bent = question && bendBoth(question, fields);
  return bent && { waveMm: bent.range, weft: bent.weft, warp: bent.warp, warnings: fields.findings.warnings };
}
