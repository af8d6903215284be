/** Workings of whole pieces, held to their own formulas by another program's arithmetic (mathjs). */
import { expect, test } from 'vitest';
import { explainPiece } from '#core/craft/show-how/explain.ts';
import workedPiece from '../worked-piece.json' with { type: 'json' };
import { faultsOf, workingsOf } from './follow.ts';

test('every formula of the worked piece gives its number, and every input comes from somewhere', () => {
  expect(faultsOf(workingsOf(explainPiece(workedPiece)), workedPiece)).toEqual([]);
});
