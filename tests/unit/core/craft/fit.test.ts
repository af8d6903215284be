import { readFileSync } from 'node:fs';
import { describe, expect, test } from 'vitest';
import { fitPiece, type MyPiece } from '#core/craft/fit.ts';
import { roomOnLoom } from '#core/craft/frame-loom/room.ts';
import { nthNailFor } from '#core/craft/fitting/change-piece.ts';
import type { FrameLoomPiece } from '#core/craft/piece.ts';
import { PLAIN_PIECE, pieceOf, pieceWith } from './a-piece.ts';

const PATTERN: FrameLoomPiece = pieceWith({ dowel: { diameterMm: 12, lengthMm: 380 }, yarns: { ground: { metresPer100g: 180, colour: '#6d93bc', label: 'Fenwool' } } });

const fitted = (mine: MyPiece, pattern: FrameLoomPiece = PATTERN) => {
  const outcome = fitPiece(pattern, mine);
  if (!outcome.ok) throw new Error(JSON.stringify(outcome.problems));
  const { changes, ...made } = outcome.value;
  return { ...made, changes: changes.map((words) => words.replaceAll('\u00a0', ' ')) };
};
const problemsWith = (mine: MyPiece): string[] => {
  const outcome = fitPiece(PATTERN, mine);
  return outcome.ok ? [] : outcome.problems.map(({ code, path, message }) => `${code} ${path} ${message}`);
};

test('on a loom like the pattern’s nothing changes', () => {
  const { piece, changes } = fitted({});
  expect(piece).toEqual(PATTERN);
  expect(changes).toEqual([]);
});

describe('nails', () => {
  test('twice as close are used every second one, so that the cloth stays the same', () => {
    const { piece, plan, changes } = fitted({ loom: { nailPitchMm: 5 } });
    expect(piece.loom).toMatchObject({ nailPitchMm: 5, everyNthNail: 2 });
    expect(plan.ends.spacingMm).toBe(5);
    expect(changes).toEqual(['The warp goes round every second nail.']);
  });

  test('a little wider apart give fewer ends', () => {
    const { plan, changes } = fitted({ loom: { nailPitchMm: 12 } });
    expect(plan.ends.count).toBe(52);
    expect(changes).toEqual(['Ends stand 6 mm apart instead of 5 mm.', 'There are 52 ends instead of 62.']);
  });

  test.each([[10, 10, 1], [10, 5, 2], [10, 4, 3], [10, 25, 1], [10, 0, 1], [10, Number.NaN, 1], [10, -3, 1], [10, 0.001, 50]])('a pattern at %f on nails at %f uses every %i-th', (pattern, own, nth) => {
    expect(nthNailFor(pattern, own)).toBe(nth);
  });

  test('a pattern that skipped nails uses all of a loom that has them where it needs them', () => {
    const skipping = pieceWith({ loom: { nailPitchMm: 5, everyNthNail: 2, warping: 'zigzag', insideHeightMm: 520 } });
    expect(fitted({ loom: { nailPitchMm: 10 } }, skipping).piece.loom).not.toHaveProperty('everyNthNail');
  });
});

