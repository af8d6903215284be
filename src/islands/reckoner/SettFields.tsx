import { LOOM_WORDS } from '#core/craft/looms/loom-words.ts';
import { LOOM_KIND_NAMES, LOOM_KINDS } from '#core/craft/looms/looms.ts';
import { chosenField, countedField, listedField, typedField, type FormHand } from '#islands/reckoner/form-hand.ts';
import { Kept } from '#islands/reckoner/Kept.tsx';
import { Choose } from '#islands/ui/Choose.tsx';
import { Field, Select } from '#islands/ui/Field.tsx';

const LOOMS = LOOM_KIND_NAMES.map((value) => ({ value, label: LOOM_WORDS[value].label }));

/** Width, loom and warp: what decides the number of ends. */
export function SettFields({ hand }: { hand: FormHand }) {
  const kind = LOOM_KINDS[LOOM_KIND_NAMES.find((name) => name === hand.form['loom-kind']) ?? 'nailed-frame'];
  return (
    <>
      <Select {...listedField(hand, 'loom-kind')} options={LOOMS} />
      <div className="two">
        <Field {...typedField(hand, 'width')} />
        <Field {...typedField(hand, 'nails')} />
      </div>
      {kind.rows === 2
        ? <Choose options={[{ value: 'both', label: 'Both rows' }, { value: 'inner', label: 'The inner row' }]} {...chosenField(hand, 'nail-rows', ['both', 'inner'])} />
        : <Kept hand={hand} fields={['nail-rows']} />}
      {kind.warpings.length > 1
        ? <Choose options={[{ value: 'zigzag', label: 'Round every nail' }, { value: 'two-nail', label: 'Along two nails' }]} {...chosenField(hand, 'warping', ['zigzag', 'two-nail'])} />
        : <Kept hand={hand} fields={['warping']} />}
      <Choose options={[{ value: '1', label: 'Singly' }, { value: '2', label: 'In pairs' }]} {...chosenField(hand, 'together', ['1', '2'])} />
      <Choose
        options={[{ value: 'any', label: 'Any' }, { value: 'even', label: 'Even' }, { value: 'odd', label: 'Odd' }]}
        {...chosenField(hand, 'parity', ['any', 'even', 'odd'])}
      />
      <Field {...countedField(hand, 'every')} hint="1 takes each one, 2 every second one." />
      <div className="two">
        <Field {...typedField(hand, 'warp-tex')} unit="tex" />
        <Field {...typedField(hand, 'draw-in')} unit="%" />
      </div>
    </>
  );
}
