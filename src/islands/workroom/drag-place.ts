/** A row on the screen, in pixels. */
export interface RowBox {
  readonly top: number;
  readonly height: number;
}

/**
 * The number a row would have, let go at height `y`: rows change places as soon as the pointer has passed the middle of
 * the other. `from` is the number it has, 1 for the first.
 */
export function placeAt(rows: readonly RowBox[], from: number, y: number): number {
  const passed = rows.filter(({ top, height }, index) => (index + 1 < from ? y > top + height / 2 : index + 1 > from && y >= top + height / 2)).length;
  return Math.min(Math.max(1, passed + 1), Math.max(1, rows.length));
}
