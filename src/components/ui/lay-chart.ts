// How high the columns of a chart are, and of how many rows each is built. Pixels; their width is the page's affair.

export interface LaidColumn {
  readonly heightPx: number;
  /** Path of the gaps between the rows, from the floor up; longer than any column is wide. */
  readonly gaps: string;
}

export interface LaidChart {
  /** What one drawn row stands for. */
  readonly row: number;
  readonly columns: readonly LaidColumn[];
}

export const rowPx = 4;
const mostRows = 28;
const widerThanAny = 400;

/** The least of 1, 2, 5, 10, 20, 50 … times `row` that keeps the highest column within the room. */
function coarsened(row: number, highest: number): number {
  for (let power = 1; ; power *= 10) {
    for (const step of [1, 2, 5]) if (highest / (row * step * power) <= mostRows) return row * step * power;
  }
}

/**
 * Builds one column for each value. `row`: what one row stands for at least (seats, or minor units of money).
 * Values under zero are drawn as none; a value that is more than nothing has at least half a row.
 */
export function layChart(values: readonly number[], row: number): LaidChart {
  if (!(row > 0)) throw new RangeError('A row of a chart must stand for more than nothing');
  const step = coarsened(row, Math.max(0, ...values));
  const columns = values.map((value) => {
    const rows = value <= 0 ? 0 : Math.max(0.5, value / step);
    const heightPx = Math.round(rows * rowPx);
    const gaps = Array.from({ length: Math.max(0, Math.ceil(rows) - 1) }, (_, index) => `M0 ${heightPx - (index + 1) * rowPx}h${widerThanAny}`).join('');
    return { heightPx, gaps };
  });
  return { row: step, columns };
}

/** The warp ends in every column; what is too long is clipped by its edge. */
export const columnEnds = Array.from({ length: Math.floor(widerThanAny / 7) }, (_, index) => `M${index * 7 + 3.5} 0v${mostRows * rowPx}`).join('');
