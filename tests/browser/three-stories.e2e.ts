/**
 * The main job in one go, in two browsers: a teacher changes a part and publishes it, a student buys, ticks off her
 * tools, shows her warped loom, is told to mend, shows it again, and goes on.
 */
import sharp from 'sharp';
import { expect, test as base, type Browser, type Page } from 'playwright/test';
import { weaveOnPhone } from './support/at-the-loom.ts';
import { stateOf } from './support/demo-people.ts';
import { textField } from './support/lesson-text.ts';
import { letterTo } from './support/mail-tray.ts';
import { newPerson, signInHere, type NewPerson } from './support/new-person.ts';
import { CARD, payWith, untilSeat } from './support/pay.ts';
import { expectFaultless, test } from './support/test.ts';

const SERIES = '/series/low-tide';

async function teacherIn(browser: Browser): Promise<Page> {
  const context = await browser.newContext({ storageState: stateOf('ilse'), baseURL: process.env['FELLMARK_TEST_URL'] ?? '', viewport: { width: 1280, height: 900 }, locale: 'en-GB' });
  return context.newPage();
}

async function takeSeat(page: Page, buyer: NewPerson): Promise<void> {
  await page.goto(SERIES);
  await page.getByRole('button', { name: 'Take a seat' }).click();
  await signInHere(page, buyer);
  await page.getByRole('button', { name: 'Take a seat' }).click();
  await payWith(page, CARD);
  await untilSeat(page, true);
}

async function showPhoto(page: Page, words: string): Promise<void> {
  // Another picture each time: the same file again would be the same photo.
  const buffer = await sharp({ create: { width: 1_200, height: 900, channels: 3, background: { r: 185, g: 170, b: (words.length * 8) % 256 } } }).jpeg().toBuffer();
  await page.goto(`${SERIES}/2`);
  await page.locator('#checkpoint').scrollIntoViewIfNeeded();
  await page.getByLabel('What should Ilse know?').fill(words);
  await page.getByTestId('photo-chooser').setInputFiles({ name: 'my loom.jpg', mimeType: 'image/jpeg', buffer });
  await page.getByRole('button', { name: 'Send to Ilse' }).click();
  await expect(page.locator('#checkpoint').getByText('Waits for Ilse').first()).toBeVisible();
}

/** Takes the photo of this student in hand, however many others wait. */
async function takeInHand(bench: Page, name: string): Promise<void> {
  await bench.goto('/workroom/bench');
  await bench.getByRole('region', { name: 'Waiting photos, oldest first' }).getByRole('link', { name: new RegExp(name) }).click();
  await expect(bench.getByRole('heading', { level: 2, name: new RegExp(`^${name}`) })).toBeVisible();
  await bench.locator('.bench-work[data-alive]').waitFor();
}

base.setTimeout(180_000);

test('from a published part to a woven-on loom', async ({ page, browser, request }) => {
  const name = `Nell Fane ${Date.now().toString(36)}`;
  const student = await newPerson(request, name);
  const teacher = await teacherIn(browser);

  await test.step('the teacher changes a part and publishes it', async () => {
    await teacher.goto('/workroom/series/low-tide');
    await teacher.getByRole('link', { name: 'Gather and plan' }).first().click();
    await textField(teacher).press('ControlOrMeta+End');
    await teacher.keyboard.insertText(`\n\nFor ${name}: begin in daylight.\n`);
    await teacher.getByRole('button', { name: /^Save/ }).first().click();
    await expect(teacher.getByText(/^Saved/).first()).toBeVisible();
    await teacher.goto('/workroom/series/low-tide');
    await teacher.getByRole('button', { name: 'Publish the changes', exact: true }).click();
    await teacher.locator('#publish-dialog').getByRole('button', { name: /^Publish/ }).click();
    await expect(teacher.getByText('Students read everything as it stands here.')).toBeVisible();
  });

  await test.step('the student buys a seat and reads the new words', async () => {
    await takeSeat(page, student);
    await page.goto(`${SERIES}/1`);
    await expect(page.getByText(`For ${name}: begin in daylight.`)).toBeVisible();
  });

  await test.step('she ticks off a tool, and it stays ticked', async () => {
    await page.goto(`${SERIES}/gather`);
    const scissors = page.getByRole('checkbox', { name: /Sharp scissors for yarn/ }).first();
    await scissors.check();
    await expect(async () => {
      await page.reload();
      await expect(scissors).toBeChecked();
    }).toPass({ timeout: 15_000 });
    await expectFaultless(page);
  });

  await test.step('Part 3 waits for her photo', async () => {
    await page.goto(`${SERIES}/3`);
    await expect(page.getByText(/Part 3 opens when Ilse has seen/).first()).toBeVisible();
    await showPhoto(page, 'Is the left side too loose?');
  });

  await test.step('the teacher says mend first, with a pin', async () => {
    await takeInHand(teacher, name);
    await expect(teacher.getByText('Is the left side too loose?')).toBeVisible();
    await teacher.keyboard.press('p');
    await teacher.getByLabel('Note 1', { exact: true }).fill('Take up the slack from here outwards.');
    await teacher.getByLabel(/^To Nell/).fill('Nearly there.');
    await teacher.getByRole('button', { name: /^Mend first/ }).click();
    await expect(teacher.getByText(`Mend first: goes out to ${name} in ten seconds.`)).toBeVisible();
    await expect(teacher.getByRole('button', { name: `Take back what you said to ${name}` })).toBeVisible();
    const letter = await letterTo(request, student.email, 'Mend first: Ilse Marrow has seen your photo');
    expect(letter.text).toContain('Take up the slack from here outwards.');
  });

  await test.step('she sees the note, mends, and shows it again in the same thread', async () => {
    await page.goto(`${SERIES}/2`);
    await expect(page.getByText('Take up the slack from here outwards.')).toBeVisible();
    await showPhoto(page, 'Mended.');
    await expect(page.getByRole('heading', { name: 'Photo 2 of 2' })).toBeVisible();
  });

  await test.step('the teacher says weave on, by key', async () => {
    await takeInHand(teacher, name);
    await expect(teacher.getByText('Take up the slack from here outwards.')).toBeVisible();
    await teacher.locator('body').press('w');
    await expect(teacher.getByText(`Weave on: goes out to ${name} in ten seconds.`)).toBeVisible();
    await letterTo(request, student.email, 'Weave on: Ilse Marrow has seen your photo');
  });

  await test.step('the next part is open', async () => {
    await page.goto(`${SERIES}/3`);
    await expect(page.getByRole('heading', { level: 1, name: 'Rya fringe' })).toBeVisible();
    await expect(page.getByText(/Part 3 opens when/)).toHaveCount(0);
  });

  await test.step('she weaves by her phone, and her loom knows the rows', async () => {
    await weaveOnPhone(browser, page, `${SERIES}/3`);
    await page.goto('/loom');
    await expect(page.getByText(/row 3 of \d+ of the band “foot”/).first()).toBeVisible();
  });
  await teacher.context().close();
});
