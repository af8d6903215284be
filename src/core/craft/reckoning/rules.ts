/** What the single questions to the reckoner have in common. */
import type { NumberRule } from '#core/craft/reading/fields.ts';
import { LONGEST_MM } from '#core/craft/techniques/read-rules.ts';

/** A length between threads, or of a thread's thickness. */
export const fineLength = (name: string): NumberRule => ({ name, min: 'over-zero', max: LONGEST_MM, unit: 'mm' });

export const SPACING = fineLength('From end to end');
export const PICK_SPACING = fineLength('From row to row');
export const WARP_DIAMETER = fineLength('Thickness of the warp');

/** Ends that can be worked, doubled ones counted once. */
export const WORKING_ENDS: NumberRule = { name: 'Ends', min: 2, max: 2000, whole: true };
