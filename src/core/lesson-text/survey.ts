// A first walk over the parsed tree, before anything is made of it: how large and how deep it is, and where the
// addresses lie that links elsewhere point to. Done with a list of its own instead of recursion, so no text can
// exhaust the stack.
import type { Definition, Nodes, Root } from 'mdast';
import { LIMITS } from './limits.ts';
import { problemAt, type LessonProblem } from './problem.ts';

export type Definitions = ReadonlyMap<string, Definition>;

interface Sums {
  nodes: number;
  headings: number;
  tables: number;
  definitions: Map<string, Definition>;
}

/** The addresses set apart in the text, by their names, or why the text is too much to go on with. */
export function surveyTree(root: Root): { ok: true; definitions: Definitions } | { ok: false; problem: LessonProblem } {
  const sums: Sums = { nodes: 0, headings: 0, tables: 0, definitions: new Map() };
  const waiting: { node: Nodes; depth: number; components: number }[] = [{ node: root, depth: 0, components: 0 }];
  for (let next = waiting.pop(); next !== undefined; next = waiting.pop()) {
    const { node, depth } = next;
    const components = next.components + (node.type === 'mdxJsxFlowElement' || node.type === 'mdxJsxTextElement' ? 1 : 0);
    const reason = count(node, depth, components, sums);
    if (reason !== undefined) return { ok: false, problem: problemAt(node.position, reason.code, reason.says) };
    if (!('children' in node)) continue;
    for (let index = node.children.length - 1; index >= 0; index -= 1) {
      const child = node.children[index];
      if (child !== undefined) waiting.push({ node: child, depth: depth + 1, components });
    }
  }
  return { ok: true, definitions: sums.definitions };
}

function count(node: Nodes, depth: number, components: number, sums: Sums): { code: 'too-much' | 'too-deep'; says: string } | undefined {
  sums.nodes += 1;
  if (sums.nodes > LIMITS.nodes) return { code: 'too-much', says: `The text has more than ${String(LIMITS.nodes)} paragraphs, words with emphasis, links and the like. Divide it into two parts.` };
  if (depth > LIMITS.depth) return { code: 'too-deep', says: `Things lie more than ${String(LIMITS.depth)} deep in each other here. Set them apart instead.` };
  if (components > LIMITS.componentDepth) return { code: 'too-deep', says: `Components lie more than ${String(LIMITS.componentDepth)} deep in each other here. Set them one after another.` };
  if (node.type === 'definition') {
    // As in Markdown everywhere, the first one of a name holds.
    if (!sums.definitions.has(node.identifier)) sums.definitions.set(node.identifier, node);
  } else if (node.type === 'heading') {
    sums.headings += 1;
    if (sums.headings > LIMITS.headings) return { code: 'too-much', says: `The text has more than ${String(LIMITS.headings)} headings. Divide it into two parts.` };
  } else if (node.type === 'table') {
    sums.tables += 1;
    if (sums.tables > LIMITS.tables) return { code: 'too-much', says: `The text has more than ${String(LIMITS.tables)} tables. Divide it into two parts.` };
    if (node.children.length > LIMITS.tableRows) return { code: 'too-much', says: `The table has ${String(node.children.length)} rows; at most ${String(LIMITS.tableRows)} can be shown. Divide it.` };
    const columns = Math.max(0, ...node.children.map((row) => row.children.length));
    if (columns > LIMITS.tableColumns) return { code: 'too-much', says: `The table has ${String(columns)} columns; at most ${String(LIMITS.tableColumns)} can be shown. Divide it.` };
  }
  return undefined;
}
