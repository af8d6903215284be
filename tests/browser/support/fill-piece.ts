/** A small plain piece typed into the form of a pattern piece; the form offers the rest. */
import { expect, type Page } from 'playwright/test';

const SMALL = { Width: '20', Height: '20', 'Nail to nail, upright': '45', 'Nail to nail, along': '10', Tex: '500', 'Metres in 100 g': '333' } as const;

/** On the page of the piece. With script the fields are filled once it is awake, as it draws the form anew. */
export async function fillPiece(page: Page, measures: Partial<Record<keyof typeof SMALL, string>> = {}, withScript = true): Promise<void> {
  if (withScript) await expect(page.locator('astro-island[ssr]')).toHaveCount(0);
  for (const [label, words] of Object.entries({ ...SMALL, ...measures })) await page.getByRole('main').getByLabel(label, { exact: true }).first().fill(words);
}
