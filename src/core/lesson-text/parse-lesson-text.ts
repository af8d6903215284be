// The one way from a lesson's source to what pages draw. A lesson is Markdown with a few tags of our own, a part of
// MDX from which everything that runs has been left out. Text that holds anything else is refused as a whole, with
// the places and the reasons: a writer must see what her students will see, not a repaired version of it.
//
// The steps: count raw characters (pre-scan.ts), parse (read-markdown.ts), measure the tree (survey.ts), copy what is
// allowed into a tree of our own (read-block.ts, read-inline.ts), name headings and settle links within the lesson.
import type { Root } from 'mdast';
import { characterKind, characterName } from './characters.ts';
import { factsOf, type LessonFacts } from './lesson-facts.ts';
import { LIMITS } from './limits.ts';
import { plainWords } from './plain-text.ts';
import { preScan } from './pre-scan.ts';
import { problemAt, type LessonProblem } from './problem.ts';
import { readBlock } from './read-block.ts';
import { readInline } from './read-inline.ts';
import { KeptReadings, readInStretches } from './read-in-stretches.ts';
import { slugOf, uniqueSlug } from './slugs.ts';
import { surveyTree, type Definitions } from './survey.ts';
import { headingAnchor, stepAnchor, TREE_VERSION, type Block, type LessonTree, type OutlineEntry } from './tree.ts';
import type { Walk } from './walk.ts';

export interface LessonText extends LessonFacts {
  ok: true;
  tree: LessonTree;
  problems: [];
  /** Things that do not keep the lesson from being read but that its writer should look at. */
  warnings: LessonProblem[];
}

export interface RefusedText {
  ok: false;
  /** At least one, at most `LIMITS.problems`, in the order of the text. */
  problems: LessonProblem[];
}

/**
 * Reads a lesson's source. Never throws for anything a person can type; time is bounded by `LIMITS`. Who reads a text
 * again and again while it is written hands the same `kept` each time: only stretches that changed are parsed anew.
 */
export function parseLessonText(source: string, kept: KeptReadings = new KeptReadings()): LessonText | RefusedText {
  const text = source.replace(/\r\n?/g, '\n');
  const unfit = preScan(text);
  if (unfit !== undefined) return { ok: false, problems: [unfit] };
  const read = readInStretches(text, kept);
  if (!read.ok) return { ok: false, problems: [read.problem] };
  const survey = surveyTree(read.root);
  if (!survey.ok) return { ok: false, problems: [survey.problem] };
  const tree: LessonTree = { v: TREE_VERSION, type: 'root', children: [] };
  const walk = walkTree(read.root, text, survey.definitions, tree);
  if (walk.problems.length > 0) return { ok: false, problems: inOrder(walk.problems) };
  nameHeadings(tree.children);
  const facts = factsOf(tree);
  const warnings = [...settleInsideLinks(walk, facts.outline), ...unseenCharacters(text)].slice(0, LIMITS.problems);
  return { ok: true, tree, ...facts, problems: [], warnings: inOrder(warnings) };
}

function walkTree(root: Root, source: string, definitions: Definitions, tree: LessonTree): Walk {
  const walk: Walk = { source, definitions, frames: [], stepIds: new Set(), insideLinks: [], problems: [] };
  walk.frames.push({ kind: 'blocks', nodes: root.children, index: 0, out: tree.children, place: { top: true } });
  for (let frame = walk.frames.at(-1); frame !== undefined; frame = walk.frames.at(-1)) {
    const node = frame.nodes[frame.index];
    frame.index += 1;
    if (node === undefined || walk.problems.length >= LIMITS.problems) walk.frames.pop();
    else if (frame.kind === 'blocks') readBlock(walk, node, frame.out, frame.place);
    else readInline(walk, node, frame.out, frame.place);
  }
  return walk;
}

/** Headings stand at the left edge only, so they are all among the tree's own children. */
function nameHeadings(blocks: readonly Block[]): void {
  const taken = new Set<string>();
  for (const block of blocks) if (block.type === 'heading') block.id = uniqueSlug(plainWords(block.children), taken);
}

/** Points `#tie-on` at the heading or step of that name; warns where there is none. */
function settleInsideLinks(walk: Walk, outline: readonly OutlineEntry[]): LessonProblem[] {
  const headings = new Set(outline.map((entry) => entry.id));
  const warnings: LessonProblem[] = [];
  for (const { link, position } of walk.insideLinks) {
    const name = slugOf(link.url.slice(1));
    if (!headings.has(name) && walk.stepIds.has(name)) link.url = `#${stepAnchor(name)}`;
    else {
      link.url = `#${headingAnchor(name)}`;
      if (!headings.has(name)) warnings.push(problemAt(position, 'anchor', `No heading or step of this lesson is called "${name}". The link leads nowhere.`));
    }
  }
  return warnings;
}

/** Characters without width are needed in some scripts, so they are allowed, and shown to the writer. */
function unseenCharacters(text: string): LessonProblem[] {
  const found: LessonProblem[] = [];
  let line = 1;
  let lineStart = 0;
  for (let index = 0; index < text.length && found.length < LIMITS.problems; index += 1) {
    const code = text.charCodeAt(index);
    if (code === 0x0a) {
      line += 1;
      lineStart = index + 1;
    } else if (code >= 0xad && characterKind(code) === 'unseen' && !(code === 0xfeff && index === 0)) {
      const column = index - lineStart + 1;
      found.push({ line, column, endColumn: column + 1, code: 'unseen-character', reason: `Here stands a character that cannot be seen (${characterName(code)}). Take it out if you did not mean it.` });
    }
  }
  return found;
}

function inOrder(problems: readonly LessonProblem[]): LessonProblem[] {
  return [...problems].sort((a, b) => a.line - b.line || a.column - b.column);
}
