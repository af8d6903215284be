import { describe, expect, test } from 'vitest';
import { TECHNIQUE_NAMES } from '#core/craft/techniques/registry.ts';
import { TECHNIQUE_WORDS } from '#core/craft/techniques/technique-words.ts';
import { pieceOf, pieceWith, planOf, problemsOf, refusals, warningsOf } from '../a-piece.ts';

const tabby = { technique: 'tabby', yarn: 'ground', heightMm: 100 } as const;
const bandOf = (band: Parameters<typeof pieceOf>[0]) => planOf(pieceOf(band)).bands[0];

describe('doubled weft', () => {
  const single = bandOf(tabby);
  const doubled = bandOf({ ...tabby, strands: 2 });

  test('lies √2 as thick, so fewer rows fill the band', () => {
    expect(doubled?.picks).toBe(Math.round(100 / (Math.SQRT2 * 1.445624)));
    expect(single?.picks).toBe(69);
  });

  test('takes two strands a row, each a little longer than one alone', () => {
    const ofOneRow = (band: typeof single): number => (band?.yarnMm['ground'] ?? 0) / (band?.picks ?? 1);
    expect(ofOneRow(doubled)).toBeGreaterThan(2 * ofOneRow(single));
    expect(ofOneRow(doubled)).toBeLessThan(2.1 * ofOneRow(single));
  });

  test('stands in the place of the strands the yarn is taken in otherwise', () => {
    const twofold = pieceWith({ yarns: { ground: { metresPer100g: 180, strands: 2 } } });
    expect(planOf({ ...twofold, bands: [tabby, ...twofold.bands] }).bands[0]).toEqual(doubled);
    const { bands } = planOf({ ...twofold, bands: [{ ...tabby, strands: 1 }, ...twofold.bands] });
    expect(bands[0]?.yarnMm['ground']).toBeCloseTo(single?.yarnMm['ground'] ?? 0, 6);
  });

  test('lies as much further apart than the rows that were counted on a swatch', () => {
    const counted = { ...pieceOf({ ...tabby, strands: 4 }, tabby), beat: { picksPerCm: 6 } };
    expect(planOf(counted).bands.slice(0, 2).map(({ picks }) => picks)).toEqual([30, 60]);
  });
});

describe('basket weave', () => {
  const basket = { ...tabby, basket: true } as const;

  test('takes two ends as one and two strands in a row', () => {
    const woven = bandOf(basket);
    expect(woven?.picks).toBe(bandOf({ ...tabby, strands: 2 })?.picks);
    // 31 pairs of ends, 10 mm apart, met by yarn √2 as thick on either side (Peirce’s arcs and line added up).
    const D = Math.SQRT2 * (0.8014131 + 1.011937);
    const step = Math.sqrt(100 - D * D) + D * Math.asin(D / 10);
    const turn = Math.hypot((Math.PI * D) / 2, Math.SQRT2 * 1.445624);
    expect(woven?.yarnMm['ground']).toBeCloseTo((woven?.picks ?? 0) * 2 * (30 * step + turn), 1);
  });

  test('asks for an even number of ends by itself', () => {
    const any = { ...pieceOf(basket), warp: { yarn: { tex: 400 } } };
    expect(planOf(any).ends.working).toBe(62);
    expect(warningsOf(any)).toContain('W_PARITY /warp/parity');
    expect(planOf({ ...pieceOf(tabby), warp: { yarn: { tex: 400 } } }).ends.working).toBe(61);
  });

  test('cannot be woven on ends that must be odd, pinned or not', () => {
    expect(problemsOf({ ...pieceOf(tabby, basket), warp: { yarn: { tex: 400 }, parity: 'odd' } })).toEqual([
      { code: 'E_PARITY', path: '/warp/parity', message: 'Band 2 takes the ends in pairs, so their number must be even. Ask for an even one, or for any.' },
    ]);
    expect(refusals({ ...pieceOf(basket), warp: { yarn: { tex: 400 }, endCount: 61 } })).toEqual(['E_PARITY /warp/endCount']);
  });

  test('holds shapes that are stepped in pairs of ends', () => {
    const shaped = bandOf({ ...basket, shapes: [{ shape: 'rectangle', yarn: 'ground', baseMm: 100, heightMm: 50 }] });
    expect(shaped?.picks).toBe(bandOf(basket)?.picks);
    expect(shaped?.yarnMm['ground']).toBeGreaterThan(0);
  });

  test('is true or false, and nothing else', () => {
    expect(refusals(pieceOf({ ...tabby, basket: 2 as unknown as boolean }))).toEqual(['E_ENUM /bands/0/basket']);
    expect(refusals(pieceOf({ ...tabby, strands: 0 }))).toEqual(['E_RANGE /bands/0/strands']);
  });
});

describe('plain ends beside rya', () => {
  const rya = { technique: 'rya', yarn: 'ground', strands: 2, legEnds: 1, pileMm: 40, trimMm: 0, rows: 1, heightMm: 6 } as const;

  test('take no knots', () => {
    expect(bandOf(rya)?.knots).toBe(31);
    expect(bandOf({ ...rya, edgeEnds: 2 })?.knots).toBe(29);
    expect(warningsOf(pieceOf({ ...rya, legEnds: 2, edgeEnds: 1 }))).not.toContain('W_PLAIN_END /bands/0/legEnds');
  });

  test('must leave room for a knot', () => {
    expect(refusals(pieceOf({ ...rya, edgeEnds: 31 }))).toEqual(['E_FIT /bands/0/edgeEnds']);
    expect(refusals(pieceOf({ ...rya, legEnds: 40, edgeEnds: 2 }))).toEqual(['E_FIT /bands/0/legEnds']);
  });
});

describe('twining', () => {
  const twining = { technique: 'twining', yarn: 'ground', rows: 2 } as const;

  test('crossed less often takes fewer stitches and less yarn', () => {
    const [every, second] = [bandOf(twining), bandOf({ ...twining, endsPerTwist: 2 })];
    expect([every?.stitches, second?.stitches]).toEqual([124, 62]);
    expect(second?.yarnMm['ground']).toBeLessThan(every?.yarnMm['ground'] ?? 0);
    expect(second?.yarnMm['ground']).toBeGreaterThan(2 * 2 * 305);
  });

  test('is crossed somewhere', () => {
    expect(refusals(pieceOf({ ...twining, endsPerTwist: 63 }))).toEqual(['E_FIT /bands/0/endsPerTwist']);
  });
});

test.each(TECHNIQUE_NAMES)('%s says what it is called, what the hand does and what to heed', (name) => {
  const { label, how, cautions } = TECHNIQUE_WORDS[name];
  expect(label).toMatch(/^[A-Z]/u);
  for (const sentence of [how, ...cautions]) expect(sentence).toMatch(/^[A-Z].*\.$/u);
  expect(cautions.length).toBeGreaterThan(0);
});
