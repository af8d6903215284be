/** A person of a journey's own, with a confirmed address, so that no journey changes the people of another. */
import { randomBytes } from 'node:crypto';
import { expect, type APIRequestContext, type Page } from 'playwright/test';
import { letterTo, linkIn } from './mail-tray.ts';

export interface NewPerson {
  readonly email: string;
  readonly password: string;
}

const FROM_HERE = { 'sec-fetch-site': 'same-origin' };

export async function newPerson(request: APIRequestContext, name = 'Nell Fane'): Promise<NewPerson> {
  const person = { email: `nell.${randomBytes(4).toString('hex')}@weavers.example`, password: 'nine kettles on a beam' };
  const made = await request.post('/sign-up?_action=people.signUp', { headers: FROM_HERE, form: { name, ...person }, maxRedirects: 0 });
  expect(made.status(), await made.text()).toBe(303);
  const link = linkIn(await letterTo(request, person.email, 'Confirm your address'), '/confirm/');
  const token = new URL(link).pathname.split('/').at(-1) ?? '';
  const confirmed = await request.post(`/confirm/${token}?_action=people.confirmAddress`, { headers: FROM_HERE, form: { token }, maxRedirects: 0 });
  expect(confirmed.status(), await confirmed.text()).toBe(303);
  return person;
}

/** Types address and password into the page of the door she stands at. */
export async function signInHere(page: Page, { email, password }: NewPerson): Promise<void> {
  await page.getByLabel('Email').fill(email);
  await page.getByLabel('Password', { exact: true }).fill(password);
  await page.getByRole('main').getByRole('button', { name: 'Sign in', exact: true }).click();
}
