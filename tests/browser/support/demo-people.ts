/**
 * The people of the demo world, signed in. Each signs in once for a whole run and the cookies are kept in a file, since
 * signing in is limited, and hundreds of pages are looked at. Journeys that sign out sign in by themselves.
 */
import { mkdir, readFile, writeFile } from 'node:fs/promises';
import os from 'node:os';
import path from 'node:path';
import { request, type BrowserContextOptions } from 'playwright/test';

export const DEMO = {
  amara: 'amara@weavers.example',
  jonas: 'jonas@weavers.example',
  maud: 'maud@weavers.example',
  teodor: 'teodor@cordage.example',
  ilse: 'ilse@saltmarsh.example',
  wren: 'wren@saltmarsh.example',
  pell: 'pell@office.example',
} as const;
export type DemoName = keyof typeof DEMO;

function fileOf(name: DemoName): string {
  const site = new URL(process.env['FELLMARK_TEST_URL'] ?? 'http://nowhere').port;
  return path.join(os.tmpdir(), `fellmark-signed-in-${site}`, `${name}.json`);
}

/** Signs everybody in; done once, before the tests. */
export async function signEverybodyIn(): Promise<void> {
  for (const name of Object.keys(DEMO) as DemoName[]) {
    const context = await request.newContext({ baseURL: process.env['FELLMARK_TEST_URL'] ?? '' });
    const answer = await context.post('/sign-in?_action=people.signIn', {
      headers: { 'sec-fetch-site': 'same-origin' },
      form: { email: DEMO[name], password: process.env['FELLMARK_TEST_PASSWORD'] ?? '' },
      maxRedirects: 0,
    });
    if (answer.status() !== 303) throw new Error(`${name} could not sign in: ${answer.status()} ${await answer.text()}`);
    await mkdir(path.dirname(fileOf(name)), { recursive: true });
    await writeFile(fileOf(name), JSON.stringify(await context.storageState()));
    await context.dispose();
  }
}

/** For `test.use({ storageState })`, `browser.newContext` and `request.newContext`. */
export function stateOf(name: DemoName): string {
  return fileOf(name);
}

/** The cookies of a person as a header, for bare requests. */
export async function cookieOf(name: DemoName): Promise<string> {
  const state = JSON.parse(await readFile(fileOf(name), 'utf8')) as Exclude<BrowserContextOptions['storageState'], string | undefined>;
  return state.cookies.map((cookie) => `${cookie.name}=${cookie.value}`).join('; ');
}
