// The shape of a lesson's text once it has been read: a tree of our own, small enough to keep as JSON beside the
// source, and holding only what a page knows how to draw. There is no node for code that runs, for raw HTML or for
// an address that was not checked, so nothing downstream has to guard against them.
import type { ComponentName } from './components.ts';

/** Version of the tree's shape. A stored tree of another version is parsed anew from its source. */
export const TREE_VERSION = 1;

export interface Text {
  type: 'text';
  value: string;
}

/** Words set as code: spoken names of files, commands, a string of letters. Never run. */
export interface InlineCode {
  type: 'inlineCode';
  value: string;
}

export interface Break {
  type: 'break';
}

export interface Styled {
  type: 'emphasis' | 'strong' | 'delete';
  children: Inline[];
}

/** A link whose address passed `checkLinkAddress`. */
export interface Link {
  type: 'link';
  url: string;
  /** True when the link leaves this site and must not tell the other site where it came from. */
  external: boolean;
  title?: string;
  children: Inline[];
}

/** One of our own parts; `props` hold exactly what its schema in components.ts allows. */
export interface Component {
  type: 'component';
  name: ComponentName;
  props: Readonly<Record<string, string>>;
  children: Block[];
}

export type Inline = Text | InlineCode | Break | Styled | Link | Component;

export interface Paragraph {
  type: 'paragraph';
  children: Inline[];
}

export interface Heading {
  type: 'heading';
  depth: 2 | 3 | 4;
  /** Unique within the lesson; `headingAnchor` makes the id of the element from it. */
  id: string;
  children: Inline[];
}

export interface CodeBlock {
  type: 'code';
  value: string;
}

export interface ThematicBreak {
  type: 'thematicBreak';
}

export interface Blockquote {
  type: 'blockquote';
  children: Block[];
}

export interface List {
  type: 'list';
  ordered: boolean;
  /** First number of an ordered list. */
  start: number;
  /** True when its items are paragraphs of their own, set apart by space. */
  loose: boolean;
  children: ListItem[];
}

export interface ListItem {
  type: 'listItem';
  children: Block[];
}

export type ColumnAlign = 'left' | 'right' | 'center' | null;

/** A table whose first row is its head. */
export interface Table {
  type: 'table';
  align: ColumnAlign[];
  children: TableRow[];
}

export interface TableRow {
  type: 'tableRow';
  children: TableCell[];
}

export interface TableCell {
  type: 'tableCell';
  children: Inline[];
}

export type Block = Paragraph | Heading | CodeBlock | ThematicBreak | Blockquote | List | Table | Component;

export type LessonNode = Block | Inline | ListItem | TableRow | TableCell;

export interface LessonTree {
  v: typeof TREE_VERSION;
  type: 'root';
  children: Block[];
}

/** A heading at the lesson's left edge, for lists of contents. */
export interface OutlineEntry {
  depth: 2 | 3 | 4;
  id: string;
  words: string;
}

/** A step a student ticks, with its words (amounts of the plan read as "…"). */
export interface StepEntry {
  id: string;
  words: string;
}

/** A picture or video of the series that the lesson shows. */
export interface MediaEntry {
  kind: 'picture' | 'video';
  name: string;
}

/** The element id of a heading: prefixed, so that no heading can take the id of a part of the page. */
export function headingAnchor(id: string): string {
  return `h-${id}`;
}

/** The element id of a step. */
export function stepAnchor(id: string): string {
  return `step-${id}`;
}
