/**
 * Results that are kept in a file beside the tests, because nobody writes a drawing's thousand numbers into one. Whoever
 * changes a drawing on purpose looks at it, writes the files anew with FELLMARK_KEEP=on, and reads what changed in them.
 * That they are right is for other tests to say; these say that they are the same.
 */
import { existsSync, readFileSync, writeFileSync } from 'node:fs';
import { expect } from 'vitest';

type Json = string | number | boolean | null | readonly Json[] | { readonly [key: string]: Json };

const files = new Map<string, Record<string, Json>>();
const rewriting = process.env['FELLMARK_KEEP'] === 'on';

function kept(file: URL): Record<string, Json> {
  let known = files.get(file.href);
  if (known === undefined) {
    known = !rewriting && existsSync(file) ? (JSON.parse(readFileSync(file, 'utf8')) as Record<string, Json>) : {};
    files.set(file.href, known);
  }
  return known;
}

/** @param value plain: what is missing in it is missing in the file */
export function expectKept(file: URL, name: string, value: unknown): void {
  const known = kept(file);
  const plain = JSON.parse(JSON.stringify(value)) as Json;
  if (rewriting) {
    known[name] = plain;
    writeFileSync(file, `${JSON.stringify(known, null, 1)}\n`);
  } else expect(plain, `${name}: written anew with FELLMARK_KEEP=on`).toEqual(known[name]);
}

/** What a drawing is made of, one line each, in the order in which it is laid. */
export function marksOf(svg: string): string[] {
  return [...svg.matchAll(/<([^/][^>]*)>([^<]*)/gu)].map(([, mark = '', words = '']) => `${mark.replaceAll('"', '').replace(/\/$/u, '')}${words === '' ? '' : ` ${words}`}`);
}

/** A drawing in a line, for one of many: how many marks it has, and a sum (FNV-1a) over all that it holds. */
export function gistOf(svg: string): string {
  let sum = 0x811c9dc5;
  for (let at = 0; at < svg.length; at++) sum = Math.imul(sum ^ svg.charCodeAt(at), 0x01000193);
  return `${String(marksOf(svg).length)} marks ${(sum >>> 0).toString(16).padStart(8, '0')}`;
}

/** A long number as a drawing and a plan need it: to a thousandth. */
export function thousandths(value: unknown): unknown {
  if (typeof value === 'number') return Math.round(value * 1000) / 1000;
  if (Array.isArray(value)) return value.map(thousandths);
  if (typeof value === 'object' && value !== null) return Object.fromEntries(Object.entries(value).map(([key, own]) => [key, thousandths(own)]));
  return value;
}
