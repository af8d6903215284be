/**
 * A list in a cellar: pages a student opened are there without a connection, two devices tick and nothing is lost, and
 * after she has signed out nothing of her is left on the device.
 */
import { expect, test, type Browser, type BrowserContext, type Page } from 'playwright/test';
import { newStudent } from './support/take-seat.ts';

const GATHER = '/series/low-tide/gather';
const tick = (page: Page, name: RegExp) => page.getByRole('checkbox', { name }).first();

/** Addresses of pages in this browser's store. */
const keptPages = (page: Page): Promise<string[]> => page.evaluate(async () => {
  const store = await caches.open('fellmark-pages-1');
  return (await store.keys()).map(({ url }) => new URL(url).pathname).filter((path) => path !== '/kept-state');
});

async function otherDevice(browser: Browser, of: BrowserContext): Promise<Page> {
  const context = await browser.newContext({ storageState: { cookies: await of.cookies(), origins: [] } });
  return context.newPage();
}

// In browsers whose console is not watched: it complains of the connection that is taken away.
test.use({ serviceWorkers: 'allow', viewport: { width: 390, height: 844 } });

test('a list is ticked on two devices without a connection, and nothing is lost', async ({ page, request, browser, context }) => {
  test.setTimeout(150_000);
  await newStudent(page, request);
  await page.goto(GATHER);
  await expect.poll(() => keptPages(page)).toContain(GATHER);

  await context.setOffline(true);
  await tick(page, /^Blunt needle/).check();
  await expect(page.getByText('No signal. Ticks are kept here.')).toBeVisible();
  await page.reload();
  await expect(page.getByText(/^You are without a connection: this is as of \d\d:\d\d\./)).toBeVisible();
  await expect(tick(page, /^Blunt needle/)).toBeChecked();
  await tick(page, /^Eye protection/).check();
  await page.goto('/account');
  await expect(page.getByRole('heading', { name: 'You are without a connection' })).toBeVisible();
  await page.getByRole('link', { name: 'Gather for Low Tide' }).click();
  await expect(tick(page, /^Eye protection/)).toBeChecked();

  const laptop = await otherDevice(browser, context);
  await laptop.goto(GATHER);
  const sent = laptop.waitForResponse((response) => response.url().endsWith('/api/ticks'));
  await tick(laptop, /^Scissors|^Sharp scissors/).check();
  expect((await sent).ok()).toBe(true);

  await context.setOffline(false);
  await expect(page.getByText('No signal. Ticks are kept here.')).toBeHidden();
  // Heard with the answer, on the page that was kept.
  await expect(tick(page, /^Scissors|^Sharp scissors/)).toBeChecked();
  await laptop.reload();
  for (const name of [/^Blunt needle/, /^Eye protection/, /^Scissors|^Sharp scissors/]) await expect(tick(laptop, name)).toBeChecked();
  await laptop.context().close();

  await page.goto('/loom');
  await page.locator('summary', { hasText: 'Your menu' }).click();
  await page.getByRole('button', { name: 'Sign out' }).click();
  await expect(page).toHaveURL(/\/sign-in$/);
  await expect.poll(() => keptPages(page)).toEqual([]);
  const waiting = await page.evaluate(() => new Promise<number>((resolve, reject) => {
    const opening = indexedDB.open('fellmark-outbox');
    opening.onerror = () => { reject(new Error('no outbox')); };
    opening.onsuccess = () => {
      const asked = opening.result.transaction('entries').objectStore('entries').count();
      asked.onsuccess = () => { resolve(asked.result); };
    };
  }));
  expect(waiting).toBe(0);
});
