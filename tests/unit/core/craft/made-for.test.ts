import { describe, expect, test } from 'vitest';
import { madeFor } from '#core/craft/made-for.ts';
import { PLAIN_PIECE, pieceWith } from './a-piece.ts';

describe('the piece a page reckons with', () => {
  test('is the pattern for a student who changed nothing', () => {
    expect(madeFor(PLAIN_PIECE, {}, 'cm')).toMatchObject({ piece: PLAIN_PIECE, isOwn: false, problems: [], plan: { ends: { count: 62 } } });
  });

  test('is her own where she has one that can be woven', () => {
    const own = madeFor(PLAIN_PIECE, { loom: { nailPitchMm: 8 } }, 'cm');
    expect(own).toMatchObject({ isOwn: true, problems: [], piece: { loom: { nailPitchMm: 8 } } });
    expect(own).toHaveProperty('plan.ends.count', 78);
  });

  test('falls back to the pattern where hers cannot be woven any more, and says why', () => {
    const made = madeFor(PLAIN_PIECE, { loom: { insideHeightMm: 100 } }, 'cm');
    expect(made).toMatchObject({ isOwn: false, piece: PLAIN_PIECE });
    expect(made?.problems.map(({ code }) => code)).toContain('E_FIT');
  });

  test('is none where the pattern is missing or cannot be woven', () => {
    expect(madeFor(null, {}, 'cm')).toBeNull();
    expect(madeFor(pieceWith({ size: { widthMm: 300, heightMm: 5_000 } }) , {}, 'cm')).toBeNull();
  });

  test('is half way with what she told of it; not where the pattern stands in for hers, nor where nothing is woven', () => {
    const woven = { bandsDone: 0, rows: 100 };
    expect(madeFor(PLAIN_PIECE, {}, 'cm', woven)?.halfway).toMatchObject({ woven, rest: { rows: 177 } });
    expect(madeFor(PLAIN_PIECE, {}, 'cm')?.halfway).toBeNull();
    expect(madeFor(PLAIN_PIECE, { loom: { insideHeightMm: 100 } }, 'cm', woven)?.halfway).toBeNull();
  });

  test('is whole, and says why, where what she told belongs to another piece', () => {
    const made = madeFor(PLAIN_PIECE, {}, 'cm', { bandsDone: 9 });
    expect(made).toMatchObject({ halfway: null, problems: [], plan: { ends: { count: 62 } } });
    expect(made?.restProblems.map(({ path }) => path)).toEqual(['/bandsDone']);
  });
});
