import react from '@astrojs/react/server.js';
import { experimental_AstroContainer as AstroContainer } from 'astro/container';
import { JSDOM } from 'jsdom';
import { beforeAll, describe, expect, test } from 'vitest';
import LessonTree from '#components/lesson/LessonTree.astro';
import type { LessonScene, SceneAmount } from '#components/lesson/scene.ts';
import { parseLessonText } from '#core/lesson-text/parse-lesson-text.ts';
import { HARMLESS } from './harmless.ts';

const warp: SceneAmount = {
  label: 'Warp',
  parts: [{ kind: 'number', text: '19' }, { kind: 'text', text: '\u2009' }, { kind: 'fraction', text: '11/16' }, { kind: 'text', text: '\u00a0' }, { kind: 'unit', text: 'yd' }],
  how: { formula: 'ends × loom height', inputs: [{ name: 'Ends', parts: [{ kind: 'number', text: '66' }] }], source: 'Counted from your plan.', trust: 'formula' },
};
const bare: LessonScene = { amounts: {}, figures: {}, pictures: {}, videos: {}, ticked: new Set() };

let container: AstroContainer;
beforeAll(async () => {
  container = await AstroContainer.create();
  container.addServerRenderer({ name: '@astrojs/react', renderer: react });
  container.addClientRenderer({ name: '@astrojs/react', entrypoint: '@astrojs/react/client.js' });
});

async function drawTree(tree: unknown, scene: Partial<LessonScene> = {}): Promise<Document> {
  const html = await container.renderToString(LessonTree, { props: { tree, scene: { ...bare, ...scene } } });
  return new JSDOM(html).window.document;
}

function draw(source: string, scene: Partial<LessonScene> = {}): Promise<Document> {
  const read = parseLessonText(source);
  if (!read.ok) throw new Error(read.problems[0]?.reason);
  return drawTree(JSON.parse(JSON.stringify(read.tree)), scene);
}

const textOf = (node: Element | null | undefined): string => (node?.textContent ?? '').replace(/\s+/g, ' ').trim();

describe('the words', () => {
  test('keep their spaces, marks and signs', async () => {
    const page = await draw('Wind **38** *ends*, ~~40~~ `abc`; &lt;script&gt; & "so"\\\non.');
    expect(page.querySelector('p')?.innerHTML).toBe('Wind <strong>38</strong> <em>ends</em>, <del>40</del> <code>abc</code>; &lt;script&gt; &amp; "so"<br>on.');
  });

  test('a heading can be linked to', async () => {
    const page = await draw('## Wind the warp\n\n[There](#wind-the-warp)');
    const target = page.querySelector('a')?.getAttribute('href')?.slice(1) ?? '';
    expect(textOf(page.getElementById(target))).toBe('Wind the warp');
  });

  test('a link elsewhere does not tell where it came from, one within the house is plain', async () => {
    const page = await draw('[there](https://a.example "Title") and [here](/handbook)');
    expect([...page.querySelectorAll('a')].map((link) => [link.getAttribute('rel'), link.getAttribute('referrerpolicy'), link.getAttribute('title')])).toEqual([['noopener nofollow ugc', 'no-referrer', 'Title'], [null, null, null]]);
  });

  test('a tight list holds words, a loose one paragraphs, and a list may begin anywhere', async () => {
    const page = await draw('3. a\n4. b\n\nwords\n\n- a\n\n- b');
    expect(page.querySelector('ol')?.outerHTML).toBe('<ol start="3"><li>a</li><li>b</li></ol>');
    expect(page.querySelectorAll('ul > li > p')).toHaveLength(2);
  });

  test('a table scrolls in a region that has a name and takes focus', async () => {
    const page = await draw('| Yarn | Much |\n| - | -: |\n| Foam | 3 |');
    const region = page.querySelector('[role=region]');
    expect([region?.getAttribute('aria-label'), region?.getAttribute('tabindex')]).toEqual(['Table: Yarn, Much', '0']);
    expect(region?.querySelector('td:last-child')?.className).toBe('num');
  });
});

describe('amounts', () => {
  test('open how they were reckoned, one note for each amount however often it stands', async () => {
    const page = await draw('Take <Amount of="warp"/>, all <Amount of="warp"/>.', { amounts: { warp } });
    const buttons = [...page.querySelectorAll('button.amt')];
    expect(buttons.map(textOf)).toEqual(['19 11/16 yd', '19 11/16 yd']);
    expect(textOf(page.querySelector('p'))).toBe('Take 19 11/16 yd, all 19 11/16 yd.');
    expect(page.querySelector('.frac')?.textContent).toBe('11/16');
    const notes = page.querySelectorAll('[popover]');
    expect(notes).toHaveLength(1);
    expect(notes[0]?.id).toBe(buttons[0]?.getAttribute('popovertarget'));
    expect(textOf(notes[0])).toContain('ends × loom height Ends66');
  });

  test('say so when the plan does not have them', async () => {
    expect(textOf(await draw('Take <Amount of="cord"/>.').then((page) => page.querySelector('p')))).toBe('Take (not in this plan).');
  });
});

