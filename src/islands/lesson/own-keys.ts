/** What the thing with the focus does with keys by itself. */

const closest = (target: EventTarget | null, selector: string): boolean => target instanceof Element && target.closest(selector) !== null;

/** Whether the space bar presses it. */
export function pressesByItself(target: EventTarget | null): boolean {
  return closest(target, 'button, summary');
}

/** Whether it is typed into, chosen from or slid, so that no key may mean anything else. */
export function hasOwnKeys(target: EventTarget | null): boolean {
  return closest(target, 'input, select, textarea');
}
