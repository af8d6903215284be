/** The loom side on a phone: swiped, counted, cut off from the net, and found again as it was left. */
import { expect, type Browser, type Page } from 'playwright/test';
import { expectFaultless } from './test.ts';

async function swipe(phone: Page, fromX: number, toX: number): Promise<void> {
  const touch = await phone.context().newCDPSession(phone);
  const y = 260;
  await touch.send('Input.dispatchTouchEvent', { type: 'touchStart', touchPoints: [{ x: fromX, y }] });
  for (const share of [0.3, 0.7, 1]) await touch.send('Input.dispatchTouchEvent', { type: 'touchMove', touchPoints: [{ x: fromX + (toX - fromX) * share, y }] });
  await touch.send('Input.dispatchTouchEvent', { type: 'touchEnd', touchPoints: [] });
  await touch.detach();
}

const step = (phone: Page, number: number) => expect(phone.getByRole('heading', { name: new RegExp(`^Step ${String(number)} of`) })).toBeVisible();
const counted = (phone: Page, rows: number) => expect(phone.locator('.rows-number')).toHaveText(new RegExp(`^${String(rows)} of \\d+ rows$`));

/** `page` is signed in as somebody to whom the part is open. Its bands are counted for the first time. */
export async function weaveOnPhone(browser: Browser, page: Page, part: string): Promise<void> {
  const context = await browser.newContext({ storageState: await page.context().storageState(), baseURL: process.env['FELLMARK_TEST_URL'] ?? '', viewport: { width: 390, height: 844 }, hasTouch: true, isMobile: true, serviceWorkers: 'allow', locale: 'en-GB' });
  const phone = await context.newPage();
  await phone.goto(`${part}/loomside`);
  const count = phone.getByRole('button', { name: 'Count rows' });
  await expect(count).toBeVisible();
  await swipe(phone, 320, 120);
  await step(phone, 2);
  await swipe(phone, 100, 300);
  await phone.keyboard.press('Space');
  await step(phone, 2);
  const done = phone.getByRole('button', { name: 'Done: step 2' });
  await done.tap();
  await expect(done).toHaveAttribute('aria-pressed', 'true');
  await count.tap();
  const sent = phone.waitForResponse((response) => response.url().endsWith('/api/rows'));
  await phone.getByRole('button', { name: 'One row' }).tap();
  expect((await sent).ok()).toBe(true);
  await phone.keyboard.press('Space');
  await counted(phone, 2);
  await step(phone, 2);
  await expectFaultless(phone);

  await expect.poll(() => phone.evaluate(async (address) => (await caches.match(address)) !== undefined, `${part}/loomside`)).toBe(true);
  await context.setOffline(true);
  await phone.keyboard.press('Space');
  await counted(phone, 3);
  await expect(phone.getByText('Kept on this device. It goes out when there is signal.')).toBeVisible();
  await swipe(phone, 320, 120);
  await step(phone, 3);
  await phone.reload();
  await step(phone, 3);
  await counted(phone, 3);
  await context.setOffline(false);
  await expect(phone.getByText('Kept on this device.')).toBeHidden();
  await context.close();
}
