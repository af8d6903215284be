/** Reading and reckoning a cloth on a rigid heddle: plain weave in which warp and weft bend alike. */
import { ASHENHURST_K, DEFAULT_ALLOWANCES, PACE } from '#core/craft/defaults.ts';
import { END_RANGE, rawEnds, widthBeforeDrawIn } from '#core/craft/ends.ts';
import { pickGeometry, pickLength, type PickGeometry } from '#core/craft/picks.ts';
import type { Yarn } from '#core/craft/piece.ts';
import type { WarpPlan } from '#core/craft/plan-types.ts';
import { ballsFor, withMargin } from '#core/craft/purchase.ts';
import type { Fields, NumberRule } from '#core/craft/reading/fields.ts';
import type { Findings } from '#core/craft/reading/findings.ts';
import { present } from '#core/craft/reading/present.ts';
import type { HeddlePiece, HeddlePlan } from '#core/craft/rigid-heddle/piece.ts';
import { roundHalfUp } from '#core/craft/rounding.ts';
import { LONGEST_MM } from '#core/craft/techniques/read-rules.ts';
import { secondsPerRow } from '#core/craft/time.ts';
import { readYarn } from '#core/craft/yarn/read-yarn.ts';
import { massOf, threadOf, type Thread } from '#core/craft/yarn/thread.ts';

/** Loom waste: one loom maker's 24 in. Take-up and shrinkage: common practice where nothing is known. */
export const USUAL = { drawIn: 0.08, widthShrinkage: 0.1, lengthShrinkage: 0.1, takeUp: 0.1, fringeMm: 0, gapMm: 0, wasteMm: 610, margin: DEFAULT_ALLOWANCES.marginWeft.swatch } as const;
/** The margin of the warp is in its waste already; this is for slips of the hand. */
export type Allowances = { readonly [K in keyof typeof USUAL]: number };

const length = (name: string, max: number = LONGEST_MM): NumberRule => ({ name, min: 'over-zero', max, unit: 'mm' });
const share = (name: string, max: number): NumberRule => ({ name, min: 0, max, unit: 'share' });

function readAllowances(fields: Fields): Allowances {
  const group = fields.optionalGroup('allowances', 'Allowances');
  if (group === undefined) return USUAL;
  const room = (key: 'fringeMm' | 'gapMm' | 'wasteMm', name: string): number | undefined => group.optionalNumber(key, { name, min: 0, max: 5000, unit: 'mm' });
  const given = present({
    drawIn: group.optionalNumber('drawIn', { ...share('Draw-in', 0.4), maxIsOut: true }),
    widthShrinkage: group.optionalNumber('widthShrinkage', share('Shrinkage of the width', 0.5)),
    lengthShrinkage: group.optionalNumber('lengthShrinkage', share('Shrinkage of the length', 0.5)),
    takeUp: group.optionalNumber('takeUp', share('Take-up', 0.6)),
    fringeMm: room('fringeMm', 'Fringe'),
    gapMm: room('gapMm', 'Gap between pieces'),
    wasteMm: room('wasteMm', 'Loom waste'),
    margin: group.optionalNumber('margin', share('Margin', 1)),
  });
  group.end();
  return { ...USUAL, ...given };
}

export interface Parts {
  readonly size: HeddlePiece['size'];
  readonly heddle: HeddlePiece['heddle'];
  readonly warp: Yarn;
  readonly weft: Yarn;
  readonly picksPerCm: number;
  readonly pieces: number;
  readonly allowances: Allowances;
}

/** Undefined if anything was refused. Refuses keys it does not know. */
export function readHeddlePiece(fields: Fields): Parts | undefined {
  fields.take('craft');
  return fields.findings.soundly(() => {
    const size = fields.group('size', 'Size');
    const heddle = fields.group('heddle', 'Heddle');
    const yarns = fields.group('yarns', 'The group of yarns');
    const parts: Parts = {
      size: { widthMm: size.number('widthMm', length('Width')), lengthMm: size.number('lengthMm', length('Length')) },
      heddle: { spacingMm: heddle.number('spacingMm', { name: 'From end to end', min: 0.5, max: 25, unit: 'mm' }), ...present({ widthMm: heddle.optionalNumber('widthMm', length('Width of the heddle', 3000)) }) },
      warp: readYarn(yarns.group('warp', 'Warp yarn')) ?? { tex: 1 },
      weft: readYarn(yarns.group('weft', 'Weft yarn')) ?? { tex: 1 },
      picksPerCm: fields.number('picksPerCm', { name: 'Rows in a centimetre', min: 'over-zero', max: 100 }),
      pieces: fields.optionalNumber('pieces', { name: 'Pieces on one warp', min: 1, max: 100, whole: true }) ?? 1,
      allowances: readAllowances(fields),
    };
    for (const group of [size, heddle, yarns, fields]) group.end();
    return parts;
  });
}

