/** Every technique the reckoning knows. */
import type { BandByTechnique, TechniqueName } from '#core/craft/piece.ts';
import { hemStitch } from '#core/craft/techniques/hem-stitch.ts';
import { loopPile } from '#core/craft/techniques/loop-pile.ts';
import { roving } from '#core/craft/techniques/roving.ts';
import { rya } from '#core/craft/techniques/rya.ts';
import { soumak } from '#core/craft/techniques/soumak.ts';
import { tabby } from '#core/craft/techniques/tabby.ts';
import { twining } from '#core/craft/techniques/twining.ts';
import type { Technique } from '#core/craft/techniques/technique.ts';

export const TECHNIQUES: { readonly [N in TechniqueName]: Technique<N> } = {
  tabby,
  soumak,
  rya,
  roving,
  'hem-stitch': hemStitch,
  'loop-pile': loopPile,
  twining,
};

export const TECHNIQUE_NAMES = [
  'tabby', 'soumak', 'rya', 'roving', 'hem-stitch', 'loop-pile', 'twining',
] as const satisfies readonly TechniqueName[];

/** A band together with the technique that knows it. */
export function techniqueOf<N extends TechniqueName>(band: BandByTechnique[N] & { readonly technique: N }): Technique<N> {
  return TECHNIQUES[band.technique];
}
