/** Hem-stitch: on the edge of the cloth, one stitch round each bundle of ends and one that reaches into the rows. */
import type { HemStitchBand } from '#core/craft/cloth/cloth-piece.ts';
import { light, shade } from '#core/craft/cloth/colour.ts';
import { ROUND, moved, num } from '#core/craft/cloth/markup.ts';
import type { Weave } from '#core/craft/cloth/weave.ts';

/**
 * Drawn about the edge of the cloth at y = 0.
 * @param into 1 if the cloth lies below the edge on the screen, -1 if above
 */
export function drawHemStitch(band: HemStitchBand, into: 1 | -1, weave: Weave): string {
  const step = hemStep(band, weave);
  const width = Math.max(1, Math.min(step * 0.16, weave.end * 0.42, 6));
  const reach = Math.max(band.reachMm * weave.pxPerMm, width * 2.4) * into;
  let d = '';
  for (let x = step; x < weave.width + step * 0.4; x += step) {
    const at = Math.min(x, weave.width);
    d += `M${num(at - step + width)} 0H${num(at - width * 0.6)}`;
    if (at < weave.width - 0.5) d += `M${num(at)} 0l${num(width * 0.2)} ${num(reach)}`;
  }
  const { paths } = weave;
  return (
    paths.stroke(d, shade(band.colour, 0.55), width * 1.5, ROUND + moved(width * 0.12, width * 0.3)) +
    paths.stroke(d, shade(band.colour, 0.04), width, ROUND) +
    (width > 1.6 ? paths.stroke(d, light(band.colour, 0.35), width * 0.26, ROUND + moved(-width * 0.1, -width * 0.22)) : '')
  );
}

function hemStep(band: HemStitchBand, weave: Weave): number {
  const real = (weave.end / weave.grouped) * band.bundleEnds;
  const bundles = Math.max(1, Math.round(weave.width / Math.max(real, weave.end * 2)));
  return weave.width / bundles;
}
