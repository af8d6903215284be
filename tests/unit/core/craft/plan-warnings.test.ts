import { describe, expect, test } from 'vitest';
import { pieceOf, pieceWith, planOf, PLAIN_PIECE, warningsOf } from './a-piece.ts';

const warningWords = (piece: unknown, code: string): string[] => planOf(piece).warnings.filter((warning) => warning.code === code).map(({ message }) => message);
const withGround = (yarn: object): unknown => ({ ...PLAIN_PIECE, yarns: { ground: yarn } });

test('a piece that is all right only says that an end was added for the parity', () => {
  expect(warningsOf(PLAIN_PIECE)).toEqual(['W_PARITY /warp/parity']);
  expect(warningWords(PLAIN_PIECE, 'W_PARITY')).toEqual(['This pattern needs an even number of ends. 61 becomes 62; the cloth grows by 5 mm.']);
});

test('doubled ends that had to be raised say so at the doubling', () => {
  const piece = { ...PLAIN_PIECE, warp: { yarn: { tex: 400 }, endsTogether: 2 } };
  expect(warningWords(piece, 'W_PARITY')).toEqual(['This pattern needs ends in pairs. 61 becomes 62; the cloth grows by 5 mm.']);
  const odd = { ...PLAIN_PIECE, warp: { yarn: { tex: 400 }, endsTogether: 2, parity: 'even' } };
  expect(planOf(odd).ends.working % 2).toBe(0);
  expect(warningWords(odd, 'W_PARITY')).toEqual(['This pattern needs an even number of pairs of ends. 61 becomes 64; the cloth grows by 1.5 cm.'].map((words) => words.replace('1.5 cm', '15 mm')));
});

