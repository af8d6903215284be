/** The foot of a piece: what became of the warp's own ends below the cloth. */
import type { WovenPiece } from '#core/craft/cloth/cloth-piece.ts';
import { light, shade } from '#core/craft/cloth/colour.ts';
import { ROUND, num } from '#core/craft/cloth/markup.ts';
import { groupsShown, realEnds, stretchOf, type Weave } from '#core/craft/cloth/weave.ts';
import { FRINGE_BUNDLE_ENDS } from '#core/craft/defaults.ts';
import { bundlesOf } from '#core/craft/techniques/hem-stitch.ts';

type Finish = NonNullable<WovenPiece['finish']>;

/** Where nobody has said what becomes of the ends. */
const UNSAID: Finish = { bottom: 'knotted', fringeMm: 38, bundleEnds: FRINGE_BUNDLE_ENDS };

/** A bundle of ends on the screen. */
interface Bundle {
  readonly x0: number;
  readonly x1: number;
}

/** From the edge of the cloth to the tips, in pixels; 0 where nothing hangs. */
export function warpFringeHeight({ finish = UNSAID }: WovenPiece, weave: Weave): number {
  const fringe = finish.fringeMm * weave.pxPerMm;
  switch (finish.bottom) {
    case 'knotted':
      return knotY(bundlesShown(finish, weave), weave) + Math.max(fringe, weave.end * 1.2);
    case 'twisted':
      return fringe === 0 ? 0 : Math.max(fringe, weave.end * 4);
    case 'plain':
      return fringe;
    case 'tucked':
      return 0;
  }
}

/** Drawn downwards from the edge of the cloth at y = 0. */
export function drawWarpFringe(piece: WovenPiece, weave: Weave): string {
  const { finish = UNSAID } = piece;
  const height = warpFringeHeight(piece, weave);
  if (height <= 0) return '';
  if (finish.bottom === 'knotted') return drawKnotted(bundlesShown(finish, weave), height, weave);
  return finish.bottom === 'twisted' ? drawTwisted(bundlesShown(finish, weave), height, weave) : drawLoose(height, weave);
}

/** Bundles count single ends, of which two may be worked as one; the last may be smaller. */
function bundlesShown({ bundleEnds }: Finish, weave: Weave): readonly Bundle[] {
  const ends = realEnds(weave);
  const each = Math.max(1, Math.round(bundleEnds / weave.endsTogether));
  const { whole, lastEnds } = bundlesOf(ends, each);
  const all = Array.from({ length: whole + (lastEnds > 0 ? 1 : 0) }, (_, at) => ({ first: at * each, last: Math.min(ends, (at + 1) * each) - 1 }));
  return groupsShown(all, weave).map((bundle) => stretchOf(bundle, weave));
}

const widest = (bundles: readonly Bundle[]): number => Math.max(...bundles.map(({ x0, x1 }) => x1 - x0));

/** Wide bundles need more room to come together. */
const knotY = (bundles: readonly Bundle[], weave: Weave): number => Math.max(weave.end * 1.6, widest(bundles) * 0.5);

/** The ends of a bundle that are drawn, from its left. */
function endsOf({ x0, x1 }: Bundle, { end }: Weave): number[] {
  const count = Math.max(1, Math.round((x1 - x0) / end));
  return Array.from({ length: count }, (_, at) => x0 + ((at + 0.5) * (x1 - x0)) / count);
}

function drawKnotted(bundles: readonly Bundle[], height: number, weave: Weave): string {
  const at = knotY(bundles, weave);
  let strands = '';
  let knots = '';
  for (const bundle of bundles) {
    const middle = (bundle.x0 + bundle.x1) / 2;
    const ends = endsOf(bundle, weave);
    ends.forEach((x, index) => (strands += knottedEnd(x, middle, index - (ends.length - 1) / 2, at, height, weave)));
    knots += `M${num(middle - weave.end * 0.3)} ${num(at)}h${num(weave.end * 0.6)}`;
  }
  const { paths, warpColour } = weave;
  return (
    drawStrands(strands, weave) +
    paths.stroke(knots, shade(warpColour, 0.5), Math.max(2, weave.end * 0.9), ROUND) +
    paths.stroke(knots, light(warpColour, 0.15), Math.max(1.4, weave.end * 0.64), ROUND)
  );
}

