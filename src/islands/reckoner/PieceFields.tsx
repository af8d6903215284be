import { chosenField, typedField, type FormHand } from '#islands/reckoner/form-hand.ts';
import { Choose } from '#islands/ui/Choose.tsx';
import { Field } from '#islands/ui/Field.tsx';

/** What makes a piece of yarn, ends and rows: the frame, its foot, its rod. */
export function PieceFields({ hand }: { hand: FormHand }) {
  return (
    <>
      <div className="two">
        <Field {...typedField(hand, 'frame-height')} />
        <Field {...typedField(hand, 'frame-width')} />
      </div>
      <Choose options={[{ value: 'none', label: 'A hem' }, { value: 'rya', label: 'A rya fringe' }]} {...chosenField(hand, 'fringe', ['none', 'rya'])} />
      <Field {...typedField(hand, 'dowel')} />
      <p className="hint">Inside width and rod may stay empty. The fringe is tied as in the part on rya.</p>
    </>
  );
}
