/** Dressing the loom: how many ends the width takes, and whether loom and piece fit each other. */
import { NAIL_DIAMETER_MM, ASHENHURST_K } from '#core/craft/defaults.ts';
import { END_RANGE, endsFor, endsSuit, rawEnds, widthBeforeDrawIn } from '#core/craft/ends.ts';
import type { Settings } from '#core/craft/frame-loom/settings.ts';
import { heightBeforeShrinking } from '#core/craft/loom-height.ts';
import { bareWarp, largestHeight, largestWidth, layoutOf, widthOfEnds, type Edges } from '#core/craft/frame-loom/room.ts';
import { endsPerMm, nailsUsed, railNeeded, spacingRows, workingSpacing, zigzagGaps } from '#core/craft/nails.ts';
import type { EndsTogether, Loom, Parity, FrameLoomPiece, Warp } from '#core/craft/piece.ts';
import type { EndsPlan, LoomPlan } from '#core/craft/plan-types.ts';
import type { Findings } from '#core/craft/reading/findings.ts';
import { diameterTogether } from '#core/craft/yarn/diameter.ts';
import { threadOf, type Thread } from '#core/craft/yarn/thread.ts';

export interface DressedWarp {
  readonly ends: EndsPlan;
  readonly insideWidthNeededMm: number;
  /** One end. */
  readonly thread: Thread;
  /** Compressed, of a working end: two ends together are √2 as thick as one. */
  readonly workingDiameterMm: number;
  readonly nailDiameterMm: number;
}

/** Rounding must not refuse what fits exactly. */
const HAIR_MM = 1e-9;

interface Demands {
  readonly together: EndsTogether;
  readonly parity: Parity;
}

/** In words: `an even number of ends`. */
function parityWords({ together, parity }: Demands): string {
  const kind = parity === 'any' ? '' : `${parity} `;
  if (together === 1) return `${parity === 'even' || parity === 'odd' ? 'an ' : 'a '}${kind}number of ends`;
  return parity === 'any' ? 'ends in pairs' : `${parity === 'even' ? 'an even' : 'an odd'} number of pairs of ends`;
}

function pinnedEnds(pinned: number, demands: Demands, findings: Findings): number {
  if (!endsSuit(pinned, demands.together, demands.parity)) {
    const { count } = endsFor(pinned, demands.together, demands.parity);
    findings.reject('E_PARITY', '/warp/endCount', `This pattern needs ${parityWords(demands)}, and ${String(pinned)} is not. ${String(count)} works.`);
  }
  return pinned;
}

/** Undefined if there are too few or too many to go on with. */
function reckonedEnds(raw: number, demands: Demands, spacingMm: number, findings: Findings): number | undefined {
  const { count, raisedBy } = endsFor(raw, demands.together, demands.parity);
  if (count < END_RANGE.min || count > END_RANGE.max) {
    const words = `${String(count)} ends are too ${count < END_RANGE.min ? 'few' : 'many'} to weave with.`;
    findings.reject('E_RANGE', '/size/widthMm', `${words} Between ${String(END_RANGE.min)} and ${String(END_RANGE.max)} works.`);
    return undefined;
  }
  if (raisedBy > 0) {
    const from = String(count - raisedBy);
    const wider = findings.length((raisedBy * spacingMm) / demands.together);
    findings.warn('W_PARITY', demands.parity === 'any' ? '/warp/endsTogether' : '/warp/parity',
      `This pattern needs ${parityWords(demands)}. ${from} becomes ${String(count)}; the cloth grows by ${wider}.`);
  }
  return count;
}

/** Pinned ends may come out at another width than was asked; a whole spacing of difference is worth a word. */
function checkPinnedWidth(count: number, raw: number, widthMm: number, findings: Findings): void {
  if (Math.abs(count - raw) <= 2) return;
  findings.warn('W_WIDTH', '/warp/endCount', `${String(count)} ends come out ${findings.length(widthMm)} wide, not as wide as was asked.`);
}

