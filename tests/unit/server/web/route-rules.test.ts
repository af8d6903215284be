import { readdirSync } from 'node:fs';
import { describe, expect, test } from 'vitest';
import { ROUTE_RULES } from '#server/web/route-rules.ts';

const PAGES = new URL('../../../../src/pages/', import.meta.url);
/** Routes that Astro makes by itself, and the page that only the development server has. */
const WITHOUT_FILE = ['/_actions/[...path]', '/_image', '/_server-islands/[name]', '/_components'];

/** The routes that the files in src/pages make, by Astro's rules: a name that begins with `_` makes none. */
function routesOfFiles(): string[] {
  return readdirSync(PAGES, { recursive: true, withFileTypes: true })
    .filter((entry) => entry.isFile())
    .map((entry) => `${entry.parentPath.slice(PAGES.pathname.length - 1)}/${entry.name}`.replaceAll('//', '/'))
    .filter((path) => /\.(?:astro|ts|md|mdx)$/.test(path) && !path.split('/').some((part) => part.startsWith('_')))
    .map((path) => path.replace(/(?:\.\w+)$/, '').replace(/\/index$/, '') || '/');
}

describe('every route', () => {
  test.each(routesOfFiles())('%s has a rule that says who may come in', (route) => {
    expect(ROUTE_RULES).toHaveProperty([route]);
  });

  test.each(Object.keys(ROUTE_RULES).filter((route) => !WITHOUT_FILE.includes(route)))('that has a rule, such as %s, has a page', (route) => {
    expect(routesOfFiles()).toContain(route);
  });

  test('below /office is the steward’s, and below /workroom at least a helper’s', () => {
    for (const [route, rule] of Object.entries(ROUTE_RULES)) {
      if (/^\/office(?:\/|$)/.test(route)) expect([route, rule]).toEqual([route, 'steward']);
      if (/^\/workroom(?:\/|$)/.test(route)) expect(['teacher', 'bench'], route).toContain(rule);
    }
  });

  test('of a machine carries a proof of its own or changes nothing', () => {
    const machines = Object.entries(ROUTE_RULES).filter(([, rule]) => rule === 'machine').map(([route]) => route);
    expect(machines.sort()).toEqual(['/api/openapi.json', '/api/payments/events', '/api/reckon', '/calendar/[key].ics', '/leave/[key]', '/robots.txt', '/series/[slug]/share.png', '/series/feed.atom', '/sitemap.xml', '/teachers/[handle]/feed.atom']);
  });
});
