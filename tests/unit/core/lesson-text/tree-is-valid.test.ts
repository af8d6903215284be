import { describe, expect, test } from 'vitest';
import { parseLessonText } from '#core/lesson-text/parse-lesson-text.ts';
import { treeIsValid } from '#core/lesson-text/tree-is-valid.ts';

const everything = `## Wind

Wind **38** *ends*, ~~not 40~~, \`abc\` and [here](https://a.example "There")\\
or [there](#wind).

<Step id="tie-on">
Tie on at <Amount of="nails"/>.

<Tip title="No knot">
Not yet.
</Tip>
</Step>

<Caution title="Nails">
Mind them.
</Caution>

<Figure of="warping" caption="Round."/>

<Picture name="loom" alt=""/>

<Video name="dress-the-loom"/>

> Quoted.

1. One

   More.
2. Two

---

| a | b |
| - | -: |
| c | d |

\`\`\`
code
\`\`\`
`;

const root = (...children: unknown[]): unknown => ({ v: 1, type: 'root', children });
const paragraph = (...children: unknown[]): unknown => ({ type: 'paragraph', children });
const words = { type: 'text', value: 'Wind.' };
const link = (extra: object): unknown => root(paragraph({ type: 'link', url: '/a', external: false, children: [words], ...extra }));
const component = (extra: object): unknown => ({ type: 'component', name: 'Tip', props: {}, children: [paragraph(words)], ...extra });

describe('a kept tree', () => {
  test('is valid as the reader made it, also after a turn through JSON', () => {
    const result = parseLessonText(everything);
    expect(result.problems).toEqual([]);
    expect(result.ok && treeIsValid(JSON.parse(JSON.stringify(result.tree)))).toBe(true);
  });

  test('is valid when put together by hand as the reader would', () => {
    expect([root(), root(paragraph(words)), link({}), root(component({}))].map(treeIsValid)).toEqual([true, true, true, true]);
  });

  test.each<[string, unknown]>([
    ['nothing', undefined],
    ['a word', 'root'],
    ['a list', []],
    ['another version', { v: 2, type: 'root', children: [] }],
    ['a root without children', { v: 1, type: 'root' }],
    ['a root with more', { v: 1, type: 'root', children: [], html: '<b>' }],
    ['raw HTML', root({ type: 'html', value: '<script>' })],
    ['a node that runs', root({ type: 'mdxFlowExpression', value: '1+1' })],
    ['words where a block belongs', root(words)],
    ['a block where words belong', root(paragraph(paragraph(words)))],
    ['words that are no text', root(paragraph({ type: 'text', value: { toString: 1 } }))],
    ['words with a hidden mark', root(paragraph({ type: 'text', value: '\u202E' }))],
    ['a node with more', root(paragraph({ ...words, style: 'x' }))],
    ['an address that runs', link({ url: 'javascript:alert(1)', external: true })],
    ['an address elsewhere that says it is here', link({ url: 'https://a.example', external: false })],
    ['a title that is no text', link({ title: 3 })],
    ['an unknown component', root(component({ name: 'script' }))],
    ['an inherited name', root(component({ name: 'constructor' }))],
    ['an unknown attribute', root(component({ props: { onclick: 'x' } }))],
    ['an attribute that is no text', root(component({ props: { title: ['x'] } }))],
    ['a component without what it needs', root(component({ name: 'Caution' }))],
    ['a value that breaks the rules', root({ type: 'component', name: 'Video', props: { name: '../x' }, children: [] })],
    ['a video that holds words', root({ type: 'component', name: 'Video', props: { name: 'x' }, children: [paragraph(words)] })],
    ['a step in a quote', root({ type: 'blockquote', children: [component({ name: 'Step', props: { id: 'a' } })] })],
    ['a tip in a caution', root(component({ name: 'Caution', props: { title: 'a' }, children: [component({})] }))],
    ['an amount in a heading', root({ type: 'heading', depth: 2, id: 'a', children: [{ type: 'component', name: 'Amount', props: { of: 'warp' }, children: [] }] })],
    ['a heading of the first order', root({ type: 'heading', depth: 1, id: 'a', children: [words] })],
    ['a heading whose name leaves its attribute', root({ type: 'heading', depth: 2, id: 'a" onclick="x', children: [words] })],
    ['a heading in a quote', root({ type: 'blockquote', children: [{ type: 'heading', depth: 2, id: 'a', children: [words] }] })],
    ['a list of paragraphs', root({ type: 'list', ordered: false, start: 1, loose: false, children: [paragraph(words)] })],
    ['an unknown alignment', root({ type: 'table', align: ['justify'], children: [] })],
    ['more nodes than a lesson can have', root(...Array.from({ length: 20_000 }, () => paragraph()))],
  ])('is not valid with %s', (_what, tree) => {
    expect(treeIsValid(tree)).toBe(false);
  });

  test('a tree a hundred thousand deep is refused without exhausting anything', () => {
    let node: unknown = paragraph(words);
    for (let depth = 0; depth < 100_000; depth += 1) node = { type: 'blockquote', children: [node] };
    expect(treeIsValid(root(node))).toBe(false);
  });
});
