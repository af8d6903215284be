/** From the shop front to a seat: the series found, tried on a loom, paid for at the pay page, and never paid twice. */
import { expect, type Page } from 'playwright/test';
import { letterTo } from './support/mail-tray.ts';
import { newPerson, signInHere } from './support/new-person.ts';
import { CARD, payWith, REFUSED_CARD, untilSeat } from './support/pay.ts';
import { test } from './support/test.ts';

const takeSeat = (page: Page): Promise<void> => page.getByRole('button', { name: 'Take a seat' }).click();

for (const javaScriptEnabled of [true, false]) {
  test.describe(javaScriptEnabled ? 'with script' : 'without script', () => {
    test.use({ javaScriptEnabled });

    test('somebody finds Low Tide, tries it on her loom, and takes a seat', async ({ page, request, context }) => {
      const buyer = await newPerson(request);
      await page.goto('/');
      await page.getByLabel('Search').fill('ridges ilse');
      await page.getByRole('button', { name: 'Find' }).click();
      await expect(page).toHaveURL(/\/series\?.*q=ridges\+ilse/);
      await page.getByRole('link', { name: 'Low Tide', exact: true }).click();
      await expect(page.getByRole('heading', { level: 1, name: 'Low Tide' })).toBeVisible();

      await page.getByLabel('Inside width').scrollIntoViewIfNeeded();
      const reckon = page.getByRole('button', { name: 'Reckon for this loom' });
      if (javaScriptEnabled) await expect(reckon).toHaveCount(0);
      await page.getByLabel('Inside width').fill('36,0');
      await page.getByLabel('Nail spacing').fill('8');
      await page.getByLabel('Doubled').check();
      if (!javaScriptEnabled) await reckon.click();
      await expect(page.getByText('Your loom is 36 cm inside. Low Tide needs 45.6 cm.')).toBeVisible();
      await page.getByRole('link', { name: 'See it so' }).click();
      await expect(page.getByText('It fits your loom')).toBeVisible();
      await page.getByRole('heading', { name: 'Everything to gather' }).scrollIntoViewIfNeeded();
      await expect(page.getByText(/^For your own piece, 31.cm wide/)).toBeVisible();

      await takeSeat(page);
      await expect(page).toHaveURL(/\/sign-in\?to=/);
      await signInHere(page, buyer);
      await expect(page).toHaveURL(/\/series\/low-tide\?inside=36%2C0&spacing=8&ends=2&units=cm&wide=most#take$/);
      for (const box of await page.getByRole('checkbox').all()) await expect(box).not.toBeChecked();
      const tooLate = await context.newPage();
      await tooLate.goto(page.url());

      await takeSeat(page);
      await payWith(page, REFUSED_CARD);
      await expect(page.getByRole('heading', { name: 'The bank said no' })).toBeVisible();
      await page.getByRole('button', { name: 'Close' }).first().click();
      await expect(page).toHaveURL(/\/series\/low-tide\?paying=stopped/);
      await expect(page.getByRole('heading', { name: 'Nothing was taken' })).toBeVisible();
      await page.getByLabel(/^Open the parts to me at once/).check();
      await page.getByLabel(/^I know that with the first part/).check();
      await takeSeat(page);
      await payWith(page, CARD);
      await untilSeat(page, javaScriptEnabled);
      await expect(page.getByText('Part 1 is open. Start with what to gather.')).toBeVisible();

      const receipt = await letterTo(request, buyer.email, 'Your seat in Low Tide: a woven wall hanging in seven parts');
      expect(receipt.text).toContain('€68.00');
      expect(receipt.text).toContain('gave up the fourteen days');

      await page.goto('/series/low-tide');
      await expect(page.getByRole('heading', { name: 'Your seat' })).toBeVisible();
      await expect(page.getByRole('button', { name: 'Take a seat' })).toHaveCount(0);
      await takeSeat(tooLate);
      await expect(tooLate.getByText('You have a seat in this series already. It is on your loom.')).toBeVisible();
      await expect(tooLate.getByRole('heading', { name: 'Your seat' })).toBeVisible();
    });
  });
}

test('what was typed about her loom comes with the seat', async ({ page, request }) => {
  const buyer = await newPerson(request);
  await page.goto('/series/low-tide?inside=36&spacing=8&ends=2&units=cm&wide=most');
  await takeSeat(page);
  await signInHere(page, buyer);
  await takeSeat(page);
  await payWith(page, CARD);
  await untilSeat(page, true);
  await expect(page.getByText('Every amount is reckoned for your loom.')).toBeVisible();
  await page.goto('/series/low-tide');
  await expect(page.getByText(/^For your own piece, 31.cm wide/)).toBeVisible();
});

test('who has not confirmed her address is told so, and sent to nobody', async ({ page, request }) => {
  const email = `una.${Date.now().toString(36)}@weavers.example`;
  await request.post('/sign-up?_action=people.signUp', { headers: { 'sec-fetch-site': 'same-origin' }, form: { name: 'Una Reed', email, password: 'nine kettles on a beam' } });
  await page.goto('/sign-in?to=/series/low-tide');
  await signInHere(page, { email, password: 'nine kettles on a beam' });
  await page.getByLabel(/^I know that with the first part/).check();
  await takeSeat(page);
  await expect(page.getByText('Confirm your address first: the receipt goes there. The link is in your mail.')).toBeVisible();
  await expect(page.getByLabel(/^I know that with the first part/)).toBeChecked();
});
