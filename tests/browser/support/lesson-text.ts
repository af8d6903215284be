/** The text field of a part: the page's own without script, the editor's once the page is awake. */
import { expect, type Locator, type Page } from 'playwright/test';

/** The editor's field; waits by itself until the page is awake. */
export const textField = (page: Page): Locator => page.locator('.lesson-editor[data-alive]').getByRole('textbox', { name: 'Text of this part' });
const plainField = (page: Page): Locator => page.getByLabel('Text of this part');

export async function fillText(page: Page, words: string, withScript = true): Promise<void> {
  await (withScript ? textField(page) : plainField(page)).fill(words);
}

export async function expectText(page: Page, words: string, withScript = true): Promise<void> {
  if (withScript) await expect(textField(page)).toHaveText(words);
  else await expect(plainField(page)).toHaveValue(words);
}