describe('a yarn', () => {
  test('that is as thick as the room between ends lets the warp show', () => {
    expect(warningsOf(withGround({ metresPer100g: 100, wrapsPerInch: 5 }))).toContain('W_WARP_SHOWS /yarns/ground');
    expect(warningsOf(withGround({ metresPer100g: 180, wrapsPerInch: 10 }))).not.toContain('W_WARP_SHOWS /yarns/ground');
  });

  test('that is thick for its ends says how far apart they would suit it', () => {
    expect(warningWords(withGround({ metresPer100g: 100, wrapsPerInch: 7.5 }), 'W_THICK')).toEqual([
      'This yarn is thick for ends so close, and hard to beat down. It suits ends 6.5 mm apart and more.',
    ]);
    expect(warningsOf(withGround({ metresPer100g: 100, wrapsPerInch: 5 }))).not.toContain('W_THICK /yarns/ground');
  });

  test('that is thin for its ends may slip, and says how many strands together would hold', () => {
    expect(warningsOf(withGround({ metresPer100g: 1200 }))).toContain('W_LOOSE /yarns/ground');
    expect(warningWords(withGround({ metresPer100g: 1200 }), 'W_LOOSE')[0]).toContain('Take 9 strands together, or set the ends closer.');
  });

  test('in balanced cloth is not asked to cover the warp', () => {
    const balanced = { ...(withGround({ metresPer100g: 1200 }) as object), mode: 'balanced', beat: { picksPerCm: 2 } };
    expect(warningsOf(balanced)).not.toContain('W_LOOSE /yarns/ground');
  });

  test('in balanced cloth that is set too close bends as evenly as it can', () => {
    const close = { ...PLAIN_PIECE, mode: 'balanced', loom: { ...PLAIN_PIECE.loom, nailPitchMm: 3.3 }, yarns: { ground: { tex: 400 } }, beat: { picksPerWeftDiameter: 0.62 } };
    expect(warningsOf(close)).toContain('W_CLAMPED /yarns/ground');
  });

  test('whose count can be read two ways is asked about', () => {
    expect(warningsOf(withGround({ count: { text: '2/8', system: 'ne-cotton' } }))).toContain('W_AMBIGUOUS /yarns/ground/count/text');
    expect(warningsOf(withGround({ count: { text: '5/2', system: 'nm' } }))).toContain('W_AMBIGUOUS /yarns/ground/count/text');
    expect(warningsOf(withGround({ fibre: 'Silk', count: { text: '40/2', system: 'ne-cotton' } }))).toContain('W_SILK /yarns/ground/count/text');
  });

  test('of spun silk is asked about in its own count and in cotton’s', () => {
    expect(warningsOf(withGround({ count: { text: '20/2', system: 'spun-silk' } }))).toContain('W_SILK /yarns/ground/count/text');
    expect(warningsOf(withGround({ fibre: 'spun silk', count: { text: '20/2', system: 'ne-cotton' } }))).toContain('W_SILK /yarns/ground/count/text');
    expect(warningsOf(withGround({ fibre: 'silkworm brand cotton', count: { text: '20/2', system: 'ne-cotton' } }))).not.toContain('W_SILK /yarns/ground/count/text');
  });

  test('known by nothing but its class is reckoned from the middle of it, and says how rough that is', () => {
    expect(warningWords(withGround({ class: 4 }), 'W_CLASS')).toEqual([
      'Class 4, medium, goes from 120 to 200 m in 100 g, so every amount is a rough guess. Read the label, or wrap the yarn round a ruler.',
    ]);
    expect(warningWords(withGround({ class: 0 }), 'W_CLASS')[0]).toContain('goes from 600 m in 100 g upwards');
    expect(warningWords({ ...(withGround({ class: 6 }) as object), loom: { ...PLAIN_PIECE.loom, nailPitchMm: 20 } }, 'W_CLASS')[0]).toContain('goes up to 100 m in 100 g');
    const { massG, netMm } = planOf(withGround({ class: 4 })).yarns['ground'] ?? { massG: 0, netMm: 1 };
    expect(massG / netMm).toBeCloseTo(100 / 160_000, 12);
  });

  test('whose class stands beside a label is taken by the label, and says if the two do not agree', () => {
    expect(warningsOf(withGround({ class: 4, ball: { metres: 80, grams: 50 } })).filter((found) => !found.startsWith('W_PARITY'))).toEqual([]);
    expect(warningWords(withGround({ class: 4, ball: { metres: 400, grams: 100 } }), 'W_LABEL')).toEqual([
      'Metres and grams of the ball come to 400 m in 100 g, which is no yarn of class 4. The ball is used.',
    ]);
  });

  test('whose label tells metres and grams is not asked about, and is taken by them', () => {
    const labelled = withGround({ count: { text: '2/8', system: 'ne-cotton' }, ball: { metres: 170, grams: 25 } });
    expect(warningsOf(labelled)).not.toContain('W_AMBIGUOUS /yarns/ground/count/text');
    const { yarns } = planOf(labelled);
    expect((yarns['ground']?.massG ?? 0) / (yarns['ground']?.netMm ?? 1)).toBeCloseTo(25 / 170_000, 12);
  });

  test('whose label contradicts itself says what was used', () => {
    expect(warningWords(withGround({ tex: 500, ball: { metres: 100, grams: 100 } }), 'W_LABEL')).toEqual([
      'Metres and grams of the ball come to 1000 tex, which is another yarn. The 500.0 tex given are used.',
    ]);
    expect(warningWords(withGround({ count: { text: '8/2', system: 'ne-cotton' }, ball: { metres: 200, grams: 100 } }), 'W_LABEL')).toEqual([
      'Metres and grams of the ball come to 500.0 tex, which is another yarn. The ball is used.',
    ]);
  });

  test('whose wraps cannot be is asked to be counted again', () => {
    expect(warningsOf(withGround({ tex: 556, wrapsPerInch: 40 }))).toContain('W_LOFT /yarns/ground/wrapsPerInch');
    expect(warningsOf(withGround({ tex: 100, wrapsPerInch: 5 }))).toContain('W_LOFT /yarns/ground/wrapsPerInch');
  });

  test('that leaves hardly anything of its last ball asks for one more', () => {
    const { withMarginMm } = planOf(PLAIN_PIECE).yarns['ground'] ?? { withMarginMm: 0 };
    const metres = (withMarginMm / 1000) * 1.02;
    expect(warningsOf(withGround({ metresPer100g: 180, ball: { metres, grams: (metres / 180) * 100 } }))).toContain('W_TIGHT /yarns/ground/ball');
  });

  test('that no band is woven with is pointed out', () => {
    expect(warningsOf(pieceWith({ yarns: { ...PLAIN_PIECE.yarns, spare: { tex: 300 } } }))).toContain('W_UNUSED /yarns/spare');
    expect(planOf(pieceWith({ yarns: { ...PLAIN_PIECE.yarns, spare: { tex: 300 } } })).yarns['spare']).toMatchObject({ netMm: 0, loads: 0, rowsPerLoad: 0 });
  });
});

