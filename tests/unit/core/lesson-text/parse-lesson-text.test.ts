import { describe, expect, test } from 'vitest';
import { parseLessonText, type LessonText } from '#core/lesson-text/parse-lesson-text.ts';
import { LIMITS } from '#core/lesson-text/limits.ts';

function read(source: string): LessonText {
  const result = parseLessonText(source);
  if (!result.ok) throw new Error(result.problems.map((problem) => `${String(problem.line)}:${String(problem.column)} ${problem.reason}`).join('\n'));
  return result;
}

function problemsOf(source: string): string[] {
  const result = parseLessonText(source);
  return result.problems.map((problem) => `${String(problem.line)}:${String(problem.column)} ${problem.reason}`);
}

describe('a lesson as a teacher writes it', () => {
  const lesson = read(`<Video name="dress-the-loom"/>

Wind <Amount of="ends"/>, using <Amount of="warp"/> of warp.

## Wind the warp

<Step id="tie-on">
Tie on at the **first** nail.
</Step>

<Step id="wind">Wind until <Amount of="ends"/> stand on the loom.</Step>

<Figure of="warping" caption="Round every nail."/>

![A warped loom, seen from above](warped-loom "My own loom")

### If it goes wrong

See [tying on](#tie-on), [winding](#wind-the-warp) and [the handbook](/handbook/warping).
`);

  test('tells its headings in order, with names', () => {
    expect(lesson.outline).toEqual([
      { depth: 2, id: 'wind-the-warp', words: 'Wind the warp' },
      { depth: 3, id: 'if-it-goes-wrong', words: 'If it goes wrong' },
    ]);
  });

  test('tells its steps with their words, whether written on one line or on several', () => {
    expect(lesson.steps).toEqual([
      { id: 'tie-on', words: 'Tie on at the first nail.' },
      { id: 'wind', words: 'Wind until … stand on the loom.' },
    ]);
  });

  test('tells what it needs from the plan, the figures and the media of the series, each once', () => {
    expect(lesson.amounts).toEqual(['ends', 'warp']);
    expect(lesson.figures).toEqual(['warping']);
    expect(lesson.media).toEqual([
      { kind: 'video', name: 'dress-the-loom' },
      { kind: 'picture', name: 'warped-loom' },
    ]);
  });

  test('reads a picture in Markdown as a picture component', () => {
    expect(lesson.tree.children).toContainEqual({
      type: 'component',
      name: 'Picture',
      props: { name: 'warped-loom', alt: 'A warped loom, seen from above', caption: 'My own loom' },
      children: [],
    });
  });

  test('links to a step or heading of the lesson by its name', () => {
    const links = JSON.stringify(lesson.tree).match(/"url":"[^"]+"/g);
    expect(links).toEqual(['"url":"#step-tie-on"', '"url":"#h-wind-the-warp"', '"url":"/handbook/warping"']);
  });

  test('survives being kept as JSON', () => {
    expect(JSON.parse(JSON.stringify(lesson.tree))).toEqual(lesson.tree);
  });
});

