/**
 * The worked piece and every number of its table, reckoned. Lengths are millimetres; the
 * imperial column is the same piece typed in inches and turned into millimetres on entry.
 */
import type { FrameLoomPiece } from '#core/craft/piece.ts';
import { planPiece } from '#core/craft/plan.ts';
import type { BandPlan, FrameLoomPlan, YarnPlan } from '#core/craft/plan-types.ts';
import { ASHENHURST_K } from '#core/craft/defaults.ts';
import { cordTension } from '#core/craft/hanging.ts';
import { topForDowel } from '#core/craft/loom-height.ts';
import { stepShape, trueArea } from '#core/craft/shapes.ts';
import { hemStitchLength } from '#core/craft/techniques/hem-stitch.ts';
import { bulgeArc, rovingFloats } from '#core/craft/techniques/roving.ts';
import { ryaBundle, ryaWrap, windingCard } from '#core/craft/techniques/rya.ts';
import { soumakRatio, soumakStitch } from '#core/craft/techniques/soumak.ts';
import { secondsPerRow } from '#core/craft/time.ts';
import { warpRoundNails, warpStraight } from '#core/craft/warp.ts';
import { threadOf, type Thread } from '#core/craft/yarn/thread.ts';
import workedPiece from './worked-piece.json' with { type: 'json' };

const MM_PER_INCH = 25.4;
const METRES_PER_YARD = 0.9144;

/** Every length of the piece goes to inches and back, and every label to yards and back, as if it had been typed so. */
export function typedInInches(value: unknown, key = ''): unknown {
  if (Array.isArray(value)) return value.map((item) => typedInInches(item));
  if (typeof value === 'object' && value !== null) return Object.fromEntries(Object.entries(value).map(([name, item]) => [name, typedInInches(item, name)]));
  if (typeof value !== 'number') return value;
  if (key.endsWith('Mm')) return (value / MM_PER_INCH) * MM_PER_INCH;
  return key === 'metresPer100g' || key === 'metres' ? (value / METRES_PER_YARD) * METRES_PER_YARD : value;
}

/** Of a frame-loom piece, read as one from whatever was handed in. */
export function planOf(piece: unknown): FrameLoomPlan {
  const planned = planPiece(piece as FrameLoomPiece);
  if (!planned.ok) throw new Error(JSON.stringify(planned.problems));
  return planned.value;
}

export const METRIC: unknown = workedPiece;
export const IMPERIAL: unknown = typedInInches(workedPiece);

export type Column = ReadonlyMap<string, number>;

interface Yarns {
  readonly A: Thread;
  readonly B: Thread;
  readonly C: Thread;
}

const band = (plan: FrameLoomPlan, index: number): BandPlan => plan.bands[index] ?? { index, technique: 'tabby', heightMm: Number.NaN, yarnMm: {} };
const yarn = (plan: FrameLoomPlan, role: string): YarnPlan => plan.yarns[role] ?? { netMm: Number.NaN, withMarginMm: Number.NaN, massG: Number.NaN, loads: 0, rowsPerLoad: 0 };
const of = (lengths: Readonly<Record<string, number>>, role: string): number => lengths[role] ?? Number.NaN;

