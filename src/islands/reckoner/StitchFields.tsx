import { countedField, typedField, type FormHand } from '#islands/reckoner/form-hand.ts';
import { Field } from '#islands/ui/Field.tsx';

export function SoumakFields({ hand }: { hand: FormHand }) {
  return (
    <>
      <div className="two">
        <Field {...countedField(hand, 'over', 'ends')} />
        <Field {...countedField(hand, 'back', 'ends')} />
      </div>
      <div className="two">
        <Field {...countedField(hand, 'soumak-rows')} />
        <Field {...countedField(hand, 'between', 'rows')} />
      </div>
    </>
  );
}

export function RyaFields({ hand }: { hand: FormHand }) {
  return (
    <>
      <div className="two">
        <Field {...typedField(hand, 'pile')} />
        <Field {...typedField(hand, 'trim')} />
      </div>
      <div className="two">
        <Field {...countedField(hand, 'knot-strands')} />
        <Field {...countedField(hand, 'leg-ends')} />
      </div>
      <div className="two">
        <Field {...countedField(hand, 'rya-rows')} />
        <Field {...countedField(hand, 'edge-ends', 'ends')} />
      </div>
      <Field {...typedField(hand, 'card')} />
    </>
  );
}

export function RodFields({ hand }: { hand: FormHand }) {
  return (
    <>
      <Field {...typedField(hand, 'rod-load')} />
      <div className="two">
        <Field {...typedField(hand, 'rod-length')} />
        <Field {...typedField(hand, 'rise')} hint="over the rod" />
      </div>
    </>
  );
}
