import { expect, test } from 'vitest';
import { minutesText } from '#core/units/minutes-text.ts';

test.each([[50, '50\u00a0min'], [60, '1\u00a0h'], [100, '1\u00a0h\u00a040'], [125, '2\u00a0h\u00a005']])('%i minutes are %s', (minutes, words) => {
  expect(minutesText(minutes)).toBe(words);
});
