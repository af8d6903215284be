/** Amounts every piece has: ends, sizes, warp, cards, hanging, hours. */
import { holderStep } from '#core/craft/looms/looms.ts';
import { HANGING } from '#core/craft/defaults.ts';
import {
  countOf,
  lengthOf,
  massOf,
  type HowReckoned,
  type Reckoned,
} from '#core/craft/amounts/amount-types.ts';
import { settingsOf } from '#core/craft/frame-loom/settings.ts';
import type { FrameLoomPiece } from '#core/craft/piece.ts';
import type { FrameLoomPlan } from '#core/craft/plan-types.ts';
import { leastTrust, type Trust } from '#core/craft/trust.ts';

export interface PlannedPiece {
  readonly piece: FrameLoomPiece;
  readonly plan: FrameLoomPlan;
}

type FixedAmount = (of: PlannedPiece) => Reckoned | undefined;

/** A swatch that was counted beats the rule of thumb for how close rows lie. */
export function beatTrust({ beat }: FrameLoomPiece): Trust {
  return beat?.picksPerCm === undefined ? 'formula' : 'measured';
}

const settings = ({ piece }: PlannedPiece): ReturnType<typeof settingsOf> =>
  settingsOf(piece.allowances ?? {}, piece.mode ?? 'straight-warp', piece.beat);

const COMMON = 'common practice';
const GEOMETRY = 'geometry of the loom';

const ends: FixedAmount = ({ piece, plan }) => ({
  label: 'Warp ends',
  quantity: countOf(plan.ends.count, 'end', 'ends'),
  how: {
    formula: 'width on the loom ÷ room for one end, rounded, raised to the number the pattern needs',
    inputs: [
      { name: 'width on the loom', value: lengthOf(plan.ends.loomWidthMm, 'size') },
      { name: 'from nail to nail', value: lengthOf(holderStep(piece.loom), 'fine') },
      { name: 'before rounding', value: { kind: 'number', value: plan.ends.raw } },
    ],
    source: GEOMETRY,
    trust: 'formula',
  },
});

const nails: FixedAmount = ({ plan }) => ({
  label: 'Nails on the upper rail',
  quantity: countOf(plan.ends.nailsTop, 'nail', 'nails'),
  how: {
    formula: 'the way the warp takes round the nails, counted',
    inputs: [
      { name: 'warp ends', value: countOf(plan.ends.count, 'end', 'ends') },
      { name: 'on the lower rail', value: countOf(plan.ends.nailsBottom, 'nail', 'nails') },
    ],
    source: GEOMETRY,
    trust: 'formula',
  },
});

const spacing: FixedAmount = ({ piece, plan }) => ({
  label: 'From end to end',
  quantity: lengthOf(plan.ends.spacingMm, 'fine'),
  how: {
    formula: 'nail spacing ÷ ends at a nail × ends worked together',
    inputs: [
      { name: 'from nail to nail', value: lengthOf(holderStep(piece.loom), 'fine') },
      { name: 'every so-many-th nail', value: { kind: 'number', value: piece.loom.everyNthNail ?? 1 } },
      { name: 'ends worked together', value: { kind: 'number', value: piece.warp.endsTogether ?? 1 } },
    ],
    source: GEOMETRY,
    trust: 'measured',
  },
});

/** A size the pattern gives, with nothing reckoned. */
const given = (label: string, mm: number): Reckoned => ({
  label,
  quantity: lengthOf(mm, 'size'),
  how: { formula: 'as the piece says', inputs: [], source: 'the piece', trust: 'measured' },
});

const woundWidth: FixedAmount = ({ plan }) => ({
  label: 'Width of the warp',
  quantity: lengthOf(plan.ends.woundWidthMm, 'size'),
  how: {
    formula: '(ends − 1) × room for one end',
    inputs: [{ name: 'warp ends', value: countOf(plan.ends.count, 'end', 'ends') }],
    source: GEOMETRY,
    trust: 'formula',
  },
});

const loomWidth: FixedAmount = ({ piece, plan }) => ({
  label: 'Inside width of the loom, at least',
  quantity: lengthOf(plan.loom.insideWidthNeededMm, 'least'),
  how: {
    formula: '(nails − 1) × nail spacing + room beyond the outer nails',
    inputs: [
      { name: 'nails', value: countOf(plan.ends.nailsTop, 'nail', 'nails') },
      { name: 'from nail to nail', value: lengthOf(holderStep(piece.loom), 'fine') },
    ],
    source: COMMON,
    trust: 'formula',
  },
});

const loomHeight: FixedAmount = ({ plan }) => ({
  label: 'From nail to nail upright, at least',
  quantity: lengthOf(plan.loom.heightNeededMm, 'least'),
  how: {
    formula: 'height on the loom + bare warp above and below',
    inputs: [
      { name: 'height on the loom', value: lengthOf(plan.loom.heightOnLoomMm, 'size') },
      { name: 'above', value: lengthOf(plan.loom.topMm, 'size') },
      { name: 'below', value: lengthOf(plan.loom.bottomMm, 'size') },
    ],
    source: COMMON,
    trust: 'formula',
  },
});

function warpHow(of: PlannedPiece): HowReckoned {
  const { piece, plan } = of;
  return {
    formula: 'ends × height of the frame + a half turn round each nail + two ties, with margin',
    inputs: [
      { name: 'warp ends', value: countOf(plan.ends.count, 'end', 'ends') },
      { name: 'height of the frame', value: lengthOf(piece.loom.insideHeightMm, 'size') },
      { name: 'without margin', value: lengthOf(plan.warp.netMm, 'yarn') },
      { name: 'margin', value: { kind: 'share', share: settings(of).marginWarp } },
    ],
    source: GEOMETRY,
    trust: 'formula',
  };
}

