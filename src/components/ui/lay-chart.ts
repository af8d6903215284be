// Where the columns of a chart stand. Pixels at the size the chart is drawn for; it scales as a whole.

export interface LaidColumn {
  readonly x: number;
  readonly top: number;
  readonly height: number;
  /** Path of the warp ends within the column. */
  readonly ends: string;
  /** Path of the gaps between its picks. */
  readonly picks: string;
}

export interface LaidChart {
  readonly width: number;
  readonly height: number;
  readonly floor: number;
  readonly columnWidth: number;
  /** What one drawn row stands for. */
  readonly row: number;
  readonly columns: readonly LaidColumn[];
}

const pickHeight = 4;
const mostRows = 28;
const headRoom = 22;
const footRoom = 22;
const gap = 10;

/** The least of 1, 2, 5, 10, 20, 50 … times `row` that keeps the highest column within the room. */
function coarsened(row: number, highest: number): number {
  for (let power = 1; ; power *= 10) {
    for (const step of [1, 2, 5]) if (highest / (row * step * power) <= mostRows) return row * step * power;
  }
}

/**
 * Lays one column for each value. `row`: what one row stands for at least (seats, or minor units of money).
 * Values under zero are drawn as none; a value that is more than nothing has at least half a row.
 */
export function layChart(values: readonly number[], row: number): LaidChart {
  if (!(row > 0)) throw new RangeError('A row of a chart must stand for more than nothing');
  const step = coarsened(row, Math.max(0, ...values));
  const columnWidth = Math.max(28, Math.min(84, Math.floor(620 / Math.max(1, values.length)) - gap));
  const rows = values.map((value) => (value <= 0 ? 0 : Math.max(0.5, value / step)));
  const floor = headRoom + Math.ceil(Math.max(4, ...rows)) * pickHeight;
  const columns = rows.map((count, index) => {
    const x = index * (columnWidth + gap);
    const height = count * pickHeight;
    const top = floor - height;
    const ends = Array.from({ length: Math.floor(columnWidth / 7) }, (_, end) => `M${x + 3.5 + end * 7} ${top}V${floor}`).join('');
    const picks = Array.from({ length: Math.max(0, Math.ceil(count) - 1) }, (_, pick) => `M${x} ${floor - (pick + 1) * pickHeight}h${columnWidth}`).join('');
    return { x, top, height, ends, picks };
  });
  return { width: Math.max(1, values.length) * (columnWidth + gap) - gap, height: floor + footRoom, floor, columnWidth, row: step, columns };
}
