/**
 * A piece as woven structure, drawn from its own data as an SVG string.
 *
 * Pure and repeatable: the same piece and view give the same cloth, on the server and in the browser. No `style`
 * attributes and no scripts; the markup holds nothing that a person typed but escaped words and checked colours.
 */
import { coloursOf } from '#core/craft/cloth/bands/draw-band.ts';
import { ryaFall } from '#core/craft/cloth/bands/rya.ts';
import { chanceFrom } from '#core/craft/cloth/chance.ts';
import { hangingBox } from '#core/craft/cloth/cloth-box.ts';
import { wovenHeightMm, type ClothPiece, type HungPiece, type WovenPiece } from '#core/craft/cloth/cloth-piece.ts';
import { checkView, detailOf, type ClothView } from '#core/craft/cloth/cloth-view.ts';
import { describeCloth } from '#core/craft/cloth/describe-cloth.ts';
import { drawEnds } from '#core/craft/cloth/ends.ts';
import { drawFellLine } from '#core/craft/cloth/fell-line.ts';
import { drawCastShadow, drawDowel, drawFixing } from '#core/craft/cloth/hanging.ts';
import { drawHung } from '#core/craft/cloth/hung.ts';
import { layBands, type DrawnBands, type DrawnBefore } from '#core/craft/cloth/lay-bands.ts';
import { markupOf, type Layer } from '#core/craft/cloth/layers.ts';
import { layOnLoom } from '#core/craft/cloth/lay-on-loom.ts';
import { drawFrame, drawShuttle, drawSpacerCard, drawWarpOnNails } from '#core/craft/cloth/loom-frame.ts';
import { PathStore, WRITTEN_OUT, escapeWords, num, type Strokes } from '#core/craft/cloth/markup.ts';
import { drawPlies } from '#core/craft/cloth/ply.ts';
import { drawWarpFringe, warpFringeHeight } from '#core/craft/cloth/warp-fringe.ts';
import type { Weave } from '#core/craft/cloth/weave.ts';

interface Picture {
  readonly width: number;
  readonly height: number;
  readonly layers: readonly Layer[];
  /** For `defs`. */
  readonly defs: string;
}

/** A woven piece in layers, for whoever changes a drawing that stands already. */
export interface LayeredCloth extends Omit<Picture, 'defs'> {
  /** What it shows, for who does not see it. */
  readonly words: string;
}

/** Throws `RangeError` for a view that cannot be drawn (no id, no width); never for what a piece holds. */
export function drawCloth(piece: ClothPiece, view: ClothView): string {
  checkView(view);
  const paths = new PathStore(view.id);
  const { defs, ...picture } = piece.kind === 'hung' ? hangKnotted(piece, view) : drawWoven(piece, view, { paths, before: new Map() });
  return wrap({ ...picture, defs: defs + paths.defs() }, piece, view);
}

/** Views of a finished piece that can be had in layers. */
export type LayeredView = Pick<ClothView, 'id' | 'width' | 'units'> & { readonly as: 'hanging' | 'loom' };

/**
 * The same picture of a finished piece that `drawCloth` gives, in layers that need nothing of each other. Bands that stand in
 * `before`, the picture that was drawn last, are taken from there: a band that grows costs the drawing of one band.
 * Throws as `drawCloth` does.
 */
export function layerCloth(piece: WovenPiece, view: LayeredView, before?: LayeredCloth): LayeredCloth {
  checkView(view);
  const drawn = new Map((before?.layers ?? []).flatMap(({ inputs, markup }) => (inputs === undefined ? [] : [[inputs, markup] as const])));
  const { width, height, layers } = drawWoven(piece, view, { paths: WRITTEN_OUT, before: drawn });
  return { width, height, layers, words: describeCloth(piece, view) };
}

/** How lines are written, and what need not be drawn again. */
interface Hand {
  readonly paths: Strokes;
  readonly before: DrawnBefore;
}

function drawWoven(piece: WovenPiece, view: ClothView, hand: Hand): Picture {
  if (view.as === 'hanging') return hang(piece, view, hand);
  if (view.as === 'loom') return onLoom(piece, view, hand);
  return lay(piece, view, hand);
}

/** Room for what pile may hang below a band in this view. */
function pileRoom(view: ClothView): (bandHeight: number) => number {
  const kept = view.as === 'strip' || view.as === 'lying';
  return (bandHeight) => (kept ? bandHeight * 0.72 : Number.POSITIVE_INFINITY);
}

/** However tall a piece, a picture of it holds no more rows than this. Rows get coarser by fifths of a pixel, not with every row woven. */
const MOST_ROWS = 250;
const coarsened = (height: number): number => Math.ceil((height / MOST_ROWS) * 5) / 5;
/** Views whose rows have at least this many pixels show the plies of their yarn. */
const PLIED_FROM = 9;
/** Pieces at least so many pixels wide show how their colours meet. */
const JOINED_FROM = 180;

