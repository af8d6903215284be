/** The order of parts by hand and by keyboard, what is missing before publishing, and a series that leaves the house and comes in again. */
import { readFile } from 'node:fs/promises';
import { expect, type Page } from 'playwright/test';
import { press, tabTo, takeFile } from './support/by-keys.ts';
import { stateOf } from './support/demo-people.ts';
import { makeSeries } from './support/new-series.ts';
import { expectFaultless, test } from './support/test.ts';

test.use({ storageState: stateOf('ilse') });
test.slow();

const inMain = (page: Page) => page.getByRole('main');
const order = (page: Page) => page.locator('#part-rows > li').evaluateAll((rows) => rows.map((row) => row.getAttribute('data-title')));

test('parts are moved by Alt with an arrow, told at the ends, and pulled by their dots', async ({ page }) => {
  await makeSeries(page, 'Warp', 'Fringe', 'Sky');
  await expect(page.locator('#part-rows.can-drag')).toBeVisible();
  await tabTo(page, page.getByRole('link', { name: 'Warp', exact: true }));
  await page.keyboard.press('Alt+ArrowUp');
  await expect(page.getByText('Warp is first already.')).toBeAttached();
  await page.keyboard.press('Alt+ArrowDown');
  await expect(page.getByText('“Warp” is now Part 2.').first()).toBeVisible();
  expect(await order(page)).toEqual(['Fringe', 'Warp', 'Sky']);

  await expect(page.locator('#part-rows.can-drag')).toBeVisible();
  const grip = page.locator('[data-title="Sky"] .part-grip');
  await grip.scrollIntoViewIfNeeded();
  const [from, to] = [await grip.boundingBox(), await page.locator('[data-title="Fringe"]').boundingBox()];
  if (from === null || to === null) throw new Error('a row is out of sight');
  await page.mouse.move(from.x + from.width / 2, from.y + from.height / 2);
  await page.mouse.down();
  await page.mouse.move(to.x + 30, to.y + to.height / 2, { steps: 8 });
  await page.mouse.move(to.x + 30, to.y + 4, { steps: 4 });
  await expect(page.getByText('Sky becomes Part 1.')).toBeAttached();
  await page.mouse.up();
  await expect(page.getByText('“Sky” is now Part 1.').first()).toBeVisible();
  expect(await order(page)).toEqual(['Sky', 'Fringe', 'Warp']);
  await press(page, page.getByRole('button', { name: 'Put “Sky” back as Part 3' }));
  await expect(page.getByText('“Sky” is now Part 3.').first()).toBeVisible();
  await page.setViewportSize({ width: 390, height: 844 });
  await expectFaultless(page);
});

test.describe('by finger on a phone', () => {
  test.use({ viewport: { width: 390, height: 844 }, hasTouch: true, isMobile: true });

  test('a part waits for another one to be done; a later one is refused with the reason', async ({ page }) => {
    const series = await makeSeries(page, 'Warp', 'Fringe');
    const openSettings = async (part: string) => {
      await page.goto(series);
      await page.getByRole('link', { name: new RegExp(`^Settings of Part \\d, ${part}$`) }).tap();
    };
    await openSettings('Fringe');
    await page.getByLabel(/^It opens when she says that she has done/).selectOption({ label: 'Part 1, Warp' });
    await expect(page.getByRole('radio', { name: 'When an earlier part is done' })).toBeChecked();
    await inMain(page).getByRole('button', { name: 'Save', exact: true }).tap();
    await expect(page.getByText(/^Saved \d\d:\d\d$/).first()).toBeVisible();
    await page.goto(series);
    await expect(inMain(page).getByText(/opens when Part 1 is done/)).toBeVisible();
    await page.getByRole('button', { name: 'Move Part 2, Fringe up' }).tap();
    await page.getByRole('link', { name: 'Before you publish', exact: true }).last().tap();
    await expect(inMain(page).getByText('It waits for Part 2, which comes later, so nobody could ever open it.').first()).toBeVisible();
    await expectFaultless(page);
    await inMain(page).getByRole('link', { name: /^Open the settings of Part 1/ }).tap();
    await expect(page).toHaveURL(/\/settings#opens$/);
  });

  test('a series is taken along by keys, comes in again as a draft, and a file that is none is refused in words', async ({ page }) => {
    await page.goto('/workroom/series/low-tide/folder');
    await expectFaultless(page);
    const coming = page.waitForEvent('download');
    await press(page, page.getByRole('link', { name: 'Take it without films' }));
    const zip = await readFile(await (await coming).path());
    await press(page, inMain(page).getByRole('link', { name: 'Bring a series in' }));
    const field = page.getByLabel('Zip of the series');
    await takeFile(page, field, { name: 'low-tide.zip', mimeType: 'application/zip', buffer: zip.subarray(0, 400) });
    await press(page, inMain(page).getByRole('button', { name: 'Bring it in' }));
    await expect(inMain(page).getByRole('alert').or(inMain(page).getByText(/Nothing of it was kept/)).first()).toBeVisible();
    await expectFaultless(page);
    await field.setInputFiles({ name: 'low-tide.zip', mimeType: 'application/zip', buffer: zip });
    await inMain(page).getByRole('button', { name: 'Bring it in' }).tap();
    await expect(page).toHaveURL(/\/workroom\/series\/bring-in\/[0-9a-z]{26}$/);
    // The page opens anew by itself when the worker is done.
    await expect(inMain(page).getByText(/came in\. It is a draft with 7 parts/)).toBeVisible({ timeout: 20_000 });
    await expectFaultless(page);
    await inMain(page).getByRole('link', { name: 'Open the series' }).tap();
    await expect(page).toHaveURL(/\/workroom\/series\/low-tide-[0-9a-z-]+$/);
    await expect(inMain(page).getByText('Draft: nobody but you sees it')).toBeVisible();
    await expectFaultless(page);
  });
});
