/** The same cloth in words, for whoever does not see it. */
import { wovenHeightMm, type ClothBand, type ClothPiece, type TabbyBand, type WovenPiece } from '#core/craft/cloth/cloth-piece.ts';
import { spansByRow } from '#core/craft/cloth/spans.ts';
import type { ClothView } from '#core/craft/cloth/cloth-view.ts';
import { amountText } from '#core/units/format-amount.ts';
import type { Units } from '#core/units/units.ts';

/**
 * For example: "Low Tide, wall hanging, 40 cm wide. In the order it is woven: a rya fringe in Foam, 4 cm of tabby in
 * Estuary. Woven so far: 28 cm of 44 cm, row 52 of 96 in the wedges." Not escaped.
 */
export function describeCloth(piece: ClothPiece, view: Pick<ClothView, 'woven' | 'units'> = {}): string {
  const units = view.units ?? 'cm';
  if (piece.kind === 'hung') return `${piece.title}, ${piece.thing}, ${piece.words[units]}`;
  const bands = piece.bands.filter((band) => band.technique !== 'heading').map((band) => bandWords(band, units));
  const order = bands.length === 0 ? '' : ` In the order it is woven: ${bands.join(', ')}.`;
  return `${piece.title}, ${piece.thing}, ${length(piece.widthMm, units)} wide.${order}${finishWords(piece, units)}${progressWords(piece, view.woven ?? 1, units)}`;
}

/** " Its warp ends are knotted in bundles of 6 and hang 7 cm. It is lashed to its dowel." Nothing of what nobody has said. */
function finishWords({ finish, fixing = 'slipped' }: WovenPiece, units: Units): string {
  const held = fixing === 'slipped' ? '' : ` It is ${fixing} to its dowel.`;
  return finish === undefined ? held : ` Its warp ends are ${endsWords(finish, units)}.${held}`;
}

function endsWords({ bottom, fringeMm, bundleEnds }: NonNullable<WovenPiece['finish']>, units: Units): string {
  const hang = length(fringeMm, units);
  switch (bottom) {
    case 'knotted':
      return `knotted in bundles of ${bundleEnds}${fringeMm > 0 ? ` and hang ${hang}` : ''}`;
    case 'twisted':
      return fringeMm > 0 ? `twisted into cords of ${bundleEnds}, ${hang} long` : `twisted into cords of ${bundleEnds}`;
    case 'tucked':
      return 'tucked back into the cloth';
    case 'plain':
      return fringeMm > 0 ? `left loose, ${hang} long` : 'cut at the edge of the cloth';
  }
}

function bandWords(band: ClothBand, units: Units): string {
  const high = length(band.heightMm, units);
  switch (band.technique) {
    case 'tabby':
      return band.shapes.length === 0 ? `${high} of ${weaveWords(band)} in ${band.yarn}` : `${high} of ${shapesWord(band)} in ${list(yarnsOf(band))}`;
    case 'soumak':
      return `${counted(band.rows, 'row')} of soumak in ${band.yarn}`;
    case 'rya':
      return `a rya fringe in ${band.yarn}, ${length(band.pileMm, units)} long`;
    case 'roving':
      return `${high} of roving in ${band.yarn}`;
    case 'loop-pile':
      return `${high} of loop pile in ${band.yarn}`;
    case 'twining':
      return `${counted(band.rows, 'row')} of twining in ${band.yarn}`;
    case 'hem-stitch':
      return `a hem-stitched edge in ${band.yarn}`;
    case 'heading':
      return 'a heading';
  }
}

function weaveWords({ together, strands = 1 }: TabbyBand): string {
  if (together === 2) return 'basket weave';
  return strands === 2 ? 'tabby with a doubled weft' : 'tabby';
}

/** A triangle is a wedge at the loom; anything else is called a shape. */
function shapesWord(band: TabbyBand): string {
  return band.shapes.every(narrows) ? 'wedges' : 'shapes';
}

function narrows(shape: TabbyBand['shapes'][number]): boolean {
  const rows = [...spansByRow(shape).values()];
  if (rows.some((spans) => spans.length > 1)) return false;
  const widths = rows.map(([span]) => (span === undefined ? 0 : span.to - span.from));
  return widths.length > 1 && widths.every((width, row) => row === 0 || width <= (widths[row - 1] ?? width) + 1) && (widths.at(-1) ?? 0) < (widths[0] ?? 0);
}

function yarnsOf(band: TabbyBand): string[] {
  return [...new Set([band.yarn, ...band.shapes.map((shape) => shape.yarn)])];
}

function progressWords(piece: WovenPiece, woven: number, units: Units): string {
  if (woven >= 1) return '';
  const total = wovenHeightMm(piece);
  if (woven <= 0) return ` Nothing woven yet, of ${length(total, units)}.`;
  const reached = woven * total;
  return ` Woven so far: ${length(reached, units)} of ${length(total, units)}${rowWords(piece, reached)}.`;
}

function rowWords(piece: WovenPiece, reachedMm: number): string {
  let at = 0;
  for (const band of piece.bands) {
    const within = reachedMm - at;
    if (band.technique === 'tabby' && within > 0 && within <= band.heightMm + 0.01) {
      const row = Math.round((within / band.heightMm) * band.picks);
      return `, row ${row} of ${band.picks} in the ${band.shapes.length > 0 ? shapesWord(band) : 'tabby'}`;
    }
    at += band.heightMm;
  }
  return '';
}

function length(mm: number, units: Units): string {
  return amountText({ kind: 'length', mm, use: mm < 10 ? 'fine' : 'size' }, units);
}

function counted(count: number, word: string): string {
  return count === 1 ? `1 ${word}` : `${count} ${word}s`;
}

function list(words: readonly string[]): string {
  return words.length < 2 ? words.join('') : `${words.slice(0, -1).join(', ')} and ${words.at(-1) ?? ''}`;
}
