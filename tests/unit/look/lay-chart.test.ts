import { describe, expect, it } from 'vitest';
import { layChart } from '#components/ui/lay-chart.ts';

const gaps = (path: string) => path.split('M').length - 1;

describe('a chart built of rows', () => {
  it('draws one row for one seat while they fit', () => {
    const chart = layChart([9, 24, 0], 1);
    expect(chart.row).toBe(1);
    expect(chart.columns.map(({ height }) => height)).toEqual([36, 96, 0]);
    expect(gaps(chart.columns[0]?.picks ?? '')).toBe(8);
  });

  it('lets one row stand for more when the columns would grow too high, in steps people count by', () => {
    expect(layChart([100], 1).row).toBe(5);
    expect(layChart([200_00], 10_00).row).toBe(10_00);
    expect(layChart([700_00], 10_00).row).toBe(50_00);
  });

  it('shows that there was something, however little', () => {
    expect(layChart([1, 1000], 1).columns[0]?.height).toBeGreaterThan(0);
    expect(layChart([0, 1000], 1).columns[0]?.height).toBe(0);
  });

  it('stands all columns on one floor, side by side', () => {
    const { columns, columnWidth, width, floor } = layChart([3, 5, 8, 13], 1);
    for (const { top, height } of columns) expect(top + height).toBe(floor);
    columns.slice(1).forEach(({ x }, index) => expect(x).toBeGreaterThanOrEqual((columns[index]?.x ?? 0) + columnWidth));
    expect((columns.at(-1)?.x ?? 0) + columnWidth).toBe(width);
  });

  it('can be empty', () => {
    expect(layChart([], 1).columns).toEqual([]);
  });

  it('does not take a row that stands for nothing', () => {
    expect(() => layChart([1], 0)).toThrow(RangeError);
  });
});