function toBuy(netMm: number, yarn: Yarn, { tex, strands }: Thread, margin: number): WarpPlan {
  const yarnMm = netMm * strands;
  const withMarginMm = withMargin(yarnMm, margin);
  const plan = { netMm: yarnMm, withMarginMm, massG: massOf(yarnMm, tex) };
  return yarn.ball === undefined ? plan : { ...plan, balls: ballsFor(withMarginMm, yarn.ball.metres).count };
}

/** How warp and weft cross; undefined where they jam. */
export function crossing({ heddle, picksPerCm }: Parts, warp: Thread, weft: Thread): PickGeometry | undefined {
  return pickGeometry({ spacingMm: heddle.spacingMm, warpDiameterMm: warp.compressedMm, weftDiameterMm: weft.compressedMm, pickSpacingMm: 10 / picksPerCm, mode: 'balanced' });
}

function checkCrossing(geometry: PickGeometry | undefined, findings: Findings): PickGeometry | undefined {
  if (geometry === undefined) findings.reject('E_JAM', '/picksPerCm', 'Yarns this thick cannot lie so close. Fewer rows in a centimetre, a coarser heddle or thinner yarn works.');
  if (geometry?.clamped === true) findings.warn('W_CLAMPED', '/picksPerCm', 'Warp and weft cannot bend alike in so close a cloth. The nearest that is possible is reckoned.');
  return geometry;
}

/** Ends in the heddle; undefined if there are too few or too many, or they find no room. */
function endsIn({ size, heddle, allowances: { drawIn, widthShrinkage } }: Parts, findings: Findings): HeddlePlan['ends'] | undefined {
  const widthInHeddleMm = widthBeforeDrawIn(size.widthMm, drawIn) / (1 - widthShrinkage);
  const raw = rawEnds(widthInHeddleMm, 1 / heddle.spacingMm);
  const count = roundHalfUp(raw);
  if (count < END_RANGE.min || count > END_RANGE.max) findings.reject('E_RANGE', '/size/widthMm', `${String(count)} ends are too ${count < END_RANGE.min ? 'few' : 'many'} to weave with. Between ${String(END_RANGE.min)} and ${String(END_RANGE.max)} works.`);
  if (heddle.widthMm !== undefined && widthInHeddleMm > heddle.widthMm + 1e-9) findings.reject('E_FIT', '/heddle/widthMm', `The cloth stands ${findings.length(widthInHeddleMm, 'up')} wide in the heddle, which holds ${findings.length(heddle.widthMm)}. Up to ${findings.length(heddle.widthMm * (1 - drawIn) * (1 - widthShrinkage), 'down')} of finished width fit.`);
  return { count, raw, widthInHeddleMm };
}

/** Reads a piece and reckons it; undefined, with a problem among the findings, if it cannot be woven. */
export function planHeddle(fields: Fields): Omit<HeddlePlan, 'warnings'> | undefined {
  const parts = readHeddlePiece(fields);
  return parts && reckonHeddle(parts, fields.findings);
}

/** The plan of a piece that has been read; undefined, with a problem among the findings, if it cannot be woven. */
export function reckonHeddle(parts: Parts, findings: Findings): Omit<HeddlePlan, 'warnings'> | undefined {
  const { size, pieces, picksPerCm, allowances } = parts;
  const ends = endsIn(parts, findings);
  const [warp, weft] = [threadOf(parts.warp, ASHENHURST_K.warp), threadOf(parts.weft, ASHENHURST_K.warp)];
  const laid = checkCrossing(crossing(parts, warp, weft), findings);
  if (findings.count > 0 || ends === undefined || laid === undefined) return undefined;
  const warpEndMm = (pieces * size.lengthMm) / ((1 - allowances.lengthShrinkage) * (1 - allowances.takeUp)) + (pieces - 1) * allowances.gapMm + allowances.fringeMm + allowances.wasteMm;
  const picks = pieces * roundHalfUp((size.lengthMm / 10) * picksPerCm);
  const pickMm = pickLength(ends.count, laid);
  const yarns = { warp: toBuy(ends.count * warpEndMm, parts.warp, warp, allowances.margin), weft: toBuy(picks * pickMm, parts.weft, weft, allowances.margin) };
  const likely = (picks * secondsPerRow(ends.count)) / 3600 + ends.count / PACE.warpEndsPerHour + PACE.finishingHours;
  return {
    craft: 'rigid-heddle', ends, warpEndMm, picks, weft: { crimp: laid.crimp, stepMm: laid.stepMm, turnMm: laid.turnMm, pickMm }, yarns,
    massG: yarns.warp.massG + yarns.weft.massG, hours: { likely, low: likely * PACE.lowFactor, high: likely * PACE.highFactor },
  };
}
