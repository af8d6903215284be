/** What a knotted piece tells by the keys of amounts. */
import { countOf, lengthOf, massOf, type HowReckoned, type LengthUse, type Quantity, type Reckoned } from '#core/craft/amounts/amount-types.ts';
import type { Trust } from '#core/craft/trust.ts';
import type { KeyGroup, MadeOf } from '#core/craft/craft.ts';
import type { ColumnPlan, MacramePiece, MacramePlan, SectionPlan } from '#core/craft/macrame/piece.ts';
import { gramsInHand } from '#core/craft/purchase.ts';

type Made = MadeOf<MacramePiece, MacramePlan>;

/** In the order in which one begins. */
export const AMOUNTS: readonly KeyGroup[] = [
  { title: 'Size and rod', keys: ['width', 'height', 'rod.length', 'rod.diameter'] },
  { title: 'Cords', keys: ['cords', 'ends', 'column.<column>.cords', 'column.<column>.cut', 'column.<column>.height'] },
  { title: 'To buy', keys: ['yarn.<role>', 'yarn.<role>.mass', 'yarn.<role>.balls'] },
  { title: 'Knots', keys: ['knots', 'section.<section>.knots', 'section.<section>.height', 'section.<section>.worker', 'section.<section>.cord'] },
  { title: 'Time', keys: ['hours', 'mass'] },
];

const PRACTICE = 'common practice; measure ten of your own knots';
const PATH = 'the path of each knot; measure ten of your own';

function how(formula: string, source: string, trust: Trust, inputs: HowReckoned['inputs'] = []): HowReckoned {
  return { formula, inputs, source, trust };
}

const reckoned = (label: string, quantity: Quantity, by: HowReckoned): Reckoned => ({ label, quantity, how: by });
const length = (label: string, mm: number, use: LengthUse, by: HowReckoned): Reckoned => reckoned(label, lengthOf(mm, use), by);

/** A measured knot beats the rule. */
const knotTrust = ({ takes }: MacramePiece): Trust => (takes?.squareKnot === undefined ? 'class' : 'measured');

/** `last-knot` reads as `Last knot`. */
function title(name: string): string {
  const words = name.replaceAll('-', ' ').trim();
  return words.charAt(0).toUpperCase() + words.slice(1);
}

function fixed({ piece, plan }: Made): Readonly<Record<string, Reckoned | undefined>> {
  const { rod } = plan;
  const { likely, low, high } = plan.hours;
  return {
    width: length('Width', plan.widthMm, 'size', how('ends side by side, and room between the columns', PRACTICE, 'formula')),
    height: length('Length from the rod to the tips', plan.heightMm, 'size', how('all sections of the longest column, and the foot', PRACTICE, knotTrust(piece))),
    cords: reckoned('Cords to cut and fold', countOf(plan.cords, 'cord', 'cords'), how('as the piece says', 'the piece', 'measured')),
    ends: reckoned('Ends that hang', countOf(plan.ends, 'end', 'ends'), how('two of every folded cord', 'the piece', 'measured')),
    knots: reckoned('Knots in all', countOf(plan.knots, 'knot', 'knots'), how('of all sections', PRACTICE, knotTrust(piece))),
    'rod.length': rod && length('Length of the rod', rod.lengthMm, 'least', how('width + what stands out on both sides', PRACTICE, 'formula')),
    'rod.diameter': reckoned(piece.rod.kind === 'rod' ? 'Thickness of the rod' : 'Width of the ring', lengthOf(piece.rod.diameterMm, 'fine'), how('as the piece says', 'the piece', 'measured')),
    hours: reckoned('Hours of work', { kind: 'time', hours: likely, low, high }, how('cutting and hanging + knots + finishing, at a steady hand’s pace', 'common practice', 'class', [{ name: 'knots', value: countOf(plan.knots, 'knot', 'knots') }])),
    mass: reckoned('Mass of the finished piece', massOf(plan.massG), how('all cords, each length × its weight, without margin', 'the thickness of the cord, or its label', 'formula')),
  };
}

