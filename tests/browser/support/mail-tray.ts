/** Letters that reached the mail tray, which stands in for everybody's mailbox. */
import { expect, type APIRequestContext } from 'playwright/test';

interface TrayLetter {
  readonly to: string;
  readonly subject: string;
  readonly text: string;
}

/** The newest letter to `address` under `subject`; the worker may take a moment. */
export async function letterTo(request: APIRequestContext, address: string, subject: string): Promise<TrayLetter> {
  let found: TrayLetter | undefined;
  await expect.poll(async () => {
    const letters = (await (await request.get(`${process.env['FELLMARK_TEST_STAND_INS'] ?? ''}/mail.json`)).json()) as TrayLetter[];
    found = letters.find((letter) => letter.to === address && letter.subject === subject);
    return found !== undefined;
  }, { message: `no letter "${subject}" came to ${address}`, timeout: 20_000 }).toBe(true);
  if (found === undefined) throw new Error('unreachable');
  return found;
}

/** The address of the first link in a letter below `path`. */
export function linkIn({ text }: TrayLetter, path: string): string {
  const link = text.split(/\s+/).find((word) => URL.canParse(word) && new URL(word).pathname.startsWith(path));
  if (link === undefined) throw new Error(`no link to ${path} in: ${text}`);
  return link;
}
