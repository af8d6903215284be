/** Gathering lists by keyboard, and what a part's readers are told of changes. In a series of its own, so that nobody else's is touched. */
import { expect, type Page } from 'playwright/test';
import { press, tabTo, typeInto } from './support/by-keys.ts';
import { stateOf } from './support/demo-people.ts';
import { textField } from './support/lesson-text.ts';
import { makeSeries } from './support/new-series.ts';
import { expectFaultless, test } from './support/test.ts';

test.use({ storageState: stateOf('ilse') });

const inMain = (page: Page) => page.getByRole('main');

/** By keys. */
async function openList(page: Page, series: string, part: string): Promise<void> {
  await page.goto(series);
  await press(page, page.getByRole('link', { name: part, exact: true }));
  await press(page, inMain(page).getByRole('navigation', { name: /Pages of Part/ }).getByRole('link', { name: 'To gather' }));
  await expect(page.getByRole('heading', { name: 'Put something on the list' })).toBeVisible();
}

test('a thing is kept once, chosen by keyboard for a list, contradicted by another part, and put back after it was taken out', async ({ page }) => {
  test.setTimeout(120_000);
  const thing = `Bodkin ${Date.now().toString(36)}`;
  const series = await makeSeries(page, 'Dress the loom', 'First rows');
  await page.goto('/workroom/things');
  for (const [label, words] of [['Name', `${thing}, blunt`], ['What to look out for', 'Its eye takes the yarn'], ['Where to get it', 'A haberdasher']] as const) await typeInto(page, page.getByLabel(label).last(), words);
  await page.keyboard.press('Enter');
  await expect(inMain(page).getByText('Look out for: Its eye takes the yarn').first()).toBeVisible();
  await expectFaultless(page);

  await openList(page, series, 'Dress the loom');
  // The plain list that stands there without script is a combobox too.
  await tabTo(page, page.locator('input[role="combobox"]'));
  await page.keyboard.type(thing.toLowerCase());
  await page.keyboard.press('Enter');
  const form = page.locator('#add-line');
  await expect(form.getByLabel('Name')).toHaveValue(`${thing}, blunt`);
  await typeInto(page, form.getByLabel('Or how much in words'), '1');
  await page.keyboard.press('Enter');
  await expect(page.getByRole('listitem').filter({ hasText: `${thing}, blunt` }).getByText('Look out for: Its eye takes the yarn')).toBeVisible();

  await openList(page, series, 'First rows');
  await typeInto(page, page.locator('#add-line').getByLabel('Name'), `${thing}, pointed`);
  await page.keyboard.press('Enter');
  await press(page, page.getByRole('link', { name: 'The lists of all parts as one' }));
  await expect(inMain(page).getByText(`It asks for “${thing}, pointed”, Part 1 for “${thing}, blunt”.`)).toBeVisible();
  await page.setViewportSize({ width: 390, height: 844 });
  await expectFaultless(page);
  await press(page, page.getByRole('link', { name: 'The line in Part 1' }));
  await expect(page).toHaveURL(/\/gather#line-[0-9a-z]{26}$/);

  await press(page, page.getByRole('button', { name: `Take out ${thing}, blunt` }));
  await press(page, page.getByRole('button', { name: 'Take it out' }));
  await expect(page.getByRole('heading', { name: 'Taken off the list' })).toBeVisible();
  await press(page, page.getByRole('button', { name: 'Put it back' }));
  await expect(page.getByRole('listitem').filter({ hasText: `${thing}, blunt` })).toBeVisible();
  await expectFaultless(page);
});

test.describe('on a phone without script', () => {
  test.use({ javaScriptEnabled: false, viewport: { width: 390, height: 844 }, hasTouch: true, isMobile: true });
  test('a kept thing is chosen from a plain list and comes back in the form', async ({ page }) => {
    const thing = `Lease rod ${Date.now().toString(36)}`;
    const series = await makeSeries(page, 'Dress the loom');
    await page.goto('/workroom/things');
    await page.locator('#keep-thing').getByLabel('Name').fill(thing);
    await page.locator('#keep-thing').getByRole('button', { name: 'Keep it' }).tap();
    await expect(inMain(page).getByText(thing).first()).toBeVisible();
    await openList(page, series, 'Dress the loom');
    await page.getByLabel('One of your things').selectOption({ label: `${thing} (tool)` });
    await page.getByRole('button', { name: 'Fill it in' }).tap();
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
  await press(page, page.getByRole('link', { name: 'Gather and plan', exact: true }));
  await tabTo(page, textField(page));
  await page.keyboard.press('Control+End');
  await page.keyboard.type(`\n\n${said}`);
  await press(page, inMain(page).getByRole('button', { name: 'Save', exact: true }));
  await expect(page.getByText(/^Saved \d\d:\d\d$/).first()).toBeVisible();
  await page.goto('/workroom/series/low-tide');
  await press(page, inMain(page).getByRole('button', { name: 'Publish the changes of Part 1' }));
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
