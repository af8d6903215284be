/** A seat in Low Tide for a person of a journey's own, bought as everybody buys one. */
import { expect, type APIRequestContext, type Page } from 'playwright/test';
import { newPerson, signInHere, type NewPerson } from './new-person.ts';

export async function newStudent(page: Page, request: APIRequestContext): Promise<NewPerson> {
  const student = await newPerson(request);
  await page.goto('/sign-in?to=/series/low-tide');
  await signInHere(page, student);
  await expect(page.getByRole('heading', { level: 1, name: 'Low Tide' })).toBeVisible();
  await page.getByLabel(/^Open the parts to me at once/).check();
  await page.getByLabel(/^I know that with the first part/).check();
  await page.getByRole('button', { name: 'Take a seat' }).click();
  await expect(page).toHaveURL(/\/pay\//);
  await page.getByLabel('Card number').fill('4242 4242 4242 4242');
  await page.getByLabel('Expiry').fill('12/34');
  await page.getByLabel('Security code').fill('123');
  await page.getByRole('button', { name: /^Pay/ }).click();
  // News from the bank may take a moment; the loom shows the seat as soon as it is there.
  await expect(async () => {
    await page.goto('/loom');
    await expect(page.getByText('Low Tide, Part 1 of 7')).toBeVisible({ timeout: 500 });
  }).toPass({ timeout: 30_000 });
  return student;
}
