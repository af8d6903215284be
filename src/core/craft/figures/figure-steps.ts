/** A figure step by step: where in its movement each step is done. */
import type { FigureKind } from '#core/craft/figures/figure-kinds.ts';
import { figureStepsOf, type AnyFigureInput } from '#core/craft/figures/figures.ts';

export interface StepAt {
  readonly words: string;
  /** The figure's progress when the step is done, over 0 up to 1. */
  readonly until: number;
}

/** The steps of a figure in their order; the last one is done at 1. */
export function stepsOf(kind: FigureKind, input: AnyFigureInput): readonly StepAt[] {
  const steps = figureStepsOf(kind, input);
  const total = steps.reduce((sum, { weight }) => sum + weight, 0);
  let done = 0;
  return steps.map(({ words, weight }, index) => {
    done += weight;
    return { words, until: index === steps.length - 1 ? 1 : done / total };
  });
}

/** Rounding must not leave a figure in the step it has just finished. */
const HAIR = 1e-6;

/** Which step is under way at this progress, from 0; the last one when all is done. */
export function stepAt(steps: readonly StepAt[], progress: number): number {
  const found = steps.findIndex(({ until }) => progress <= until + HAIR);
  return found < 0 ? steps.length - 1 : found;
}
