/**
 * A teacher writes to her class: a student takes a seat, asks for letters, reads the notice in her page and in the letter,
 * and leaves by the letter's link, from a mail program and by hand.
 */
import { expect, request, type APIRequestContext } from 'playwright/test';
import { choose, pick, press, typeInto } from './support/by-keys.ts';
import { stateOf } from './support/demo-people.ts';
import { letterTo, linkIn } from './support/mail-tray.ts';
import { signInHere } from './support/new-person.ts';
import { newStudent } from './support/take-seat.ts';
import { expectFaultless, test } from './support/test.ts';

const heading = (): string => `Cork and nails ${Date.now().toString(36)}`;

/** Writes a notice as Ilse and sends it; by bare requests, so that it tells nothing of the pages. */
async function ilseSends(title: string, words: string): Promise<void> {
  const api = await request.newContext({ baseURL: process.env['FELLMARK_TEST_URL'] ?? '', storageState: stateOf('ilse'), extraHTTPHeaders: { 'sec-fetch-site': 'same-origin' } });
  const kept = await api.post('/workroom/notices/new?_action=notices.keep', { form: { series: 'low-tide', title, words }, maxRedirects: 0 });
  expect(kept.status(), await kept.text()).toBe(303);
  const at = kept.headers()['location'] ?? '';
  const sent = await api.post(`${at}?_action=notices.send`, { form: { notice: at.split('/').at(-1) ?? '', when: 'now' }, maxRedirects: 0 });
  expect(sent.status(), await sent.text()).toBe(303);
  await api.dispose();
}

interface TrayMail { readonly to: string; readonly subject: string; readonly headers: Readonly<Record<string, string>> }

async function headersOf(api: APIRequestContext, to: string, subject: string): Promise<Readonly<Record<string, string>>> {
  const mails = (await (await api.get(`${process.env['FELLMARK_TEST_STAND_INS'] ?? ''}/mail.json`)).json()) as TrayMail[];
  return mails.find((mail) => mail.to === to && mail.subject === subject)?.headers ?? {};
}

test.describe('a teacher', () => {
  test.use({ storageState: stateOf('ilse') });

  for (const javaScriptEnabled of [true, false]) {
    test.describe(javaScriptEnabled ? 'by keys' : 'by keys and without script', () => {
      test.use({ javaScriptEnabled });

      test('writes a notice, sees it as a student with her amounts, puts it off, takes it back and throws it away', async ({ page }) => {
        const title = heading();
        await page.goto('/workroom/students');
        await press(page, page.getByRole('link', { name: 'Write a notice' }));
        await typeInto(page, page.getByLabel('Heading'), title);
        await typeInto(page, page.getByLabel('Your words'), '## No headings');
        await press(page, page.getByRole('button', { name: 'Keep it and look it over' }));
        await expect(page.getByText('A notice holds paragraphs, lists, bold words, links and amounts.')).toBeVisible();
        await expect(page.getByLabel('Heading')).toHaveValue(title);
        await typeInto(page, page.getByLabel('Your words'), 'Yours is <Amount of="width"/> wide, says [the handbook](/handbook/tabby).');
        await press(page, page.getByRole('button', { name: 'Keep it and look it over' }));
        await expect(page.getByRole('heading', { name: title })).toBeVisible();
        await pick(page, page.getByLabel('Seen as'), 'Maud Ellery');
        await press(page, page.getByRole('button', { name: 'Show' }));
        await expect(page.getByRole('article')).toContainText(/Yours is 30\scm wide/);
        await expect(page.getByText(/people get it under Notices/)).toBeVisible();
        if (javaScriptEnabled) await expectFaultless(page);
        await choose(page, page.getByRole('radio', { name: 'Later' }));
        await page.getByLabel('Later: on').fill('2020-01-01T09:00');
        await press(page, page.getByRole('button', { name: 'Send' }));
        await expect(page.getByText('This moment has passed.')).toBeVisible();
        const nextYear = new Date(Date.now() + 30 * 86_400_000).toISOString().slice(0, 11);
        await page.getByLabel('Later: on').fill(`${nextYear}09:00`);
        await press(page, page.getByRole('button', { name: 'Send' }));
        await press(page, page.getByRole('button', { name: 'Take it back' }));
        await press(page, page.getByRole('button', { name: 'Throw it away' }));
        await press(page, page.getByRole('dialog').getByRole('button', { name: 'Throw it away' }));
        await expect(page).toHaveURL(/\/workroom\/notices$/);
        await expect(page.getByText(title)).toHaveCount(0);
      });
    });
  }

  test.describe('on a phone', () => {
    test.use({ viewport: { width: 390, height: 844 }, hasTouch: true, isMobile: true });

    test('looks at a nudge before it goes, and is told that one in three days is enough', async ({ page, browser, request: api }) => {
      const name = `Nell ${Date.now().toString(36)}`;
      const hers = await browser.newContext({ storageState: { cookies: [], origins: [] } });
      await newStudent(await hers.newPage(), api, undefined, name);
      await hers.close();
      await page.goto('/workroom/students');
      await page.getByRole('link', { name: `Nudge ${name}` }).tap();
      await expect(page.getByLabel('Your words')).toHaveValue(/That happens to everybody/);
      await page.getByLabel('Your words').fill('Did the **spacer card** arrive?');
      await page.getByRole('button', { name: 'See how it reads' }).tap();
      await expect(page.getByText('Did the spacer card arrive?')).toBeVisible();
      await expectFaultless(page);
      await page.getByRole('button', { name: 'Send it' }).tap();
      await expect(page.getByText(`${name} has it under Notices.`)).toBeVisible();
      await page.getByRole('link', { name: `Nudge ${name}` }).tap();
      await expect(page.getByText(/One word in 3 days is enough/)).toBeVisible();
    });
  });
});

