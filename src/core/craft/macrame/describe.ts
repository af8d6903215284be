/** A knotted piece in words, for whoever does not see it. */
import { lengthOf } from '#core/craft/amounts/amount-types.ts';
import type { MadeOf } from '#core/craft/craft.ts';
import type { ColumnPlan, MacramePiece, MacramePlan, SectionPlan } from '#core/craft/macrame/piece.ts';
import { amountText } from '#core/units/format-amount.ts';
import type { Units } from '#core/units/units.ts';

const counted = (count: number, word: string): string => (count === 1 ? `1 ${word}` : `${String(count)} ${word}s`);

function sectionWords({ technique, knots = 0, heightMm }: SectionPlan, units: Units): string {
  const long = amountText(lengthOf(heightMm, 'size'), units);
  switch (technique) {
    case 'square-knots':
      return counted(knots, 'square knot');
    case 'alternating':
      return `a net of ${counted(knots, 'square knot')}, ${long}`;
    case 'half-hitches':
      return `a rib of ${counted(knots, 'double half hitch').replace('hitchs', 'hitches')}`;
    case 'gathering':
      return 'a gathering knot';
    case 'plain':
      return `${long} of plain cord`;
    case 'fringe':
      return `${long} of loose ends`;
  }
}

const listed = (sections: readonly SectionPlan[], units: Units): string => sections.map((section) => sectionWords(section, units)).join(', ');

function columnWords({ cords, sections, index, name }: ColumnPlan, units: Units): string {
  return `${name ?? `column ${String(index + 1)}`} of ${counted(cords, 'folded cord')}: ${listed(sections, units)}`;
}

function describe({ piece, plan }: MadeOf<MacramePiece, MacramePlan>, units: Units): string {
  const from = piece.rod.kind === 'ring' ? 'a ring' : 'a rod';
  const columns = plan.columns.slice(0, 12).map((column) => columnWords(column, units)).join('; ');
  const more = plan.columns.length > 12 ? `; and ${String(plan.columns.length - 12)} columns more` : '';
  const foot = plan.foot.length === 0 ? '' : `. Below them all ends together: ${listed(plan.foot, units)}`;
  return `${counted(plan.cords, 'cord')} on ${from}, ${amountText(lengthOf(plan.heightMm, 'size'), units)} long. From the top: ${columns}${more}${foot}.`;
}

export function describeMacrame(made: MadeOf<MacramePiece, MacramePlan>): Readonly<Record<Units, string>> {
  return { cm: describe(made, 'cm'), in: describe(made, 'in') };
}