describe('steps', () => {
  const text = '<Step id="a">Tie on.</Step>\n\n<Step id="b">Wind.</Step>\n\nWords.\n\n<Step id="c">Pluck.</Step>';
  const stepForm = { action: '/series/low-tide/2?_action=ticks', series: 'low-tide', lesson: 'l'.repeat(26) };

  test('that follow each other are one list', async () => {
    const page = await draw(text);
    expect([...page.querySelectorAll('ol.steps')].map((list) => list.children.length)).toEqual([2, 1]);
    expect(page.querySelectorAll('form')).toHaveLength(0);
  });

  test('are ticked, and ticks taken back, by a form that needs no script', async () => {
    const page = await draw(text, { stepForm, ticked: new Set(['a']) });
    const forms = [...page.querySelectorAll('form')].map((form) => {
      const button = form.querySelector('button');
      const hidden = [...form.querySelectorAll('input')].map((input) => `${input.name}=${input.value}`).join('&');
      return [form.getAttribute('action'), hidden, `${button?.name ?? ''}=${button?.value ?? ''}`, button?.getAttribute('aria-pressed'), button?.getAttribute('aria-label')];
    });
    const shared = `subject=step&series=low-tide&lesson=${stepForm.lesson}`;
    expect(forms).toEqual([
      [stepForm.action, `${shared}&item=a`, 'ticked=no', 'true', 'Done: Tie on.'],
      [stepForm.action, `${shared}&item=b`, 'ticked=yes', 'false', 'Done: Wind.'],
      [stepForm.action, `${shared}&item=c`, 'ticked=yes', 'false', 'Done: Pluck.'],
    ]);
    expect(page.querySelector('[aria-current=step]')?.id).toBe('step-b');
  });
});

describe('parts', () => {
  test('caution and tip are named by their titles and hold their words', async () => {
    const page = await draw('<Caution title="Nails">\nMind *them*.\n</Caution>\n\n<Tip>\nOr not.\n</Tip>');
    expect([...page.querySelectorAll('aside')].map((aside) => [aside.getAttribute('aria-label'), textOf(aside)])).toEqual([['Caution: Nails', 'NailsMind them.'], ['Tip', 'Or not.']]);
  });

  test('a figure leads to its page in the handbook, drawn or not', async () => {
    const page = await draw('<Figure of="loop-pile"/>\n\n<Figure of="tabby"/>', { figures: { tabby: { svg: '<svg></svg>' } } });
    expect([...page.querySelectorAll('figure a')].map((link) => [textOf(link), link.getAttribute('href')])).toEqual([
      ['Loop pile in the handbook', '/handbook/loop-pile'],
      ['Tabby in the handbook', '/handbook/tabby'],
    ]);
  });

  test('a figure is the drawing from the scene, under it the caption as text', async () => {
    const page = await draw('<Figure of="tabby" caption="a &lt;b&gt; c"/>', { figures: { tabby: { svg: '<svg role="img" aria-label="Tabby"></svg>' } } });
    expect(page.querySelector('figure > [data-drawing] > svg')?.getAttribute('aria-label')).toBe('Tabby');
    expect(page.querySelector('figcaption')?.innerHTML).toBe('a &lt;b&gt; c');
  });

  test('a picture has its size and its words', async () => {
    const page = await draw('![A "loom"](loom)', { pictures: { loom: { src: '/media/x/large', width: 1200, height: 900 } } });
    expect(page.querySelector('img')?.outerHTML).toBe('<img src="/media/x/large" alt="A &quot;loom&quot;" width="1200" height="900" loading="lazy" decoding="async">');
  });

  test('what is not there yet is told in its place', async () => {
    const page = await draw('![A loom](loom)\n\n<Video name="v"/>\n\n<Figure of="tabby"/>');
    expect([...page.querySelectorAll('.not-there')].map(textOf)).toEqual(['A picture belongs here, and is not there yet. A loom', 'A video belongs here. It is being made ready.', 'A figure belongs here. It is drawn from the piece, and this series has none yet.']);
  });

  test('a video plays with captions, and its chapters and words are there without script', async () => {
    const page = await draw('<Video name="v"/>', {
      videos: { v: { title: 'Dress', src: '/media/v/video', type: 'video/mp4', durationMs: 3_800_000, captions: '/media/v/captions', chapters: [{ atMs: 0, title: 'First' }, { atMs: 3_725_000, title: 'Last' }], cues: [{ fromMs: 0, toMs: 900, words: 'Lay it down.' }, { fromMs: 900, toMs: 1_800, words: 'Wind.' }] } },
    });
    expect(page.querySelector('video[controls][preload=metadata] > track[kind=captions][default]')?.getAttribute('src')).toBe('/media/v/captions');
    expect([...page.querySelectorAll('.chapter-list a')].map((link) => [link.getAttribute('href'), textOf(link)])).toEqual([['/media/v/video#t=0', '0:00First'], ['/media/v/video#t=3725', '1:02:05Last']]);
    expect(textOf(page.querySelector('details section'))).toBe('FirstLay it down. Wind.');
  });
});

describe('whatever comes', () => {
  test('a tree that is not one is not drawn', async () => {
    const page = await drawTree({ v: 1, type: 'root', children: [{ type: 'html', value: '<script>alert(1)</script>' }] });
    expect(textOf(page.body)).toBe('The text of this part cannot be shown just now. Nothing you made is lost.');
    expect(page.querySelector('script')).toBeNull();
  });

  test.each(HARMLESS)('%j is drawn as words, without anything that runs', async (source) => {
    const page = await draw(source, { pictures: { loom: { src: '/media/x/large', width: 1, height: 1 } } });
    expect(page.querySelectorAll('script, iframe, object, embed, style, link, base, meta[http-equiv]')).toHaveLength(0);
    const attributes = [...page.querySelectorAll('*')].flatMap((element) => element.getAttributeNames());
    expect(attributes.filter((name) => name.startsWith('on') || name === 'style')).toEqual([]);
    expect(page.querySelectorAll('img:not([src^="/media/"])')).toHaveLength(0);
  });
});
