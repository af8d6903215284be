/**
 * What the drawing knows of a piece: sizes, counts and colours, already reckoned. Lengths are millimetres.
 *
 * Bands come in the order they are woven. All counts are the real ones; how many threads a picture can show is the
 * drawing's own affair.
 */
import type { Meeting } from '#core/craft/interlacement/lay.ts';
import type { Finish, Fixing } from '#core/craft/piece.ts';
import type { Units } from '#core/units/units.ts';

export interface WovenPiece {
  readonly kind: 'woven';
  /** A teacher's words, as typed. */
  readonly title: string;
  /** What the piece is, in a word or two: "wall hanging". */
  readonly thing: string;
  readonly widthMm: number;
  /** Working ends: two ends that are worked as one count once. */
  readonly ends: number;
  readonly endsTogether: 1 | 2;
  readonly warpColour: string;
  readonly seed: number;
  /** Woven head down, so it is turned through half a circle to hang. */
  readonly turned: boolean;
  readonly loom: LoomOutline | undefined;
  /** What became of the warp's ends below the cloth; where nobody has said it, they hang in knotted fours. */
  readonly finish?: Required<Finish>;
  /** How it is held to its dowel; `slipped` when missing. */
  readonly fixing?: Fixing;
  readonly bands: readonly ClothBand[];
}

/** The frame a piece stands in. `bottomMm` is the bare warp between the lower nails and the first row. */
export interface LoomOutline {
  readonly insideWidthMm: number;
  readonly insideHeightMm: number;
  readonly bottomMm: number;
}

/** Something knotted or tied that hangs: nothing in it is woven. x grows to the right from its left edge, y down from below the rod. */
export interface HungPiece {
  readonly kind: 'hung';
  readonly title: string;
  readonly thing: string;
  readonly widthMm: number;
  /** Below the rod. */
  readonly heightMm: number;
  readonly rod: { readonly kind: 'rod'; readonly diameterMm: number } | { readonly kind: 'ring'; readonly diameterMm: number; readonly thickMm: number };
  /** The same in words, without its title: "six cords of 4 mm, 80 cm long: …" */
  readonly words: Readonly<Record<Units, string>>;
  /** What comes again and again, drawn once. */
  readonly motifs: readonly (readonly HungStrand[])[];
  /** From the back to the front. */
  readonly laid: readonly (HungStrand | PlacedMotif | 'rod')[];
}

/** A stretch of cord or yarn. `way` is x and y of its beginning, then six numbers for each curve: two points that draw it, and where it ends. */
export interface HungStrand {
  readonly colour: string;
  readonly widthMm: number;
  readonly way: readonly number[];
}

export interface PlacedMotif {
  readonly motif: number;
  readonly xMm: number;
  readonly yMm: number;
}

export type ClothPiece = WovenPiece | HungPiece;

interface BandBase {
  /** How texts refer to the band, if it has a name. */
  readonly name: string | undefined;
  readonly heightMm: number;
  readonly colour: string;
  /** The yarn in a word: "Estuary". */
  readonly yarn: string;
}

export interface TabbyBand extends BandBase {
  readonly technique: 'tabby';
  readonly picks: number;
  /** How much of the warp the weft hides: 0 warp and weft alike, 1 weft-faced. */
  readonly cover: number;
  readonly shapes: readonly ClothShape[];
  /** Basket weave: two ends are one here, and count once. */
  readonly together?: 2;
  /** Threads that lie side by side in a row; 1 when missing. */
  readonly strands?: number;
}

/** One colour area laid over a tabby ground. Rows are picks of the band, ends count from the left selvedge. */
export interface ClothShape {
  readonly colour: string;
  readonly yarn: string;
  readonly spans: readonly EndSpan[];
  /** How its colour meets those beside it; `slit` when missing. */
  readonly join?: Meeting;
}

/** Ends `from` up to (not including) `to` in pick `row` (0 = the band's first). A row may have several. */
export interface EndSpan {
  readonly row: number;
  readonly from: number;
  readonly to: number;
}

export interface SoumakBand extends BandBase {
  readonly technique: 'soumak';
  readonly rows: number;
  readonly over: number;
  readonly back: number;
  /** Share (0..1) of the height taken by soumak; plain picks between rows take the rest. */
  readonly soumakShare: number;
  readonly tabbyBetween: number;
  readonly tabbyColour: string;
}

export interface RyaBand extends BandBase {
  readonly technique: 'rya';
  readonly rows: number;
  /** Working ends under one knot. */
  readonly knotEnds: number;
  /** Plain ends at each selvedge; 0 when missing. */
  readonly edgeEnds?: number;
  readonly strands: number;
  readonly pileMm: number;
  readonly groundColour: string;
}

export interface RovingBand extends BandBase {
  readonly technique: 'roving';
  readonly over: number;
  readonly passes: number;
}

export interface LoopPileBand extends BandBase {
  readonly technique: 'loop-pile';
  readonly rows: number;
  /** How far a loop hangs. */
  readonly loopMm: number;
  readonly groundColour: string;
}

export interface TwiningBand extends BandBase {
  readonly technique: 'twining';
  readonly rows: number;
  /** Ends between two crossings of the strands; 1 when missing. */
  readonly endsPerTwist?: number;
}

/** Has no height of its own: it lies on the edge of the band beside it and reaches into that band. */
export interface HemStitchBand extends BandBase {
  readonly technique: 'hem-stitch';
  /** Working ends in a bundle. */
  readonly bundleEnds: number;
  readonly reachMm: number;
}

/** Work that is not yet cloth (planning, dressing the loom): a few spaced picks in warp yarn. Only in strips. */
export interface HeadingBand extends BandBase {
  readonly technique: 'heading';
}

export type ClothBand =
  | TabbyBand
  | SoumakBand
  | RyaBand
  | RovingBand
  | LoopPileBand
  | TwiningBand
  | HemStitchBand
  | HeadingBand;

/** Height of all bands together, in millimetres. */
export function wovenHeightMm(piece: WovenPiece): number {
  return piece.bands.reduce((sum, band) => sum + band.heightMm, 0);
}
