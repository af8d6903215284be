/**
 * A lesson's text for the loom side: its steps one at a time, each with the cautions that stand before it and the figure
 * that belongs to it.
 */
import type { Block, Component, LessonTree } from './tree.ts';

export interface LoomSideStep {
  readonly id: string;
  /** What is to be done. */
  readonly step: Component;
  /** In their order, since the step before. */
  readonly cautions: readonly Component[];
  /** Kind of a technique's figure. */
  readonly figure: string | undefined;
}

const named = (block: Block | undefined, name: Component['name']): Component | undefined =>
  block?.type === 'component' && block.name === name ? block : undefined;

/** The steps in their order. A figure that follows a step before any other step is that step's; else the last one of the section. */
export function loomSideSteps(tree: LessonTree): LoomSideStep[] {
  const steps: LoomSideStep[] = [];
  let cautions: Component[] = [];
  let figure: string | undefined;
  tree.children.forEach((block, index) => {
    if (block.type === 'heading') figure = undefined;
    const caution = named(block, 'Caution');
    if (caution !== undefined) cautions.push(caution);
    figure = named(block, 'Figure')?.props['of'] ?? figure;
    const step = named(block, 'Step');
    if (step === undefined) return;
    steps.push({ id: step.props['id'] ?? '', step, cautions, figure: figureAfter(tree.children, index) ?? figure });
    cautions = [];
  });
  return steps;
}

function figureAfter(blocks: readonly Block[], at: number): string | undefined {
  for (const block of blocks.slice(at + 1)) {
    if (block.type === 'heading' || named(block, 'Step') !== undefined) return undefined;
    const figure = named(block, 'Figure');
    if (figure !== undefined) return figure.props['of'];
  }
  return undefined;
}
