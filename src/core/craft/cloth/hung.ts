/**
 * What is knotted or tied and hangs: strands in the order in which they lie, so that what goes over another is seen to.
 * Every strand has an edge in shadow and a line of light, as woven threads have.
 */
import type { HungPiece, HungStrand, PlacedMotif } from '#core/craft/cloth/cloth-piece.ts';
import { light, shade, yarnColour } from '#core/craft/cloth/colour.ts';
import { moved, num, ROUND } from '#core/craft/cloth/markup.ts';

/** Room above the rod for the cord it hangs by, as a share of the width. */
const CORD_RISE = 0.09;
/** Thinner strands than this many pixels show no light. */
const LIT_FROM = 1.6;
const WOOD = { edge: '#6f6250', body: '#a4957c', light: '#c5b89f' } as const;
const CORD = '#646f77';

export interface HungPicture {
  readonly height: number;
  readonly body: string;
  readonly defs: string;
}

/** Draws in a picture `width` pixels wide, at `scale` pixels in a millimetre; ids begin with `id`. */
export function drawHung(piece: HungPiece, { id, width, scale }: { readonly id: string; readonly width: number; readonly scale: number }): HungPicture {
  const left = (width - piece.widthMm * scale) / 2;
  const above = roomAbove(piece) * scale + 2;
  const laid = piece.laid.map((item) => (item === 'rod' ? drawRod(piece, scale) : 'motif' in item ? place(item, id, scale) : drawStrand(item, scale)));
  const motifs = piece.motifs.map((strands, index) => `<g id="${id}-knot${index}">${strands.map((strand) => drawStrand(strand, scale)).join('')}</g>`);
  return {
    height: above + piece.heightMm * scale + 4,
    body: `<g transform="translate(${num(left)} ${num(above)})">${laid.join('')}</g>`,
    defs: motifs.join(''),
  };
}

function roomAbove({ rod, widthMm }: HungPiece): number {
  return rod.kind === 'ring' ? rod.diameterMm : rod.diameterMm + widthMm * CORD_RISE;
}

const place = ({ motif, xMm, yMm }: PlacedMotif, id: string, scale: number): string => `<use href="#${id}-knot${motif}"${moved(xMm * scale, yMm * scale)}/>`;

function drawStrand({ colour, widthMm, way }: HungStrand, scale: number): string {
  const d = pathOf(way, scale);
  const wide = Math.max(0.9, widthMm * scale);
  const yarn = yarnColour(colour);
  const stroke = (look: string, share: number, more = ''): string => `<path d="${d}" stroke="${look}" stroke-width="${num(wide * share)}"${ROUND}${more}/>`;
  const lit = wide < LIT_FROM ? '' : stroke(light(yarn, 0.38), 0.2, moved(-wide * 0.14, -wide * 0.1));
  return stroke(shade(yarn, 0.56), 1) + stroke(yarn, 0.74) + lit;
}

/** `[x, y, then six numbers for each curve]`, in millimetres, as path data. */
function pathOf(way: readonly number[], scale: number): string {
  const at = way.map((mm) => num(mm * scale));
  let d = `M${at[0] ?? '0'} ${at[1] ?? '0'}`;
  for (let i = 2; i + 5 < at.length; i += 6) d += `C${at.slice(i, i + 6).join(' ')}`;
  return d;
}

function drawRod({ rod, widthMm }: HungPiece, scale: number): string {
  const bar = (d: string, wide: number): string =>
    `<path d="${d}" stroke="${WOOD.edge}" stroke-width="${num(wide)}"${ROUND}/><path d="${d}" stroke="${WOOD.body}" stroke-width="${num(wide * 0.68)}"${ROUND}/>` +
    `<path d="${d}" stroke="${WOOD.light}" stroke-width="${num(wide * 0.2)}"${ROUND}${moved(0, -wide * 0.18)}/>`;
  const middle = (widthMm / 2) * scale;
  if (rod.kind === 'ring') {
    const thick = rod.thickMm * scale;
    const r = (rod.diameterMm * scale - thick) / 2;
    return bar(`M${num(middle - r)} ${num(-r - thick / 2)}a${num(r)} ${num(r)} 0 1 0 ${num(2 * r)} 0a${num(r)} ${num(r)} 0 1 0 ${num(-2 * r)} 0`, Math.max(2, thick));
  }
  const wide = Math.max(3, rod.diameterMm * scale);
  const y = (-rod.diameterMm / 2) * scale;
  const rise = widthMm * CORD_RISE * scale;
  const cord = `M${num(widthMm * 0.08 * scale)} ${num(y)}L${num(middle)} ${num(y - wide / 2 - rise + 2)}L${num(widthMm * 0.92 * scale)} ${num(y)}`;
  return `<path class="cord" d="${cord}" stroke="${CORD}" stroke-width="${num(Math.max(1, wide * 0.14))}" stroke-linejoin="round"/>` + bar(`M${num(wide / 2)} ${num(y)}H${num(widthMm * scale - wide / 2)}`, wide);
}
