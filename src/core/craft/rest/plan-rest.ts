/**
 * The rest of a piece that is half woven: rows, yarn and time still to go. What was
 * measured on the woven part takes the place of what the plan assumed.
 */
import { addUp, type PieceOnLoom } from '#core/craft/frame-loom/add-up.ts';
import { putOnLoom } from '#core/craft/frame-loom/plan-frame-loom.ts';
import type { StackedBand } from '#core/craft/frame-loom/stack-bands.ts';
import { DEFAULT_ALLOWANCES } from '#core/craft/defaults.ts';
import type { Band, FrameLoomPiece } from '#core/craft/piece.ts';
import { picksInHeight } from '#core/craft/picks.ts';
import type { BandPlan, Hours, WarpPlan } from '#core/craft/plan-types.ts';
import { ballsFor } from '#core/craft/purchase.ts';
import { Fields } from '#core/craft/reading/fields.ts';
import { below, Findings } from '#core/craft/reading/findings.ts';
import { present } from '#core/craft/reading/present.ts';
import { measuredBeat, shrinkOf } from '#core/craft/rest/measured-beat.ts';
import { isBegun, readWoven, type WovenSoFar } from '#core/craft/rest/woven-so-far.ts';
import { pickSpacingOn, threadOn } from '#core/craft/techniques/technique.ts';
import type { Outcome } from '#core/outcome.ts';
import { lengthOf } from '#core/craft/amounts/amount-types.ts';
import type { Trust } from '#core/craft/trust.ts';
import { amountText } from '#core/units/format-amount.ts';
import type { Units } from '#core/units/units.ts';

export type { WovenSoFar } from '#core/craft/rest/woven-so-far.ts';

export interface RestYarn {
  /** Still to be woven, tails included. */
  readonly netMm: number;
  readonly withMarginMm: number;
  /** Of the net length. */
  readonly massG: number;
  /** What is left of it, where it was weighed. */
  readonly leftMm?: number;
  /** What must be had in addition, its margin included; missing where what is left was not weighed. */
  readonly missingMm?: number;
  /** Balls of what is missing, where the ball tells its length. */
  readonly ballsToGet?: number;
}

export interface RestPlan {
  /** Rows of tabby still to weave. */
  readonly rows: number;
  /** Bands still to weave, that in hand with what is left of it. `index` is that in the piece. */
  readonly bands: readonly BandPlan[];
  /** By yarn role. */
  readonly yarns: Readonly<Record<string, RestYarn>>;
  /** Nothing once the warp is on the loom. */
  readonly warp: WarpPlan;
  readonly hours: Hours;
  /** Of the finished piece, as it will come out. */
  readonly heightMm: number;
  /** Rows in a centimetre of the main weft, as reckoned with. */
  readonly picksPerCm: number;
  /** `measured` where the woven part told how close the rows lie. */
  readonly trust: Trust;
}

const NO_WARP: WarpPlan = { netMm: 0, withMarginMm: 0, massG: 0 };
/** A hand's rule tells no less. */
const SAME_MM = 2;

/** None in a band that has no rows to count. */
const rowsIn = (band: Band, heightMm: number, workings: PieceOnLoom): number =>
  band.technique === 'tabby' ? picksInHeight(heightMm, pickSpacingOn(workings.laid, band.yarn)) : 'rows' in band ? band.rows : 0;

/** Refuses what the piece does not have: more bands, or rows in a band that has none. */
function checkPlace({ stacked }: PieceOnLoom, { bandsDone, rows = 0 }: WovenSoFar, findings: Findings): void {
  if (bandsDone > stacked.length) {
    findings.reject('E_RANGE', '/bandsDone', `This piece has ${String(stacked.length)} bands. Say how many of them are finished.`);
    return;
  }
  const band = stacked[bandsDone]?.band;
  if (rows === 0) return;
  if (band === undefined) findings.reject('E_RANGE', '/rows', 'Every band is finished, so no row is left to count. Leave the rows empty.');
  else if (!('rows' in band)) {
    // However many rows of tabby there are, they are: a band may have grown higher than it was planned.
    if (band.technique !== 'tabby') findings.reject('E_RANGE', '/rows', 'This band has no rows to count. Leave them empty, and say that it is finished when it is.');
  } else if (rows > band.rows) findings.reject('E_RANGE', '/rows', `This band has ${String(band.rows)} rows. Between 0 and ${String(band.rows)} works.`);
}