function loomRows(piece: FrameLoomPiece, plan: FrameLoomPlan, warp: Thread, { A, B }: Yarns): [string, number][] {
  const run = { ends: plan.ends.count, frameHeightMm: piece.loom.insideHeightMm, nailDiameterMm: 1.6, warpDiameterMm: warp.compressedMm, tieMm: 150 };
  const { weft } = plan;
  return [
    ['1', warp.compressedMm],
    ['2', A.compressedMm],
    ['3', A.loftMm],
    ['4', B.loftMm],
    ['5', plan.ends.loomWidthMm],
    ['6', 1 / plan.ends.spacingMm],
    ['7', plan.ends.raw],
    ['8', plan.ends.count],
    ['9 top', plan.ends.nailsTop],
    ['9 bottom', plan.ends.nailsBottom],
    ['10', plan.ends.spacingMm],
    ['11', plan.ends.woundWidthMm],
    ['12', plan.loom.insideWidthNeededMm],
    ['13', plan.loom.heightOnLoomMm],
    ['14', topForDowel(12)],
    ['15', plan.loom.topMm],
    ['16', plan.loom.heightNeededMm],
    ['17', piece.loom.insideHeightMm],
    ['18', warpStraight(run)],
    ['19', warpRoundNails(run)],
    ['20', 2 * run.tieMm],
    ['21', plan.warp.netMm],
    ['22', weft.diameterSumMm],
    ['23', weft.pickSpacingMm],
    ['24', weft.tightness],
    ['25', Math.sqrt(plan.ends.spacingMm ** 2 - weft.diameterSumMm ** 2)],
    ['26', Math.asin(weft.tightness)],
    ['27', weft.stepMm],
    ['28', weft.crimp],
    ['29', weft.turnMm],
    ['30', weft.pickMm],
  ];
}

function bandRows(plan: FrameLoomPlan, warp: Thread, { A, B, C }: Yarns): [string, number][] {
  const { spacingMm, working } = plan.ends;
  const { pickSpacingMm, pickMm } = plan.weft;
  const triangle = { shape: 'triangle', baseMm: 150, heightMm: 100 } as const;
  const stepped = stepShape(triangle, { spacingMm, pickSpacingMm, ends: working, symmetric: true });
  const totalEnds = stepped.widths.reduce((sum, width) => sum + width, 0);
  const picksOfA = plan.bands.reduce((sum, { picks }) => sum + (picks ?? 0), 0);
  const besideTriangle = of(band(plan, 5).yarnMm, 'A') - (104 - 69) * pickMm;
  const hemMm = of(band(plan, 0).yarnMm, 'A') + of(band(plan, 8).yarnMm, 'A');
  const netA = plan.bands.reduce((sum, { yarnMm }) => sum + (yarnMm['A'] ?? 0), 0);
  const hem = { bundleEnds: 2, reachPicks: 2, spacingMm, pickSpacingMm, diameterSumMm: warp.compressedMm + A.loftMm };
  const knot = { legEnds: 1, strands: 3, spacingMm, warpDiameterMm: warp.compressedMm, strandLoftMm: B.strandLoftMm, pileMm: 150, trimMm: 10 };
  const stitch = { over: 4, back: 2, spacingMm, diameterSumMm: warp.compressedMm + C.loftMm };
  const floats = rovingFloats(working, 4);
  const tailsOfA = yarn(plan, 'A').netMm - netA;
  return [
    ['31', band(plan, 4).heightMm],
    ['32', band(plan, 7).heightMm],
    ...[1, 3, 4, 5, 7].map((index): [string, number] => [`33 b${String(index + 1)}`, band(plan, index).picks ?? Number.NaN]),
    ...[1, 3, 5, 7].map((index): [string, number] => [`34 b${String(index + 1)}`, band(plan, index).heightMm / pickSpacingMm]),
    ['35', picksOfA],
    ['36', stepped.rows],
    ['37', stepped.widths[0] ?? Number.NaN],
    ['38', totalEnds * spacingMm * pickSpacingMm],
    ['38 true', trueArea(triangle)],
    ['39', (picksOfA - stepped.rows) * pickMm],
    ['40', besideTriangle],
    ['41', netA - hemMm],
    ['42', of(band(plan, 5).yarnMm, 'T')],
    ['43', hem.diameterSumMm],
    ['44', hemStitchLength(hem)],
    ['45', band(plan, 0).stitches ?? Number.NaN],
    ['46', hemMm],
    ['47', netA],
    ['48', yarn(plan, 'A').loads],
    ['49', yarn(plan, 'A').rowsPerLoad],
    ['50', tailsOfA],
    ['51', yarn(plan, 'A').netMm],
    ['52', yarn(plan, 'T').netMm],
    ['53', ryaBundle(knot)],
    ['54', warp.compressedMm + ryaBundle(knot)],
    ['55', ryaWrap(knot)],
    ['56', band(plan, 2).cutMm ?? Number.NaN],
    ['57', band(plan, 2).knots ?? Number.NaN],
    ['58', band(plan, 2).strands ?? Number.NaN],
    ['59', yarn(plan, 'B').netMm],
    ['60', windingCard(band(plan, 2).cutMm ?? Number.NaN, 2).exactMm],
    ['60 card', windingCard(band(plan, 2).cutMm ?? Number.NaN, 2).widthMm],
    ['61', stitch.diameterSumMm],
    ['62', soumakStitch(stitch)],
    ['63', soumakRatio(stitch)],
    ['64', (band(plan, 4).stitches ?? Number.NaN) / 4],
    ['65', of(band(plan, 4).yarnMm, 'C') / 4],
    ['66', yarn(plan, 'C').netMm],
    ['67', 4 * spacingMm],
    ['68 face', floats.face],
    ['68 back', floats.back],
    ['68 rest', floats.rest],
    ['69', bulgeArc(4 * spacingMm, 12)],
    ['70', yarn(plan, 'R').netMm],
  ];
}

