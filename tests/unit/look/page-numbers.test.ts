import fc from 'fast-check';
import { expect, it } from 'vitest';
import { pageNumbers } from '#components/ui/page-numbers.ts';

it('shows every page of a short list', () => {
  expect(pageNumbers(2, 5)).toEqual([1, 2, 3, 4, 5]);
});

it('leaves out what is far from the current page', () => {
  expect(pageNumbers(6, 12)).toEqual([1, 'gap', 5, 6, 7, 'gap', 12]);
});

it('shows a number rather than a gap that would hide only that one', () => {
  expect(pageNumbers(4, 12)).toEqual([1, 2, 3, 4, 5, 'gap', 12]);
});

it('always shows the first, the last and the current page, in order', () => {
  fc.assert(fc.property(fc.integer({ min: 1, max: 400 }), fc.integer({ min: 1, max: 400 }), (a, b) => {
    const [current, total] = [Math.min(a, b), Math.max(a, b)];
    const numbers = pageNumbers(current, total).filter((n): n is number => n !== 'gap');
    expect(numbers).toEqual([...new Set(numbers)].sort((x, y) => x - y));
    expect(numbers).toEqual(expect.arrayContaining([1, current, total]));
    expect(pageNumbers(current, total).length).toBeLessThanOrEqual(7);
  }));
});
