import { describe, expect, test } from 'vitest';
import { choicesOf } from '#components/shop/words.ts';
import type { NamedLoom } from '#core/craft/my-piece/own-loom.ts';
import type { ShopWishes } from '#contracts/shop.ts';
import type { ShopChoices } from '#server/queries/shop/shop-series.ts';

const OPEN: ShopChoices = { open: 2, crafts: ['frame-loom', 'macrame'], techniques: ['rya', 'square knot'], levels: ['beginner'], currency: 'EUR' };
const VISITOR = { looms: [], units: 'cm' } as const;
const labels = (chosen: ShopWishes): string[] => choicesOf(OPEN, chosen, VISITOR).craft.map(({ label }) => label);

describe('the crafts to choose from', () => {
  test('are those that have a series open', () => {
    expect(labels({})).toEqual(['Any craft', 'Weaving', 'Macramé']);
  });

  test('keep the one that was chosen already, so that the form says what is looked for', () => {
    expect(labels({ craft: 'dyeing' })).toEqual(['Any craft', 'Weaving', 'Macramé', 'Natural dyeing']);
  });
});

describe('the looms to choose from', () => {
  const loom = (publicId: string, name: string, insideWidthMm: number): NamedLoom => ({ publicId, name, loom: { kind: 'nailed-frame', insideWidthMm, insideHeightMm: 600, nailPitchMm: 8, warping: 'zigzag', endsTogether: 1 } });

  test('are a person’s own first, by their names, then the usual widths', () => {
    const { loom: choices } = choicesOf(OPEN, {}, { looms: [loom('a', 'Kitchen frame', 455), loom('b', 'Old frame', 500), loom('c', 'School frame', 500)], units: 'cm' });
    expect(choices.slice(0, 4)).toEqual([
      { value: '', label: 'Any loom' }, { value: '45.5', label: expect.stringMatching(/^Kitchen frame: 4[56].cm inside$/) }, { value: '50', label: expect.stringMatching(/^Old frame, School frame: 50.cm inside$/) }, { value: 'none', label: 'No loom' },
    ]);
    expect(choices.filter(({ value }) => value === '50')).toHaveLength(1);
  });

  test('keep a width that only the address names', () => {
    expect(choicesOf(OPEN, { loom: '47' }, VISITOR).loom.at(-1)).toMatchObject({ value: '47', label: expect.stringMatching(/^47.cm inside$/) });
  });
});

test('the order says what holds when nothing is chosen', () => {
  expect(choicesOf(OPEN, {}, VISITOR).sort[0]?.label).toBe('Newest');
  expect(choicesOf(OPEN, { q: 'tide' }, VISITOR).sort.map(({ label }) => label)).toEqual(['Nearest', 'Newest', 'By title', 'Shortest']);
});
