/** What a loom larger than the pattern's leaves as it is, and what could grow on it, in words. */
import { lengthOf } from '#core/craft/amounts/amount-types.ts';
import { roomOnLoom } from '#core/craft/frame-loom/room.ts';
import { fills } from '#core/craft/fitting/leave-out.ts';
import { bandWords, type Made } from '#core/craft/fitting/tell-changes.ts';
import { Findings } from '#core/craft/reading/findings.ts';
import { amountText } from '#core/units/format-amount.ts';
import type { Units } from '#core/units/units.ts';

const fillingBand = ({ piece }: Made): string | undefined => {
  const index = piece.bands.findIndex(fills);
  const band = piece.bands[index];
  return band && bandWords(band, index);
};

/** `made` is the piece as it is on her loom, `pattern` on its own. Sentences; none where nothing could grow. */
export function tellRoom(pattern: Made, made: Made, units: Units): readonly string[] {
  const findings = Findings.in(units);
  const { widthMm, heightMm } = roomOnLoom(made.piece);
  const { size } = made.piece;
  const text = (mm: number, use: 'size' | 'yarn' = 'size'): string => amountText(lengthOf(mm, use), units);
  // Room is never told larger than it is.
  const room = (mm: number): string => findings.length(mm, 'down');
  const growMm = heightMm - size.heightMm;
  if (growMm <= 0 && (widthMm === undefined || widthMm <= size.widthMm)) return [];
  const holds = `At this spacing your loom holds a piece up to ${widthMm === undefined ? '' : `${room(widthMm)} wide and `}${room(heightMm)} high.`;
  const stays = `As it is, yours stays ${text(size.widthMm)} wide and ${text(size.heightMm)} high.`;
  const [wasWarp, isWarp] = [pattern.plan.warp.withMarginMm, made.plan.warp.withMarginMm];
  const warp = isWarp > wasWarp ? [`The warp spans the whole loom all the same: have ${text(isWarp, 'yarn')} of it in hand instead of ${text(wasWarp, 'yarn')}.`] : [];
  const filling = fillingBand(made);
  const grow = growMm > 0 && filling !== undefined ? [`There is room for ${room(growMm)} more of the band that fills the rest (${filling}).`] : [];
  return [holds, stays, ...warp, ...grow];
}
