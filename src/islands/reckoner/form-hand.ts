import type { FieldErrors } from '#core/reckoner/answer-line.ts';
import { FIELD_LABELS } from '#core/reckoner/field-labels.ts';
import { unitOf } from '#core/reckoner/measured-fields.ts';
import { unitsOf, type ReckonerField, type ReckonerForm } from '#core/reckoner/reckoner-form.ts';

/** What every group of fields is handed. */
export interface FormHand {
  readonly form: ReckonerForm;
  readonly errors: FieldErrors;
  /** The same for as long as the form is there. */
  readonly change: (field: ReckonerField, value: string) => void;
}

/** Properties of a typed field: its value, its unit where it is measured, what is wrong with it. */
export function typedField({ form, errors, change }: FormHand, name: ReckonerField) {
  return {
    name,
    label: FIELD_LABELS[name],
    value: form[name],
    error: errors[name],
    maxLength: 40,
    autoComplete: 'off',
    inputMode: 'decimal' as const,
    unit: unitOf(name, unitsOf(form)),
    onChange: ({ target }: { target: { value: string } }) => { change(name, target.value); },
  };
}

/** Of a field that counts things. */
export function countedField(hand: FormHand, name: ReckonerField, unit?: string) {
  return { ...typedField(hand, name), inputMode: 'numeric' as const, unit };
}

/** Properties of a bar of choices. */
export function chosenField<const V extends string>({ form, errors, change }: FormHand, name: ReckonerField, values: readonly V[]) {
  return {
    name,
    legend: FIELD_LABELS[name],
    value: values.find((value) => value === form[name]) ?? values[0],
    error: errors[name],
    onChoose: (value: V) => { change(name, value); },
  };
}

/** Properties of a list to choose from. */
export function listedField({ form, errors, change }: FormHand, name: ReckonerField) {
  return { name, label: FIELD_LABELS[name], value: form[name], error: errors[name], onChange: ({ target }: { target: { value: string } }) => { change(name, target.value); } };
}
