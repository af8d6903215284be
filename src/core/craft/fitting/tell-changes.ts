/** How a student's piece differs from the pattern, in words. */
import { fills } from '#core/craft/fitting/leave-out.ts';
import { bandKey } from '#core/craft/fitting/way.ts';
import type { Band, FrameLoomPiece } from '#core/craft/piece.ts';
import type { BandPlan, FrameLoomPlan } from '#core/craft/plan-types.ts';
import { lengthOf, type LengthUse } from '#core/craft/amounts/amount-types.ts';
import { amountText } from '#core/units/format-amount.ts';
import { LOOM_WORDS } from '#core/craft/looms/loom-words.ts';
import { DEFAULT_KIND, loomKind } from '#core/craft/looms/looms.ts';
import { listed } from '#core/listed.ts';
import type { Units } from '#core/units/units.ts';

export interface Made {
  readonly piece: FrameLoomPiece;
  readonly plan: FrameLoomPlan;
}

/** A difference that cannot be seen is none. */
const SAME_MM = 0.05;

const ORDINALS = ['first', 'second', 'third', 'fourth', 'fifth', 'sixth', 'seventh', 'eighth', 'ninth', 'tenth'];

const ordinal = (place: number): string => ORDINALS[place - 1] ?? `${String(place)}th`;

/** `dark shore`, or `the third band` for one without a name. */
export function bandWords(band: { readonly name?: string }, index: number): string {
  return band.name === undefined ? `the ${ordinal(index + 1)} band` : band.name.replaceAll('-', ' ');
}

function nailWords({ loom }: FrameLoomPiece): string {
  const nth = loom.everyNthNail ?? 1;
  const inner = loomKind(loom).rows === 2 && loom.nailRows === 'inner' ? 'inner ' : '';
  const nail = `${inner}${loomKind(loom).holder.one}`;
  return nth === 1 ? `every ${nail}` : `every ${ordinal(nth)} ${nail}`;
}

const sumOf = (plan: FrameLoomPlan, of: (band: BandPlan) => number | undefined): number => plan.bands.reduce((sum, band) => sum + (of(band) ?? 0), 0);

function soumakRows({ bands }: FrameLoomPiece): number {
  return bands.reduce((sum, band) => sum + (band.technique === 'soumak' ? band.rows : 0), 0);
}

/** Two roles may have yarn of one name, so the role is told with it. */
const yarnName = (role: string, label: string | undefined): string => (label === undefined ? `the ${role} yarn` : `${label} (${role})`);

function tellYarns(before: FrameLoomPiece, after: FrameLoomPiece): string[] {
  return Object.entries(after.yarns).flatMap(([role, yarn]) => {
    const was = before.yarns[role];
    if (yarn === was) return [];
    const strands = yarn.strands ?? 1;
    const isOwn = was === undefined || JSON.stringify({ ...yarn, strands }) !== JSON.stringify({ ...was, strands });
    const own = isOwn ? [`${yarn.label ?? 'Your own yarn'} is the ${role} yarn.`] : [];
    if (strands === (was?.strands ?? 1)) return own;
    const together = strands === 1 ? 'Take a single strand' : `Take ${String(strands)} strands`;
    return [...own, `${together} of ${yarnName(role, yarn.label)}${strands === 1 ? '' : ' together'} instead of ${String(was?.strands ?? 1)}.`];
  });
}

function tellUnused(before: Made, after: Made): string[] {
  return Object.keys(after.piece.yarns).flatMap((role) => {
    const isNeeded = ({ plan }: Made): boolean => (plan.yarns[role]?.netMm ?? 0) > 0;
    return isNeeded(before) && !isNeeded(after) ? [`No ${yarnName(role, after.piece.yarns[role]?.label).replace(/^the /u, '')} is needed.`] : [];
  });
}

interface TwoBands {
  readonly words: string;
  readonly was: { readonly band: Band; readonly plan: BandPlan };
  /** Missing where the band is left out. */
  readonly is: { readonly band: Band; readonly plan: BandPlan } | undefined;
}

/** What is not left out stands in the same order in both. */
function pairBands(before: Made, after: Made, leftOut: readonly string[]): readonly TwoBands[] {
  let place = 0;
  return before.piece.bands.flatMap((band, index): TwoBands[] => {
    const plan = before.plan.bands[index];
    if (plan === undefined) return [];
    const words = bandWords(band, index);
    const was = { band, plan };
    if (leftOut.includes(bandKey(band, index))) return [{ words, was, is: undefined }];
    const [now, planned] = [after.piece.bands[place], after.plan.bands[place]];
    place += 1;
    return now === undefined || planned === undefined ? [] : [{ words, was, is: { band: now, plan: planned } }];
  });
}

