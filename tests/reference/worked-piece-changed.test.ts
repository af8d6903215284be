/** What becomes of the worked piece when one thing about it changes (each worked out by hand from the table). */
import { describe, expect, test } from 'vitest';
import type { Problem } from '#core/outcome.ts';
import { planPiece } from '#core/craft/plan.ts';
import { reckon } from '#core/craft/reckon.ts';
import workedPiece from './worked-piece.json' with { type: 'json' };
import { expectClose } from './close.ts';
import { planOf } from './worked-piece.ts';

const problemsOf = (piece: unknown): readonly Problem[] => {
  const planned = planPiece(piece);
  return planned.ok ? [] : planned.problems;
};

test('50: in a frame of 500 mm it does not fit, and 392 mm of cloth would (shares divided out by hand)', () => {
  const problems = problemsOf({ ...workedPiece, loom: { ...workedPiece.loom, insideHeightMm: 500 } });
  expect(problems.map(({ code, path }) => [code, path])).toEqual([['E_FIT', '/loom/insideHeightMm']]);
  expect(problems[0]?.message).toContain('39.2 cm');
  expect(problems[0]?.message).toContain('50.9 cm');
});

test('51: where the pattern asks for no parity, the ends stay at 61, on 31 nails above and below (path walked by hand)', () => {
  const { ends } = planOf({ ...workedPiece, warp: { ...workedPiece.warp, parity: 'any' } });
  expect([ends.count, ends.nailsTop, ends.nailsBottom]).toEqual([61, 31, 31]);
});

test('ends pinned to an odd number are refused where even is asked for', () => {
  const problems = problemsOf({ ...workedPiece, warp: { ...workedPiece.warp, endCount: 61 } });
  expect(problems.map(({ code, path }) => [code, path])).toEqual([['E_PARITY', '/warp/endCount']]);
});

describe('13: a tex that is no tex (by definition)', () => {
  test.each([[0, 'E_RANGE'], [-5, 'E_RANGE'], [Number.NaN, 'E_NUM'], ['400', 'E_NUM']])('%s is refused as %s', (tex, code) => {
    const answer = reckon({ what: 'yarn', yarn: { tex } });
    expect(answer.ok ? [] : answer.problems.map((problem) => [problem.code, problem.path])).toEqual([[code, '/yarn/tex']]);
  });
});

test('doubled ends halve the working ends and double their spacing', () => {
  const { ends } = planOf({ ...workedPiece, warp: { ...workedPiece.warp, endsTogether: 2, parity: 'any' } });
  expect([ends.count, ends.working]).toEqual([62, 31]);
  expectClose(ends.spacingMm, 10, 1e-15);
});
