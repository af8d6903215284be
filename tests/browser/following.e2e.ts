/**
 * From a seat to a photo: a student tells her loom, ticks what she gathers, follows the steps, and shows her warped loom.
 * With script everything answers at once; without it every step is a form that does the same.
 */
import { expect, type Browser, type Page } from 'playwright/test';
import sharp from 'sharp';
import { stateOf } from './support/demo-people.ts';
import { newStudent } from './support/take-seat.ts';
import { expectFaultless, test } from './support/test.ts';

const jpeg = (): Promise<Buffer> => sharp({ create: { width: 900, height: 600, channels: 3, background: '#8a7a66' } }).jpeg().toBuffer();
const tick = (page: Page, name: RegExp) => page.getByRole('checkbox', { name }).first();
const step = (page: Page, words: RegExp) => page.getByRole('button', { name: words });
const MARK = /^Done: Mark the middle/;

async function tellLoom(page: Page, fields: Readonly<Record<string, string>>): Promise<void> {
  for (const [label, text] of Object.entries(fields)) await page.getByLabel(label, { exact: true }).fill(text);
}

/** Another browser of the same person: only the cookies go along. */
async function otherBrowser(browser: Browser, page: Page): Promise<Page> {
  const context = await browser.newContext({ storageState: { cookies: await page.context().cookies(), origins: [] } });
  return context.newPage();
}

test('a student tells her loom, gathers, follows the steps and shows her photo', async ({ page, request, browser }) => {
  test.setTimeout(150_000);
  await newStudent(page, request);
  await page.goto('/loom');
  await expectFaultless(page);

  await test.step('an impossible loom is told at its field, and nothing typed is lost', async () => {
    await page.goto('/series/low-tide/piece');
    await expect(page.getByRole('status').first()).toHaveText('It fits your loom');
    await tellLoom(page, { 'Inside width': '3 mm', 'Nail spacing': '8' });
    await expect(page.getByText('Too narrow for a frame. Between 5 cm and 300 cm works.').first()).toBeVisible();
    await page.getByRole('button', { name: 'Keep my piece' }).click();
    await expect(page.getByRole('alert')).toContainText('Too narrow for a frame.');
    await expect(page.getByLabel('Nail spacing', { exact: true })).toHaveValue('8');
  });

  await test.step('her own loom is kept, and every amount follows', async () => {
    await tellLoom(page, { 'Inside width': '36,0', 'Inside height': '64', 'Nail spacing': '8', 'Width of your piece': '30' });
    await page.getByLabel('Doubled', { exact: true }).check();
    await expect(page.getByRole('status').first()).toHaveText('It fits your loom');
    await page.getByRole('button', { name: 'Keep my piece' }).click();
    await expect(page.getByText('Your piece is kept. Every amount is reckoned for it.')).toBeVisible();
    await page.goto('/series/low-tide/2');
    await expect(page.getByText(/Reckoned for your loom: 36\scm inside, nails every 8\smm, doubled ends: 80 ends/)).toBeVisible();
    await expect(page.getByText(/until\s+80\sends\s+stand/).first()).toBeVisible();
  });

  await test.step('a thing ticked is ticked after a reload, in every list and in a second browser', async () => {
    await page.goto('/series/low-tide/gather');
    const sent = page.waitForResponse((response) => response.url().endsWith('/api/ticks'));
    await tick(page, /^Blunt needle/).check();
    await expect(page.getByText('1 of 34 gathered')).toBeVisible();
    expect((await sent).ok()).toBe(true);
    await page.reload();
    await expect(tick(page, /^Blunt needle/)).toBeChecked();
    const second = await otherBrowser(browser, page);
    await second.goto('/series/low-tide/gather?part=7');
    await expect(tick(second, /^Blunt needle/)).toBeChecked();
    await second.context().close();
  });

  await test.step('a tick without signal is kept here, and goes out by itself', async () => {
    // In a browser whose console is not watched: it complains of the signal that is taken away.
    const away = await otherBrowser(browser, page);
    await away.goto('/series/low-tide/gather');
    await expect(away.getByRole('button', { name: /^Print/ })).toBeVisible();
    await away.context().setOffline(true);
    await tick(away, /^Eye protection/).check();
    await expect(away.getByText('No signal. Ticks are kept here.')).toBeVisible();
    await away.context().setOffline(false);
    await expect(away.getByText('No signal. Ticks are kept here.')).toBeHidden({ timeout: 15_000 });
    await away.context().close();
    await page.reload();
    await expect(tick(page, /^Eye protection/)).toBeChecked();
  });

  await test.step('steps are ticked by keyboard, and the fell moves on', async () => {
    await page.goto('/series/low-tide/2');
    await step(page, MARK).focus();
    const sent = page.waitForResponse((response) => response.url().endsWith('/api/ticks'));
    await page.keyboard.press('Space');
    await expect(step(page, MARK)).toHaveAttribute('aria-pressed', 'true');
    expect((await sent).ok()).toBe(true);
    await page.reload();
    await expect(step(page, MARK)).toHaveAttribute('aria-pressed', 'true');
  });

  await test.step('a file that is no photo is told; a photo is sent, and the thread shows it', async () => {
    await page.locator('#checkpoint').scrollIntoViewIfNeeded();
    const chooser = page.getByTestId('photo-chooser');
    await chooser.setInputFiles({ name: 'notes.txt', mimeType: 'text/plain', buffer: Buffer.from('no photo') });
    await expect(page.getByRole('alert')).toContainText('This file is not a photo we can read.');
    await page.getByLabel(/^What should Ilse know/).fill('Is the left edge slack?');
    await chooser.setInputFiles({ name: 'warped-loom.jpg', mimeType: 'image/jpeg', buffer: await jpeg() });
    await page.getByRole('button', { name: 'Send to Ilse' }).click();
    await expect(page.getByRole('heading', { name: 'Ilse has your photo' })).toBeVisible({ timeout: 20_000 });
    await expect(page.getByText('You wrote: “Is the left edge slack?”')).toBeVisible();
    const photo = page.getByRole('img', { name: /^Your photo of/ });
    await expect.poll(() => photo.evaluate((image) => image instanceof HTMLImageElement && image.naturalWidth)).toBeGreaterThan(0);
    await page.goto('/loom');
    await expect(page.getByText('Waits for Ilse')).toBeVisible();
  });

  await test.step('what is not open yet says what opens it', async () => {
    await page.goto('/series/low-tide/3');
    await expect(page.getByText('Part 3 opens when Ilse has seen your warped loom.')).toBeVisible();
    await expectFaultless(page);
  });
});