/** What is left of the band in hand; undefined where that is nothing. */
function restOfBand(stack: StackedBand, rows: number, workings: PieceOnLoom): StackedBand | undefined {
  const { band } = stack;
  if (rows > 0 && rows >= rowsIn(band, stack.heightMm, workings)) return undefined;
  if (band.technique === 'tabby') return { ...stack, fromRow: rows };
  return 'rows' in band ? { ...stack, heightMm: stack.heightMm * (1 - rows / band.rows), band: { ...band, rows: band.rows - rows } } : stack;
}

/** The band that fills takes what truly is left of the height. */
function refill(workings: PieceOnLoom, woven: WovenSoFar, soFarMm: number): readonly StackedBand[] {
  const { bandsDone, rows = 0 } = woven;
  const isOpen = ({ index }: StackedBand): boolean => index >= bandsDone;
  const fixedMm = workings.stacked.filter((stack) => isOpen(stack) && !('fill' in stack.band)).reduce((sum, stack) => sum + leftMmOf(stack, stack.index === bandsDone ? rows : 0, workings), 0);
  return workings.stacked.map((stack) => {
    if (!('fill' in stack.band) || !isOpen(stack)) return stack;
    const wovenMm = stack.index === bandsDone ? rows * pickSpacingOn(workings.laid, stack.band.yarn) : 0;
    return { ...stack, heightMm: wovenMm + Math.max(0, workings.size.heightMm - soFarMm - fixedMm) };
  });
}

/** Finished height of what is left of a band. */
function leftMmOf({ band, heightMm }: StackedBand, rows: number, workings: PieceOnLoom): number {
  if (band.technique === 'tabby') return Math.max(0, heightMm - rows * pickSpacingOn(workings.laid, band.yarn));
  return 'rows' in band ? heightMm * (1 - rows / band.rows) : heightMm;
}

function yarnLeft(role: string, needed: Pick<RestYarn, 'netMm' | 'withMarginMm' | 'massG'>, workings: PieceOnLoom, { leftG = {} }: WovenSoFar, findings: Findings): RestYarn {
  const grams = Object.hasOwn(leftG, role) ? leftG[role] : undefined;
  const yarn = workings.yarns.get(role);
  const { netMm, withMarginMm, massG } = needed;
  if (grams === undefined || yarn === undefined) return { netMm, withMarginMm, massG };
  const leftMm = (grams / threadOn(workings.laid, role).tex) * 1e6;
  const missingMm = Math.max(0, withMarginMm - leftMm);
  tellLeft(role, yarn.label ?? role, { netMm, withMarginMm, leftMm, missingMm }, findings);
  const ballsToGet = missingMm > 0 && yarn.ball !== undefined ? ballsFor(missingMm, yarn.ball.metres).count : undefined;
  return { netMm, withMarginMm, massG, leftMm, missingMm, ...present({ ballsToGet }) };
}

function tellLeft(role: string, name: string, { netMm, withMarginMm, leftMm, missingMm }: Required<Omit<RestYarn, 'massG' | 'ballsToGet'>>, findings: Findings): void {
  if (leftMm >= withMarginMm) return;
  const text = (mm: number): string => amountText(lengthOf(mm, 'yarn'), findings.units);
  const path = below('/leftG', role);
  const needs = `The rest takes ${text(netMm)} of ${name}, ${text(withMarginMm)} with its margin, and ${text(leftMm)} are left.`;
  if (leftMm < netMm) findings.warn('W_SHORT', path, `${needs} That does not suffice: get ${text(missingMm)} more, of the same dye lot if you can.`);
  else findings.warn('W_TIGHT', path, `${needs} That suffices only just: ${text(missingMm)} more is safer.`);
}

function warnOfRoom(workings: PieceOnLoom, heightMm: number, findings: Findings): void {
  const { loom, height } = workings;
  const neededMm = heightMm / shrinkOf(workings) + height.topMm + height.bottomMm;
  if (neededMm <= loom.insideHeightMm + 1e-6) return;
  findings.warn('W_ROOM', '/heightMm', `Woven on like this, the cloth grows ${findings.length(neededMm - loom.insideHeightMm, 'up')} into the warp that must stay open at the top. Beat the rest closer, or leave out rows of the last bands.`);
}

