// What only a browser can tell: that none of these texts opens a box, asks another site for anything, or needs what a
// strict content policy refuses.
import { experimental_AstroContainer as AstroContainer } from 'astro/container';
import { chromium, type Browser } from 'playwright';
import { afterAll, beforeAll, expect, test } from 'vitest';
import LessonTree from '#components/lesson/LessonTree.astro';
import type { LessonScene } from '#components/lesson/scene.ts';
import { parseLessonText } from '#core/lesson-text/parse-lesson-text.ts';
import { HARMLESS } from './harmless.ts';

const POLICY = "default-src 'none'; img-src 'self'; media-src 'self'; form-action 'self'; base-uri 'none'; require-trusted-types-for 'script'";
const SITE = 'http://lesson.test';
const scene: LessonScene = {
  amounts: {},
  figures: {},
  pictures: { loom: { src: '/media/x/large', width: 1, height: 1 } },
  videos: {},
  ticked: new Set(),
  stepForm: { action: '/tick', series: 's', lesson: 'l' },
};

let browser: Browser;
let container: AstroContainer;
beforeAll(async () => {
  container = await AstroContainer.create();
  browser = await chromium.launch({ executablePath: process.env['FELLMARK_TEST_CHROMIUM'] ?? '/usr/bin/chromium', args: ['--no-sandbox', '--disable-gpu', '--disable-background-networking', '--disable-component-update', '--disable-sync'] });
}, 60_000);
afterAll(() => browser.close());

test.each(HARMLESS)('%j does nothing in a browser but be read', async (source) => {
  const read = parseLessonText(source);
  expect(read.problems).toEqual([]);
  const html = await container.renderToString(LessonTree, { props: { tree: read.ok && read.tree, scene } });
  const page = await browser.newPage();
  const seen: string[] = [];
  page.on('dialog', (dialog) => {
    seen.push(`dialog: ${dialog.message()}`);
    void dialog.dismiss();
  });
  page.on('console', (message) => seen.push(`console: ${message.text()}`));
  page.on('pageerror', (error) => seen.push(`error: ${error.message}`));
  await page.route('**/*', (route) => {
    const { origin, pathname } = new URL(route.request().url());
    if (origin !== SITE) seen.push(`request: ${route.request().url()}`);
    if (pathname === '/') return route.fulfill({ contentType: 'text/html; charset=utf-8', headers: { 'Content-Security-Policy': POLICY }, body: `<!doctype html><html lang="en"><title>Lesson</title><body>${html}` });
    return route.fulfill({ contentType: 'image/svg+xml', body: '<svg xmlns="http://www.w3.org/2000/svg"/>' });
  });
  await page.goto(`${SITE}/`, { waitUntil: 'load' });
  for (const target of await page.locator('img, h2, p').all()) await target.hover({ timeout: 2_000 }).catch(() => undefined);
  await page.close();
  expect(seen).toEqual([]);
}, 60_000);
