// What people ask the handbook, and the page they are led to.
import { readdirSync, readFileSync } from 'node:fs';
import { load as parse } from 'js-yaml';
import { expect, test } from 'vitest';
import { HandbookHead } from '#contracts/handbook.ts';
import { findPages, indexPages } from '#core/handbook/find-pages.ts';
import { sectionsOf } from '#core/handbook/page-text.ts';

const folder = new URL('../../../content/handbook/', import.meta.url);
const index = indexPages(
  readdirSync(folder).map((file) => {
    const [, head = '', body = ''] = /^---\n([\s\S]*?)\n---\n([\s\S]*)$/u.exec(readFileSync(new URL(file, folder), 'utf8')) ?? [];
    const { title, summary } = HandbookHead.parse(parse(head));
    return { id: file.slice(0, -'.mdx'.length), title, summary, sections: sectionsOf(body) };
  }),
);

test.each([
  ['soumak', 'soumak'],
  ['soumack', 'soumak'],
  ['rya knots', 'rya'],
  ['plain weave', 'tabby'],
  ['moths', 'moths'],
  ['broken end', 'mending-the-warp'],
  ['warp shows', 'mending-rows'],
  ['narrow edges', 'mending-shape-and-edges'],
  ['slit', 'slits-and-sewing-them'],
  ['macrame', 'basic-knots'],
  ['how much cord', 'measuring-cord'],
  ['washing', 'wet-finishing-and-blocking'],
  ['mordant', 'dyeing-safely'],
  ['wpi', 'wraps-per-inch'],
  ['inches', 'units-and-conversions'],
  ['sore wrists', 'posture-and-hands'],
  ['baby', 'children-and-cords'],
  ['how long does it take hours', 'estimating-hours'],
  ['rigid heddle', 'warping-a-rigid-heddle-loom'],
  ['color', 'planning-colour'],
  ['twisted fringe', 'fringes'],
  ['nail pitch', 'frame-looms-and-nails'],
  ['glossary', 'glossary'],
])('who asks for "%s" finds %s among the first three', (asked, page) => {
  expect(findPages(index, asked).found.slice(0, 3).map(({ id }) => id)).toContain(page);
});

test('every page is found by its own title, as the first or the second', () => {
  for (const { page } of index.pages) expect(findPages(index, page.title).found.slice(0, 2).map(({ id }) => id), page.title).toContain(page.id);
});
