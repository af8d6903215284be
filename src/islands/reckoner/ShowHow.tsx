/**
 * How an answer was got: its formula, what went in and where each of that comes from, the
 * source, how far to trust it. Without script all of it stands there, folded; alive only
 * what is open is drawn, so that typing stays quick.
 */
import type { MouseEvent, ReactNode } from 'react';
import type { Working, WorkingInput } from '#core/craft/show-how/working.ts';
import type { AnswerLine } from '#core/reckoner/answer-line.ts';
import { givenAt, marginSentence, stepFormula, stepSymbol, stepValue, TRUST_SENTENCES } from '#core/reckoner/step-words.ts';
import { fieldId } from '#islands/ui/field-id.ts';

/** How sure an answer is, in as few words as stand beside it. */
const TRUST_WORDS: Readonly<Record<AnswerLine['trust'], string>> = {
  counted: 'Exact', measured: 'Measured', label: 'From the label', formula: 'Reckoned', class: 'From a table, roughly', practice: 'By custom, roughly',
};

/** What the explanations of a part share. */
export interface Steps {
  readonly part: string;
  /** Nothing is drawn before it is opened. */
  readonly lazily: boolean;
  readonly opened: ReadonlySet<string>;
  readonly toggle: (key: string, open: boolean) => void;
  /** Opens the working and goes to it. */
  readonly goTo: (id: string) => void;
  readonly workingOf: (id: string) => Working | undefined;
}

export const stepAnchor = (part: string, id: string): string => `how-${part}-${id.replaceAll(/[^A-Za-z0-9]+/gu, '-')}`;

function Origin({ input, steps }: { input: WorkingInput; steps: Steps }) {
  if (input.from !== undefined) {
    const id = input.from;
    const follow = (event: MouseEvent): void => { if (steps.lazily) { event.preventDefault(); steps.goTo(id); } };
    return <a href={`#${stepAnchor(steps.part, id)}`} onClick={follow}>reckoned: see how</a>;
  }
  const place = input.path === undefined ? undefined : givenAt(steps.part, input.path);
  if (place !== undefined) return 'field' in place ? <>as in <a href={`#${fieldId(place.field)}`}>{place.label}</a></> : <>from <a href={`#${place.part}`}>{place.label}</a></>;
  return input.source ?? 'as this part is laid out';
}

/** One working, as a person follows it. */
export function Step({ working, steps }: { working: Working; steps: Steps }) {
  const margin = marginSentence(working);
  return (
    <div className="one-working" id={stepAnchor(steps.part, working.id)} tabIndex={-1}>
      <p><b>{working.name}</b> = <code>{stepFormula(working.formula)}</code> = {stepValue(working.value, working.unit)}</p>
      <ul>
        {working.inputs.map((input) => (
          <li key={input.symbol}><code>{stepSymbol(input.symbol)}</code> {input.name}, {stepValue(input.value, input.unit)} <span>({<Origin input={input} steps={steps} />})</span></li>
        ))}
      </ul>
      <p>By {working.source}. {TRUST_SENTENCES[working.trust]}{margin !== undefined && ` ${margin}`}</p>
    </div>
  );
}

interface FoldProps {
  readonly name: string;
  readonly steps: Steps;
  readonly className: string;
  readonly summary: ReactNode;
  readonly children: () => ReactNode;
}

/** Unfolds natively; alive it is drawn when it is. */
export function Fold({ name, steps, className, summary, children }: FoldProps) {
  const open = steps.opened.has(name);
  return (
    <details className={className} open={open} onToggle={({ currentTarget }) => { steps.toggle(name, currentTarget.open); }} suppressHydrationWarning>
      <summary>{summary}</summary>
      {(open || !steps.lazily) && children()}
    </details>
  );
}

/** Opens the way an answer was got. */
export function ShowHow({ line, steps }: { line: AnswerLine; steps: Steps }) {
  return (
    <Fold
      name={line.step ?? line.label}
      steps={steps}
      className="show-how"
      summary={line.step === undefined ? <>{TRUST_WORDS[line.trust]}<span className="hide">: show how “{line.label}” was got</span></> : <>Show how<span className="hide"> “{line.label}” was got</span></>}
    >
      {() => {
        const working = line.step === undefined ? undefined : steps.workingOf(line.step);
        return (
          <div>
            <p>{line.how}{working === undefined && `. ${TRUST_SENTENCES[line.trust]}`}</p>
            {working !== undefined && <Step working={working} steps={steps} />}
          </div>
        );
      }}
    </Fold>
  );
}
