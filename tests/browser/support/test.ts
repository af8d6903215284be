/**
 * Journeys in which nothing may go wrong unseen: any error or warning in the console, and with it any report of the
 * content policy, fails the test that caused it.
 */
import axe from 'axe-core';
import { expect, test as base, type Page } from 'playwright/test';

/** A page that answers with a refusal on purpose is told of in the console as well. */
const ANSWERED_ON_PURPOSE = /^Failed to load resource: the server responded with a status of (?:402|403|404|409|410|422|429)\b/;

/** Said by the runner where a journey goes without a service worker (playwright.config.ts). */
const WITHOUT_WORKER = 'Service Worker registration blocked by Playwright';

export const test = base.extend({
  page: async ({ page }, use) => {
    const faults: string[] = [];
    page.on('console', (message) => {
      if (['error', 'warning'].includes(message.type()) && !ANSWERED_ON_PURPOSE.test(message.text()) && !message.text().startsWith(WITHOUT_WORKER)) faults.push(`${page.url()}: ${message.text()}`);
    });
    page.on('pageerror', (error) => { faults.push(`${page.url()}: ${error.message}`); });
    await use(page);
    expect(faults).toEqual([]);
  },
});

const NARROWEST = 320;
/** What a scheme changes is colour; everything else is the same by day and by evening. */
const RULES_OF_COLOUR = ['color-contrast', 'link-in-text-block'];

/** Nothing that a program can find stands between the page and those who hear or zoom it; it never scrolls sideways, nor at 320 px. */
export async function expectFaultless(page: Page): Promise<void> {
  await page.evaluate(() => document.fonts.ready.then(() => undefined));
  await expectNoFaultOf(page, { rules: { 'target-size': { enabled: true } } });
  await expectNoSidewaysScroll(page);
  const size = page.viewportSize();
  if (size === null || size.width > 520) return;
  await page.setViewportSize({ ...size, width: NARROWEST });
  await expectNoSidewaysScroll(page);
  await page.setViewportSize(size);
}

/** The same wide and on a phone, by day and by evening; the page is left on a phone by evening. */
export async function expectFaultlessEverywhere(page: Page): Promise<void> {
  /* Colours that are on their way from one scheme to the other are neither's. */
  await page.emulateMedia({ reducedMotion: 'reduce' });
  for (const width of [1280, 390]) {
    await page.setViewportSize({ width, height: 900 });
    await page.emulateMedia({ colorScheme: 'light' });
    await expectFaultless(page);
    await page.emulateMedia({ colorScheme: 'dark' });
    await expectNoFaultOf(page, { runOnly: RULES_OF_COLOUR, preload: false });
  }
}

/** No rule that is asked looks into style sheets by itself, so they are not fetched again; films are, for those that would play at once. */
async function expectNoFaultOf(page: Page, options: axe.RunOptions): Promise<void> {
  if (!(await page.evaluate(() => 'axe' in window))) await page.evaluate(axe.source);
  const found = await page.evaluate(async (asked) => (await window.axe.run(document, { preload: { assets: ['media'] }, ...asked, resultTypes: ['violations'] })).violations.map(({ id, nodes }) => `${id}: ${nodes.map(({ html }) => html).join(' ')}`), options);
  expect(found, page.url()).toEqual([]);
}

async function expectNoSidewaysScroll(page: Page): Promise<void> {
  const over = await page.evaluate(() => document.documentElement.scrollWidth - document.documentElement.clientWidth);
  expect(over, `${page.url()} scrolls sideways by ${over} px`).toBeLessThanOrEqual(0);
}

declare global {
  interface Window {
    axe: typeof axe;
  }
}
