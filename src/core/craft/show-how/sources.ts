/**
 * Where every formula and every default of a working comes from, and how far that can be
 * trusted. The numbers of the defaults themselves are in `../defaults.ts`.
 */
import type { Standing } from '#core/craft/show-how/notebook.ts';

const practice = (source: string): Standing => ({ source, trust: 'practice' });
const formula = (source: string): Standing => ({ source, trust: 'formula' });
const exact = (source: string): Standing => ({ source, trust: 'counted' });

/** Of formulas. */
export const RULES = {
  arithmetic: exact('adding up'),
  asGiven: exact('as the piece says'),
  count: exact('counting'),
  wholeNumbers: exact('to whole ones; a half goes up, and a billionth keeps exact halves on one side'),
  yarnNumbers: exact('ASTM D2260, conversion factors for yarn numbers'),
  tex: exact('ISO 1144, grams in a kilometre'),
  ashenhurst: formula('Ashenhurst’s rule for threads that lie side by side'),
  wraps: exact('an inch shared by the wraps counted in it'),
  bandStrands: exact('as many strands as the band takes in a row'),
  together: exact('strands packed alike: their areas add up'),
  yarnClass: { source: 'yarn weight classes as shops print them (Craft Yarn Council’s wraps, one shop’s metres): they overlap, so measure', trust: 'class' },
  loftRatio: formula('P. Osterkamp’s tip of 2004, that wraps come to about 0.7 of Ashenhurst’s number: weak, wraps you count are better'),
  shrinking: exact('a share that is lost is divided out'),
  nails: exact('the way of the warp round the nails'),
  loom: exact('geometry of the loom'),
  peirce: formula('Peirce 1937, J. Text. Inst. 28, T45'),
  turn: formula('half a circle round the selvedge end, one row further on'),
  swatch: exact('rows counted on a swatch'),
  beat: formula('rows in one thickness of the weft'),
  stitchPath: formula('the path of the yarn, worked out here: no published derivation, so try a swatch'),
  ellipse: formula('length of an ellipse: complete elliptic integral of the second kind, as a mean over 200 places'),
  parabola: formula('length of a parabola’s arc'),
  colourRows: formula('Peirce 1937, J. Text. Inst. 28, T45, with the turns and joins of each colour’s edges'),
  drawnRows: exact('counted in the rows of the band as they are drawn'),
  shapes: exact('the shape stepped out in whole ends and rows'),
  euclid: exact('schoolbook geometry'),
  evenOdd: exact('even-odd rule: inside is what the line goes round an odd number of times'),
  spacingRows: practice('common practice: rows of twining or scrap that set zigzag ends even'),
  beam: formula('bending of an evenly loaded beam held at both ends'),
  forces: formula('balance of forces'),
  errors: formula('independent errors add in squares (JCGM 100, 5.1)'),
  coverage: formula('one-sided 95 % of a normal distribution'),
  margins: exact('what to buy on top'),
  pace: practice('common practice; hands differ widely, so take your own rate'),
} as const satisfies Record<string, Standing>;

const COMMON = practice('common practice');

/** Of numbers that stand in where the person gave none, and of those a rule brings along. */
export const DEFAULTS = {
  ashenhurstK: formula('Ashenhurst: 0.90 for worsted, cotton and linen, 0.84 for woollen and soft knitting yarn'),
  oneStrand: exact('one, unless the yarn says more'),
  everyNail: exact('every nail, unless the loom says otherwise'),
  singleEnds: exact('single ends, unless the warp says otherwise'),
  parity: exact('the ends the pattern asks for: any, even or odd, in pairs where two are worked as one'),
  drawIn: practice('common practice: 0 to 3 % for weft-faced cloth, 4 to 10 % for balanced'),
  relaxation: practice('common practice for cotton warp on a frame; an elastic wool warp takes up to 13 %'),
  wetShrinkage: practice('common practice: a hanging is not washed'),
  topMm: practice('common practice: no needle passes in the last 40 mm'),
  bottomMm: practice('common practice: enough to knot or tuck the ends'),
  tailMm: COMMON,
  loadMm: practice('common practice: a well filled stick shuttle'),
  marginWeft: formula('1.645 standard errors of the yarn of a tabby band, rounded up'),
  marginWarp: formula('what a warp may differ by'),
  nailDiameter: practice('a common panel nail'),
  tie: COMMON,
  railMargin: COMMON,
  lashing: COMMON,
  fixing: practice('common practice: a fixing holds several times the piece'),
  oneEnd: exact('between every two ends, unless the band says otherwise'),
  seat: COMMON,
  spacerExtra: COMMON,
  overhang: practice('common practice: 20 to 60 mm'),
  cord: COMMON,
  modulus: practice('softer than any listed wood (aspen 8.1 to yellow birch 13.9 GPa)'),
  sagLimit: practice('common practice: a sag of a 360th of the span is not seen'),
  cardThickness: practice('common practice: stout cardboard'),
  cardStep: practice('common practice: cards are cut to 5 mm'),
  pace: practice('common practice; hands differ widely, so take your own rate'),
  ryaPace: practice('one teacher’s figure; hands differ widely'),
  uncertainty: practice('estimated: what such a number differs by'),
  ryaMargin: practice('common practice: strands are cut one by one'),
  edgeEnds: exact('none: knots go from selvedge to selvedge'),
  onePass: exact('one pass, unless the band says more'),
} as const satisfies Record<string, Standing>;