/** With the beat that was measured, the piece worked out anew; the problems of that belong to what was measured. */
function workOutAnew(piece: FrameLoomPiece, workings: PieceOnLoom, woven: WovenSoFar, findings: Findings): { readonly workings: PieceOnLoom; readonly isMeasured: boolean } | undefined {
  const beat = measuredBeat(workings, woven, findings);
  if (findings.count > 0) return undefined;
  if (beat === undefined) return { workings, isMeasured: false };
  const again = Findings.in(findings.units);
  // What was measured needs less in reserve, unless the piece has a margin of its own.
  const allowances = { ...piece.allowances, marginWeft: piece.allowances?.marginWeft ?? DEFAULT_ALLOWANCES.marginWeft.swatch };
  const found = putOnLoom(Fields.of({ ...piece, beat, allowances }, '', 'A piece', again));
  if (found !== undefined) return { workings: found, isMeasured: true };
  const read = again.outcome<never>(undefined);
  const reasons = read.ok ? '' : read.problems.map(({ message }) => message).join(' ');
  findings.reject('E_RANGE', '/heightMm', `With rows as close as that the piece does not work out. ${reasons} Count the rows and measure again.`);
  return undefined;
}

/**
 * What is still to be woven of `piece`, on from what `woven` says. With nothing woven it is the plan; with all of it
 * woven only finishing is left. Never throws for what a person may send: paths of problems with the piece lie below
 * `/piece`, all others in `woven`.
 *
 * Finished bands are taken to have the rows of the plan. Where a measured height says that the rows lie otherwise, the
 * rest is reckoned with rows as they were measured, from two centimetres of tabby on.
 */
export function planRest(piece: unknown, woven: unknown, units: Units = 'cm'): Outcome<RestPlan> {
  const findings = Findings.in(units);
  const said = readWoven(Fields.of(woven, '', 'What is woven', findings));
  const planned = putOnLoom(Fields.of(piece, '', 'A piece', findings.within('/piece')));
  if (said === undefined || planned === undefined) return findings.outcome<RestPlan>(undefined);
  checkPlace(planned, said, findings);
  const anew = findings.count > 0 ? undefined : workOutAnew(piece as FrameLoomPiece, planned, said, findings);
  if (anew === undefined) return findings.outcome<RestPlan>(undefined);
  // Warnings of the whole piece were told with its plan; here only those of the rest count.
  const own = Findings.in(units);
  return own.outcome(reckonRest(anew.workings, said, anew.isMeasured, own));
}

function reckonRest(workings: PieceOnLoom, woven: WovenSoFar, isMeasured: boolean, findings: Findings): RestPlan {
  const { bandsDone, rows = 0, heightMm } = woven;
  // Of use only where it was measured.
  const soFarMm = (heightMm ?? 0) * shrinkOf(workings);
  const stacked = isMeasured ? refill(workings, woven, soFarMm) : workings.stacked;
  const open = stacked.slice(bandsDone).flatMap((stack) => (stack.index === bandsDone ? (restOfBand(stack, rows, workings) ?? []) : stack));
  const begun = isBegun(woven);
  const summed = addUp({ ...workings, stacked: open, ...(begun ? { isWarped: true } : {}) }, Findings.in(findings.units));
  const restMm = stacked.slice(bandsDone).reduce((sum, stack) => sum + leftMmOf(stack, stack.index === bandsDone ? rows : 0, workings), 0);
  const comesToMm = isMeasured ? soFarMm + restMm : workings.size.heightMm;
  if (comesToMm > workings.size.heightMm + SAME_MM) warnOfRoom(workings, comesToMm, findings);
  return {
    rows: summed.bands.reduce((sum, { picks }) => sum + (picks ?? 0), 0),
    bands: summed.bands,
    yarns: Object.fromEntries(Object.entries(summed.yarns).map(([role, needed]) => [role, yarnLeft(role, needed, workings, woven, findings)])),
    warp: begun ? NO_WARP : summed.warp,
    hours: summed.hours,
    heightMm: comesToMm,
    picksPerCm: 10 / summed.weft.pickSpacingMm,
    trust: isMeasured ? 'measured' : 'formula',
  };
}
