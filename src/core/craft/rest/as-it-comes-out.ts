/** The plan of a piece that is half woven, as the whole of it will come out. */
import type { Made } from '#core/craft/fitting/tell-changes.ts';
import type { BandPlan, FrameLoomPlan, Hours, YarnPlan } from '#core/craft/plan-types.ts';
import { ballsFor } from '#core/craft/purchase.ts';
import { present } from '#core/craft/reading/present.ts';
import { planRest, type RestPlan, type RestYarn } from '#core/craft/rest/plan-rest.ts';
import { rowsIn } from '#core/craft/rest/woven-share.ts';
import { isBegun, type WovenSoFar } from '#core/craft/rest/woven-so-far.ts';
import { succeed, type Outcome } from '#core/outcome.ts';
import type { Units } from '#core/units/units.ts';

/** How far she is, and what that leaves. */
export interface HalfWoven {
  readonly woven: WovenSoFar;
  readonly rest: RestPlan;
}

export interface ComesOut {
  /** What is woven as it was planned, the rest as it is reckoned now. Where nothing was measured it is the plan itself. */
  readonly plan: FrameLoomPlan;
  /** Null while nothing is woven. */
  readonly halfway: HalfWoven | null;
}

type Length = Pick<RestYarn, 'netMm' | 'withMarginMm' | 'massG'>;
const NOTHING: Length = { netMm: 0, withMarginMm: 0, massG: 0 };

/** What was planned, with the planned rest taken away and the measured one put in its place. */
const swap = (whole: number, planned: number, measured: number): number => Math.max(0, whole - planned + measured);

function yarnAsItComes(whole: YarnPlan, ballMetres: number | undefined, planned: Length, measured: Length): YarnPlan {
  const withMarginMm = swap(whole.withMarginMm, planned.withMarginMm, measured.withMarginMm);
  return {
    ...whole,
    netMm: swap(whole.netMm, planned.netMm, measured.netMm),
    withMarginMm,
    massG: swap(whole.massG, planned.massG, measured.massG),
    ...present({ balls: ballMetres === undefined ? undefined : ballsFor(withMarginMm, ballMetres).count }),
  };
}

/** Of the band in hand the rows that are woven count, too. Pile and soumak keep the rows they were given. */
function bandAsItComes(whole: BandPlan, left: BandPlan | undefined, rowsWoven: number): BandPlan {
  if (left === undefined) return whole;
  if (rowsWoven === 0) return left;
  if (whole.technique !== 'tabby' || left.picks === undefined || whole.picks === undefined || whole.picks === 0) return whole;
  const share = rowsWoven / whole.picks;
  const roles = [...new Set([...Object.keys(whole.yarnMm), ...Object.keys(left.yarnMm)])];
  const yarnMm = Object.fromEntries(roles.map((role) => [role, (whole.yarnMm[role] ?? 0) * share + (left.yarnMm[role] ?? 0)]));
  return { ...left, picks: rowsWoven + left.picks, yarnMm };
}

function hoursAsTheyCome(whole: Hours, planned: Hours, measured: Hours): Hours {
  const of = (key: keyof Hours): number => swap(whole[key], planned[key], measured[key]);
  return { likely: of('likely'), low: of('low'), high: of('high') };
}

function measuredPlan({ piece, plan }: Made, planned: RestPlan, { woven, rest }: HalfWoven): FrameLoomPlan {
  const yarns = Object.fromEntries(Object.entries(plan.yarns).map(([role, whole]) =>
    [role, yarnAsItComes(whole, piece.yarns[role]?.ball?.metres, planned.yarns[role] ?? NOTHING, rest.yarns[role] ?? NOTHING)]));
  const massOfYarns = (of: FrameLoomPlan['yarns']): number => Object.values(of).reduce((sum, { massG }) => sum + massG, 0);
  return {
    ...plan,
    yarns,
    bands: plan.bands.map((band) => bandAsItComes(band, rest.bands.find(({ index }) => index === band.index), band.index === woven.bandsDone ? (woven.rows ?? 0) : 0)),
    weft: { ...plan.weft, pickSpacingMm: 10 / rest.picksPerCm },
    massG: plan.massG - massOfYarns(plan.yarns) + massOfYarns(yarns),
    hours: hoursAsTheyCome(plan.hours, planned.hours, rest.hours),
  };
}

/** Problems are those of `planRest`: what was said of the woven part belongs to another piece. */
export function asItComesOut(made: Made, woven: WovenSoFar, units: Units): Outcome<ComesOut> {
  if (!isBegun(woven)) return succeed({ plan: made.plan, halfway: null });
  const rest = planRest(made.piece, woven, units);
  if (!rest.ok) return rest;
  const halfway: HalfWoven = { woven, rest: rest.value };
  if (rest.value.trust !== 'measured') return succeed({ plan: made.plan, halfway });
  const { heightMm: _, ...unmeasured } = woven;
  const planned = planRest(made.piece, unmeasured, units);
  return planned.ok ? succeed({ plan: measuredPlan(made, planned.value, halfway), halfway }) : planned;
}

/** Rows of the band in hand that are still to come; undefined where it has none to count. */
export function rowsLeftIn({ piece, plan }: Made, { woven: { bandsDone, rows = 0 } }: HalfWoven): number | undefined {
  const all = rowsIn(plan.bands[bandsDone], piece.bands[bandsDone]);
  return all === undefined ? undefined : Math.max(0, all - rows);
}

/** The plan of what is still to weave alone, for who buys or fetches yarn for it. Its warp is on the loom. */
export function planOfRest({ piece, plan }: Made, { rest }: HalfWoven): FrameLoomPlan {
  const yarns = Object.fromEntries(Object.entries(plan.yarns).map(([role, whole]): [string, YarnPlan] => {
    const { netMm, withMarginMm, massG } = rest.yarns[role] ?? NOTHING;
    const ballMetres = piece.yarns[role]?.ball?.metres;
    return [role, { ...whole, netMm, withMarginMm, massG, ...present({ balls: ballMetres === undefined ? undefined : ballsFor(withMarginMm, ballMetres).count }) }];
  }));
  return { ...plan, yarns, warp: rest.warp, bands: rest.bands, hours: rest.hours };
}
