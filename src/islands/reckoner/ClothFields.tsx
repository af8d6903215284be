import { BEATS } from '#core/reckoner/read-fields.ts';
import { chosenField, listedField, typedField, type FormHand } from '#islands/reckoner/form-hand.ts';
import { Kept } from '#islands/reckoner/Kept.tsx';
import { Choose } from '#islands/ui/Choose.tsx';
import { Field, Select } from '#islands/ui/Field.tsx';

/** How high the cloth is and how its rows lie. */
export function ClothFields({ hand }: { hand: FormHand }) {
  const counted = hand.form.beat === 'swatch' || hand.errors.swatch !== undefined;
  return (
    <>
      <Field {...typedField(hand, 'height')} />
      <Select {...listedField(hand, 'beat')} options={BEATS} />
      {counted ? <Field {...typedField(hand, 'swatch')} /> : <Kept hand={hand} fields={['swatch']} />}
      <Choose options={[{ value: 'straight-warp', label: 'The weft alone' }, { value: 'balanced', label: 'Both alike' }]} {...chosenField(hand, 'weave', ['straight-warp', 'balanced'])} />
    </>
  );
}
