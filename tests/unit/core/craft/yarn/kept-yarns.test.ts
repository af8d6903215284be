/** How yarns are read, and what is said of them, as it was found right. Outside numbers for counts are in `tests/reference/yarn-counts.test.ts`. */
import { describe, expect, test } from 'vitest';
import { reckon } from '#core/craft/reckon.ts';
import { countFromTex, metresPer100gFromTex, texFromBall, texFromMetresPer100g, texFromYardsPerOunce, texFromYardsPerPound, texOfFolded, twistContraction, yardsPerPoundFromTex } from '#core/craft/yarn/count.ts';
import { classesByLength, classesByWraps, classOf } from '#core/craft/yarn/classes.ts';
import { diameterFromVolume, loftFromCompressed, specificVolume, volumeOfAshenhurst } from '#core/craft/yarn/diameter.ts';
import { rovingDiameter, texFromGramsPerMetre } from '#core/craft/yarn/roving.ts';
import { threadOf, withStrands } from '#core/craft/yarn/thread.ts';
import { expectKept, thousandths } from '../../../../support/kept.ts';

const file = new URL('../../../../fixtures/yarn/read.json', import.meta.url);
const told = (yarn: unknown): unknown => {
  const answer = reckon({ what: 'yarn', yarn });
  if (!answer.ok) return answer.problems.map(({ code, path, message }) => `${code} ${path}: ${message}`);
  return { ...(thousandths(answer.value) as object), warnings: answer.warnings.map(({ code, path, message }) => `${code} ${path}: ${message}`) };
};

describe('a yarn is read', () => {
  test.each<[string, unknown]>([
    ['that says nothing', {}], ['that is none', 'wool'], ['in two ways', { tex: 400, class: 4 }], ['in every way', { tex: 400, metresPer100g: 250, count: { text: '8/2', system: 'nm' }, class: 4 }], ['with a word nobody knows', { tex: 400, fluff: true }],
    ['with every trait', { tex: 400, label: 'Fenwool', colour: '#6D93bc', strands: 2, ashenhurstK: 0.84, wrapsPerInch: 12, fibre: 'wool', ball: { metres: 250, grams: 100 } }],
    ['with wrong traits', { tex: 400, label: '', colour: 'blue', strands: 1.5, ashenhurstK: 0.5, wrapsPerInch: 61, fibre: 7, ball: { metres: 0, grams: 'much', more: 1 } }],
    ['wrapped and measured', { tex: 400, wrapsPerInch: 12, freeDiameterMm: 2 }], ['measured', { tex: 400, freeDiameterMm: 2 }], ['measured too thick', { tex: 400, freeDiameterMm: 201 }],
    ['of no tex', { tex: 0 }], ['of the least tex', { tex: 1 }], ['of too much tex', { tex: 200_001 }], ['of few metres', { metresPer100g: 0.4 }],
    ['of a class that is none', { class: 8 }], ['of half a class', { class: 3.5 }], ['of class 0', { class: 0 }], ['of class 4', { class: 4 }], ['of class 7', { class: 7 }], ['of a class and wraps', { class: 4, wrapsPerInch: 2 }],
    ['of a class with its ball', { class: 4, ball: { metres: 160, grams: 100 } }], ['of a class with another’s ball', { class: 4, ball: { metres: 700, grams: 100 } }], ['of a class at the edge of its metres', { class: 4, ball: { metres: 200, grams: 100 } }],
    ['of a count', { count: { text: '8/2', system: 'ne-cotton' } }], ['of a count in doubt', { count: { text: '3/3', system: 'nm' } }], ['of a count in doubt, of one ply', { count: { text: '150/48', system: 'denier' } }], ['of a count in doubt with a ball', { count: { text: '3/3', system: 'nm' }, ball: { metres: 100, grams: 100 } }],
    ['of silk', { count: { text: '40/2', system: 'ne-cotton' }, fibre: 'tussah silk' }], ['of a count that is none', { count: { text: 'eight', system: 'nm' } }], ['of a count too fine', { count: { text: '2000', system: 'nm' } }], ['of a count too thick', { count: { text: '0.001', system: 'nm' } }],
    ['of a count without a system', { count: { text: '8/2' } }], ['of a count with more', { count: { text: '8/2', system: 'nm', plies: 2 } }], ['of the finest and thickest counts', { count: { text: '1000', system: 'nm' } }],
    ['whose ball says the same', { tex: 400, ball: { metres: 275, grams: 100 } }], ['whose ball says a tenth less', { tex: 400, ball: { metres: 250 / 1.1001, grams: 100 } }], ['whose ball says another', { tex: 400, ball: { metres: 100, grams: 100 } }], ['whose ball says another than its count', { count: { text: '10', system: 'nm' }, ball: { metres: 500, grams: 100 } }],
    ['whose ball cannot be', { tex: 400, ball: { metres: 1_000_000, grams: 1 } }], ['whose ball is of lead', { tex: 400, ball: { metres: 1, grams: 1000 } }], ['whose ball is no group', { tex: 400, ball: 7 }],
    ['wrapped too closely', { tex: 2000, wrapsPerInch: 40 }], ['wrapped too widely', { tex: 30, wrapsPerInch: 5 }], ['wrapped well', { tex: 400, wrapsPerInch: 14 }],
  ])('%s', (name, yarn) => {
    expectKept(file, name, told(yarn));
  });

  test.each(['#12345', '#1234567', '123456#', '#12345g', ' #123456'])('whose colour “%s” is none', (colour) => {
    expect(JSON.stringify(told({ tex: 400, colour }))).toMatch(/colour/iu);
  });

  test('whose label may be long, but not longer', () => {
    expect(told({ tex: 400, label: 'x'.repeat(120), fibre: 'y'.repeat(60) })).toHaveProperty('tex', 400);
    expect(told({ tex: 400, label: 'x'.repeat(121), fibre: 'y'.repeat(61) })).toEqual(['E_RANGE /yarn/label: Label may be 120 characters long at most.', 'E_RANGE /yarn/fibre: Fibre may be 60 characters long at most.']);
  });
});

