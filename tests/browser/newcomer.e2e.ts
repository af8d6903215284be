/**
 * A teacher who has never been here, and owns no mouse, makes a series in seven parts from a blank page, through the pages
 * alone: piece, parts, texts, lists, films with captions, timetable, price. A student finds it, buys it on her phone and starts.
 */
import { randomBytes } from 'node:crypto';
import { mkdtemp, rm } from 'node:fs/promises';
import os from 'node:os';
import path from 'node:path';
import { expect, test as base, type Browser, type Page } from 'playwright/test';
import { makeClip } from '../support/clips.ts';
import { choose, pick, press, skipToWork, tabTo, takeFile, typeInto } from './support/by-keys.ts';
import { DEMO } from './support/demo-people.ts';
import { fillPiece } from './support/fill-piece.ts';
import { textField } from './support/lesson-text.ts';
import { letterTo } from './support/mail-tray.ts';
import { newPerson, signInHere, type NewPerson } from './support/new-person.ts';
import { CARD, payWith, untilSeat } from './support/pay.ts';
import { expectFaultless, test } from './support/test.ts';

interface Part {
  readonly title: string;
  readonly words: string;
  readonly tools: readonly (readonly [name: string, howMuch: string])[];
  readonly photo?: string;
  /** The number of the part whose photo it waits for. */
  readonly after?: number;
  readonly daysIn?: number;
  readonly film?: boolean;
}

const PARTS: readonly Part[] = [
  { title: 'Read the shore', words: 'Find <Amount of="yarn.ground"/> for the ground.\n\n<Step id="gather">Lay everything out.</Step>', tools: [['Ground yarn', '']] },
  { title: 'Dress the frame', words: '<Caution title="Mind your wrists">Wind in short turns and rest your wrists.</Caution>\n\n<Step id="tie">Tie on at the left.</Step>\n\n<Step id="wind">Wind <Amount of="ends"/>.</Step>', tools: [['Warp yarn', ''], ['Scissors', '1']], photo: 'Show your warped frame', film: true },
  { title: 'The first hand', words: '<Step id="tabby">Weave <Amount of="height"/>.</Step>', tools: [['Blunt needle', '1']], after: 2 },
  { title: 'The ebb line', words: '<Step id="ebb">Change the yarn where the water stood.</Step>', tools: [['Fork', '1']], daysIn: 1, film: true },
  { title: 'Ridges', words: '<Step id="ridge">Lay the stitch over four, back two.</Step>', tools: [['Blunt needle', '1']], photo: 'Show a ridge from near' },
  { title: 'The dry sand', words: '<Step id="sand">Weave to the top.</Step>', tools: [['Fork', '1']], after: 5 },
  { title: 'Cut and hang', words: '<Caution title="Mind the blades">Cut away from your hand.</Caution>\n\n<Step id="cut">Cut the warp and knot it in twos.</Step>', tools: [['Scissors', '1']] },
];

let folder = '';
base.beforeAll(async () => { folder = await mkdtemp(path.join(os.tmpdir(), 'fellmark-newcomer-')); });
base.afterAll(() => rm(folder, { recursive: true }));
base.setTimeout(420_000);
base.use({ actionTimeout: 15_000 });

const main = (page: Page) => page.getByRole('main');
const link = (page: Page, name: string | RegExp) => main(page).getByRole('link', { name, ...typeof name === 'string' ? { exact: true } : {} }).first();
const headOf = (page: Page, { title }: Part) => page.getByRole('heading', { level: 1, name: title });
/** From a page of one part to the same page of the part beside it. */
const stepTo = (page: Page, number: number) => link(page, `Part ${number}, ${PARTS[number - 1]?.title ?? ''}`);

