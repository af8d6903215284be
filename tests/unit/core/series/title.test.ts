import { expect, test } from 'vitest';
import { titleHalves } from '#core/series/title.ts';

test.each([
  ['Low Tide: a woven wall hanging in seven parts', 'Low Tide', 'A woven wall hanging in seven parts'],
  ['Salt Stripe', 'Salt Stripe', ''],
  ['12:30 at the loom', '12:30 at the loom', ''],
  [': nothing before', ': nothing before', ''],
])('"%s" has the name "%s" and the rest "%s"', (title, name, rest) => {
  expect(titleHalves(title)).toEqual({ name, rest });
});
