/** What a figure is: an explanatory line drawing of one technique, with this person's own amounts in it. */
import type { Scene } from '#core/craft/figures/kit/scene.ts';
import type { FrameLoomPiece } from '#core/craft/piece.ts';
import type { FrameLoomPlan } from '#core/craft/plan-types.ts';
import type { Units } from '#core/units/units.ts';

/** Of a frame-loom piece where nothing else is said: most figures are. */
export interface FigureInput<P = FrameLoomPiece, L = FrameLoomPlan> {
  readonly piece: P;
  readonly plan: L;
  readonly units: Units;
}

/** One movement of a figure. */
export interface FigureStep {
  /** What the hand does, in a sentence. */
  readonly words: string;
  /** How long it takes, compared with the others. */
  readonly weight: number;
}

/** Methods, as those of a craft: each is handed only pieces of its own craft. */
export interface Figure<P = FrameLoomPiece, L = FrameLoomPlan> {
  /** A few words: the heading of a caption. */
  readonly title: string;
  /** The same movement in words, with the amounts: for screen readers and under the drawing. */
  describe(input: FigureInput<P, L>): string;
  /** Its movements one after another, for whoever wants it step by step. At least one. */
  steps(input: FigureInput<P, L>): readonly FigureStep[];
  /** Height of the drawing; all are {@link FIGURE_WIDTH} wide. */
  readonly height: number;
  /** @param progress 0 before the first movement, 1 when it is done */
  draw(scene: Scene, input: FigureInput<P, L>, progress: number): void;
}

export const FIGURE_WIDTH = 560;
