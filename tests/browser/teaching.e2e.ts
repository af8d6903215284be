/** A teacher makes a series from nothing, puts it before students, and takes it back: by finger on a phone, and by mouse without script. */
import { randomBytes } from 'node:crypto';
import { expect, type Locator, type Page } from 'playwright/test';
import { press as pressKey, tabTo } from './support/by-keys.ts';
import { stateOf } from './support/demo-people.ts';
import { fillPiece } from './support/fill-piece.ts';
import { expectText, fillText, textField } from './support/lesson-text.ts';
import { expectFaultless, test } from './support/test.ts';

const newTitle = (): string => `Ebb ${randomBytes(3).toString('hex')}`;
const inMain = (page: Page) => page.getByRole('main');
const PHONE = { viewport: { width: 390, height: 844 }, hasTouch: true, isMobile: true };
const MOUSE = { viewport: { width: 1280, height: 900 } };
/** By finger where there is one. */
const hit = (page: Page, wanted: Locator): Promise<void> => (page.viewportSize()?.width === PHONE.viewport.width ? wanted.tap() : wanted.click());
const press = (page: Page, name: string | RegExp): Promise<void> => hit(page, inMain(page).getByRole('button', { name, exact: true }).first());

async function makeSeries(page: Page, title: string): Promise<string> {
  await page.goto('/workroom/series/new');
  await page.getByLabel('Title').fill(title);
  await press(page, 'Make the series');
  await expect(page.getByRole('heading', { level: 1, name: title })).toBeVisible();
  return new URL(page.url()).pathname;
}

async function putInPart(page: Page, title: string): Promise<void> {
  await page.getByLabel('Put in a part').fill(title);
  await press(page, 'Put it in');
  await expect(page.getByRole('heading', { level: 3, name: title })).toBeVisible();
}

async function writePart(page: Page, desk: string, title: string, words: string, withScript = true): Promise<void> {
  await page.goto(desk);
  await hit(page, page.getByRole('link', { name: title, exact: true }));
  await fillText(page, words, withScript);
  await press(page, 'Save');
  await expect(inMain(page).getByText(/^Saved \d\d:\d\d$/).or(page.getByRole('status').filter({ hasText: /^Saved \d\d:\d\d$/ })).first()).toBeVisible();
}

async function describePiece(page: Page, desk: string, withScript: boolean): Promise<void> {
  await page.goto(`${desk}/piece`);
  await fillPiece(page, {}, withScript);
  await press(page, 'Save the piece');
  await expect(page.getByText('The piece is saved.')).toBeVisible();
}

const parts = (page: Page) => inMain(page).getByRole('region', { name: 'Parts', exact: true }).getByRole('listitem').getByRole('heading', { level: 3 });

