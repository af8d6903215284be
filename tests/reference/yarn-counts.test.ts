/**
 * Linear density and diameter against what standards, textbooks and sellers print, and
 * against unit packages made by others. Each row names its source.
 */
import Decimal from 'decimal.js';
import Fraction from 'fraction.js';
import Qty from 'js-quantities';
import { unit } from 'mathjs';
import { describe, expect, test } from 'vitest';
import type { CountSystem } from '#core/craft/piece.ts';
import { balancedSett, ashenhurstMaximum, plainMaximum, squareMaximum, WEAVES } from '#core/craft/sett.ts';
import {
  countFromTex,
  metresPer100gFromTex,
  texFromBall,
  texFromCount,
  texFromMetresPer100g,
  texFromYardsPerOunce,
  texFromYardsPerPound,
  twistContraction,
  texOfFolded,
  TEX_YARDS_PER_POUND,
  yardsPerPoundFromTex,
} from '#core/craft/yarn/count.ts';
import { readCount } from '#core/craft/yarn/count-text.ts';
import { ashenhurstNumber, compressedDiameter, diameterFromVolume, volumeOfAshenhurst } from '#core/craft/yarn/diameter.ts';
import { threadOf } from '#core/craft/yarn/thread.ts';
import { diameterFromTwist } from '#core/craft/spinning/twist.ts';
import { expectClose, expectPrinted } from './close.ts';

const ASTM_D2260 = 'ASTM D2260-03(2013), factor table and examples';
const HNPE = 'HNPE 7.1.6, conversion matrix';
const TAYLOR = 'J. T. Taylor, Cotton Weaving and Designing, pp. 239, 453, 458';
const ASHENHURST = 'the "Ashenhurst" sheet of 1999';
const PEIRCE = 'Peirce 1937 as given by N. Balasubramanian';

const from = (count: number, system: CountSystem) => ({ to: (other: CountSystem): number => countFromTex(texFromCount(count, system), other) });

describe('converting counts', () => {
  test.each<[string, string, number, string | undefined, number]>([
    ['1: 30 tex is cotton count', ASTM_D2260, countFromTex(30, 'ne-cotton'), '19.7', 19.684708],
    ['2: cotton 10 is worsted', ASTM_D2260, from(10, 'ne-cotton').to('ne-worsted'), '15', 15],
    ['3: cotton 1 is denier', ASTM_D2260, from(1, 'ne-cotton').to('denier'), '5314.87', 5314.871227],
    ['Nm 1 is cotton', ASTM_D2260, from(1, 'nm').to('ne-cotton'), '0.590541', 0.59054125],
    ['cotton 1 is Nm', HNPE, from(1, 'ne-cotton').to('nm'), '1.69', 1.6933618],
    ['4a: Nm 1 is worsted', ASTM_D2260, from(1, 'nm').to('ne-worsted'), '0.885812', 0.88581187],
    ['4b: Nm 1 is linen lea', ASTM_D2260, from(1, 'nm').to('lea'), '1.65352', 1.6535155],
    ['4c: Nm 1 is woollen run', ASTM_D2260, from(1, 'nm').to('run'), '0.310034', 0.31003415],
    ['5: Nm 1 is yards in a pound', ASTM_D2260, yardsPerPoundFromTex(texFromCount(1, 'nm')), '496.055', 496.05465],
    ['6: worsted 1 is Yorkshire skein', '256 yd in a pound, by definition', from(1, 'ne-worsted').to('yorkshire'), '2.1875', 2.1875],
    ['a grain in 120 yd is tex', ASTM_D2260, texFromCount(1, 'grain'), '0.590541', 0.59054125],
    ['7a: jute 1 is tex', HNPE, texFromCount(1, 'jute'), '34.45', 34.448239],
    ['7b: jute 1 is Nm', HNPE, from(1, 'jute').to('nm'), '29.03', 29.02906],
    ['7c: jute 1 is denier', HNPE, from(1, 'jute').to('denier'), '310.03', 310.03415],
    ['worsted 1 is denier', HNPE, from(1, 'ne-worsted').to('denier'), '7972.3', 7972.3068],
    ['lea 1 is denier', HNPE, from(1, 'lea').to('denier'), '14882', 14881.639],
    ['200 m in 100 g is tex', 'definition', texFromMetresPer100g(200), '500', 500],
    ['200 m in 100 g is Nm', 'definition', countFromTex(500, 'nm'), '2', 2],
    ['200 m in 100 g is yards in a pound', 'derived', yardsPerPoundFromTex(500), undefined, 992.1093],
    ['spun silk 1 is cotton', 'both 840 yd in a pound, by definition', from(1, 'spun-silk').to('ne-cotton'), '1', 1],
    ['100 decitex is tex', 'definition', texFromCount(100, 'dtex'), '10', 10],
    ['a yard in an ounce is tex', 'derived', texFromYardsPerOunce(1), undefined, 31003.41549],
  ])('%s (%s)', (_, __, actual, printed, exact) => {
    expectClose(actual, exact, 1e-7);
    if (printed !== undefined) expectPrinted(actual, printed);
  });

  test('agrees with exact fractions of the definitions', () => {
    const texOf = (yards: number) => new Fraction('453.59237').mul(1000).div('0.9144').div(yards);
    expect(texOf(840).toFraction()).toBe('32399455/54864');
    expect(new Fraction('453.59237').mul(1000).div('0.9144').toFraction()).toBe('1133980925/2286');
    for (const [system, yards] of [['ne-cotton', 840], ['ne-worsted', 560], ['run', 1600], ['lea', 300], ['yorkshire', 256]] as const) {
      expectClose(texFromCount(1, system), texOf(yards).valueOf(), 1e-15);
    }
    expectClose(TEX_YARDS_PER_POUND, 1133980925 / 2286, 1e-15);
  });

  test('agrees with twenty digits of decimal arithmetic', () => {
    const texOfCotton = new Decimal('453.59237').mul(1000).div('0.9144').div(840);
    expect(texOfCotton.toSignificantDigits(20).toString()).toBe('590.54124744823563721');
    expectClose(texFromCount(1, 'ne-cotton'), texOfCotton.toNumber(), 1e-15);
  });

  test('agrees with two unit packages on yards and pounds', () => {
    for (const metresPerYard of [unit(1, 'yd').toNumber('m'), new Qty('1 yd').to('m').scalar]) {
      for (const gramsPerPound of [unit(1, 'lbm').toNumber('g'), new Qty('1 lb').to('g').scalar]) {
        expectClose(texFromYardsPerPound(840), (1000 * gramsPerPound) / (840 * metresPerYard), 1e-14);
      }
    }
  });
});

