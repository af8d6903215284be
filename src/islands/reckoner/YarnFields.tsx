import { YARN_WAYS } from '#core/reckoner/read-fields.ts';
import { FIELD_LABELS } from '#core/reckoner/field-labels.ts';
import { chosenField, typedField, type FormHand } from '#islands/reckoner/form-hand.ts';
import { Choose } from '#islands/ui/Choose.tsx';
import { Field, Select } from '#islands/ui/Field.tsx';

/** What a label says of a yarn, and what can be measured on it. */
export function YarnFields({ hand }: { hand: FormHand }) {
  const { form, change } = hand;
  const isPlainNumber = ['metres', 'yards', 'tex'].includes(form['yarn-by']);
  return (
    <>
      <Select name="yarn-by" label={FIELD_LABELS['yarn-by']} value={form['yarn-by']} options={YARN_WAYS} onChange={({ target }) => { change('yarn-by', target.value); }} />
      <Field hint={isPlainNumber ? undefined : 'As it stands there, such as 16 or 8/2.'} {...typedField(hand, 'yarn')} inputMode={isPlainNumber ? 'decimal' : 'text'} />
      <div className="two">
        <Field {...typedField(hand, 'ball-metres')} unit="m" />
        <Field {...typedField(hand, 'ball-grams')} unit="g" />
      </div>
      <div className="two">
        <Field {...typedField(hand, 'wraps')} />
        <Field {...typedField(hand, 'strands')} inputMode="numeric" />
      </div>
      <p className="hint">Ball and wraps may stay empty. Wraps you count beat any rule.</p>
      <Choose
        options={[{ value: 'soft', label: 'Soft, woollen' }, { value: 'firm', label: 'Firm, smooth' }]}
        {...chosenField(hand, 'hand', ['soft', 'firm'])}
      />
    </>
  );
}
