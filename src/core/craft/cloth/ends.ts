/** The warp: all ends of a stretch are one line as thick as the stretch is high, dashed once for each end. */
import { light, shade } from '#core/craft/cloth/colour.ts';
import { dashes, num } from '#core/craft/cloth/markup.ts';
import type { Weave } from '#core/craft/cloth/weave.ts';

/** Ends narrower than this cannot show that there are two of them. */
const DOUBLED_FROM = 6;

/** Ends from `top` to `bottom` over the whole width, or between `x0` and `x1` (multiples of one end). */
export function drawEnds(top: number, bottom: number, weave: Weave, x0 = 0, x1 = weave.width): string {
  const height = bottom - top;
  if (height <= 0) return '';
  return strokeEnds(`M${num(x0)} ${num(top + height / 2)}H${num(x1)}`, height, weave);
}

/** Every second end, from the left of the screen: those that lie over something broad which goes under them. */
export function drawEverySecondEnd(top: number, bottom: number, first: 0 | 1, weave: Weave): string {
  const height = bottom - top;
  const d = `M0 ${num(top + height / 2)}H${num(weave.width)}`;
  return endsAt(d, height, weave, (width, off) => dashes(width, 2 * weave.end - width, (first + 0.5) * weave.end - width / 2 + off));
}

/** The ends under lying lines of a given thickness. Every line begins at a multiple of one end. */
export function strokeEnds(d: string, height: number, weave: Weave): string {
  return endsAt(d, height, weave, (width, off) => eachEnd(weave, width, off));
}

/** The dashes of threads so wide, so far beside the middle of their ends. */
type DashesAt = (width: number, off: number) => string;

function endsAt(d: string, height: number, weave: Weave, at: DashesAt): string {
  return weave.endsTogether === 2 && weave.end >= DOUBLED_FROM ? doubledEnds(d, height, weave, at) : plainEnds(d, height, weave, at);
}

function plainEnds(d: string, height: number, weave: Weave, at: DashesAt): string {
  const { warpColour, warpWidth: width, paths } = weave;
  let drawn = paths.stroke(d, shade(warpColour, 0.45), height, at(width, 0));
  drawn += paths.stroke(d, warpColour, height, at(width * 0.68, -width * 0.08));
  if (width > 1.8) drawn += paths.stroke(d, light(warpColour, 0.6), height, at(width * 0.2, -width * 0.16));
  return drawn;
}

function doubledEnds(d: string, height: number, weave: Weave, at: DashesAt): string {
  const { warpColour, warpWidth: width, paths } = weave;
  return [-1, 1]
    .map((side) => {
      const off = side * width * 0.31;
      return (
        paths.stroke(d, shade(warpColour, 0.45), height, at(width * 0.56, off)) +
        paths.stroke(d, light(warpColour, 0.1), height, at(width * 0.34, off - width * 0.06))
      );
    })
    .join('');
}

/** A dash `width` px wide on each end, `off` px beside its middle. */
function eachEnd(weave: Weave, width: number, off: number): string {
  return dashes(width, weave.end - width, weave.end / 2 - width / 2 + off);
}
