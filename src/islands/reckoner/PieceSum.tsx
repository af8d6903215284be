import { useMemo } from 'react';
import { amountOf } from '#core/craft/amounts.ts';
import { clothPieceOf } from '#core/craft/cloth/cloth-piece-of.ts';
import type { PieceSection } from '#core/reckoner/answer-piece.ts';
import { formatAmount, formatHours, hoursRange } from '#core/units/format-amount.ts';
import type { Units } from '#core/units/units.ts';
import { Cloth } from '#islands/cloth/Cloth.tsx';
import { Figures } from '#islands/ui/Figures.tsx';
import { Flag } from '#islands/ui/Flag.tsx';

const KEYS = ['ends', 'warp', 'yarn.ground'] as const;
/** Short words, where the table below has the full ones. */
const LABELS: Readonly<Record<(typeof KEYS)[number], string>> = { ends: 'Ends', warp: 'Warp', 'yarn.ground': 'Weft yarn' };

/** The piece as it will hang, that it fits, and its largest numbers. */
export function PieceSum({ piece: { made }, units }: { piece: PieceSection; units: Units }) {
  const cloth = useMemo(() => made && clothPieceOf(made.piece, made.plan, 'This piece'), [made]);
  if (made === undefined || cloth === undefined) return null;
  const { likely, low, high } = made.plan.hours;
  const amounts = KEYS.flatMap((key) => {
    const amount = amountOf(key, made.piece, made.plan);
    return amount.ok ? [{ label: LABELS[key], value: formatAmount(amount.value, units) }] : [];
  });
  const items = [...amounts, { label: 'At the loom', value: formatHours(likely), was: `${hoursRange(low, high)} as hands differ` }];
  return (
    <div className="mb-5 grid items-start gap-5 hand:grid-cols-[220px_minmax(0,1fr)]">
      <Cloth piece={cloth} view={{ id: 'reckoned', as: 'hanging', width: 220, units }} />
      <div className="grid gap-4">
        <p><Flag kind="on">It fits this frame</Flag></p>
        <Figures items={items} />
      </div>
    </div>
  );
}
