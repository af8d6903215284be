/** The handbook as one looks something up in it: no script, a phone, a word that is not spelt right. */
import { expect } from 'playwright/test';
import { test } from './support/test.ts';

test.use({ javaScriptEnabled: false, viewport: { width: 390, height: 844 } });

test('a fault is looked up by what one sees, and its heading is opened', async ({ page }) => {
  await page.goto('/handbook');
  const search = page.getByRole('search', { name: 'Search the handbook' });
  await search.getByRole('searchbox').fill('slack ends');
  await search.getByRole('button', { name: 'Find' }).click();
  await page.getByRole('link', { name: 'Mending the warp: A slack end' }).click();
  await expect(page).toHaveURL(/\/handbook\/mending-the-warp#a-slack-end$/u);
  await expect(page.getByRole('heading', { name: 'A slack end' })).toBeInViewport();

  await search.getByRole('searchbox').fill('soumack');
  await search.getByRole('button', { name: 'Find' }).click();
  await expect(page.getByText('It was read as soumak.')).toBeVisible();
  await page.getByRole('link', { name: 'Soumak', exact: true }).first().click();
  await expect(page.getByRole('heading', { level: 1, name: 'Soumak' })).toBeVisible();
});
