/** Soumak with the tabby that holds it. */
import { asked, noteLoftSum, noteRows, spacing, tail, workingEnds, type BandOf, type ToldBand } from '#core/craft/show-how/bands/band.ts';
import { noteSoumakRow } from '#core/craft/show-how/explain-stitches.ts';
import { ofRole } from '#core/craft/show-how/explain-weft.ts';
import { from } from '#core/craft/show-how/notebook.ts';
import { RULES } from '#core/craft/show-how/sources.ts';

export function noteSoumakBand(of: BandOf<'soumak'>): ToldBand {
  const { on: { book, piece, warp, weft }, prefix, band, woven } = of;
  const rows = asked(of, 'r', 'rows', band.rows, 'rows');
  const sum = noteLoftSum(of, band.yarn);
  const stitch = { over: band.over, back: band.back, spacingMm: warp.spacing.value, diameterSumMm: sum.value, ends: piece.laid.workingEnds };
  const { stitches, row } = noteSoumakRow(book, prefix, stitch, {
    over: asked(of, 'n', 'ends passed over', band.over, 'over'),
    back: asked(of, 'm', 'ends gone back under', band.back, 'back'),
    p: spacing(of),
    D: from('D', sum),
    E: workingEnds(of),
  }, { stitches: 'stitchesPerRow', row: 'bareRowMm' });
  const whole = book.note({
    id: `${prefix}rowMm`, name: 'weft of one row with its tails', formula: 'L + 2 * t', inputs: [from('L', row), tail(of)], value: row.value + 2 * piece.settings.tailMm, unit: 'mm', ...RULES.arithmetic,
  });
  const all = book.note({ id: `${prefix}stitches`, name: 'stitches', formula: 'r * s', inputs: [rows, from('s', stitches)], value: woven.counts.stitches ?? 0, unit: 'count', ...RULES.count });
  const use = noteRows(of, 'soumak', band.yarn, 'by-the-row', rows, whole);
  const picks = woven.counts.picks;
  if (picks === undefined) return { uses: [use], work: { stitches: all } };
  const between = book.note({
    id: `${prefix}picks`, name: 'picks of tabby between the rows', formula: '(r - 1) * b', inputs: [rows, asked(of, 'b', 'picks between two rows', band.tabbyBetween, 'tabbyBetween')],
    value: picks, unit: 'count', ...RULES.count,
  });
  const ground = noteRows(of, 'tabby', band.tabbyYarn, 'shuttle', from('N', between), ofRole(weft.picks, band.tabbyYarn).pick);
  return { uses: [use, { ...ground, full: ground.thread }], work: { rows: between, stitches: all } };
}
