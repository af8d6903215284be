/** What a part answers: the numbers that matter, loud; the others in rows; and with each the way it was got. */
import { Fragment, memo, useMemo, useState } from 'react';
import { flushSync } from 'react-dom';
import type { AnswerLine, FieldErrors, Section } from '#core/reckoner/answer-line.ts';
import { FIELD_LABELS } from '#core/reckoner/field-labels.ts';
import { formatAmount } from '#core/units/format-amount.ts';
import type { Units } from '#core/units/units.ts';
import { stepsBetween } from '#core/reckoner/step-words.ts';
import { Fold, ShowHow, Step, stepAnchor, type Steps } from '#islands/reckoner/ShowHow.tsx';
import { fieldId } from '#islands/ui/field-id.ts';
import { Findings } from '#islands/ui/Findings.tsx';
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

interface LinesProps {
  readonly lines: readonly AnswerLine[];
  readonly units: Units;
  readonly steps: Steps;
}

function Loud({ lines, units, steps }: LinesProps) {
  return (
    <dl className="figs reckoned">
      {lines.map((line) => (
        <div key={line.label}>
          <dt>{line.label}</dt>
          <dd>
            <span className={line.value.kind === 'words' ? 'says' : undefined}><Value value={line.value} units={units} /></span>
            <ShowHow line={line} steps={steps} />
          </dd>
        </div>
      ))}
    </dl>
  );
}

function Rows({ caption, lines, units, steps }: LinesProps & { readonly caption: string }) {
  return (
    <table className="table dense reckoned mt-5 w-full">
      <caption className="hide">{caption}</caption>
      <thead className="hide"><tr><th scope="col">What</th><th scope="col">How much</th></tr></thead>
      <tbody>
        {lines.map((line) => (
          <tr key={line.label}>
            <th scope="row">{line.label} <ShowHow line={line} steps={steps} /></th>
            <td className="num"><Value value={line.value} units={units} /></td>
          </tr>
        ))}
      </tbody>
    </table>
  );
}

/** Which workings are open, and the way from one to another. */
function useSteps(part: string, section: Section, lazily: boolean) {
  const [opened, setOpened] = useState<ReadonlySet<string>>(new Set());
  // Written down once somebody asks, and again when what was typed changes.
  const book = useMemo(() => {
    let written: ReturnType<NonNullable<Section['workings']>> | undefined;
    return () => (written ??= section.workings?.() ?? []);
  }, [section]);
  const shown = new Set(section.lines.flatMap(({ step }) => (step === undefined ? [] : [step])));
  const toggle = (key: string, open: boolean): void => {
    setOpened((now) => (now.has(key) === open ? now : new Set(open ? [...now, key] : [...now].filter((other) => other !== key))));
  };
  const steps: Steps = {
    part,
    lazily,
    opened,
    toggle,
    goTo: (id) => {
      flushSync(() => { toggle(shown.has(id) ? id : BETWEEN, true); });
      const step = document.getElementById(stepAnchor(part, id));
      step?.scrollIntoView({ block: 'center' });
      step?.focus({ preventScroll: true });
    },
    workingOf: (id) => book().find((working) => working.id === id),
  };
  return { steps, between: () => stepsBetween(book(), shown) };
}

/** Key of the fold that holds what lies between the answers. */
const BETWEEN = 'between';

interface AnswersProps {
  readonly part: string;
  readonly caption: string;
  readonly section: Section;
  readonly errors: FieldErrors;
  readonly units: Units;
  readonly alive: boolean;
}

/** Drawn anew only when its answer is. */
export const Answers = memo(function Answers({ part, caption, section, errors, units, alive }: AnswersProps) {
  const { steps, between } = useSteps(part, section, alive);
  if (section.failed === true) return <p className="font-semibold text-mend">This could not be reckoned, and it is our fault. What you typed is kept, and the other parts answer on.</p>;
  if (section.lines.length === 0) return <Waiting needs={section.needs} errors={errors} />;
  const loud = section.lines.filter((line) => line.loud === true);
  const rest = section.lines.filter((line) => line.loud !== true);
  return (
    <>
      {section.notes.length > 0 && (
        <div className="mb-4 border-l-2 border-ink pl-3">
          <Findings found={section.notes.map(({ code, message }) => ({ code, says: message }))} />
        </div>
      )}
      <Loud lines={loud} units={units} steps={steps} />
      {rest.length > 0 && <Rows caption={caption} lines={rest} units={units} steps={steps} />}
      {section.workings !== undefined && (
        <Fold name={BETWEEN} steps={steps} className="show-how steps-between" summary={<>Steps between<span className="hide"> in “{caption}”</span></>}>
          {() => <div>{between().map((working) => <Step key={working.id} working={working} steps={steps} />)}</div>}
        </Fold>
      )}
    </>
  );
});
