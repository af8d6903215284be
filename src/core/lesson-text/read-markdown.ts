// From characters to a Markdown tree. The parts are chosen one by one: CommonMark, tables, strikethrough, and MDX's
// tags and braces. Braces are read only to be refused, so there is no JavaScript parser behind them: it would try
// again at each closing brace, a second for four thousand of them. Nothing here turns text into code.
import { fromMarkdown } from 'mdast-util-from-markdown';
import { gfmStrikethroughFromMarkdown } from 'mdast-util-gfm-strikethrough';
import { gfmTableFromMarkdown } from 'mdast-util-gfm-table';
import { mdxExpressionFromMarkdown } from 'mdast-util-mdx-expression';
import { mdxJsxFromMarkdown } from 'mdast-util-mdx-jsx';
import { gfmStrikethrough } from 'micromark-extension-gfm-strikethrough';
import { gfmTable } from 'micromark-extension-gfm-table';
import { mdxExpression } from 'micromark-extension-mdx-expression';
import { mdxJsx } from 'micromark-extension-mdx-jsx';
import { mdxMd } from 'micromark-extension-mdx-md';
import type { Root } from 'mdast';
import { explainSyntaxError, isErrorOfSigns } from './explain-syntax.ts';
import type { LessonProblem } from './problem.ts';

const extensions = [mdxJsx(), mdxExpression(), mdxMd(), gfmTable(), gfmStrikethrough({ singleTilde: false })];
const mdastExtensions = [mdxJsxFromMarkdown(), mdxExpressionFromMarkdown(), gfmTableFromMarkdown(), gfmStrikethroughFromMarkdown()];

/** A Markdown tree, or what the parser stumbled over. */
export type ReadText =
  | { ok: true; root: Root }
  /** `isOfSigns`: a tag or brace cannot be read as it is written, whatever comes after it. */
  | { ok: false; problem: LessonProblem; isOfSigns: boolean };

/** Reads a text that passed `preScan`, all at once. */
export function readMarkdown(source: string): ReadText {
  try {
    return { ok: true, root: fromMarkdown(source, { extensions, mdastExtensions }) };
  } catch (error) {
    return { ok: false, problem: explainSyntaxError(error, source), isOfSigns: isErrorOfSigns(error) };
  }
}
