/** Weaving on a rigid heddle: plain, balanced cloth. */
import { countOf, lengthOf, massOf, type Quantity, type Reckoned } from '#core/craft/amounts/amount-types.ts';
import type { WovenPiece } from '#core/craft/cloth/cloth-piece.ts';
import { yarnColour } from '#core/craft/cloth/colour.ts';
import type { Craft, MadeOf, Material } from '#core/craft/craft.ts';
import { gramsInHand } from '#core/craft/purchase.ts';
import { present } from '#core/craft/reading/present.ts';
import type { HeddlePiece, HeddlePlan } from '#core/craft/rigid-heddle/piece.ts';
import { HEDDLE_CAUTIONS } from '#core/craft/rigid-heddle/cautions.ts';
import { planHeddle, readHeddlePiece } from '#core/craft/rigid-heddle/plan-heddle.ts';
import { amountText } from '#core/units/format-amount.ts';
import type { Units } from '#core/units/units.ts';

type Made = MadeOf<HeddlePiece, HeddlePlan>;
const ROLES = ['warp', 'weft'] as const;

function amountIn(key: string, { piece, plan }: Made): Reckoned | string {
  const told = (label: string, quantity: Quantity, formula: string, source = 'Peirce’s geometry of plain weave; common practice'): Reckoned => ({ label, quantity, how: { formula, inputs: [], source, trust: 'formula' } });
  const { likely, low, high } = plan.hours;
  const fixed: Readonly<Record<string, Reckoned>> = {
    ends: told('Warp ends', countOf(plan.ends.count, 'end', 'ends'), 'width ÷ (1 − draw-in) ÷ (1 − shrinkage) ÷ room for one end, rounded'),
    width: told('Width', lengthOf(piece.size.widthMm, 'size'), 'as the piece says', 'the piece'),
    height: told('Length', lengthOf(piece.size.lengthMm, 'size'), 'as the piece says', 'the piece'),
    'warp-end': told('Each warp end', lengthOf(plan.warpEndMm, 'cut'), 'length ÷ (1 − shrinkage) ÷ (1 − take-up) + gaps + fringe + loom waste'),
    'heddle.width': told('Width in the heddle', lengthOf(plan.ends.widthInHeddleMm, 'least'), 'width ÷ (1 − draw-in) ÷ (1 − shrinkage)'),
    picks: told('Rows', countOf(plan.picks, 'row', 'rows'), 'length × rows in a centimetre, rounded'),
    pick: told('Yarn in one row', lengthOf(plan.weft.pickMm, 'size'), '(ends − 1) × yarn from end to end + the turn at the selvedge'),
    hours: told('Hours of work', { kind: 'time', hours: likely, low, high }, 'warping + rows + finishing, at a steady hand’s pace', 'common practice'),
    mass: told('Mass of the yarn in it', massOf(plan.massG), 'warp with its waste and weft, without margins', 'the labels'),
  };
  if (Object.hasOwn(fixed, key)) return fixed[key] ?? '';
  const [subject, name, what] = key.split('.');
  const role = ROLES.find((one) => one === name);
  if (subject !== 'yarn' || role === undefined) return `No amount is called “${key}”.`;
  const yarn = plan.yarns[role];
  const label = piece.yarns[role].label ?? role;
  if (what === undefined) return told(label, lengthOf(yarn.withMarginMm, 'yarn'), 'all of it, with margin');
  if (what === 'mass') return told(label, massOf(gramsInHand(yarn)), 'length × weight of the yarn, with margin');
  return what === 'balls' && yarn.balls !== undefined ? told(`Balls of ${label}`, countOf(yarn.balls, 'ball', 'balls'), 'length with margin ÷ length of a ball, rounded up', 'the label') : `A yarn has mass and, where its label says, balls.`;
}

function draw({ piece, plan }: Made, title: string): WovenPiece {
  const { warp, weft } = piece.yarns;
  return {
    kind: 'woven', title, thing: 'plain cloth', widthMm: piece.size.widthMm, ends: plan.ends.count, endsTogether: 1, warpColour: yarnColour(warp.colour), seed: 7, turned: false, loom: undefined,
    bands: [{ technique: 'tabby', name: undefined, heightMm: piece.size.lengthMm, colour: yarnColour(weft.colour), yarn: weft.label ?? 'weft', picks: plan.picks / (piece.pieces ?? 1), cover: 0, shapes: [] }],
  };
}

const size = (mm: number, units: Units): string => amountText(lengthOf(mm, 'size'), units);

export const RIGID_HEDDLE: Craft<HeddlePiece, HeddlePlan> = {
  words: { label: 'Rigid heddle', hours: 'at the loom', needs: 'Rigid heddle loom', material: 'Yarn', allMaterial: 'Warp and weft together', made: 'woven on a rigid heddle', search: 'weaving rigid heddle' },
  cautions: HEDDLE_CAUTIONS,
  example: {
    craft: 'rigid-heddle', size: { widthMm: 200, lengthMm: 1500 }, heddle: { spacingMm: 2.54 }, picksPerCm: 4,
    yarns: { warp: { tex: 250, colour: '#2f5366' }, weft: { tex: 250, colour: '#cdbb94' } },
    allowances: { drawIn: 0.08, widthShrinkage: 0.05, lengthShrinkage: 0.05, takeUp: 0.1, fringeMm: 200 },
  },
  plan: planHeddle,
  read: readHeddlePiece,
  amounts: [
    { title: 'Size and heddle', keys: ['width', 'height', 'heddle.width'] },
    { title: 'Warp', keys: ['ends', 'warp-end'] },
    { title: 'Yarns', keys: ['yarn.<role>', 'yarn.<role>.mass', 'yarn.<role>.balls'] },
    { title: 'Weaving', keys: ['picks', 'pick', 'hours', 'mass'] },
  ],
  ownNames: () => ({ role: ROLES }),
  amount: amountIn,
  materials: ({ piece, plan }) => ROLES.map((role): Material => ({
    key: `yarn.${role}`, role, name: role, yarn: piece.yarns[role], lengthMm: plan.yarns[role].withMarginMm, grams: gramsInHand(plan.yarns[role]),
    ...present({ label: piece.yarns[role].label, colour: piece.yarns[role].colour, balls: plan.yarns[role].balls }),
  })),
  roleOfKey: (key) => (key.startsWith('yarn.') ? key.split('.')[1] : undefined),
  draw,
  change: (pattern, { widthMm, yarns }) => ({ ...pattern, size: { ...pattern.size, widthMm: widthMm ?? pattern.size.widthMm }, yarns: { warp: yarns?.['warp'] ?? pattern.yarns.warp, weft: yarns?.['weft'] ?? pattern.yarns.weft } }),
  tellChanges: (before, after) => (after.plan.ends.count === before.plan.ends.count ? [] : [`There are ${String(after.plan.ends.count)} ends instead of ${String(before.plan.ends.count)}.`]),
  summary: ({ piece, plan }, units) => `${String(plan.ends.count)} ends in the heddle, woven ${size(piece.size.widthMm, units)} wide`,
  size: ({ piece }, units) => `${size(piece.size.widthMm, units)} wide and ${size(piece.size.lengthMm, units)} long, without its fringe`,
  leastInsideMm: () => undefined,
};
