import { describe, expect, test } from 'vitest';
import { choicesOf } from '#components/shop/words.ts';
import type { ShopChoices } from '#server/queries/shop/shop-series.ts';

const OPEN: ShopChoices = { open: 2, crafts: ['frame-loom', 'macrame'], techniques: ['rya', 'square knot'], levels: ['beginner'], currency: 'EUR' };
const labels = (chosen: { readonly craft?: string }): string[] => choicesOf(OPEN, chosen).craft.map(({ label }) => label);

describe('the crafts to choose from', () => {
  test('are those that have a series open', () => {
    expect(labels({})).toEqual(['Any craft', 'Weaving', 'Macramé']);
  });

  test('keep the one that was chosen already, so that the form says what is looked for', () => {
    expect(labels({ craft: 'dyeing' })).toEqual(['Any craft', 'Weaving', 'Macramé', 'Natural dyeing']);
  });
});