describe('small things', () => {
  test('an empty text is a lesson without words', () => {
    expect(read('').tree).toEqual({ v: 1, type: 'root', children: [] });
  });

  test('lines that end as forms send them are the same lesson', () => {
    expect(read('## One\r\n\r\nWords.').tree).toEqual(read('## One\n\nWords.').tree);
  });

  test('letters are kept in composed form', () => {
    expect(read('Le\u0301gere').tree.children).toEqual([{ type: 'paragraph', children: [{ type: 'text', value: 'L\u00e9gere' }] }]);
  });

  test('headings of the same words get names of their own', () => {
    expect(read('## Knots\n\n## Knots\n\n## Кисть\n\n## ...').outline.map((entry) => entry.id)).toEqual(['knots', 'knots-2', 'кисть', 'section']);
  });

  test('an amount alone on its line is a paragraph', () => {
    expect(read('<Amount of="warp"/>').tree.children).toEqual([{ type: 'paragraph', children: [{ type: 'component', name: 'Amount', props: { of: 'warp' }, children: [] }] }]);
  });

  test('a tip within a step', () => {
    expect(read('<Step id="a">\nTie on.\n\n<Tip>No knot yet.</Tip>\n</Step>').steps).toEqual([{ id: 'a', words: 'Tie on. No knot yet.' }]);
    expect(read('<Step id="a"><Tip>No knot yet.</Tip></Step>').tree.children).toMatchObject([{ name: 'Step', children: [{ name: 'Tip', children: [{ type: 'paragraph' }] }] }]);
  });

  test('a table keeps its columns', () => {
    expect(read('| Yarn | Amount |\n| :-- | --: |\n| Foam | <Amount of="yarn.foam"/> |').tree.children[0]).toMatchObject({
      type: 'table',
      align: ['left', 'right'],
      children: [{ children: [{ children: [{ value: 'Yarn' }] }, { children: [{ value: 'Amount' }] }] }, { children: [{}, { children: [{ props: { of: 'yarn.foam' } }] }] }],
    });
  });

  test('links by name lead to the address set apart, the first of that name', () => {
    expect(JSON.stringify(read('[one][r] and [r]\n\n[r]: https://a.example/x\n[r]: /second').tree).match(/"url":"[^"]+"/g)).toEqual(['"url":"https://a.example/x"', '"url":"https://a.example/x"']);
  });

  test('a smaller-than sign between words is only a sign', () => {
    expect(read('If 3 < 4 it fits.').tree.children).toEqual([{ type: 'paragraph', children: [{ type: 'text', value: 'If 3 < 4 it fits.' }] }]);
  });

  test('characters that cannot be seen are allowed and shown', () => {
    expect(read('Wind\n38\u200bends').warnings).toEqual([
      { line: 2, column: 3, endColumn: 4, code: 'unseen-character', reason: 'Here stands a character that cannot be seen (U+200B). Take it out if you did not mean it.' },
    ]);
  });

  test('a link within the lesson that leads nowhere is told', () => {
    expect(read('[there](#nowhere)').warnings.map((warning) => warning.code)).toEqual(['anchor']);
  });
});

describe('what a writer is told', () => {
  test('every mistake, in the order of the text, with its place', () => {
    expect(problemsOf('# Title\n\nSee [it](http://a.example).\n\n<Caution>\nMind.\n</Caution>\n\n<Tpi>x</Tpi>')).toEqual([
      '1:1 The title of the lesson is its only heading with one #. Write ## here.',
      '3:5 The address begins with http://. Write https://, so that the way there is safe.',
      '5:1 <Caution> needs title="…": what the caution is about. Like this: <Caution title="Mind the nails">Push a cork on the corner nails.</Caution>.',
      '9:1 There is no <Tpi>. There are <Step>, <Caution>, <Tip>, <Amount>, <Figure>, <Picture> and <Video>, written exactly so.',
    ]);
  });

  test('not more at once than somebody can mend', () => {
    expect(problemsOf('# A\n\n'.repeat(100))).toHaveLength(LIMITS.problems);
  });

  test.each([
    ['a step in a list', '- <Step id="a">Tie on.</Step>', /^1:3 <Step> stands on its own, not in a list/],
    ['a step in a step', '<Step id="a">\n<Step id="b">Tie on.</Step>\n</Step>', /^2:1 <Step> cannot stand inside <Step>\. Close that first\.$/],
    ['two steps of one name', '<Step id="a">One.</Step>\n\n<Step id="a">Two.</Step>', /^3:1 Two steps are called "a"/],
    ['an empty step', '<Step id="a"></Step>', /^1:1 <Step> is empty/],
    ['a caution within a sentence', 'Take <Caution title="Nails">care</Caution> here.', /^1:6 <Caution> cannot stand within a sentence/],
    ['an amount that holds words', '<Amount of="warp">62 m</Amount>', /^1:1 <Amount> holds nothing and closes itself\. Write it as <Amount of="warp"\/>\.$/],
    ['an amount left open', 'Take <Amount of="warp"> of it.', /<Amount> holds nothing and closes itself/],
    ['an amount in a heading', '## Wind <Amount of="ends"/>', /^1:9 <Amount> cannot stand in a heading/],
    ['an amount in a link', '[take <Amount of="warp"/>](/a)', /^1:7 <Amount> cannot stand in a link/],
    ['an unknown figure', '<Figure of="rug"/>', /^1:9 "of" of <Figure> does not work\. Choose one of these: warping, /],
    ['an amount no plan has', '<Amount of="warpp"/>', /^1:9 "of" of <Amount> does not work\. No plan has an amount of that name/],
    ['an amount of a yarn without its role', '<Amount of="yarn"/>', /No plan has an amount of that name/],
    ['an amount of an inherited name', '<Amount of="constructor"/>', /No plan has an amount of that name/],
    ['a heading in a component', '<Tip title="x">\n## Words\n</Tip>', /^2:1 A heading stands at the left edge/],
    ['a heading of five signs', '##### Small', /^1:1 Headings go from ## to ####/],
    ['a heading without words', '##', /^1:1 The heading has no words/],
    ['a picture within a sentence', 'See ![a loom](loom) here.', /^1:5 A picture stands on a line of its own/],
    ['a picture by its address', '![a loom](https://a.example/loom.png)', /^1:1 A picture is named as you named it in this series/],
    ['a picture by an address set apart', '![a loom][l]\n\n[l]: /loom', /^1:1 A picture stands on a line of its own/],
    ['a link without words', '[](/a)', /^1:1 The link has no words/],
    ['a long address', `[a](https://a.example/${'x'.repeat(500)})`, /^1:1 The address is longer than 500 characters/],
    ['words where a value belongs', '<Tip title>x</Tip>', /^1:6 The value of "title" stands in straight quotes/],
    ['a curly quote', '<Tip title=“x”>x</Tip>', /^1:12 Values stand in straight quotes/],
    ['a long title', `<Tip title="${'x'.repeat(121)}">x</Tip>`, /^1:6 "title" of <Tip> does not work\. At most 120 characters fit here; these are 121\.$/],
    ['an address in angle brackets', 'See <https://a.example>.', /Write it as a link: \[what it is\]\(https:/],
    ['a brace left open', 'Take {38 ends', /A curly brace opens here or above and is not closed/],
    ['a smaller-than sign before a number', 'If <3 it fits.', /^1:5 After < comes the name of a component.*Write \\< if you mean the sign itself\.$/],
    ['a tag that tangles with a heading', '<script>| a |\n| - |\n---', /./],
    ['a component across a list', '- <Tip title="x">\n\nwords\n\n</Tip>', /is opened but not closed where it should be/],
  ])('%s', (_what, source, reason) => {
    expect(problemsOf(source)[0]).toMatch(reason);
  });
});

describe('limits', () => {
  const words = (count: number): string => 'word '.repeat(count).trim();

  test.each([
    ['as many headings as may be', '## A\n\n'.repeat(LIMITS.headings), '## A\n\n'.repeat(LIMITS.headings + 1)],
    ['as many tables', '| a |\n| - |\n\n'.repeat(LIMITS.tables), '| a |\n| - |\n\n'.repeat(LIMITS.tables + 1)],
    ['as many rows', `| a |\n| - |\n${'| b |\n'.repeat(LIMITS.tableRows - 1)}`, `| a |\n| - |\n${'| b |\n'.repeat(LIMITS.tableRows)}`],
    ['as many columns', `${'|a'.repeat(LIMITS.tableColumns)}|\n${'|-'.repeat(LIMITS.tableColumns)}|`, `${'|a'.repeat(LIMITS.tableColumns + 1)}|\n${'|-'.repeat(LIMITS.tableColumns + 1)}|`],
    ['as many steps', Array.from({ length: LIMITS.steps }, (_, n) => `<Step id="s${String(n)}">a</Step>`).join('\n\n'), Array.from({ length: LIMITS.steps + 1 }, (_, n) => `<Step id="s${String(n)}">a</Step>`).join('\n\n')],
    ['as long a line', 'x'.repeat(LIMITS.lineLength - 1), 'x'.repeat(LIMITS.lineLength + 1)],
    ['as deep a quote', `${'>'.repeat(LIMITS.prefixDepth)} a`, `${'>'.repeat(LIMITS.prefixDepth + 1)} a`],
    ['as many brackets in a line', words(2) + '('.repeat(LIMITS.lineBrackets), words(2) + '('.repeat(LIMITS.lineBrackets + 1)],
    ['as many addresses set apart', Array.from({ length: LIMITS.definitions }, (_, n) => `[r${String(n)}]: /a`).join('\n'), Array.from({ length: LIMITS.definitions + 1 }, (_, n) => `[r${String(n)}]: /a`).join('\n')],
  ])('%s is read, one more is refused', (_what, most, more) => {
    expect(parseLessonText(most)).toMatchObject({ ok: true });
    const refused = parseLessonText(more);
    expect(refused.ok).toBe(false);
    expect(refused.problems[0]?.code).toMatch(/^too-/);
  });

  test('two hundred thousand characters of prose are read', () => {
    const prose = `${words(100)}\n\n`.repeat(396);
    expect(prose.length).toBeGreaterThan(198_000);
    expect(parseLessonText(prose)).toMatchObject({ ok: true });
    expect(parseLessonText(prose + words(1_000))).toMatchObject({ ok: false, problems: [{ code: 'too-long' }] });
  });

  test('rules of many signs are rules, not lists in lists', () => {
    expect(read('- - - - - - - - - - - - - - - -').tree.children).toEqual([{ type: 'thematicBreak' }]);
  });
});