describe('folded and plied yarn', () => {
  test(`8: 60s with 40s cotton make 24s (${TAYLOR})`, () => {
    expectClose(countFromTex(texOfFolded([texFromCount(60, 'ne-cotton'), texFromCount(40, 'ne-cotton')]), 'ne-cotton'), 24, 1e-12);
  });

  test(`9: 8/2 cotton has 3360 yards in a pound (${ASHENHURST})`, () => {
    const tex = readCount('8/2', 'ne-cotton')?.tex ?? 0;
    expectClose(yardsPerPoundFromTex(tex), 3360, 1e-12);
    expectClose(tex, 147.63531, 1e-7);
    expectClose(metresPer100gFromTex(tex), 677.34473, 1e-7);
  });

  test('10: 8/4 cotton sold as 1600 yards in a pound lost 4.762 % to twist (label in a rigid-heddle project book)', () => {
    const untwisted = readCount('8/4', 'ne-cotton')?.tex ?? 0;
    expectClose(1 - untwisted / texFromYardsPerPound(1600), 0.047619048, 1e-7);
    expectClose(twistContraction([untwisted], texFromYardsPerPound(1600)), 0.047619048, 1e-7);
    expectClose(texOfFolded([untwisted], 0.0476190476), texFromYardsPerPound(1600), 1e-8);
  });

  test('11: 2/16 Nm is 125 tex, 800 m in 100 g (derived)', () => {
    const read = readCount('2/16', 'nm');
    expect(read).toMatchObject({ plies: 2, count: 16 });
    expectClose(read?.tex ?? 0, 125, 1e-12);
    expectClose(metresPer100gFromTex(125), 800, 1e-12);
    expectClose(yardsPerPoundFromTex(125), 3968.4372, 1e-7);
  });

  test('12: 2/8 cotton is doubtful, because sellers write it both ways (common practice)', () => {
    expect(readCount('2/8', 'ne-cotton')).toMatchObject({ doubt: 'which-is-plies', plies: 2 });
  });

  test('a ball of 200 yards and 100 grams is its own tex (definition)', () => {
    expectClose(texFromBall({ metres: 200 * 0.9144, grams: 100 }), 1000 * 100 / (0.9144 * 200), 1e-15);
  });
});

