import { randomBytes } from 'node:crypto';
import { expect, type Page } from 'playwright/test';
import { letterTo, linkIn } from './support/mail-tray.ts';
import { test } from './support/test.ts';

const DEMO_PASSWORD = process.env['FELLMARK_TEST_PASSWORD'] ?? '';
const FIRST = 'nine kettles on a beam';
const SECOND = 'grey wool in the tide';
const somebody = (): string => `nell.${randomBytes(4).toString('hex')}@weavers.example`;

const press = (page: Page, name: string): Promise<void> => page.getByRole('main').getByRole('button', { name, exact: true }).click();

async function signUp(page: Page, address: string): Promise<void> {
  await page.goto('/sign-up');
  await page.getByLabel('Your name').fill('Nell Fane');
  await page.getByLabel('Email').fill(address);
  await page.getByLabel('Password', { exact: true }).fill(FIRST);
  await press(page, 'Make my account');
  await expect(page.getByRole('status')).toContainText(`A letter is on its way to ${address}.`);
}

async function signIn(page: Page, address: string, password: string, to = '/account'): Promise<void> {
  await page.goto(`/sign-in?to=${to}`);
  await page.getByLabel('Email').fill(address);
  await page.getByLabel('Password', { exact: true }).fill(password);
  await press(page, 'Sign in');
}

