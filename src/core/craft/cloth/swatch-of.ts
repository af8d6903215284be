/** Small patches of cloth: one band of a piece, or one yarn, as it looks woven. Not to scale. */
import type { ClothBand, TabbyBand, WovenPiece } from '#core/craft/cloth/cloth-piece.ts';
import { yarnColour } from '#core/craft/cloth/colour.ts';

const PATCH_MM = 100;
const PATCH_ENDS = 10;

/** To be drawn with `as: 'swatch'`. Hem-stitch is shown on the edge of a tabby in its own neighbour's colour. */
export function swatchOfBand(piece: WovenPiece, index: number): WovenPiece {
  const band = piece.bands[index];
  const bands = band === undefined ? [] : patch(band, piece, index);
  return { ...piece, widthMm: PATCH_MM, ends: PATCH_ENDS, endsTogether: 1, loom: undefined, turned: false, bands };
}

/** A patch of tabby in one yarn. `colour` may be anything; what is not `#rrggbb` is shown undyed. */
export function swatchOfYarn(colour: unknown, warpColour: string, seed: number): WovenPiece {
  const dyed = yarnColour(colour);
  return {
    kind: 'woven', title: '', thing: 'yarn', widthMm: PATCH_MM, ends: PATCH_ENDS, endsTogether: 1, warpColour: yarnColour(warpColour), seed,
    turned: false, loom: undefined, bands: [plain(dyed, '', 80)],
  };
}

function plain(colour: string, yarn: string, heightMm: number): TabbyBand {
  return { technique: 'tabby', name: undefined, heightMm, colour, yarn, picks: 99, cover: 0.7, shapes: [] };
}

function patch(band: ClothBand, piece: WovenPiece, index: number): ClothBand[] {
  const heightMm = 80;
  switch (band.technique) {
    case 'tabby': {
      const narrower = PATCH_ENDS / piece.ends;
      const shapes = band.shapes.map((shape) => ({
        ...shape,
        spans: shape.spans.map((span) => ({ row: span.row, from: span.from * narrower, to: span.to * narrower })),
      }));
      return [{ ...band, heightMm, shapes }];
    }
    case 'soumak':
      return [{ ...band, heightMm, rows: 6 }];
    case 'rya':
      return [{ ...band, heightMm, rows: 3, pileMm: 34, edgeEnds: 0 }];
    case 'loop-pile':
      return [{ ...band, heightMm, rows: 5, loopMm: 12 }];
    case 'twining':
      return [{ ...band, heightMm, rows: 9 }];
    case 'roving':
      return [{ ...band, heightMm, over: 2, passes: 2 }];
    case 'hem-stitch':
      return [{ ...band, bundleEnds: Math.min(band.bundleEnds, 5), reachMm: 14 }, plain(neighbourColour(piece, index, band.colour), '', heightMm)];
    case 'heading':
      return [{ ...band, heightMm }];
  }
}

function neighbourColour(piece: WovenPiece, index: number, fallback: string): string {
  return (piece.bands[index + 1] ?? piece.bands[index - 1])?.colour ?? fallback;
}
