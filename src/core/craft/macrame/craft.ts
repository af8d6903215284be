/** Knotting cords: macramé. */
import { lengthOf } from '#core/craft/amounts/amount-types.ts';
import type { Craft, MadeOf, Material } from '#core/craft/craft.ts';
import { AMOUNTS, amountIn } from '#core/craft/macrame/amounts.ts';
import { CORD_CAUTIONS } from '#core/craft/macrame/cautions.ts';
import { drawMacrame } from '#core/craft/macrame/draw.ts';
import { EXAMPLE } from '#core/craft/macrame/example.ts';
import type { MyPiece } from '#core/craft/fitting/my-piece.ts';
import type { Cord, MacramePiece, MacramePlan } from '#core/craft/macrame/piece.ts';
import { planMacrame } from '#core/craft/macrame/plan-macrame.ts';
import { readPiece } from '#core/craft/macrame/read-piece.ts';
import { gramsInHand } from '#core/craft/purchase.ts';
import { present } from '#core/craft/reading/present.ts';
import { amountText } from '#core/units/format-amount.ts';
import type { Units } from '#core/units/units.ts';

type Made = MadeOf<MacramePiece, MacramePlan>;

function materials({ piece, plan }: Made): Material[] {
  return Object.entries(piece.yarns).flatMap(([role, cord]): Material[] => {
    const planned = plan.yarns[role];
    if (planned === undefined) return [];
    return [{ key: `yarn.${role}`, role, name: role, lengthMm: planned.withMarginMm, grams: gramsInHand(planned), ...present({ label: cord.label, colour: cord.colour, balls: planned.balls }) }];
  });
}

const size = (mm: number, units: Units): string => amountText(lengthOf(mm, 'size'), units);
const names = (list: readonly { readonly name?: string }[]): string[] => list.flatMap(({ name }) => (name === undefined ? [] : [name]));

/** Her own cord in a role: told by its grist like any yarn; the pattern's colour where she says none. */
function ownCords(pattern: MacramePiece['yarns'], mine: Readonly<Record<string, Cord>>): MacramePiece['yarns'] {
  return Object.fromEntries(Object.entries(pattern).map(([role, cord]) => {
    const own = Object.hasOwn(mine, role) ? mine[role] : undefined;
    return [role, own === undefined ? cord : { ...present({ colour: cord.colour }), ...own }];
  }));
}

function change(pattern: MacramePiece, { yarns, cords, rod }: MyPiece): MacramePiece {
  if (yarns === undefined && cords === undefined && rod === undefined) return pattern;
  return { ...pattern, yarns: ownCords(pattern.yarns, { ...yarns, ...cords }), rod: rod === undefined ? pattern.rod : { ...pattern.rod, diameterMm: rod.diameterMm } };
}

function tellChanges(before: Made, after: Made, units: Units): string[] {
  const yarns = Object.entries(after.piece.yarns).flatMap(([role, cord]) => (cord === before.piece.yarns[role] ? [] : [`${cord.label ?? 'Your own cord'} is the ${role} cord.`]));
  const [was, is] = [size(before.plan.heightMm, units), size(after.plan.heightMm, units)];
  const longer = is === was ? [] : [`The piece comes out ${is} long instead of ${was}.`];
  const { rod } = after.piece;
  const hung = rod.diameterMm === before.piece.rod.diameterMm ? [] : [`It hangs from a ${rod.kind} ${amountText(lengthOf(rod.diameterMm, 'fine'), units)} ${rod.kind === 'rod' ? 'thick' : 'wide'}.`];
  return [...yarns, ...hung, ...longer];
}

export const MACRAME: Craft<MacramePiece, MacramePlan> = {
  words: {
    label: 'Macramé',
    hours: 'of knotting',
    needs: 'No loom, a rail to hang from',
    material: 'Cord',
    allMaterial: 'All cords together',
    made: 'knotted',
    search: 'macramé knotting',
  },
  cautions: CORD_CAUTIONS,
  example: EXAMPLE,
  plan: planMacrame,
  read: readPiece,
  amounts: AMOUNTS,
  ownNames: ({ yarns, columns, foot = [] }) => ({
    role: Object.keys(yarns),
    column: names(columns),
    section: names([...columns.flatMap(({ sections }) => sections), ...foot]),
  }),
  amount: amountIn,
  materials,
  roleOfKey: (key) => (key.startsWith('yarn.') ? key.split('.')[1] : undefined),
  draw: drawMacrame,
  change,
  tellChanges,
  summary: ({ piece, plan }, units) => `${String(plan.cords)} cords on a ${piece.rod.kind}, ${size(plan.heightMm, units)} long`,
  size: ({ plan }, units) => `${size(plan.heightMm, units)} long, about ${size(plan.widthMm, units)} wide where it is knotted`,
  leastInsideMm: () => undefined,
};
