/** A series of its own for a journey that changes one, so that nobody else's is touched. */
import { expect, type Page } from 'playwright/test';

/** As Ilse: an empty draft with these parts. @returns the path of its page in the workroom, which is open. */
export async function makeSeries(page: Page, ...parts: string[]): Promise<string> {
  const main = page.getByRole('main');
  await page.goto('/workroom/series/new');
  await page.getByLabel('Title').fill(`Neap tide ${Date.now().toString(36)}`);
  await main.getByRole('button', { name: 'Make the series' }).click();
  for (const part of parts) {
    await page.getByLabel('Put in a part').fill(part);
    await page.getByLabel('Put in a part').press('Enter');
    await expect(main.getByRole('link', { name: part, exact: true })).toBeVisible();
  }
  return new URL(page.url()).pathname;
}
