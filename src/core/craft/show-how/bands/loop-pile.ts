/** Loop pile: picks with their loops drawn up. */
import { asked, noteRows, workingEnds, type BandOf, type ToldBand } from '#core/craft/show-how/bands/band.ts';
import { ofRole } from '#core/craft/show-how/explain-weft.ts';
import { from } from '#core/craft/show-how/notebook.ts';
import { RULES } from '#core/craft/show-how/sources.ts';
import { loopLength, loopRow, loopsPerRow } from '#core/craft/techniques/loop-pile.ts';

export function noteLoopPileBand(of: BandOf<'loop-pile'>): ToldBand {
  const { on: { book, piece, weft }, prefix, band, woven } = of;
  const { loft } = ofRole(weft.threads, band.yarn);
  const { pick } = ofRole(weft.picks, band.yarn);
  const how = band.rodMm === undefined
    ? { formula: '2 * h', inputs: [asked(of, 'h', 'height of a loop', band.loopMm, 'loopMm', 'mm')] }
    : { formula: 'pi * (G + d)', inputs: [asked(of, 'G', 'thickness of the rod', band.rodMm, 'rodMm', 'mm'), from('d', loft)] };
  const loop = book.note({ id: `${prefix}loopMm`, name: 'weft of one loop', ...how, value: loopLength(band, loft.value), unit: 'mm', ...RULES.stitchPath });
  const loops = book.note({
    id: `${prefix}loopsPerRow`, name: 'loops in a row', formula: 'max(0, floor((E - 2) / 2))', inputs: [workingEnds(of)], value: loopsPerRow(piece.laid.workingEnds), unit: 'count', ...RULES.count,
  });
  const row = book.note({
    id: `${prefix}rowMm`, name: 'one pick with its loops', formula: 'L + n * l', inputs: [from('L', pick), from('n', loops), from('l', loop)],
    value: loopRow(pick.value, loops.value, loop.value), unit: 'mm', ...RULES.arithmetic,
  });
  const rows = asked(of, 'r', 'rows', band.rows, 'rows');
  const picks = book.note({ id: `${prefix}picks`, name: 'picks', formula: 'r', inputs: [rows], value: band.rows, unit: 'count', ...RULES.asGiven });
  const stitches = book.note({ id: `${prefix}stitches`, name: 'loops', formula: 'r * n', inputs: [rows, from('n', loops)], value: woven.counts.stitches ?? 0, unit: 'count', ...RULES.count });
  return { uses: [noteRows(of, 'loopPile', band.yarn, 'shuttle', rows, row)], work: { rows: picks, stitches } };
}
