/** Roving: puffed floats on the face, straight ones behind. */
import { asked, noteRows, spacing, tail, workingEnds, type BandOf, type ToldBand } from '#core/craft/show-how/bands/band.ts';
import { from, standing } from '#core/craft/show-how/notebook.ts';
import { DEFAULTS, RULES } from '#core/craft/show-how/sources.ts';
import { bulgeArc, rovingFloats, rovingPass } from '#core/craft/techniques/roving.ts';

export function noteRovingBand(of: BandOf<'roving'>): ToldBand {
  const { on: { book, piece, warp }, prefix, band } = of;
  const ends = piece.laid.workingEnds;
  const [E, p] = [workingEnds(of), spacing(of)];
  const over = asked(of, 'n', 'ends passed over', band.over, 'over');
  const bulge = asked(of, 'a', 'bulge', band.bulgeMm, 'bulgeMm', 'mm');
  const base = book.note({ id: `${prefix}floatMm`, name: 'cloth under one float', formula: 'n * p', inputs: [over, p], value: band.over * warp.spacing.value, unit: 'mm', ...RULES.arithmetic });
  const b = from('b', base);
  const puffed = { formula: 'sqrt(b^2 + 16 * a^2) / 2 + b^2 / (8 * a) * asinh(4 * a / b)', inputs: [b, bulge] };
  const arc = book.note({
    id: `${prefix}arcMm`, name: 'roving of one puffed float', ...(band.bulgeMm === 0 ? { formula: 'b', inputs: [b] } : puffed), value: bulgeArc(base.value, band.bulgeMm), unit: 'mm', ...RULES.parabola,
  });
  const floats = rovingFloats(ends, band.over);
  const count = (id: string, name: string, formula: string, value: number) => book.note({ id: `${prefix}${id}`, name, formula, inputs: [E, over], value, unit: 'count', ...RULES.count });
  const face = count('faceFloats', 'floats on the face', 'ceil(floor(E / n) / 2)', floats.face);
  const back = count('backFloats', 'floats behind', 'floor(floor(E / n) / 2)', floats.back);
  const rest = count('restEnds', 'ends beyond the last whole float', 'mod(E, n)', floats.rest);
  const pass = book.note({
    id: `${prefix}rowMm`, name: 'roving of one pass with its tails', formula: 'f * s + k * b + r * p + 2 * t', inputs: [from('f', face), from('s', arc), from('k', back), b, from('r', rest), p, tail(of)],
    value: rovingPass({ ...band, ends, spacingMm: warp.spacing.value, tailMm: piece.settings.tailMm }), unit: 'mm', ...RULES.stitchPath,
  });
  const passes = band.passes === undefined ? standing({ symbol: 'q', name: 'passes', value: 1, unit: 'count' }, DEFAULTS.onePass) : asked(of, 'q', 'passes', band.passes, 'passes');
  return { uses: [noteRows(of, 'roving', band.yarn, 'by-the-row', passes, pass)], work: {} };
}
