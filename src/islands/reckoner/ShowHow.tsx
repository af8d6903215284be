import type { AnswerLine } from '#core/reckoner/answer-line.ts';

/** How sure an answer is, in as few words as stand beside it. */
const TRUST_WORDS: Readonly<Record<AnswerLine['trust'], string>> = {
  counted: 'Exact', measured: 'Measured', label: 'From the label', formula: 'Reckoned', class: 'From a table, roughly', practice: 'By custom, roughly',
};

/** Opens the way an answer was got. */
export function ShowHow({ line }: { line: AnswerLine }) {
  return (
    <details className="show-how" suppressHydrationWarning>
      <summary>{TRUST_WORDS[line.trust]}<span className="hide">: show how “{line.label}” was got</span></summary>
      <p>{line.how}</p>
    </details>
  );
}
