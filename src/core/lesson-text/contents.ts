// What a lesson's tree holds and needs: its headings and steps, and what has to be fetched or reckoned before it can
// be drawn.
import { FIGURE_KINDS, type FigureKind } from '#core/craft/figures/figure-kinds.ts';
import { plainWords } from './plain-text.ts';
import type { Component, LessonNode, LessonTree, MediaEntry, OutlineEntry, StepEntry } from './tree.ts';

export interface LessonContents {
  /** The headings, in order. */
  outline: OutlineEntry[];
  steps: StepEntry[];
  /** Keys of the plan's amounts that the text shows, each once, in order. */
  amounts: string[];
  figures: FigureKind[];
  media: MediaEntry[];
}

/** Looks through a whole tree once. */
export function contentsOf(tree: LessonTree): LessonContents {
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
  const contents: LessonContents = { outline: [], steps: [], amounts: [], figures: [], media: [] };
  const waiting: LessonNode[] = [...tree.children].reverse();
  for (let node = waiting.pop(); node !== undefined; node = waiting.pop()) {
    if (node.type === 'heading') contents.outline.push({ depth: node.depth, id: node.id, words: plainWords(node.children) });
    if (node.type === 'component') {
      if (node.name === 'Step') contents.steps.push({ id: node.props['id'] ?? '', words: plainWords(node.children) });
      const want = wanted[node.name];
      want?.names.add(node.props[want.by] ?? '');
    }
    if ('children' in node) waiting.push(...[...node.children].reverse());
  }
  contents.amounts = [...amounts];
  contents.figures = FIGURE_KINDS.filter((kind) => figures.has(kind));
  contents.media = [...[...videos].map((name) => ({ kind: 'video' as const, name })), ...[...pictures].map((name) => ({ kind: 'picture' as const, name }))];
  return contents;
}
