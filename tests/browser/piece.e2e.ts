/** A teacher describes a small piece from nothing, by keyboard alone, and once more in a browser that runs no script. */
import { randomBytes } from 'node:crypto';
import { expect, type Locator, type Page } from 'playwright/test';
import { press, typeInto } from './support/by-keys.ts';
import { stateOf } from './support/demo-people.ts';
import { expectFaultless, test } from './support/test.ts';

test.use({ storageState: stateOf('ilse') });

const field = (page: Page, name: string): Locator => page.locator(`[name="${name}"]`);
/** A series of this journey's own, without a piece; answers the address of its piece. */
async function newSeries(page: Page): Promise<string> {
  await page.goto('/workroom/series/new');
  await typeInto(page, page.getByLabel('Title'), `Small Weir ${randomBytes(3).toString('hex')}`);
  await page.keyboard.press('Enter');
  await page.waitForURL(/\/workroom\/series\/small-weir-/);
  return `${new URL(page.url()).pathname}/piece`;
}

test('a piece is described by keyboard, drawn as it grows, refused with a sentence when it cannot be, and saved', async ({ page }) => {
  const address = await newSeries(page);
  await page.goto(address);
  await expect(page.getByText('The piece is drawn here as soon as it can be woven')).toBeVisible();
  await expect(page.locator('astro-island[ssr]')).toHaveCount(0);
  for (const [name, text] of [
    ['size.widthMm', '30'], ['size.heightMm', '40'], ['loom.insideWidthMm', '20'], ['loom.insideHeightMm', '60'], ['loom.nailPitchMm', '10'],
    ['warp.yarn.grist', '400'], ['yarns.0.grist', '180'],
  ] as const) await typeInto(page, field(page, name), text);

  await test.step('a loom too small is said at its field, and everything typed stays', async () => {
    await expect(field(page, 'loom.insideWidthMm')).toHaveAttribute('aria-invalid', 'true');
    await page.keyboard.press('Enter');
    const told = page.getByRole('alert');
    await expect(told).toBeFocused();
    await expect(told).toContainText('Nothing typed is lost');
    await expect(field(page, 'yarns.0.grist')).toHaveValue('180');
    await expectFaultless(page);
  });

  await test.step('on a loom that is wide enough it is drawn and reckoned', async () => {
    await typeInto(page, field(page, 'loom.insideWidthMm'), '40');
    await expect(page.locator('.stage .cloth svg')).toHaveAttribute('aria-label', /30\scm wide\. .* 40\scm of tabby/);
    await expect(page.getByRole('row', { name: /Warp ends/ })).toContainText('61');
  });

  await test.step('a second band is put in, moved, and told aloud', async () => {
    await press(page, page.getByRole('button', { name: 'Add a band, woven last' }));
    await expect(field(page, 'bands.1.technique')).toBeFocused();
    await typeInto(page, field(page, 'bands.1.heightMm'), '12,5');
    await press(page, page.getByRole('button', { name: 'Weave band 2 sooner' }));
    await expect(page.getByRole('status').filter({ hasText: 'Band 2 is now woven first.' })).toBeAttached();
    await expect(field(page, 'bands.0.heightMm')).toHaveValue('12,5');
  });

  await typeInto(page, field(page, 'size.heightMm'), '41');
  await page.keyboard.press('Enter');
  await expect(page.getByText('The piece is saved.')).toBeVisible();
  await expect(page.getByText(/Saved today/)).toBeVisible();
  await page.reload();
  await expect(field(page, 'size.heightMm')).toHaveValue('41');
  await expect(field(page, 'bands.0.heightMm')).toHaveValue('12.5');
  await expectFaultless(page);
});

test('without script the same form keeps what was typed through every button', async ({ browser }) => {
  const context = await browser.newContext({ storageState: stateOf('ilse'), javaScriptEnabled: false });
  const page = await context.newPage();
  await page.goto(await newSeries(page));
  for (const [name, text] of [['size.widthMm', '12 in'], ['size.heightMm', '40'], ['loom.insideHeightMm', '60'], ['loom.nailPitchMm', '10'], ['warp.yarn.grist', '400']] as const) await field(page, name).fill(text);

  await page.getByRole('button', { name: 'Add a band, woven last' }).click();
  await expect(field(page, 'size.widthMm')).toHaveValue('12 in');
  await expect(page.getByRole('alert')).toHaveCount(0);
  await field(page, 'bands.1.technique').selectOption('twining');
  await page.locator('#band-1 button[value="look"]').click();
  await expect(field(page, 'bands.1.rows')).toHaveValue('2');

  await page.getByRole('button', { name: 'Save the piece' }).first().click();
  await expect(page.getByRole('alert')).toContainText('Metres in 100 g is missing.');
  await expect(field(page, 'size.widthMm')).toHaveValue('12 in');
  await field(page, 'yarns.0.grist').fill('180');
  await page.getByRole('button', { name: 'Save the piece' }).first().click();
  await expect(page.getByText('The piece is saved.')).toBeVisible();
  await expect(field(page, 'size.widthMm')).toHaveValue('12 in');
  await expect(page.locator('.stage .cloth svg')).toHaveAttribute('aria-label', /2 rows of twining/);
  await context.close();
});
