/** Changing and choosing text in a field so that its own undo keeps working. */
import type { Stretch } from '#islands/workroom/lines.ts';
import type { PutIn } from '#islands/workroom/put-in.ts';

/** Puts the focus into the field with `stretch` chosen and in sight. */
export function choose(field: HTMLTextAreaElement, { from, to }: Stretch): void {
  field.focus({ preventScroll: true });
  field.setSelectionRange(from, to);
  field.scrollTop = Math.max(0, heightOf(field, to) - field.clientHeight / 2);
  field.scrollIntoView({ block: 'nearest' });
}

export function replaceStretch(field: HTMLTextAreaElement, { from, to, text, selectFrom, selectTo }: PutIn): void {
  type(field, from, to, text);
  choose(field, { from: selectFrom, to: selectTo });
}

export function replaceAll(field: HTMLTextAreaElement, text: string): void {
  type(field, 0, field.value.length, text);
}

/** As if it were typed: only so does a browser keep the change in its undo. */
function type(field: HTMLTextAreaElement, from: number, to: number, text: string): void {
  field.focus({ preventScroll: true });
  field.setSelectionRange(from, to);
  const before = field.value;
  // eslint-disable-next-line @typescript-eslint/no-deprecated -- nothing else keeps a field's own undo
  const typed = text === '' ? document.execCommand('delete') : document.execCommand('insertText', false, text);
  if (typed && field.value !== before) return;
  field.setRangeText(text, from, to, 'end');
  field.dispatchEvent(new Event('input', { bubbles: true }));
}

/** How far down the place `to` lies, lines that run over counted: measured on a double that holds only what comes before. */
function heightOf(field: HTMLTextAreaElement, to: number): number {
  const double = field.cloneNode();
  if (!(double instanceof HTMLTextAreaElement) || field.parentElement === null) return 0;
  double.removeAttribute('id');
  double.removeAttribute('name');
  double.setAttribute('aria-hidden', 'true');
  Object.assign(double.style, { position: 'absolute', visibility: 'hidden', width: `${field.offsetWidth}px`, height: '0', minHeight: '0' });
  double.value = field.value.slice(0, to);
  field.parentElement.append(double);
  const height = double.scrollHeight;
  double.remove();
  return height;
}