for (const javaScriptEnabled of [true, false]) {
  test.describe(javaScriptEnabled ? 'with script' : 'without script', () => {
    test.use({ javaScriptEnabled });

    test('somebody makes an account, confirms her address and signs out', async ({ page, request }) => {
      const address = somebody();
      await page.goto('/sign-up');
      await page.getByLabel('Your name').fill('Nell Fane');
      await page.getByLabel('Email').fill('nell@');
      await page.getByLabel('Password', { exact: true }).fill('nellfane');
      await press(page, 'Make my account');
      await expect(page.getByLabel('Email')).toHaveAccessibleDescription(/The part after the @ is missing\. Write it like name@saltmarsh\.example\./);
      await expect(page.getByLabel('Email')).toBeFocused();
      await expect(page.getByLabel('Your name')).toHaveValue('Nell Fane');

      await signUp(page, address);
      const link = linkIn(await letterTo(request, address, 'Confirm your address'), '/confirm/');
      await signIn(page, address, FIRST);
      await expect(page.getByText('Waits for you to confirm it')).toBeVisible();

      // A program that checks mail follows the link first.
      await request.get(link);
      await page.goto(link);
      await press(page, 'Confirm this address');
      await expect(page).toHaveURL(/\/account$/);
      await expect(page.getByText('Confirmed', { exact: true })).toBeVisible();
      await page.goto(link);
      await expect(page.getByRole('heading', { name: 'This link has ended' })).toBeVisible();

      await page.goto('/account');
      await page.getByRole('main').getByRole('button', { name: /^Sign out/ }).first().click();
      await expect(page.getByText('Signed out.')).toBeVisible();
      await page.goto('/account');
      await expect(page).toHaveURL(/\/sign-in\?to=%2Faccount$/);
    });

    test('somebody who forgot her password chooses a new one by a link, once', async ({ page, request }) => {
      const address = somebody();
      await signUp(page, address);
      await page.goto('/sign-in');
      await page.getByLabel('Email').fill(address);
      await press(page, 'Send me a link instead');
      await expect(page.getByText(`A link is on its way to ${address}. It works for 20 minutes, once.`)).toBeVisible();
      const link = linkIn(await letterTo(request, address, 'Choose a new password'), '/new-password/');

      await page.goto(link);
      await page.getByLabel('New password', { exact: true }).fill('short');
      await press(page, 'Set the new password');
      await expect(page.getByLabel('New password', { exact: true })).toHaveAccessibleDescription(/At least 12 work/);
      await page.getByLabel('New password', { exact: true }).fill(SECOND);
      await press(page, 'Set the new password');
      await expect(page.getByText('Your new password is set')).toBeVisible();
      await letterTo(request, address, 'Your password was changed');
      expect((await page.goto(link))?.status()).toBe(410);

      await signIn(page, address, FIRST);
      await expect(page.getByText('Address and password do not belong together. Try again, or have a link sent.')).toBeVisible();
      await signIn(page, address, SECOND);
      await expect(page.getByRole('heading', { name: 'Account' })).toBeVisible();
    });

    test('somebody changes her name, units and password, and her other browser is signed out', async ({ page, browser }) => {
      const address = somebody();
      await signUp(page, address);
      await signIn(page, address, FIRST);
      const elsewhere = await browser.newPage();
      await signIn(elsewhere, address, FIRST);
      await expect(elsewhere.getByRole('heading', { name: 'Account' })).toBeVisible();

      await page.getByLabel('Your name').fill('Nell F.');
      await page.getByRole('radio', { name: 'inches, g' }).check();
      await page.getByLabel('Time zone').fill('Mars/Base');
      await press(page, 'Save');
      await expect(page.getByLabel('Time zone')).toHaveAccessibleDescription(/There is no such time zone/);
      await expect(page.getByLabel('Your name')).toHaveValue('Nell F.');
      await page.getByLabel('Time zone').fill('Europe/Berlin');
      await press(page, 'Save');
      await expect(page.getByRole('radio', { name: 'inches, g' })).toBeChecked();

      await page.getByLabel('Old password').fill(FIRST);
      await page.getByLabel('New password', { exact: true }).fill(SECOND);
      await press(page, 'Change the password');
      await expect(page.getByText('Your password is changed.')).toBeVisible();
      await elsewhere.goto('/account');
      await expect(elsewhere).toHaveURL(/\/sign-in/);
      await elsewhere.close();
    });

    test('the steward lets somebody in as a teacher, suspends and restores her', async ({ page, browser, request }) => {
      const address = somebody();
      const hers = await browser.newPage();
      await signUp(hers, address);
      await signIn(page, 'pell@office.example', DEMO_PASSWORD, '/office/people');
      await page.getByLabel('Name, address or workroom').fill(address);
      await press(page, 'Search');
      await page.getByRole('link', { name: 'Nell Fane' }).click();

      await page.getByLabel('Name of the workroom').fill('Driftwood Looms');
      await page.getByLabel('Handle').fill('Driftwood Looms');
      await press(page, 'Let in as a teacher');
      await expect(page.getByLabel('Handle')).toHaveAccessibleDescription(/Small letters, figures and single hyphens work/);
      await page.getByLabel('Handle').fill(`driftwood-${randomBytes(3).toString('hex')}`);
      await press(page, 'Let in as a teacher');
      await expect(page.getByText('Nell Fane is let in as a teacher.')).toBeVisible();
      await letterTo(request, address, 'Your workroom is open');

      await page.getByLabel('Reason').fill('A trial');
      await press(page, 'Suspend Nell Fane');
      await expect(page.getByText('Nell Fane is suspended and signed out.')).toBeVisible();
      await signIn(hers, address, FIRST);
      await expect(hers.getByText('Address and password do not belong together.')).toBeVisible();
      await press(page, 'Restore Nell Fane');
      await signIn(hers, address, FIRST);
      await expect(hers.getByRole('heading', { name: 'Account' })).toBeVisible();

      await page.goto('/office/log');
      await expect(page.getByRole('row', { name: /Pell Harrow Restore person Nell Fane/ }).first()).toBeVisible();
      await hers.close();
    });
  });
}

test('a password is shown while one wants to see it, and is sent hidden', async ({ page }) => {
  await page.goto('/sign-in');
  const field = page.getByLabel('Password', { exact: true });
  await field.fill('wrong wrong wrong');
  await page.getByRole('button', { name: 'Show password' }).click();
  await expect(field).toHaveAttribute('type', 'text');
  await page.getByRole('button', { name: 'Hide password' }).click();
  await expect(field).toHaveAttribute('type', 'password');
});

test('the office is not there for anybody else', async ({ page }) => {
  await signIn(page, 'amara@weavers.example', DEMO_PASSWORD);
  for (const path of ['/office', '/office/people', '/office/mail', '/office/jobs', '/office/log']) expect((await page.goto(path))?.status()).toBe(404);
});
