// Within one plain line: words, stress, links and tags that hold nothing. The signs are taken only between neighbours
// that leave them one meaning, so no rule of the Markdown parser is repeated here.
import type { PhrasingContent, Text } from 'mdast';
import type { MdxJsxAttribute } from 'mdast-util-mdx-jsx';

/** One line of a text, and where it begins: `line` from 1, `offset` from 0, in UTF-16 code units. */
export interface Row {
  readonly words: string;
  readonly line: number;
  readonly offset: number;
}

interface Point {
  line: number;
  column: number;
  offset: number;
}

interface Place {
  start: Point;
  end: Point;
}

/** Nothing in it may begin or end anything; "&" stands before a space. */
const BARE = String.raw`[^\u0000-\u001f\\\x60*_[\]{}<>&~|]`;
const WORDS = String.raw`${BARE}+(?:&(?= )${BARE}+)*`;
const ATTRIBUTES = String.raw`((?: [a-z]+="[^"&<>{}\\]*")*)`;
const TAG = new RegExp(`^<([A-Z][A-Za-z]*)${ATTRIBUTES} ?(/?)>$`);
const ATTRIBUTE = / ([a-z]+)="([^"]*)"/g;
/** Stars open after a space and before a letter; they close after a letter or a stop, before a space or a stop. */
const STRESS = String.raw`(?<=^|[ (])(\*{1,2})(?=[\p{L}\p{N}])(${WORDS})(?:(?<=[\p{L}\p{N}])|(?<=[.,:;!?])(?=\*+(?: |$)))\4(?=$|[ .,:;!?)])`;
const LINK = String.raw`(?<!!)\[(?=[\p{L}\p{N}])(${WORDS})(?<=[\p{L}\p{N}.?!])\]\(([A-Za-z0-9/#:.-]+)\)`;
const PIECE = new RegExp(`(${WORDS})|<([A-Z][A-Za-z]*)${ATTRIBUTES} ?/>|${STRESS}|${LINK}`, 'uy');

/** Reads `row` from `from` to its end and puts what it holds to `out`. @returns false when it is not plain. */
export function readPlainSentence(row: Row, from: number, out: PhrasingContent[]): boolean {
  const { words } = row;
  if (out.length > 0) goOn(out, row);
  for (let at = from; at < words.length; at = PIECE.lastIndex) {
    PIECE.lastIndex = at;
    const piece = PIECE.exec(words);
    if (piece === null) return false;
    const [all, bare, tag, attributes, stars, stressed, linked, url] = piece;
    const position = placeOf(row, at, at + all.length);
    if (bare !== undefined) addWords(out, bare, position);
    else if (tag !== undefined) out.push({ type: 'mdxJsxTextElement', name: tag, attributes: readAttributes(row, at + 1 + tag.length, attributes ?? ''), children: [], position });
    else if (stressed !== undefined && stars !== undefined) out.push({ type: stars === '*' ? 'emphasis' : 'strong', children: [textOf(stressed, row, at + stars.length)], position });
    else out.push({ type: 'link', title: null, url: url ?? '', children: [textOf(linked ?? '', row, at + 1)], position });
  }
  return true;
}

/** A tag that has a line to itself; undefined when the line is anything else. `holds` unless it closes itself. */
export function readPlainTag(row: Row): { name: string; attributes: MdxJsxAttribute[]; holds: boolean } | undefined {
  const [, name, attributes, closes] = TAG.exec(row.words) ?? [];
  return name === undefined ? undefined : { name, attributes: readAttributes(row, 1 + name.length, attributes ?? ''), holds: closes === '' };
}

/** From one index of a line to another, its end unless told. */
export function placeOf(row: Row, from: number, to = row.words.length): Place {
  return { start: pointAt(row, from), end: pointAt(row, to) };
}

function pointAt({ line, offset }: Row, index: number): Point {
  return { line, column: index + 1, offset: offset + index };
}

function textOf(value: string, row: Row, at: number): Text {
  return { type: 'text', value, position: placeOf(row, at, at + value.length) };
}

/** The end of the line above is part of the words on both sides. */
function goOn(out: PhrasingContent[], row: Row): void {
  const before = out.at(-1)?.position?.end;
  if (before === undefined) return;
  addWords(out, '\n', { start: { line: before.line, column: before.column, offset: row.offset - 1 }, end: pointAt(row, 0) });
}

function addWords(out: PhrasingContent[], value: string, position: Place): void {
  const last = out.at(-1);
  if (last?.type !== 'text') out.push({ type: 'text', value, position });
  else {
    last.value += value;
    last.position = { start: last.position?.start ?? position.start, end: position.end };
  }
}

function readAttributes(row: Row, from: number, written: string): MdxJsxAttribute[] {
  return Array.from(written.matchAll(ATTRIBUTE), ({ 0: all, 1: name = '', 2: value = '', index }) => ({
    type: 'mdxJsxAttribute',
    name,
    value,
    position: placeOf(row, from + index + 1, from + index + all.length),
  }));
}
