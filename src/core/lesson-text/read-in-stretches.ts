// Reading a text by stretches that do not depend on each other, so that what was read once need not be read again after
// an edit elsewhere. A cut is made only where no list, quote, paragraph, table or tag can go on: after an empty line,
// before a letter, a heading or a tag at the left edge, outside every tag and block of code. Where a stretch read alone
// could still differ from the same lines in the whole text, the whole is read instead: the tree is always the same, and
// what is refused is refused.
import type { Nodes, Root, RootContent } from 'mdast';
import type { LessonProblem } from './problem.ts';
import { readMarkdown, type ReadText } from './read-markdown.ts';
import { readPlain } from './read-plain.ts';

/** Readings of stretches by their words. Those not needed by the last text are let go. */
export class KeptReadings {
  #read = new Map<string, ReadText>();

  /** What `words` read as when they are a whole text; read only when they were not in the text before. */
  readAll(stretches: readonly string[]): ReadText[] {
    const next = new Map<string, ReadText>();
    const readings = stretches.map((words) => {
      const reading = next.get(words) ?? this.#read.get(words) ?? readStretch(words);
      next.set(words, reading);
      return reading;
    });
    this.#read = next;
    return readings;
  }
}

/** The Markdown tree of a text that passed `preScan`, as `readMarkdown` reads it. Nodes are never shared with `kept`. */
export function readInStretches(source: string, kept: KeptReadings): ReadText {
  const stretches = cutText(source);
  if (stretches.length < 2) return readStretch(source);
  const readings = kept.readAll(stretches);
  const children: RootContent[] = [];
  let [line, offset] = [0, 0];
  for (const [index, reading] of readings.entries()) {
    const words = stretches[index] ?? '';
    // An error of the signs themselves refuses the whole text, whatever follows; others may not.
    if (!reading.ok) return reading.isOfSigns ? { ...reading, problem: moved(reading.problem, line) } : readMarkdown(source);
    if (index < stretches.length - 1 && endsInCode(reading.root)) return readMarkdown(source);
    for (const node of reading.root.children) children.push(movedNode(node, line, offset));
    line += countLines(words);
    offset += words.length;
  }
  return { ok: true, root: { type: 'root', children } };
}

function readStretch(words: string): ReadText {
  const plain = readPlain(words);
  return plain === undefined ? readMarkdown(words) : { ok: true, root: plain };
}

const CUT = /\n\n(?=[A-Za-z#<])/g;
const FENCE = /^[ \t]*(?:```|~~~)/;
const TAGS = /<(\/?)[A-Za-z][^<>]*?(\/?)>/g;

/** Cuts a text; joined, the stretches are the text. A text with addresses set apart is one stretch: they reach everywhere. */
export function cutText(source: string): string[] {
  if (source.includes(']:')) return [source];
  const stretches: string[] = [];
  let [start, depth, inFence] = [0, 0, false];
  let seen = 0;
  for (const { index } of source.matchAll(CUT)) {
    const end = index + 2;
    const words = source.slice(seen, end);
    seen = end;
    for (const row of words.includes('```') || words.includes('~~~') ? words.split('\n') : []) if (FENCE.test(row)) inFence = !inFence;
    for (const [, closes, empty] of words.matchAll(TAGS)) depth += closes === '/' ? -1 : empty === '/' ? 0 : 1;
    if (inFence || depth !== 0) continue;
    stretches.push(source.slice(start, end));
    start = end;
  }
  stretches.push(source.slice(start));
  return stretches;
}

/** Whether the last thing in a tree is a block of code, which may have swallowed what follows it. */
function endsInCode(root: Root): boolean {
  let last: Nodes | undefined = root.children.at(-1);
  while (last !== undefined && 'children' in last && last.children.length > 0) last = last.children.at(-1);
  return last?.type === 'code';
}

function countLines(words: string): number {
  let lines = 0;
  for (let at = words.indexOf('\n'); at !== -1; at = words.indexOf('\n', at + 1)) lines += 1;
  return lines;
}

function moved(problem: LessonProblem, lines: number): LessonProblem {
  return { ...problem, line: problem.line + lines };
}

interface Placed {
  position?: { start: Point; end: Point } | undefined;
  children?: Placed[];
  attributes?: Placed[];
}

interface Point {
  line: number;
  column: number;
  offset?: number | undefined;
}

/** A copy further down in a text. A stretch begins at the left edge, so columns stay. Trees are at most some dozens deep. */
function movedNode<T extends Placed>(node: T, lines: number, characters: number): T {
  const copy = { ...node };
  const movedPoint = (point: Point): Point => ({ line: point.line + lines, column: point.column, ...(point.offset === undefined ? {} : { offset: point.offset + characters }) });
  if (node.position !== undefined) copy.position = { start: movedPoint(node.position.start), end: movedPoint(node.position.end) };
  if (node.children !== undefined) copy.children = node.children.map((child) => movedNode(child, lines, characters));
  if (node.attributes !== undefined) copy.attributes = node.attributes.map((attribute) => movedNode(attribute, lines, characters));
  return copy;
}
