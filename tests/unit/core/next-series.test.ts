import { expect, test } from 'vitest';
import { nextSeries } from '#core/series/next-series.ts';

const FINISHED = { slug: 'low-tide', handle: 'saltmarsh', techniques: ['Tabby', 'soumak', 'rya'] };
const of = (slug: string, handle: string, ...techniques: string[]) => ({ slug, handle, techniques });
const told = (open: readonly ReturnType<typeof of>[], had: readonly string[] = []) => nextSeries(FINISHED, open, new Set(had), 3).map(({ series: { slug }, byTeacher, shared }) => [slug, byTeacher, shared.join()]);

test('the teacher’s own comes first, then what has most in common', () => {
  expect(told([of('one', 'cordage', 'tabby'), of('two', 'cordage', 'soumak', 'TABBY '), of('hers', 'saltmarsh', 'felting')])).toEqual([['hers', true, ''], ['two', false, 'soumak,TABBY '], ['one', false, 'tabby']]);
});

test('what she has, what she finished and what has nothing in common is not suggested', () => {
  expect(told([of('low-tide', 'saltmarsh', 'tabby'), of('has', 'saltmarsh', 'tabby'), of('cords', 'cordage', 'square knot')], ['has'])).toEqual([]);
});

test('at most three are', () => {
  expect(told(['a', 'b', 'c', 'd'].map((slug) => of(slug, 'x', 'rya')))).toHaveLength(3);
});
