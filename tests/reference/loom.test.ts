/** Nails, ends, allowances and hanging against published projects and second ways of counting. */
import { describe, expect, test } from 'vitest';
import { endsFor, rawEnds, widthBeforeDrawIn } from '#core/craft/ends.ts';
import { cordLength, cordTension, leastDowelDiameter } from '#core/craft/hanging.ts';
import { heightAfterShrinking, heightBeforeShrinking, topAllowance } from '#core/craft/loom-height.ts';
import { endsPerMm, nailsUsed, staggeredPitch, workingSpacing, zigzagGaps } from '#core/craft/nails.ts';
import { combinedUncertainty, marginFor, tolerableShortage, UNCERTAINTIES } from '#core/craft/purchase.ts';
import { tapestryRate } from '#core/craft/time.ts';
import { warpLength } from '#core/craft/warp.ts';
import { inchesText, toInches } from '#core/units/inches.ts';
import { expectClose, expectPrinted } from './close.ts';

const INCH = 25.4;
const YARD = 914.4;

/** Walks the warp from nail to nail and counts, as a hand would. */
function walkZigzag(ends: number): { readonly top: number; readonly bottom: number } {
  const used = { top: new Set([0]), bottom: new Set<number>() };
  let top = 0;
  let bottom = 0;
  for (let end = 0; end < ends; end += 1) {
    if (end % 2 === 0) used.bottom.add(bottom);
    else used.top.add((top += 1));
    if (end % 2 === 1) bottom += 1;
  }
  return { top: used.top.size, bottom: used.bottom.size };
}

describe('nails and ends', () => {
  test('21: nails a quarter inch apart, warped in a zigzag, give 8 ends to the inch (a published frame has 8 strands to the inch, webcasty.com 2013)', () => {
    expectClose(endsPerMm({ pitchMm: INCH / 4, warping: 'zigzag' }) * INCH, 8, 1e-15);
  });

  test('22: the warp of that frame, 20 in at 8 to the inch over 14 in and 2 yards for tying, is 64 yards (webcasty.com 2013)', () => {
    const run = { ends: 20 * 8, frameHeightMm: 14 * INCH, nailDiameterMm: 0, warpDiameterMm: 0, tieMm: YARD, wovenMm: 0, crimp: 0 };
    const yards = warpLength(run) / YARD;
    expectClose(yards, 64.222222, 1e-7);
    expectPrinted(yards, '64');
  });

  test('23: 21 in at 4 to the inch are 84 ends (rigid-heddle project book, rug project)', () => {
    expect(endsFor(rawEnds(widthBeforeDrawIn(21 * INCH, 0), 4 / INCH), 1, 'any').count).toBe(84);
  });

  test.each([[61, 31, 31], [62, 32, 31], [4, 3, 2], [5, 3, 3]])('24: %i ends use %i nails above and %i below, as walking the path shows', (ends, top, bottom) => {
    expect(nailsUsed(ends, 'zigzag')).toEqual({ top, bottom });
    expect(walkZigzag(ends)).toEqual({ top, bottom });
  });

  test('25: a tenth of the height from a rail, gaps between zigzag ends alternate between 1 and 9 mm (lines from nail to nail)', () => {
    const u = 0.1;
    const fromNailToNail = (end: number): number => (end % 2 === 0 ? (end / 2) * 10 : ((end + 1) / 2) * 10 * (1 - u) + ((end - 1) / 2) * 10 * u);
    const { first, second } = zigzagGaps(u, 10);
    expectClose(fromNailToNail(1) - fromNailToNail(0), second, 1e-12);
    expectClose(fromNailToNail(2) - fromNailToNail(1), first, 1e-12);
    expectClose(first, 1, 1e-12);
    expectClose(second, 9, 1e-12);
  });

  test('doubling ends and warping the inner row of a staggered frame both halve the ends', () => {
    const both = { pitchMm: staggeredPitch(INCH / 2, 'both'), warping: 'zigzag' } as const;
    const inner = { pitchMm: staggeredPitch(INCH / 2, 'inner'), warping: 'zigzag' } as const;
    expectClose(workingSpacing(both, 2), INCH / 4, 1e-15);
    expectClose(workingSpacing(inner, 1), INCH / 4, 1e-15);
    expectClose(workingSpacing(both, 1), INCH / 8, 1e-15);
  });
});

