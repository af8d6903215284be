import { BEATS } from '#core/reckoner/read-fields.ts';
import { unitsOf } from '#core/reckoner/reckoner-form.ts';
import { FIELD_LABELS } from '#core/reckoner/field-labels.ts';
import { chosenField, typedField, type FormHand } from '#islands/reckoner/form-hand.ts';
import { Choose } from '#islands/ui/Choose.tsx';
import { Field, Select } from '#islands/ui/Field.tsx';

/** What makes a piece of ends and yarn: height, frame, beat, fringe, dowel. */
export function PieceFields({ hand }: { hand: FormHand }) {
  const { form, change } = hand;
  return (
    <>
      <div className="two">
        <Field {...typedField(hand, 'height')} />
        <Field {...typedField(hand, 'dowel')} />
      </div>
      <div className="two">
        <Field {...typedField(hand, 'frame-height')} />
        <Field {...typedField(hand, 'frame-width')} />
      </div>
      <p className="hint">Dowel and inside width may stay empty.</p>
      <Select name="beat" label={FIELD_LABELS['beat']} value={form.beat} options={BEATS} onChange={({ target }) => { change('beat', target.value); }} />
      {form.beat === 'swatch' || hand.errors.swatch !== undefined ? (
        <Field {...typedField(hand, 'swatch')} unit={unitsOf(form) === 'in' ? 'to the inch' : 'to the cm'} />
      ) : (
        <input type="hidden" name="swatch" value={form.swatch} />
      )}
      <Choose options={[{ value: 'none', label: 'A hem' }, { value: 'rya', label: 'A rya fringe' }]} {...chosenField(hand, 'fringe', ['none', 'rya'])} />
      {form.fringe === 'rya' ? (
        <div className="two">
          <Field {...typedField(hand, 'pile')} />
          <Field {...typedField(hand, 'fringe-strands')} inputMode="numeric" />
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
