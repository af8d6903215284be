import { expect, test } from 'vitest';
import { parseTime } from '#core/units/parse-time.ts';

test.each([
  ['1 h 30', 90], ['1h30', 90], ['1 h 5 min', 65], ['1:30', 90], ['2 hours 10 minutes', 130], ['90 min', 90], ['90m', 90], ['1,5', 90], ['1.5 h', 90], ['1 ½', 90], ['1½ h', 90],
  ['3/4 h', 45], ['2', 120], ['0', 0], ['45 Min.', 45], ['1\u00a0h\u00a040', 100],
])('%s is %d minutes', (typed, minutes) => {
  expect(parseTime(typed)).toEqual({ ok: true, minutes });
});

test.each([
  ['', 'Type how long it was. Write one time, like 1 h 30, 90 min or 1.5.'],
  ['all day', 'Write one time, like 1 h 30, 90 min or 1.5.'],
  ['-2', 'A time cannot be below 0.'],
  ['1 h 75', 'Between 0 and 59 minutes make up the rest of an hour.'],
  ['2 days', '“days” is no unit we know. Write h or min.'],
  ['2 toString', '“toString” is no unit we know. Write h or min.'],
  ['1/0 h', 'A fraction cannot have 0 below its line.'],
  ['1e9', 'Write one time, like 1 h 30, 90 min or 1.5.'],
  ['1 h '.repeat(20), 'That is too long for a time.'],
])('%s is told in words', (typed, reason) => {
  expect(parseTime(typed)).toEqual({ ok: false, reason });
});
