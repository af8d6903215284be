/** What a kind of loom is to the reckoning. One kind is one file beside this one, and one line in `looms.ts`. */
import type { Warping } from '#core/craft/piece.ts';

export interface LoomKind {
  /** What holds the warp along a rail. */
  readonly holder: { readonly one: string; readonly many: string };
  /** Ways the warp can be wound on it. */
  readonly warpings: readonly [Warping, ...Warping[]];
  /** Why no other way goes, and what does; for a kind that takes every way there is nothing to say. */
  readonly otherWarping?: string;
  /** Rows of holders along each rail. Two are set half a pitch aside, and the inner one can be used alone. */
  readonly rows: 1 | 2;
  /** Bare warp at the edges, at least: above, where no needle passes any more, and below, for ends that are knotted or tucked. */
  readonly leastBareMm: { readonly top: number; readonly bottom: number };
}

/** What is said of it, apart from the reckoning. */
export interface LoomWords {
  /** As it stands in a list of choices. */
  readonly label: string;
  /** How the warp goes on, in a sentence. */
  readonly dressing: string;
  /** What goes wrong on it, and what to do. */
  readonly cautions: readonly string[];
}
