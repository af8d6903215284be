// One pass over the raw characters before any parser sees them. A Markdown parser's work can grow with the square of
// what it is given: nested lists, long runs of brackets or backticks, a thousand half-open emphases. All of that is
// counted here, in time proportional to the length, and refused when it is more than people write.
import { badCharacterReason, characterKind, isLoneHalf } from './characters.ts';
import { LIMITS } from './limits.ts';
import type { LessonProblem, LessonProblemCode } from './problem.ts';

const TAB = 0x09;
const NEWLINE = 0x0a;
const SPACE = 0x20;

interface Counts {
  line: number;
  lineStart: number;
  lineBrackets: number;
  lineBars: number;
  /** Where the stretch of lines without an empty one began, and its marks so far. */
  stretchStart: number;
  stretchMarks: number;
  stretchFirstLine: number;
  marks: number;
  prefixMarkers: number;
  angles: number;
  squareBrackets: number;
  definitions: number;
}

/** What makes the text unfit to be parsed at all, or undefined. Line ends must be `\n` already. */
export function preScan(source: string): LessonProblem | undefined {
  if (source.length > LIMITS.sourceLength) {
    return tooMuch(1, 1, 'too-long', `The text has ${String(source.length)} characters; a lesson holds at most ${String(LIMITS.sourceLength)}. Divide it into two parts.`);
  }
  const counts: Counts = { line: 0, lineStart: 0, lineBrackets: 0, lineBars: 0, stretchStart: 0, stretchMarks: 0, stretchFirstLine: 1, marks: 0, prefixMarkers: 0, angles: 0, squareBrackets: 0, definitions: 0 };
  for (let start = 0; start <= source.length; ) {
    const newline = source.indexOf('\n', start);
    const end = newline === -1 ? source.length : newline;
    const problem = startLine(source, start, end, counts) ?? scanLine(source, start, end, counts);
    if (problem !== undefined) return problem;
    start = end + 1;
  }
  return undefined;
}

function tooMuch(line: number, column: number, code: LessonProblemCode, reason: string): LessonProblem {
  return { line, column, code, reason };
}

/** Reads the indent and the markers of quotes and lists at the start of a line. */
function startLine(source: string, start: number, end: number, counts: Counts): LessonProblem | undefined {
  counts.line += 1;
  counts.lineStart = start;
  counts.lineBrackets = 0;
  counts.lineBars = 0;
  if (counts.line > LIMITS.lines) return tooMuch(counts.line, 1, 'too-long', `The text has more than ${String(LIMITS.lines)} lines. Divide it into two parts.`);
  if (counts.line - counts.stretchFirstLine >= LIMITS.stretchLines) {
    return tooMuch(counts.line, 1, 'too-long', `More than ${String(LIMITS.stretchLines)} lines follow each other without an empty one. Put empty lines between the paragraphs.`);
  }
  let index = start;
  let columns = 0;
  let markers = 0;
  while (index < end) {
    const code = source.charCodeAt(index);
    const after = code === SPACE || code === TAB ? index + 1 : afterMarker(source, index);
    if (after === -1) break;
    if (after > index + 1 || (code !== SPACE && code !== TAB)) markers += 1;
    else columns += code === TAB ? 4 : 1;
    index = after;
  }
  if (columns > LIMITS.indent && index < end) return tooMuch(counts.line, 1, 'too-deep', `The line begins with more than ${String(LIMITS.indent)} spaces. Begin it further left.`);
  const rule = markers > 0 && isRule(source, start, end);
  if (markers > LIMITS.prefixDepth && !rule) {
    return tooMuch(counts.line, 1, 'too-deep', `Lists or quotes lie more than ${String(LIMITS.prefixDepth)} deep in each other here. Set them apart instead.`);
  }
  if (!rule) counts.prefixMarkers += markers;
  if (counts.prefixMarkers > LIMITS.prefixMarkers) {
    return tooMuch(counts.line, 1, 'too-much', `The text has more than ${String(LIMITS.prefixMarkers)} items of lists and lines of quotes. Divide it into two parts.`);
  }
  if (index >= end && markers === 0) {
    counts.stretchStart = end;
    counts.stretchMarks = 0;
    counts.stretchFirstLine = counts.line + 1;
  }
  return index < end ? definitionAt(source, index, end, counts) : undefined;
}

/** Index after a quote or list marker at `index`, or -1 when none stands there. */
function afterMarker(source: string, index: number): number {
  const code = source.charCodeAt(index);
  if (code === 0x3e) return index + 1;
  if (code === 0x2a || code === 0x2b || code === 0x2d) return isGap(source.charCodeAt(index + 1)) ? index + 1 : -1;
  let end = index;
  while (end - index < 10 && isDigit(source.charCodeAt(end))) end += 1;
  if (end === index || end - index > 9) return -1;
  const mark = source.charCodeAt(end);
  return (mark === 0x2e || mark === 0x29) && isGap(source.charCodeAt(end + 1)) ? end + 1 : -1;
}

