/** Adding the plan up, once everything is sound and fits together. */
import { HANGING, SPACER_CARD_EXTRA_MM, TIE_MM } from '#core/craft/defaults.ts';
import { countWarp, countYarn, warpRun } from '#core/craft/frame-loom/count-yarn.ts';
import type { DressedWarp } from '#core/craft/frame-loom/dress-loom.ts';
import type { PieceParts } from '#core/craft/frame-loom/read-piece.ts';
import type { Settings } from '#core/craft/frame-loom/settings.ts';
import type { StackedBand } from '#core/craft/frame-loom/stack-bands.ts';
import { cordLength, cordSpan, dowelLength, lashingLength, lashingWraps, leastDowelDiameter } from '#core/craft/hanging.ts';
import type { Edges } from '#core/craft/frame-loom/room.ts';
import type { Loom, FrameLoomPiece, Warp, Yarn } from '#core/craft/piece.ts';
import { pickLength } from '#core/craft/picks.ts';
import type { BandPlan, CutPlan, LoomPlan, FrameLoomPlan, WeftPlan, YarnPlan } from '#core/craft/plan-types.ts';
import type { Findings } from '#core/craft/reading/findings.ts';
import { techniqueOf } from '#core/craft/techniques/registry.ts';
import type { DressedLoom, LaidPicks, Woven } from '#core/craft/techniques/technique.ts';
import { hoursOf, type Work } from '#core/craft/time.ts';

/** A piece that is sound and fits its loom, with all that adding up needs. */
export interface PieceOnLoom {
  readonly parts: PieceParts;
  readonly size: FrameLoomPiece['size'];
  readonly loom: Loom;
  readonly warp: Warp;
  readonly edges: Edges;
  readonly yarns: ReadonlyMap<string, Yarn | undefined>;
  readonly settings: Settings;
  readonly height: Omit<LoomPlan, 'insideWidthNeededMm'>;
  readonly dressed: DressedWarp;
  readonly laid: DressedLoom;
  /** Those that are still to be woven; all of them in the plan of a whole piece. */
  readonly stacked: readonly StackedBand[];
  /** The loom is dressed already: winding the warp takes no more time. */
  readonly isWarped?: true;
}

/** A band with what it takes. */
export interface WovenBand extends StackedBand {
  readonly woven: Woven;
}

function planBand({ index, band, heightMm, woven }: WovenBand): BandPlan {
  const yarnMm: Record<string, number> = {};
  for (const use of woven.uses) yarnMm[use.role] = (yarnMm[use.role] ?? 0) + use.yarnMm;
  return { index, technique: band.technique, heightMm, ...woven.counts, yarnMm };
}

/** The picks most rows are woven in; those woven first where two are alike. */
export function mainWeft(bands: readonly WovenBand[], laid: DressedLoom): { readonly geometry: LaidPicks; readonly rawPicks: number } {
  const runs = bands.flatMap(({ woven }) => (woven.picks === undefined ? [] : [woven.picks]));
  const totals = [...laid.picks].map(([key, geometry]) => {
    const own = runs.filter((run) => run.key === key);
    return { geometry, rows: own.reduce((sum, { rows }) => sum + rows, 0), rawPicks: own.reduce((sum, { rawRows }) => sum + rawRows, 0) };
  });
  return totals.reduce((most, next) => (next.rows > most.rows ? next : most));
}

function planWeft(bands: readonly WovenBand[], laid: DressedLoom): WeftPlan {
  const { geometry, rawPicks } = mainWeft(bands, laid);
  const { diameterSumMm, pickSpacingMm, tightness, crimp, stepMm, turnMm } = geometry;
  const pickMm = pickLength(geometry.workingEnds, geometry);
  return { diameterSumMm, pickSpacingMm, tightness, crimp, stepMm, turnMm, pickMm, rawPicks };
}

