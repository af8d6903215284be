import { existsSync } from 'node:fs';
import { expect, test } from 'vitest';
import { GUIDED_TECHNIQUES, techniqueGuide, techniqueKey } from '#core/series/technique-guide.ts';

test.each([
  ['Square knots', 'square-knot'],
  ['square-knot', 'square-knot'],
  ['Lark’s head', 'larks-head'],
  ['plain weave', 'tabby'],
  ['Rölakan', 'rolakan'],
  ['  hem stitch ', 'hem-stitch'],
  ['§!', ''],
])('%s is the technique %s', (name, key) => {
  expect(techniqueKey(name)).toBe(key);
});

test('every guided technique is its own key and has its page in the handbook', () => {
  for (const key of GUIDED_TECHNIQUES) {
    expect(techniqueKey(key)).toBe(key);
    expect(existsSync(`content/handbook/${techniqueGuide(key)?.page ?? ''}.mdx`), key).toBe(true);
  }
  expect(techniqueGuide('constructor')).toBeNull();
});
