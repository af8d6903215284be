/** A seat for a person of a journey's own, bought as everybody buys one. */
import { expect, type APIRequestContext, type Page } from 'playwright/test';
import { newPerson, signInHere, type NewPerson } from './new-person.ts';
import { CARD, payWith } from './pay.ts';

const LOW_TIDE = { slug: 'low-tide', title: 'Low Tide', parts: 7 };

export async function newStudent(page: Page, request: APIRequestContext, series = LOW_TIDE, name?: string): Promise<NewPerson> {
  const student = await newPerson(request, name);
  await page.goto(`/sign-in?to=/series/${series.slug}`);
  await signInHere(page, student);
  await expect(page.getByRole('heading', { level: 1, name: series.title })).toBeVisible();
  await page.getByLabel(/^Open the parts to me at once/).check();
  await page.getByLabel(/^I know that with the first part/).check();
  await page.getByRole('button', { name: 'Take a seat' }).click();
  await payWith(page, CARD);
  // News from the bank may take a moment; the loom shows the seat as soon as it is there.
  await expect(async () => {
    await page.goto('/loom');
    await expect(page.getByText(`${series.title}, Part 1 of ${series.parts}`)).toBeVisible({ timeout: 500 });
  }).toPass({ timeout: 30_000 });
  return student;
}