/** True when the whole line is one kind of marker and spaces, as in `- - -`: a rule, not lists in lists. */
function isRule(source: string, start: number, end: number): boolean {
  let marker = 0;
  for (let index = start; index < end; index += 1) {
    const code = source.charCodeAt(index);
    if (code === SPACE || code === TAB) continue;
    if (marker === 0) marker = code;
    else if (code !== marker) return false;
  }
  return marker === 0x2a || marker === 0x2d;
}

function isGap(code: number): boolean {
  return code === SPACE || code === TAB || code === NEWLINE || Number.isNaN(code);
}

function isDigit(code: number): boolean {
  return code >= 0x30 && code <= 0x39;
}

function definitionAt(source: string, index: number, end: number, counts: Counts): LessonProblem | undefined {
  if (source.charCodeAt(index) !== 0x5b) return undefined;
  let close = index;
  while (close < end && source.charCodeAt(close) !== 0x5d) close += 1;
  if (source.charCodeAt(close + 1) === 0x3a) counts.definitions += 1;
  if (counts.definitions <= LIMITS.definitions) return undefined;
  return tooMuch(counts.line, index - counts.lineStart + 1, 'too-much', `There are more than ${String(LIMITS.definitions)} link addresses set apart like "[name]: address". Write the addresses into the links.`);
}

/** Counts the characters of one line that cost a parser work, and looks for those that may not stand in a text. */
function scanLine(source: string, start: number, end: number, counts: Counts): LessonProblem | undefined {
  for (let index = start; index < end; index += 1) {
    const code = source.charCodeAt(index);
    const problem = code < 0x7f && code >= SPACE ? countMark(code, counts) : judgeCharacter(source, index, code);
    if (problem !== undefined) return { line: counts.line, column: index - start + 1, ...problem };
    if (index - start >= LIMITS.lineLength) {
      return tooMuch(counts.line, index - start + 1, 'too-long', `The line is longer than ${String(LIMITS.lineLength)} characters. Break it into paragraphs with empty lines between them.`);
    }
    if (index - counts.stretchStart >= LIMITS.stretchLength) {
      return tooMuch(counts.line, index - start + 1, 'too-long', `More than ${String(LIMITS.stretchLength)} characters follow each other without an empty line. Put empty lines between the paragraphs.`);
    }
  }
  return undefined;
}

type Unplaced = Omit<LessonProblem, 'line' | 'column'>;

function judgeCharacter(source: string, index: number, code: number): Unplaced | undefined {
  const kind = characterKind(code);
  if (kind !== 'control' && kind !== 'direction' && !isLoneHalf(source, index, code)) return undefined;
  return { code: 'character', reason: badCharacterReason(code) };
}

function countMark(code: number, counts: Counts): Unplaced | undefined {
  switch (code) {
    case 0x3c: // <
      counts.angles += 1;
      if (counts.angles > LIMITS.angles) return { code: 'too-much', reason: `The text has more than ${String(LIMITS.angles)} tags. Divide it into two parts.` };
      return countStretchMark(counts);
    case 0x7c: // |
      counts.lineBars += 1;
      if (counts.lineBars > LIMITS.lineBars) return { code: 'too-much', reason: `The line has more than ${String(LIMITS.lineBars)} bars. A table has at most ${String(LIMITS.tableColumns)} columns.` };
      return undefined;
    case 0x5b: // [
      counts.squareBrackets += 1;
      if (counts.squareBrackets > LIMITS.squareBrackets) return { code: 'too-much', reason: `The text has more than ${String(LIMITS.squareBrackets)} square brackets. Divide it into two parts.` };
      return countBracket(counts) ?? countStretchMark(counts);
    case 0x5d: // ]
      return countBracket(counts) ?? countStretchMark(counts);
    case 0x28: // (
    case 0x29: // )
    case 0x7b: // {
    case 0x7d: // }
      return countBracket(counts);
    case 0x2a: // *
    case 0x5f: // _
    case 0x60: // `
    case 0x7e: // ~
    case 0x21: // !
    case 0x26: // &
    case 0x5c: // backslash
      return countStretchMark(counts);
    default:
      return undefined;
  }
}

function countBracket(counts: Counts): Unplaced | undefined {
  counts.lineBrackets += 1;
  if (counts.lineBrackets <= LIMITS.lineBrackets) return undefined;
  return { code: 'too-much', reason: `The line has more than ${String(LIMITS.lineBrackets)} brackets. Take out those that are not needed.` };
}

function countStretchMark(counts: Counts): Unplaced | undefined {
  counts.stretchMarks += 1;
  counts.marks += 1;
  if (counts.marks > LIMITS.marks) return { code: 'too-much', reason: `The text has more than ${String(LIMITS.marks)} marks such as *, _, \` or [. Divide it into two parts.` };
  if (counts.stretchMarks <= LIMITS.stretchMarks) return undefined;
  return { code: 'too-much', reason: `More than ${String(LIMITS.stretchMarks)} marks such as *, _, \` or [ follow each other without an empty line. Put empty lines between the paragraphs.` };
}
