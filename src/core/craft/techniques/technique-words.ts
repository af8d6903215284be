/** What is said of each technique, apart from the reckoning: who only plans a piece loads none of it. */
import type { TechniqueName } from '#core/craft/piece.ts';
import { HEM_STITCH_WORDS } from '#core/craft/techniques/hem-stitch.ts';
import { LOOP_PILE_WORDS } from '#core/craft/techniques/loop-pile.ts';
import { ROVING_WORDS } from '#core/craft/techniques/roving.ts';
import { RYA_WORDS } from '#core/craft/techniques/rya.ts';
import { SOUMAK_WORDS } from '#core/craft/techniques/soumak.ts';
import { TABBY_WORDS } from '#core/craft/techniques/tabby.ts';
import { TWINING_WORDS } from '#core/craft/techniques/twining.ts';
import type { TechniqueWords } from '#core/craft/techniques/technique.ts';

export const TECHNIQUE_WORDS: Readonly<Record<TechniqueName, TechniqueWords>> = {
  tabby: TABBY_WORDS,
  soumak: SOUMAK_WORDS,
  rya: RYA_WORDS,
  roving: ROVING_WORDS,
  'hem-stitch': HEM_STITCH_WORDS,
  'loop-pile': LOOP_PILE_WORDS,
  twining: TWINING_WORDS,
};
