/** Hem-stitch: yarn round every bundle, the last one smaller where ends do not come out. */
import { asked, noteLoftSum, spacing, workingEnds, type BandOf, type ToldBand } from '#core/craft/show-how/bands/band.ts';
import { ofRole } from '#core/craft/show-how/explain-weft.ts';
import { from } from '#core/craft/show-how/notebook.ts';
import { RULES } from '#core/craft/show-how/sources.ts';
import type { Working, WorkingInput } from '#core/craft/show-how/working.ts';
import { bundlesOf, hemStitchLength } from '#core/craft/techniques/hem-stitch.ts';

export function noteHemStitchBand(of: BandOf<'hem-stitch'>): ToldBand {
  const { on: { book, piece, warp, weft }, prefix, band, woven } = of;
  const E = workingEnds(of);
  const k = asked(of, 'k', 'ends in a bundle', band.bundleEnds, 'bundleEnds');
  const sum = noteLoftSum(of, band.yarn);
  const p2 = ofRole(weft.spacings, band.yarn);
  const shared = [spacing(of), from('D', sum), asked(of, 'r', 'rows the stitch reaches up', band.reachPicks, 'reachPicks'), from('p2', p2)];
  const around = (id: string, name: string, ends: WorkingInput): Working =>
    book.note({
      id: `${prefix}${id}`, name, formula: '2 * (k - 1) * p + pi * D + hypot(k * p, r * p2) + r * p2', inputs: [{ ...ends, symbol: 'k' }, ...shared],
      value: hemStitchLength({ bundleEnds: Number(ends.value), reachPicks: band.reachPicks, spacingMm: warp.spacing.value, pickSpacingMm: p2.value, diameterSumMm: sum.value }), unit: 'mm', ...RULES.stitchPath,
    });
  const { whole, lastEnds } = bundlesOf(piece.laid.workingEnds, band.bundleEnds);
  const bundle = around('bundleMm', 'yarn round one bundle', k);
  const bundles = book.note({ id: `${prefix}wholeBundles`, name: 'whole bundles', formula: 'floor(E / k)', inputs: [E, k], value: whole, unit: 'count', ...RULES.count });
  const rest = book.note({ id: `${prefix}lastEnds`, name: 'ends beyond the last whole bundle', formula: 'mod(E, k)', inputs: [E, k], value: lastEnds, unit: 'count', ...RULES.count });
  const stitches = book.note({
    id: `${prefix}stitches`, name: 'bundles', formula: 'w + min(1, r)', inputs: [from('w', bundles), from('r', rest)], value: woven.counts.stitches ?? 0, unit: 'count', ...RULES.count,
  });
  const last = lastEnds === 0 ? [] : [from('l', around('lastBundleMm', 'yarn round the smaller last bundle', from('k', rest)))];
  const thread = book.note({
    id: `${prefix}hemStitchMm.${band.yarn}`, name: 'yarn of one edge', formula: last.length === 0 ? 'w * L' : 'w * L + l', inputs: [from('w', bundles), from('L', bundle), ...last],
    value: woven.uses[0]?.threadMm ?? 0, unit: 'mm', ...RULES.arithmetic,
  });
  return { uses: [{ kind: 'hemStitch', role: band.yarn, carry: 'shuttle', thread, row: thread, strands: ofRole(weft.threads, band.yarn).strands }], work: { hemBundles: stitches } };
}
