/** What a part answers: the numbers that matter, loud; the others in rows; and with each the way it was got. */
import { Fragment } from 'react';
import type { AnswerLine, FieldErrors, Section } from '#core/reckoner/answer-line.ts';
import { FIELD_LABELS } from '#core/reckoner/field-labels.ts';
import { formatAmount } from '#core/units/format-amount.ts';
import type { Units } from '#core/units/units.ts';
import { ShowHow } from '#islands/reckoner/ShowHow.tsx';
import { fieldId } from '#islands/ui/field-id.ts';
import { Parts } from '#islands/ui/Parts.tsx';

/** Stands in for an answer that waits, with the way to every field it waits for. */
function Waiting({ needs, errors }: { needs: Section['needs']; errors: FieldErrors }) {
  const fields = needs.filter((field) => errors[field] !== undefined);
  return (
    <p className="quiet">
      This answer waits for {fields.length === 1 ? 'a field that cannot be used yet: ' : 'fields that cannot be used yet: '}
      {fields.map((field, index) => <Fragment key={field}>{index > 0 && ', '}<a href={`#${fieldId(field)}`}>{FIELD_LABELS[field]}</a></Fragment>)}.
    </p>
  );
}

function Value({ value, units }: { value: AnswerLine['value']; units: Units }) {
  return value.kind === 'words' ? value.words : <Parts parts={formatAmount(value, units)} />;
}

function Loud({ lines, units }: { lines: readonly AnswerLine[]; units: Units }) {
  return (
    <dl className="figs reckoned">
      {lines.map((line) => (
        <div key={line.label}>
          <dt>{line.label}</dt>
          <dd>
            <span className={line.value.kind === 'words' ? 'says' : undefined}><Value value={line.value} units={units} /></span>
            <ShowHow line={line} />
          </dd>
        </div>
      ))}
    </dl>
  );
}

function Rows({ caption, lines, units }: { caption: string; lines: readonly AnswerLine[]; units: Units }) {
  return (
    <table className="table dense reckoned mt-5 w-full">
      <caption className="hide">{caption}</caption>
      <thead className="hide"><tr><th scope="col">What</th><th scope="col">How much</th></tr></thead>
      <tbody>
        {lines.map((line) => (
          <tr key={line.label}>
            <th scope="row">{line.label} <ShowHow line={line} /></th>
            <td className="num"><Value value={line.value} units={units} /></td>
          </tr>
        ))}
      </tbody>
    </table>
  );
}

interface AnswersProps {
  readonly caption: string;
  readonly section: Section;
  readonly errors: FieldErrors;
  readonly units: Units;
}

export function Answers({ caption, section, errors, units }: AnswersProps) {
  if (section.failed === true) return <p className="font-semibold text-mend">This could not be reckoned, and it is our fault. What you typed is kept, and the other parts answer on.</p>;
  if (section.lines.length === 0) return <Waiting needs={section.needs} errors={errors} />;
  const loud = section.lines.filter((line) => line.loud === true);
  const rest = section.lines.filter((line) => line.loud !== true);
  return (
    <>
      {section.notes.length > 0 && (
        <ul className="mb-4 grid gap-2">
          {section.notes.map((note) => <li key={note} className="border-l-2 border-ink pl-3">{note}</li>)}
        </ul>
      )}
      <Loud lines={loud} units={units} />
      {rest.length > 0 && <Rows caption={caption} lines={rest} units={units} />}
    </>
  );
}
