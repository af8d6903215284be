/** The workings of every technique the reckoning knows. */
import type { TechniqueName } from '#core/craft/piece.ts';
import type { BandOf, ToldBand } from '#core/craft/show-how/bands/band.ts';
import { noteHemStitchBand } from '#core/craft/show-how/bands/hem-stitch.ts';
import { noteLoopPileBand } from '#core/craft/show-how/bands/loop-pile.ts';
import { noteRovingBand } from '#core/craft/show-how/bands/roving.ts';
import { noteRyaBand } from '#core/craft/show-how/bands/rya.ts';
import { noteSoumakBand } from '#core/craft/show-how/bands/soumak.ts';
import { noteTabby } from '#core/craft/show-how/bands/tabby.ts';
import { noteTwiningBand } from '#core/craft/show-how/bands/twining.ts';

const NOTERS: { readonly [N in TechniqueName]: (of: BandOf<N>) => ToldBand } = {
  tabby: noteTabby,
  soumak: noteSoumakBand,
  rya: noteRyaBand,
  roving: noteRovingBand,
  'hem-stitch': noteHemStitchBand,
  'loop-pile': noteLoopPileBand,
  twining: noteTwiningBand,
};

export function noteBand<N extends TechniqueName>(of: BandOf<N> & { readonly technique: N }): ToldBand {
  return NOTERS[of.technique](of);
}
