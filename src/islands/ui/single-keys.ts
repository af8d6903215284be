/** Whether keys pressed alone do something. People who speak to their machine turn them off; kept in this browser. */

const NAME = 'fellmark-single-keys';

/** On, unless they were turned off here. Where nothing can be kept, on. */
export function singleKeysWork(): boolean {
  try {
    return localStorage.getItem(NAME) !== 'off';
  } catch {
    return true;
  }
}

export function setSingleKeys(work: boolean): void {
  try {
    if (work) localStorage.removeItem(NAME);
    else localStorage.setItem(NAME, 'off');
  } catch {
    // A browser that keeps nothing forgets it with the page.
  }
}
