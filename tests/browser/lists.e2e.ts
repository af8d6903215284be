/** Gathering lists by keyboard, and what a part's readers are told of changes. In a series of its own, so that nobody else's is touched. */
import { expect, type Page } from 'playwright/test';
import { stateOf } from './support/demo-people.ts';
import { textField } from './support/lesson-text.ts';
import { makeSeries } from './support/new-series.ts';
import { expectFaultless, test } from './support/test.ts';

test.use({ storageState: stateOf('ilse') });

const inMain = (page: Page) => page.getByRole('main');

async function openList(page: Page, series: string, part: string): Promise<void> {
  await page.goto(series);
  await page.getByRole('link', { name: part, exact: true }).click();
  await inMain(page).getByRole('navigation', { name: /Pages of Part/ }).getByRole('link', { name: 'To gather' }).click();
  await expect(page.getByRole('heading', { name: 'Put something on the list' })).toBeVisible();
}

test('a thing is kept once, chosen by keyboard for a list, contradicted by another part, and put back after it was taken out', async ({ page }) => {
  test.setTimeout(120_000);
  const thing = `Bodkin ${Date.now().toString(36)}`;
  const series = await makeSeries(page, 'Dress the loom', 'First rows');
  await page.goto('/workroom/things');
  await page.getByLabel('Name').last().fill(`${thing}, blunt`);
  await page.getByLabel('What to look out for').last().fill('Its eye takes the yarn');
  await page.getByLabel('Where to get it').last().fill('A haberdasher');
  await page.getByLabel('Name').last().press('Enter');
  await expect(inMain(page).getByText('Look out for: Its eye takes the yarn').first()).toBeVisible();
  await expectFaultless(page);

  await openList(page, series, 'Dress the loom');
  // The plain list that stands there without script is a combobox too.
  await page.locator('input[role="combobox"]').focus();
  await page.keyboard.type(thing.toLowerCase());
  await page.keyboard.press('Enter');
  const form = page.locator('#add-line');
  await expect(form.getByLabel('Name')).toHaveValue(`${thing}, blunt`);
  await form.getByLabel('Or how much in words').fill('1');
  await page.keyboard.press('Enter');
  await expect(page.getByRole('listitem').filter({ hasText: `${thing}, blunt` }).getByText('Look out for: Its eye takes the yarn')).toBeVisible();

  await openList(page, series, 'First rows');
  await page.locator('#add-line').getByLabel('Name').fill(`${thing}, pointed`);
  await page.keyboard.press('Enter');
  await page.getByRole('link', { name: 'The lists of all parts as one' }).click();
  await expect(inMain(page).getByText(`It asks for “${thing}, pointed”, Part 1 for “${thing}, blunt”.`)).toBeVisible();
  await page.setViewportSize({ width: 390, height: 844 });
  await expectFaultless(page);
  await page.getByRole('link', { name: 'The line in Part 1' }).press('Enter');
  await expect(page).toHaveURL(/\/gather#line-[0-9a-z]{26}$/);

  await page.getByRole('button', { name: `Take out ${thing}, blunt` }).press('Enter');
  await page.getByRole('button', { name: 'Take it out' }).press('Enter');
  await expect(page.getByRole('heading', { name: 'Taken off the list' })).toBeVisible();
  await page.getByRole('button', { name: 'Put it back' }).press('Enter');
  await expect(page.getByRole('listitem').filter({ hasText: `${thing}, blunt` })).toBeVisible();
  await expectFaultless(page);
});

test.describe('without script', () => {
  test.use({ javaScriptEnabled: false });
  test('a kept thing is chosen from a plain list and comes back in the form', async ({ page }) => {
    const thing = `Lease rod ${Date.now().toString(36)}`;
    const series = await makeSeries(page, 'Dress the loom');
    await page.goto('/workroom/things');
    await page.locator('#keep-thing').getByLabel('Name').fill(thing);
    await page.locator('#keep-thing').getByRole('button', { name: 'Keep it' }).click();
    await openList(page, series, 'Dress the loom');
    await page.getByLabel('One of your things').selectOption({ label: `${thing} (tool)` });
    await page.getByRole('button', { name: 'Fill it in' }).click();
    await expect(page.locator('#add-line').getByLabel('Name')).toHaveValue(thing);
  });
});

test('who has read a part is told quietly what its teacher changed since, until she says that she has read it', async ({ page, browser }) => {
  test.setTimeout(120_000);
  const said = `Keep the label of each yarn (${Date.now().toString(36)}).`;
  const student = await (await browser.newContext({ storageState: stateOf('maud'), viewport: { width: 390, height: 844 } })).newPage();
  const part = `${new URL(process.env['FELLMARK_TEST_URL'] ?? '').origin}/series/low-tide/1`;
  await student.goto(part);
  await expect(student.getByText(/Changed since you read it/)).toHaveCount(0);

  await page.goto('/workroom/series/low-tide');
  await page.getByRole('link', { name: 'Gather and plan', exact: true }).click();
  await textField(page).focus();
  await page.keyboard.press('Control+End');
  await page.keyboard.type(`\n\n${said}`);
  await inMain(page).getByRole('button', { name: 'Save', exact: true }).click();
  await expect(page.getByText(/^Saved \d\d:\d\d$/).first()).toBeVisible();
  await page.goto('/workroom/series/low-tide');
  await inMain(page).getByRole('button', { name: 'Publish the changes of Part 1' }).press('Enter');
  await expect(page.getByText('Part 1 is published.').first()).toBeVisible();

  await student.goto(part);
  await student.getByText('Changed since you read it: one passage').press('Enter');
  await expect(student.getByRole('region', { name: 'What changed' }).getByText(said)).toBeVisible();
  await expectFaultless(student);
  await student.getByRole('button', { name: 'I have read it' }).press('Enter');
  await expect(student.getByText(/Changed since you read it/)).toHaveCount(0);
  await expect(student.getByRole('main').getByText(said)).toBeVisible();
  await student.context().close();
});
