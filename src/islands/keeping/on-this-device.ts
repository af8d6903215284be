/** Beside every page of a signed-in person: the service worker that keeps pages, and the sending of what waits. */
import type { ToWorker } from '#contracts/kept-pages.ts';
import { forgetRows } from './rows-here.ts';
import { isWaiting, outboxOf, personOfPage, type Outbox } from './outbox.ts';

/** So long leaving waits for what is still to be sent. */
const LEAVING_MS = 4_000;

export function keepOnThisDevice({ hasWorker }: { hasWorker: boolean }): void {
  const person = personOfPage();
  if (person === null) return;
  if (hasWorker) void beginWorker().catch(() => undefined);
  const outbox = outboxOf(person);
  const send = (): void => { void outbox.flush(); };
  window.addEventListener('online', send);
  document.addEventListener('visibilitychange', () => { if (document.visibilityState === 'visible') send(); });
  document.addEventListener('submit', (event) => {
    const form = event.target;
    if (!(form instanceof HTMLFormElement) || new URL(form.action).pathname !== '/sign-out') return;
    event.preventDefault();
    void leave(form, outbox);
  });
  send();
}

/** Where the browser has none, or keeps nothing, pages are as they always were. */
async function beginWorker(): Promise<void> {
  if (!('serviceWorker' in navigator)) return;
  const isNew = navigator.serviceWorker.controller === null;
  await navigator.serviceWorker.register('/service-worker.js', { scope: '/' });
  if (!isNew) return;
  const { active } = await navigator.serviceWorker.ready;
  const { pathname, search } = window.location;
  active?.postMessage({ kind: 'opened', address: pathname + search } satisfies ToWorker);
}

/** Signs out when all is sent, or when she says that it may be lost. Pages go with the first page made for nobody. */
async function leave(form: HTMLFormElement, outbox: Outbox): Promise<void> {
  await Promise.race([outbox.flush(), new Promise((resolve) => setTimeout(resolve, LEAVING_MS))]);
  const count = outbox.current().entries.filter(isWaiting).length;
  const words = count === 1 ? 'One thing is kept on this device only and would be lost.' : `${count} things are kept on this device only and would be lost.`;
  if (count > 0 && !window.confirm(`${words} Sign out all the same?`)) return;
  await outbox.empty();
  forgetRows();
  form.submit();
}
