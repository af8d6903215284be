/** How wide a piece and the loom it comes from are drawn beside each other. */

export interface LoomWidths {
  readonly patternPx: number;
  readonly loomPx: number;
}

/** Shares of the drawing that are not cloth: air beside a hanging piece, rails of a frame. */
const HANGING_CLOTH = 0.94;
const FRAME_INSIDE = 0.9;
const LEAST_PX = 24;

/** Widths at which a hanging piece and a frame stand at one scale and fill `roomPx` together. */
export function atOneScale(pieceMm: number, insideMm: number, roomPx: number): LoomWidths {
  const scale = roomPx / (pieceMm / HANGING_CLOTH + insideMm / FRAME_INSIDE);
  return { patternPx: Math.max(LEAST_PX, (pieceMm / HANGING_CLOTH) * scale), loomPx: Math.max(LEAST_PX, (insideMm / FRAME_INSIDE) * scale) };
}