function weaveOf(piece: WovenPiece, view: ClothView, width: number, paths: Strokes): Weave {
  const { minEnd, minPick } = detailOf(view);
  const pxPerMm = view.pxPerMm ?? width / piece.widthMm;
  const height = view.height ?? wovenHeightMm(piece) * pxPerMm;
  /* A picture that shows only part of the width shows that part of the ends. */
  const real = Math.max(4, Math.round(piece.ends * Math.min(1, width / pxPerMm / piece.widthMm)));
  const fitting = Math.max(4, Math.min(real, Math.floor(width / minEnd)));
  const ends = fitting - (fitting % 2);
  const end = width / ends;
  return {
    id: view.id,
    width,
    end,
    ends,
    grouped: Math.max(1, real / ends),
    pxPerMm,
    minPick: Math.max(minPick, coarsened(height)),
    begin: beginOf(piece, view),
    firstRow: 0,
    endsTogether: piece.endsTogether,
    plied: minPick >= PLIED_FROM,
    joined: minPick >= PLIED_FROM || (width >= JOINED_FROM && (view.as === 'hanging' || view.as === 'loom')),
    warpColour: piece.warpColour,
    warpWidth: Math.min(end * 0.4, 9),
    paths,
    chance: chanceFrom(piece.seed),
    longestPile: pileRoom(view),
  };
}

function beginOf(piece: WovenPiece, view: ClothView): 'head' | 'foot' {
  if (view.begin !== undefined) return view.begin;
  const stripped = view.as === 'strip' || view.as === 'lying';
  return stripped || (view.as === 'hanging' && piece.turned) ? 'head' : 'foot';
}

function wovenShare(view: ClothView): number {
  return Math.max(0, Math.min(1, view.woven ?? 1));
}

function defsOf(piece: WovenPiece, weave: Weave, clip: string): string {
  const plies = weave.plied ? drawPlies(piece.bands.flatMap(coloursOf), weave.minPick * 1.1, weave.id) : '';
  return plies + clip;
}

function hang(piece: WovenPiece, view: ClothView, { paths, before }: Hand): Picture {
  const { left: inset, top: at, dowelTop: top } = hangingBox(piece, view.width);
  const weave = weaveOf(piece, view, view.width - 2 * inset, paths);
  const bands = layBands(piece, weave.pxPerMm, wovenShare(view), weave, () => [inset, at], before);
  const bare = wovenShare(view) >= 1 && (piece.finish !== undefined || !endsInPile(piece, weave));
  const below = Math.max(bare ? warpFringeHeight(piece, weave) : 0, pileBelow(piece, bands, weave));
  const behind =
    drawCastShadow(inset, top, weave.width, bands.height) +
    drawDowel(view.width, inset * 0.1, top) +
    `<g transform="translate(${num(inset)} 0)">${drawEnds(top * 0.8, top + 4, weave)}${drawFixing(piece, view.width, top, weave)}</g>`;
  const layers: readonly Layer[] = [
    { of: 'behind', x: 0, y: 0, markup: behind },
    ...(bare ? [{ of: 'fringe', x: inset, y: at + bands.height, ...fringeOf(piece, weave, before) } as const] : []),
    ...bands.layers,
  ];
  return { width: view.width, height: at + bands.height + below + 6, layers, defs: defsOf(piece, weave, bands.clip) };
}

function fringeOf(piece: WovenPiece, weave: Weave, before: DrawnBefore): Pick<Layer, 'inputs' | 'markup'> {
  const inputs = JSON.stringify(['fringe', piece.finish, piece.seed]) + JSON.stringify(weave);
  return { inputs, markup: before.get(inputs) ?? drawWarpFringe(piece, weave) };
}

/** Whether pile hangs over the lower edge of the cloth, so that the ends of the warp are not seen. */
function endsInPile(piece: WovenPiece, weave: Weave): boolean {
  const solid = piece.bands.filter((band) => band.heightMm > 0);
  const near = weave.begin === 'head' ? solid.slice(-3) : solid.slice(0, 3);
  return near.some((band) => band.technique === 'rya');
}

/** How far the longest pile falls below the lower edge of the cloth. */
function pileBelow(piece: WovenPiece, bands: DrawnBands, weave: Weave): number {
  let at = 0;
  let deepest = 0;
  for (const band of piece.bands) {
    const height = band.heightMm * weave.pxPerMm;
    const foot = weave.begin === 'head' ? at + height : bands.height - at;
    if (band.technique === 'rya') deepest = Math.max(deepest, foot - height / band.rows + ryaFall(band, height / band.rows, weave) * 1.04 - bands.height);
    at += height;
  }
  return deepest;
}

