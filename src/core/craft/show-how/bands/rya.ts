/** Rya: knots, strands, and the length to cut them. */
import { CARD_THICKNESS_MM } from '#core/craft/defaults.ts';
import { asked, spacing, workingEnds, type BandOf, type ToldBand } from '#core/craft/show-how/bands/band.ts';
import { noteKnot } from '#core/craft/show-how/explain-stitches.ts';
import { ofRole } from '#core/craft/show-how/explain-weft.ts';
import { from, standing } from '#core/craft/show-how/notebook.ts';
import { DEFAULTS, RULES } from '#core/craft/show-how/sources.ts';

export function noteRyaBand(of: BandOf<'rya'>): ToldBand {
  const { on: { book, piece, warp, weft }, prefix, band, woven } = of;
  const strandLoft = ofRole(weft.threads, band.yarn).strandLoft;
  const g = asked(of, 'g', 'strands in a knot', band.strands, 'strands');
  const knot = {
    ...band, spacingMm: warp.spacing.value, warpDiameterMm: warp.workingDiameter.value, strandLoftMm: strandLoft.value, ends: piece.laid.workingEnds, edgeEnds: band.edgeEnds ?? 0,
  };
  const { cut, knotsPerRow } = noteKnot(book, prefix, knot, {
    g,
    k: asked(of, 'k', 'ends in each leg', band.legEnds, 'legEnds'),
    p: spacing(of),
    d1: from('d1', warp.workingDiameter),
    d: from('d', strandLoft),
    pile: asked(of, 'P', 'length of the pile', band.pileMm, 'pileMm', 'mm'),
    trim: asked(of, 't', 'length to trim away', band.trimMm, 'trimMm', 'mm'),
    E: workingEnds(of),
    edge: band.edgeEnds === undefined ? standing({ symbol: 'b', name: 'plain ends at each edge', value: 0, unit: 'count' }, DEFAULTS.edgeEnds) : asked(of, 'b', 'plain ends at each edge', band.edgeEnds, 'edgeEnds'),
    thickness: standing({ symbol: 'x', name: 'thickness of the card', value: CARD_THICKNESS_MM, unit: 'mm' }, DEFAULTS.cardThickness),
  });
  const rows = asked(of, 'r', 'rows', band.rows, 'rows');
  const knots = book.note({ id: `${prefix}knots`, name: 'knots', formula: 'r * K', inputs: [rows, from('K', knotsPerRow)], value: woven.counts.knots ?? 0, unit: 'count', ...RULES.count });
  const strands = book.note({ id: `${prefix}strands`, name: 'strands to cut', formula: 'K * g', inputs: [from('K', knots), g], value: woven.counts.strands ?? 0, unit: 'count', ...RULES.count });
  const thread = book.note({
    id: `${prefix}ryaMm.${band.yarn}`, name: 'yarn of all strands', formula: 'n * S', inputs: [from('n', strands), from('S', cut)], value: strands.value * cut.value, unit: 'mm', ...RULES.arithmetic,
  });
  return { uses: [{ kind: 'rya', role: band.yarn, carry: 'cut', thread }], work: { knots } };
}
