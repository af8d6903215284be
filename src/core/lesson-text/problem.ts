// What is wrong with a lesson's text, said so that its writer can put it right without help.

export type LessonProblemCode =
  | 'too-long'
  | 'too-much'
  | 'too-deep'
  | 'too-slow'
  | 'character'
  | 'code'
  | 'tag'
  | 'component'
  | 'place'
  | 'attribute'
  | 'address'
  | 'heading'
  | 'picture'
  | 'step'
  | 'markup'
  | 'anchor'
  | 'unseen-character';

/** One mistake. Lines and columns count from 1; columns in UTF-16 code units, as editors count them. */
export interface LessonProblem {
  line: number;
  column: number;
  /** Column after the last character concerned, when that lies in the same line. */
  endColumn?: number;
  code: LessonProblemCode;
  /** What is wrong and what to do instead, one or two plain sentences. */
  reason: string;
}

interface Place {
  start: { line: number; column: number };
  end: { line: number; column: number };
}

/** A problem at the place of a node, or at the start of the text when the place is unknown. */
export function problemAt(place: Place | undefined, code: LessonProblemCode, reason: string): LessonProblem {
  if (place === undefined) return { line: 1, column: 1, code, reason };
  const { start, end } = place;
  const sameLine = start.line === end.line && end.column > start.column;
  return { line: start.line, column: start.column, ...(sameLine ? { endColumn: end.column } : {}), code, reason };
}
