/**
 * A film from a teacher's device to her student, by keys on both sides: sent in pieces over a line that breaks, gone on with
 * after the page was loaded anew, made ready, captioned, given chapters and a poster, published, watched large and small.
 */
import { appendFile, mkdtemp, rm } from 'node:fs/promises';
import os from 'node:os';
import path from 'node:path';
import { expect, test as bare } from 'playwright/test';
import { makeClip } from '../support/clips.ts';
import { choose, press, takeFile, typeInto } from './support/by-keys.ts';
import { stateOf } from './support/demo-people.ts';
import { makeSeries } from './support/new-series.ts';
import { test } from './support/test.ts';

const MIB = 1_048_576;
const DESK = '/workroom/series/low-tide/videos/dress-the-loom';
let folder = '';

bare.beforeAll(async () => { folder = await mkdtemp(path.join(os.tmpdir(), 'fellmark-film-')); });
bare.afterAll(() => rm(folder, { recursive: true }));

/** Film of some pieces' size, with lines enough for a small one: a box of nothing behind it is passed over by every reader. */
async function film(): Promise<string> {
  const file = makeClip(folder, 'warping.mp4', { seconds: 24, size: '640x482', rate: 4 });
  const nothing = Buffer.alloc(20 * MIB);
  nothing.writeUInt32BE(nothing.length, 0);
  nothing.write('free', 4, 'latin1');
  await appendFile(file, nothing);
  return file;
}

