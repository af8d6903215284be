// A lesson as plain words: for search, for summaries, for names of headings and steps.
import type { LessonNode, LessonTree } from './tree.ts';

const BLOCKS: ReadonlySet<string> = new Set(['paragraph', 'heading', 'blockquote', 'list', 'listItem', 'table', 'tableRow', 'tableCell', 'component', 'thematicBreak', 'break']);

/**
 * The words below `nodes`, blocks set apart by a space. Only text a person wrote as words: no code, no addresses, no
 * attributes. `amount` gives the words that stand for an amount of the plan, "…" unless told otherwise.
 */
export function plainWords(nodes: readonly LessonNode[], amount: (key: string) => string = () => '…'): string {
  const words: string[] = [];
  const waiting: LessonNode[] = [...nodes].reverse();
  for (let node = waiting.pop(); node !== undefined; node = waiting.pop()) {
    if (node.type === 'text') words.push(node.value);
    else if (node.type === 'component' && node.name === 'Amount') words.push(amount(node.props['of'] ?? ''));
    else {
      if (BLOCKS.has(node.type)) words.push(' ');
      if (!('children' in node)) continue;
      for (let index = node.children.length - 1; index >= 0; index -= 1) {
        const child = node.children[index];
        if (child !== undefined) waiting.push(child);
      }
    }
  }
  return words.join('').replace(/\s+/g, ' ').trim();
}

/** All words of a lesson, without amounts (they differ for each student), for the search index and summaries. */
export function lessonPlainText(tree: LessonTree): string {
  return plainWords(tree.children, () => '');
}
