/** Asking on a part and being answered; being asked to help, helping, and helping no longer. */
import { expect, type APIRequestContext, type Browser, type Page } from 'playwright/test';
import { press as pressKey, typeInto } from './support/by-keys.ts';
import { stateOf, type DemoName } from './support/demo-people.ts';
import { letterTo, linkIn } from './support/mail-tray.ts';
import { newPerson, signInHere } from './support/new-person.ts';
import { newStudent } from './support/take-seat.ts';
import { expectFaultless, test } from './support/test.ts';

const press = (page: Page, name: string | RegExp): Promise<void> => page.getByRole('main').getByRole('button', { name, exact: true }).click();
const pageOf = async (browser: Browser, who: DemoName): Promise<Page> => (await browser.newContext({ storageState: stateOf(who) })).newPage();

test('a student is shown what was asked before, asks all the same without script, and reads a helper’s answer', async ({ page, browser, request }) => {
  test.slow();
  const { email } = await newStudent(page, request);
  const plain = await browser.newContext({ javaScriptEnabled: false, storageState: await page.context().storageState() });
  const asking = await plain.newPage();
  await asking.goto('/series/low-tide/1');
  await asking.getByText('Ask a question on this part').click();
  const form = asking.getByRole('form', { name: 'Ask' });
  await form.getByRole('button', { name: 'Ask', exact: true }).click();
  await expect(form.getByLabel('Your question')).toHaveAccessibleDescription(/Your question is missing/);

  const words = `Does wool fill the rows at 8 mm? <b>${email}</b>`;
  await form.getByLabel('Your question').fill(words);
  await form.getByRole('button', { name: 'Ask', exact: true }).click();
  await expect(form.getByRole('status')).toContainText('This was asked before in like words');
  await expect(form.getByRole('status')).toContainText('Wind ten centimetres as a trial');
  await expect(form.getByLabel('Your question')).toHaveValue(words);
  await form.getByRole('button', { name: 'Ask it all the same' }).click();
  const question = asking.getByRole('article', { name: 'Question of yours' });
  await expect(question).toContainText(words);
  await expect(question).toContainText('Waits for Ilse');
  await plain.close();

  const wren = await pageOf(browser, 'wren');
  await wren.goto('/workroom/questions');
  const waiting = wren.getByRole('article').filter({ hasText: words });
  // Older ones stand before it: only the first stands open.
  if (!(await waiting.getByLabel('Your answer to Nell').isVisible())) await pressKey(wren, waiting.getByText(/^Answer/).first());
  await typeInto(wren, waiting.getByLabel('Your answer to Nell'), 'It does, with the ends double.');
  await pressKey(wren, waiting.getByRole('button', { name: 'Send the answer' }));
  await expect(wren.getByText('Your answer is sent to Nell.')).toBeVisible();
  await expectFaultless(wren);
  await wren.context().close();

  const letter = await letterTo(request, email, 'Wren Okafor answered your question');
  expect(letter.text).toContain('Wren Okafor, who helps Ilse Marrow, answers:\n\nIt does, with the ends double.');
  await page.goto(linkIn(letter, '/series/'));
  const mine = page.getByRole('article', { name: 'Question of yours' });
  await expect(mine.getByRole('blockquote')).toContainText('helps Ilse');
  await expect(mine.getByText('Change', { exact: false })).toHaveCount(0);
  await mine.getByRole('button', { name: 'Take out your question' }).click();
  await expect(mine).toContainText('Taken out. Nobody sees it but you.');
  await mine.getByRole('button', { name: /^Put it back/ }).click();
  await expect(mine).toContainText(words);
});

