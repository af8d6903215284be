import { expect, it } from 'vitest';
import { comboMatches } from '#islands/ui/combo-matches.ts';

const options = ['Rya', 'Soumak', 'Tabby', 'Tabby with wedges', 'Twining', 'Loop pile', 'Métis'].map((label) => ({ value: label.toLowerCase(), label }));
const found = (typed: string) => comboMatches(options, typed).map(({ label }) => label);

it('offers everything before anything is typed', () => {
  expect(found('  ')).toHaveLength(options.length);
});

it('offers first what begins with the typed letters', () => {
  expect(found('w')).toEqual(['Tabby with wedges', 'Twining']);
  expect(found('t')).toEqual(['Tabby', 'Tabby with wedges', 'Twining', 'Métis']);
});

it('does not mind capitals and accents', () => {
  expect(found('METIS')).toEqual(['Métis']);
});

it('says when nothing is called so, by offering nothing', () => {
  expect(found('knitting')).toEqual([]);
});