function columnAmount({ name = '', cords, cutMm, ruleMm, heightMm, sections }: ColumnPlan, what: string, { piece }: Made): Reckoned | string {
  const label = title(name);
  switch (what) {
    case 'cords':
      return reckoned(`${label}: cords`, countOf(cords, 'cord', 'cords'), how('as the piece says', 'the piece', 'measured'));
    case 'height':
      return length(`${label}: length`, heightMm, 'size', how('its sections under each other', PRACTICE, knotTrust(piece)));
    case 'cut':
      return length(`${label}: each cord`, cutMm, 'cut', how('2 × (what a working end takes in every section + a tail) + the lark’s head', PATH, knotTrust(piece), [
        ...sections.map(({ technique, name: own, workerMm }) => ({ name: own ?? technique, value: lengthOf(workerMm, 'size') })),
        { name: 'by the rule of practice', value: lengthOf(ruleMm, 'size') },
      ]));
    default:
      return `A column has no “${what}”. It has cords, cut and height.`;
  }
}

function sectionAmount({ name = '', technique, knots, heightMm, workerMm, cordMm }: SectionPlan, what: string, { piece }: Made): Reckoned | string {
  const label = title(name);
  const trust = knotTrust(piece);
  switch (what) {
    case 'height':
      return length(`${label}: length`, heightMm, 'size', how(knots === undefined ? 'as the piece says' : 'knots × what each stands high', PRACTICE, knots === undefined ? 'measured' : trust));
    case 'worker':
      return length(`${label}: taken by a working end`, workerMm, 'size', how('knots × cord in one knot', PATH, trust));
    case 'knots':
      return knots === undefined ? `A stretch that is ${technique} has no knots.` : reckoned(`${label}: knots`, countOf(knots, 'knot', 'knots'), how('height ÷ what a knot stands high, rounded, for every group of ends', PRACTICE, trust));
    case 'cord':
      return cordMm === undefined ? 'Only a gathering knot has a cord of its own.' : length(`${label}: its own cord`, cordMm, 'cut', how('turns × once round the bundle + down and up inside + two tails', PATH, 'formula'));
    default:
      return `A section has no “${what}”. It has height, knots, worker and cord.`;
  }
}

function yarnAmount(role: string, what: string | undefined, { piece, plan }: Made): Reckoned | string {
  const yarn = Object.hasOwn(plan.yarns, role) ? plan.yarns[role] : undefined;
  if (yarn === undefined) return `This piece has no cord in the role “${role}”.`;
  const label = piece.yarns[role]?.label ?? role;
  const cut = plan.cut.filter((one) => one.yarn === role).map(({ where, count, lengthMm }) => ({ name: `${where}, ${String(count)} ×`, value: lengthOf(lengthMm, 'size') }));
  const by = how('every cord to cut, with margin', PATH, knotTrust(piece), [...cut, { name: 'without margin', value: lengthOf(yarn.netMm, 'yarn') }]);
  if (what === undefined) return length(label, yarn.withMarginMm, 'yarn', by);
  if (what === 'mass') return reckoned(label, massOf(gramsInHand(yarn)), { ...by, formula: `length × weight of the cord: ${by.formula}` });
  if (what !== 'balls') return `A cord has no “${what}”. It has mass and balls.`;
  if (yarn.balls === undefined) return `How long a ball of “${role}” is has not been said.`;
  return reckoned(`Balls of ${label}`, countOf(yarn.balls, 'ball', 'balls'), how('length with margin ÷ length of a ball, rounded up', 'the label', by.trust));
}

/** The amount of a key, or a sentence why this piece has none. */
export function amountIn(key: string, made: Made): Reckoned | string {
  const known = fixed(made);
  if (Object.hasOwn(known, key)) return known[key] ?? `This piece does not tell “${key}”.`;
  const [subject, name, what, ...more] = key.split('.');
  if (name === undefined || more.length > 0) return `No amount is called “${key}”.`;
  if (subject === 'yarn') return yarnAmount(name, what, made);
  const { columns, foot } = made.plan;
  if (subject === 'column' && what !== undefined) {
    const column = columns.find((one) => one.name === name);
    return column === undefined ? `This piece has no column called “${name}”.` : columnAmount(column, what, made);
  }
  if (subject === 'section' && what !== undefined) {
    const section = [...columns.flatMap(({ sections }) => sections), ...foot].find((one) => one.name === name);
    return section === undefined ? `This piece has no section called “${name}”.` : sectionAmount(section, what, made);
  }
  return `No amount is called “${key}”.`;
}
