/**
 * From the last part to words about the series: a finisher keeps and hangs her piece, takes it down, and writes; the teacher answers, the
 * steward hides and shows.
 */
import { expect, type Browser, type Page } from 'playwright/test';
import sharp from 'sharp';
import { stateOf, type DemoName } from './support/demo-people.ts';
import { newStudent } from './support/take-seat.ts';
import { expectFaultless, test } from './support/test.ts';

const CORDS = { slug: 'three-knotted-cords', title: 'Three Knotted Cords', parts: 3 };
const SERIES = `/series/${CORDS.slug}`;

const as = async (browser: Browser, name: DemoName): Promise<Page> => (await browser.newContext({ storageState: stateOf(name) })).newPage();

test('who finished a series says how it was, the teacher answers, the steward may hide it', async ({ page, browser, request }) => {
  test.setTimeout(180_000);
  const name = `Nell ${Date.now().toString(36)}`;
  await newStudent(page, request, CORDS, name);
  const [teodor, pell] = [await as(browser, 'teodor'), await as(browser, 'pell')];
  const words = `The second cord took me an evening, says ${name}.`;

  await test.step('before the last part nothing is asked', async () => {
    await page.goto(SERIES);
    await expect(page.locator('#reviews summary')).toHaveCount(0);
  });

  await test.step('every part is done', async () => {
    await page.goto(`${SERIES}/1`);
    await page.getByRole('button', { name: 'Part 1 is done' }).click();
    await page.goto(`${SERIES}/2`);
    const lesson = await page.locator('input[name="lesson"]').first().inputValue();
    const buffer = await sharp({ create: { width: 900, height: 600, channels: 3, background: '#b9aa8d' } }).jpeg().toBuffer();
    const sent = await page.request.post('/api/photos', { headers: { 'sec-fetch-site': 'same-origin' }, multipart: { series: CORDS.slug, lesson, words: '', photo: { name: 'cords.jpg', mimeType: 'image/jpeg', buffer } } });
    const { photo } = (await sent.json()) as { photo: string };
    await teodor.goto(`/workroom/bench?photo=${photo}`);
    await teodor.getByRole('button', { name: /^Weave on/ }).click();
    await expect(teodor.getByText(`Weave on: goes out to ${name} in ten seconds.`)).toBeVisible();
    await expect(async () => {
      await page.goto(`${SERIES}/3`);
      await expect(page.getByRole('button', { name: 'Part 3 is done' })).toBeVisible({ timeout: 500 });
    }).toPass({ timeout: 60_000 });
    await page.getByRole('button', { name: 'Part 3 is done' }).click();
    await page.goto('/loom');
  });

  await test.step('on a phone she keeps photo, yarn and hours, hangs the piece, and it is gone when she takes it down', async () => {
    const window = page.viewportSize();
    await page.setViewportSize({ width: 390, height: 844 });
    await page.getByRole('link', { name: 'Photo, hours and label' }).click();
    const buffer = await sharp({ create: { width: 600, height: 800, channels: 3, background: '#8d9f9c' } }).jpeg().toBuffer();
    await page.getByLabel('Photo of the finished piece').setInputFiles({ name: 'cords.jpg', mimeType: 'image/jpeg', buffer });
    await page.getByRole('button', { name: 'Keep this photo' }).click();
    await page.getByLabel(/^Hours it took/).fill('3 h 30');
    await page.getByLabel('Made of').first().fill('60 % cotton, 60 % jute');
    await page.getByRole('button', { name: 'Write it down' }).click();
    await expect(page.getByText('That comes to 120 %.').first()).toBeVisible();
    await page.getByLabel('Made of').first().fill('jute');
    await page.getByRole('button', { name: 'Write it down' }).click();
    await expect(page.getByLabel('Care').getByText('Do not wash.')).toBeVisible();
    await page.getByRole('button', { name: 'Hang it on the wall' }).click();
    await expect(page.getByText('Nothing is shown without your agreement.').first()).toBeVisible();
    await page.getByLabel('Your name there').last().fill(name);
    await page.getByLabel(/^I agree/).check();
    await page.getByRole('button', { name: 'Hang it on the wall' }).click();
    await expect(page.getByText(`as “${name}”`)).toBeVisible();
    await expectFaultless(page);
    const certificate = await page.request.get(`${SERIES}/certificate.pdf?day=2026-12-01&name=${encodeURIComponent(name)}`);
    expect([certificate.status(), certificate.headers()['content-type']]).toEqual([200, 'application/pdf']);
    const visitor = await (await browser.newContext()).newPage();
    await visitor.goto('/wall');
    const photo = visitor.getByRole('img', { name: `${CORDS.title}, made by ${name}` });
    await expect(photo).toBeVisible();
    const address = await photo.getAttribute('src') ?? '';
    expect((await visitor.request.get(address)).status()).toBe(200);
    await page.getByRole('button', { name: 'Take it off the wall' }).click();
    await expect(page.getByRole('button', { name: 'Hang it on the wall' })).toBeVisible();
    expect((await visitor.request.get(address)).status()).toBe(404);
    await visitor.reload();
    await expect(photo).toHaveCount(0);
    await visitor.context().close();
    if (window !== null) await page.setViewportSize(window);
  });

  await test.step('she writes, is told what is missing, and everybody reads it', async () => {
    await page.getByRole('link', { name: 'Say how it was' }).click();
    await page.getByLabel('Your name there').fill('N.');
    await page.getByRole('button', { name: 'Keep my words' }).click();
    await expect(page.getByText('Choose yes or no.').first()).toBeVisible();
    await page.getByLabel('How was it to make?').fill(words);
    await page.getByLabel('Yes', { exact: true }).check();
    await page.getByRole('button', { name: 'Keep my words' }).click();
    await expect(page.locator('#reviews').getByText(words).first()).toBeVisible();
    await expectFaultless(page);
    const visitor = await (await browser.newContext()).newPage();
    await visitor.goto(SERIES);
    await expect(visitor.locator('#reviews').getByText(words)).toBeVisible();
    await expect(visitor.locator('#reviews').getByText(/^N\., /).first()).toBeVisible();
    await visitor.context().close();
  });

  const review = (at: Page) => at.getByRole('listitem').filter({ hasText: words });
  await test.step('the teacher answers, and has no way to take it away', async () => {
    await teodor.goto(SERIES);
    await review(teodor).locator('summary').click();
    await review(teodor).getByLabel('Your answer to N.').fill('Evenings well spent. Thank you.');
    await review(teodor).getByRole('button', { name: 'Keep the answer' }).click();
    await expect(review(teodor).getByText('Evenings well spent. Thank you.').first()).toBeVisible();
    await expect(review(teodor).getByRole('button', { name: /Hide|Take out/ })).toHaveCount(0);
  });

  await test.step('the steward hides it with a reason, and shows it again', async () => {
    await pell.goto('/office/reviews');
    await review(pell).locator('summary').click();
    await review(pell).getByLabel('Reason').fill('It names somebody.');
    await review(pell).getByRole('button', { name: 'Hide it' }).click();
    await expect(review(pell).getByText(/^Hidden/)).toBeVisible();
    await expectFaultless(pell);
    await page.goto(SERIES);
    await expect(page.getByText('Your review is hidden by the steward: It names somebody.')).toBeVisible();
    await pell.goto('/office/reviews?state=hidden');
    await review(pell).getByRole('button', { name: /^Show again/ }).click();
    await page.goto(SERIES);
    await expect(review(page).getByText('Evenings well spent. Thank you.')).toBeVisible();
  });
  await Promise.all([teodor, pell].map((one) => one.context().close()));
});