/** The steward finds her among the people and gives her a workroom. */
async function letIn(browser: Browser, { email }: NewPerson, workroom: string): Promise<void> {
  // A sign-in of this journey's own: proving herself ends the session that others keep.
  const office = await browser.newPage({ storageState: { cookies: [], origins: [] } });
  await office.goto(`/sign-in?to=${encodeURIComponent(`/office/people?q=${encodeURIComponent(email)}`)}`);
  await signInHere(office, { email: DEMO.pell, password: process.env['FELLMARK_TEST_PASSWORD'] ?? '' });
  await main(office).getByRole('link', { name: 'Nell Fane' }).first().click();
  const prove = main(office).getByRole('link', { name: 'Type my password' });
  if (await prove.isVisible()) {
    await prove.click();
    await office.getByLabel('Password', { exact: true }).fill(process.env['FELLMARK_TEST_PASSWORD'] ?? '');
    await main(office).getByRole('button', { name: 'Go on' }).click();
  }
  await office.getByLabel('Name of the workroom').fill(workroom);
  await office.getByLabel('Handle').fill(`nell-${randomBytes(3).toString('hex')}`);
  await main(office).getByRole('button', { name: 'Let in as a teacher' }).click();
  await expect(main(office).getByRole('link', { name: workroom })).toBeVisible();
  await office.close();
}

