/** Rows counted on this device lie in the browser's storage, as they must be kept before the next one is counted. */

/** Begins the names they lie under; the seat's public id follows. */
export const ROWS_HERE = 'fellmark-rows-';

/** For signing out: none stay. What was not sent is in the outbox, too, and asked about there. */
export function forgetRows(): void {
  try {
    for (const name of Object.keys(localStorage)) if (name.startsWith(ROWS_HERE)) localStorage.removeItem(name);
  } catch {
    // A browser that keeps nothing has none.
  }
}
