/**
 * The reckoner: one form of three parts that feed each other. Drawn on the server it works
 * by sending the form; alive it answers while one types, with the same core.
 */
import { useEffect, useMemo, useReducer, type ReactNode } from 'react';
import { answerForm, type ReckonerAnswer } from '#core/reckoner/answer-form.ts';
import { changeField, reckonerQuery, unitsOf, type ReckonerField, type ReckonerForm } from '#core/reckoner/reckoner-form.ts';
import { amountText } from '#core/units/format-amount.ts';
import { AnswerTable } from '#islands/reckoner/AnswerTable.tsx';
import type { FormHand } from '#islands/reckoner/form-hand.ts';
import { LoomFields } from '#islands/reckoner/LoomFields.tsx';
import { PieceFields } from '#islands/reckoner/PieceFields.tsx';
import { PieceSum } from '#islands/reckoner/PieceSum.tsx';
import { YarnFields } from '#islands/reckoner/YarnFields.tsx';
import { Button } from '#islands/ui/Button.tsx';
import { Choose } from '#islands/ui/Choose.tsx';

/** The address follows the form after a pause in typing, so that it can be kept or sent. */
const ADDRESS_PAUSE_MS = 500;

function useAddress(form: ReckonerForm, initial: ReckonerForm): void {
  useEffect(() => {
    if (form === initial) return undefined;
    const timer = setTimeout(() => {
      const query = reckonerQuery(form);
      history.replaceState(history.state, '', `${location.pathname}${query === '' ? '' : `?${query}`}${location.hash}`);
    }, ADDRESS_PAUSE_MS);
    return () => { clearTimeout(timer); };
  }, [form, initial]);
}

interface PartProps {
  readonly id: string;
  readonly title: string;
  readonly says: string;
  readonly fields: ReactNode;
  readonly last?: boolean;
  readonly children: ReactNode;
}

function Part({ id, title, says, fields, last = false, children }: PartProps) {
  return (
    <section className="pick mt-7 scroll-mt-4 desk:grid desk:grid-cols-[340px_minmax(0,1fr)] desk:gap-7" aria-labelledby={id}>
      <div className="desk:sticky desk:top-4 desk:self-start">
        <h2 className="h2" id={id}>{title}</h2>
        <p className="small quiet mt-1">{says}</p>
        <div className="mt-4 grid content-start gap-4">
          {fields}
          <div><Button type="submit" kind={last ? 'act' : 'plain'}>Reckon</Button></div>
        </div>
      </div>
      <div className="mt-5 min-w-0 desk:mt-0">{children}</div>
    </section>
  );
}

/** What changed, for who cannot see it: the sum of the piece, or that something cannot be used. */
function inWords({ errors, piece }: ReckonerAnswer, form: ReckonerForm): string {
  const wrong = Object.keys(errors).length;
  if (wrong > 0) return wrong === 1 ? 'One field cannot be used yet.' : `${String(wrong)} fields cannot be used yet.`;
  return piece.lines
    .slice(0, 2)
    .map(({ label, value }) => (value.kind === 'words' ? value.words : `${label}: ${amountText(value, unitsOf(form))}`))
    .join(', ');
}

export function Reckoner({ initial }: { initial: ReckonerForm }) {
  const [form, change] = useReducer((now: ReckonerForm, [field, value]: readonly [ReckonerField, string]) => changeField(now, field, value), initial);
  const answer = useMemo(() => answerForm(form), [form]);
  const units = unitsOf(form);
  const hand: FormHand = { form, errors: answer.errors, change: (field, value) => { change([field, value]); } };
  useAddress(form, initial);
  return (
    <form method="get" action="/reckoner" noValidate>
      <input type="hidden" name="shown" value={units} />
      <Choose name="units" legend="Units" quietLegend options={[{ value: 'cm', label: 'cm, g' }, { value: 'in', label: 'in, oz' }]} value={units} onChoose={(chosen) => { change(['units', chosen]); }} />
      <p className="hide" role="status">{inWords(answer, form)}</p>
      <Part id="yarn" title="One yarn" says="Every way its thickness is told, and how thick it lies." fields={<YarnFields hand={hand} />}>
        <AnswerTable caption="The yarn in every count" section={answer.yarn} errors={answer.errors} units={units} />
      </Part>
      <Part id="ends" title="Ends and spacing" says="From a width and a row of nails to warp ends." fields={<LoomFields hand={hand} />}>
        <AnswerTable caption="Ends, nails and spacing" section={answer.ends} errors={answer.errors} units={units} />
      </Part>
      <Part id="piece" title="A whole hanging" says="Woven in this yarn on these ends. Amounts are those to have in hand, with a reserve." last fields={<PieceFields hand={hand} />}>
        <PieceSum piece={answer.piece} units={units} />
        <AnswerTable caption="Everything the piece takes" section={answer.piece} errors={answer.errors} units={units} />
      </Part>
    </form>
  );
}
