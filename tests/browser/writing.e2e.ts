/** Writing a part in the real editor: hostile texts, suggestions by keyboard, a lost line, a long text. */
import { expect, type Page } from 'playwright/test';
import { press, tabTo } from './support/by-keys.ts';
import { stateOf } from './support/demo-people.ts';
import { expectText, fillText, textField } from './support/lesson-text.ts';
import { expectFaultless, test } from './support/test.ts';

test.use({ storageState: stateOf('ilse') });

const inMain = (page: Page) => page.getByRole('main');
const remarks = (page: Page) => inMain(page).getByRole('region', { name: 'Line by line' });

/** A part of a series of its own, so that nobody else's text is touched. */
async function openNewPart(page: Page): Promise<void> {
  await page.goto('/workroom/series/new');
  await page.getByLabel('Title').fill(`Spring tide ${Date.now().toString(36)}`);
  await inMain(page).getByRole('button', { name: 'Make the series' }).click();
  await page.getByLabel('Put in a part').fill('One');
  await inMain(page).getByRole('button', { name: 'Put it in', exact: true }).first().click();
  await page.getByRole('link', { name: 'One', exact: true }).click();
  await expect(textField(page)).toBeVisible();
}

/** Each is refused at line 3, in words of ours. */
const HOSTILE: readonly (readonly [source: string, reason: RegExp])[] = [
  ['import x from "fs"', /begin program code/],
  ['{process.env.KEY}', /Curly braces mean code/],
  ['<script>alert(1)</script>', /lessons hold no HTML/],
  ['<img src=x onerror=alert(1)>', /straight quotes/],
  ['<iframe src="https://e"/>', /lessons hold no HTML/],
  ['<svg><a href="javascript:1"/></svg>', /lessons hold no HTML/],
  ['<Caution title="Nails" onClick="x">Words.</Caution>', /has no "onClick"/],
  ['<constructor/>', /lessons hold no HTML/],
  ['<!-- c -->', /Hidden remarks/],
  ['[a](java&#115;cript:alert(1))', /A link begins with/],
  ['[a](//evil.example)', /cannot begin with/],
  ['<Video name="../../etc/passwd"/>', /does not work/],
  ['![a](data:image/svg+xml,x)', /A picture is named/],
  ['Wind \u202E38 ends', /writing direction/],
];

test.describe('on a phone', () => {
  test.use({ viewport: { width: 390, height: 844 }, hasTouch: true, isMobile: true });

  test('hostile texts typed into the editor run nowhere and are told with line and reason', async ({ page }) => {
    test.setTimeout(120_000);
    page.on('dialog', (dialog) => { throw new Error(`a dialog opened: ${dialog.message()}`); });
    await openNewPart(page);
    for (const [source, reason] of HOSTILE) {
      await fillText(page, `Take the frame.\n\n${source}`);
      await expect(remarks(page).getByText(reason).first()).toBeVisible();
      await expect(remarks(page).getByRole('link', { name: 'Line 3' }).first()).toBeVisible();
    }
    await fillText(page, 'Take the frame.');
    await expect(remarks(page).getByText('It can be read as it stands.')).toBeVisible();
    await expectFaultless(page);
  });
});

test('by keyboard alone: a step and an amount from the palette, a remark, and out by Tab', async ({ page }) => {
  await page.goto('/workroom/series/low-tide');
  await press(page, page.getByRole('link', { name: 'First rows of tabby', exact: true }));
  await tabTo(page, textField(page));
  await page.keyboard.press('Control+End');
  await page.keyboard.type('\n\n/step');
  await expect(page.getByRole('option', { name: /Step to tick/ })).toBeVisible();
  await page.keyboard.press('Enter');
  await page.keyboard.type('Wind ');
  await page.keyboard.press('Control+k');
  await expect(page.getByRole('option', { name: 'Caution' })).toBeVisible();
  await page.keyboard.type('Hanging cord');
  await expect(page.getByRole('option', { name: 'Caution' })).toHaveCount(0);
  await expect(page.getByRole('option', { name: /Hanging cord.*\d/ })).toBeVisible();
  await page.keyboard.press('Enter');
  await expect(textField(page)).toContainText('Wind <Amount of="cord"/>');
  await page.keyboard.type(' {x}');
  await expect(remarks(page).getByText(/Curly braces mean code/).first()).toBeVisible();
  await page.keyboard.press('Tab');
  await expect(textField(page)).not.toBeFocused();
  // What stood here before stands again, so that other journeys find it.
  await press(page, page.getByRole('link', { name: 'Versions', exact: true }));
  await press(page, inMain(page).getByRole('button', { name: /Take it up again.*Version/ }).first());
  await expect(page.getByText(/Taken up again/)).toBeVisible();
});

