/**
 * A piece seen from very near: few ends and few rows, so that every thread shows its plies. Not to scale; bands keep their
 * order and yarns, and what has no body near (edges, pile that would hide everything) is left out.
 */
import { spansByRow } from '#core/craft/cloth/spans.ts';
import { wovenHeightMm, type ClothBand, type TabbyBand, type WovenPiece } from '#core/craft/cloth/cloth-piece.ts';

const WIDTH_MM = 400;
const ENDS = 40;
/** Height of one row of tabby near. */
const ROW_MM = 7;

/** To be drawn with `as: 'swatch', range: 'near'`. Bands that are high in the piece are high here, within bounds. */
export function closeUpOf(piece: WovenPiece): WovenPiece {
  const total = Math.max(1, wovenHeightMm(piece));
  const bands = piece.bands.flatMap((band) => enlarged(band, band.heightMm / total, piece.ends));
  return { ...piece, widthMm: WIDTH_MM, ends: ENDS, loom: undefined, turned: false, bands };
}

function enlarged(band: ClothBand, share: number, ends: number): ClothBand[] {
  if (band.technique === 'tabby') return share < 0.02 ? [] : [nearTabby(band, Math.max(3, Math.min(18, Math.round(share * 44))), ends)];
  if (band.technique === 'soumak') return [{ ...band, heightMm: 31, rows: 2, over: 4, back: 2 }];
  if (band.technique === 'roving') return [{ ...band, heightMm: 34, over: 2, passes: 1 }];
  if (band.technique === 'twining') return [{ ...band, heightMm: 16, rows: 1 }];
  if (band.technique === 'loop-pile') return [{ ...band, heightMm: 44, rows: 2, loopMm: 14 }];
  return [];
}

function nearTabby(band: TabbyBand, picks: number, ends: number): TabbyBand {
  const fewer = picks / band.picks;
  const narrower = ENDS / ends;
  const shapes = band.shapes.map((shape) => {
    const near = new Map([...spansByRow(shape)].map(([row, spans]) => [Math.floor(row * fewer), spans]));
    return { ...shape, spans: [...near].flatMap(([row, spans]) => spans.map((span) => ({ row, from: span.from * narrower, to: span.to * narrower }))) };
  });
  /* Near, a weft-faced cloth would show no warp at all: a little of it tells what is what. */
  return { ...band, heightMm: picks * ROW_MM, picks, shapes, cover: Math.min(band.cover, 0.7) };
}
