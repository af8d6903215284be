import { describedBy, fieldId } from '#islands/ui/field-id.ts';
import { Glyph } from '#islands/ui/Glyph.tsx';
import type { GlyphName } from '#islands/ui/glyphs.ts';
import { Wrong } from '#islands/ui/Wrong.tsx';

interface ChooseProps<V extends string> {
  name: string;
  legend: string;
  options: readonly { value: V; label: string; glyph?: GlyphName | undefined; off?: boolean | undefined }[];
  value: V | undefined;
  onChoose: (value: V) => void;
  hint?: string | undefined;
  error?: string | undefined;
  form?: string | undefined;
  /** The legend is read aloud only: where what is chosen is plain to see. */
  quietLegend?: boolean | undefined;
}

/** One of two to four, set as one bar; arrow keys move the choice. */
export function Choose<V extends string>({ name, legend, options, value, onChoose, hint, error, form, quietLegend = false }: ChooseProps<V>) {
  const id = fieldId(name, form);
  return (
    <fieldset className={error === undefined ? undefined : 'bad'} id={id} aria-describedby={describedBy(id, hint, error)}>
      <legend className={quietLegend ? 'hide' : 'label'}>{legend}</legend>
      {hint !== undefined && <span className="hint" id={`${id}-hint`}>{hint}</span>}
      <div className="choose">
        {options.map((option) => (
          <label key={option.value}>
            <input type="radio" name={`${form ?? ''}${name}`} value={option.value} checked={option.value === value} disabled={option.off} onChange={() => onChoose(option.value)} />
            <span>{option.glyph && <Glyph name={option.glyph} />}{option.label}</span>
          </label>
        ))}
      </div>
      {error !== undefined && <Wrong id={`${id}-wrong`} says={error} />}
    </fieldset>
  );
}
