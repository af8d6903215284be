import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import type { Band, FrameLoomPiece } from '#core/craft/piece.ts';
import { planRest, type RestPlan, type WovenSoFar } from '#core/craft/rest/plan-rest.ts';
import { widen } from '#core/craft/fitting/widen.ts';
import { refuseChanges } from '#core/craft/rest/fixed-on-loom.ts';
import { cases } from '../../../../support/random-cases.ts';
import { lowTide } from '../../../../support/low-tide.ts';
import { PLAIN_PIECE, pieceWith, planOf } from '../a-piece.ts';

const pattern = await lowTide();
const plain = (words: string): string => words.replaceAll('\u00a0', ' ');
const restOf = (piece: FrameLoomPiece, woven: WovenSoFar): RestPlan => {
  const rest = planRest(piece, woven);
  if (!rest.ok) throw new Error(JSON.stringify(rest.problems));
  return rest.value;
};
const problemsOf = (piece: unknown, woven: unknown): string[] => {
  const rest = planRest(piece, woven);
  return rest.ok ? [] : rest.problems.map(({ code, path, message }) => `${code} ${path} ${plain(message)}`);
};
const warningsOf = (piece: FrameLoomPiece, woven: WovenSoFar): string[] => {
  const rest = planRest(piece, woven);
  return rest.ok ? rest.warnings.map(({ code, path, message }) => `${code} ${path} ${plain(message)}`) : [];
};

test('with nothing woven the rest is the plan', () => {
  for (const piece of [pattern, PLAIN_PIECE]) {
    const [rest, plan] = [restOf(piece, { bandsDone: 0 }), planOf(piece)];
    expect(rest.bands).toEqual(plan.bands);
    expect(rest.hours).toEqual(plan.hours);
    expect(rest.warp).toEqual(plan.warp);
    expect(rest.heightMm).toBe(piece.size.heightMm);
    for (const [role, yarn] of Object.entries(plan.yarns)) expect(rest.yarns[role]).toMatchObject({ netMm: yarn.netMm, withMarginMm: yarn.withMarginMm, massG: yarn.massG });
  }
});

test('with all woven nothing is needed, and only finishing is left', () => {
  const rest = restOf(pattern, { bandsDone: pattern.bands.length });
  expect(rest).toMatchObject({ rows: 0, bands: [], warp: { netMm: 0 }, hours: { likely: 0.75 } });
  for (const { netMm } of Object.values(rest.yarns)) expect(netMm).toBe(0);
});

