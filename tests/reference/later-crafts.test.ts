/** Formulas of other fibre crafts against published inputs. */
import Qty from 'js-quantities';
import { describe, expect, test } from 'vitest';
import { yarnPerArea } from '#core/craft/crochet/yarn.ts';
import { agentMass, bathLitres } from '#core/craft/dyeing/bath.ts';
import { feltingFactor, layoutFor } from '#core/craft/felting/shrinkage.ts';
import { folkRuleYards, knitYarn, stitchLength } from '#core/craft/knitting/yarn.ts';
import { foldedCordLength, gatheringCord, larksHead, leastHalfHitch, leastSquareKnot, sectionedCordLength, squareKnotCord, squareKnotsIn, texFromDiameter } from '#core/craft/macrame/cord.ts';
import { planPiece } from '#core/craft/plan.ts';
import { diameterFromTwist, turnsPerMetre } from '#core/craft/spinning/twist.ts';
import { expectClose } from './close.ts';

describe('macramé cord', () => {
  test('59: a hanging of 3 ft needs folded cords of 24 ft (macramelovers.com and thelarksheadshop.com)', () => {
    expect(foldedCordLength(3)).toBe(24);
  });

  test('60: 40 cm knotted and 20 cm plain need 360 cm (urbaki.com, after a video on cord length)', () => {
    expect(sectionedCordLength(40, 20)).toBe(360);
  });

  test('61: a square knot of 3 mm cord takes at least 34.27 mm, and 50 are reported (path added up; same video)', () => {
    expectClose(leastSquareKnot(3), 34.274334, 1e-7);
    expect(leastSquareKnot(3)).toBeLessThan(50);
    expectClose(squareKnotCord(3), 50, 0.05);
    expect(squareKnotsIn(900, 3)).toBe(86);
  });

  test.each([[1.5, 30], [3, 50], [5, 60]])('cord of %f mm: %f mm a knot are reported (urbaki.com), within what a piece accepts', (cordMm, reported) => {
    expect(reported / cordMm).toBeGreaterThanOrEqual(11.5);
    expect(reported / cordMm).toBeLessThanOrEqual(20);
    expect(reported).toBeGreaterThan(leastSquareKnot(cordMm));
  });

  test('90 cm of square knots in 3 mm cord: 86 knots, 4.128 m of a working end, 4.59 times the length (path added up; the rule of four gives 3.6 m)', () => {
    const planned = planPiece({
      craft: 'macrame', rod: { kind: 'rod', diameterMm: 20 }, yarns: { main: { diameterMm: 3 } },
      columns: [{ yarn: 'main', cords: 2, sections: [{ technique: 'square-knots', heightMm: 900 }] }],
    });
    if (!planned.ok) throw new Error('it can be knotted');
    const [column] = planned.value.columns;
    expect(column?.sections[0]).toMatchObject({ knots: 86, workerMm: 4128 });
    expectClose((column?.sections[0]?.workerMm ?? 0) / 900, 4.587, 1e-3);
    // Fillers are as long as the knots stand high: 0.9 m, to within half a knot.
    expect(Math.abs((column?.sections[0]?.fillerMm ?? 0) - 900)).toBeLessThan(3.5 * 3 * 0.5 + 1e-9);
    expectClose((column?.ruleMm ?? 0) / 2, 3600, 0.01);
  });

  test('a tight half hitch is one turn round its like, a double one two; a lark’s head goes round rod and cord twice (circles)', () => {
    expectClose(leastHalfHitch(1), 6.283185, 1e-6);
    expectClose(2 * leastHalfHitch(1), 12.56637, 1e-6);
    expectClose(larksHead(20, 3), 2 * Math.PI * 26, 1e-12);
  });

  test('a gathering knot of one turn is once round its bundle, and its tails (circle)', () => {
    expectClose(gatheringCord(1, 10, 2, 100), 12 * Math.PI + 4 + 200, 1e-12);
  });

  test('4 mm of three-strand cotton cord weigh 8 to 10 g a metre (common practice, no source)', () => {
    expect(texFromDiameter(4)).toBeGreaterThan(8000);
    expect(texFromDiameter(4)).toBeLessThan(10_000);
  });
});

describe('knitting and crochet', () => {
  test('62: 48 by 8 in at 5 stitches are 320 yards by the knitters’ rule (perkyhobby.com), 282.67 by Munden’s constants', () => {
    expectClose(folkRuleYards(48, 8, 5), 320, 1e-12);
    const mm = knitYarn(48 * 25.4 * 8 * 25.4, 5 / 2.54);
    expectClose(mm / 914.4, 282.66667, 1e-6);
  });

  test('63: a 5-inch square of single crochet held 785.5 in: 1.237 mm a square millimetre (windchilde.com)', () => {
    expectClose(yarnPerArea(785.5, 25), 31.42, 1e-12);
    expectClose(yarnPerArea(785.5 * 25.4, 25 * 25.4 ** 2), 1.2370079, 1e-7);
  });
});

describe('dyeing', () => {
  const pound = 453.59237;
  const ounce = pound / 16;

  test.each([[14, 2.24], [8, 1.28], [7, 1.12]])('64: %f %% of a pound of wool are %f oz (leighsfiberjournal, 12 August 2024)', (percent, ounces) => {
    expectClose(agentMass(pound, percent) / ounce, ounces, 1e-12);
  });

  test('65: a quarter pound of alum and an ounce of tartar to the pound are 25 and 6.25 % (an old recipe at dyeing.ca)', () => {
    expectClose(agentMass(pound, 25), pound / 4, 1e-12);
    expectClose(agentMass(pound, 6.25), ounce, 1e-12);
  });

  test('66: 4 gallons to the pound are 33.38 litres to the kilogram (definitions; a unit package)', () => {
    const litres = 4 * new Qty('1 gallon').to('l').scalar;
    expectClose(litres / (pound / 1000), 33.381618, 1e-7);
    expectClose(bathLitres(pound, 33.381618), 4 * 3.785411784, 1e-7);
  });
});

test('67: a twist multiplier of 1 is 956.73 turns a metre at 1 tex, 30.25 at Nm 1 (definitions multiplied out)', () => {
  expectClose(turnsPerMetre(1, 1), 956.73443, 1e-8);
  expectClose(turnsPerMetre(1, 1000), 30.254599, 1e-8);
  expectClose(turnsPerMetre(3.5, 59.0541247), 435.7469, 1e-6);
});

test('fibres lie at 45° on a yarn as thick as a turn is long, over π (a turn unrolled is a right-angled triangle)', () => {
  // A turn every π mm: once round a yarn of 1 mm is π mm, too.
  expectClose(diameterFromTwist(Math.PI / 4, 1 / Math.PI), 1, 1e-12);
  // Half a turn in a mm at 30°: 0.57735/1.570796.
  expectClose(diameterFromTwist(Math.PI / 6, 0.5), 0.3675526, 1e-6);
});

test('a stitch of five to the centimetre takes 8.2 mm of yarn (Munden 1959: 4.1 over the stitches)', () => {
  expectClose(stitchLength(5), 0.82, 1e-12);
});

describe('felting', () => {
  test('68a: 30 cm that felt to 20 have a factor of 1.5 (feltwest.org.au, shrinkage part 2)', () => {
    expect(feltingFactor(30, 20)).toBe(1.5);
    expectClose(layoutFor(20, 1 / 3), 30, 1e-12);
  });

  test('68b: 25 cm at 20 % are laid out at 31.25 (ilovefelt.com, size control)', () => {
    expect(layoutFor(25, 0.2)).toBe(31.25);
  });
});
