/**
 * Every default of the reckoning in one place, each with where it comes from.
 * All of them are settings a person can see and change, except the constants at the end.
 *
 * Sources: F found in published material, D derived, P common practice without a source,
 * M from memory of a published work.
 */

/** Threads that lie side by side in an inch are K·√(yards per pound). F: Ashenhurst. */
export const ASHENHURST_K = {
  /** Worsted, cotton and linen: what warp is made of, and the plain answer for any yarn. */
  warp: 0.9,
  /** Woollen and soft knitting yarn: what weft mostly is. */
  weft: 0.84,
} as const;

/** Loft diameter over compressed diameter when only one is known. F, weak: one weaver's tip. */
export const LOFT_RATIO = 1.43;

/** Tightness (d₁ + d₂)/p of weft-faced cloth. D: published projects lie between 0.3 and 0.42. */
export const TIGHTNESS = { target: 0.4, loose: 0.25, jam: 1 } as const;

/**
 * Take-up of both yarns of a balanced cloth when nothing is known. F: practice says about a tenth. D: Peirce's wave at
 * a sett of half the wraps gives 0.065 with the yarn beaten down and 0.145 with it free.
 */
export const TAKE_UP_UNKNOWN = { likely: 0.1, low: 0.065, high: 0.145 } as const;

export const DEFAULT_ALLOWANCES = {
  /** P: 0 to 3 % weft-faced, 4 to 10 % balanced; 4.5 and 7.4 % measured (F). Who gives or measures the bend says the draw-in as well, or has the weft-faced one. */
  drawIn: { 'straight-warp': 0.02, balanced: 0.08, given: 0.02, measured: 0.02 },
  /** P: cotton warp on a frame; an elastic wool warp may take 13 % (F). */
  relaxation: 0.02,
  /** A hanging is not washed. */
  wetShrinkage: 0,
  /** P: no needle passes in the last 40 mm. */
  topMm: 40,
  /** P: ends that are knotted or tucked need 60 mm; 100 to 150 mm where fringe is added (F). */
  bottomMm: 60,
  /** P */
  tailMm: 50,
  /** P: a well filled stick shuttle. Worth asking for. */
  loadMm: 8000,
  /** D: 1.645 standard errors of the yarn of a tabby band, without and with a counted swatch. */
  marginWeft: { unmeasured: 0.15, swatch: 0.1 },
  /** D */
  marginWarp: 0.1,
} as const;

/** P: top left unwoven when the hanging is tied to its rod instead of slipped on: two and a half inches. */
export const TOP_FOR_TYING_MM = 63.5;

/** P */
export const TIE_MM = 150;
/** A common panel nail. */
export const NAIL_DIAMETER_MM = 1.6;
/** P: rail beyond the first and the last nail, each. */
export const RAIL_MARGIN_MM = 20;
/** P: rows of twining or scrap at each edge that set zigzag ends even. */
export const SPACING_ROWS = { fewest: 3, most: 4 } as const;
/** P: stout cardboard, for a card strands are wound on. */
export const CARD_THICKNESS_MM = 2;
/** P: the spacer card is this much wider than the warp. */
export const SPACER_CARD_EXTRA_MM = 20;

/** P: warp left to tuck back into the cloth. */
export const TUCKED_MM = 60;
/** P: warp the hand needs beyond a knot to tie it. */
export const HANDLE_MM = 30;
/** M: bundle diameters a tight overhand knot swallows (the tight open trefoil takes 10.1: Pieranski and others 2001). Measure one. */
export const KNOT_DIAMETERS = 10;
/** P: warp over the length it has as a twisted cord. */
export const TWIST_RATIO = 1.25;
/** P */
export const FRINGE_BUNDLE_ENDS = 4;

export const HANGING = {
  /** P: room between the loops on the dowel and the first row. */
  seatMm: 5,
  /** P: dowel beyond the cloth on each side, 20 to 60 mm. */
  overhangMm: 40,
  /** P: the cord is tied this far from each dowel end. */
  cordInsetMm: 20,
  /** P: how high the cord rises over the dowel. */
  cordRiseMm: 120,
  /** P: from one wrap of a lashing to the next. */
  lashingPitchMm: 15,
  /** P: cord for one knot. */
  cordKnotMm: 150,
  /** Softer than any listed wood: aspen 8.1 to yellow birch 13.9 GPa (F). */
  modulusPa: 8e9,
  /** P: a sag of a 360th of the span is not seen. */
  sagLimit: 360,
  /** P: what holds it up should bear so many times its weight. */
  fixingFactor: 4,
  /** P: a dowel thinner than this is not sold straight. */
  leastStockMm: 8,
} as const;

/** P unless marked. Show a range, and ask for the person's own rate. */
export const PACE = {
  secondsPerEnd: 0.6,
  secondsPerRow: 20,
  secondsPerColourChange: 10,
  /** F: one teacher's figure. */
  ryaKnotsPerHour: 150,
  stitchesPerHour: 300,
  hemBundlesPerHour: 120,
  warpEndsPerHour: 120,
  finishingHours: 0.75,
  lowFactor: 0.6,
  highFactor: 1.8,
} as const;

/** P: slits longer than this are sewn, or the colours joined. */
export const LONGEST_SLIT_MM = 20;

/** P: less of a ball left over than this is too close to running out. */
export const TIGHT_SHARE_OF_BALL = 0.1;
