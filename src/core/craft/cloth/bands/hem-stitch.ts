/** Hem-stitch: on the edge of the cloth, one stitch round each bundle of ends and one that reaches into the rows. */
import type { HemStitchBand } from '#core/craft/cloth/cloth-piece.ts';
import { light, shade } from '#core/craft/cloth/colour.ts';
import { ROUND, moved, num } from '#core/craft/cloth/markup.ts';
import { groupsShown, realEnds, stretchOf, type Weave } from '#core/craft/cloth/weave.ts';
import { bundleEndsFrom } from '#core/craft/techniques/hem-stitch.ts';

/**
 * Drawn about the edge of the cloth at y = 0.
 * @param into 1 if the cloth lies below the edge on the screen, -1 if above
 */
export function drawHemStitch(band: HemStitchBand, into: 1 | -1, weave: Weave): string {
  const bundles = groupsShown(bundleEndsFrom(realEnds(weave), band.bundleEnds), weave).map((bundle) => stretchOf(bundle, weave));
  const widest = Math.max(...bundles.map(({ x0, x1 }) => x1 - x0));
  const width = Math.max(1, Math.min(widest * 0.16, weave.end * 0.42, 6));
  const reach = Math.max(band.reachMm * weave.pxPerMm, width * 2.4) * into;
  let d = '';
  for (const { x0, x1 } of bundles) {
    d += `M${num(x0 + width)} 0H${num(Math.max(x0 + width, x1 - width * 0.6))}`;
    if (x1 < weave.width - 0.5) d += `M${num(x1)} 0l${num(width * 0.2)} ${num(reach)}`;
  }
  const { paths } = weave;
  return (
    paths.stroke(d, shade(band.colour, 0.55), width * 1.5, ROUND + moved(width * 0.12, width * 0.3)) +
    paths.stroke(d, shade(band.colour, 0.04), width, ROUND) +
    (width > 1.6 ? paths.stroke(d, light(band.colour, 0.35), width * 0.26, ROUND + moved(-width * 0.1, -width * 0.22)) : '')
  );
}
