import { describe, expect, test } from 'vitest';
import { fitPiece, type MyPiece } from '#core/craft/fit.ts';
import { BANDS_DONE, HEIGHT, leftAsked, ROWS } from '#core/craft/my-piece/asked-of-woven.ts';
import { isTold, judgeWoven, NOTHING_KEPT, wovenFieldOf, type KeptPiece } from '#core/craft/my-piece/judge-woven.ts';
import type { FrameLoomPiece } from '#core/craft/piece.ts';
import { rowsIn, wovenShare } from '#core/craft/rest/woven-share.ts';
import type { WovenSoFar } from '#core/craft/rest/woven-so-far.ts';
import { PLAIN_PIECE, pieceOf, planOf } from '../a-piece.ts';

const judged = (woven: WovenSoFar, mine: MyPiece, kept: KeptPiece = NOTHING_KEPT) => {
  const made = fitPiece<FrameLoomPiece>(PLAIN_PIECE, mine);
  if (!made.ok) throw new Error(JSON.stringify(made.problems));
  return judgeWoven(woven, mine, made.value, kept, PLAIN_PIECE, 'cm');
};
const problems = (...of: Parameters<typeof judged>): string[] => {
  const outcome = judged(...of);
  return outcome.ok ? [] : outcome.problems.map(({ code, path }) => `${code} ${path}`);
};

describe('a piece half way', () => {
  const begun: WovenSoFar = { bandsDone: 0, rows: 100 };

  test('has its rest', () => {
    const outcome = judged(begun, {});
    expect(outcome.ok && outcome.value).toMatchObject({ woven: begun, rest: { rows: 177 } });
    expect(outcome.ok && outcome.value).not.toHaveProperty('restAsKept');
  });

  test('keeps its width once it is begun, but may be woven on with another yarn, and both rests are told', () => {
    const kept: KeptPiece = { mine: {}, woven: begun };
    expect(problems(begun, { widthMm: 200 }, kept)).toEqual(['E_FIT /size/widthMm']);
    expect(problems(begun, { widthMm: 200 })).toEqual([]);
    const thicker = judged(begun, { yarns: { ground: { metresPer100g: 100 } } }, kept);
    expect(thicker.ok && thicker.value.restAsKept?.rows).toBe(177);
    expect(judged(begun, {}, kept)).not.toHaveProperty('value.restAsKept');
  });

  test('of which more is said than there is, is refused at its place, with what may not change', () => {
    expect(problems({ bandsDone: 3 }, {})).toEqual(['E_RANGE /bandsDone']);
    expect(problems({ bandsDone: 3 }, { widthMm: 200 }, { mine: {}, woven: begun })).toEqual(['E_FIT /size/widthMm', 'E_RANGE /bandsDone']);
  });

  test('is told of from the first row, or from yarn that was weighed', () => {
    expect([isTold({ bandsDone: 0 }), isTold(begun), isTold({ bandsDone: 1 }), isTold({ bandsDone: 0, leftG: { ground: 40 } })]).toEqual([false, true, true, true]);
  });

  test.each([
    ['/bandsDone', BANDS_DONE.key], ['/rows', ROWS.key], ['/heightMm', HEIGHT.key], ['/leftG/ground', leftAsked('ground').key], ['/leftG/a~1b', leftAsked('a/b').key],
    ['/leftG', undefined], ['/size/widthMm', undefined],
  ])('%s is about the field %s', (path, field) => {
    expect(wovenFieldOf(path)).toBe(field);
  });
});

describe('how far up the fell is', () => {
  // 100 of tabby, 40 of a fringe in four rows, and a sky that fills the other 260 of 400.
  const piece = pieceOf(
    { technique: 'tabby', yarn: 'ground', heightMm: 100 },
    { technique: 'rya', yarn: 'ground', strands: 3, legEnds: 1, pileMm: 80, trimMm: 5, rows: 4, heightMm: 40 },
  );
  const made = { piece, plan: planOf(piece) };

  test.each<[WovenSoFar, number]>([
    [{ bandsDone: 0 }, 0], [{ bandsDone: 1 }, 0.25], [{ bandsDone: 1, rows: 2 }, 0.3], [{ bandsDone: 1, rows: 9 }, 0.35], [{ bandsDone: 2 }, 0.35], [{ bandsDone: 3 }, 1], [{ bandsDone: 3, rows: 5 }, 1],
  ])('with %j it is at %f of the height', (woven, share) => {
    expect(wovenShare(made, woven)).toBeCloseTo(share, 9);
  });

  test('rows are those of tabby as planned, of a technique as the piece says; a band without any has none', () => {
    const [tabby, rya] = made.plan.bands;
    expect(rowsIn(tabby, piece.bands[0])).toBe(tabby?.picks);
    expect(rowsIn(rya, piece.bands[1])).toBe(4);
    expect(rowsIn(tabby, { technique: 'roving', yarn: 'ground', over: 4, bulgeMm: 12, heightMm: 40 })).toBeUndefined();
    expect(rowsIn(undefined, piece.bands[0])).toBeUndefined();
    expect(rowsIn(tabby, undefined)).toBeUndefined();
    expect(wovenShare({ piece, plan: { ...made.plan, bands: [] } }, { bandsDone: 0, rows: 3 })).toBe(0);
  });
});
