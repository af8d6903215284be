// How long fitting, the rest of a piece and shopping take. The budget is 50 ms, warm, on a machine that has nothing else to do.
import { bench, describe } from 'vitest';
import { fitPiece } from '#core/craft/fit.ts';
import { waysToFit } from '#core/craft/fitting/ways-to-fit.ts';
import { planRest } from '#core/craft/rest/plan-rest.ts';
import { mergeShopping } from '#core/craft/shopping/merge-shopping.ts';
import { lowTide } from '../support/low-tide.ts';

const piece = await lowTide();
const small = { loom: { insideWidthMm: 300, insideHeightMm: 420 } };

describe('reckoning a piece', () => {
  bench('on a student’s loom', () => void fitPiece(piece, { loom: { nailPitchMm: 8 } }));
  bench('every way to fit a loom that is too small', () => void waysToFit(piece, small));
  bench('the rest of it, measured', () => void planRest(piece, { bandsDone: 6, rows: 40, heightMm: 110 }));
  bench('the shopping of five', () => void mergeShopping(Array.from({ length: 5 }, (_, index) => ({ name: String(index), piece }))));
});
