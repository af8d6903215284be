/**
 * The reckoner as a weaver meets it: without script, by keyboard alone, on a phone, on paper; and as a program asks it.
 */
import { expect } from 'playwright/test';
import { faultsOf, WIRE_ROWS } from '../reference/wire-rows.ts';
import { expectFaultless, test } from './support/test.ts';

const PARTS = ['One yarn', 'Ends and spacing', 'How much yarn', 'Soumak', 'Rya', 'Shapes', 'Rod and cord', 'A whole hanging'];

test('every check row that can be sent is answered right over HTTP', async ({ request }) => {
  const faults: string[] = [];
  for (const row of WIRE_ROWS) {
    const response = await request.post('/api/reckon', { data: row.question });
    faults.push(...faultsOf(row, { status: response.status(), body: await response.json() }).map((fault) => `${row.row}: ${fault}`));
  }
  expect(faults).toEqual([]);
});

test('its description for programs is served to whoever asks', async ({ request }) => {
  const response = await request.get('/api/openapi.json');
  expect(response.headers()['content-type']).toContain('application/json');
  expect(response.headers()['access-control-allow-origin']).toBe('*');
  expect(await response.json()).toMatchObject({ openapi: '3.1.0', paths: { '/api/reckon': {} } });
});

test.describe('without script', () => {
  test.use({ javaScriptEnabled: false });

  test('the form is sent, answers, says what is wrong at the field, and its address keeps what was typed', async ({ page }) => {
    await page.goto('/reckoner');
    await page.getByLabel('Finished width').fill('20');
    await page.getByRole('button', { name: 'Reckon' }).first().click();
    await expect(page.getByText('Warp ends', { exact: true }).first().locator('..')).toContainText('42 ends');
    expect(page.url()).toContain('width=20');
    await page.getByLabel('in, oz').check();
    await page.getByLabel('From nail to nail', { exact: true }).fill('5 7/16 mm');
    await page.getByLabel('Shape', { exact: true }).selectOption('circle');
    await page.getByRole('button', { name: 'Reckon' }).first().click();
    await expect(page.getByLabel('Finished width')).toHaveValue('7 7/8');
    await expect(page.getByLabel('Radius')).toHaveValue('2 3/8');
    await page.getByLabel('Wraps in an inch').fill('99');
    await page.getByRole('button', { name: 'Reckon' }).first().click();
    await expect(page.getByText('Wraps in an inch: between 1 and 60 works.')).toBeVisible();
    await page.reload();
    await expect(page.getByLabel('Wraps in an inch')).toHaveValue('99');
  });

  test('how an answer was got unfolds, and leads to what gave it', async ({ page }) => {
    await page.goto('/reckoner');
    await page.locator('summary', { hasText: '“Warp ends”' }).first().click();
    const ends = page.locator('#how-sett-ends-count');
    await expect(ends).toContainText('warp ends = n + r = 62');
    await ends.getByRole('link', { name: 'reckoned: see how' }).first().click();
    await expect(page.locator('#how-sett-ends-rounded')).toBeVisible();
  });
});

test('by keyboard alone: type, hear, follow a number back, copy the link', async ({ page, context }) => {
  await context.grantPermissions(['clipboard-read', 'clipboard-write']);
  await page.goto('/reckoner');
  await expect(page.getByRole('button', { name: 'Copy link' })).toBeVisible();
  await page.getByLabel('Finished width').focus();
  await page.keyboard.press('ControlOrMeta+A');
  await page.keyboard.type('45');
  await expect(page.getByText('Warp ends', { exact: true }).first().locator('..')).toContainText('92 ends');
  await page.keyboard.press('Tab');
  await expect(page.getByLabel('From nail to nail', { exact: true })).toBeFocused();
  await page.locator('summary', { hasText: '“Warp ends”' }).first().focus();
  await page.keyboard.press('Enter');
  await page.locator('#how-sett-ends-count').getByRole('link').first().focus();
  await page.keyboard.press('Enter');
  await expect(page.locator('#how-sett-ends-rounded')).toBeFocused();
  await page.getByRole('button', { name: 'Copy link' }).focus();
  await page.keyboard.press('Enter');
  await expect(page.getByText('Link copied.')).toBeVisible();
  const link = await page.evaluate(() => navigator.clipboard.readText());
  await page.goto(link);
  await expect(page.getByLabel('Finished width')).toHaveValue('45');
});

test('what cannot be used is said at its field, and the other parts answer on', async ({ page }) => {
  await page.goto('/reckoner');
  await expect(page.getByRole('button', { name: 'Copy link' })).toBeVisible();
  await page.getByLabel('Pile hangs').fill('long');
  await expect(page.getByText('Write one length, like 12.5 or 4 7/8.')).toBeVisible();
  await expect(page.getByText('This answer waits for a field that cannot be used yet:')).toHaveCount(1);
  await expect(page.getByText('It fits this frame')).toBeVisible();
});

test('on a phone every part stands there, in cm and in inches', async ({ page }) => {
  await page.setViewportSize({ width: 390, height: 844 });
  for (const units of ['cm', 'in']) {
    await page.goto(`/reckoner?units=${units}&fringe=rya&shape=circle`);
    for (const part of PARTS) await expect(page.getByRole('heading', { name: part, exact: true })).toBeVisible();
    await expectFaultless(page);
  }
});

for (const format of ['A4', 'Letter'] as const) {
  test(`all of it prints on one page of ${format}`, async ({ page }) => {
    await page.goto('/reckoner?units=in&fringe=rya&wraps=10&ball-length=98&ball-weight=1.75&together=2&parity=any');
    const pdf = await page.pdf({ format, preferCSSPageSize: false });
    expect([...pdf.toString('latin1').matchAll(/\/Type\s*\/Page\b/gu)]).toHaveLength(1);
    await page.emulateMedia({ media: 'print' });
    for (const part of PARTS) await expect(page.getByRole('heading', { name: part, exact: true })).toBeVisible();
    await expect(page.getByText('Copy link')).toBeHidden();
  });
}
