// The steps of a lesson as they stand in the page: which form belongs to which, what is ticked, where the fell is.
import { stepAnchor } from '#core/lesson-text/tree.ts';

/** Id of the step a form ticks; undefined for any other form. */
export function stepOf(form: HTMLFormElement): string | undefined {
  if (!form.classList.contains('step-form')) return undefined;
  const item = new FormData(form).get('item');
  return typeof item === 'string' ? item : undefined;
}

const rowOf = (step: string): HTMLElement | null => document.getElementById(stepAnchor(step));
const boxOf = (row: HTMLElement | null): HTMLButtonElement | null => row?.querySelector<HTMLButtonElement>('.step-box') ?? null;

export function tickedNow(step: string): boolean {
  return boxOf(rowOf(step))?.getAttribute('aria-pressed') === 'true';
}

/** Draws a step as done or not; the form under it then sends the opposite. */
export function markStep(step: string, ticked: boolean): void {
  const row = rowOf(step);
  const box = boxOf(row);
  if (row === null || box === null) return;
  row.classList.toggle('done', ticked);
  box.setAttribute('aria-pressed', String(ticked));
  box.value = ticked ? 'no' : 'yes';
}

/** Puts the fell over the first step that is not done. */
export function moveHere(): void {
  const rows = [...document.querySelectorAll<HTMLElement>('.step')];
  const next = rows.find((row) => boxOf(row)?.getAttribute('aria-pressed') === 'false');
  for (const row of rows) {
    const here = row === next;
    row.classList.toggle('here', here);
    if (here) row.setAttribute('aria-current', 'step');
    else row.removeAttribute('aria-current');
  }
}
