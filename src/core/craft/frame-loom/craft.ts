/** Weaving on a nailed frame: the first craft of the house. */
import { lengthOf } from '#core/craft/amounts/amount-types.ts';
import { clothPieceOf } from '#core/craft/cloth/cloth-piece-of.ts';
import type { Craft, MadeOf } from '#core/craft/craft.ts';
import { changePiece } from '#core/craft/fitting/change-piece.ts';
import { tellChanges } from '#core/craft/fitting/tell-changes.ts';
import { AMOUNTS, amountIn } from '#core/craft/frame-loom/amounts.ts';
import { EXAMPLE } from '#core/craft/frame-loom/example.ts';
import { materials } from '#core/craft/frame-loom/materials.ts';
import { planFrameLoom } from '#core/craft/frame-loom/plan-frame-loom.ts';
import { readPieceParts } from '#core/craft/frame-loom/read-piece.ts';
import type { FrameLoomPiece } from '#core/craft/piece.ts';
import type { FrameLoomPlan } from '#core/craft/plan-types.ts';
import { amountText } from '#core/units/format-amount.ts';
import type { Units } from '#core/units/units.ts';

type Made = MadeOf<FrameLoomPiece, FrameLoomPlan>;

function roleOfKey(key: string, piece: FrameLoomPiece): string | undefined {
  const [subject, name, what] = key.split('.');
  if (subject === 'yarn') return name;
  return subject === 'band' && what === 'yarn' ? piece.bands.find((band) => band.name === name)?.yarn : undefined;
}

const size = (mm: number, units: Units): string => amountText(lengthOf(mm, 'size'), units);

/** `36 cm inside, nails every 8 mm, doubled ends: 76 ends, woven 30 cm wide` */
function summary({ piece, plan }: Made, units: Units): string {
  const inside = piece.loom.insideWidthMm === undefined ? '' : `${size(piece.loom.insideWidthMm, units)} inside, `;
  const nth = piece.loom.everyNthNail ?? 1;
  const nails = `nails every ${amountText(lengthOf(piece.loom.nailPitchMm, 'fine'), units)}${nth === 1 ? '' : `, one in ${nth} used`}`;
  return `${inside}${nails}, ${piece.warp.endsTogether === 2 ? 'doubled' : 'single'} ends: ${plan.ends.count} ends, woven ${size(piece.size.widthMm, units)} wide`;
}

export const FRAME_LOOM: Craft<FrameLoomPiece, FrameLoomPlan> = {
  words: {
    label: 'Weaving',
    hours: 'at the loom',
    needs: 'Frame loom',
    material: 'Yarn',
    allMaterial: 'Warp and weft together',
    made: 'woven',
    search: 'weaving frame loom',
  },
  cautions: [
    {
      title: 'If you build the frame yourself',
      says: 'Sawing and nailing: wear eye protection, clamp the wood, sand what the warp runs over. Keep loose warp and cords away from small children. What your tools’ makers and your local rules say comes first; where you are not sure, ask somebody trained.',
      more: { href: '/handbook/safety-at-the-loom', label: 'The handbook says more' },
    },
  ],
  example: EXAMPLE,
  plan: planFrameLoom,
  read: readPieceParts,
  amounts: AMOUNTS,
  ownNames: ({ yarns, bands }) => ({ role: Object.keys(yarns), name: bands.flatMap(({ name }) => (name === undefined ? [] : [name])) }),
  amount: amountIn,
  materials,
  roleOfKey,
  draw: ({ piece, plan }, title) => clothPieceOf(piece, plan, title),
  change: changePiece,
  tellChanges: (before, after, units, { way }) => tellChanges(before, after, units, way?.kind === 'fewer-bands' ? way.leaveOut : []),
  summary,
  size: ({ piece: { size: { widthMm, heightMm } } }, units) => `${size(widthMm, units)} wide and ${size(heightMm, units)} high, without its fringe`,
  leastInsideMm: ({ plan }) => plan.loom.insideWidthNeededMm,
};
