// The short way through most of a lesson: paragraphs, headings, lists of single lines, tables and tags on lines of their
// own, written as nearly everybody writes them. The Markdown parser weighs each character against all that it could begin,
// which takes many times as long. What is not plain beyond doubt is left to that parser, so this file decides nothing
// about the language: of what it reads it makes the tree that the parser makes, place for place.
import type { BlockContent, Heading, List, Paragraph, Root, Table } from 'mdast';
import type { MdxJsxFlowElement } from 'mdast-util-mdx-jsx';
import { placeOf, readPlainSentence, readPlainTag, type Row } from './read-plain-sentence.ts';
import { beginPlainTable, goOnWithTable, hasRule } from './read-plain-table.ts';

const HEADING = /^(#{1,6}) (?=[\p{L}*])/u;
const ITEM = /^- (?=[\p{L}*])/u;
/** Begins nothing but a sentence: a letter, or what opens stress or a link before one. */
const PROSE = /^(?:\*{0,2}|\[)\p{L}/u;

/** The tree of a text, or undefined where only the Markdown parser can tell. Line ends must be `\n` already. */
export function readPlain(source: string): Root | undefined {
  const reader = new PlainReader();
  let [line, offset] = [1, 0];
  for (const words of source.split('\n')) {
    if (!reader.read({ words, line, offset })) return undefined;
    line += 1;
    offset += words.length + 1;
  }
  return reader.tree();
}

/** What is open at the end of a line, and where the next one goes. */
class PlainReader {
  readonly #blocks: BlockContent[] = [];
  readonly #tags: MdxJsxFlowElement[] = [];
  #paragraph: Paragraph | undefined;
  #list: List | undefined;
  #table: Table | undefined;

  tree(): Root | undefined {
    return this.#tags.length === 0 && this.#endTable() ? { type: 'root', children: this.#blocks } : undefined;
  }

  /** Takes one line. @returns false when it is not plain where it stands. */
  read(row: Row): boolean {
    const { words } = row;
    if (words === '') {
      [this.#paragraph, this.#list] = [undefined, undefined];
      return this.#endTable();
    }
    if (words.endsWith(' ')) return false;
    if (this.#table !== undefined) return goOnWithTable(this.#table, row) && endAt(this.#table, row);
    if (ITEM.test(words)) return this.#readItem(row);
    // A line below an item without an empty one between belongs to it, whatever it looks like.
    if (this.#list !== undefined) return false;
    if (PROSE.test(words)) return this.#readProse(row);
    if (words.startsWith('|')) return this.#openTable(row);
    this.#paragraph = undefined;
    return words.startsWith('<') ? this.#readTag(row) : this.#readHeading(row);
  }

  get #out(): BlockContent[] {
    return (this.#tags.at(-1)?.children as BlockContent[] | undefined) ?? this.#blocks;
  }

  #readProse(row: Row): boolean {
    if (this.#paragraph === undefined) this.#out.push((this.#paragraph = newParagraph(row, 0)));
    return readPlainSentence(row, 0, this.#paragraph.children) && endAt(this.#paragraph, row);
  }

  #readItem(row: Row): boolean {
    // After an empty line it would go on with the list above, and make it a loose one.
    if (this.#paragraph !== undefined || (this.#list === undefined && this.#out.at(-1)?.type === 'list')) return false;
    if (this.#list === undefined) {
      this.#list = { type: 'list', ordered: false, start: null, spread: false, children: [], position: placeOf(row, 0) };
      this.#out.push(this.#list);
    }
    const paragraph = newParagraph(row, 2);
    this.#list.children.push({ type: 'listItem', spread: false, checked: null, children: [paragraph], position: placeOf(row, 0) });
    return readPlainSentence(row, 2, paragraph.children) && endAt(this.#list, row);
  }

  #openTable(row: Row): boolean {
    // Below a line of words it would be a part of them.
    this.#table = this.#paragraph === undefined ? beginPlainTable(row) : undefined;
    if (this.#table !== undefined) this.#out.push(this.#table);
    return this.#table !== undefined;
  }

  /** @returns false when what looked like a table was none. */
  #endTable(): boolean {
    const wasOne = this.#table === undefined || hasRule(this.#table);
    this.#table = undefined;
    return wasOne;
  }

  #readHeading(row: Row): boolean {
    const signs = HEADING.exec(row.words)?.[1]?.length;
    // Signs at the end of a heading close it.
    if (signs === undefined || row.words.endsWith('#')) return false;
    const heading: Heading = { type: 'heading', depth: signs as Heading['depth'], children: [], position: placeOf(row, 0) };
    this.#out.push(heading);
    return readPlainSentence(row, signs + 1, heading.children);
  }

  #readTag(row: Row): boolean {
    if (row.words.startsWith('</')) {
      const tag = this.#tags.pop();
      return tag !== undefined && row.words === `</${tag.name ?? ''}>` && endAt(tag, row);
    }
    const tag = readPlainTag(row);
    if (tag === undefined) return false;
    const element: MdxJsxFlowElement = { type: 'mdxJsxFlowElement', name: tag.name, attributes: tag.attributes, children: [], position: placeOf(row, 0) };
    this.#out.push(element);
    if (tag.holds) this.#tags.push(element);
    return true;
  }
}

function newParagraph(row: Row, from: number): Paragraph {
  return { type: 'paragraph', children: [], position: placeOf(row, from) };
}

/** What was open ends with this line, as far as is known. */
function endAt(node: BlockContent, row: Row): true {
  const { end } = placeOf(row, row.words.length);
  node.position = { start: node.position?.start ?? end, end };
  return true;
}
