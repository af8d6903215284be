import { Fragment } from 'react';
import type { AnswerLine, FieldErrors, Section } from '#core/reckoner/answer-line.ts';
import { FIELD_LABELS } from '#core/reckoner/field-labels.ts';
import { RECKONER_FIELDS } from '#core/reckoner/reckoner-form.ts';
import { formatAmount } from '#core/units/format-amount.ts';
import type { Units } from '#core/units/units.ts';
import { fieldId } from '#islands/ui/field-id.ts';
import { Parts } from '#islands/ui/Parts.tsx';

/** How sure an answer is, as short as a column needs it. */
const TRUST_WORDS: Readonly<Record<AnswerLine['trust'], string>> = {
  counted: 'Exact', measured: 'Measured', label: 'From the label', formula: 'Reckoned', class: 'From a table, roughly', practice: 'By custom, roughly',
};

function Value({ value, units }: { value: AnswerLine['value']; units: Units }) {
  return value.kind === 'words' ? value.words : <Parts parts={formatAmount(value, units)} />;
}

/** Stands in for an answer that waits, with the way to every field it may wait for. */
function Waiting({ errors }: { errors: FieldErrors }) {
  const fields = RECKONER_FIELDS.filter((field) => errors[field] !== undefined);
  return (
    <p className="quiet">
      This answer waits for {fields.length === 1 ? 'a field that cannot be used yet: ' : 'fields that cannot be used yet: '}
      {fields.map((field, index) => <Fragment key={field}>{index > 0 && ', '}<a href={`#${fieldId(field)}`}>{FIELD_LABELS[field]}</a></Fragment>)}.
    </p>
  );
}

interface AnswerTableProps {
  readonly caption: string;
  readonly section: Section;
  readonly errors: FieldErrors;
  readonly units: Units;
}

/** Amounts, each with the way it was got, and what is worth knowing about them. */
export function AnswerTable({ caption, section, errors, units }: AnswerTableProps) {
  if (section.lines.length === 0) return <Waiting errors={errors} />;
  return (
    <>
      {section.notes.length > 0 && (
        <ul className="mb-4 grid gap-2">
          {section.notes.map((note) => <li key={note} className="border-l-2 border-ink pl-3">{note}</li>)}
        </ul>
      )}
      <table className="table dense w-full">
        <caption className="hide">{caption}</caption>
        <thead>
          <tr><th scope="col">Amount, and how it was got</th><th scope="col" className="num">For you</th></tr>
        </thead>
        <tbody>
          {section.lines.map(({ label, value, how, trust }) => (
            <tr key={label}>
              <th scope="row">
                <span className="grid gap-x-5 desk:grid-cols-[15em_minmax(0,1fr)]">
                  {label}
                  <span className="small quiet font-normal">{TRUST_WORDS[trust]}: {how}</span>
                </span>
              </th>
              <td className="num font-semibold"><Value value={value} units={units} /></td>
            </tr>
          ))}
        </tbody>
      </table>
    </>
  );
}
