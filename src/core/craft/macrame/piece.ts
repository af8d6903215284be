/**
 * A knotted piece as a person describes it, and the plan that comes of it.
 *
 * It hangs from a rod or a ring in columns side by side; every column is a number of cords, each folded over the rod so
 * that it gives two ends, and is knotted in sections from the top down. Below the columns, in the foot, all ends go on
 * together. Lengths are millimetres, masses grams, linear density tex; what cord a knot takes is told in cord diameters.
 */
import type { PlanCore } from '#core/craft/craft.ts';
import type { Yarn, YarnTraits } from '#core/craft/piece.ts';
import type { WarpPlan } from '#core/craft/plan-types.ts';

/** Cord told by its thickness (`diameterMm` 0.5 to 60; `tex` where a scale has told it), or any yarn by its grist. */
export type Cord = (Pick<YarnTraits, 'label' | 'colour' | 'ball' | 'fibre'> & { readonly diameterMm: number; readonly tex?: number }) | Yarn;

export type Rod =
  /** `lengthMm` as wide as the columns with something to stand out where it is missing. */
  | { readonly kind: 'rod'; readonly diameterMm: number; readonly lengthMm?: number }
  /** `diameterMm` from outer edge to outer edge, `thickMm` of what it is made of: 8 when missing. */
  | { readonly kind: 'ring'; readonly diameterMm: number; readonly thickMm?: number };

interface Named {
  /** How lessons refer to it: `^[a-z0-9-]{1,40}$`, unique in the piece. */
  readonly name?: string;
}

/** Square knots under each other, four ends to a knot: the two in the middle are filled round, the outer two work. */
export type SquareKnots = Named & {
  readonly technique: 'square-knots';
  /** Bare cord between two knots; 0 when missing. */
  readonly gapMm?: number;
  /** Only its first half, again and again: the column turns. */
  readonly spiral?: boolean;
} & ({ readonly knots: number; readonly heightMm?: never } | { readonly heightMm: number; readonly knots?: never });

/** Rows of square knots, each row tied half a knot to the side of the one above. */
export type AlternatingKnots = Named & { readonly technique: 'alternating'; readonly rows: number; readonly gapMm?: number };

/** Double half hitches of every end over one that is held across: a rib. */
export type HalfHitches = Named & { readonly technique: 'half-hitches'; readonly rows: number; readonly slant?: 'level' | 'left' | 'right' };

export type PlainCord = Named & { readonly technique: 'plain'; readonly heightMm: number };

/** All ends wrapped by a cord of its own (`yarn`, that of the first column when missing). */
export type GatheringKnot = Named & { readonly technique: 'gathering'; readonly wraps: number; readonly yarn?: string };

/** The loose ends; nothing follows it. */
export type Fringe = Named & { readonly technique: 'fringe'; readonly heightMm: number };

export type Section = SquareKnots | AlternatingKnots | HalfHitches | PlainCord | GatheringKnot | Fringe;
export type FootSection = PlainCord | GatheringKnot | Fringe;

export interface Column extends Named {
  /** Role of its cord. */
  readonly yarn: string;
  /** Folded over the rod; twice as many ends. */
  readonly cords: number;
  readonly sections: readonly Section[];
}

export interface MacramePiece {
  readonly craft: 'macrame';
  readonly rod: Rod;
  /** By role. */
  readonly yarns: Readonly<Record<string, Cord>>;
  /** From the left to the right. */
  readonly columns: readonly Column[];
  readonly foot?: readonly FootSection[];
  /** As measured on ten knots, in cord diameters: 11.5 to 20 (16 when missing), 2 to 6 (3.5), 12.5 to 25 (15). */
  readonly takes?: { readonly squareKnot?: number; readonly squareRise?: number; readonly doubleHalfHitch?: number };
  /** `margin` to buy on top, 0 to 1 (0.1 when missing); `tailMm` at every end to hold while knotting (50). */
  readonly allowances?: { readonly margin?: number; readonly tailMm?: number };
  readonly seed?: number;
}

export interface SectionPlan {
  readonly technique: Section['technique'];
  readonly name?: string;
  readonly heightMm: number;
  readonly knots?: number;
  /** What an end takes that works, and one that is only knotted round or held. */
  readonly workerMm: number;
  readonly fillerMm: number;
  /** The gathering knot's own cord, to cut. */
  readonly cordMm?: number;
}

export interface ColumnPlan {
  readonly index: number;
  readonly name?: string;
  readonly ends: number;
  readonly heightMm: number;
  /** To cut, every cord of the column alike. */
  readonly cords: number;
  readonly cutMm: number;
  /** What the whole-length rule of practice would cut, for comparison. */
  readonly ruleMm: number;
  readonly sections: readonly SectionPlan[];
}

/** One line of what to cut. */
export interface CordCut {
  readonly what: 'cord' | 'gathering-cord';
  /** Column or section it is for, by name or place. */
  readonly where: string;
  readonly yarn: string;
  readonly count: number;
  readonly lengthMm: number;
}

export interface MacramePlan extends PlanCore {
  readonly craft: 'macrame';
  readonly widthMm: number;
  /** From the rod to the tips. */
  readonly heightMm: number;
  readonly cords: number;
  readonly ends: number;
  readonly knots: number;
  readonly columns: readonly ColumnPlan[];
  readonly foot: readonly SectionPlan[];
  /** Of a rod; a ring is bought as it is. */
  readonly rod?: { readonly lengthMm: number; readonly minDiameterMm: number };
  readonly cut: readonly CordCut[];
  /** By role. */
  readonly yarns: Readonly<Record<string, WarpPlan>>;
}