function onLoom(piece: WovenPiece, view: ClothView, { paths, before }: Hand): Picture {
  const { rail, inset, nailsTop, nailsBottom, below, frame } = layOnLoom(piece, view.width);
  const weave = weaveOf(piece, view, view.width - 2 * inset, paths);
  const topOf = (height: number): number => (weave.begin === 'foot' ? nailsBottom - below - height : nailsTop + below);
  const bands = layBands(piece, weave.pxPerMm, wovenShare(view), weave, (height) => [inset, topOf(height)], before);
  const clothTop = topOf(bands.height);
  const card = weave.begin === 'foot' && below > 8 ? drawSpacerCard(nailsBottom - below, below * 0.8, weave) : '';
  const layers: readonly Layer[] = [
    { of: 'behind', x: 0, y: 0, markup: `${drawFrame(view.width, frame, rail)}<g transform="translate(${num(inset)} 0)">${drawWarpOnNails(nailsTop, nailsBottom, weave)}${card}</g>` },
    ...bands.layers,
    { of: 'front', x: inset, y: clothTop, markup: atFell(piece, bands, view, weave, inset) },
  ];
  const height = Math.max(frame, clothTop + bands.height + pileBelow(piece, bands, weave) + 2);
  return { width: view.width, height, layers, defs: defsOf(piece, weave, bands.clip) };
}

function atFell(piece: WovenPiece, bands: DrawnBands, view: ClothView, weave: Weave, inset: number): string {
  const woven = wovenShare(view);
  if (woven >= 1) return '';
  const shuttle = woven > 0 ? drawShuttle(bands.fell, bandAt(piece, woven)?.colour ?? piece.warpColour, weave) : '';
  if (view.fell === false) return shuttle;
  return shuttle + drawFellLine(weave.width, bands.fell, view.fellOut ?? Math.min(inset * 0.55, 26), view.width > 200 ? 4 : 3);
}

function bandAt(piece: WovenPiece, woven: number): WovenPiece['bands'][number] | undefined {
  const reached = woven * wovenHeightMm(piece);
  let at = 0;
  return piece.bands.find((band) => {
    at += band.heightMm;
    return band.heightMm > 0 && at >= reached - 0.01;
  });
}

/** The bare cloth: strips and swatches. */
function lay(piece: WovenPiece, view: ClothView, { paths, before }: Hand): Picture {
  const pad = view.pad ?? (view.as === 'swatch' ? 0 : 3);
  const weave = weaveOf(piece, view, view.width - 2 * pad, paths);
  const total = Math.max(1, wovenHeightMm(piece));
  const height = view.height ?? total * weave.pxPerMm;
  const bands = layBands(piece, height / total, wovenShare(view), weave, () => [pad, 0], before);
  const open = view.openWarp === false ? '' : weave.begin === 'head' ? drawEnds(bands.fell, height, weave) : drawEnds(0, bands.fell, weave);
  const unfinished = (view.woven ?? 1) < 1 && view.fell !== false;
  const fell = unfinished ? drawFellLine(weave.width, bands.fell, view.fellOut ?? 3, weave.width > 200 ? 5 : 3) : '';
  const layers: readonly Layer[] = [{ of: 'behind', x: pad, y: 0, markup: open }, ...bands.layers, { of: 'front', x: pad, y: 0, markup: fell }];
  return { width: view.width, height, layers, defs: defsOf(piece, weave, bands.clip) };
}

/** A long hanging is drawn smaller, so that its picture stays about twice as high as wide. */
const HUNG_TALLEST = 2.1;

/** Knotted work hangs in every view: it never stands in a frame. */
function hangKnotted(piece: HungPiece, view: ClothView): Picture {
  const inset = Math.max(2, view.width * 0.03);
  const scale = view.pxPerMm ?? Math.min((view.width - 2 * inset) / piece.widthMm, (view.width * HUNG_TALLEST) / piece.heightMm);
  const { height, body, defs } = drawHung(piece, { id: view.id, width: view.width, scale });
  return { width: view.width, height, layers: [{ of: 'front', x: 0, y: 0, markup: body }], defs };
}

function wrap(picture: Picture, piece: ClothPiece, view: ClothView): string {
  const lying = view.as === 'lying';
  const width = num(lying ? picture.height : picture.width);
  const height = num(lying ? picture.width : picture.height);
  const layers = picture.layers.filter(({ markup }) => markup !== '').map(markupOf).join('');
  const body = lying ? `<g transform="translate(0 ${num(picture.width)}) rotate(-90)">${layers}</g>` : layers;
  const stretch = view.as === 'strip' || lying ? ' preserveAspectRatio="none"' : '';
  const words = view.decorative === true ? ' aria-hidden="true"' : ` role="img" aria-label="${escapeWords(view.label ?? describeCloth(piece, view))}"`;
  const defs = picture.defs === '' ? '' : `<defs>${picture.defs}</defs>`;
  return (
    `<svg xmlns="http://www.w3.org/2000/svg" viewBox="0 0 ${width} ${height}" width="${width}" height="${height}" fill="none"${stretch}${words}>` +
    `${defs}${body}</svg>`
  );
}
