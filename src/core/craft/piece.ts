/**
 * A frame-loom piece as a person describes it: loom, width, spacing, yarns, and the bands in
 * the order they are woven. Everything else (ends, rows, yarn, hours, the drawing)
 * is reckoned from this.
 *
 * Lengths are millimetres, masses grams, linear density tex. Shares such as draw-in
 * and margins are fractions: 0.02 is two per cent.
 */

import type { WeaveNumbers } from '#core/craft/weave.ts';

export type CountSystem =
  | 'ne-cotton'
  | 'spun-silk'
  | 'ne-worsted'
  | 'nm'
  | 'lea'
  | 'run'
  | 'denier'
  | 'dtex'
  | 'jute'
  | 'yorkshire'
  | 'grain';

/** A count as it stands on a label: `{ text: '8/2', system: 'ne-cotton' }`. */
export interface YarnCount {
  readonly text: string;
  readonly system: CountSystem;
}

/** Shops' classes from 0, lace, to 7, jumbo (`yarn/classes.ts`). */
export type YarnClassNumber = 0 | 1 | 2 | 3 | 4 | 5 | 6 | 7;

interface GristWays {
  readonly tex: number;
  readonly metresPer100g: number;
  readonly count: YarnCount;
  /** A rough guess, for a yarn of which nothing else is known. */
  readonly class: YarnClassNumber;
}

type OnlyOne<T> = { [K in keyof T]: Pick<T, K> & Readonly<Partial<Record<Exclude<keyof T, K>, never>>> }[keyof T];

/** How thick the yarn is, said in exactly one way. */
export type YarnGrist = OnlyOne<GristWays>;

export interface YarnTraits {
  readonly label?: string;
  /** `#rrggbb` */
  readonly colour?: string;
  /** Strands taken together as one thread; 1 when missing. The grist is that of one strand. */
  readonly strands?: number;
  /** Ashenhurst's K, 0.75 to 1; 0.90 for warp and 0.84 for weft when missing. */
  readonly ashenhurstK?: number;
  /** Snug wraps in an inch, measured; 1 to 60. */
  readonly wrapsPerInch?: number;
  /** Thickness of one strand as it lies free, measured; instead of wraps, for what cannot be wrapped, such as roving. */
  readonly freeDiameterMm?: number;
  readonly ball?: { readonly metres: number; readonly grams: number };
  readonly fibre?: string;
}

export type Yarn = YarnTraits & YarnGrist;

export type Warping = 'zigzag' | 'two-nail';

/** Each kind with what it is in `looms/`; a further kind is a further name here. */
export type LoomKindName = 'nailed-frame' | 'notched-frame' | 'two-row-frame';

export type NailRows = 'both' | 'inner';

export interface Loom {
  /** `nailed-frame` when missing. */
  readonly kind?: LoomKindName;
  /** From one nail or notch to the next along a row, centre to centre. */
  readonly nailPitchMm: number;
  /** Which rows of a `two-row-frame` the warp goes round; `both` when missing. */
  readonly nailRows?: NailRows;
  readonly warping: Warping;
  /** 1 uses every nail, 2 every second one … */
  readonly everyNthNail?: number;
  readonly nailDiameterMm?: number;
  /** From the nails of one rail to the nails of the other. */
  readonly insideHeightMm: number;
  readonly insideWidthMm?: number;
}

export type EndsTogether = 1 | 2;
export type Parity = 'any' | 'even' | 'odd';

export interface Warp {
  readonly yarn: Yarn;
  /** 2 weaves every two neighbouring ends as one. */
  readonly endsTogether?: EndsTogether;
  /** What the pattern asks of the number of working ends. */
  readonly parity?: Parity;
  /** The number of ends when it is fixed by hand; otherwise reckoned from the width. */
  readonly endCount?: number;
  /** Warp used for tying at the first and at the last nail, each. */
  readonly tieMm?: number;
}

/** How closely the rows are beaten: by the yarn's own thickness, or as counted on a swatch. */
export type Beat =
  | { readonly picksPerWeftDiameter: number; readonly picksPerCm?: never }
  | { readonly picksPerCm: number; readonly picksPerWeftDiameter?: never };

export interface Allowances {
  readonly drawIn?: number;
  readonly relaxation?: number;
  readonly wetShrinkage?: number;
  /** Warp left unwoven at the top and at the bottom of the loom. */
  readonly topMm?: number;
  readonly bottomMm?: number;
  /** Yarn left hanging where a weft begins or ends. */
  readonly tailMm?: number;
  /** Yarn on one shuttle or butterfly. */
  readonly loadMm?: number;
  readonly marginWeft?: number;
  readonly marginWarp?: number;
}

/** How the cloth is held to its dowel: warp loops slipped on it, tied to it, or the edge lashed to it with yarn. */
export type Fixing = 'slipped' | 'tied' | 'lashed';

export interface Dowel {
  readonly diameterMm: number;
  readonly lengthMm?: number;
  /** `slipped` when missing. */
  readonly fixing?: Fixing;
}

/** What becomes of the warp ends below the cloth; `plain` leaves or cuts them as they are. */
export type FinishWay = 'knotted' | 'twisted' | 'tucked' | 'plain';

export interface Finish {
  readonly bottom: FinishWay;
  /** Fringe that is left to see, beyond knots; none when missing. Ends that are tucked in leave none. */
  readonly fringeMm?: number;
  /** Ends in a knot or a twisted cord; 4 when missing. */
  readonly bundleEnds?: number;
}

export type ShapeKind = 'triangle' | 'rectangle' | 'circle' | 'points';
export type ShapeJoin = 'slit' | 'dovetail' | 'interlock';

