import { describe, expect, test } from 'vitest';
import { comesFromOwnPages, ownOrigins } from '#server/web/origin.ts';

const OWN = ['https://fellmark.example'];
const ORIGINS = { ours: 'https://fellmark.example', 'another site’s': 'https://elsewhere.example', 'hidden (null)': 'null', absent: undefined } as const;
const TYPES = ['application/x-www-form-urlencoded', 'multipart/form-data; boundary=x', 'text/plain', 'application/json', 'application/offset+octet-stream', undefined] as const;
const CHANGING = ['POST', 'PUT', 'PATCH', 'DELETE', 'TRACE'] as const;

function headers(given: Record<string, string | undefined>): Headers {
  const headers = new Headers();
  for (const [name, value] of Object.entries(given)) if (value !== undefined) headers.set(name, value);
  return headers;
}

describe.each(['GET', 'HEAD', 'OPTIONS'])('a %s, which changes nothing,', (method) => {
  test.each(['same-origin', 'none', 'same-site', 'cross-site', undefined])('may come from anywhere (Sec-Fetch-Site: %s)', (site) => {
    for (const origin of Object.values(ORIGINS)) expect(comesFromOwnPages(method, headers({ 'sec-fetch-site': site, origin }), OWN)).toBe(true);
  });
});

describe.each(CHANGING)('a %s', (method) => {
  const answers = (site: string | undefined, origin: string | undefined): Set<boolean> =>
    new Set(TYPES.map((type) => comesFromOwnPages(method, headers({ 'sec-fetch-site': site, origin, 'content-type': type }), OWN)));

  test.each(Object.entries(ORIGINS))('with an origin that is %s is judged by Sec-Fetch-Site where the browser sends it, whatever it carries', (_what, origin) => {
    expect(answers('same-origin', origin)).toEqual(new Set([true]));
    expect(answers('none', origin)).toEqual(new Set([true]));
    expect(answers('same-site', origin)).toEqual(new Set([false]));
    expect(answers('cross-site', origin)).toEqual(new Set([false]));
    expect(answers('something new', origin)).toEqual(new Set([false]));
  });

  test('of an older browser comes from our pages only with our origin', () => {
    expect(Object.fromEntries(Object.entries(ORIGINS).map(([what, origin]) => [what, [...answers(undefined, origin)]]))).toEqual({
      ours: [true], 'another site’s': [false], 'hidden (null)': [false], absent: [false],
    });
  });

  test.each(['http://fellmark.example', 'https://fellmark.example:8443', 'https://fellmark.example.elsewhere.example', 'https://www.fellmark.example', 'https://FELLMARK.example.', ''])('from %s is not ours', (origin) => {
    expect(comesFromOwnPages(method, headers({ origin }), OWN)).toBe(false);
  });
});

describe('our own origins', () => {
  test('are the public address, with its port where it has one', () => {
    expect(ownOrigins('https://fellmark.example', false)).toEqual(['https://fellmark.example']);
    expect(ownOrigins('http://127.0.0.1:4321', false)).toEqual(['http://127.0.0.1:4321']);
  });

  test('in the demo are this machine’s two names too, on the same port', () => {
    expect(ownOrigins('http://127.0.0.1:4321', true)).toEqual(['http://127.0.0.1:4321', 'http://127.0.0.1:4321', 'http://localhost:4321']);
  });
});
