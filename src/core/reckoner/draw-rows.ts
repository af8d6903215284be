/** Rows of a shape drawn at their true proportions, the first one at the foot, as it is woven. */

export interface RowsDrawing {
  readonly widthMm: number;
  readonly heightMm: number;
  /** Outline of all rows, in millimetres from the upper left. */
  readonly shape: string;
  /** The warp behind, a line at the middle of each end. */
  readonly warp: string;
  /** Where one row lies on the next, as far as rows can be told apart. */
  readonly rows: string;
}

interface Grid {
  readonly spacingMm: number;
  readonly pickSpacingMm: number;
  /** Working ends of the ground. */
  readonly ends: number;
  /** From the left edge, or about the middle; half an end goes to the right. */
  readonly aligned: 'left' | 'middle';
}

/** Ends of ground that stay beside the widest row. */
const ENDS_BESIDE = 3;
/** More lines than this run together. */
const MOST_LINES = 240;

const at = (value: number): string => String(Math.round(value * 100) / 100);

export function drawRows(widths: readonly number[], { spacingMm, pickSpacingMm, ends, aligned }: Grid): RowsDrawing {
  const widest = Math.max(1, ...widths);
  // The stretch that is drawn keeps the parity of the ground, so that what is in its middle stays there.
  const wished = widest + 2 * ENDS_BESIDE;
  const shown = Math.max(widest, Math.min(ends, wished + ((ends - wished) % 2 === 0 ? 0 : 1)));
  const heightMm = widths.length * pickSpacingMm;
  const top = (row: number): number => heightMm - (row + 1) * pickSpacingMm;
  let shape = '';
  let row = 0;
  while (row < widths.length) {
    const width = widths[row] ?? 0;
    let last = row;
    while (widths[last + 1] === width) last += 1;
    const start = aligned === 'left' ? 0 : Math.ceil((shown - width) / 2);
    if (width > 0) shape += `M${at(start * spacingMm)} ${at(top(last))}h${at(width * spacingMm)}v${at((last - row + 1) * pickSpacingMm)}h${at(-width * spacingMm)}z`;
    row = last + 1;
  }
  const warp = shown > MOST_LINES ? '' : Array.from({ length: shown }, (_, end) => `M${at((end + 0.5) * spacingMm)} 0V${at(heightMm)}`).join('');
  const rows = widths.length > MOST_LINES ? '' : Array.from({ length: Math.max(0, widths.length - 1) }, (_, line) => `M0 ${at(top(line))}H${at(shown * spacingMm)}`).join('');
  return { widthMm: shown * spacingMm, heightMm, shape, warp, rows };
}