describe('numbers of a yarn, reckoned by hand', () => {
  test('a ball of 50 m and 20 g is 400 tex, which are 250 m in 100 g and 1240 yards in a pound', () => {
    expect(texFromBall({ metres: 50, grams: 20 })).toBe(400);
    expect([metresPer100gFromTex(400), texFromMetresPer100g(250)]).toEqual([250, 400]);
    // 453.59237 g of 0.4 g/m are 1133.98 m, 1240.14 yd; 77.51 of them to an ounce.
    expect(yardsPerPoundFromTex(400)).toBeCloseTo(1240.1366, 3);
    expect(texFromYardsPerPound(1240.1366)).toBeCloseTo(400, 3);
    expect(texFromYardsPerOunce(77.5085)).toBeCloseTo(400, 3);
    expect(texFromGramsPerMetre(0.4)).toBe(400);
  });

  // A kilometre of 100 tex is 100 g: 900 g in 9000 m, ten km in a kilogram; 4960.55 yd in a pound are 5.905 hanks of 840, 8.858 of 560, 16.535 leas, 3.1 runs.
  test.each([['denier', 900], ['dtex', 1000], ['nm', 10], ['ne-cotton', 5.90541], ['spun-silk', 5.90541], ['ne-worsted', 8.85812], ['lea', 16.53515], ['run', 3.10034], ['yorkshire', 19.37713]] as const)('100 tex are %s %f', (system, count) => {
    expect(countFromTex(100, system)).toBeCloseTo(count, 4);
  });

  test('two strands of 100 that lose a tenth in twisting are 222.2 tex, and tell what they lost', () => {
    expect(texOfFolded([100, 100], 0.1)).toBeCloseTo(222.222, 3);
    expect(texOfFolded([100, 50])).toBe(150);
    expect(twistContraction([100, 100], 222.2222)).toBeCloseTo(0.1, 6);
  });

  test('a round yarn of 1000 tex and 1 cm³ to the gram has a section of one square millimetre', () => {
    expect(diameterFromVolume(1000, 1)).toBeCloseTo(2 * Math.sqrt(1 / Math.PI), 9);
    expect(specificVolume(1.25, 0.5)).toBe(1.6);
    // K = 0.9 at 1 tex: 25.4 mm over 0.9 times the root of 496 054.6 yards is 0.04007 mm, 1.261 mm² to the thousandth of a gram.
    expect(volumeOfAshenhurst(0.9)).toBeCloseTo(1.261, 3);
    // Roving of wool: three parts of 1.31 g/cm³ in a hundred are 25.4 cm³ to the gram.
    expect(rovingDiameter(20_000)).toBeCloseTo(10 * Math.sqrt((4e-5 * 20_000) / (Math.PI * 0.03 * 1.31)), 6);
    expect(rovingDiameter(20_000, 'cotton', 0.05)).toBeCloseTo(10 * Math.sqrt((4e-5 * 20_000) / (Math.PI * 0.05 * 1.52)), 6);
  });

  test('four strands are twice as thick as one, and lose or gain it again', () => {
    const one = threadOf({ tex: 400 }, 0.9);
    const four = withStrands(one, 4);
    expect(four).toMatchObject({ strands: 4, compressedMm: 2 * one.compressedMm, loftMm: 2 * one.loftMm, strandLoftMm: one.strandLoftMm });
    expect(withStrands(four, 1).compressedMm).toBeCloseTo(one.compressedMm, 12);
    expect(one.loftMm).toBeCloseTo(loftFromCompressed(one.compressedMm), 12);
  });

  test('classes hold their limits', () => {
    expect(classesByLength(350).map(({ number }) => number)).toEqual([1, 2]);
    expect(classesByLength(100).map(({ number }) => number)).toEqual([5, 6, 7]);
    expect(classesByWraps(9).map(({ number }) => number)).toEqual([4, 5]);
    expect(classesByWraps(30).map(({ number }) => number)).toEqual([0, 1]);
    expect(classOf(5).name).toBe('bulky');
  });
});