describe('her own way of making it', () => {
  test('stepping along two nails halves the ends', () => {
    const { plan, changes } = fitted({ loom: { warping: 'two-nail' } });
    expect(plan.ends).toMatchObject({ count: 32, spacingMm: 10 });
    expect(changes[0]).toBe('The warp steps along two nails at a time.');
    expect(fitPiece(pieceWith({ loom: { ...PLAIN_PIECE.loom, warping: 'two-nail' } }), { loom: { warping: 'zigzag' } })).toMatchObject({
      ok: true,
      value: { changes: expect.arrayContaining(['The warp goes round every nail in a zigzag.']) as unknown },
    });
  });

  test('doubled ends are told, and single ones again', () => {
    expect(fitted({ endsTogether: 2 }).changes).toContain('Two ends are worked together as one.');
    const doubled = pieceWith({ warp: { yarn: { tex: 400 }, endsTogether: 2 } });
    expect(fitted({ endsTogether: 1 }, doubled).changes).toContain('Each end is worked by itself.');
  });

  test('a number of ends the pattern pinned stays only where nothing asks for another', () => {
    const pinned = pieceWith({ warp: { yarn: { tex: 400 }, endCount: 60 } });
    expect(fitted({ yarns: { ground: { tex: 500 } } }, pinned).plan.ends.count).toBe(60);
    expect(fitted({ widthMm: 200 }, pinned).plan.ends.count).toBe(41);
    expect(fitted({ loom: { insideHeightMm: 600 } }, pinned).plan.ends.count).toBe(60);
  });

  test('a narrower piece takes its shapes, its dowel and its cord along', () => {
    const shaped = {
      ...PATTERN,
      ...pieceOf(
        {
          technique: 'tabby',
          yarn: 'ground',
          heightMm: 120,
          shapes: [
            { shape: 'triangle', yarn: 'ground', baseMm: 200, heightMm: 60, centreMm: 150, leanMm: 30 },
            { shape: 'circle', yarn: 'ground', radiusMm: 50, bottomMm: 10, centreMm: 100 },
            { shape: 'points', yarn: 'ground', points: [{ xMm: 0, yMm: 0 }, { xMm: 80, yMm: 10 }, { xMm: 20, yMm: 60 }], centreMm: 200 },
          ],
        },
        { technique: 'twining', yarn: 'ground', rows: 1 },
      ),
      dowel: { diameterMm: 12, lengthMm: 380 },
    };
    const { piece } = fitted({ widthMm: 150 }, shaped);
    expect(piece.bands[0]).toMatchObject({
      shapes: [
        { shape: 'triangle', baseMm: 100, heightMm: 60, centreMm: 75, leanMm: 15 },
        { shape: 'circle', radiusMm: 25, bottomMm: 10, centreMm: 50 },
        { shape: 'points', points: [{ xMm: 0, yMm: 0 }, { xMm: 40, yMm: 10 }, { xMm: 10, yMm: 60 }], centreMm: 100 },
      ],
    });
    expect(piece.dowel).toEqual({ diameterMm: 12, lengthMm: 230 });
    const wider = fitted({ widthMm: 400, loom: { insideHeightMm: 600 } }, shaped).piece.bands[0];
    expect(wider).toMatchObject({ shapes: [{ baseMm: 200 * (400 / 300) }, { radiusMm: 50 }, { points: [{ xMm: 0, yMm: 0 }, { xMm: 80 * (400 / 300), yMm: 10 }, { yMm: 60 }] }] });
  });

  test('her yarn takes the role, and the pattern’s colour where she has not said her own', () => {
    const { piece, plan, changes } = fitted({ yarns: { ground: { tex: 700, label: 'Found in the attic' } } });
    expect(piece.yarns['ground']).toEqual({ tex: 700, label: 'Found in the attic', colour: '#6d93bc' });
    expect(fitted({ yarns: { ground: { tex: 700, colour: '#112233' } } }).piece.yarns['ground']).toMatchObject({ colour: '#112233' });
    expect(changes[0]).toBe('Found in the attic is the ground yarn.');
    expect(changes[1]).toMatch(/^277 rows of tabby become \d+\.$/u);
    expect(plan.weft.pickSpacingMm).toBeGreaterThan(1.6);
    expect(fitted({ yarns: { ground: { tex: 700 } } }).changes[0]).toBe('Your own yarn is the ground yarn.');
  });

  test('a yarn kept for a role the teacher took out is only a warning', () => {
    const outcome = fitPiece(PATTERN, { yarns: { fringe: { tex: 400 } } });
    expect(outcome).toMatchObject({ ok: true, warnings: expect.arrayContaining([{ code: 'W_UNUSED', path: '/yarns/fringe', message: expect.any(String) as unknown }]) as unknown });
  });

  test('changes are told in inches to those who measure so', () => {
    const outcome = fitPiece(PATTERN, { widthMm: 254 }, 'in');
    expect(outcome.ok ? outcome.value.changes[0] : '').toBe('The piece is 10\u00a0in wide instead of 11\u200913/16\u00a0in.');
  });
});

test('a pattern that does not fit its own loom may fit hers, and then nothing can be compared', () => {
  const tight = { ...PATTERN, loom: { ...PATTERN.loom, insideHeightMm: 300 } };
  expect(fitted({ loom: { insideHeightMm: 600 } }, tight).changes).toEqual([]);
});

test('nails far closer than the pattern’s are counted in words as far as words go', () => {
  expect(fitted({ loom: { nailPitchMm: 1 } }).changes).toEqual(['The warp goes round every tenth nail.']);
  const wide = { ...PATTERN, loom: { ...PATTERN.loom, nailPitchMm: 12 } };
  expect(fitted({ loom: { nailPitchMm: 1 } }, wide).changes).toEqual(['The warp goes round every 12th nail.']);
});

