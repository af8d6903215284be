/**
 * The strip beside a list of parts: one stretch for each part, all of the same height, not to scale. A part that weaves
 * nothing (planning, dressing the loom, finishing) is a heading: spaced picks in warp yarn.
 */
import type { ClothBand, EndSpan, WovenPiece } from '#core/craft/cloth/cloth-piece.ts';
import { shade } from '#core/craft/cloth/colour.ts';

/** Bands woven in one part, by name or by place in the piece; none for a part that weaves nothing. */
export interface PartStretch {
  readonly bands: readonly (string | number)[];
}

const STRETCH_MM = 60;
const STRIP_ENDS = 10;

/** A strip to be drawn with `as: 'strip'` or `'lying'`. */
export function partsStripOf(piece: WovenPiece, parts: readonly PartStretch[]): WovenPiece {
  return {
    ...piece,
    widthMm: 40,
    ends: STRIP_ENDS,
    loom: undefined,
    turned: false,
    bands: parts.flatMap((part) => stretch(part, piece)),
  };
}

/** Spreads the bands of a piece over `count` parts when nothing says which part weaves which: two to begin, one to finish. */
export function spreadOverParts(piece: WovenPiece, count: number): PartStretch[] {
  const before = count >= 5 ? 2 : count >= 3 ? 1 : 0;
  const after = count >= 4 ? 1 : 0;
  const weaving = Math.max(1, count - before - after);
  const bands = piece.bands.map((band, index) => ({ index, high: band.heightMm })).filter((band) => band.high > 0);
  const share = bands.reduce((sum, band) => sum + band.high, 0) / weaving;
  let at = 0;
  const found: number[][] = Array.from({ length: weaving }, () => []);
  for (const band of bands) {
    found[Math.min(weaving - 1, Math.floor((at + band.high / 2) / Math.max(1, share)))]?.push(band.index);
    at += band.high;
  }
  const none = (many: number): PartStretch[] => Array.from({ length: many }, () => ({ bands: [] }));
  return [...none(before), ...found.map((own) => ({ bands: own })), ...none(after)].slice(0, count);
}

function stretch(part: PartStretch, piece: WovenPiece): ClothBand[] {
  const own = piece.bands.filter((band, index) => band.heightMm > 0 && part.bands.some((wanted) => wanted === index || (band.name !== undefined && wanted === band.name)));
  const pile = own.find((band) => band.technique === 'rya');
  if (pile !== undefined) return [{ ...pile, heightMm: STRETCH_MM, rows: 4, pileMm: STRETCH_MM / 2 }];
  const total = own.reduce((sum, band) => sum + band.heightMm, 0);
  if (total === 0) return [{ technique: 'heading', name: undefined, heightMm: STRETCH_MM, colour: shade(piece.warpColour, 0.12), yarn: 'warp' }];
  return own.map((band) => inStrip(band, (band.heightMm / total) * STRETCH_MM, STRIP_ENDS / piece.ends));
}

/** A strip is a tenth as wide as the piece: there is room for few rows. */
function inStrip(band: ClothBand, heightMm: number, narrower: number): ClothBand {
  if (band.technique === 'tabby') return { ...band, heightMm, shapes: band.shapes.map((shape) => ({ ...shape, spans: shape.spans.map((span) => narrow(span, narrower)) })) };
  if (band.technique === 'soumak') return { ...band, heightMm, rows: Math.max(2, Math.min(band.rows, Math.round(heightMm / 6))) };
  return { ...band, heightMm };
}

/** Ten ends cannot show a fine slope: spans are drawn wider than true, about their own middle. */
const BROADER = 1.4;

function narrow(span: EndSpan, narrower: number): EndSpan {
  const middle = ((span.from + span.to) / 2) * narrower;
  const half = ((span.to - span.from) / 2) * narrower * BROADER;
  return { row: span.row, from: middle - half, to: middle + half };
}
