/** What a figure is: an explanatory line drawing of one technique, with this person's own amounts in it. */
import type { Scene } from '#core/craft/figures/kit/scene.ts';
import type { Piece } from '#core/craft/piece.ts';
import type { Plan } from '#core/craft/plan.ts';
import type { Units } from '#core/units/units.ts';

export interface FigureInput {
  readonly piece: Piece;
  readonly plan: Plan;
  readonly units: Units;
}

/** One movement of a figure. */
export interface FigureStep {
  /** What the hand does, in a sentence. */
  readonly words: string;
  /** How long it takes, compared with the others. */
  readonly weight: number;
}

export interface Figure {
  /** A few words: the heading of a caption. */
  readonly title: string;
  /** The same movement in words, with the amounts: for screen readers and under the drawing. */
  readonly describe: (input: FigureInput) => string;
  /** Its movements one after another, for whoever wants it step by step. At least one. */
  readonly steps: (input: FigureInput) => readonly FigureStep[];
  /** Height of the drawing; all are {@link FIGURE_WIDTH} wide. */
  readonly height: number;
  /** @param progress 0 before the first movement, 1 when it is done */
  readonly draw: (scene: Scene, input: FigureInput, progress: number) => void;
}

export const FIGURE_WIDTH = 560;
