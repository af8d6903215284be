/** Weft twining: both strands of a row, each an ellipse stretched along it. */
import { asked, noteLoftSum, noteRows, spacing, tail, workingEnds, type BandOf, type ToldBand } from '#core/craft/show-how/bands/band.ts';
import { ofRole } from '#core/craft/show-how/explain-weft.ts';
import { from, standing } from '#core/craft/show-how/notebook.ts';
import { DEFAULTS, RULES } from '#core/craft/show-how/sources.ts';
import { ellipticE, twinedEllipse, twinedRow, twiningRatio } from '#core/craft/techniques/twining.ts';

/** E(m) as a mean over evenly spaced places, which comes to the integral faster than any power of their number. */
const ELLIPTIC = 'pi / 2 * mean(map(1:200, f(k) = sqrt(1 - m * sin(pi * (k - 0.5) / 200)^2)))';

export function noteTwiningBand(of: BandOf<'twining'>): ToldBand {
  const { on: { book, piece, warp, weft }, prefix, band, woven } = of;
  const [E, p] = [workingEnds(of), spacing(of)];
  const { loft } = ofRole(weft.threads, band.yarn);
  const sum = noteLoftSum(of, band.yarn);
  const [D, d] = [from('D', sum), from('d', loft)];
  const row = { ends: piece.laid.workingEnds, spacingMm: warp.spacing.value, diameterSumMm: sum.value, weftMm: loft.value, tailMm: piece.settings.tailMm, endsPerTwist: band.endsPerTwist ?? 1 };
  const every = band.endsPerTwist === undefined ? standing({ symbol: 'k', name: 'ends between two crossings', value: 1, unit: 'count' }, DEFAULTS.oneEnd) : asked(of, 'k', 'ends between two crossings', band.endsPerTwist, 'endsPerTwist');
  const twist = book.note({ id: `${prefix}twistMm`, name: 'cloth between two crossings', formula: 'k * p', inputs: [every, p], value: row.endsPerTwist * row.spacingMm, unit: 'mm', ...RULES.arithmetic });
  const x = from('x', twist);
  const ellipse = twinedEllipse(twist.value, row.diameterSumMm, row.weftMm);
  const stretch = book.note({ id: `${prefix}stretch`, name: 'how far the ellipse is stretched, squared', formula: '1 + (pi / (2 * x))^2 * D^2', inputs: [x, D], value: ellipse.stretch, unit: 'ratio', ...RULES.ellipse });
  const m = book.note({
    id: `${prefix}ellipseM`, name: 'parameter of the ellipse', formula: '(pi / (2 * x))^2 * (D^2 - d^2) / s', inputs: [x, D, d, from('s', stretch)], value: ellipse.m, unit: 'ratio', ...RULES.ellipse,
  });
  const integral = book.note({ id: `${prefix}ellipseE`, name: 'quarter of the ellipse’s girth', formula: ELLIPTIC, inputs: [from('m', m)], value: ellipticE(m.value), unit: 'ratio', ...RULES.ellipse });
  const ratio = book.note({
    id: `${prefix}ratio`, name: 'strand over cloth covered', formula: '2 / pi * sqrt(s) * q', inputs: [from('s', stretch), from('q', integral)],
    value: twiningRatio(twist.value, row.diameterSumMm, row.weftMm), unit: 'ratio', ...RULES.ellipse,
  });
  const whole = book.note({
    id: `${prefix}rowMm`, name: 'both strands of one row with their tails', formula: '2 * (E - 1) * p * q + pi * D / 2 + 2 * t', inputs: [E, p, from('q', ratio), D, tail(of)],
    value: twinedRow(row), unit: 'mm', ...RULES.stitchPath,
  });
  const rows = asked(of, 'r', 'rows', band.rows, 'rows');
  const stitches = book.note({ id: `${prefix}stitches`, name: 'crossings', formula: 'r * ceil(E / k - 1e-9)', inputs: [rows, E, every], value: woven.counts.stitches ?? 0, unit: 'count', ...RULES.count });
  return { uses: [noteRows(of, 'twining', band.yarn, 'by-the-row', rows, whole)], work: { stitches } };
}
