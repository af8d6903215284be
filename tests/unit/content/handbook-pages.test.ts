// The handbook's pages: whole, within their length, and pointing only at what is there.
import { readdirSync, readFileSync } from 'node:fs';
import { describe, expect, test } from 'vitest';
import { load as parse } from 'js-yaml';
import { LOW_TIDE } from '#components/handbook/pattern.ts';
import { HANDBOOK_TOPICS, neighboursOf, pagesByTopic } from '#core/handbook/reading-order.ts';
import { isTableName } from '#components/handbook/tables.ts';
import { HandbookHead } from '#contracts/handbook.ts';
import { amountOf } from '#core/craft/amounts.ts';
import { FIGURE_KINDS } from '#core/craft/figures/figure-kinds.ts';
import { TECHNIQUE_NAMES } from '#core/craft/techniques/registry.ts';
import { TECHNIQUE_WORDS } from '#core/craft/techniques/technique-words.ts';
import { sectionsOf } from '#core/handbook/page-text.ts';
import { COMMON_FAULTS, FIGURE_PAGES, handbookAddress, TECHNIQUE_PAGES } from '#core/handbook/pages-for.ts';
import { PARTS } from '#islands/reckoner/parts.ts';

const folder = new URL('../../../content/handbook/', import.meta.url);
const slugs = readdirSync(folder).filter((file) => file.endsWith('.mdx')).map((file) => file.slice(0, -'.mdx'.length));

interface HandbookPage {
  readonly id: string;
  readonly data: HandbookHead;
  readonly body: string;
}

function pageOf(id: string): HandbookPage {
  const [, head = '', body = ''] = /^---\n([\s\S]*?)\n---\n([\s\S]*)$/u.exec(readFileSync(new URL(`${id}.mdx`, folder), 'utf8')) ?? [];
  return { id, data: HandbookHead.parse(parse(head)), body };
}

function valuesOf({ body }: HandbookPage, component: string, attribute: string): string[] {
  return [...body.matchAll(new RegExp(`<${component} [^>]*?${attribute}="([^"]*)"`, 'gu'))].map((match) => match[1] ?? '');
}

const pages = slugs.map(pageOf);

/** Every address a page may point at: pages, their headings, the parts of the reckoner. */
const addresses = new Set([
  ...pages.flatMap(({ id, body }) => [`/handbook/${id}`, ...sectionsOf(body).flatMap((section) => (section.id === undefined ? [] : [`/handbook/${id}#${section.id}`]))]),
  '/reckoner', ...PARTS.map(({ name }) => `/reckoner#${name}`),
]);
/** What is shown by hand or thread, and so by a drawing. */
const DRAWN_TOPICS: readonly string[] = ['techniques', 'shapes', 'knots'];

test('the handbook has at least thirty pages, and every topic has one', () => {
  expect(pages.length).toBeGreaterThanOrEqual(30);
  expect(pagesByTopic(pages).map(({ key }) => key)).toEqual(HANDBOOK_TOPICS.map(({ key }) => key));
});

test('no two pages of a topic claim the same place', () => {
  for (const { key, pages: ordered } of pagesByTopic(pages)) {
    expect(ordered.map(({ data }) => data.order), key).toEqual(ordered.map((_, index) => index + 1));
  }
});

test('turning the pages leads from the first to the last and back', () => {
  const first = pagesByTopic(pages)[0]?.pages[0];
  const walked: string[] = [];
  for (let page = first; page !== undefined; page = neighboursOf(pages, page.id).after) walked.push(page.id);
  expect([...walked].sort()).toEqual([...slugs].sort());
  for (const [index, id] of walked.entries()) expect(neighboursOf(pages, id).before?.id).toBe(walked[index - 1]);
});

test('every technique has a page that names it, and says when to be careful', () => {
  for (const name of TECHNIQUE_NAMES) {
    const page = pages.find(({ id }) => id === TECHNIQUE_PAGES[name]);
    expect(page?.body.toLowerCase(), name).toContain(TECHNIQUE_WORDS[name].label.split(' ')[0]?.toLowerCase());
  }
});

