/** A student half way says how far she has woven, is told what is left, and what of her piece can no longer change. */
import { expect, type Locator, type Page } from 'playwright/test';
import { expectFaultless, test } from './support/test.ts';
import { newStudent } from './support/take-seat.ts';

test.use({ viewport: { width: 390, height: 844 } });

const MY_PIECE = '/series/low-tide/piece';
const field = (page: Page, name: string): Locator => page.locator(`[name="${name}"]`);

test('a piece on the loom: the rest of it is reckoned and kept, and what is woven stays, with script and without', async ({ page, request, browser }) => {
  await newStudent(page, request);
  await page.goto(MY_PIECE);

  await test.step('by keyboard she says how far she is, and sees whether her yarn suffices', async () => {
    const fold = page.getByText('I have already woven some of it');
    await expect(page.locator('astro-island[ssr]')).toHaveCount(0);
    await fold.focus();
    await page.keyboard.press('Enter');
    await page.keyboard.press('Tab');
    await expect(field(page, 'woven.bandsDone')).toBeFocused();
    await page.keyboard.type('7 of 14');
    await page.keyboard.press('Tab');
    await page.keyboard.press('Tab');
    await page.keyboard.type('26');
    await field(page, 'woven.left.water').fill('5');
    await expect(page.getByText('as you measured')).toBeVisible();
    await expect(page.getByText('Not enough')).toBeVisible();
    await page.getByText('The yarn does not suffice: what this means').click();
    await expect(page.getByText(/^What to do: Get more of the same dye lot/)).toBeVisible();
    await expectFaultless(page);
    await page.getByRole('button', { name: 'Keep my piece' }).click();
    await expect(page.getByText('What is woven stays as it is; the rest is reckoned anew.')).toBeVisible();
    await expect(field(page, 'woven.bandsDone')).toHaveValue('7');
  });

  await test.step('the list and the text are those of what is still to weave, and say so', async () => {
    await page.goto('/series/low-tide/gather');
    await expect(page.getByText(/^You said that 7 of 14 bands are woven: yarn is listed for what is still to weave/).first()).toBeAttached();
    await expect(page.getByText('On the loom', { exact: true }).first()).toBeVisible();
    await page.goto('/series/low-tide/1');
    await expect(page.getByText(/the rest is reckoned anew with the .* rows in a centimetre you measured/)).toBeVisible();
  });

  await test.step('without script, the width is refused at its field, and everything typed stays', async () => {
    const context = await browser.newContext({ storageState: await page.context().storageState(), javaScriptEnabled: false });
    const plain = await context.newPage();
    await plain.goto(MY_PIECE);
    await field(plain, 'widthMm').fill('30');
    await field(plain, 'loomName').fill('Kitchen frame');
    await plain.getByRole('button', { name: 'Keep my piece' }).click();
    await expect(plain.getByRole('alert')).toContainText('the piece keeps its width');
    await expect(field(plain, 'widthMm')).toHaveAttribute('aria-invalid', 'true');
    await expect(field(plain, 'woven.left.water')).toHaveValue('5');
    await field(plain, 'widthMm').fill('');
    await field(plain, 'insideHeightMm').fill('50');
    await plain.getByRole('button', { name: 'Keep my piece' }).click();
    await plain.getByRole('radio', { name: /^Lower, from the end/ }).check();
    await plain.getByRole('button', { name: 'Keep my piece' }).click();
    await expect(plain.getByText('What is woven stays as it is; the rest is reckoned anew.')).toBeVisible();
    await expect(plain.getByRole('radio', { name: /^Lower, from the end/ })).toBeChecked();
    await field(plain, 'insideHeightMm').fill('80');
    await field(plain, 'woven.left.water').fill('9');
    await plain.getByRole('button', { name: /^Kitchen frame/ }).click();
    await expect(field(plain, 'insideHeightMm')).toHaveValue('50');
    await expect(field(plain, 'woven.left.water')).toHaveValue('9');
    await context.close();
  });
});
