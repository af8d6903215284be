import { readFileSync } from 'node:fs';
import { expect, test } from 'vitest';
import type { FrameLoomPiece } from '#core/craft/piece.ts';
import { tryMaking } from '#core/trial/try-making.ts';

const lowTide = JSON.parse(readFileSync('content/series/low-tide/piece.json', 'utf8')) as FrameLoomPiece;

test('on a loom like the pattern’s it fits, and nothing is different', () => {
  const tried = tryMaking(lowTide, {}, 'cm');
  expect(tried.fits && tried.fitted.changes).toEqual([]);
});

test('on a loom too narrow it says what is missing, and what would fit', () => {
  const tried = tryMaking(lowTide, { loom: { insideWidthMm: 280 } }, 'cm');
  expect(tried).toMatchObject({ fits: false, problems: [{ code: 'E_FIT' }] });
  const narrower = tried.fits ? undefined : tried.wouldFit.find(({ id }) => id === 'narrower');
  expect(narrower?.fitted.piece.size.widthMm).toBeLessThan(280);
});

test('numbers nobody weaves by are told in words, without a way out', () => {
  for (const loom of [{ insideWidthMm: -3 }, { insideWidthMm: Number.NaN }, { nailPitchMm: 1e9 }]) {
    const tried = tryMaking(lowTide, { loom }, 'cm');
    expect(tried.fits).toBe(false);
    expect(tried.fits ? '' : tried.problems.map(({ message }) => message).join(' ')).not.toMatch(/NaN|Infinity|undefined/);
  }
});