const sentence = (words: string): string => `${words.charAt(0).toUpperCase()}${words.slice(1)}`;

/** In the person's units; nothing where the difference cannot be seen. */
type TellLength = (was: number, is: number, use: LengthUse, words: (is: string, was: string) => string) => string[];

function lengthTeller(units: Units): TellLength {
  const length = (mm: number, use: LengthUse): string => amountText(lengthOf(mm, use), units);
  return (was, is, use, words) => (Math.abs(is - was) > SAME_MM ? [words(length(is, use), length(was, use))] : []);
}

function tellWarp(before: Made, after: Made, tellLength: TellLength): string[] {
  const told: string[] = [];
  const [kindBefore, kind] = [before.piece.loom.kind ?? DEFAULT_KIND, after.piece.loom.kind ?? DEFAULT_KIND];
  if (kind !== kindBefore) told.push(LOOM_WORDS[kind].dressing);
  if (after.piece.loom.warping !== before.piece.loom.warping) {
    told.push(after.piece.loom.warping === 'zigzag' ? 'The warp goes round every nail in a zigzag.' : 'The warp steps along two nails at a time.');
  }
  if (nailWords(after.piece) !== nailWords(before.piece)) told.push(`The warp goes round ${nailWords(after.piece)}.`);
  if ((after.piece.warp.endsTogether ?? 1) !== (before.piece.warp.endsTogether ?? 1)) {
    told.push(after.piece.warp.endsTogether === 2 ? 'Two ends are worked together as one.' : 'Each end is worked by itself.');
  }
  told.push(...tellLength(before.plan.ends.spacingMm, after.plan.ends.spacingMm, 'fine', (is, was) => `Ends stand ${is} apart instead of ${was}.`));
  if (after.plan.ends.count !== before.plan.ends.count) {
    told.push(`There are ${String(after.plan.ends.count)} ends instead of ${String(before.plan.ends.count)}.`);
  }
  const yarn = after.piece.warp.yarn;
  if (JSON.stringify(yarn) !== JSON.stringify(before.piece.warp.yarn)) told.push(`${yarn.label ?? 'Your own yarn'} is the warp.`);
  return told;
}

function tellBands(before: Made, after: Made, leftOut: readonly string[], tellLength: TellLength): string[] {
  const pairs = pairBands(before, after, leftOut);
  const gone = pairs.filter(({ is }) => is === undefined).map(({ words }) => words);
  const isOtherHeight = Math.abs(after.piece.size.heightMm - before.piece.size.heightMm) > SAME_MM;
  const measures = pairs.flatMap(({ words, was, is }) => {
    if (is === undefined) return [];
    if (isOtherHeight && fills(is.band)) return tellLength(was.plan.heightMm, is.plan.heightMm, 'size', (now, then) => sentence(`${words}: ${now} high instead of ${then}.`));
    if (was.band.technique !== 'rya' || is.band.technique !== 'rya') return [];
    return tellLength(was.band.pileMm, is.band.pileMm, 'size', (now, then) => sentence(`${words}: ${now} long instead of ${then}.`));
  });
  return [...(gone.length === 0 ? [] : [`Left out: ${listed(gone)}.`]), ...tellUnused(before, after), ...measures];
}

/** What is not woven any more is told with the bands that are left out. */
function tellCounts(before: Made, after: Made): string[] {
  const count = (of: (made: Made) => number, words: string): string[] =>
    of(after) === of(before) || of(after) === 0 ? [] : [`${String(of(before))} ${words} become ${String(of(after))}.`];
  return [
    ...count(({ plan }) => sumOf(plan, ({ picks }) => picks), 'rows of tabby'),
    ...count(({ piece }) => soumakRows(piece), 'rows of soumak'),
    ...count(({ plan }) => sumOf(plan, ({ knots }) => knots), 'knots'),
  ];
}

/** One sentence for each thing that is not as in the pattern. `leftOut` are the keys of bands of `before` that are not woven. */
export function tellChanges(before: Made, after: Made, units: Units, leftOut: readonly string[] = []): readonly string[] {
  const tellLength = lengthTeller(units);
  return [
    ...tellLength(before.piece.size.widthMm, after.piece.size.widthMm, 'size', (is, was) => `The piece is ${is} wide instead of ${was}.`),
    ...tellLength(before.piece.size.heightMm, after.piece.size.heightMm, 'size', (is, was) => `The piece is ${is} high instead of ${was}.`),
    ...tellWarp(before, after, tellLength),
    ...tellYarns(before.piece, after.piece),
    ...tellBands(before, after, leftOut, tellLength),
    ...tellCounts(before, after),
  ];
}
