/** One soumak stitch and one rya knot, by themselves or in a band. */
import { from, standing, type Notebook } from '#core/craft/show-how/notebook.ts';
import { DEFAULTS, RULES } from '#core/craft/show-how/sources.ts';
import type { Working, WorkingInput } from '#core/craft/show-how/working.ts';
import { CARD_STEP_MM, ryaBundle, ryaCutLength, ryaKnotsPerRow, ryaWrap, windingCard, type RyaKnot } from '#core/craft/techniques/rya.ts';
import { soumakRatio, soumakRest, soumakRowLength, soumakStitch, soumakStitchesPerRow, type SoumakStitch } from '#core/craft/techniques/soumak.ts';

type Inputs<Keys extends string> = Readonly<Record<Keys, WorkingInput>>;

type SoumakInputs = Inputs<'over' | 'back' | 'p' | 'D' | 'E'>;

/** What a shorter last stitch adds to a row, if there is one. */
function lastStitch(book: Notebook, prefix: string, of: SoumakStitch & { readonly ends: number }, { over, back, p, D, E }: SoumakInputs): readonly WorkingInput[] {
  const restEnds = soumakRest(of.ends, of.over, of.back);
  if (restEnds === 0) return [];
  const rest = book.note({
    id: `${prefix}restEnds`, name: 'ends beyond the last whole stitch', formula: 'mod(E - n, n - m)', inputs: [E, over, back], value: restEnds, unit: 'count', ...RULES.count,
  });
  const last = book.note({
    id: `${prefix}lastStitchMm`, name: 'weft of the shorter last stitch', formula: '(m + r + m - 2) * p + pi * D', inputs: [back, from('r', rest), p, D],
    value: soumakStitch({ ...of, over: of.back + restEnds }), unit: 'mm', ...RULES.stitchPath,
  });
  return [from('l', last)];
}

/** Length, ratio and number of stitches, and the weft of a row without its tails; `ids` name the latter two. */
export function noteSoumakRow(
  book: Notebook, prefix: string, of: SoumakStitch & { readonly ends: number }, inputs: SoumakInputs, ids: { readonly stitches: string; readonly row: string },
): { readonly stitches: Working; readonly row: Working } {
  const { over, back, p, D, E } = inputs;
  const stitch = book.note({
    id: `${prefix}stitchMm`, name: 'weft of one stitch', formula: '(n + m - 2) * p + pi * D', inputs: [over, back, p, D],
    value: soumakStitch(of), unit: 'mm', ...RULES.stitchPath,
  });
  book.note({
    id: `${prefix}ratio`, name: 'weft over cloth covered', formula: 'L / ((n - m) * p)', inputs: [from('L', stitch), over, back, p],
    value: soumakRatio(of), unit: 'ratio', ...RULES.stitchPath,
  });
  const stitches = book.note({
    id: `${prefix}${ids.stitches}`, name: 'stitches in a row', formula: 'floor((E - n) / (n - m)) + 1', inputs: [E, over, back],
    value: soumakStitchesPerRow(of.ends, of.over, of.back), unit: 'count', ...RULES.count,
  });
  const last = lastStitch(book, prefix, of, inputs);
  const row = book.note({
    id: `${prefix}${ids.row}`, name: 'weft of one row, without its tails', formula: last.length === 0 ? 's * L' : 's * L + l', inputs: [from('s', stitches), from('L', stitch), ...last],
    value: soumakRowLength(of, of.ends), unit: 'mm', ...RULES.stitchPath,
  });
  return { stitches, row };
}

export type KnotInputs = Inputs<'g' | 'k' | 'p' | 'd1' | 'd' | 'pile' | 'trim' | 'E' | 'edge' | 'thickness'>;

function noteCard(book: Notebook, prefix: string, cut: Working, thickness: WorkingInput): void {
  const card = windingCard(cut.value, Number(thickness.value));
  const exact = book.note({
    id: `${prefix}cardExactMm`, name: 'width of a winding card cut along one edge, before rounding', formula: 'S / 2 - x', inputs: [from('S', cut), thickness],
    value: card.exactMm, unit: 'mm', ...RULES.stitchPath,
  });
  const step = standing({ symbol: 's', name: 'step of cards', value: CARD_STEP_MM, unit: 'mm' }, DEFAULTS.cardStep);
  book.note({
    id: `${prefix}cardMm`, name: 'width of a winding card cut along one edge', formula: 'ceil(x / s - 1e-9) * s', inputs: [from('x', exact), step],
    value: card.widthMm, unit: 'mm', ...RULES.wholeNumbers,
  });
}

/** Bundle, wrap, cut length, knots in a row, and the card to wind the strands on. */
export function noteKnot(book: Notebook, prefix: string, of: RyaKnot & { readonly ends: number; readonly edgeEnds: number }, inputs: KnotInputs): { readonly cut: Working; readonly knotsPerRow: Working } {
  const { g, k, p, d1, d, pile, trim, E, edge, thickness } = inputs;
  const bundle = book.note({
    id: `${prefix}bundleMm`, name: 'strands of a knot lying together', formula: 'sqrt(g) * d', inputs: [g, d], value: ryaBundle(of), unit: 'mm', ...RULES.together,
  });
  const sum = book.note({
    id: `${prefix}diameterSumMm`, name: 'warp and strands together', formula: 'd1 + d', inputs: [d1, from('d', bundle)],
    value: of.warpDiameterMm + bundle.value, unit: 'mm', ...RULES.arithmetic,
  });
  const wrap = book.note({
    id: `${prefix}wrapMm`, name: 'strand the knot itself takes', formula: '2 * (2 * k - 1) * p + (pi + 2) * D', inputs: [k, p, from('D', sum)],
    value: ryaWrap(of), unit: 'mm', ...RULES.stitchPath,
  });
  const cut = book.note({
    id: `${prefix}cutMm`, name: 'length to cut each strand', formula: '2 * (P + t) + w', inputs: [pile, trim, from('w', wrap)],
    value: ryaCutLength(of), unit: 'mm', ...RULES.stitchPath,
  });
  const knotsPerRow = book.note({
    id: `${prefix}knotsPerRow`, name: 'knots in a row', formula: 'floor((E - 2 * b) / (2 * k))', inputs: [E, edge, k],
    value: ryaKnotsPerRow(of.ends, of.edgeEnds, of.legEnds), unit: 'count', ...RULES.count,
  });
  noteCard(book, prefix, cut, thickness);
  return { cut, knotsPerRow };
}
