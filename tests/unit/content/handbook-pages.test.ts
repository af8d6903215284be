// The handbook's pages: whole, within their length, and pointing only at what is there.
import { readdirSync, readFileSync } from 'node:fs';
import { describe, expect, test } from 'vitest';
import { load as parse } from 'js-yaml';
import { LOW_TIDE } from '#components/handbook/pattern.ts';
import { HANDBOOK_TOPICS, neighboursOf, pagesByTopic } from '#core/handbook/reading-order.ts';
import { isTableName } from '#components/handbook/tables.ts';
import { HandbookHead } from '#contracts/handbook.ts';
import { FIGURE_KINDS } from '#core/craft/figures/figure-kinds.ts';

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

test('the handbook has at least ten pages, and every topic has one', () => {
  expect(pages.length).toBeGreaterThanOrEqual(10);
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

describe.each(pages)('$id', (page) => {
  test('is between five hundred and nine hundred words long', () => {
    const words = page.body.replaceAll(/<[^>]*>/gu, ' ').replaceAll(/[|#*]|---/gu, ' ').split(/\s+/u).filter((word) => /[\p{L}\p{N}]/u.test(word));
    expect(words.length).toBeGreaterThanOrEqual(500);
    expect(words.length).toBeLessThanOrEqual(900);
  });

  test('has drawn figures of kinds that exist, each with words under it', () => {
    const kinds = valuesOf(page, 'Figure', 'of');
    if (page.data.topic !== 'yarn') expect(kinds.length).toBeGreaterThanOrEqual(1);
    for (const kind of kinds) expect(FIGURE_KINDS).toContain(kind);
    expect(new Set(kinds).size).toBe(kinds.length);
    for (const caption of valuesOf(page, 'Figure', 'caption')) expect(caption.length).toBeGreaterThan(15);
    expect(valuesOf(page, 'Figure', 'caption')).toHaveLength(kinds.length);
  });

  test('shows only tables that are reckoned, and each example amount once', () => {
    for (const name of valuesOf(page, 'Reckoned', 'of')) expect(isTableName(name), name).toBe(true);
    const examples = valuesOf(page, 'InLowTide', 'of');
    expect(new Set(examples).size).toBe(examples.length);
  });

  test('shows the cloth of a band the pattern has, if any', () => {
    const { swatch } = page.data;
    if (swatch !== undefined) expect(LOW_TIDE.piece.bands.map((band) => band.name)).toContain(swatch);
  });

  test('uses no component and no tag but the five it may', () => {
    expect([...page.body.matchAll(/<\/?([A-Za-z]+)/gu)].map((match) => match[1]).filter((name) => !['Caution', 'Figure', 'InLowTide', 'Reckoned', 'Tip'].includes(name ?? ''))).toEqual([]);
    expect(page.body).not.toMatch(/[{}]/u);
  });

  test('links only to pages of the handbook, and not to itself', () => {
    for (const link of page.body.matchAll(/\]\(([^)]*)\)/gu)) {
      const slug = (link[1] ?? '').replace('/handbook/', '');
      expect(slugs, link[1]).toContain(slug);
      expect(slug).not.toBe(page.id);
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
