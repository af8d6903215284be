/** What the whole piece takes of each yarn: lengths with their tails, loads, mass, balls. */
import type { DressedWarp } from '#core/craft/frame-loom/dress-loom.ts';
import type { Settings } from '#core/craft/frame-loom/settings.ts';
import type { Loom, Warp, Yarn } from '#core/craft/piece.ts';
import type { WarpPlan, YarnPlan } from '#core/craft/plan-types.ts';
import { rowsPerLoad } from '#core/craft/picks.ts';
import { ballsFor, withMargin } from '#core/craft/purchase.ts';
import type { Findings } from '#core/craft/reading/findings.ts';
import { ceilSafe } from '#core/craft/rounding.ts';
import { threadOn, type DressedLoom, type Woven, type YarnUse } from '#core/craft/techniques/technique.ts';
import { warpLength, type WarpRun } from '#core/craft/warp.ts';
import { massOf } from '#core/craft/yarn/thread.ts';
import { TIE_MM } from '#core/craft/defaults.ts';

interface Skein {
  readonly yarn: Yarn;
  readonly tex: number;
  readonly netMm: number;
  readonly margin: number;
  /** Where the yarn stands in the piece. */
  readonly path: string;
}

function toBuy({ yarn, tex, netMm, margin, path }: Skein, findings: Findings): WarpPlan {
  const withMarginMm = withMargin(netMm, margin);
  const bought = { netMm, withMarginMm, massG: massOf(netMm, tex) };
  if (yarn.ball === undefined) return bought;
  const balls = ballsFor(withMarginMm, yarn.ball.metres);
  if (balls.tight) {
    const rest = findings.length(balls.leftOverMm);
    findings.warn('W_TIGHT', `${path}/ball`, `Only ${rest} would be left of the last ball. One ball more of the same dye lot is safer.`);
  }
  return { ...bought, balls: balls.count };
}

/** The way of all ends; `crimp` is what they bend in the cloth, that of the picks most rows are woven in. */
export function warpRun(warp: Warp, loom: Loom, dressed: DressedWarp, wovenMm: number, crimp: number): WarpRun {
  return {
    ends: dressed.ends.count,
    frameHeightMm: loom.insideHeightMm,
    nailDiameterMm: dressed.nailDiameterMm,
    warpDiameterMm: dressed.thread.compressedMm,
    tieMm: warp.tieMm ?? TIE_MM,
    wovenMm,
    crimp,
  };
}

/** Warp yarn: it spans the whole frame, used or not. */
export function countWarp(warp: Warp, run: WarpRun, { thread: { tex, strands } }: DressedWarp, settings: Settings, findings: Findings): WarpPlan {
  return toBuy({ yarn: warp.yarn, tex, netMm: warpLength(run) * strands, margin: settings.marginWarp, path: '/warp/yarn' }, findings);
}

const sum = (uses: readonly YarnUse[], of: 'threadMm' | 'yarnMm'): number => uses.reduce((total, use) => total + use[of], 0);

/** The row a load mostly goes into: that of the band which takes most of the yarn. */
export function mainRow(uses: readonly YarnUse[]): number | undefined {
  return [...uses].sort((a, b) => b.threadMm - a.threadMm).find(({ rowMm }) => rowMm !== undefined)?.rowMm;
}

export interface Loads {
  readonly count: number;
  /** Loads that begin and end inside the cloth, with two tails each. */
  readonly joined: number;
}

export function loadsFor(uses: readonly YarnUse[], loadMm: number): Loads {
  const shuttleMm = sum(uses.filter(({ carry }) => carry === 'shuttle'), 'threadMm');
  const byTheRowMm = sum(uses.filter(({ carry }) => carry === 'by-the-row'), 'threadMm');
  const joined = ceilSafe(shuttleMm / loadMm);
  return { joined, count: joined + ceilSafe(byTheRowMm / loadMm) };
}

/** Strands wound together, on average: bands may take other numbers of them. */
export function strandsOnShuttle(uses: readonly YarnUse[]): number {
  const wound = uses.filter(({ carry }) => carry === 'shuttle');
  const threadMm = sum(wound, 'threadMm');
  return threadMm === 0 ? 0 : sum(wound, 'yarnMm') / threadMm;
}

/** One weft yarn over all bands. */
export function countYarn(role: string, yarn: Yarn, woven: readonly Woven[], loom: DressedLoom, settings: Settings, findings: Findings): YarnPlan {
  const uses = woven.flatMap((band) => band.uses.filter((use) => use.role === role));
  const { tex } = threadOn(loom, role);
  const loads = loadsFor(uses, settings.loadMm);
  const tailsMm = loads.joined * 2 * settings.tailMm * strandsOnShuttle(uses);
  const netMm = sum(uses, 'yarnMm') + tailsMm;
  const rowMm = mainRow(uses);
  return {
    ...toBuy({ yarn, tex, netMm, margin: settings.marginWeft, path: `/yarns/${role}` }, findings),
    loads: loads.count,
    rowsPerLoad: rowMm === undefined ? 0 : rowsPerLoad(settings.loadMm, rowMm),
  };
}
