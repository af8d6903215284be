/** Where each band of a piece lies on the screen, how much of it is woven, and the cloth that makes. */
import { drawBand, picksDrawn, type LaidBand } from '#core/craft/cloth/bands/draw-band.ts';
import { drawHemStitch } from '#core/craft/cloth/bands/hem-stitch.ts';
import type { HemStitchBand, WovenPiece } from '#core/craft/cloth/cloth-piece.ts';
import { num } from '#core/craft/cloth/markup.ts';
import type { Weave } from '#core/craft/cloth/weave.ts';

interface Laid {
  readonly band: LaidBand;
  /** Upper edge and height on the screen. */
  readonly top: number;
  readonly height: number;
  /** Woven part of the height. */
  readonly done: number;
  /** Picks drawn before it. */
  readonly firstRow: number;
}

interface Hem {
  readonly band: HemStitchBand;
  /** Pixels from the first row. */
  readonly at: number;
  /** Whether cloth follows the edge (it is the first edge) or comes before it. */
  readonly cloth: 'after' | 'before';
}

export interface DrawnBands {
  readonly markup: string;
  /** For `defs`. */
  readonly clip: string;
  /** Height of the whole cloth, and where the fell lies in it. */
  readonly height: number;
  readonly fell: number;
}

/**
 * @param scale pixels in a millimetre, upwards
 * @param woven share of the height that is woven, 0..1
 */
export function layBands(piece: WovenPiece, scale: number, woven: number, weave: Weave): DrawnBands {
  const height = piece.bands.reduce((sum, band) => sum + band.heightMm, 0) * scale;
  const { laid, hems } = place(piece, scale, height, woven * height, weave);
  /* Lowest on the screen first: pile falls over what lies below it. */
  const order = weave.begin === 'head' ? [...laid].reverse() : laid;
  const cut = order.find((item) => item.done < item.height - 0.5);
  const clip = cut === undefined ? '' : clipPath(cut, weave);
  const pieces = order.map((item) => drawLaid(item, item === cut, weave));
  const edges = hems.map((hem) => drawHem(hem, height, weave));
  const markup = withEdges(pieces, edges, hems, order[0]?.band, weave);
  const fell = weave.begin === 'head' ? woven * height : height - woven * height;
  return { markup, clip, height, fell };
}

/**
 * The first edge is sewn into the band above it and lies under the pile of all that follow; the last edge lies over
 * everything. Bands and edges come with the lowest on the screen first.
 */
function withEdges(bands: readonly string[], edges: readonly string[], hems: readonly Hem[], lowest: LaidBand | undefined, weave: Weave): string {
  const first = weave.begin === 'foot' ? hems.findIndex((hem) => hem.cloth === 'after') : -1;
  if (first < 0) return bands.join('') + edges.join('');
  const before = lowest?.technique === 'rya' ? 0 : 1;
  const others = edges.filter((_, index) => index !== first);
  return [...bands.slice(0, before), edges[first], ...bands.slice(before), ...others].join('');
}

function place(piece: WovenPiece, scale: number, height: number, wovenPx: number, weave: Weave): { laid: Laid[]; hems: Hem[] } {
  const laid: Laid[] = [];
  const hems: Hem[] = [];
  let at = 0;
  let firstRow = 0;
  for (const band of piece.bands) {
    const full = band.heightMm * scale;
    if (band.technique === 'hem-stitch') {
      if (at <= wovenPx + 0.5) hems.push({ band, at, cloth: laid.length === 0 ? 'after' : 'before' });
    } else if (Math.min(full, wovenPx - at) > 0.5) {
      laid.push({ band, top: weave.begin === 'head' ? at : height - at - full, height: full, done: Math.min(full, wovenPx - at), firstRow });
      firstRow += picksDrawn(band, full, weave);
    }
    at += full;
  }
  return { laid, hems: laid.length === 0 ? [] : hems };
}

/** Rows of a band that is only partly woven stay where they are while it grows: it is drawn whole and cut at the fell. */
function drawLaid(item: Laid, cut: boolean, weave: Weave): string {
  const inner = drawBand(item.band, item.height, { ...weave, firstRow: item.firstRow });
  const clipped = cut ? `<g clip-path="url(#${weave.id}-cut)">${inner}</g>` : inner;
  return `<g transform="translate(0 ${num(item.top)})">${clipped}</g>`;
}

function clipPath(item: Laid, weave: Weave): string {
  /* Growing upwards, pile may hang far below the band; growing downwards, the fell is the lower edge. */
  const from = weave.begin === 'head' ? -2 : item.height - item.done;
  const to = weave.begin === 'head' ? item.done : item.height + 4000;
  return `<clipPath id="${weave.id}-cut"><path d="M-40 ${num(from)}h${num(weave.width + 80)}v${num(to - from)}H-40z"/></clipPath>`;
}

function drawHem(hem: Hem, height: number, weave: Weave): string {
  const y = weave.begin === 'head' ? hem.at : height - hem.at;
  const clothBelow = (hem.cloth === 'after') === (weave.begin === 'head');
  return `<g transform="translate(0 ${num(y)})">${drawHemStitch(hem.band, clothBelow ? 1 : -1, weave)}</g>`;
}
