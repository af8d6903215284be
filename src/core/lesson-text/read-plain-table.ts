// Plain tables: bars at both ends of each line, a space on both sides of each cell's words, as many cells in each row.
import type { AlignType, Table, TableCell } from 'mdast';
import { placeOf, readPlainSentence, type Row } from './read-plain-sentence.ts';

const RULE = /^\|(?: :?-+:? \|)+$/;

/** A table with its head, which waits for the rule below it; undefined when the line is not plain. */
export function beginPlainTable(row: Row): Table | undefined {
  const table: Table = { type: 'table', children: [], position: placeOf(row, 0) };
  return readCells(row, table) ? table : undefined;
}

/** True once its rule was read: before that it may be no table at all. */
export function hasRule(table: Table): boolean {
  return table.align !== undefined;
}

/** Takes the rule or one more row. @returns false when it is not plain. */
export function goOnWithTable(table: Table, row: Row): boolean {
  if (hasRule(table)) return readCells(row, table);
  const marks = row.words.split('|').slice(1, -1);
  table.align = marks.map(alignOf);
  return RULE.test(row.words) && marks.length === table.children[0]?.children.length;
}

function alignOf(marks: string): AlignType {
  const [left, right] = [marks.startsWith(' :'), marks.endsWith(': ')];
  if (left && right) return 'center';
  return left ? 'left' : right ? 'right' : null;
}

function readCells(row: Row, table: Table): boolean {
  const [before, ...cells] = row.words.split('|');
  if (before !== '' || cells.pop() !== '' || cells.length === 0 || cells.length !== (table.children[0]?.children.length ?? cells.length)) return false;
  const children: TableCell[] = [];
  let bar = 0;
  for (const [index, written] of cells.entries()) {
    const next = bar + 1 + written.length;
    // The last cell has the bar behind it, too.
    const cell: TableCell = { type: 'tableCell', children: [], position: placeOf(row, bar, index === cells.length - 1 ? next + 1 : next) };
    if (!/^ \S(?:.*\S)? $/.test(written) || !readPlainSentence({ ...row, words: row.words.slice(0, next - 1) }, bar + 2, cell.children)) return false;
    children.push(cell);
    bar = next;
  }
  table.children.push({ type: 'tableRow', children, position: placeOf(row, 0) });
  return true;
}
