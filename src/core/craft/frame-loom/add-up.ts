/** Adding the plan up, once everything is sound and fits together. */
import { SPACER_CARD_EXTRA_MM } from '#core/craft/defaults.ts';
import { countWarp, countYarn } from '#core/craft/frame-loom/count-yarn.ts';
import type { DressedWarp } from '#core/craft/frame-loom/dress-loom.ts';
import type { Settings } from '#core/craft/frame-loom/settings.ts';
import type { StackedBand } from '#core/craft/frame-loom/stack-bands.ts';
import { cordLength, cordSpan, dowelLength, leastDowelDiameter } from '#core/craft/hanging.ts';
import type { Dowel, Loom, Piece, Warp, Yarn } from '#core/craft/piece.ts';
import { pickLength } from '#core/craft/picks.ts';
import type { BandPlan, CutPlan, Hours, LoomPlan, Plan, WeftPlan, YarnPlan } from '#core/craft/plan-types.ts';
import type { Findings } from '#core/craft/reading/findings.ts';
import { techniqueOf } from '#core/craft/techniques/registry.ts';
import { picksOn, type DressedLoom, type Woven } from '#core/craft/techniques/technique.ts';
import { hoursOf, type Work } from '#core/craft/time.ts';

export interface Workings {
  readonly size: Piece['size'];
  readonly loom: Loom;
  readonly warp: Warp;
  readonly hanging: { readonly dowel?: Dowel };
  readonly yarns: ReadonlyMap<string, Yarn | undefined>;
  readonly settings: Settings;
  readonly height: Omit<LoomPlan, 'insideWidthNeededMm'>;
  readonly dressed: DressedWarp;
  readonly laid: DressedLoom;
  readonly stacked: readonly StackedBand[];
}

/** A band with what it takes. */
interface WovenBand extends StackedBand {
  readonly woven: Woven;
}

function planBand({ index, band, heightMm, woven }: WovenBand): BandPlan {
  const yarnMm: Record<string, number> = {};
  for (const use of woven.uses) yarnMm[use.role] = (yarnMm[use.role] ?? 0) + use.yarnMm;
  return { index, technique: band.technique, heightMm, ...woven.counts, yarnMm };
}

/** The yarn most picks are woven with; the one woven first where two are alike. */
function mainWeft(bands: readonly WovenBand[], laid: DressedLoom): { readonly role: string; readonly rawPicks: number } {
  const runs = bands.flatMap(({ woven }) => (woven.picks === undefined ? [] : [woven.picks]));
  const totals = [...laid.picks.keys()].map((role) => {
    const own = runs.filter((run) => run.role === role);
    return { role, rows: own.reduce((sum, { rows }) => sum + rows, 0), rawPicks: own.reduce((sum, { rawRows }) => sum + rawRows, 0) };
  });
  return totals.reduce((most, next) => (next.rows > most.rows ? next : most));
}

function planWeft(bands: readonly WovenBand[], laid: DressedLoom): WeftPlan {
  const { role, rawPicks } = mainWeft(bands, laid);
  const { diameterSumMm, pickSpacingMm, tightness, crimp, stepMm, turnMm } = picksOn(laid, role);
  const pickMm = pickLength(laid.workingEnds, { stepMm, turnMm });
  return { diameterSumMm, pickSpacingMm, tightness, crimp, stepMm, turnMm, pickMm, rawPicks };
}

function planCut({ size, hanging, dressed, height }: Workings, massG: number, findings: Findings): CutPlan {
  const spacerCard = { widthMm: dressed.ends.woundWidthMm + SPACER_CARD_EXTRA_MM, heightMm: height.bottomMm };
  const { dowel } = hanging;
  if (dowel === undefined) return { spacerCard };
  const lengthMm = dowel.lengthMm ?? dowelLength(size.widthMm);
  const spanMm = cordSpan(lengthMm);
  const minDiameterMm = leastDowelDiameter(massG, spanMm);
  if (lengthMm < size.widthMm) {
    findings.warn('W_DOWEL', '/dowel/lengthMm', `This dowel is shorter than the cloth is wide. ${findings.length(dowelLength(size.widthMm))} lets it stand out on both sides.`);
  }
  if (dowel.diameterMm < minDiameterMm) {
    findings.warn('W_DOWEL', '/dowel/diameterMm', `This dowel will sag under the piece. ${findings.length(minDiameterMm, 'up')} and thicker holds.`);
  }
  return { spacerCard, dowel: { lengthMm, minDiameterMm }, cordMm: cordLength(spanMm) };
}

function planHours(bands: readonly WovenBand[], { dressed, laid }: Workings): Hours {
  const total = (of: keyof Work): number => bands.reduce((sum, { woven }) => sum + (woven.work[of] ?? 0), 0);
  return hoursOf({
    workingEnds: laid.workingEnds,
    warpEnds: dressed.ends.count,
    rows: total('rows'),
    colourChanges: total('colourChanges'),
    knots: total('knots'),
    stitches: total('stitches'),
    hemBundles: total('hemBundles'),
  });
}

function planYarns(bands: readonly WovenBand[], { yarns, laid, settings }: Workings, findings: Findings): Record<string, YarnPlan> {
  const woven = bands.map((band) => band.woven);
  const plans: Record<string, YarnPlan> = {};
  for (const [role, yarn] of yarns) {
    if (yarn !== undefined) plans[role] = countYarn(role, yarn, woven, laid, settings, findings);
  }
  return plans;
}

/** Needs at least one yarn whose picks are laid, which laying the weft has seen to. */
export function addUp(workings: Workings, findings: Findings): Omit<Plan, 'warnings'> {
  const { dressed, laid, height, stacked } = workings;
  const bands = stacked.map((stack) => ({ ...stack, woven: techniqueOf(stack.band).weave(stack.band, stack.heightMm, laid) }));
  const warp = countWarp(workings.warp, workings.loom, dressed, workings.settings, findings);
  const yarns = planYarns(bands, workings, findings);
  const massG = Object.values(yarns).reduce((sum, yarn) => sum + yarn.massG, warp.massG);
  return {
    ends: dressed.ends,
    loom: { insideWidthNeededMm: dressed.insideWidthNeededMm, ...height },
    weft: planWeft(bands, laid),
    warp,
    yarns,
    bands: bands.map(planBand),
    cut: planCut(workings, massG, findings),
    massG,
    hours: planHours(bands, workings),
  };
}