bare.describe('a film', () => {
  bare.use({ storageState: stateOf('ilse') });
  bare.describe.configure({ timeout: 300_000 });

  // The console tells of the broken line, which is meant.
  bare('goes from the teacher’s device to her student', async ({ page, browser }) => {
    const file = await film();
    const maud = await browser.newContext({ storageState: stateOf('maud') });
    const student = await maud.newPage();
    await student.goto('/series/low-tide/2');
    const before = await student.locator('.lesson-video source').getAttribute('src') ?? '';
    await page.goto(DESK);
    const onDesk = await page.locator('.cue-film video').getAttribute('src') ?? '';

    // The line breaks after the first piece, and stays away.
    let broken = 0;
    await page.route('**/api/videos/*', async (route) => {
      const request = route.request();
      if (request.method() === 'PATCH' && request.headers()['upload-offset'] !== '0') {
        broken += 1;
        await route.abort('connectionfailed');
      } else await route.continue();
    });
    await takeFile(page, page.getByRole('button', { name: 'Choose a video' }), file);
    await expect(page.getByText(/Waits for signal. The line dropped at/)).toBeVisible({ timeout: 60_000 });
    expect(broken).toBeGreaterThan(1);
    await page.unroute('**/api/videos/*');

    // She closes the page, comes back, and chooses the same file.
    page.once('dialog', (dialog) => void dialog.accept());
    await page.goto(DESK);
    await expect(page.locator('#replace').getByText(/are here. Choose the same file again/)).toBeVisible();
    const offsets: string[] = [];
    page.on('request', (request) => { if (request.method() === 'PATCH') offsets.push(request.headers()['upload-offset'] ?? ''); });
    await takeFile(page, page.getByRole('button', { name: 'Choose the file again' }), file);
    await expect(page.getByText(/All of it is here|It is being made ready|Students see it as it is here after you publish/).first()).toBeVisible({ timeout: 60_000 });
    expect(Number(offsets[0])).toBeGreaterThanOrEqual(8 * MIB);
    await expect(page.locator('.cue-film video')).not.toHaveAttribute('src', onDesk, { timeout: 180_000 });
    await expect(page.getByText('Students see it as it is here after you publish the series.')).toBeVisible();
    const src = await page.locator('.cue-film video').getAttribute('src') ?? '';

    // Captions by keys, chapters as lines, a poster of six.
    await press(page, page.getByRole('button', { name: 'Write a line here' }));
    await page.keyboard.type('Lay the frame flat.');
    await expect(page.getByText(/^Saved \d\d:\d\d/)).toBeVisible({ timeout: 30_000 });
    await typeInto(page, page.getByLabel('A time and a title in each line'), '0:00 Tie on\n0:10 Wind\n');
    await press(page, page.getByRole('button', { name: 'Save chapters' }));
    await expect(page.locator('.toast, [role=status]').filter({ hasText: 'Saved' }).first()).toBeVisible();
    await expect(page.locator('.stills li')).toHaveCount(6);
    await choose(page, page.getByLabel('Still 4', { exact: true }));
    await press(page, page.getByRole('button', { name: 'Use this one' }));
    await expect(page.getByLabel('Still 4', { exact: true })).toBeChecked();

    // Students keep the old film until she publishes.
    await student.goto('/series/low-tide/2');
    expect(await student.locator('.lesson-video source').getAttribute('src')).toBe(before);
    await page.goto('/workroom/series/low-tide');
    await press(page, page.getByRole('button', { name: 'Publish the changes', exact: true }));
    await press(page, page.locator('#publish-dialog').getByRole('button', { name: /^Publish/ }));
    await expect(page.getByText(/^Published/).first()).toBeVisible();

    await student.goto('/series/low-tide/2');
    expect(await student.locator('.lesson-video source').getAttribute('src')).toBe(src);
    await press(student, student.getByRole('button', { name: 'Play' }).first());
    const place = () => student.locator('.lesson-video video').evaluate((video: HTMLVideoElement) => video.currentTime);
    await expect.poll(place, { timeout: 30_000 }).toBeGreaterThan(0.2);
    await press(student, student.getByRole('list', { name: 'Chapters' }).getByRole('link', { name: /Wind/ }));
    await expect.poll(place).toBeGreaterThanOrEqual(10);
    const kept = student.waitForResponse('**/api/video-place');
    await student.keyboard.press(' ');
    expect((await kept).status()).toBe(200);
    await press(student, student.getByText('The spoken words'));
    await expect(student.getByRole('button', { name: 'Lay the frame flat.' }).first()).toBeVisible();

    // For a slow line she takes the small one, which goes on at the same place and is what she gets from now on.
    const size = () => student.locator('.lesson-video video').evaluate((video: HTMLVideoElement) => video.videoHeight);
    expect(await size()).toBe(482);
    const stopped = await place();
    const small = student.getByRole('button', { name: /^Small film for slow lines, / });
    await press(student, small, ' ');
    await expect(small).toHaveAttribute('aria-pressed', 'true');
    await expect.poll(size).toBe(480);
    await expect.poll(place).toBeCloseTo(stopped, 0);

    // On another device she goes on where she stopped.
    await student.goto('/series/low-tide/2');
    await expect(student.getByRole('button', { name: /Go on at 0:1\d/ })).toBeVisible();
    await expect(small).toHaveAttribute('aria-pressed', 'true');
    await expect.poll(size).toBe(480);
    await maud.close();
  });

  test('is watched without script in the browser’s own player, with captions, chapters and words', async ({ browser }) => {
    const context = await browser.newContext({ storageState: stateOf('maud'), javaScriptEnabled: false });
    const page = await context.newPage();
    await page.goto('/series/low-tide/2');
    await expect(page.locator('.lesson-video video[controls] track[kind=captions]')).toHaveCount(1);
    await expect(page.locator('.lesson-video .chapter-list a').first()).toHaveAttribute('href', /\/media\/[0-9a-z]{26}\/video#t=0/);
    await page.getByText('The spoken words').click();
    await expect(page.locator('.transcript-words')).toContainText(/Lay the frame flat/);
    await context.close();
  });

  test('is captioned without script from a file, and what is no file of captions is told by its line', async ({ browser }) => {
    const context = await browser.newContext({ storageState: stateOf('ilse'), javaScriptEnabled: false });
    const page = await context.newPage();
    await page.goto('/workroom/series/low-tide/videos/soumak-ridges');
    await page.getByText('From a file, or as a text').click();
    await page.getByLabel('WebVTT file').setInputFiles({ name: 'ridge.vtt', mimeType: 'text/vtt', buffer: Buffer.from('1\n00:00:01,000 --> 00:00:02,000\nOver four.\n') });
    await page.getByRole('button', { name: 'Take captions from the file' }).click();
    await expect(page.getByText(/This is an SRT file/)).toBeVisible();
    await page.getByLabel('WebVTT file').setInputFiles({ name: 'ridge.vtt', mimeType: 'text/vtt', buffer: Buffer.from('WEBVTT\n\n00:01.000 --> 00:02.000\n<b>Over four</b>, back two.\n') });
    await page.getByRole('button', { name: 'Take captions from the file' }).click();
    await page.getByText('From a file, or as a text').click();
    await expect(page.getByLabel('As WebVTT text')).toHaveValue('WEBVTT\n\n00:00:01.000 --> 00:00:02.000\nOver four, back two.\n');
    await context.close();
  });

  test.describe('on a phone', () => {
    test.use({ storageState: stateOf('ilse'), viewport: { width: 390, height: 844 }, hasTouch: true, isMobile: true });

    test('that no text speaks of is deleted for good, after a question', async ({ page }) => {
      const series = await makeSeries(page, 'Warp');
      await page.getByRole('main').getByRole('link', { name: 'Warp', exact: true }).tap();
      await page.getByRole('main').getByRole('link', { name: 'Video', exact: true }).tap();
      await page.getByTestId('video-chooser').setInputFiles(makeClip(folder, 'slip.mp4'));
      await page.getByRole('link', { name: 'Write the captions' }).tap({ timeout: 120_000 });
      await page.getByRole('button', { name: 'Write a line here' }).tap();
      await page.keyboard.type('A slip of the hand.');
      await expect(page.getByText(/^Saved \d\d:\d\d/)).toBeVisible({ timeout: 30_000 });
      await page.getByRole('button', { name: 'Delete this video' }).tap();
      const asks = page.getByRole('dialog', { name: 'Delete “Warp”?' });
      await expect(asks).toContainText('nobody can bring them back');
      await asks.getByRole('button', { name: 'Keep it' }).tap();
      await expect(asks).toBeHidden();
      await page.getByRole('button', { name: 'Delete this video' }).tap();
      await asks.getByRole('button', { name: 'Delete it for good' }).tap();
      await expect(page.getByText(/deleted/i).first()).toBeVisible();
      expect((await page.goto(`${series}/videos/warp`))?.status()).toBe(404);
    });
  });
});