test.describe('without script', () => {
  test.use({ javaScriptEnabled: false });

  test('the same is done by forms', async ({ page, request }) => {
    test.setTimeout(150_000);
    await newStudent(page, request);

    await page.goto('/series/low-tide/piece');
    await tellLoom(page, { 'Inside width': '30 m', 'Nail spacing': '8', 'Width of your piece': '30' });
    await page.getByRole('button', { name: 'Keep my piece' }).click();
    await expect(page.getByText('Too wide for a frame. Between 5 cm and 300 cm works.').first()).toBeVisible();
    await expect(page.getByLabel('Inside width', { exact: true })).toHaveValue('30 m');
    await tellLoom(page, { 'Inside width': '36', 'Inside height': '64' });
    await page.getByLabel('Doubled', { exact: true }).check();
    await page.getByRole('button', { name: 'Keep my piece' }).click();
    await expect(page.getByText('Your piece is kept. Every amount is reckoned for it.')).toBeVisible();

    await page.goto('/series/low-tide/gather');
    await tick(page, /^Blunt needle/).check();
    await page.getByRole('button', { name: 'Keep my ticks' }).click();
    await expect(page.getByText('Your ticks are kept.')).toBeVisible();
    await expect(tick(page, /^Blunt needle/)).toBeChecked();

    await page.goto('/series/low-tide/2');
    await step(page, MARK).click();
    await expect(page).toHaveURL(/\/series\/low-tide\/2#step-/);
    await expect(step(page, MARK)).toHaveAttribute('aria-pressed', 'true');

    const words = page.getByLabel(/^What should Ilse know/);
    await words.fill('Is it slack?');
    await page.getByLabel('Photos', { exact: true }).setInputFiles({ name: 'loom.jpg', mimeType: 'image/jpeg', buffer: Buffer.from('no photo at all') });
    await page.getByRole('button', { name: 'Send to Ilse' }).click();
    await expect(page).toHaveURL(/\/series\/low-tide\/2#checkpoint$/);
    await expect(page.getByText('This file is not a photo we can read. Use JPEG, PNG or WebP, up to 25 MB.')).toBeVisible();
    await expect(words).toHaveValue('Is it slack?');
    await page.getByLabel('Photos', { exact: true }).setInputFiles({ name: 'loom.jpg', mimeType: 'image/jpeg', buffer: Buffer.alloc(45_000_000) });
    await page.getByRole('button', { name: 'Send to Ilse' }).click();
    await expect(page.getByText('This photo is larger than 25 MB.')).toBeVisible({ timeout: 30_000 });
    await page.getByLabel('Photos', { exact: true }).setInputFiles({ name: 'loom.jpg', mimeType: 'image/jpeg', buffer: await jpeg() });
    await page.getByRole('button', { name: 'Send to Ilse' }).click();
    await expect(page.getByRole('heading', { name: 'Ilse has your photo' })).toBeVisible();

    await page.goto('/series/low-tide/1');
    await page.getByRole('button', { name: 'Part 1 is done' }).click();
    await expect(page).toHaveURL(/\/series\/low-tide\/2$/);
    await page.goto('/series/low-tide/2/loomside?step=1');
    await page.getByRole('link', { name: /^Next step/ }).click();
    await expect(page.getByRole('heading', { name: /^Step 2 of/ })).toBeVisible();
  });
});

test.describe('Maud', () => {
  test.use({ storageState: stateOf('maud') });

  test('turns the steps at the loom side by space and arrows', async ({ page }) => {
    await page.goto('/series/low-tide/2/loomside?step=1');
    await expect(page.getByText('Nails, and the way you stand')).toBeVisible();
    await page.locator('astro-island:not([ssr])').first().waitFor({ state: 'attached' });
    await page.keyboard.press('Space');
    await expect(page.getByRole('heading', { name: /^Step 2 of/ })).toBeVisible();
    await page.locator('astro-island:not([ssr])').first().waitFor({ state: 'attached' });
    await page.keyboard.press('ArrowLeft');
    await expect(page.getByRole('heading', { name: /^Step 1 of/ })).toBeVisible();
  });

  test('has a video with captions, of which a browser may ask a part', async ({ page, request }) => {
    await page.goto('/series/low-tide/2');
    const src = await page.locator('video source').getAttribute('src') ?? '';
    const part = await request.get(src, { headers: { range: 'bytes=100-199' } });
    expect(part.status()).toBe(206);
    expect(part.headers()['content-range']).toMatch(/^bytes 100-199\/\d+$/);
    expect(await part.body()).toHaveLength(100);
    const captions = await request.get(await page.locator('video track').getAttribute('src') ?? '');
    expect(captions.headers()['content-type']).toContain('text/vtt');
    expect(await captions.text()).toMatch(/^WEBVTT/);
  });

  test('prints her whole list on one page', async ({ page }) => {
    await page.goto('/series/low-tide/gather');
    for (const format of ['A4', 'Letter']) {
      const paper = (await page.pdf({ format })).toString('latin1');
      expect(paper.match(/\/Type\s*\/Page[^s]/g), format).toHaveLength(1);
    }
  });
});

test('a film is not handed to whoever has no seat', async ({ browser, request }) => {
  const maud = await browser.newContext({ storageState: stateOf('maud') });
  const page = await maud.newPage();
  await page.goto('/series/low-tide/2');
  const src = await page.locator('video source').getAttribute('src') ?? '';
  await maud.close();
  expect((await request.get(src)).status()).toBe(404);
});
