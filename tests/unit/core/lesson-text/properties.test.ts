// What holds for every text, tried on texts nobody thought of.
import fc from 'fast-check';
import remarkMdx from 'remark-mdx';
import remarkParse from 'remark-parse';
import { unified } from 'unified';
import { describe, test } from 'vitest';
import { parseLessonText } from '#core/lesson-text/parse-lesson-text.ts';
import { plainWords } from '#core/lesson-text/plain-text.ts';
import { treeIsValid } from '#core/lesson-text/tree-is-valid.ts';

const PIECES = [
  'import x from "fs"', 'export const a = 1', '{1+1}', '{', '}', '<', '>', '</', '/>', '<Step id="a">', '</Step>', '<Tip>', '</Tip>', '<Caution title="x">', '</Caution>',
  '<Amount of="warp"/>', '<Figure of="tabby"/>', '<Picture name="a" alt=""/>', '<Video name="a"/>', '<script>', '</script>', '<a:b/>', '<a.b/>', '<></>', '<!--', '-->', '<constructor/>',
  ' onClick="x"', ' {...p}', '="', '"', '\'', '`', '```', '~~', '**', '*', '_', '# ', '## ', '- ', '1. ', '> ', '| a |\n| - |\n', '---', '\n', '\n\n', '  ', '    ', '\t', '\\',
  '[a](', '[a][r]', '[r]: ', ')', ']', '![a](b)', 'javascript:alert(1)', 'java&#115;cript:', '&#x202E;', '&lt;', 'https://a.example', '//evil', 'data:text/html,', '#a', 'words', 'ä', '🧶', '\u202e', '\u0000', '\u200b',
];

const spliced = fc.array(fc.constantFrom(...PIECES), { maxLength: 40 }).map((pieces) => pieces.join(''));
const anyText = fc.oneof(spliced, fc.string({ unit: 'binary', maxLength: 200 }));

describe('whatever is typed', { timeout: 60_000 }, () => {
  test('is either refused with a reason and a place in the text, or becomes a tree that is valid', () => {
    fc.assert(
      fc.property(anyText, (source) => {
        const result = parseLessonText(source);
        if (result.ok) return treeIsValid(JSON.parse(JSON.stringify(result.tree)));
        const lines = source.replace(/\r\n?/g, '\n').split('\n').length;
        return result.problems.length > 0 && result.problems.every((problem) => problem.line >= 1 && problem.line <= lines && problem.column >= 1 && problem.reason.endsWith('.'));
      }),
      { numRuns: 800 },
    );
  });

  test('never leaves an address that runs or a name that is not ours in the tree', () => {
    fc.assert(
      fc.property(spliced, (source) => {
        const result = parseLessonText(source);
        if (!result.ok) return true;
        const json = JSON.stringify(result.tree);
        return !/"url":"(?!https:\/\/|\/(?!\/)|#|mailto:)/.test(json) && !/"type":"(?:html|mdx)/.test(json) && !/"name":"(?:script|constructor|a:b)/.test(json);
      }),
      { numRuns: 800 },
    );
  });

  test('that is read, MDX reads too, and sees the same words', () => {
    const mdx = unified().use(remarkParse).use(remarkMdx);
    fc.assert(
      fc.property(spliced, (source) => {
        const result = parseLessonText(source);
        // Tables and strikethrough are no part of plain MDX.
        if (!result.ok || /\||~/.test(source)) return true;
        const words: string[] = [];
        const waiting: { type: string; value?: string; children?: unknown[] }[] = [mdx.parse(source)];
        for (let node = waiting.pop(); node !== undefined; node = waiting.pop()) {
          if (node.type.startsWith('mdx') && !node.type.startsWith('mdxJsx')) return false;
          if (node.type === 'text') words.push(node.value ?? '');
          waiting.push(...((node.children ?? []) as typeof waiting).slice().reverse());
        }
        const bare = (text: string): string => text.normalize('NFC').replace(/\s+/g, '');
        return bare(words.join('')) === bare(plainWords(result.tree.children, () => ''));
      }),
      { numRuns: 600 },
    );
  });
});