/** A corner of a shape drawn by points: to the right and upwards from wherever the shape counts from. */
export interface ShapePoint {
  readonly xMm: number;
  readonly yMm: number;
}

/**
 * A triangle's base is its first row. Points are the corners of a closed line, at least three; the box round them is what
 * is placed, so where they count from does not matter. What the line goes round an even number of times lies outside.
 */
export type ShapeMeasures =
  | { readonly shape: 'triangle' | 'rectangle'; readonly baseMm: number; readonly heightMm: number; readonly radiusMm?: never; readonly points?: never }
  | { readonly shape: 'circle'; readonly radiusMm: number; readonly baseMm?: never; readonly heightMm?: never; readonly points?: never }
  | { readonly shape: 'points'; readonly points: readonly ShapePoint[]; readonly baseMm?: never; readonly heightMm?: never; readonly radiusMm?: never };

interface ShapePlacing {
  readonly yarn: string;
  /** Middle of the base, from the left selvedge; the middle of the piece when missing. */
  readonly centreMm?: number;
  /** From the band's first row; 0 when missing. */
  readonly bottomMm?: number;
  /** How far the top stands to the right (negative: left) of the base's middle. */
  readonly leanMm?: number;
  /** Steps alike on both sides; true when missing, unless the shape leans. Points say it themselves. */
  readonly symmetric?: boolean;
  /** How the colours meet; `slit` when missing. */
  readonly join?: ShapeJoin;
}

/** A figure woven into the ground of a tabby band. */
export type Shape = ShapeMeasures & ShapePlacing;

interface NamedBand {
  /** How lessons refer to the band: `^[a-z0-9-]{1,40}$`, unique in the piece. */
  readonly name?: string;
}

export type BandHeight =
  | { readonly heightMm: number; readonly fill?: never }
  | { readonly fill: true; readonly heightMm?: never };

export type TabbyBand = NamedBand &
  BandHeight & {
    readonly technique: 'tabby';
    readonly yarn: string;
    /** Strands in one row of this band, instead of the yarn's own number: 2 is doubled weft. */
    readonly strands?: number;
    /** Two ends as one, and two strands in a row unless `strands` says otherwise. */
    readonly basket?: boolean;
    readonly shapes?: readonly Shape[];
  };

export interface SoumakBand extends NamedBand {
  readonly technique: 'soumak';
  readonly yarn: string;
  readonly over: number;
  readonly back: number;
  readonly rows: number;
  /** Picks of tabby between two rows of soumak. */
  readonly tabbyBetween: number;
  readonly tabbyYarn: string;
}

export interface RyaBand extends NamedBand {
  readonly technique: 'rya';
  readonly yarn: string;
  /** Strands in one knot. */
  readonly strands: number;
  /** Ends in each of the knot's two legs. */
  readonly legEnds: number;
  /** Plain ends at each selvedge; 0 when missing. */
  readonly edgeEnds?: number;
  readonly pileMm: number;
  readonly trimMm: number;
  readonly rows: number;
  readonly heightMm: number;
}

export interface RovingBand extends NamedBand {
  readonly technique: 'roving';
  readonly yarn: string;
  /** Ends the roving passes over, then under. */
  readonly over: number;
  /** How far it is puffed up from the cloth. */
  readonly bulgeMm: number;
  readonly heightMm: number;
  readonly passes?: number;
}

export interface HemStitchBand extends NamedBand {
  readonly technique: 'hem-stitch';
  readonly yarn: string;
  /** Ends drawn together by one stitch. */
  readonly bundleEnds: number;
  /** Rows the stitch reaches into the cloth. */
  readonly reachPicks: number;
}

export type LoopSize =
  | { readonly rodMm: number; readonly loopMm?: never }
  | { readonly loopMm: number; readonly rodMm?: never };

export type LoopPileBand = NamedBand &
  LoopSize & {
    readonly technique: 'loop-pile';
    readonly yarn: string;
    readonly rows: number;
    readonly heightMm: number;
  };

export interface TwiningBand extends NamedBand {
  readonly technique: 'twining';
  readonly yarn: string;
  readonly rows: number;
  /** Ends between two crossings of the strands; 1 when missing. */
  readonly endsPerTwist?: number;
}

/** Every technique with the band it describes; a further technique is a further line here. */
export interface BandByTechnique {
  readonly tabby: TabbyBand;
  readonly soumak: SoumakBand;
  readonly rya: RyaBand;
  readonly roving: RovingBand;
  readonly 'hem-stitch': HemStitchBand;
  readonly 'loop-pile': LoopPileBand;
  readonly twining: TwiningBand;
}

export type TechniqueName = keyof BandByTechnique;
export type Band = BandByTechnique[TechniqueName];

export interface FrameLoomPiece extends WeaveNumbers {
  readonly craft: 'frame-loom';
  /** Finished size of the woven cloth, without fringe. */
  readonly size: { readonly widthMm: number; readonly heightMm: number };
  readonly loom: Loom;
  readonly warp: Warp;
  /** Missing only in balanced cloth, whose rows then lie as far apart as the ends. */
  readonly beat?: Beat;
  readonly allowances?: Allowances;
  readonly dowel?: Dowel;
  readonly finish?: Finish;
  /** `turned` hangs with the end that was woven first at the top. */
  readonly hangs?: 'as-woven' | 'turned';
  /** Of the drawing's chance. */
  readonly seed?: number;
  /** By yarn role. */
  readonly yarns: Readonly<Record<string, Yarn>>;
  /** In the order they are woven. */
  readonly bands: readonly Band[];
}
