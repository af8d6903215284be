import { isPlainNumber, YARN_WAYS } from '#core/reckoner/read-fields.ts';
import { chosenField, countedField, listedField, typedField, type FormHand } from '#islands/reckoner/form-hand.ts';
import { Choose } from '#islands/ui/Choose.tsx';
import { Field, Select } from '#islands/ui/Field.tsx';

/** What a label says of a yarn, and what can be measured on it. */
export function YarnFields({ hand }: { hand: FormHand }) {
  const plain = isPlainNumber(hand.form['yarn-by']);
  return (
    <>
      <Select {...listedField(hand, 'yarn-by')} options={YARN_WAYS} />
      <Field hint={plain ? undefined : 'As it stands there, such as 16 or 8/2.'} {...typedField(hand, 'yarn')} inputMode={plain ? 'decimal' : 'text'} />
      <div className="two">
        <Field {...typedField(hand, 'ball-length')} />
        <Field {...typedField(hand, 'ball-weight')} />
      </div>
      <div className="two">
        <Field {...typedField(hand, 'wraps')} />
        <Field {...countedField(hand, 'strands')} />
      </div>
      <p className="hint">Ball and wraps may stay empty. Wraps you count beat any rule.</p>
      <Choose
        options={[{ value: 'soft', label: 'Soft, woollen' }, { value: 'firm', label: 'Firm, smooth' }]}
        {...chosenField(hand, 'hand', ['soft', 'firm'])}
      />
    </>
  );
}