describe('allowances', () => {
  test('52: 10 in finished at 20 % shrinkage are woven 12.5 in wide, not 12 (Conference of Northern California Handweavers)', () => {
    expectClose(widthBeforeDrawIn(10, 0.2), 12.5, 1e-15);
    expectClose(12 * 0.8, 9.6, 1e-15);
  });

  test('53: 75 in woven that come off the loom as 65 relaxed by 13.333 % (therogueweaver.com, 22 August 2025)', () => {
    expectClose(heightBeforeShrinking(65, 1 - 65 / 75, 0), 75, 1e-12);
    expectClose(1 - 65 / 75, 0.13333333, 1e-7);
  });

  test('what shrinks by a tenth off the loom and by a twentieth in water keeps 85.5 % of its height (shares multiply)', () => {
    expectClose(heightAfterShrinking(1000, 0.1, 0.05), 855, 1e-12);
    expectClose(heightBeforeShrinking(855, 0.1, 0.05), 1000, 1e-12);
  });

  test('a dowel of 30 mm takes half its girth and a seat of unwoven warp, where 40 mm were asked (geometry)', () => {
    expectClose(topAllowance(40, { diameterMm: 30 }), Math.PI * 15 + 5, 1e-12);
    expectClose(topAllowance(60, { diameterMm: 30 }), 60, 1e-12);
    expectClose(topAllowance(10, undefined), 40, 1e-12);
  });

  test('54: 8.1 in on the loom that finish at 7.5 drew in by 7.4 % (M. Petrini, August 2023)', () => {
    expectClose(widthBeforeDrawIn(7.5, 0.074074074), 8.1, 1e-7);
    expectPrinted((1 - 7.5 / 8.1) * 100, '7.4');
  });
});

describe('hanging', () => {
  test('55: a dowel for 600 g over half a metre is 11.5 mm thick, and then sags by a 360th (beam formula put in backwards)', () => {
    const d = leastDowelDiameter(600, 500);
    expectClose(d, 11.511267, 1e-6);
    const I = (Math.PI * (d / 1000) ** 4) / 64;
    expectClose((5 * 0.6 * 9.80665 * 0.5 ** 3) / (384 * 8e9 * I), 0.5 / 360, 1e-9);
  });

  test('two halves of a cord carry the piece (forces added up)', () => {
    const tension = cordTension(108.8268, 340, 120);
    const up = 2 * tension * (120 / Math.hypot(170, 120));
    expectClose(up, 0.1088268 * 9.80665, 1e-9);
    expectClose(cordLength(340, 120), 716.173, 1e-6);
  });
});

describe('margins', () => {
  test('without a swatch 14.36 %, with one 7.583 % (uncertainties added in squares)', () => {
    expectClose(combinedUncertainty(UNCERTAINTIES.unmeasured), 0.08732, 1e-4);
    expectClose(marginFor(UNCERTAINTIES.unmeasured), 0.1436, 1e-3);
    expectClose(combinedUncertainty(UNCERTAINTIES.swatch), 0.0461, 1e-3);
    expectClose(marginFor(UNCERTAINTIES.swatch), 0.07583, 1e-3);
  });

  test.each([[50, 4.5], [75, 4.5], [100, 4.5], [25, 2.25], [150, 6.75], [250, 9], [400, 12], [800, 15]])(
    '58: a prepacked ball of %i g may be %f g light (Directive 76/211/EEC, Annex I 2.4)',
    (nominal, shortage) => { expectClose(tolerableShortage(nominal), shortage, 1e-12); },
  );
});

describe('display', () => {
  test.each<[number, 'nearest' | 'up', number, string]>([
    [16.06942, 'nearest', 16, '16 1/16'],
    [28.19579, 'nearest', 16, '28 3/16'],
    [13.77953, 'up', 16, '13 13/16'],
    [14.34175, 'up', 8, '14 3/8'],
    [12 + 1 / 32, 'nearest', 16, '12 1/16'],
  ])('57: %f in, %s, is written in parts of %i as %s (counted on a rule)', (inches, round, parts, text) => {
    expect(inchesText(toInches(inches, parts, round))).toBe(text);
  });
});

test('56: 3 ft² of tapestry in a 40-hour week at 6 to the inch are 69.677 cm² an hour (J. Soroka)', () => {
  expectClose(tapestryRate(3), 69.67728, 1e-9);
  [5, 3, 2, 1].forEach((feet, index) => { expectPrinted(tapestryRate(feet), ['116.13', '69.677', '46.452', '23.226'][index] ?? ''); });
});
