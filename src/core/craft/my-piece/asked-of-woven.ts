/** What a student is asked about a piece that is on the loom already. All of it may stay empty. */
import type { AskedMeasure } from '#core/craft/piece-form/asked.ts';

export const BANDS_DONE: AskedMeasure = { key: 'woven.bandsDone', kind: 'number', label: 'Bands that are finished' };
export const ROWS: AskedMeasure = { key: 'woven.rows', kind: 'number', label: 'Rows of the next band', hint: 'Count those of the band you are weaving now.' };
export const HEIGHT: AskedMeasure = { key: 'woven.heightMm', kind: 'length', label: 'Height of the cloth so far', hint: 'On the loom, from the first row to the fell.' };
/** Fields of the yarn that is left: `woven.left.<role>`. */
const LEFT = 'woven.left.';

export const leftAsked = (role: string): AskedMeasure => ({ key: `${LEFT}${role}`, kind: 'mass', label: 'Left of it' });
