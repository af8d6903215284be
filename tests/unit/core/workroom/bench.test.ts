import { expect, test } from 'vitest';
import { isLate, phraseKey, phrasesOf, withPhrase } from '#core/workroom/bench.ts';

test('a phrase stands behind what is written as the next sentence', () => {
  expect(withPhrase('', 'Card sits too high')).toBe('Card sits too high');
  expect(withPhrase('Tension is even', 'Card sits too high.')).toBe('Tension is even. Card sits too high.');
  expect(withPhrase('Is it dry?  ', 'Weave on.')).toBe('Is it dry? Weave on.');
});

test('the first nine phrases have the keys 1 to 9', () => {
  expect([0, 8, 9].map(phraseKey)).toEqual(['1', '9', undefined]);
});

test('phrases are read one a line', () => {
  expect(phrasesOf(' One. \r\n\r\nTwo  here.\nOne.')).toEqual(['One.', 'Two here.']);
});

test('an answer is late after the promised days, not at their end', () => {
  const posted = new Date('2026-11-29T10:00:00Z');
  expect(isLate(posted, 2, new Date('2026-12-01T10:00:00Z'))).toBe(false);
  expect(isLate(posted, 2, new Date('2026-12-01T10:00:01Z'))).toBe(true);
  expect(isLate(posted, 3, new Date('2026-12-01T10:00:01Z'))).toBe(false);
});
