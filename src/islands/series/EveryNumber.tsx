/** Every number of the plan for this loom, folded away until it is asked for. */
import { amountOf, type Amount } from '#core/craft/amounts.ts';
import { formatAmount } from '#core/units/format-amount.ts';
import type { Units } from '#core/units/units.ts';
import type { MadeOnLoom } from '#islands/series/trial.ts';
import { Parts } from '#islands/ui/Parts.tsx';

const KEYS = ['width', 'height', 'ends', 'nails', 'spacing', 'wound-width', 'loom.width', 'loom.height', 'warp', 'warp.mass', 'pick', 'rows-per-load', 'spacer.width', 'spacer.height', 'dowel.length', 'dowel.diameter', 'cord', 'mass', 'hours'];

export function EveryNumber({ made: { piece, plan }, units }: { readonly made: MadeOnLoom; readonly units: Units }) {
  const amounts = KEYS.flatMap((key): Amount[] => {
    const amount = amountOf(key, piece, plan);
    return amount.ok ? [amount.value] : [];
  });
  // It may have been opened before the script came.
  return (
    <details className="every-number" suppressHydrationWarning>
      <summary>See every number</summary>
      <dl className="lined">
        {amounts.map((amount) => <div key={amount.key}><dt>{amount.label}{amount.key === 'warp.mass' && ', weight'}</dt><dd className="num"><Parts parts={formatAmount(amount, units)} /></dd></div>)}
      </dl>
    </details>
  );
}
