import type { CountedBand } from '#core/following/row-count.ts';
import { Button } from '#islands/ui/Button.tsx';
import { Field } from '#islands/ui/Field.tsx';

export interface RefusedRows {
  readonly typed: string;
  readonly says: string;
}

interface RowFormProps {
  series: string;
  part: number;
  step: number;
  action: string;
  band: CountedBand;
  rows: number;
  refused?: RefusedRows | undefined;
}

/** The row counter before its script, or without: a number to say, and a button for one row more. */
export function RowForm({ series, part, step, action, band, rows, refused }: RowFormProps) {
  return (
    <section className="rows" id="rows" aria-label="Row counter">
      <form method="post" action={action} className="rows-form">
        <input type="hidden" name="series" value={series} />
        <input type="hidden" name="part" value={part} />
        <input type="hidden" name="step" value={step} />
        <input type="hidden" name="band" value={band.key} />
        <Field name="rows" label={`Rows woven of ${band.words}`} hint={band.rows === 1 ? 'By the plan 1.' : `By the plan ${String(band.rows)}.`} error={refused?.says} inputMode="numeric" maxLength={7} defaultValue={refused?.typed ?? rows} />
        <Button type="submit">Keep</Button>
        <Button type="submit" name="rows" value={rows + 1}>One row more</Button>
      </form>
    </section>
  );
}
