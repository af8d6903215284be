/** The frame a piece is woven in: four bars, nails with the warp round them, and the shuttle where the last row ended. */
import { shade } from '#core/craft/cloth/colour.ts';
import { drawEnds, drawEverySecondEnd } from '#core/craft/cloth/ends.ts';
import { ROUND, dashes, num } from '#core/craft/cloth/markup.ts';
import { firstOver, type Weave } from '#core/craft/cloth/weave.ts';
import { CARD_ROW } from '#core/craft/interlacement/lay.ts';

const WOOD = '#b9aa8d';
const WOOD_DARK = '#6f6250';
const WOOD_LIGHT = '#d3c7ad';
const NAIL = '#36424c';
const CARD = '#c9b48a';

export function drawFrame(width: number, height: number, rail: number): string {
  const bar = (x: number, y: number, w: number, h: number): string =>
    `<path d="M${num(x)} ${num(y)}h${num(w)}v${num(h)}h${num(-w)}z" fill="${WOOD}" stroke="${WOOD_DARK}"/>`;
  const uprights = bar(0.5, rail * 0.4, rail, height - rail * 0.8) + bar(width - rail - 0.5, rail * 0.4, rail, height - rail * 0.8);
  const rails = bar(0.5, 0.5, width - 1, rail * 1.25) + bar(0.5, height - rail * 1.25 - 0.5, width - 1, rail * 1.25);
  const light = `M2 ${num(rail * 0.3)}H${num(width - 2)}M2 ${num(height - rail * 0.98)}H${num(width - 2)}`;
  const grain = `M${num(rail * 0.36)} ${num(rail * 2)}V${num(height - rail * 2)}M${num(width - rail * 0.66)} ${num(rail * 2)}V${num(height - rail * 2)}`;
  return (
    uprights + rails +
    `<path d="${light}" stroke="${WOOD_LIGHT}" stroke-width="${num(Math.max(1, rail * 0.14))}"/>` +
    `<path d="${grain}" stroke="${WOOD_LIGHT}" stroke-opacity=".5" stroke-width="${num(Math.max(1, rail * 0.1))}"/>`
  );
}

/** All ends from the upper nails to the lower ones. */
export function drawWarpOnNails(top: number, bottom: number, weave: Weave): string {
  const thick = Math.max(1.6, Math.min(weave.end * 0.42, 6));
  const d = `M0 ${num(top)}H${num(weave.width)}M0 ${num(bottom)}H${num(weave.width)}`;
  const each = dashes(0.01, weave.end - 0.01, weave.end / 2) + ROUND;
  return drawEnds(top, bottom, weave) + weave.paths.stroke(d, NAIL, thick, each);
}

/** The card that holds the first row up from the nails: like a broad pick below the first one, it goes over the ends that row goes under. */
export function drawSpacerCard(top: number, height: number, weave: Weave): string {
  const out = Math.min(10, weave.width * 0.03);
  const y = top + height / 2;
  const whole = `M${num(-out)} ${num(y)}H${num(weave.width + out)}`;
  return (
    weave.paths.stroke(whole, shade(CARD, 0.28), height) +
    weave.paths.stroke(whole, CARD, Math.max(0.5, height - 2)) +
    drawEverySecondEnd(top, top + height, firstOver(CARD_ROW, weave) === 0 ? 1 : 0, weave)
  );
}

/** A loaded shuttle that waits above the fell at the right, its thread coming from the end of the last row. */
export function drawShuttle(fell: number, colour: string, weave: Weave): string {
  const { width: w, paths } = weave;
  const unit = Math.max(3, Math.min(weave.end, 9));
  const x = w * 0.82;
  const y = fell - unit * 3.4;
  const thread = `M${num(w - 1)} ${num(fell + 2)}q${num(unit * 2)} ${num(-unit * 3)} ${num(-w * 0.05)} ${num(-unit * 3.2)}L${num(x)} ${num(y)}`;
  return (
    paths.stroke(thread, shade(colour, 0.15), Math.max(1.2, unit * 0.34), ROUND) +
    paths.stroke(`M${num(x)} ${num(y)}l${num(-w * 0.2)} ${num(-unit * 0.6)}`, '#8f7f63', Math.max(3, unit * 1.1), ROUND) +
    paths.stroke(`M${num(x - w * 0.05)} ${num(y - unit * 0.1)}l${num(-w * 0.11)} ${num(-unit * 0.35)}`, colour, Math.max(4, unit * 1.5), ROUND)
  );
}
