/** Every numbered outside check stands in exactly one title of these tests; parts of one have letters. */
import { readdir, readFile } from 'node:fs/promises';
import { fileURLToPath } from 'node:url';
import { expect, test } from 'vitest';

const FOLDER = fileURLToPath(new URL('.', import.meta.url));

test('checks 1 to 68 and facts C1 to C7 are all there, none twice', async () => {
  const files = (await readdir(FOLDER)).filter((name) => name.endsWith('.test.ts'));
  const texts = await Promise.all(files.map((name) => readFile(`${FOLDER}${name}`, 'utf8')));
  const labels = texts.flatMap((text) => [...text.matchAll(/['`](C?\d{1,2}[a-z]?): /gu)].map(([, label = '']) => label));
  const wanted = [...Array.from({ length: 68 }, (_, index) => String(index + 1)), ...Array.from({ length: 7 }, (_, index) => `C${String(index + 1)}`)];
  const numbers = new Set(labels.map((label) => label.replace(/[a-z]$/u, '')));
  expect(wanted.filter((number) => !numbers.has(number))).toEqual([]);
  expect([...numbers].filter((number) => !wanted.includes(number))).toEqual([]);
  expect(labels.filter((label, index) => labels.indexOf(label) !== index || (/[a-z]$/u.test(label) && labels.includes(label.slice(0, -1))))).toEqual([]);
});
