/** Which content coding to answer with (RFC 9110 section 12.5.3). */

export type Coding = 'br' | 'gzip';

const OUR_ORDER: readonly Coding[] = ['br', 'gzip'];

/**
 * The coding of `available` that the client likes best, ours first among equals; undefined for the plain body.
 * @param header the Accept-Encoding header as received
 */
export function acceptedCoding(header: string | undefined, available: readonly Coding[] = OUR_ORDER): Coding | undefined {
  if (header === undefined) return undefined;
  const weights = new Map<string, number>();
  for (const part of header.split(',')) {
    const [name = '', ...parameters] = part.split(';').map((word) => word.trim().toLowerCase());
    const weight = parameters.find((parameter) => parameter.startsWith('q='));
    weights.set(name, weight === undefined ? 1 : Number(weight.slice(2)) || 0);
  }
  let best: Coding | undefined;
  let bestWeight = 0;
  for (const coding of OUR_ORDER) {
    const weight = weights.get(coding) ?? weights.get('*') ?? 0;
    if (available.includes(coding) && weight > bestWeight) {
      best = coding;
      bestWeight = weight;
    }
  }
  return best;
}

/** Adds Accept-Encoding to a Vary header's value. */
export function varyByEncoding(vary: number | string | readonly string[] | undefined): string {
  const names = vary === undefined ? [] : String(vary).split(',').map((name) => name.trim()).filter((name) => name !== '');
  if (names.includes('*') || names.some((name) => name.toLowerCase() === 'accept-encoding')) return names.join(', ');
  return [...names, 'Accept-Encoding'].join(', ');
}