test('a student reads a notice in her page and in the letter she asked for, and leaves by the letter’s link', async ({ page, request: api }) => {
  test.slow();
  const nell = await newStudent(page, api);
  await page.goto('/account');
  await page.getByLabel(/^Notices by letter/).check();
  await page.getByLabel(/^Nudges by letter/).check();
  await page.getByRole('button', { name: /^Keep/ }).click();
  await expect(page.getByLabel(/^Notices by letter/)).toBeChecked();

  const title = heading();
  await ilseSends(title, 'Push a cork on the **corner nails**.');
  const letter = await letterTo(api, nell.email, title);
  const leave = linkIn(letter, '/leave/');
  expect(await headersOf(api, nell.email, title)).toMatchObject({ 'list-unsubscribe': `<${leave}>`, 'list-unsubscribe-post': 'List-Unsubscribe=One-Click', 'list-id': expect.stringContaining('notices.saltmarsh') });

  await page.goto('/loom');
  const told = page.getByRole('region', { name: 'Said to you' });
  await told.getByRole('link', { name: title }).click();
  await expect(page.getByText('Push a cork on the corner nails.')).toBeVisible();
  await page.getByRole('button', { name: title }).click();
  await expect(page.getByRole('button', { name: title })).toHaveCount(0);

  // Looking, and a mail program that looks ahead, change nothing; a changed link leads nowhere.
  const outside = await request.newContext();
  expect((await outside.get(leave, { headers: { 'sec-purpose': 'prefetch' } })).status()).toBe(200);
  expect((await outside.head(leave)).status()).toBe(200);
  expect((await outside.post(`${leave.slice(0, -2)}xx`, { form: { 'List-Unsubscribe': 'One-Click' } })).status()).toBe(404);
  await page.goto('/account');
  await expect(page.getByLabel(/^Notices by letter/)).toBeChecked();

  // RFC 8058: a bare POST, from wherever it says it comes, as either kind of form, twice.
  for (const site of ['cross-site', 'same-site', 'same-origin', 'none']) {
    const answer = await outside.post(leave, { headers: { 'sec-fetch-site': site, origin: 'null' }, maxRedirects: 0, ...(site === 'none' ? { multipart: { 'List-Unsubscribe': 'One-Click' } } : { form: { 'List-Unsubscribe': 'One-Click' } }) });
    expect(answer.status(), site).toBe(200);
  }
  expect((await outside.post(leave)).status()).toBe(200);
  await outside.dispose();
  await page.reload();
  await expect(page.getByLabel(/^Notices by letter/)).not.toBeChecked();
  await expect(page.getByLabel(/^Nudges by letter/)).toBeChecked();

  // By hand: asked for again, left with the button.
  await page.getByLabel(/^Notices by letter/).check();
  await page.getByRole('button', { name: /^Keep/ }).click();
  await page.context().clearCookies();
  await page.goto(leave);
  await expectFaultless(page);
  await page.getByRole('button', { name: 'Leave these letters' }).click();
  await expect(page.getByRole('heading', { name: 'You have left' })).toBeVisible();
  await page.goto('/sign-in?to=/account');
  await signInHere(page, nell);
  await expect(page.getByLabel(/^Notices by letter/)).not.toBeChecked();

  // The next notice stands in her page only.
  const second = heading();
  await ilseSends(second, 'And bring two.');
  await expect(async () => {
    await page.goto('/notices');
    await expect(page.getByRole('heading', { name: second })).toBeVisible({ timeout: 1_000 });
  }).toPass({ timeout: 30_000 });
  expect(await headersOf(api, nell.email, second)).toEqual({});
});