/** Yarn as thick as the warp, tied at both ends. */
function lashingYarn(widthMm: number, dowelMm: number, yarnLoftMm: number): number {
  return lashingLength(lashingWraps(widthMm), HANGING.lashingPitchMm, dowelMm, yarnLoftMm) + 2 * TIE_MM;
}

function planCut({ size, edges, dressed, height }: PieceOnLoom, massG: number, findings: Findings): CutPlan {
  const fixingHoldsG = HANGING.fixingFactor * massG;
  const spacerCard = { widthMm: dressed.ends.woundWidthMm + SPACER_CARD_EXTRA_MM, heightMm: height.bottomMm };
  const { dowel } = edges;
  if (dowel === undefined) return { spacerCard, fixingHoldsG };
  const lengthMm = dowel.lengthMm ?? dowelLength(size.widthMm);
  const spanMm = cordSpan(lengthMm);
  const minDiameterMm = leastDowelDiameter(massG, spanMm);
  if (lengthMm < size.widthMm) {
    findings.warn('W_DOWEL', '/dowel/lengthMm', `This dowel is shorter than the cloth is wide. ${findings.length(dowelLength(size.widthMm))} lets it stand out on both sides.`);
  }
  if (dowel.diameterMm < minDiameterMm) {
    findings.warn('W_DOWEL', '/dowel/diameterMm', `This dowel will sag under the piece. ${findings.length(minDiameterMm, 'up')} and thicker holds.`);
  }
  const cut = { spacerCard, dowel: { lengthMm, minDiameterMm }, cordMm: cordLength(spanMm), fixingHoldsG };
  return dowel.fixing === 'lashed' ? { ...cut, lashingMm: lashingYarn(size.widthMm, dowel.diameterMm, dressed.thread.loftMm) } : cut;
}

/** What there is to do in all bands, and the warp. */
export function workOf(bands: readonly WovenBand[], { dressed, laid, isWarped }: PieceOnLoom): Work {
  const total = (of: keyof Work): number => bands.reduce((sum, { woven }) => sum + (woven.work[of] ?? 0), 0);
  return {
    workingEnds: laid.workingEnds,
    warpEnds: isWarped === true ? 0 : dressed.ends.count,
    rows: total('rows'),
    colourChanges: total('colourChanges'),
    knots: total('knots'),
    stitches: total('stitches'),
    hemBundles: total('hemBundles'),
  };
}

function planYarns(bands: readonly WovenBand[], { yarns, laid, settings }: PieceOnLoom, findings: Findings): Record<string, YarnPlan> {
  const woven = bands.map((band) => band.woven);
  const plans: Record<string, YarnPlan> = {};
  for (const [role, yarn] of yarns) {
    if (yarn !== undefined) plans[role] = countYarn(role, yarn, woven, laid, settings, findings);
  }
  return plans;
}

export function weaveBands({ stacked, laid }: PieceOnLoom): readonly WovenBand[] {
  return stacked.map((stack) => ({ ...stack, woven: techniqueOf(stack.band).weave(stack.band, stack.heightMm, laid, stack.fromRow) }));
}

/** Needs at least one yarn whose picks are laid, which laying the weft has seen to. */
export function addUp(piece: PieceOnLoom, findings: Findings): Omit<FrameLoomPlan, 'warnings'> {
  const { dressed, laid, height } = piece;
  const bands = weaveBands(piece);
  const run = warpRun(piece.warp, piece.loom, dressed, height.heightOnLoomMm, mainWeft(bands, laid).geometry.warpCrimp);
  const warp = countWarp(piece.warp, run, dressed, piece.settings, findings);
  const yarns = planYarns(bands, piece, findings);
  const massG = Object.values(yarns).reduce((sum, yarn) => sum + yarn.massG, warp.massG);
  return {
    ends: dressed.ends,
    loom: { insideWidthNeededMm: dressed.insideWidthNeededMm, ...height },
    weft: planWeft(bands, laid),
    warp,
    yarns,
    bands: bands.map(planBand),
    cut: planCut(piece, massG, findings),
    massG,
    hours: hoursOf(workOf(bands, piece)),
  };
}
