/** What cannot change any more once a piece is on the loom: its warp, and what is woven of it. */
import type { Made } from '#core/craft/fitting/tell-changes.ts';
import { isBegun, type WovenSoFar } from '#core/craft/rest/woven-so-far.ts';
import type { Band } from '#core/craft/piece.ts';
import type { Problem } from '#core/outcome.ts';

const SAME_MM = 0.01;
const differs = (a: number, b: number): boolean => Math.abs(a - b) > SAME_MM;
const NEW_WARP = 'To change it, cut this piece off and wind a new warp: say then that nothing is woven yet.';

/** What may be said of a yarn in other words while it stays the same. */
const UNSEEN = { label: undefined, colour: undefined, ball: undefined, fibre: undefined };

/** Without what makes no difference to cloth that is woven already. */
const cloth = (band: Band): string => JSON.stringify({ ...band, fill: undefined, heightMm: undefined });

/**
 * One problem (`E_FIT`) for each thing of `after` that is not as in `before`, which is on the loom as far as `woven`
 * says. Heights and yarns of what is not woven yet may change, and so may the bands.
 */
export function refuseChanges(before: Made, after: Made, woven: WovenSoFar): readonly Problem[] {
  if (!isBegun(woven)) return [];
  const found: Problem[] = [];
  const refuse = (path: string, message: string): void => void found.push({ code: 'E_FIT', path, message });
  if (differs(before.plan.ends.spacingMm, after.plan.ends.spacingMm) || before.piece.loom.nailPitchMm !== after.piece.loom.nailPitchMm) {
    refuse('/loom/nailPitchMm', `The warp is on the loom, and its ends stay as far apart as they are. ${NEW_WARP}`);
  } else if (before.plan.ends.count !== after.plan.ends.count || differs(before.piece.size.widthMm, after.piece.size.widthMm)) {
    refuse('/size/widthMm', `The warp is on the loom, so the piece keeps its width and its ${String(before.plan.ends.count)} ends. ${NEW_WARP}`);
  }
  if ((before.piece.warp.endsTogether ?? 1) !== (after.piece.warp.endsTogether ?? 1)) {
    refuse('/warp/endsTogether', `The cloth is begun, so its ends are worked on as they are. ${NEW_WARP}`);
  }
  if (JSON.stringify({ ...before.piece.warp.yarn, ...UNSEEN }) !== JSON.stringify({ ...after.piece.warp.yarn, ...UNSEEN })) {
    refuse('/warp/yarn', `The warp is on the loom, so it stays the yarn it is. ${NEW_WARP}`);
  }
  const begun = woven.bandsDone + ((woven.rows ?? 0) > 0 ? 1 : 0);
  const [was, is] = [before, after].map(({ piece }) => piece.bands.slice(0, begun).map(cloth).join());
  if (was !== is) refuse('/bands', 'Bands that are woven already cannot be left out or changed. Choose among those that are still to come.');
  return found;
}