describe('weight classes', () => {
  /** Number, tex, compressed at K 0.84 and loft of a yarn in the middle of its class. */
  test.each([
    [0, 142.9, 0.5131, 0.7257], [1, 210.5, 0.6229, 1.155], [2, 333.3, 0.7838, 1.693], [3, 444.4, 0.9051, 1.954],
    [4, 625, 1.073, 2.419], [5, 869.6, 1.266, 3.387], [6, 1429, 1.623, 4.618], [7, 2500, 2.147, 10.16],
  ] as const)('class %i in its middle is %f tex, %f mm beaten and %f mm lying free (Craft Yarn Council’s wraps; one shop’s metres, craftys.uk)', (number, tex, compressedMm, loftMm) => {
    const thread = threadOf({ class: number }, 0.84);
    expectPrinted(thread.tex, String(tex));
    expectClose(thread.compressedMm, compressedMm, 5e-4);
    expectClose(thread.loftMm, loftMm, 5e-4);
  });

  test('a soft yarn of 160 m in 100 g and 10.5 wraps is 2.254 times as thick free as beaten (derived)', () => {
    const { compressedMm, loftMm } = threadOf({ metresPer100g: 160, wrapsPerInch: 10.5 }, 0.84);
    expectClose(loftMm / compressedMm, 2.254, 2e-4);
  });
});

describe('diameters', () => {
  test(`14: cotton 1 at 1.1 cm³/g is a 28th of an inch (${PEIRCE})`, () => {
    const inches = diameterFromVolume(texFromCount(1, 'ne-cotton'), 1.1) / 25.4;
    expectClose(1 / inches, 27.929116, 1e-7);
    expectClose(1 / inches, 28, 0.003);
  });

  test.each([[15, 106.637, 106.5], [32, 155.754, 156], [60, 213.274, 213], [200, 389.384, 390]])(
    `15: cotton %i at K 0.95 lies %f to the inch (${TAYLOR})`,
    (count, exact, printed) => {
      const threads = ashenhurstNumber(texFromCount(count, 'ne-cotton'), 0.95);
      expectClose(threads, exact, 1e-5);
      expect(Math.abs(threads - printed)).toBeLessThan(0.62);
    },
  );

  test(`16: 1/d in inches is 29.3 √(count/volume) (${PEIRCE})`, () => {
    const factor = 25.4 / diameterFromVolume(texFromCount(1, 'ne-cotton'), 1);
    expectClose(factor, 29.292304, 1e-7);
    expectPrinted(factor, '29.3');
  });

  test.each([[0.9, 1.2610804], [0.84, 1.4476688], [0.95, 1.1318284]])('17: K %f is a volume of %f cm³/g (derived)', (k, volume) => {
    expectClose(volumeOfAshenhurst(k), volume, 1e-7);
    expectClose(diameterFromVolume(500, volume), compressedDiameter(500, k), 1e-7);
  });

  test(`18: 8/2 cotton: 52 threads, 26 plain, 34 in 2/2 twill (${ASHENHURST})`, () => {
    const threads = ashenhurstNumber(readCount('8/2', 'ne-cotton')?.tex ?? 0, 0.9);
    expectClose(threads, 52.168956, 1e-7);
    expectPrinted(threads, '52');
    expectClose(ashenhurstMaximum(threads, WEAVES.plain), 26.084478, 1e-7);
    expectPrinted(ashenhurstMaximum(threads, WEAVES.plain), '26');
    const twill = ashenhurstMaximum(threads, WEAVES['twill-2-2']);
    expectClose(twill, 34.779304, 1e-7);
    expect(Math.floor(twill)).toBe(34);
  });

  test('other weaves take the shares of Ashenhurst that textbooks give (2/3 of twill-like, 5/7 and 4/5 of satins)', () => {
    const shares = Object.values(WEAVES).map((weave) => ashenhurstMaximum(1, weave));
    [1 / 2, 3 / 5, 2 / 3, 2 / 3, 5 / 7, 4 / 5].forEach((share, index) => { expectClose(shares[index] ?? 0, share, 1e-15); });
  });

  test('equal yarns come to half of Ashenhurst, and Peirce allows a square cloth a little more (derived)', () => {
    expectClose(plainMaximum(25.4 / 52, 25.4 / 52), 26, 1e-12);
    expectClose(squareMaximum(1), 0.57735027, 1e-7);
  });

  test('19: 20 tex with 10 turns a centimetre at 32° (GATE textile engineering 2005, question 71)', () => {
    const diameter = diameterFromTwist((32 * Math.PI) / 180, 1);
    expectClose(diameter, 0.19890209, 1e-6);
    const volume = ((diameter / 10) ** 2 * Math.PI) / 4 / 20 * 1e5;
    expectClose(volume, 1.5535978, 1e-6);
    expectClose(diameter, 0.198, 0.011);
    expectClose(volume, 1.57, 0.011);
  });

  test('20: a yarn of 14 wraps is set at 7 to the inch in balanced plain weave (aethelfliedbrewbane.wordpress.com, 8 March 2017)', () => {
    expect(balancedSett(14, 'plain')).toBe(7);
    expectClose(balancedSett(14, 'twill-2-2'), 28 / 3, 1e-15);
  });
});
