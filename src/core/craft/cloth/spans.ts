/** Which ends a shape takes in each row. */
import type { ClothShape, EndSpan } from '#core/craft/cloth/cloth-piece.ts';

/** The shape's areas by the row they lie in. */
export function spansByRow(shape: ClothShape): ReadonlyMap<number, readonly EndSpan[]> {
  const rows = new Map<number, EndSpan[]>();
  for (const span of shape.spans) {
    const row = rows.get(span.row);
    if (row === undefined) rows.set(span.row, [span]);
    else row.push(span);
  }
  return rows;
}
