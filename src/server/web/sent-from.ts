/** What a browser's outbox (`islands/keeping/outbox.ts`) says of a change it sends. */

export interface SentFrom {
  /** Made up by the browser, for good. */
  readonly device: string;
  /** Counts its changes; one that is sent again has the same. */
  readonly sequence: number;
  /** How long it lay there by the browser's clock; not below nothing, and not above the longest it may lie. */
  readonly waitedMs: number;
}

const LONGEST_MS = 60 * 86_400_000;
const LARGEST = 4_294_967_295;

/** Null for what no outbox sent. */
export function sentFrom(headers: Headers): SentFrom | null {
  const device = headers.get('x-fellmark-device');
  const sequence = Number(headers.get('x-fellmark-sequence') ?? Number.NaN);
  const waited = Number(headers.get('x-fellmark-waited-ms') ?? 0);
  if (device === null || !/^[0-9a-z]{16,32}$/.test(device) || !Number.isInteger(sequence) || sequence < 1 || sequence > LARGEST) return null;
  return { device, sequence, waitedMs: Number.isFinite(waited) ? Math.min(LONGEST_MS, Math.max(0, waited)) : 0 };
}