function checkInsideWidth(loom: Loom, warp: Warp, neededMm: number, settings: Settings, findings: Findings): void {
  if (loom.insideWidthMm === undefined || neededMm <= loom.insideWidthMm + HAIR_MM) return;
  const mostMm = largestWidth(loom, warp, settings) ?? 0;
  const largest = mostMm === 0 ? 'No width fits at this spacing.' : `At this spacing up to ${findings.length(mostMm, 'down')} fit.`;
  const inside = `The loom is ${findings.length(loom.insideWidthMm)} inside.`;
  findings.reject('E_FIT', '/loom/insideWidthMm', `${inside} The piece needs ${findings.length(neededMm, 'up')}. ${largest}`);
}

/** Ends, spacing and nails of the warp; undefined if the width takes no sensible number of ends. */
export function dressWarp(size: FrameLoomPiece['size'], loom: Loom, warp: Warp, settings: Settings, findings: Findings): DressedWarp | undefined {
  const demands: Demands = { together: warp.endsTogether ?? 1, parity: warp.parity ?? 'any' };
  const layout = layoutOf(loom);
  const perMm = endsPerMm(layout);
  const spacingMm = workingSpacing(layout, demands.together);
  const loomWidthMm = widthBeforeDrawIn(size.widthMm, settings.drawIn);
  const raw = rawEnds(loomWidthMm, perMm);
  const count = warp.endCount === undefined ? reckonedEnds(raw, demands, spacingMm, findings) : pinnedEnds(warp.endCount, demands, findings);
  if (count === undefined) return undefined;
  if (warp.endCount !== undefined) checkPinnedWidth(count, raw, widthOfEnds(count, loom, settings), findings);
  const nails = nailsUsed(count, layout.warping);
  const insideWidthNeededMm = railNeeded(nails.top, layout.pitchMm);
  checkInsideWidth(loom, warp, insideWidthNeededMm, settings, findings);
  const thread = threadOf(warp.yarn, ASHENHURST_K.warp);
  return {
    ends: {
      count,
      working: count / demands.together,
      raw,
      spacingMm,
      nailsTop: nails.top,
      nailsBottom: nails.bottom,
      woundWidthMm: (count - 1) / perMm,
      loomWidthMm,
    },
    insideWidthNeededMm,
    thread,
    workingDiameterMm: diameterTogether(thread.compressedMm, demands.together),
    nailDiameterMm: loom.nailDiameterMm ?? NAIL_DIAMETER_MM,
  };
}

/** Height of cloth and bare warp, against the frame. */
export function fitHeight(size: FrameLoomPiece['size'], loom: Loom, warp: Warp | undefined, edges: Edges, settings: Settings, findings: Findings): Omit<LoomPlan, 'insideWidthNeededMm'> {
  const heightOnLoomMm = heightBeforeShrinking(size.heightMm, settings.relaxation, settings.wetShrinkage);
  const { topMm, bottomMm } = bareWarp(loom, warp, edges, settings);
  const heightNeededMm = heightOnLoomMm + topMm + bottomMm;
  if (loom.insideHeightMm < heightNeededMm - HAIR_MM) {
    const largestMm = largestHeight(loom, warp, edges, settings);
    const largest = largestMm === 0 ? 'No height fits beside the unwoven warp.' : `Up to ${findings.length(largestMm, 'down')} of cloth fit.`;
    const inside = `The loom is ${findings.length(loom.insideHeightMm)} high inside.`;
    findings.reject('E_FIT', '/loom/insideHeightMm', `${inside} The piece needs ${findings.length(heightNeededMm, 'up')}. ${largest}`);
  }
  return { heightOnLoomMm, heightNeededMm, topMm, bottomMm, firstGapsMm: gapsAt(bottomMm, loom), spacingRows: spacingRows(loom.warping) };
}

/** Gaps between single bare ends so far from a rail, at most at half height. */
function gapsAt(fromRailMm: number, loom: Loom): LoomPlan['firstGapsMm'] {
  const { pitchMm, warping } = layoutOf(loom);
  if (warping === 'two-nail') return { narrow: pitchMm, wide: pitchMm };
  const { first, second } = zigzagGaps(Math.min(0.5, fromRailMm / loom.insideHeightMm), pitchMm);
  return { narrow: first, wide: second };
}
