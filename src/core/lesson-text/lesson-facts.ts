// What a lesson's text speaks of: its headings and steps, and what has to be fetched or reckoned before it can be
// drawn. Kept beside the tree, so that nobody has to walk the tree for it.
import { FIGURE_KINDS, type FigureKind } from '#core/craft/figures/figure-kinds.ts';
import { plainWords } from './plain-text.ts';
import type { Component, LessonNode, LessonTree, MediaEntry, OutlineEntry, StepEntry } from './tree.ts';

export interface LessonFacts {
  /** The headings, in order. */
  outline: OutlineEntry[];
  steps: StepEntry[];
  /** Keys of the plan's amounts that the text shows, each once, in order. */
  amounts: string[];
  figures: FigureKind[];
  media: MediaEntry[];
}

/** Looks through a whole tree once. */
export function factsOf(tree: LessonTree): LessonFacts {
  const amounts = new Set<string>();
  const figures = new Set<string>();
  const pictures = new Set<string>();
  const videos = new Set<string>();
  const wanted: Partial<Record<Component['name'], { names: Set<string>; by: string }>> = {
    Amount: { names: amounts, by: 'of' },
    Figure: { names: figures, by: 'of' },
    Picture: { names: pictures, by: 'name' },
    Video: { names: videos, by: 'name' },
  };
  const facts: LessonFacts = { outline: [], steps: [], amounts: [], figures: [], media: [] };
  const waiting: LessonNode[] = [...tree.children].reverse();
  for (let node = waiting.pop(); node !== undefined; node = waiting.pop()) {
    if (node.type === 'heading') facts.outline.push({ depth: node.depth, id: node.id, words: plainWords(node.children) });
    if (node.type === 'component') {
      if (node.name === 'Step') facts.steps.push({ id: node.props['id'] ?? '', words: plainWords(node.children) });
      const want = wanted[node.name];
      want?.names.add(node.props[want.by] ?? '');
    }
    if ('children' in node) waiting.push(...[...node.children].reverse());
  }
  facts.amounts = [...amounts];
  facts.figures = FIGURE_KINDS.filter((kind) => figures.has(kind));
  facts.media = [...[...videos].map((name) => ({ kind: 'video' as const, name })), ...[...pictures].map((name) => ({ kind: 'picture' as const, name }))];
  return facts;
}