const warp: FixedAmount = (of) => ({ label: 'Warp yarn', quantity: lengthOf(of.plan.warp.withMarginMm, 'yarn'), how: warpHow(of) });

const warpMass: FixedAmount = (of) => {
  const { netMm, withMarginMm, massG } = of.plan.warp;
  const how = warpHow(of);
  return {
    label: 'Warp yarn',
    quantity: massOf(massG * (withMarginMm / netMm)),
    how: { ...how, formula: `length × weight of the yarn: ${how.formula}`, trust: leastTrust(how.trust, 'label') },
  };
};

const warpBalls: FixedAmount = (of) =>
  of.plan.warp.balls === undefined
    ? undefined
    : {
        label: 'Balls of warp yarn',
        quantity: countOf(of.plan.warp.balls, 'ball', 'balls'),
        how: {
          formula: 'length with margin ÷ length of a ball, rounded up',
          inputs: [{ name: 'length with margin', value: lengthOf(of.plan.warp.withMarginMm, 'yarn') }],
          source: 'the label',
          trust: leastTrust('label', warpHow(of).trust),
        },
      };

const spacerWidth: FixedAmount = ({ plan }) => ({
  label: 'Width of the spacer card',
  quantity: lengthOf(plan.cut.spacerCard.widthMm, 'least'),
  how: {
    formula: 'width of the warp + a little on both sides',
    inputs: [{ name: 'width of the warp', value: lengthOf(plan.ends.woundWidthMm, 'size') }],
    source: COMMON,
    trust: 'formula',
  },
});

const spacerHeight: FixedAmount = ({ plan }) => ({
  label: 'Height of the spacer card',
  quantity: lengthOf(plan.cut.spacerCard.heightMm, 'least'),
  how: { formula: 'bare warp below the first row, enough to knot or tuck the ends', inputs: [], source: COMMON, trust: 'formula' },
});

const dowelLength: FixedAmount = ({ piece, plan }) =>
  plan.cut.dowel && {
    label: 'Length of the dowel',
    quantity: lengthOf(plan.cut.dowel.lengthMm, 'least'),
    how: {
      formula: 'width of the piece + what stands out on both sides',
      inputs: [{ name: 'width', value: lengthOf(piece.size.widthMm, 'size') }],
      source: COMMON,
      trust: 'formula',
    },
  };

const dowelDiameter: FixedAmount = ({ piece, plan }) =>
  plan.cut.dowel && {
    label: 'Thickness of the dowel, at least',
    quantity: lengthOf(Math.max(piece.dowel?.diameterMm ?? HANGING.leastStockMm, plan.cut.dowel.minDiameterMm), 'fine-least'),
    how: {
      formula: 'the thickness the piece asks for, if it does not sag by more than a 360th of its length',
      inputs: [
        { name: 'mass of the piece', value: massOf(plan.massG) },
        { name: 'thinnest that does not sag', value: lengthOf(plan.cut.dowel.minDiameterMm, 'fine-least') },
      ],
      source: 'bending of an evenly loaded beam',
      trust: 'formula',
    },
  };

const cord: FixedAmount = ({ plan }) =>
  plan.cut.cordMm === undefined
    ? undefined
    : {
        label: 'Hanging cord',
        quantity: lengthOf(plan.cut.cordMm, 'cut'),
        how: { formula: 'from both dowel ends up to the nail + two knots', inputs: [], source: COMMON, trust: 'formula' },
      };

const hours: FixedAmount = ({ plan }) => ({
  label: 'Hours of work',
  quantity: { kind: 'time', hours: plan.hours.likely, low: plan.hours.low, high: plan.hours.high },
  how: {
    formula: 'warping + rows + colour changes + knots and stitches + finishing, at a steady hand’s pace',
    inputs: [{ name: 'warp ends', value: countOf(plan.ends.count, 'end', 'ends') }],
    source: COMMON,
    trust: 'class',
  },
});

const mass: FixedAmount = ({ piece, plan }) => ({
  label: 'Mass of the finished piece',
  quantity: massOf(plan.massG),
  how: {
    formula: 'warp and all yarns, each length × its weight, without margins',
    inputs: [{ name: 'warp', value: massOf(plan.warp.massG) }],
    source: 'the labels',
    trust: leastTrust('label', beatTrust(piece)),
  },
});

const pick: FixedAmount = ({ plan }) => ({
  label: 'Yarn in one row',
  quantity: lengthOf(plan.weft.pickMm, 'size'),
  how: {
    formula: '(working ends − 1) × yarn from end to end + the turn at the selvedge',
    inputs: [
      { name: 'working ends', value: countOf(plan.ends.working, 'end', 'ends') },
      { name: 'take-up', value: { kind: 'share', share: plan.weft.crimp } },
    ],
    source: 'Peirce’s geometry of plain weave',
    trust: 'formula',
  },
});

export const FIXED_AMOUNTS = {
  ends,
  nails,
  spacing,
  width: ({ piece }) => given('Width', piece.size.widthMm),
  height: ({ piece }) => given('Height', piece.size.heightMm),
  'wound-width': woundWidth,
  'loom.width': loomWidth,
  'loom.height': loomHeight,
  warp,
  'warp.mass': warpMass,
  'warp.balls': warpBalls,
  'spacer.width': spacerWidth,
  'spacer.height': spacerHeight,
  'dowel.length': dowelLength,
  'dowel.diameter': dowelDiameter,
  cord,
  hours,
  mass,
  pick,
} as const satisfies Readonly<Record<string, FixedAmount>>;
