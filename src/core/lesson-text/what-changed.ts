/** What a reader of an earlier text of a part would want to know of the newer one, in words rather than in source. */
import { listed } from '#core/listed.ts';
import { changedLines, type LineChange } from './changed-lines.ts';
import { factsOf } from './lesson-facts.ts';
import { plainWords } from './plain-text.ts';
import type { LessonNode, LessonTree } from './tree.ts';

export interface WhatChanged {
  /** `one new step and 2 passages`. */
  readonly says: string;
  readonly lines: readonly LineChange[];
}

/**
 * @param amount the words that stand for an amount of the plan: her own, so that both texts speak of her loom
 * @returns null when a reader would see no difference
 */
export function whatChanged(before: LessonTree, after: LessonTree, amount: (key: string) => string): WhatChanged | null {
  const lines = changedLines(plainLines(before, amount).join('\n'), plainLines(after, amount).join('\n'));
  if (lines.length === 0) return null;
  const [old, fresh] = [stepsOf(before), stepsOf(after)];
  const [put, gone] = [countMissing(fresh, old), countMissing(old, fresh)];
  const passages = lines.filter(({ kind }, index) => isChange(kind) && !isChange(lines[index - 1]?.kind)).length;
  return {
    lines,
    says: listed([
      ...(put === 0 ? [] : [put === 1 ? 'one new step' : `${put} new steps`]),
      ...(gone === 0 ? [] : [gone === 1 ? 'one step taken out' : `${gone} steps taken out`]),
      passages === 1 ? 'one passage' : `${passages} passages`,
    ]),
  };
}

const isChange = (kind: LineChange['kind'] | undefined): boolean => kind === 'in' || kind === 'out';
const stepsOf = (tree: LessonTree): Set<string> => new Set(factsOf(tree).steps.map(({ id }) => id));

/** How many of `some` are not among `others`. */
const countMissing = (some: ReadonlySet<string>, others: ReadonlySet<string>): number => [...some].filter((id) => !others.has(id)).length;

const HELD: ReadonlySet<string> = new Set(['blockquote', 'list', 'listItem', 'table']);
const SHOWN: Readonly<Record<string, string>> = { Video: 'Film', Picture: 'Picture', Figure: 'Figure' };

/** One line for each stretch of words, in the order of reading. */
function plainLines(tree: LessonTree, amount: (key: string) => string): string[] {
  const lines: string[] = [];
  const waiting: LessonNode[] = [...tree.children].reverse();
  for (let node = waiting.pop(); node !== undefined; node = waiting.pop()) {
    if (HELD.has(node.type) || (node.type === 'component' && node.children.length > 0)) {
      if (node.type === 'component' && node.props['title'] !== undefined) lines.push(node.props['title']);
      if ('children' in node) waiting.push(...[...node.children].reverse());
    } else {
      const words = node.type === 'component' ? shownWords(node.name, node.props) : node.type === 'code' ? node.value : plainWords([node], amount);
      if (words !== '') lines.push(words);
    }
  }
  return lines;
}

function shownWords(name: string, props: Readonly<Record<string, string>>): string {
  const shown = SHOWN[name];
  return shown === undefined ? '' : `${shown}: ${(props['title'] ?? props['name'] ?? props['of'] ?? '').replaceAll('-', ' ')}`;
}
