import { chosenField, typedField, type FormHand } from '#islands/reckoner/form-hand.ts';
import { Choose } from '#islands/ui/Choose.tsx';
import { Field } from '#islands/ui/Field.tsx';

/** Width, nails and warp: what decides the number of ends. */
export function LoomFields({ hand }: { hand: FormHand }) {
  return (
    <>
      <div className="two">
        <Field label="Finished width" {...typedField(hand, 'width')} />
        <Field label="From nail to nail" {...typedField(hand, 'nails')} />
      </div>
      <Choose
        legend="The warp goes"
        options={[{ value: 'zigzag', label: 'Round every nail' }, { value: 'two-nail', label: 'Along two nails' }]}
        {...chosenField(hand, 'warping', ['zigzag', 'two-nail'])}
      />
      <Choose legend="Ends worked" options={[{ value: '1', label: 'Singly' }, { value: '2', label: 'In pairs' }]} {...chosenField(hand, 'together', ['1', '2'])} />
      <Choose
        legend="Number of ends"
        options={[{ value: 'any', label: 'Any' }, { value: 'even', label: 'Even' }, { value: 'odd', label: 'Odd' }]}
        {...chosenField(hand, 'parity', ['any', 'even', 'odd'])}
      />
      <div className="two">
        <Field label="Warp yarn" {...typedField(hand, 'warp-tex')} unit="tex" />
        <Field label="Draws in by" {...typedField(hand, 'draw-in')} unit="%" />
      </div>
    </>
  );
}
