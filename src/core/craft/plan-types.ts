/**
 * What the plan of a frame-loom piece tells. Lengths are millimetres, masses grams, time hours; nothing is
 * rounded but counts.
 */
import type { TechniqueName } from '#core/craft/piece.ts';
import type { Problem } from '#core/outcome.ts';

export interface EndsPlan {
  /** Ends on the loom. */
  readonly count: number;
  /** What the weft treats as one: half of `count` when ends are doubled. */
  readonly working: number;
  /** Ends the width asks for before rounding and parity. */
  readonly raw: number;
  /** Between working ends. */
  readonly spacingMm: number;
  readonly nailsTop: number;
  readonly nailsBottom: number;
  /** From the first end to the last. */
  readonly woundWidthMm: number;
  /** Width of the cloth on the loom, before it draws in. */
  readonly loomWidthMm: number;
}

export interface LoomPlan {
  readonly insideWidthNeededMm: number;
  readonly heightOnLoomMm: number;
  readonly heightNeededMm: number;
  readonly topMm: number;
  readonly bottomMm: number;
  /** Between bare ends where the first row comes to lie: they take turns, and differ on a zigzag. */
  readonly firstGapsMm: { readonly narrow: number; readonly wide: number };
  /** Rows of twining or scrap at each edge that set them even. */
  readonly spacingRows: { readonly fewest: number; readonly most: number };
}

/** Of the yarn most picks are woven with. */
export interface WeftPlan {
  readonly diameterSumMm: number;
  readonly pickSpacingMm: number;
  readonly tightness: number;
  readonly crimp: number;
  /** Yarn from one working end to the next. */
  readonly stepMm: number;
  /** Yarn round the selvedge end. */
  readonly turnMm: number;
  readonly pickMm: number;
  readonly rawPicks: number;
}

export interface WarpPlan {
  readonly netMm: number;
  readonly withMarginMm: number;
  /** Of the net length. */
  readonly massG: number;
  readonly balls?: number;
}

export interface YarnPlan extends WarpPlan {
  /** Shuttles or butterflies to fill. */
  readonly loads: number;
  readonly rowsPerLoad: number;
}

export interface BandPlan {
  readonly index: number;
  readonly technique: TechniqueName;
  readonly heightMm: number;
  readonly picks?: number;
  readonly stitches?: number;
  readonly knots?: number;
  readonly strands?: number;
  readonly cutMm?: number;
  /** By yarn role. */
  readonly yarnMm: Readonly<Record<string, number>>;
}

export interface CutPlan {
  readonly spacerCard: { readonly widthMm: number; readonly heightMm: number };
  readonly dowel?: { readonly lengthMm: number; readonly minDiameterMm: number };
  readonly cordMm?: number;
  /** Yarn that lashes the cloth to its dowel, where it is held so. */
  readonly lashingMm?: number;
  /** What the fixing in the wall must hold. */
  readonly fixingHoldsG: number;
}

export interface Hours {
  readonly likely: number;
  readonly low: number;
  readonly high: number;
}

export interface FrameLoomPlan {
  readonly ends: EndsPlan;
  readonly loom: LoomPlan;
  readonly weft: WeftPlan;
  readonly warp: WarpPlan;
  /** By yarn role. */
  readonly yarns: Readonly<Record<string, YarnPlan>>;
  readonly bands: readonly BandPlan[];
  readonly cut: CutPlan;
  /** Of the finished piece: warp and weft without margins. */
  readonly massG: number;
  readonly hours: Hours;
  readonly warnings: readonly Problem[];
}
