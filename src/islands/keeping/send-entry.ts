import type { Entry } from './outbox-store.ts';

/** `away`: no connection. `later`: the house is busy. `signed-out`: kept until she signs in. `refused`: it will never be taken. */
export type SendAnswer =
  | { readonly kind: 'taken'; readonly answer: unknown }
  | { readonly kind: 'away' | 'later' | 'signed-out' }
  | { readonly kind: 'refused'; readonly status: number; readonly says: string };

/**
 * Sends one entry. Headers tell the endpoint which device sends which of its changes, and for how long it waited
 * (`server/web/sent-from.ts`): nothing of it is a time of day.
 */
export async function sendEntry({ address, body, sequence, madeAt }: Entry, device: string): Promise<SendAnswer> {
  try {
    const sent = 'json' in body ? { headers: { 'content-type': 'application/json' }, body: JSON.stringify(body.json), keepalive: true } : { headers: {}, body: formOf(body.form) };
    const waited = String(Math.max(0, Math.round(Date.now() - madeAt)));
    const response = await fetch(address, {
      ...sent,
      method: 'POST',
      headers: { ...sent.headers, accept: 'application/json', 'x-fellmark-device': device, 'x-fellmark-sequence': String(sequence), 'x-fellmark-waited-ms': waited },
    });
    if (response.ok) return { kind: 'taken', answer: response.status === 204 ? null : await response.json() };
    if (response.status === 401) return { kind: 'signed-out' };
    if (response.status === 408 || response.status === 429 || response.status >= 500) return { kind: 'later' };
    const problem = (await response.json().catch(() => null)) as { title?: string } | null;
    return { kind: 'refused', status: response.status, says: problem?.title ?? '' };
  } catch {
    return { kind: 'away' };
  }
}

function formOf(fields: readonly (readonly [string, string | Blob])[]): FormData {
  const form = new FormData();
  for (const [name, value] of fields) form.append(name, value);
  return form;
}