test('what is typed without a line survives a reload and goes out when there is signal', async ({ browser, baseURL }) => {
  // A page of its own: a browser tells its console of every lost line.
  const context = await browser.newContext({ storageState: stateOf('ilse'), ...(baseURL === undefined ? {} : { baseURL }) });
  const page = await context.newPage();
  await openNewPart(page);
  await context.route('**/api/workroom/lesson-draft', (route) => route.abort('internetdisconnected'));
  await fillText(page, 'Wind it tight.');
  await expect(inMain(page).getByText('Kept on this device. It goes out when there is signal.')).toBeVisible();
  await page.reload();
  await expectText(page, 'Wind it tight.');
  await expect(inMain(page).getByText(/could not send stands in the text again/)).toBeVisible();
  await context.unroute('**/api/workroom/lesson-draft');
  await inMain(page).getByRole('button', { name: 'Save', exact: true }).click();
  await expect(page.getByText(/^Saved \d\d:\d\d$/)).toBeVisible();
  await page.reload();
  await expectText(page, 'Wind it tight.');
  await expect(inMain(page).getByText(/could not send/)).toHaveCount(0);
  await context.close();
});

test('a picture that is dropped asks what it shows, goes into the text and stands in the preview', async ({ page }) => {
  await openNewPart(page);
  await fillText(page, 'Look at the edge.');
  await page.getByTestId('picture-chooser').setInputFiles({ name: 'Left edge.png', mimeType: 'image/png', buffer: await squarePicture(page) });
  const dialog = page.getByRole('dialog', { name: 'What does the picture show?' });
  await dialog.getByRole('button', { name: 'Put it in' }).click();
  await expect(dialog.getByText(/What it shows is missing/)).toBeVisible();
  await dialog.getByLabel('In words, for those who do not see it').fill('A straight left edge');
  await dialog.getByRole('button', { name: 'Put it in' }).click();
  await expect(textField(page)).toContainText('<Picture name="left-edge" alt="A straight left edge"/>');
  await expect(page.locator('#preview-drawn').getByRole('img', { name: 'A straight left edge' })).toBeVisible();
});

/** A photo as a browser writes one. */
async function squarePicture(page: Page): Promise<Buffer> {
  const bytes = await page.evaluate(async () => {
    const canvas = document.createElement('canvas');
    canvas.width = canvas.height = 64;
    canvas.getContext('2d')?.fillRect(8, 8, 48, 48);
    const blob = await new Promise<Blob | null>((resolve) => { canvas.toBlob(resolve, 'image/png'); });
    return [...new Uint8Array((await blob?.arrayBuffer()) ?? new ArrayBuffer(0))];
  });
  return Buffer.from(bytes);
}

test('a text of 170 kB is typed into without waiting, and its remarks come', async ({ page }) => {
  test.setTimeout(120_000);
  await openNewPart(page);
  const long = Array.from({ length: 1_400 }, (_, number) => `Row ${number} of the tabby goes over the first end, under the second, and so on to the right edge of the cloth, where it turns.`).join('\n\n');
  await textField(page).evaluate((field, text) => {
    const data = new DataTransfer();
    data.setData('text/plain', text);
    field.dispatchEvent(new ClipboardEvent('paste', { clipboardData: data, bubbles: true, cancelable: true }));
  }, long);
  await expect(page.getByText(/^Saved \d\d:\d\d$/)).toBeVisible({ timeout: 30_000 });
  await textField(page).focus();
  await page.keyboard.press('Control+End');
  await page.keyboard.type('\n\nEnd {x}.');
  await expect(remarks(page).getByText(/Curly braces mean code/)).toBeVisible();
  await expect(remarks(page).getByRole('link', { name: 'Line 2801' })).toBeVisible();
});
