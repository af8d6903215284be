import { SHAPES } from '#core/reckoner/answer-shape.ts';
import type { ReckonerField } from '#core/reckoner/reckoner-form.ts';
import { chosenField, countedField, listedField, typedField, type FormHand } from '#islands/reckoner/form-hand.ts';
import { Kept } from '#islands/reckoner/Kept.tsx';
import { Choose } from '#islands/ui/Choose.tsx';
import { Field, Select } from '#islands/ui/Field.tsx';

/** Fields of each shape; the others are kept. */
const FIELDS = {
  triangle: ['base', 'shape-height', 'sides'],
  rectangle: ['base', 'shape-height', 'sides'],
  circle: ['radius', 'sides'],
  slope: ['step-ends', 'step-rows'],
} as const satisfies Record<string, readonly ReckonerField[]>;

const ALL = [...new Set(Object.values(FIELDS).flat())];

function Measures({ hand, shape }: { hand: FormHand; shape: keyof typeof FIELDS }) {
  if (shape === 'circle') return <Field {...typedField(hand, 'radius')} />;
  if (shape === 'slope') {
    return (
      <div className="two">
        <Field {...countedField(hand, 'step-ends', 'ends')} />
        <Field {...countedField(hand, 'step-rows', 'rows')} />
      </div>
    );
  }
  return (
    <div className="two">
      <Field {...typedField(hand, 'base')} />
      <Field {...typedField(hand, 'shape-height')} />
    </div>
  );
}

export function ShapeFields({ hand }: { hand: FormHand }) {
  const shape = SHAPES.find(({ value }) => value === hand.form.shape)?.value ?? 'triangle';
  const shown: readonly ReckonerField[] = FIELDS[shape];
  return (
    <>
      <Select {...listedField(hand, 'shape')} options={SHAPES} />
      <Measures hand={hand} shape={shape} />
      {shape !== 'slope' && <Choose options={[{ value: 'alike', label: 'Alike' }, { value: 'freely', label: 'Freely' }]} {...chosenField(hand, 'sides', ['alike', 'freely'])} />}
      <Kept hand={hand} fields={ALL.filter((field) => !shown.includes(field))} />
    </>
  );
}
