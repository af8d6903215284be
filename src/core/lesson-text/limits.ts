// How much one lesson may hold. The numbers are far above what a lesson for people needs, and low enough that the
// slowest text within them is read in a fraction of a second.

export const LIMITS = {
  /** Length of the whole source in UTF-16 code units. */
  sourceLength: 200_000,
  lineLength: 10_000,
  /** Length of a stretch without an empty line. The parser's work can grow with its square. */
  stretchLength: 10_000,
  stretchLines: 400,
  /** Characters that may begin or end emphasis, code, a link or a list, in one such stretch. */
  stretchMarks: 800,
  /** The same, in the whole text. */
  marks: 10_000,
  lines: 5_000,
  /** Markers of quotes and lists at the beginnings of all lines. */
  prefixMarkers: 1_500,
  /** Brackets of any kind in one line. */
  lineBrackets: 500,
  /** Opening square brackets in the whole text. */
  squareBrackets: 4_000,
  /** Bars in one line; a table cannot have more columns than this allows. */
  lineBars: 60,
  /** Markers of quotes and lists before the words of one line. */
  prefixDepth: 12,
  /** Spaces before the words of one line, a tab counted as four. */
  indent: 100,
  /** Opening angle brackets in the whole text. */
  angles: 2_000,
  nodes: 5_000,
  depth: 24,
  componentDepth: 6,
  headings: 200,
  tables: 50,
  tableColumns: 20,
  tableRows: 200,
  definitions: 200,
  steps: 100,
  urlLength: 500,
  titleLength: 200,
  /** Mistakes told at once; a longer list helps nobody. */
  problems: 20,
} as const;