describe('a plain piece of 277 rows with 100 of them woven', () => {
  // A row 328.4816 mm (62 ends), 177 rows left: 58.14124 m, in 8 loads of 8 m with two tails of 50 mm each.
  test('has 177 rows and their yarn to go', () => {
    const rest = restOf(PLAIN_PIECE, { bandsDone: 0, rows: 100 });
    expect(rest.rows).toBe(177);
    expect(rest.yarns['ground']?.netMm).toBeCloseTo(177 * 328.4816 + 8 * 100, 0);
    expect(rest.warp.netMm).toBe(0);
    expect(rest.trust).toBe('formula');
    // 177 rows of 57.2 s and the finishing.
    expect(rest.hours.likely).toBeCloseTo((177 * 57.2) / 3600 + 0.75, 9);
  });

  // By the plan 100 rows come to 144.5624 mm finished. Measured 163.9 on the loom, 160.622 finished: 1.60622 from row to
  // row, and (400 − 160.622)/1.60622 = 149.03 rows are left.
  test('is reckoned with the rows as they were measured', () => {
    const rest = restOf(PLAIN_PIECE, { bandsDone: 0, rows: 100, heightMm: 163.9 });
    expect(rest.trust).toBe('measured');
    expect(rest.picksPerCm).toBeCloseTo(10 / 1.60622, 6);
    expect(rest.rows).toBe(149);
    expect(rest.heightMm).toBeCloseTo(400, 6);
    // A measured beat needs 10 % in reserve instead of 15.
    const yarn = rest.yarns['ground'];
    expect((yarn?.withMarginMm ?? 0) / (yarn?.netMm ?? 1)).toBeCloseTo(1.1, 9);
  });

  test('keeps what was assumed while too little is woven to measure', () => {
    expect(restOf(PLAIN_PIECE, { bandsDone: 0, rows: 10, heightMm: 15 }).trust).toBe('formula');
  });

  test('weighs what is left against what is needed', () => {
    // 180 m in 100 g: 33 g are 59.4 m, 50 g are 90 m. The rest takes 58.94 m, with 15 % 67.78 m.
    expect(warningsOf(PLAIN_PIECE, { bandsDone: 0, rows: 100, leftG: { ground: 50 } })).toEqual([]);
    expect(warningsOf(PLAIN_PIECE, { bandsDone: 0, rows: 100, leftG: { ground: 33 } })).toEqual([
      'W_TIGHT /leftG/ground The rest takes 59 m of ground, 68 m with its margin, and 59 m are left. That suffices only just: 8.4 m more is safer.',
    ]);
    expect(warningsOf(PLAIN_PIECE, { bandsDone: 0, rows: 100, leftG: { ground: 20 } })[0]).toMatch(/^W_SHORT \/leftG\/ground .* 36 m are left\. That does not suffice: get 32 m more/u);
    expect(restOf(pieceWith({ yarns: { ground: { metresPer100g: 180, ball: { metres: 90, grams: 50 } } } }), { bandsDone: 0, rows: 100, leftG: { ground: 20 } }).yarns['ground']).toMatchObject({ ballsToGet: 1 });
  });
});

describe('a piece of several bands', () => {
  test('takes the rows of a shape from where the fell lies', () => {
    const dunes = pattern.bands.findIndex(({ name }) => name === 'dunes');
    const whole = restOf(pattern, { bandsDone: dunes });
    const half = restOf(pattern, { bandsDone: dunes, rows: 60 });
    expect(half.rows).toBe(whole.rows - 60);
    // The wedge of green ends below its 80 mm: with 120 rows woven none of it is left.
    expect(restOf(pattern, { bandsDone: dunes, rows: 120 }).yarns['green']?.netMm).toBe(0);
    expect(half.yarns['water']?.netMm ?? 0).toBeLessThan(whole.yarns['water']?.netMm ?? 0);
  });

  test('counts rows of soumak as rows of their band', () => {
    const ridge = pattern.bands.findIndex(({ name }) => name === 'ridge-low');
    const [whole, half] = [restOf(pattern, { bandsDone: ridge }), restOf(pattern, { bandsDone: ridge, rows: 3 })];
    expect(half.bands[0]?.stitches).toBe((whole.bands[0]?.stitches ?? 0) / 2);
  });

  test('warns when cloth that grows too high leaves no open warp', () => {
    const low: Band[] = [{ technique: 'tabby', yarn: 'ground', heightMm: 200 }, { technique: 'tabby', yarn: 'ground', heightMm: 200 }];
    const piece = pieceWith({ bands: low });
    // 200 mm are 204.1 on the loom; 230 instead.
    const woven: WovenSoFar = { bandsDone: 1, heightMm: 230 };
    expect(warningsOf(piece, woven)[0]).toMatch(/^W_ROOM \/heightMm Woven on like this, the cloth grows 14\.\d mm into the warp/u);
    expect(restOf(piece, woven).heightMm).toBeCloseTo(230 * 0.98 + 200, 6);
  });
});

