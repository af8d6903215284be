import { FIELD_LABELS } from '#core/reckoner/field-labels.ts';
import { unitOf } from '#core/reckoner/measured-fields.ts';
import { unitsOf, type ReckonerField, type ReckonerForm } from '#core/reckoner/reckoner-form.ts';
import { YARN_WAYS } from '#core/reckoner/read-fields.ts';

const worth = (form: ReckonerForm, field: ReckonerField): string => {
  if (field === 'yarn-by') return YARN_WAYS.find(({ value }) => value === form['yarn-by'])?.label ?? '';
  return [form[field], unitOf(field, unitsOf(form))].filter(Boolean).join(' ');
};

/** What a part was asked, for paper, where no fields are. */
export function Typed({ form, fields }: { form: ReckonerForm; fields: readonly ReckonerField[] }) {
  const told = fields.filter((field) => form[field].trim() !== '');
  return <p className="typed only-print" aria-hidden="true">{told.map((field) => `${FIELD_LABELS[field]}: ${worth(form, field)}`).join(' · ')}</p>;
}
