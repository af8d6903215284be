import { describe, expect, it } from 'vitest';
import { layChart, rowPx } from '#components/ui/lay-chart.ts';

const lines = (path: string) => path.split('M').length - 1;

describe('a chart built of rows', () => {
  it('draws one row for one seat while they fit', () => {
    const chart = layChart([9, 24, 0], 1);
    expect(chart.row).toBe(1);
    expect(chart.columns.map(({ heightPx }) => heightPx / rowPx)).toEqual([9, 24, 0]);
    expect(lines(chart.columns[0]?.gaps ?? '')).toBe(8);
  });

  it('lets one row stand for more when the columns would grow too high, in steps people count by', () => {
    expect(layChart([100], 1).row).toBe(5);
    expect(layChart([200_00], 10_00).row).toBe(10_00);
    expect(layChart([700_00], 10_00).row).toBe(50_00);
  });

  it('shows that there was something, however little', () => {
    expect(layChart([1, 1000], 1).columns[0]?.heightPx).toBeGreaterThan(0);
    expect(layChart([0, 1000], 1).columns[0]?.heightPx).toBe(0);
  });

  it('keeps every gap between rows inside its column', () => {
    for (const { heightPx, gaps } of layChart([3, 5.5, 28, 0.2], 1).columns) {
      for (const [, y] of gaps.matchAll(/M0 (-?[\d.]+)/g)) {
        expect(Number(y)).toBeGreaterThanOrEqual(0);
        expect(Number(y)).toBeLessThan(heightPx);
      }
    }
  });

  it('can be empty', () => {
    expect(layChart([], 1).columns).toEqual([]);
  });

  it('does not take a row that stands for nothing', () => {
    expect(() => layChart([1], 0)).toThrow(RangeError);
  });
});