test('a newcomer builds a series in seven parts, and a student finds, buys and starts it', async ({ page, browser, request }) => {
  const tag = randomBytes(3).toString('hex');
  const title = `Strandline ${tag}: a small hanging in seven parts`;
  const name = `Strandline ${tag}`;
  const teacher = await newPerson(request);
  let desk = '';
  const places: string[] = [];

  await test.step('she is let in, and is told where to begin', async () => {
    await letIn(browser, teacher, `Room ${tag}`);
    await page.goto('/sign-in?to=/workroom');
    await signInHere(page, teacher);
    await expect(page.getByRole('heading', { level: 1 })).toBeVisible();
    await press(page, main(page).getByRole('link', { name: 'Make a series' }));
    await typeInto(page, page.getByLabel('Title'), title);
    await page.keyboard.press('Enter');
    await expect(page.getByRole('heading', { level: 1, name })).toBeVisible();
    desk = new URL(page.url()).pathname;
  });

  await test.step('the piece, drawn and reckoned as she types', async () => {
    await press(page, main(page).getByRole('link', { name: 'Describe the piece' }).first());
    await fillPiece(page, { Width: '24', Height: '30', 'Nail to nail, along': '8' });
    await page.keyboard.press('Enter');
    await expect(page.getByText('The piece is saved.')).toBeVisible();
  });

  await test.step('seven parts, put in their order', async () => {
    await page.goto(desk);
    await skipToWork(page);
    for (const { title: part } of PARTS) {
      await typeInto(page, page.getByLabel('Put in a part'), part);
      await page.keyboard.press('Enter');
      await expect(page.getByRole('heading', { level: 3, name: part })).toBeVisible();
    }
    await press(page, link(page, 'Read the shore'));
  });

  await test.step('seven texts, and two films', async () => {
    for (const [index, part] of PARTS.entries()) {
      await expect(headOf(page, part)).toBeVisible();
      places.push(page.url());
      await tabTo(page, textField(page));
      await page.keyboard.insertText(part.words);
      await page.keyboard.press('Control+s');
      await expect(page.getByText(/^Saved \d\d:\d\d$/).first()).toBeVisible();
      if (part.film === true) {
        await press(page, link(page, 'Video'));
        await takeFile(page, main(page).getByRole('button', { name: 'Choose a video' }), makeClip(folder, `film-${index + 1}.mp4`));
        await expect(page.getByText('All of it is here').or(page.getByText('It is being made ready')).or(link(page, /Captions/)).first()).toBeVisible({ timeout: 60_000 });
        await page.goto(places[index] ?? '');
      }
      if (index < PARTS.length - 1) await press(page, stepTo(page, index + 2));
    }
  });

  await test.step('seven lists', async () => {
    for (const [index, part] of PARTS.entries()) {
      await page.goto(`${places[index]}/gather`);
      for (const [tool, howMuch] of part.tools) {
        const add = main(page).getByRole('region', { name: 'Put something on the list' });
        await typeInto(page, add.getByLabel('Name', { exact: true }), tool);
        if (howMuch !== '') await typeInto(page, add.getByLabel('Or how much in words'), howMuch);
        await page.keyboard.press('Enter');
        await expect(main(page).getByRole('listitem').filter({ hasText: tool }).first()).toBeVisible();
      }
    }
  });

  await test.step('what each asks for, and when it opens', async () => {
    for (const [index, part] of PARTS.entries()) {
      await page.goto(`${places[index]}/settings`);
      if (index === 0) await press(page, page.getByLabel('Free to read'), ' ');
      if (part.after !== undefined) {
        await choose(page, page.getByLabel('After you have seen a photo'));
        await pick(page, page.getByLabel('It opens when you say weave on to the photo of'), `Part ${part.after}, ${PARTS[part.after - 1]?.title}`);
      }
      if (part.daysIn !== undefined) {
        await choose(page, page.getByLabel('Some days after the seat began'));
        await typeInto(page, page.getByLabel('How many days'), String(part.daysIn));
      }
      if (part.photo !== undefined) {
        await press(page, page.getByLabel('Ask for a photo'), ' ');
        await typeInto(page, page.getByLabel('What it shall show'), part.photo);
      }
      await press(page, main(page).getByRole('button', { name: 'Save', exact: true }));
      await expect(page.getByText(/^Saved \d\d:\d\d$/).first()).toBeVisible();
    }
  });

  await test.step('the films are ready, and each gets its captions', async () => {
    for (const [index, part] of PARTS.entries()) {
      if (part.film !== true) continue;
      await page.goto(`${places[index]}/video`);
      const captions = link(page, 'Write the captions');
      await expect(captions).toBeVisible({ timeout: 120_000 });
      await press(page, captions);
      await expect(page.locator('astro-island[ssr]')).toHaveCount(0);
      await press(page, page.getByRole('button', { name: 'Write a line here' }));
      await page.keyboard.type('See how the thread goes.');
      await expect(page.getByText(/^Saved \d\d:\d\d/)).toBeVisible({ timeout: 30_000 });
      await press(page, page.getByRole('link', { name: /^Part \d$/ }).first());
      await press(page, main(page).getByRole('button', { name: /at the head of the text/ }));
      await expect(page.getByRole('textbox', { name: 'Text of this part' })).toContainText('<Video');
    }
  });

  await test.step('words and price, then nothing is missing', async () => {
    await page.goto(desk);
    for (const [label, words] of [
      ['Summary', 'A small hanging in the colours of a shore, for a first frame.'], ['What makes it worth weaving', 'Each part ends where the eye can rest.'],
      ['Techniques', 'tabby'], ['Price of a seat', '36'],
    ] as const) await typeInto(page, page.getByLabel(label), words);
    await page.keyboard.press('Enter');
    await expect(page.getByLabel('Price of a seat')).toHaveValue('36.00');
    await press(page, page.getByRole('link', { name: 'Before you publish', exact: true }).last());
    await expect(main(page).getByText('Nothing stands in the way.')).toBeVisible();
    await expect(main(page).getByText('Parts 4 to 6 can be opened while Part 3 still waits for Part 2. If they build on it, let them wait too.').first()).toBeVisible();
    await expectFaultless(page);
  });

  await test.step('she publishes', async () => {
    await page.goto(desk);
    await press(page, main(page).getByRole('button', { name: 'Publish', exact: true }));
    await press(page, page.getByRole('dialog').getByRole('button', { name: 'Publish' }));
    await expect(main(page).getByText(/Open to buyers since/)).toBeVisible();
  });

  await test.step('a student finds it, buys it and starts', async () => {
    const student = await newPerson(request, 'Ada Quill');
    const shop = await browser.newPage({ baseURL: new URL(page.url()).origin, viewport: { width: 390, height: 844 } });
    await shop.goto('/series');
    await shop.getByRole('link', { name: new RegExp(name) }).first().click();
    await expect(shop.getByRole('heading', { level: 1, name })).toBeVisible();
    await expect(shop.getByText('Ground yarn').first()).toBeVisible();
    await shop.getByRole('button', { name: 'Take a seat' }).click();
    await signInHere(shop, student);
    await shop.getByLabel(/^Open the parts to me at once/).check();
    await shop.getByLabel(/^I know that with the first part/).check();
    await shop.getByRole('button', { name: 'Take a seat' }).click();
    await payWith(shop, CARD);
    await untilSeat(shop, true);
    await letterTo(request, student.email, `Your seat in ${title}`);
    await shop.goto('/loom');
    await shop.goto(`${desk.replace('/workroom', '')}/2`);
    await expect(shop.getByText(/Wind \d+/)).toBeVisible();
    await shop.getByRole('checkbox').first().check();
    await expectFaultless(shop);
    await shop.goto(`${desk.replace('/workroom', '')}/3`);
    await expect(shop.getByText(/Part 3 opens when/).first()).toBeVisible();
    await shop.close();
  });
});
