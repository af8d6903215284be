import { chosenField, typedField, type FormHand } from '#islands/reckoner/form-hand.ts';
import { Choose } from '#islands/ui/Choose.tsx';
import { Field } from '#islands/ui/Field.tsx';

/** Width, nails and warp: what decides the number of ends. */
export function LoomFields({ hand }: { hand: FormHand }) {
  return (
    <>
      <div className="two">
        <Field {...typedField(hand, 'width')} />
        <Field {...typedField(hand, 'nails')} />
      </div>
      <Choose
        options={[{ value: 'zigzag', label: 'Round every nail' }, { value: 'two-nail', label: 'Along two nails' }]}
        {...chosenField(hand, 'warping', ['zigzag', 'two-nail'])}
      />
      <Choose options={[{ value: '1', label: 'Singly' }, { value: '2', label: 'In pairs' }]} {...chosenField(hand, 'together', ['1', '2'])} />
      <Choose
        options={[{ value: 'any', label: 'Any' }, { value: 'even', label: 'Even' }, { value: 'odd', label: 'Odd' }]}
        {...chosenField(hand, 'parity', ['any', 'even', 'odd'])}
      />
      <div className="two">
        <Field {...typedField(hand, 'warp-tex')} unit="tex" />
        <Field {...typedField(hand, 'draw-in')} unit="%" />
      </div>
    </>
  );
}