test('every figure is shown on the page it leads to', () => {
  for (const kind of FIGURE_KINDS) {
    const page = pages.find(({ id }) => id === FIGURE_PAGES[kind]);
    expect(page === undefined ? [] : valuesOf(page, 'Figure', 'of'), kind).toContain(kind);
  }
});

test('every common fault has its heading, and stands in the table of faults', () => {
  const table = pages.find(({ id }) => id === 'mending-common-faults')?.body;
  for (const { says, at } of Object.values(COMMON_FAULTS)) {
    expect(addresses, says).toContain(handbookAddress(at));
    expect(table, says).toContain(`(${handbookAddress(at)})`);
  }
});

test('no heading is said twice on a page, so that each has an address of its own', () => {
  for (const { id, body } of pages) {
    const ids = sectionsOf(body).map((section) => section.id);
    expect(new Set(ids).size, id).toBe(ids.length);
  }
});

describe.each(pages)('$id', (page) => {
  test('is between three hundred and fifty and nine hundred words long, in at least three sections', () => {
    const words = page.body.replaceAll(/<[^>]*>/gu, ' ').replaceAll(/[|#*]|---/gu, ' ').split(/\s+/u).filter((word) => /[\p{L}\p{N}]/u.test(word));
    expect(words.length).toBeGreaterThanOrEqual(350);
    expect(words.length).toBeLessThanOrEqual(900);
    expect(sectionsOf(page.body).filter(({ id }) => id !== undefined).length).toBeGreaterThanOrEqual(3);
  });

  test('has drawn figures of kinds that exist, each with words under it', () => {
    const kinds = valuesOf(page, 'Figure', 'of');
    if (DRAWN_TOPICS.includes(page.data.topic)) expect(kinds.length).toBeGreaterThanOrEqual(1);
    for (const kind of kinds) expect(FIGURE_KINDS).toContain(kind);
    expect(new Set(kinds).size).toBe(kinds.length);
    for (const caption of valuesOf(page, 'Figure', 'caption')) expect(caption.length).toBeGreaterThan(15);
    expect(valuesOf(page, 'Figure', 'caption')).toHaveLength(kinds.length);
  });

  test('shows only tables that are reckoned, and each example amount once', () => {
    for (const name of valuesOf(page, 'Reckoned', 'of')) expect(isTableName(name), name).toBe(true);
    const examples = valuesOf(page, 'InLowTide', 'of');
    expect(new Set(examples).size).toBe(examples.length);
    for (const key of examples) expect(amountOf(key, LOW_TIDE.piece, LOW_TIDE.plan).ok, key).toBe(true);
  });

  test('shows the cloth of a band the pattern has, if any', () => {
    const { swatch } = page.data;
    if (swatch !== undefined) expect(LOW_TIDE.piece.bands.map((band) => band.name)).toContain(swatch);
  });

  test('uses no component and no tag but the six it may', () => {
    expect([...page.body.matchAll(/<\/?([A-Za-z]+)/gu)].map((match) => match[1]).filter((name) => !['Caution', 'Converter', 'Figure', 'InLowTide', 'Reckoned', 'Tip'].includes(name ?? ''))).toEqual([]);
    expect(page.body).not.toMatch(/[{}]/u);
  });

  test('links only to pages, headings and parts of the reckoner that are there, and not to itself', () => {
    const links = [...page.body.matchAll(/\]\(([^)]*)\)/gu)].map((match) => match[1] ?? '');
    for (const link of links) {
      expect(addresses, link).toContain(link);
      expect(link.split('#')[0]).not.toBe(`/handbook/${page.id}`);
    }
  });

  test('says of every caution that it is general, and whom to ask', () => {
    const cautions = [...page.body.matchAll(/<Caution[^>]*>([\s\S]*?)<\/Caution>/gu)].map((match) => match[1] ?? '');
    const all = page.data.topic === 'safety' ? [page.body] : cautions;
    for (const caution of all) {
      expect(caution).toMatch(/general information/u);
      expect(caution).toMatch(/qualified person|doctor/u);
    }
  });

  test('keeps to the words of the house', () => {
    expect(page.body).not.toMatch(/!|…|“|”|″|—|e\.g\.|etc\.|approx|\bfix(es|ed)?\b/u);
    expect(page.body).not.toMatch(/^# /mu);
  });
});
