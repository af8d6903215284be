// Texts by which somebody might try to get more into a lesson than words: script in a student's browser, code on the
// server, addresses that run, files that are not theirs, work that never ends.
import { describe, expect, test } from 'vitest';
import { parseLessonText } from '#core/lesson-text/parse-lesson-text.ts';
import { preScan } from '#core/lesson-text/pre-scan.ts';
import type { LessonProblemCode } from '#core/lesson-text/problem.ts';

import { leastTime } from './least-time.ts';

type Row = [number: number, what: string, source: string, code: LessonProblemCode];

const tag = (attributes: string): string => `<Caution ${attributes}>\nMind the nails.\n</Caution>`;

const refused: Row[] = [
  [1, 'an import', 'import x from "fs"', 'code'],
  [2, 'an export', 'export const a = 1', 'code'],
  [3, 'an expression on a line of its own', '{1+1}', 'code'],
  [4, 'an expression in a sentence', 'text {alert(1)}', 'code'],
  [5, 'a reach for the surroundings', '{process.env.KEY}', 'code'],
  [6, 'a remark in braces', '{/* comment */}', 'code'],
  [7, 'spread attributes', tag('{...p}'), 'code'],
  [8, 'an expression as a value', tag('title={f()}'), 'attribute'],
  [9, 'an event handler', tag('title="Nails" onClick="x"'), 'attribute'],
  [10, 'a value in backticks', tag('title=`Nails`'), 'tag'],
  [11, 'a script', '<script>alert(1)</script>', 'component'],
  [12, 'an HTML picture with a handler', '<img src=x onerror=alert(1)>', 'tag'],
  [13, 'a frame', '<iframe src="https://e"/>', 'component'],
  [14, 'a style sheet', '<style>{`*{}`}</style>', 'component'],
  [15, 'a drawing with a link that runs', '<svg><a href="javascript:1"/></svg>', 'component'],
  [16, 'HTML set from within', '<div dangerouslySetInnerHTML={{__html: "x"}}/>', 'component'],
  [17, 'a member of an object', '<React.Fragment/>', 'component'],
  [18, 'an inherited name', '<constructor/>', 'component'],
  [18, 'another inherited name', '<toString/>', 'component'],
  [19, 'the name of the prototype', '<__proto__/>', 'component'],
  [20, 'the prototype as an attribute', tag('title="Nails" __proto__="x"'), 'attribute'],
  [20, 'an inherited name as an attribute', tag('title="Nails" constructor="x"'), 'attribute'],
  [21, 'an empty tag', '<></>', 'component'],
  [22, 'a tag of another vocabulary', '<a:b/>', 'component'],
  [23, 'a remark of HTML', '<!-- c -->', 'tag'],
  [23, 'a document type', '<!DOCTYPE html>', 'tag'],
  [24, 'a name with a Cyrillic letter in it', '<C\u0430ution title="Nails">\nWords.\n</C\u0430ution>', 'component'],
  [25, 'an address that runs', '[a](javascript:alert(1))', 'address'],
  [25, 'the same in mixed case', '[a](JaVaScRiPt:alert(1))', 'address'],
  [26, 'an address that runs, one letter as a number', '[a](java&#115;cript:alert(1))', 'address'],
  [27, 'an address that runs, spelled with names', '[a](&#x6A;avascript&colon;alert(1))', 'address'],
  [28, 'an address that runs, with a tab in it', '[a](<java\tscript:alert(1)>)', 'address'],
  [29, 'a page within an address', '[a](data:text/html;base64,PHNjcmlwdD4=)', 'address'],
  [30, 'a drawing within an address', '![a](data:image/svg+xml,<svg onload=1>)', 'tag'],
  [31, 'another address that runs', '[a](vbscript:x)', 'address'],
  [31, 'a file', '[a](file:///etc/passwd)', 'address'],
  [32, 'another host without a scheme', '[a](//evil.example)', 'address'],
  [32, 'another host by backslashes', '[a](\\\\\\\\evil.example)', 'address'],
  [32, 'another host by slash and backslash', '[a](/\\\\evil.example)', 'address'],
  [33, 'an address that runs, set apart', '[a][r]\n\n[r]: javascript:alert(1)', 'address'],
  [33, 'an address that runs, set apart and not used', 'Words.\n\n[r]: javascript:alert(1)', 'address'],
  [34, 'an address that runs, its first letter in per cent', '[a](%6aavascript:alert(1))', 'address'],
  [35, 'a path instead of a name', '<Video name="../../etc/passwd"/>', 'attribute'],
  [36, 'a quote that wants out of its attribute', '<Video name="x&quot; onload=alert(1)"/>', 'attribute'],
  [37, 'a number where a name belongs', '<Step id="1E9">Words.</Step>', 'attribute'],
  [38, 'an attribute twice', tag('title="Nails" title="Knives"'), 'attribute'],
  [39, 'a tag that is not closed', '<Caution title="Nails">\n\nWords.', 'tag'],
  [39, 'a closing tag alone', '</Caution>', 'tag'],
  [40, 'a script inside a component', '<Caution title="Nails">\n<script/>\n</Caution>', 'component'],
  [41, 'a mark that turns the writing direction', 'Wind \u202E38 ends', 'character'],
  [41, 'a NUL', 'Wind \u0000 38 ends', 'character'],
  [41, 'a mark that turns the writing direction, as a number', 'Wind &#x202E;38 ends', 'character'],
  [42, 'a bare address in angle brackets', '<https://ok.test>', 'tag'],
  [43, 'a formula with an address', '$\\href{javascript:alert(1)}{x}$', 'code'],
];