describe('a band', () => {
  test('thinner than a row will not show', () => {
    expect(warningsOf(pieceOf({ technique: 'tabby', yarn: 'ground', heightMm: 0.2 }))).toContain('W_THIN /bands/0/heightMm');
    expect(warningsOf(pieceOf({ technique: 'tabby', yarn: 'ground', heightMm: 400 }))).toContain('W_THIN /bands/1/fill');
  });

  test('with a tall upright slit is to be sewn, with joined colours not', () => {
    const block = (join: 'slit' | 'dovetail') =>
      pieceOf({ technique: 'tabby', yarn: 'ground', heightMm: 50, shapes: [{ shape: 'rectangle', yarn: 'ground', baseMm: 100, heightMm: 40, join }] });
    expect(warningsOf(block('slit'))).toContain('W_SLIT /bands/0/shapes/0/join');
    expect(warningsOf(block('dovetail'))).not.toContain('W_SLIT /bands/0/shapes/0/join');
  });

  test('of rya or soumak that does not go up says what happens at the edge', () => {
    const rya = { technique: 'rya', yarn: 'ground', strands: 2, legEnds: 2, pileMm: 40, trimMm: 0, rows: 1, heightMm: 6 } as const;
    const soumak = { technique: 'soumak', yarn: 'ground', over: 5, back: 2, rows: 1, tabbyBetween: 0, tabbyYarn: 'ground' } as const;
    const warnings = planOf({ ...pieceOf(rya, { ...rya, legEnds: 1 }, soumak), warp: { yarn: { tex: 400 }, endCount: 61 } }).warnings;
    expect(warnings.map(({ code, path }) => `${code} ${path}`)).toEqual(['W_PLAIN_END /bands/0/legEnds', 'W_PLAIN_END /bands/1/legEnds', 'W_SHORT_STITCH /bands/2/over']);
    expect(warnings[0]?.message).toContain('One end stays without a knot');
    expect(warningWords(pieceOf(rya), 'W_PLAIN_END')[0]).toContain('2 ends stay without a knot');
  });
});

test('pinned ends that make another width say how wide it comes out', () => {
  const piece = { ...PLAIN_PIECE, warp: { yarn: { tex: 400 }, endCount: 50 } };
  expect(warningWords(piece, 'W_WIDTH')).toEqual(['50 ends come out 24.5 cm wide, not as wide as was asked.']);
});

test('a dowel that is too thin or too short says what holds', () => {
  const dowel = (diameterMm: number, lengthMm: number): string[] => warningWords(pieceWith({ dowel: { diameterMm, lengthMm } }), 'W_DOWEL');
  expect(dowel(3, 380)).toEqual([expect.stringMatching(/^This dowel will sag under the piece\. [\d.]+ mm and thicker holds\.$/u)]);
  expect(dowel(12, 280)).toEqual(['This dowel is shorter than the cloth is wide. 38 cm lets it stand out on both sides.']);
  expect(dowel(12, 380)).toEqual([]);
});
