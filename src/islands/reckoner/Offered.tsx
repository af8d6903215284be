import { memo } from 'react';
import { LOOM_KIND_NAMES, LOOM_KINDS } from '#core/craft/looms/looms.ts';
import type { OfferedSpacing } from '#core/craft/offered-spacings.ts';
import type { SpacingAdvice } from '#core/craft/sett.ts';
import { formatAmount } from '#core/units/format-amount.ts';
import type { Units } from '#core/units/units.ts';
import { Flag } from '#islands/ui/Flag.tsx';
import { Parts } from '#islands/ui/Parts.tsx';

const ADVICE: Readonly<Record<SpacingAdvice, string>> = { suits: 'Suits', 'too-thick': 'Too thick', 'too-thin': 'Too thin by itself' };
const ORDINALS = ['Every', 'Every second', 'Every third', 'Every fourth', 'Every fifth', 'Every sixth', 'Every seventh', 'Every eighth'];

interface OfferedProps {
  readonly spacings: readonly OfferedSpacing[];
  /** As it was chosen. */
  readonly kind: string;
  readonly units: Units;
}

/** The spacings a loom has, and what the yarn of the page does at each: there are no others. */
export const Offered = memo(function Offered({ spacings, kind, units }: OfferedProps) {
  const { one } = LOOM_KINDS[LOOM_KIND_NAMES.find((name) => name === kind) ?? 'nailed-frame'].holder;
  return (
    <div className="scrolls mt-5">
      <table className="table dense offered w-full">
        <caption className="h4">What this loom offers your yarn</caption>
        <thead><tr><th scope="col">Ends stand at</th><th scope="col" className="num">Apart</th><th scope="col">Your yarn</th><th scope="col" className="num">Strands to take</th></tr></thead>
        <tbody>
          {spacings.slice(0, ORDINALS.length).map(({ everyNthNail, spacingMm, advice, strands }) => (
            <tr key={everyNthNail}>
              <th scope="row" className="font-normal">{ORDINALS[everyNthNail - 1]} {one}</th>
              <td className="num"><Parts parts={formatAmount({ kind: 'length', mm: spacingMm, use: 'fine' }, units)} /></td>
              <td>{advice === 'suits' ? <Flag kind="on" small>{ADVICE[advice]}</Flag> : ADVICE[advice]}</td>
              <td className="num">{strands ?? 'none'}</td>
            </tr>
          ))}
        </tbody>
      </table>
    </div>
  );
});
