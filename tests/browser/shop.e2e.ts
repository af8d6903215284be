/** The shop front as a visitor walks through it, without script and on a phone: found by a word typed badly, by teacher and technique, passed on, given. */
import { expect } from 'playwright/test';
import { test } from './support/test.ts';

test.describe('without script, on a phone', () => {
  test.use({ javaScriptEnabled: false, viewport: { width: 390, height: 844 } });

  test('a visitor finds a series, reads its free part, its teacher and its techniques, and words a gift', async ({ page }) => {
    await page.goto('/series');
    await page.getByLabel('Search').fill('soumack');
    await page.getByRole('button', { name: 'Find' }).click();
    await expect(page.getByRole('status')).toContainText('Shown is what has soumak.');
    await page.getByRole('link', { name: 'Low Tide: read Part 1 free' }).click();
    await expect(page).toHaveURL(/\/series\/low-tide\/1$/);

    await page.goto('/series?technique=soumak&loom=30');
    await expect(page.getByText('No series is all of that at once.')).toBeVisible();
    await page.getByRole('button', { name: 'Filters (2)' }).click();
    await page.getByLabel('Order').selectOption('Shortest');
    await page.getByRole('button', { name: 'Show the series' }).click();
    await expect(page).toHaveURL(/sort=hours/);
    await page.getByRole('link', { name: 'Without your loom: 1 series' }).click();
    await page.getByRole('link', { name: 'Low Tide', exact: true }).click();
    await page.getByRole('link', { name: 'soumak', exact: true }).click();
    await expect(page.getByRole('heading', { level: 1, name: 'Soumak' })).toBeVisible();
    await expect(page.getByRole('link', { name: 'Soumak in the handbook' })).toHaveAttribute('href', '/handbook/soumak');

    await page.goto('/gifts');
    await page.getByLabel('Which series').selectOption('Low Tide, with Ilse Marrow');
    await page.getByLabel('For whom').fill('Amara');
    await page.getByLabel('Your words').fill('For the <long> evenings.');
    await page.getByRole('button', { name: 'Make the card' }).click();
    await expect(page.getByText('For the <long> evenings.').last()).toBeVisible();
    await expect(page.getByText('Gift seats cannot be bought here yet')).toBeVisible();
  });
});

test('what programs read of a series: its address, picture, feed and data, and the content policy has nothing against it', async ({ page, request }) => {
  await page.goto('/series/low-tide?inside=36');
  const head = page.locator('head');
  expect(await head.locator('link[rel="canonical"]').getAttribute('href')).toMatch(/\/series\/low-tide$/);
  const data = await head.locator('script[type="application/ld+json"]').allTextContents();
  expect(data.map((json) => (JSON.parse(json) as Record<string, unknown>)['@type'])).toEqual(['Course', 'BreadcrumbList']);
  const picture = await request.get((await head.locator('meta[property="og:image"]').getAttribute('content')) ?? '');
  expect([picture.status(), picture.headers()['content-type']]).toEqual([200, 'image/png']);
  const feed = await request.get((await head.locator('link[type="application/atom+xml"]').getAttribute('href')) ?? '');
  expect([feed.status(), feed.headers()['content-type']]).toEqual([200, 'application/atom+xml; charset=utf-8']);
  expect((await request.get('/series/feed.atom', { headers: { 'if-none-match': (await request.get('/series/feed.atom')).headers()['etag'] ?? '' } })).status()).toBe(304);
});
