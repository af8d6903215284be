/**
 * A notice's words: the lessons' way of writing, but only what a letter can say too. Paragraphs, lists, stress, links,
 * and amounts of the plan, which every student reads as her own.
 */
import type { Block, Inline, LessonTree, ListItem } from '#core/lesson-text/tree.ts';
import type { Run, SaidBlock } from './said.ts';

const PLAIN = 'A notice holds paragraphs, lists, bold words, links and amounts. Take the rest out, or put it into the part.';

/** What a letter could not say, in a sentence; null when all of it can be said. */
export function unsayable(tree: LessonTree): string | null {
  return tree.children.every(isSayable) ? null : PLAIN;
}

function isSayable(block: Block): boolean {
  if (block.type === 'paragraph') return block.children.every(isSayableInline);
  if (block.type === 'list') return block.children.every((item) => item.children.every((one) => one.type === 'paragraph' && isSayable(one)));
  return false;
}

function isSayableInline(inline: Inline): boolean {
  if (inline.type === 'component') return inline.name === 'Amount';
  if (inline.type === 'link' && inline.url.startsWith('#')) return false;
  return !('children' in inline) || inline.children.every(isSayableInline);
}

/** The notice as one person gets it; `amount` gives the words for an amount of her plan. Only for a tree that is sayable. */
export function sayNotice(tree: LessonTree, amount: (key: string) => string): SaidBlock[] {
  return tree.children.flatMap((block): SaidBlock[] => {
    if (block.type === 'paragraph') return [{ kind: 'prose', runs: runsOf(block.children, amount) }];
    return block.type === 'list' ? [{ kind: 'points', items: block.children.map((item) => runsOfItem(item, amount)) }] : [];
  });
}

function runsOfItem({ children }: ListItem, amount: (key: string) => string): Run[] {
  return children.flatMap((block, index) => (block.type === 'paragraph' ? [...(index > 0 ? [{ words: '\n' }] : []), ...runsOf(block.children, amount)] : []));
}

function runsOf(inlines: readonly Inline[], amount: (key: string) => string, look: Omit<Run, 'words'> = {}): Run[] {
  return joined(inlines.flatMap((inline): Run[] => {
    switch (inline.type) {
      case 'text':
      case 'inlineCode':
        return [{ ...look, words: inline.value }];
      case 'break':
        return [{ ...look, words: '\n' }];
      case 'component':
        return [{ ...look, words: amount(inline.props['of'] ?? '') }];
      case 'link':
        return runsOf(inline.children, amount, { ...look, href: inline.url });
      case 'emphasis':
      case 'strong':
        return runsOf(inline.children, amount, { ...look, strong: true });
      case 'delete':
        return runsOf(inline.children, amount, look);
    }
  }));
}

/** Neighbours of one look become one run. */
function joined(runs: readonly Run[]): Run[] {
  const out: Run[] = [];
  for (const run of runs) {
    const last = out.at(-1);
    if (last !== undefined && last.strong === run.strong && last.href === run.href) out[out.length - 1] = { ...last, words: last.words + run.words };
    else out.push(run);
  }
  return out;
}
