/** Where each band of a piece lies on the screen, how much of it is woven, and the cloth that makes. */
import { drawBand, picksDrawn, type LaidBand } from '#core/craft/cloth/bands/draw-band.ts';
import { drawHemStitch } from '#core/craft/cloth/bands/hem-stitch.ts';
import { chanceFrom, seedFrom } from '#core/craft/cloth/chance.ts';
import type { HemStitchBand, WovenPiece } from '#core/craft/cloth/cloth-piece.ts';
import type { Layer } from '#core/craft/cloth/layers.ts';
import { num } from '#core/craft/cloth/markup.ts';
import type { Weave } from '#core/craft/cloth/weave.ts';

interface Laid {
  readonly band: LaidBand;
  /** Among the piece's bands. */
  readonly index: number;
  /** Upper edge and height on the screen. */
  readonly top: number;
  readonly height: number;
  /** Woven part of the height. */
  readonly done: number;
  readonly firstRow: Weave['firstRow'];
  /** Of its chance. */
  readonly seed: number;
}

interface Hem {
  readonly band: HemStitchBand;
  readonly index: number;
  /** Pixels from the first row. */
  readonly at: number;
  /** Whether cloth follows the edge (it is the first edge) or comes before it. */
  readonly cloth: 'after' | 'before';
}

export interface DrawnBands {
  /** The lowest on the screen first. */
  readonly layers: readonly Layer[];
  /** For `defs`. */
  readonly clip: string;
  /** Height of the whole cloth, and where the fell lies in it. */
  readonly height: number;
  readonly fell: number;
}

/** Marks that were drawn before, by the inputs they follow from. */
export type DrawnBefore = ReadonlyMap<string, string>;

/**
 * @param at where the upper left corner of the cloth lies in the picture, given its height in pixels
 * @param scale pixels in a millimetre, upwards
 * @param woven share of the height that is woven, 0..1
 */
export function layBands(piece: WovenPiece, scale: number, woven: number, weave: Weave, at: (height: number) => readonly [x: number, y: number], before: DrawnBefore): DrawnBands {
  const height = piece.bands.reduce((sum, band) => sum + band.heightMm, 0) * scale;
  const { laid, hems } = place(piece, scale, height, woven * height, weave);
  /* Lowest on the screen first: pile falls over what lies below it. */
  const order = weave.begin === 'head' ? [...laid].reverse() : laid;
  const cut = order.find((item) => item.done < item.height - 0.5);
  const clip = cut === undefined ? '' : clipPath(cut, weave);
  const [x, y] = at(height);
  const known = JSON.stringify(weave);
  const pieces = order.map((item): Layer => ({ of: item.index, x, y: y + item.top, ...drawLaid(item, item === cut, weave, known, before) }));
  const edges = hems.map((hem): Layer => ({ of: hem.index, x, y: y + (weave.begin === 'head' ? hem.at : height - hem.at), markup: drawHem(hem, weave) }));
  const layers = withEdges(pieces, edges, hems, order[0]?.band, weave);
  const fell = weave.begin === 'head' ? woven * height : height - woven * height;
  return { layers, clip, height, fell };
}

/**
 * The first edge is sewn into the band above it and lies under the pile of all that follow; the last edge lies over
 * everything. Bands and edges come with the lowest on the screen first.
 */
function withEdges(bands: readonly Layer[], edges: readonly Layer[], hems: readonly Hem[], lowest: LaidBand | undefined, weave: Weave): readonly Layer[] {
  const first = weave.begin === 'foot' ? hems.findIndex((hem) => hem.cloth === 'after') : -1;
  if (first < 0) return [...bands, ...edges];
  const before = lowest?.technique === 'rya' ? 0 : 1;
  return [...bands.slice(0, before), ...edges.slice(first, first + 1), ...bands.slice(before), ...edges.toSpliced(first, 1)];
}

function place(piece: WovenPiece, scale: number, height: number, wovenPx: number, weave: Weave): { laid: Laid[]; hems: Hem[] } {
  const laid: Laid[] = [];
  const hems: Hem[] = [];
  const alike = new Map<string, number>();
  let at = 0;
  let firstRow: Weave['firstRow'] = 0;
  for (const [index, band] of piece.bands.entries()) {
    const full = band.heightMm * scale;
    if (band.technique === 'hem-stitch') {
      if (at <= wovenPx + 0.5) hems.push({ band, index, at, cloth: laid.length === 0 ? 'after' : 'before' });
    } else if (Math.min(full, wovenPx - at) > 0.5) {
      laid.push({ band, index, top: weave.begin === 'head' ? at : height - at - full, height: full, done: Math.min(full, wovenPx - at), firstRow, seed: seedOf(band, alike, piece.seed) });
      firstRow = (firstRow + picksDrawn(band, full, weave)) % 2 === 0 ? 0 : 1;
    }
    at += full;
  }
  return { laid, hems: laid.length === 0 ? [] : hems };
}

/** By what a band is and how many like it came before, so that it keeps its looks wherever another one is put in, moved or made higher. */
function seedOf({ technique, colour }: LaidBand, alike: Map<string, number>, seed: number): number {
  const kind = `${technique} ${colour}`;
  const count = alike.get(kind) ?? 0;
  alike.set(kind, count + 1);
  return seedFrom(seed, `${kind} ${count}`);
}

/** Rows of a band that is only partly woven stay where they are while it grows: it is drawn whole and cut at the fell. */
function drawLaid({ band, height, firstRow, seed }: Laid, cut: boolean, weave: Weave, known: string, before: DrawnBefore): Required<Pick<Layer, 'inputs' | 'markup'>> {
  const inputs = JSON.stringify([band, height, firstRow, seed, cut]) + known;
  const inner = (): string => drawBand(band, height, { ...weave, firstRow, chance: chanceFrom(seed) });
  return { inputs, markup: before.get(inputs) ?? (cut ? `<g clip-path="url(#${weave.id}-cut)">${inner()}</g>` : inner()) };
}

function clipPath(item: Laid, weave: Weave): string {
  /* Growing upwards, pile may hang far below the band; growing downwards, the fell is the lower edge. */
  const from = weave.begin === 'head' ? -2 : item.height - item.done;
  const to = weave.begin === 'head' ? item.done : item.height + 4000;
  return `<clipPath id="${weave.id}-cut"><path d="M-40 ${num(from)}h${num(weave.width + 80)}v${num(to - from)}H-40z"/></clipPath>`;
}

function drawHem(hem: Hem, weave: Weave): string {
  const clothBelow = (hem.cloth === 'after') === (weave.begin === 'head');
  return drawHemStitch(hem.band, clothBelow ? 1 : -1, weave);
}
