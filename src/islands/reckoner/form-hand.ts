import type { FieldErrors } from '#core/reckoner/answer-line.ts';
import { FIELD_LABELS } from '#core/reckoner/field-labels.ts';
import { isLengthField, unitOf, unitsOf, type ReckonerField, type ReckonerForm } from '#core/reckoner/reckoner-form.ts';

/** What every group of fields is handed. */
export interface FormHand {
  readonly form: ReckonerForm;
  readonly errors: FieldErrors;
  readonly change: (field: ReckonerField, value: string) => void;
}

/** Properties of a typed field: its value, its unit where it is a length, what is wrong with it. */
export function typedField({ form, errors, change }: FormHand, name: ReckonerField) {
  return {
    name,
    label: FIELD_LABELS[name],
    value: form[name],
    error: errors[name],
    maxLength: 40,
    autoComplete: 'off',
    inputMode: 'decimal' as const,
    unit: isLengthField(name) ? unitOf(name, unitsOf(form)) : undefined,
    onChange: ({ target }: { target: { value: string } }) => { change(name, target.value); },
  };
}

/** Properties of a bar of choices. */
export function chosenField<const V extends string>({ form, change }: FormHand, name: ReckonerField, values: readonly V[]) {
  return {
    name,
    legend: FIELD_LABELS[name],
    value: values.find((value) => value === form[name]) ?? values[0],
    onChoose: (value: V) => { change(name, value); },
  };
}