describe('what makes no sense is refused', () => {
  test.each<[unknown, string]>([
    [{ bandsDone: 15 }, 'E_RANGE /bandsDone This piece has 14 bands. Say how many of them are finished.'],
    [{ bandsDone: 14, rows: 3 }, 'E_RANGE /rows Every band is finished, so no row is left to count. Leave the rows empty.'],
    [{ bandsDone: 0, rows: 3 }, 'E_RANGE /rows This band has no rows to count. Leave them empty, and say that it is finished when it is.'],
    [{ bandsDone: 7, rows: 9 }, 'E_RANGE /rows This band has 6 rows. Between 0 and 6 works.'],
    [{ bandsDone: 1.5 }, 'E_COUNT /bandsDone Bands that are finished must be a whole number.'],
    [{ bandsDone: '2' }, 'E_NUM /bandsDone Bands that are finished is not a number. Give it as a plain number, such as 12.5.'],
    [null, 'E_ENUM  What is woven must be a group of named values.'],
  ])('%j', (woven, says) => {
    expect(problemsOf(pattern, woven)).toEqual([says]);
  });

  test('rows that cannot be so high are to be measured again', () => {
    expect(problemsOf(PLAIN_PIECE, { bandsDone: 0, rows: 100, heightMm: 30 })[0]).toContain('E_RANGE /heightMm So many rows cannot be so high: by the plan they come to 14.8 cm on the loom.');
    expect(problemsOf({}, { bandsDone: 0 })).toContain('E_ENUM /piece/size Size is missing.');
  });
});

describe('what is on the loom stays', () => {
  const made = (piece: FrameLoomPiece) => ({ piece, plan: planOf(piece) });
  const woven: WovenSoFar = { bandsDone: 2, rows: 1 };
  const refusals = (after: FrameLoomPiece, so = woven): string[] => refuseChanges(made(pattern), made(after), so).map(({ code, path }) => `${code} ${path}`);

  test('width, ends and spacing, and the bands that are woven', () => {
    expect(refusals(widen(pattern, 300))).toContain('E_FIT /size/widthMm');
    expect(refusals({ ...pattern, loom: { ...pattern.loom, nailPitchMm: 8 } })).toEqual(['E_FIT /loom/nailPitchMm']);
    expect(refusals({ ...pattern, bands: pattern.bands.slice(1) })).toEqual(['E_FIT /bands']);
  });

  test('so do ends that are worked singly or in pairs', () => {
    expect(refusals({ ...pattern, warp: { ...pattern.warp, endsTogether: pattern.warp.endsTogether === 2 ? 1 : 2 } }, { bandsDone: 1 })).toContain('E_FIT /warp/endsTogether');
    // A first row is enough; a band that is not begun may go.
    expect(refusals({ ...pattern, bands: pattern.bands.slice(1) }, { bandsDone: 0, rows: 1 })).toEqual(['E_FIT /bands']);
    expect(refusals({ ...pattern, bands: pattern.bands.toSpliced(1, 1) }, { bandsDone: 1 })).toEqual([]);
    expect(refusals({ ...pattern, bands: pattern.bands.toSpliced(1, 1) }, { bandsDone: 1, rows: 1 })).toEqual(['E_FIT /bands']);
  });

  test('but not its other yarns and the bands to come, nor anything while nothing is woven', () => {
    expect(refusals({ ...pattern, bands: pattern.bands.filter(({ name }) => name !== 'calm-high'), yarns: { ...pattern.yarns, ridge: { tex: 300 } } })).toEqual([]);
    expect(refusals(widen(pattern, 300), { bandsDone: 0 })).toEqual([]);
  });
});

test('the further one is, the less is left', () => {
  fc.assert(
    fc.property(fc.integer({ min: 0, max: pattern.bands.length }), fc.integer({ min: 0, max: 200 }), (bandsDone, rows) => {
      const [before, after] = [planRest(pattern, { bandsDone }), planRest(pattern, { bandsDone, rows })];
      if (!before.ok || !after.ok) return !after.ok;
      return Object.entries(after.value.yarns).every(([role, { netMm }]) => netMm <= (before.value.yarns[role]?.netMm ?? 0) + 1e-6) && after.value.hours.likely <= before.value.hours.likely;
    }),
    { numRuns: cases(1000), seed: 20261001 },
  );
});