describe('a loom that is too small', () => {
  test('names the largest piece it holds', () => {
    expect(problemsWith({ loom: { insideWidthMm: 280 } })).toEqual(['E_FIT /loom/insideWidthMm The loom is 28 cm inside. The piece needs 35 cm. At this spacing up to 23.5 cm fit.']);
    expect(problemsWith({ loom: { insideHeightMm: 450 } })).toEqual(['E_FIT /loom/insideHeightMm The loom is 45 cm high inside. The piece needs 50.9 cm. Up to 34.3 cm of cloth fit.']);
    expect(problemsWith({ loom: { insideWidthMm: 50 } })[0]).toContain('No width fits at this spacing.');
    expect(problemsWith({ loom: { insideHeightMm: 90 } })[0]).toContain('No height fits beside the unwoven warp.');
  });

  test('holds exactly the piece it names', () => {
    const room = roomOnLoom({ ...PATTERN, loom: { ...PATTERN.loom, insideWidthMm: 280 } });
    expect(problemsWith({ loom: { insideWidthMm: 280 }, widthMm: room.widthMm ?? 0 })).toEqual([]);
    expect(roomOnLoom(PATTERN)).toEqual({ heightMm: expect.closeTo(411.6, 9) as unknown });
  });
});

describe('what a student mistypes', () => {
  test.each<[MyPiece, string]>([
    [{ widthMm: -3 }, 'E_RANGE /size/widthMm'],
    [{ widthMm: Number.NaN }, 'E_NUM /size/widthMm'],
    [{ widthMm: 0 }, 'E_RANGE /size/widthMm'],
    [{ loom: { nailPitchMm: Number.NaN } }, 'E_NUM /loom/nailPitchMm'],
    [{ loom: { nailPitchMm: 0 } }, 'E_RANGE /loom/nailPitchMm'],
    [{ loom: { insideHeightMm: -1 } }, 'E_RANGE /loom/insideHeightMm'],
    [{ yarns: { ground: { tex: 0 } } }, 'E_RANGE /yarns/ground/tex'],
  ])('%j is one problem at its field', (mine, expected) => {
    const found = problemsWith(mine);
    expect(found).toHaveLength(1);
    expect(found[0]).toContain(expected);
  });
});

test('the demo series fits its own loom, and a narrower one with every second nail', () => {
  const piece = JSON.parse(readFileSync(new URL('../../../../content/series/low-tide/piece.json', import.meta.url), 'utf8')) as FrameLoomPiece;
  expect(fitPiece(piece, {})).toMatchObject({ ok: true, warnings: [] });
  expect(fitPiece(piece, { widthMm: 300, loom: { nailPitchMm: 5, insideWidthMm: 400 } })).toMatchObject({ ok: true, value: { piece: { loom: { everyNthNail: 2 } } } });
});

test('a pattern of no known craft is refused, with what is wrong with hers', () => {
  const unknown = { ...PATTERN, craft: 'lace' } as unknown as FrameLoomPiece;
  const refusals = (mine: unknown): string[] => {
    const outcome = fitPiece(unknown, mine as MyPiece);
    return outcome.ok ? ['fits'] : outcome.problems.map(({ code, path }) => `${code} ${path}`);
  };
  expect(refusals({})).toEqual(['E_ENUM /craft']);
  expect(refusals({ loom: 7, more: true })).toEqual(['E_ENUM /craft', 'E_ENUM /loom', 'E_ENUM /more']);
  const known = fitPiece(PATTERN, { loom: 7, yarns: { ground: 'wool' }, cords: { main: 4 }, rod: 2 } as unknown as MyPiece);
  expect(known.ok ? [] : known.problems.map(({ path }) => path)).toEqual(['/loom', '/yarns/ground', '/cords/main', '/rod']);
});

describe('what her plan warns of', () => {
  const yarns = { ground: { metresPer100g: 180 }, red: { metresPer100g: 180 }, blue: { metresPer100g: 180 } };
  const pattern = pieceWith({ yarns, bands: [...PLAIN_PIECE.bands, { technique: 'twining', name: 'line', yarn: 'red', rows: 2 }] });
  const warnings = (mine: MyPiece, of = pattern): string[] => {
    const outcome = fitPiece(of, mine);
    return outcome.ok ? outcome.warnings.map(({ code, path }) => `${code} ${path}`) : ['refused'];
  };

  test('is a yarn the pattern does not use either, but not one that only a band she leaves out was woven with', () => {
    expect(warnings({})).toEqual(['W_UNUSED /yarns/blue', 'W_PARITY /warp/parity']);
    expect(warnings({ way: { kind: 'fewer-bands', leaveOut: ['line'] } })).toEqual(['W_UNUSED /yarns/blue', 'W_PARITY /warp/parity']);
  });

  test('is anything else that her loom brings about', () => {
    expect(warnings({ loom: { nailPitchMm: 30 } })).toContain('W_LOOSE /yarns/ground');
  });

  test('is a yarn of hers for a role that the pattern has no more, in words', () => {
    const outcome = fitPiece(PATTERN, { yarns: { gold: { tex: 400 } } });
    expect(outcome.ok && outcome.warnings.at(-1)).toEqual({ code: 'W_UNUSED', path: '/yarns/gold', message: 'The pattern has no yarn in the role “gold” any more.' });
  });
});
