/** What a buyer does at the pay page, and while she waits for the payment service to tell us. */
import { expect, type Page } from 'playwright/test';

export const CARD = '4242 4242 4242 4242';
export const REFUSED_CARD = '4000 0000 0000 0002';

export async function payWith(page: Page, card: string): Promise<void> {
  await expect(page).toHaveURL(/\/pay\//);
  await page.getByLabel('Card number').fill(card);
  await page.getByLabel('Expiry').fill('12/34');
  await page.getByLabel('Security code').fill('123');
  await page.getByRole('button', { name: /^Pay/ }).click();
}

/** The page looks again by itself; without script it has a button for it. */
export async function untilSeat(page: Page, scripted: boolean): Promise<void> {
  const yours = page.getByRole('heading', { name: 'Your seat is yours' });
  if (!scripted) {
    await expect(async () => {
      if (!(await yours.isVisible())) await page.getByRole('link', { name: 'Look again' }).click();
      await expect(yours).toBeVisible({ timeout: 500 });
    }).toPass({ timeout: 30_000 });
  }
  await expect(yours).toBeVisible({ timeout: 30_000 });
}