test('words of the class are reported to the steward, who lets them stand', async ({ browser }) => {
  const jonas = await pageOf(browser, 'jonas');
  await jonas.goto('/series/low-tide/1');
  const maud = jonas.getByRole('article', { name: 'Question of Maud Ellery' });
  await maud.getByText(/^Report/).first().click();
  await maud.getByRole('button', { name: 'Tell the steward' }).first().click();
  await expect(jonas.getByText('Say in a few words why it should not stand there.')).toBeVisible();
  await maud.getByLabel('Why should it not stand there?').first().fill('A trial');
  await maud.getByRole('button', { name: 'Tell the steward' }).first().click();
  await expect(jonas.getByText('Told to the steward, who looks at it.')).toBeVisible();
  await jonas.context().close();

  const pell = await pageOf(browser, 'pell');
  await pell.goto('/office/reports');
  await expectFaultless(pell);
  await pell.getByRole('article', { name: 'Report of Jonas Pike' }).getByRole('button', { name: 'Let them stand' }).click();
  await expect(pell.getByText('The words stand.')).toBeVisible();
  await pell.context().close();
});

async function accept(request: APIRequestContext, link: string, site: string): Promise<number> {
  const token = new URL(link).pathname.split('/').at(-1) ?? '';
  return (await request.post(`${link}?_action=helpers.accept`, { headers: { 'sec-fetch-site': site }, form: { token }, maxRedirects: 0 })).status();
}

test('a teacher invites a helper by letter, who accepts, answers, and helps no longer once it is taken back', async ({ page, browser, request }) => {
  test.slow();
  const nell = await newPerson(request, 'Nell Fane');
  const ilse = await pageOf(browser, 'ilse');
  await ilse.goto('/workroom/helpers');
  await typeInto(ilse, ilse.getByLabel('Email'), 'ilse@saltmarsh.example');
  await ilse.keyboard.press('Enter');
  await expect(ilse.getByLabel('Email')).toHaveAccessibleDescription(/This is your own address/);
  await typeInto(ilse, ilse.getByLabel('Email'), nell.email);
  await pressKey(ilse, ilse.getByRole('button', { name: 'Send the invitation' }));
  await expect(ilse.getByText(`An invitation is on its way to ${nell.email}.`)).toBeVisible();
  await expectFaultless(ilse);
  const letter = await letterTo(request, nell.email, 'Ilse Marrow asks you to help');
  expect(letter.text).toContain('sees no money, publishes and changes nothing');
  const link = linkIn(letter, '/helping/');

  // A program that checks mail follows the link first; forms of other sites, and of nobody, change nothing.
  await request.get(link);
  expect([await accept(request, link, 'cross-site'), await accept(request, link, 'same-site'), await accept(request, link, 'same-origin'), await accept(request, link, 'none')]).toEqual([403, 403, 303, 303]);
  const amara = await pageOf(browser, 'amara');
  await amara.goto(link);
  await expect(amara.getByText('You are signed in with amara@weavers.example.')).toBeVisible();
  await amara.context().close();

  await page.goto(link);
  await expectFaultless(page);
  await page.getByRole('main').getByRole('link', { name: 'Sign in' }).click();
  await signInHere(page, nell);
  await press(page, 'Help in Saltmarsh Loom Room');
  await expect(page.getByText('You help in Saltmarsh Loom Room from now on.')).toBeVisible();
  expect((await page.goto('/workroom/questions'))?.status()).toBe(200);
  expect((await page.goto('/workroom/money'))?.status()).toBe(403);
  expect((await page.goto(link))?.status()).toBe(410);

  await ilse.goto('/workroom/helpers');
  await pressKey(ilse, ilse.getByRole('button', { name: /^End the helping of Nell Fane/ }));
  await pressKey(ilse, ilse.getByRole('dialog', { name: 'Nell Fane helps no longer?' }).getByRole('button', { name: 'End it' }));
  await expect(ilse.getByText('Nell Fane helps no longer. What she answered stays.')).toBeVisible();
  await expect(ilse.getByRole('row', { name: new RegExp(`Ilse Marrow invited ${nell.email}`) })).toBeVisible();
  await ilse.context().close();
  expect((await page.goto('/workroom/questions'))?.status()).toBe(403);
  expect((await page.goto('/account'))?.status()).toBe(200);
  await letterTo(request, nell.email, 'You help no longer in Saltmarsh Loom Room');
});
