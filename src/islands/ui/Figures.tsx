import { Parts } from '#islands/ui/Parts.tsx';
import type { AmountPart } from '#core/units/format-amount.ts';

export interface Figure {
  label: string;
  value: string | readonly AmountPart[];
  /** Small, after the value. */
  unit?: string | undefined;
  /** Small, under it: what the pattern has where this differs. */
  was?: string | undefined;
}

/** A few figures that stand alone, each against its warp. */
export function Figures({ items }: { items: readonly Figure[] }) {
  return (
    <dl className="figs">
      {items.map(({ label, value, unit, was }) => (
        <div key={label}>
          <dt>{label}</dt>
          <dd>
            {typeof value === 'string' ? value : <Parts parts={value} />}
            {unit !== undefined && <small> {unit}</small>}
            {was !== undefined && <span className="was">{was}</span>}
          </dd>
        </div>
      ))}
    </dl>
  );
}