describe('is refused', () => {
  test.each(refused)('%i: %s', (_number, _what, source, code) => {
    const result = parseLessonText(source);
    expect(result.ok).toBe(false);
    const problem = result.problems[0];
    expect(problem).toMatchObject({ code });
    expect(problem?.line).toBeGreaterThanOrEqual(1);
    expect(problem?.column).toBeGreaterThanOrEqual(1);
    expect(problem?.reason).toMatch(/^[A-Z"<].*\.$/);
  });

  const bombs: [string, string][] = [
    ['twenty thousand braces', '{'.repeat(20_000)],
    ['twenty thousand brackets', '['.repeat(20_000)],
    ['two thousand tags in each other', `${'<Tip>'.repeat(2_000)}x${'</Tip>'.repeat(2_000)}`],
    ['two thousand tags in each other, each on a line', `${'<Tip>\n'.repeat(2_000)}x\n${'</Tip>\n'.repeat(2_000)}`],
    ['five thousand references', '[a][r] '.repeat(5_000)],
    ['five thousand references, each on a line', '[a][r]\n\n'.repeat(5_000)],
    ['five thousand addresses set apart', Array.from({ length: 5_000 }, (_, n) => `[r${String(n)}]: /a`).join('\n\n')],
    ['a list two hundred deep', Array.from({ length: 200 }, (_, n) => `${'  '.repeat(n)}- a`).join('\n')],
    ['backticks without end', Array.from({ length: 700 }, (_, n) => '`'.repeat(n + 1)).join(' ')],
    ['ten thousand quotes in each other', '>'.repeat(9_999)],
  ];
  test.each(bombs)('44: %s, without work', (_what, source) => {
    const problem = preScan(source);
    expect(problem?.code).toMatch(/^too-/);
    expect(leastTime(() => preScan(source), 5)).toBeLessThan(5);
    expect(parseLessonText(source)).toEqual({ ok: false, problems: [problem] });
  });
});

describe('is taken as words', () => {
  const wordsOf = (source: string): unknown => {
    const result = parseLessonText(source);
    expect(result.problems).toEqual([]);
    return result.ok ? result.tree.children : undefined;
  };

  test('45: program text in a block of code', () => {
    expect(wordsOf('```js\nimport x from "fs"\n{1}\n```')).toEqual([{ type: 'code', value: 'import x from "fs"\n{1}' }]);
  });

  test('46: braces in code and behind a backslash, and tags as entities', () => {
    expect(wordsOf('`{1}` and \\{x\\} and &lt;script&gt;')).toEqual([
      {
        type: 'paragraph',
        children: [
          { type: 'inlineCode', value: '{1}' },
          { type: 'text', value: ' and {x} and <script>' },
        ],
      },
    ]);
  });

  test('47: what looks like settings at the head of a file is a rule and a heading, and nothing reads it', () => {
    const result = parseLessonText('---\ntitle: !!js/function "x"\n---\n\nWords.');
    expect(result.ok && result.tree.children.map((node) => node.type)).toEqual(['thematicBreak', 'heading', 'paragraph']);
  });

  test('48: Markdown inside a component', () => {
    expect(wordsOf('<Caution title="Mind the nails">\nPush **corks** on them.\n</Caution>')).toEqual([
      {
        type: 'component',
        name: 'Caution',
        props: { title: 'Mind the nails' },
        children: [
          {
            type: 'paragraph',
            children: [
              { type: 'text', value: 'Push ' },
              { type: 'strong', children: [{ type: 'text', value: 'corks' }] },
              { type: 'text', value: ' on them.' },
            ],
          },
        ],
      },
    ]);
  });
});