for (const javaScriptEnabled of [true, false]) {
  test.describe(javaScriptEnabled ? 'on a phone' : 'without script', () => {
    test.use({ ...javaScriptEnabled ? PHONE : MOUSE, javaScriptEnabled, storageState: stateOf('ilse') });

    test('a series comes from nothing to its students, and back', async ({ page, browser }) => {
      test.setTimeout(150_000);
      const title = newTitle();
      const desk = await makeSeries(page, title);
      await expect(inMain(page).getByText('The summary is missing. It is what people read first.', { exact: true })).toBeVisible();
      await expect(inMain(page).getByRole('button', { name: 'Publish' })).toHaveAttribute('aria-disabled', 'true');

      await putInPart(page, 'Weave the foot');
      await putInPart(page, 'Dress the loom');
      await press(page, 'Move Part 2, Dress the loom up');
      await expect(page.getByText('“Dress the loom” is now Part 1.')).toBeVisible();
      await expect(parts(page)).toHaveText(['Dress the loom', 'Weave the foot']);

      // A mistake is kept, told with its line, and mended.
      await writePart(page, desk, 'Dress the loom', 'Take the frame.\n\nWind {1+1} ends.', javaScriptEnabled);
      await expect(inMain(page).getByRole('link', { name: 'Line 3' })).toBeVisible();
      await expect(inMain(page).getByText(/Curly braces mean code/).first()).toBeVisible();
      await writePart(page, desk, 'Dress the loom', 'Take the frame.\n\n<Step id="wind">Wind <Amount of="ends"/>.</Step>', javaScriptEnabled);
      await expect(inMain(page).getByText('It can be read as it stands.')).toBeVisible();
      if (javaScriptEnabled) await expectFaultless(page);

      await hit(page, page.getByRole('link', { name: 'Settings', exact: true }));
      await hit(page, page.getByLabel('Ask for a photo'));
      await page.getByLabel('What it shall show').fill('Show your warped loom');
      await hit(page, page.getByLabel('Free to read'));
      await press(page, 'Save');
      await expect(page.getByText('asks for a photo').first()).toBeVisible();

      await hit(page, page.getByRole('link', { name: 'To gather', exact: true }));
      await page.getByLabel('Name', { exact: true }).fill('Blunt needle');
      await page.getByLabel('Or how much in words').fill('1');
      await press(page, 'Put it on the list');
      await expect(inMain(page).getByRole('listitem').filter({ hasText: 'Blunt needle' }).first()).toBeVisible();

      await writePart(page, desk, 'Weave the foot', '<Step id="weave">Weave eight rows.</Step>', javaScriptEnabled);
      await hit(page, page.getByRole('link', { name: 'Settings', exact: true }));
      await hit(page, page.getByLabel('On a date, for everybody'));
      await page.getByLabel('Day and time').fill('2020-01-01T09:00');
      await press(page, 'Save');
      await expect(page.getByLabel('Day and time')).toHaveAccessibleDescription(/This moment has passed/);
      await expect(page.getByLabel('Day and time')).toHaveValue('2020-01-01T09:00');
      await page.getByLabel('Day and time').fill('');
      await hit(page, page.getByLabel('After you have seen a photo'));
      await page.getByLabel('It opens when you say weave on to the photo of').selectOption({ label: 'Part 1, Dress the loom' });
      await press(page, 'Save');
      await expect(page.getByText('opens after you say weave on to the photo of Part 1').first()).toBeVisible();

      await page.goto(desk);
      await page.getByLabel('Summary').fill('A small piece of evening sea.');
      await page.getByLabel('Price of a seat').fill('dear');
      await press(page, 'Save');
      await expect(page.getByLabel('Price of a seat')).toHaveAccessibleDescription(/not a price in EUR/);
      await expect(page.getByLabel('Summary')).toHaveValue('A small piece of evening sea.');
      await page.getByLabel('Price of a seat').fill('42');
      await press(page, 'Save');
      await expect(page.getByLabel('Price of a seat')).toHaveValue('42.00');

      await describePiece(page, desk, javaScriptEnabled);
      await page.goto(desk);
      await expect(inMain(page).getByText('Nothing stands in the way.')).toBeVisible();

      await press(page, 'Publish');
      await hit(page, page.getByRole('dialog').getByRole('button', { name: 'Publish' }));
      await expect(inMain(page).getByText(/Open to buyers since/)).toBeVisible();

      const student = await browser.newContext({ storageState: stateOf('amara'), baseURL: new URL(page.url()).origin });
      const shop = await student.newPage();
      const address = desk.replace('/workroom', '');
      await shop.goto(address);
      await expect(shop.getByRole('heading', { level: 1, name: title })).toBeVisible();
      await shop.goto(`${address}/1`);
      await expect(shop.getByText(/Wind \d+/)).toBeVisible();

      await press(page, 'Take back to draft');
      await hit(page, page.getByRole('dialog').getByRole('button', { name: 'Take back to draft' }));
      await expect(inMain(page).getByText('Draft again: nobody new can buy it')).toBeVisible();
      expect((await shop.goto(address))?.status()).toBe(404);
      await student.close();
    });

    test('a part taken out is put back where it stood', async ({ page }) => {
      await makeSeries(page, newTitle());
      for (const title of ['One', 'Two', 'Three']) await putInPart(page, title);
      await press(page, 'Take out Part 2, Two');
      await expect(inMain(page).getByRole('heading', { name: 'Part 2 taken out' })).toBeVisible();
      await expect(parts(page)).toHaveText(['One', 'Three']);
      await press(page, 'Put it back');
      await expect(page.getByText('“Two” is back as Part 2.')).toBeVisible();
      await expect(parts(page)).toHaveText(['One', 'Two', 'Three']);
    });

    test('of two windows none writes over the other unasked', async ({ page, context }) => {
      const desk = await makeSeries(page, newTitle());
      await putInPart(page, 'One');
      await hit(page, page.getByRole('link', { name: 'One', exact: true }));
      const other = await context.newPage();
      await other.goto(page.url());
      await writePart(other, desk, 'One', 'Theirs.', javaScriptEnabled);
      await fillText(page, 'Mine.', javaScriptEnabled);
      await press(page, 'Save');
      await expect(inMain(page).getByText('Another window saved this text in the meantime')).toBeVisible();
      await expectText(page, 'Mine.', javaScriptEnabled);
      await press(page, 'Keep mine');
      await expect(page.getByText(/^Saved \d\d:\d\d$/).first()).toBeVisible();
      await page.reload();
      await expectText(page, 'Mine.', javaScriptEnabled);

      // The text that was written over is among the earlier ones, and is taken up again.
      await hit(page, page.getByRole('link', { name: 'Versions', exact: true }));
      await page.getByLabel('From').selectOption({ index: 1 });
      await press(page, 'Compare');
      await expect(inMain(page).getByRole('region', { name: 'What changed', exact: true }).last()).toContainText('Theirs.');
      await hit(page, inMain(page).getByRole('listitem').filter({ hasText: 'Set aside' }).getByRole('button', { name: /Take it up again/ }));
      await expect(page.getByText('Taken up again. The text that stood here is kept among the versions.')).toBeVisible();
      await expectText(page, 'Theirs.', javaScriptEnabled);
    });
  });
}

test.describe('by keyboard alone', () => {
  test.use({ storageState: stateOf('ilse') });

  test('a part moves up step by step, and an amount is put in from the plan', async ({ page }) => {
    await makeSeries(page, newTitle());
    for (const title of ['One', 'Two', 'Three']) await putInPart(page, title);
    await tabTo(page, inMain(page).getByRole('button', { name: 'Move Part 3, Three up' }));
    for (const order of [['One', 'Three', 'Two'], ['Three', 'One', 'Two']]) {
      await page.keyboard.press('Enter');
      await expect(parts(page)).toHaveText(order);
    }
    await expect(page.locator(':focus')).toHaveAccessibleName('Part 1, Three is first already');

    await page.goto('/workroom/series/low-tide');
    await pressKey(page, page.getByRole('link', { name: 'Off the loom', exact: true }));
    await expect(textField(page)).toBeVisible();
    await tabTo(page, page.getByRole('combobox', { name: 'Amount from the plan' }));
    await page.keyboard.type('Hanging cord');
    await page.keyboard.press('Enter');
    await expect(textField(page)).toBeFocused();
    await expect(textField(page)).toContainText('<Amount of="cord"/>');
    await page.keyboard.press('Control+z');
    await page.keyboard.press('Control+s');
    await expect(page.getByText(/^Saved \d\d:\d\d$/)).toBeVisible();
  });
});
