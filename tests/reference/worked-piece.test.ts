/**
 * The whole piece worked through twice, in millimetres and in inches. Both columns were
 * computed apart from this program; here they are held against it to seven figures, and
 * its own two paths against each other to twelve.
 */
import { describe, expect, test } from 'vitest';
import { expectClose } from './close.ts';
import { columnOf, IMPERIAL, METRIC } from './worked-piece.ts';
import { figures, same, TABLE } from './worked-piece-table.ts';

describe('49: the worked piece, metric and in inches (worked out by script, both ways)', () => {
  test('has every row of the table', () => {
    expect(new Set(TABLE.map(([row]) => row.split(' ')[0])).size).toBe(84);
    expect([...columnOf(METRIC).keys()]).toEqual(TABLE.map(([row]) => row));
  });

  test.each(TABLE)('row %s comes to %f, and to the same in inches', (row, value, unit, imperialValue) => {
    const reckoned = columnOf(METRIC).get(row) ?? Number.NaN;
    const typedInInches = columnOf(IMPERIAL).get(row) ?? Number.NaN;
    if (Number.isInteger(value) && unit === same) expect(reckoned).toBeCloseTo(value, 9);
    else expectClose(reckoned, value, figures(value));
    expectClose(typedInInches / unit, imperialValue, figures(imperialValue));
    expectClose(typedInInches, reckoned, 1e-12);
  });
});
