/**
 * Hands that own no mouse. Everything is reached by the tab key from where the focus stands, forwards or back as is nearer,
 * and pressed, ticked, chosen and typed into by keys; nothing is focused by the test itself. Keys go to the page that is
 * there: after a press that leads on, look for something of the next page before the next key.
 */
import { expect, type Locator, type Page } from 'playwright/test';

const MOST_STOPS = 150;

/**
 * Goes by the tab key until `wanted` has the focus. Most of the way the key is held down: how far it is is guessed from the
 * page, whether it was reached is asked of the focus, stop by stop.
 * @throws when the tab key never comes there.
 */
export async function tabTo(page: Page, wanted: Locator): Promise<void> {
  const away = await wanted.evaluate(stopsAway);
  const { keyboard } = page;
  if (away < 0) await keyboard.down('Shift');
  try {
    await Promise.all(Array.from({ length: Math.max(0, Math.abs(away) - 1) }, () => keyboard.down('Tab')));
    await keyboard.up('Tab');
    for (let stop = 0; stop < MOST_STOPS; stop += 1) {
      if (await wanted.evaluate((element) => (element.getRootNode() as Document | ShadowRoot).activeElement === element)) return;
      await keyboard.press('Tab');
    }
  } finally {
    if (away < 0) await keyboard.up('Shift');
  }
  throw new Error(`the tab key never comes to ${String(wanted)}`);
}

/** Runs in the page: how many stops of the tab key lie between the focus and `wanted`, about; negative: before it. */
function stopsAway(wanted: Element): number {
  const host = (element: Element): Element => {
    const root = element.getRootNode();
    return root instanceof ShadowRoot ? root.host : element;
  };
  const dialogs = [...document.querySelectorAll('dialog')].filter((dialog) => dialog.matches(':modal'));
  const within = dialogs.at(-1) ?? document.body;
  const stops = [...within.querySelectorAll<HTMLElement>('a[href], button, input, select, textarea, summary, video[controls], [tabindex], [contenteditable="true"]')].filter((element) => {
    if (element.tabIndex < 0 || element.matches(':disabled') || !element.checkVisibility({ visibilityProperty: true })) return false;
    if (!(element instanceof HTMLInputElement) || element.type !== 'radio') return true;
    const group = [...(element.form ?? document).querySelectorAll<HTMLInputElement>('input[type="radio"]')].filter(({ name }) => name === element.name);
    return (group.find(({ checked }) => checked) ?? group[0]) === element;
  });
  const upTo = (element: Element): number => stops.filter((stop) => stop === element || (stop.compareDocumentPosition(element) & Node.DOCUMENT_POSITION_FOLLOWING) !== 0).length;
  // Where nothing has the focus, the way begins at the place the address names.
  const from = document.activeElement === document.body ? document.querySelector(':target') : document.activeElement;
  return upTo(host(wanted)) - (from === null ? 0 : upTo(from));
}

/** Past the head of a page by its first stop. */
export async function skipToWork(page: Page): Promise<void> {
  await page.keyboard.press('Tab');
  await expect(page.locator('.skip')).toBeFocused();
  await page.keyboard.press('Enter');
  await expect(page.locator('#main')).toBeFocused();
}

/** Presses a button or follows a link; a box is ticked with the space bar. */
export async function press(page: Page, wanted: Locator, key: 'Enter' | ' ' = 'Enter'): Promise<void> {
  await tabTo(page, wanted);
  await page.keyboard.press(key);
}

/** Types over what stands in a field. */
export async function typeInto(page: Page, field: Locator, words: string): Promise<void> {
  await tabTo(page, field);
  await page.keyboard.press('ControlOrMeta+A');
  await page.keyboard.insertText(words);
  await expect(field).toHaveValue(words);
}

/** Goes to the radio buttons of a group and on with the arrow key to the one that is wanted. */
export async function choose(page: Page, radio: Locator): Promise<void> {
  const name = await radio.getAttribute('name') ?? '';
  const group = page.locator(`input[type="radio"][name="${name}"]`);
  const chosen = page.locator(`input[type="radio"][name="${name}"]:checked`);
  await tabTo(page, await chosen.count() === 0 ? group.first() : chosen);
  for (let stop = await group.count(); stop > 0 && !await radio.isChecked(); stop -= 1) await page.keyboard.press('ArrowDown');
  await expect(radio).toBeChecked();
}

/** Goes down a list by the arrow key to the choice that begins so. */
export async function pick(page: Page, list: Locator, begins: string): Promise<void> {
  await tabTo(page, list);
  const chosen = list.locator('option:checked');
  for (let stop = await list.locator('option').count(); stop > 0 && !(await chosen.innerText()).startsWith(begins); stop -= 1) await page.keyboard.press('ArrowDown');
  await expect(chosen).toHaveText(new RegExp(`^${begins}`));
}

/** Opens the chooser of a file by its button and takes `file`. */
export async function takeFile(page: Page, button: Locator, file: string | { name: string; mimeType: string; buffer: Buffer }): Promise<void> {
  const opens = page.waitForEvent('filechooser');
  await press(page, button);
  await (await opens).setFiles(file);
}
