import { expect, it } from 'vitest';
import { glyphs } from '#islands/ui/glyphs.ts';
import { yarnDotFill } from '#islands/ui/yarn-dot.ts';

it.each(Object.entries(glyphs))('draws %s within its field of 20 by 20', (_name, path) => {
  expect(path).toMatch(/^M[MmLlHhVvCcSsQqTtAaZz0-9 .-]+$/);
  // Absolute moves are enough to tell a slip; the rest is relative to them.
  for (const [, x = '', y = ''] of path.matchAll(/M(-?[\d.]+)[ ,](-?[\d.]+)/g)) {
    for (const place of [Number(x), Number(y)]) {
      expect(place).toBeGreaterThanOrEqual(0);
      expect(place).toBeLessThanOrEqual(20);
    }
  }
});

it('lets nothing into the colour of a yarn but a colour', () => {
  expect(yarnDotFill('#2f5366')).toBe('#2f5366');
  for (const other of [undefined, '', 'red', '#12', 'url(#x)', '#2f5366" onload="x']) expect(yarnDotFill(other)).toBe('#d8d2c1');
});