function drawStrands(d: string, { paths, warpColour, warpWidth }: Weave): string {
  return paths.stroke(d, shade(warpColour, 0.45), warpWidth, ROUND) + paths.stroke(d, warpColour, warpWidth * 0.66, ROUND);
}

/** Drawn together to the knot, then hanging a little apart. */
function knottedEnd(x: number, middle: number, place: number, knot: number, height: number, weave: Weave): string {
  const near = Math.min(0.16, 0.7 / Math.max(1, Math.abs(place)));
  const at = middle + place * weave.end * near;
  const fall = height * (0.9 + weave.chance() * 0.1) - knot;
  const sway = (weave.chance() - 0.5) * weave.end * 0.6;
  const out = place * weave.end * Math.min(0.5, near * 3);
  return `M${num(x)} 0Q${num(x)} ${num(knot * 0.6)} ${num(at)} ${num(knot)}q${num(sway)} ${num(fall * 0.5)} ${num(out)} ${num(fall)}`;
}

/** Each bundle as a cord of two plies, knotted at its tip. */
function drawTwisted(bundles: readonly Bundle[], height: number, weave: Weave): string {
  const { paths, warpColour } = weave;
  const thick = Math.max(2, Math.min(widest(bundles) * 0.6, weave.warpWidth * Math.sqrt(widest(bundles) / weave.end) * 1.1));
  const from = Math.min(height * 0.3, widest(bundles) * 0.45);
  const tip = height - thick * 1.2;
  let gathered = '';
  let cords = '';
  let plies = '';
  let knots = '';
  let tufts = '';
  for (const bundle of bundles) {
    const x = (bundle.x0 + bundle.x1) / 2;
    for (const end of endsOf(bundle, weave)) gathered += `M${num(end)} 0Q${num(end)} ${num(from * 0.6)} ${num(x + (end - x) * 0.2)} ${num(from + thick)}`;
    cords += `M${num(x)} ${num(from)}V${num(tip)}`;
    /* Let go to the left about each other, plies fall from the upper left. */
    for (let y = from + thick * 0.5; y < tip - thick * 0.3; y += thick * 0.85) plies += `M${num(x - thick * 0.34)} ${num(y - thick * 0.28)}l${num(thick * 0.68)} ${num(thick * 0.56)}`;
    knots += `M${num(x)} ${num(tip)}h.1`;
    tufts += `M${num(x)} ${num(tip)}l${num(-thick * 0.3)} ${num(height - tip)}M${num(x)} ${num(tip)}l${num(thick * 0.3)} ${num(height - tip)}`;
  }
  return (
    drawStrands(gathered, weave) +
    drawStrands(tufts, weave) +
    paths.stroke(cords, shade(warpColour, 0.5), thick) +
    paths.stroke(plies, warpColour, thick * 0.58, ROUND) +
    (thick > 3.4 ? paths.stroke(plies, light(warpColour, 0.5), thick * 0.16, ROUND) : '') +
    paths.stroke(knots, shade(warpColour, 0.5), thick * 1.5, ROUND) +
    paths.stroke(knots, light(warpColour, 0.15), thick * 1.1, ROUND)
  );
}

/** Ends as they were cut, hanging. */
function drawLoose(height: number, weave: Weave): string {
  let strands = '';
  for (const x of endsOf({ x0: 0, x1: weave.width }, weave)) {
    const fall = height * (0.92 + weave.chance() * 0.08);
    const sway = (weave.chance() - 0.5) * weave.end * 0.8;
    strands += `M${num(x)} 0q${num(-sway * 0.6)} ${num(fall * 0.5)} ${num(sway)} ${num(fall)}`;
  }
  return drawStrands(strands, weave);
}
