/** How warp and weft of a piece share the bending, and how long that makes the weft from end to end. */
import { waveOf, weftWaveRange } from '#core/craft/crimp.ts';
import type { WeftBend } from '#core/craft/picks.ts';
import { noteBend, noteWaveRange } from '#core/craft/show-how/explain-wave.ts';
import { from, given } from '#core/craft/show-how/notebook.ts';
import { givenOr, type OnLoom } from '#core/craft/show-how/on-loom.ts';
import { DEFAULTS, RULES } from '#core/craft/show-how/sources.ts';
import type { Working, WorkingInput } from '#core/craft/show-how/working.ts';
import type { LaidPicks } from '#core/craft/techniques/technique.ts';
import type { MeasuredWeave } from '#core/craft/weave.ts';

/** The picks, and what of them is written down already. */
export interface Laid {
  /** Of the ids: `weft.` */
  readonly prefix: string;
  readonly geometry: LaidPicks;
  readonly spacing: Working;
  readonly endSpacing: Working;
  readonly D: WorkingInput;
}

function noteWave({ book, piece: { parts: { weave } } }: OnLoom, { prefix, geometry, endSpacing, spacing, D }: Laid, value: number): Working {
  const what = { id: `${prefix}waveMm`, name: 'wave of the weft', value, unit: 'mm' } as const;
  if (weave?.mode === 'given') {
    const asked = given({ symbol: 'h', name: 'wave asked for', value: weave.weftWaveMm, unit: 'mm' }, '/weftWaveMm', 'measured');
    return book.note({ ...what, formula: 'min(D, h)', inputs: [D, asked], ...RULES.asGiven });
  }
  if (weave?.mode !== 'balanced') return book.note({ ...what, formula: 'D', inputs: [D], ...RULES.peirce });
  const range = weftWaveRange(geometry.diameterSumMm, geometry.spacingMm, geometry.pickSpacingMm);
  if (range === undefined) throw new Error('picks that jam were laid');
  const ids = { min: `${prefix}leastWaveMm`, max: `${prefix}mostWaveMm` };
  const { min, max } = noteWaveRange(book, ids, { D, p1: from('p1', endSpacing), p2: from('p2', spacing) }, range);
  return book.note({ ...what, formula: 'min(b, max(a, D / 2))', inputs: [from('a', min), from('b', max), D], ...RULES.peirce });
}

export interface Bent {
  /** From one crossing to the next. */
  readonly step: Working;
  /** What the warp bends; missing where it is straight. */
  readonly warpCrimp?: Working;
}

/** Both take-ups as they were measured, or as is usual where nothing is known. */
function noteMeasured({ book }: OnLoom, { prefix, geometry: { crimp, warpCrimp, stepMm }, endSpacing: p }: Laid, weave: MeasuredWeave): Bent {
  const usual = weave.takeUp === undefined ? DEFAULTS.takeUp : DEFAULTS.straightWarp;
  const ofWeft = givenOr({ symbol: 'c', name: 'take-up of the weft', value: crimp, unit: 'share' }, '/takeUp', weave.takeUp !== undefined, DEFAULTS.takeUp);
  const taken = book.note({ id: `${prefix}crimp`, name: 'take-up of the weft', formula: 'c', inputs: [ofWeft], value: crimp, unit: 'share', ...RULES.measuredBend });
  const step = book.note({
    id: `${prefix}stepMm`, name: 'weft from one crossing to the next', formula: 'p * (1 + c)', inputs: [from('p', p), from('c', taken)], value: stepMm, unit: 'mm', ...RULES.measuredBend,
  });
  if (warpCrimp === 0) return { step };
  const ofWarp = givenOr({ symbol: 'c', name: 'take-up of the warp', value: warpCrimp, unit: 'share' }, '/warpTakeUp', weave.warpTakeUp !== undefined, usual);
  return { step, warpCrimp: book.note({ id: `${prefix}warpBend.crimp`, name: 'take-up of the warp', formula: 'c', inputs: [ofWarp], value: warpCrimp, unit: 'share', ...RULES.measuredBend }) };
}

/** Both take-ups from the weft's wave. */
function noteModelled(of: OnLoom, laid: Laid, bend: WeftBend): Bent {
  const { book } = of;
  const { prefix, geometry: { crimp, stepMm, pickSpacingMm, diameterSumMm }, D } = laid;
  const wave = noteWave(of, laid, bend.waveMm);
  const step = noteBend(book, { prefix, of: 'weft', lengthId: 'stepMm', spacing: from('p', laid.endSpacing), D, wave: from('h', wave), lengthMm: stepMm, angleRad: bend.angleRad, crimp }).length;
  const warp = waveOf(pickSpacingMm, diameterSumMm, diameterSumMm - bend.waveMm);
  if (warp === undefined || warp.crimp === 0) return { step };
  const warpWave = book.note({ id: `${prefix}warpBend.waveMm`, name: 'wave of the warp', formula: 'D - h', inputs: [D, from('h', wave)], value: diameterSumMm - bend.waveMm, unit: 'mm', ...RULES.peirce });
  const bent = noteBend(book, { prefix: `${prefix}warpBend.`, of: 'warp', lengthId: 'lengthMm', spacing: from('p', laid.spacing), D, wave: from('h', warpWave), ...warp });
  return { step, warpCrimp: bent.crimp };
}

export function noteBending(of: OnLoom, laid: Laid): Bent {
  const { weave } = of.piece.parts;
  const { bend } = laid.geometry;
  if (bend !== undefined) return noteModelled(of, laid, bend);
  return noteMeasured(of, laid, weave?.mode === 'measured' ? weave : { mode: 'measured' });
}
