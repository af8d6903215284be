/**
 * A seat for a person of a journey's own, bought by the forms everybody sends, without a look at their pages: those are
 * looked at where buying is walked.
 */
import { expect, type APIRequestContext, type APIResponse, type Page } from 'playwright/test';
import { newPerson, type NewPerson } from './new-person.ts';
import { CARD } from './pay.ts';

const LOW_TIDE = { slug: 'low-tide', title: 'Low Tide', parts: 7 };
const SENT_ON = 303;

/** Signs a new person in on `page` and buys her the seat. */
export async function newStudent(page: Page, request: APIRequestContext, series = LOW_TIDE, name?: string): Promise<NewPerson> {
  const student = await newPerson(request, name);
  const send = async (address: string, form: Record<string, string>): Promise<APIResponse> => {
    const answer = await page.request.post(address, { headers: { 'sec-fetch-site': 'same-origin' }, form, maxRedirects: 0 });
    expect(answer.status(), `${address}: ${await answer.text()}`).toBe(SENT_ON);
    return answer;
  };
  await send('/sign-in?_action=people.signIn', { ...student });
  const payPage = (await send(`/series/${series.slug}?_action=checkout.begin`, { series: series.slug, startAtOnce: 'on', withdrawalGivenUp: 'on' })).headers()['location'] ?? '';
  await send(payPage, { do: 'pay', email: student.email, number: CARD, expiry: '12/34', cvc: '123', country: 'DE' });
  // News from the bank may take a moment; the loom shows the seat as soon as it is there.
  await expect.poll(async () => (await (await page.request.get('/loom')).text()).includes(`, Part 1 of ${series.parts}<`), {
    message: `no seat in ${series.title} came to ${student.email}`, timeout: 30_000,
  }).toBe(true);
  return student;
}
