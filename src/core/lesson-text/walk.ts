// What the two halves of the walk share: the list of what is still to be read, and what has been gathered so far.
import type { Nodes } from 'mdast';
import { badCharacterReason, findBadCharacter } from './characters.ts';
import { LIMITS } from './limits.ts';
import { problemAt, type LessonProblem, type LessonProblemCode } from './problem.ts';
import type { Place, Tag } from './read-component.ts';
import { readComponent } from './read-component.ts';
import type { Definitions } from './survey.ts';
import type { Block, Component, Inline, Link } from './tree.ts';

export type Position = Nodes['position'];

/** A run of nodes in one place, read from left to right; what they become goes to `out`. */
export type Frame =
  | { kind: 'blocks'; nodes: readonly Nodes[]; index: number; out: Block[]; place: Place }
  | { kind: 'inline'; nodes: readonly Nodes[]; index: number; out: Inline[]; place: Place };

export interface Walk {
  readonly source: string;
  readonly definitions: Definitions;
  /** The innermost run last. A list of our own instead of recursion: depth costs no stack. */
  readonly frames: Frame[];
  readonly stepIds: Set<string>;
  /** Links to a place in the same lesson; their targets are known only when all headings are. */
  readonly insideLinks: { link: Link; position: Position }[];
  readonly problems: LessonProblem[];
}

export function refuse(walk: Walk, position: Position, code: LessonProblemCode, reason: string): void {
  if (walk.problems.length < LIMITS.problems) walk.problems.push(problemAt(position, code, reason));
}

export function readBlocksLater(walk: Walk, nodes: readonly Nodes[], out: Block[], place: Place): void {
  walk.frames.push({ kind: 'blocks', nodes, index: 0, out, place });
}

export function readInlineLater(walk: Walk, nodes: readonly Nodes[], out: Inline[], place: Place): void {
  walk.frames.push({ kind: 'inline', nodes, index: 0, out, place });
}

/** Words as they are kept: in composed form, and refused when an entity smuggled in what may not stand in a text. */
export function keepWords(walk: Walk, value: string, position: Position): string {
  const bad = findBadCharacter(value);
  if (bad !== undefined) refuse(walk, position, 'character', badCharacterReason(bad.code));
  return value.normalize('NFC');
}

/** The component of a tag that may stand at `place`, with nothing in it yet, or undefined when it was refused. */
export function takeComponent(walk: Walk, tag: Tag, place: Place): { component: Component; stands: 'block' | 'inline' } | undefined {
  const read = readComponent(tag, place);
  if (!read.ok) {
    for (const problem of read.problems) if (walk.problems.length < LIMITS.problems) walk.problems.push(problem);
    return undefined;
  }
  const component: Component = { type: 'component', name: read.name, props: read.props, children: [] };
  if (read.name === 'Step') noteStep(walk, read.props['id'] ?? '', tag.position);
  return { component, stands: read.schema.stands };
}

/** Each step has a name of its own, for a tick belongs to one step. */
function noteStep(walk: Walk, id: string, position: Position): void {
  if (walk.stepIds.has(id)) refuse(walk, position, 'step', `Two steps are called "${id}". Give each its own name, so that a tick belongs to one step.`);
  walk.stepIds.add(id);
  if (walk.stepIds.size > LIMITS.steps) refuse(walk, position, 'too-much', `The lesson has more than ${String(LIMITS.steps)} steps. Divide it into two parts.`);
}
