/** The pattern piece under a teacher's hands: bands on the drawn piece by keys and by finger, two windows, three students' looms. */
import { expect, type Locator, type Page } from 'playwright/test';
import { stateOf } from './support/demo-people.ts';
import { fillPiece } from './support/fill-piece.ts';
import { makeSeries } from './support/new-series.ts';
import { expectFaultless, test } from './support/test.ts';

test.use({ storageState: stateOf('ilse'), actionTimeout: 15_000 });

const field = (page: Page, name: string): Locator => page.locator(`[name="${name}"]`);
const square = (page: Page): Locator => page.getByRole('slider', { name: /^Height of band/ });
const heightNow = async (page: Page): Promise<string> => (await square(page).getAttribute('aria-valuetext')) ?? '';

/** Opens the row of a band in the list, where it is closed. */
async function openBand(page: Page, index: number): Promise<void> {
  const row = page.locator(`#band-${index}`);
  if ((await row.locator('details').first().getAttribute('open')) === null) await row.locator('summary').first().click();
}

/** A piece of two bands, the upper one filling what the foot leaves. */
async function twoBands(page: Page): Promise<string> {
  const address = `${await makeSeries(page)}/piece`;
  await page.goto(address);
  await fillPiece(page);
  await page.getByRole('button', { name: 'Add a band, woven last' }).click();
  await field(page, 'bands.1.heightMm').fill('6');
  await expect(page.locator('.stage .cloth svg')).toHaveAttribute('aria-label', /6\scm of tabby/);
  return address;
}

test('a band is made higher, moved and split by keys, and every step is taken back', async ({ page }) => {
  await twoBands(page);
  await page.locator('.band-hit').nth(1).click();
  await square(page).focus();
  const before = await heightNow(page);
  expect(before).toMatch(/^6\scm, \d+ rows$/);
  await page.keyboard.press('Shift+ArrowUp');
  await expect(square(page)).not.toHaveAttribute('aria-valuetext', before);
  await page.keyboard.press('ControlOrMeta+z');
  await expect(square(page)).toHaveAttribute('aria-valuetext', before);

  await page.keyboard.press('Alt+ArrowDown');
  await expect(field(page, 'bands.0.heightMm')).toHaveValue(/^6/);
  await page.keyboard.press('ControlOrMeta+z');
  await expect(field(page, 'bands.1.heightMm')).toHaveValue(/^6/);

  await openBand(page, 1);
  await page.locator('#band-1').getByRole('button', { name: /^Split/ }).click();
  await expect(page.locator('.bands > li')).toHaveCount(3);
  await expect(page.getByRole('status').filter({ hasText: 'Band 2 is now two.' })).toBeAttached();
  await page.keyboard.press('ControlOrMeta+z');
  await expect(page.locator('.bands > li')).toHaveCount(2);
  await expectFaultless(page);
});

test('what is typed is kept by itself; of two windows both texts are shown, and one is chosen', async ({ page, context }) => {
  const address = await twoBands(page);
  await expect(page.getByText(/^Draft saved \d\d:\d\d/).first()).toBeVisible();
  const other = await context.newPage();
  await other.goto(address);
  await expect(field(other, 'bands.1.heightMm')).toHaveValue('6');
  await expect(other.locator('astro-island[ssr]')).toHaveCount(0);
  await openBand(other, 1);
  await field(other, 'bands.1.heightMm').fill('7');
  await expect(other.getByText(/^Draft saved \d\d:\d\d/).first()).toBeVisible();

  await field(page, 'bands.1.heightMm').fill('8');
  const told = page.getByRole('alert').filter({ hasText: 'You changed this piece in another window' });
  await expect(told).toContainText('Nothing is lost');
  await expect(field(page, 'bands.1.heightMm')).toHaveValue('8');
  await told.getByRole('button', { name: 'Take the other' }).click();
  await expect(field(page, 'bands.1.heightMm')).toHaveValue('7');
  await page.reload();
  await expect(field(page, 'bands.1.heightMm')).toHaveValue('7');
});

test('the piece is tried on three students’ looms before it is published', async ({ page }) => {
  await twoBands(page);
  await page.getByText('Try it on three students’ looms').click();
  await expect(page.locator('.try-looms').getByText('All yarn').first()).toBeVisible();
  await expect(page.locator('.try-looms svg[role="img"], .try-looms .cloth svg')).not.toHaveCount(0);
  await expectFaultless(page);
});

test.describe('by finger on a phone', () => {
  test.use({ viewport: { width: 390, height: 844 }, hasTouch: true, isMobile: true });

  test('a band is chosen with a press and pulled higher by its square', async ({ page, context }) => {
    await twoBands(page);
    await page.locator('.band-hit').nth(1).tap();
    await expect(square(page)).toBeVisible();
    await square(page).scrollIntoViewIfNeeded();
    const before = await heightNow(page);
    const box = await square(page).locator('.knob').boundingBox();
    if (box === null) throw new Error('the square is out of sight');
    const finger = await context.newCDPSession(page);
    const [x, y] = [box.x + box.width / 2, box.y + box.height / 2];
    await finger.send('Input.dispatchTouchEvent', { type: 'touchStart', touchPoints: [{ x, y }] });
    for (const by of [10, 20, 30]) await finger.send('Input.dispatchTouchEvent', { type: 'touchMove', touchPoints: [{ x, y: y + by }] });
    await finger.send('Input.dispatchTouchEvent', { type: 'touchEnd', touchPoints: [] });
    await expect(square(page)).not.toHaveAttribute('aria-valuetext', before);
    expect(await heightNow(page)).toMatch(/\scm, \d+ rows$/);
    await expectFaultless(page);
  });
});
