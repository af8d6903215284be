import { BEATS } from '#core/reckoner/read-fields.ts';
import { unitsOf } from '#core/reckoner/reckoner-form.ts';
import { chosenField, typedField, type FormHand } from '#islands/reckoner/form-hand.ts';
import { Choose } from '#islands/ui/Choose.tsx';
import { Field, Select } from '#islands/ui/Field.tsx';

/** What makes a piece of ends and yarn: height, frame, beat, fringe, dowel. */
export function PieceFields({ hand }: { hand: FormHand }) {
  const { form, change } = hand;
  return (
    <>
      <div className="two">
        <Field label="Woven height" {...typedField(hand, 'height')} />
        <Field label="Dowel" {...typedField(hand, 'dowel')} />
      </div>
      <div className="two">
        <Field label="Frame, nail to nail" {...typedField(hand, 'frame-height')} />
        <Field label="Inside width" {...typedField(hand, 'frame-width')} />
      </div>
      <p className="hint">Dowel and inside width may stay empty.</p>
      <Select name="beat" label="How rows are beaten" value={form.beat} options={BEATS} onChange={({ target }) => { change('beat', target.value); }} />
      {form.beat === 'swatch' || hand.errors.swatch !== undefined ? (
        <Field label={unitsOf(form) === 'in' ? 'Rows in an inch' : 'Rows in a centimetre'} {...typedField(hand, 'swatch')} />
      ) : (
        <input type="hidden" name="swatch" value={form.swatch} />
      )}
      <Choose legend="At its foot" options={[{ value: 'none', label: 'A hem' }, { value: 'rya', label: 'A rya fringe' }]} {...chosenField(hand, 'fringe', ['none', 'rya'])} />
      {form.fringe === 'rya' ? (
        <div className="two">
          <Field label="Fringe hangs" {...typedField(hand, 'pile')} />
          <Field label="Strands in a knot" {...typedField(hand, 'fringe-strands')} inputMode="numeric" />
        </div>
      ) : (
        <>
          <input type="hidden" name="pile" value={form.pile} />
          <input type="hidden" name="fringe-strands" value={form['fringe-strands']} />
        </>
      )}
    </>
  );
}