function purchaseRows(plan: FrameLoomPlan): [string, number][] {
  const bought: [string, { readonly netMm: number; readonly withMarginMm: number; readonly massG: number; readonly balls?: number }][] = [
    ['71', plan.warp],
    ['72', yarn(plan, 'A')],
    ['73', yarn(plan, 'T')],
    ['74', yarn(plan, 'B')],
    ['75', yarn(plan, 'C')],
    ['76', yarn(plan, 'R')],
  ];
  const lengthsAndMasses = bought.flatMap(([row, { netMm, withMarginMm, massG }]): [string, number][] => [
    [`${row} net mass`, massG],
    [`${row} length`, withMarginMm],
    [`${row} mass`, (massG * withMarginMm) / netMm],
  ]);
  const balls = bought.slice(0, 5).map(([row, { balls: count }], index): [string, number] => [`77 ${String(index)} of ${row}`, count ?? Number.NaN]);
  return [...lengthsAndMasses, ...balls];
}

function hangingRows(plan: FrameLoomPlan): [string, number][] {
  const { working, count } = plan.ends;
  const rows = plan.bands.reduce((sum, { picks }) => sum + (picks ?? 0), 0);
  return [
    ['78', plan.massG],
    ['79', plan.cut.dowel?.minDiameterMm ?? Number.NaN],
    ['80', plan.cut.cordMm ?? Number.NaN],
    ['81', cordTension(plan.massG, 340, 120)],
    ['82 width', plan.cut.spacerCard.widthMm],
    ['82 height', plan.cut.spacerCard.heightMm],
    ['83 row', secondsPerRow(working)],
    ['83 rows', (rows * secondsPerRow(working)) / 3600],
    ['83 motif', (67 * 2 * 10) / 3600],
    ['83 rya', (band(plan, 2).knots ?? Number.NaN) / 150],
    ['83 soumak', (band(plan, 4).stitches ?? Number.NaN) / 300],
    ['83 hem', ((band(plan, 0).stitches ?? Number.NaN) * 2) / 120],
    ['83 warping', count / 120],
    ['84', plan.hours.likely],
    ['84 low', plan.hours.low],
    ['84 high', plan.hours.high],
  ];
}

/** Every number of the table by its row. */
export function columnOf(piece: unknown): Column {
  const plan = planOf(piece);
  const typed = piece as FrameLoomPiece;
  const warp = threadOf(typed.warp.yarn, ASHENHURST_K.warp);
  const thread = (role: string): Thread => threadOf(typed.yarns[role] ?? { tex: Number.NaN }, ASHENHURST_K.weft);
  const yarns = { A: thread('A'), B: thread('B'), C: thread('C') };
  return new Map([...loomRows(typed, plan, warp, yarns), ...bandRows(plan, warp, yarns), ...purchaseRows(plan), ...hangingRows(plan)]);
}
