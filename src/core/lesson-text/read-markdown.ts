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
import { explainSyntaxError } from './explain-syntax.ts';
import type { LessonProblem } from './problem.ts';

const extensions = [mdxJsx(), mdxExpression(), mdxMd(), gfmTable(), gfmStrikethrough({ singleTilde: false })];
const mdastExtensions = [mdxJsxFromMarkdown(), mdxExpressionFromMarkdown(), gfmTableFromMarkdown(), gfmStrikethroughFromMarkdown()];

/** The Markdown tree of a text that passed `preScan`, or what the parser stumbled over. */
export function readMarkdown(source: string): { ok: true; root: Root } | { ok: false; problem: LessonProblem } {
  try {
    return { ok: true, root: fromMarkdown(source, { extensions, mdastExtensions }) };
  } catch (error) {
    return { ok: false, problem: explainSyntaxError(error, source) };
  }
}
