/**
 * The reckoner: one form of eight parts that feed each other. Drawn on the server it works
 * by sending the form; alive it answers while one types, with the same core.
 */
import { useCallback, useEffect, useReducer, useRef, useState, type ReactNode, type RefObject } from 'react';
import { answerForm, type ReckonerAnswer } from '#core/reckoner/answer-form.ts';
import { changeField, RECKONER_FIELDS, reckonerQuery, unitsOf, type ReckonerField, type ReckonerForm } from '#core/reckoner/reckoner-form.ts';
import { amountText } from '#core/units/format-amount.ts';
import type { Units } from '#core/units/units.ts';
import { Answers } from '#islands/reckoner/Answers.tsx';
import type { FormHand } from '#islands/reckoner/form-hand.ts';
import { LinkTools } from '#islands/reckoner/LinkTools.tsx';
import { Offered } from '#islands/reckoner/Offered.tsx';
import { Part } from '#islands/reckoner/Part.tsx';
import { PartFields } from '#islands/reckoner/PartFields.tsx';
import { PARTS, type PartName } from '#islands/reckoner/parts.ts';
import { PieceSum } from '#islands/reckoner/PieceSum.tsx';
import { ShapeSum } from '#islands/reckoner/ShapeSum.tsx';
import { Typed } from '#islands/reckoner/Typed.tsx';
import { Choose } from '#islands/ui/Choose.tsx';
import { typedBefore } from '#islands/ui/typed-before.ts';

/** The address follows the form after a pause in typing, so that it can be kept or sent. */
const ADDRESS_PAUSE_MS = 500;

function useAddress(form: ReckonerForm, initial: ReckonerForm): string {
  const address = `/reckoner?${reckonerQuery(form)}`;
  useEffect(() => {
    if (form === initial) return undefined;
    const timer = setTimeout(() => { history.replaceState(history.state, '', `${address}${location.hash}`); }, ADDRESS_PAUSE_MS);
    return () => { clearTimeout(timer); };
  }, [form, initial, address]);
  return address;
}

const isField = (name: string): name is ReckonerField => RECKONER_FIELDS.some((field) => field === name);

interface Reckoned {
  readonly form: ReckonerForm;
  readonly answer: ReckonerAnswer;
}

/** A letter and its answers stand there in the same frame. */
function reckonAnew({ form, answer }: Reckoned, [field, value]: readonly [ReckonerField, string]): Reckoned {
  const changed = changeField(form, field, value);
  return { form: changed, answer: answerForm(changed, answer) };
}

function useReckoned(initial: ReckonerForm, element: RefObject<HTMLFormElement | null>) {
  const [reckoned, dispatch] = useReducer(reckonAnew, initial, (form): Reckoned => ({ form, answer: answerForm(form) }));
  const change = useCallback((field: ReckonerField, value: string) => { dispatch([field, value]); }, []);
  const [alive, setAlive] = useState(false);
  useEffect(() => {
    setAlive(true);
    if (element.current !== null) for (const [name, text] of typedBefore(element.current)) if (isField(name)) change(name, text);
  }, []);
  return { ...reckoned, change, alive };
}

/** What changed, for who cannot see it: the sum of the piece, or that something cannot be used. */
function inWords({ errors, piece }: ReckonerAnswer, units: Units): string {
  const wrong = Object.keys(errors).length;
  if (wrong > 0) return wrong === 1 ? 'One field cannot be used yet.' : `${String(wrong)} fields cannot be used yet.`;
  return piece.lines
    .slice(0, 2)
    .map(({ label, value }) => (value.kind === 'words' ? value.words : `${label}: ${amountText(value, units)}`))
    .join(', ');
}

/** What a part has beside its lines: drawings before them, tables after. */
function extras({ sett, shape, piece }: ReckonerAnswer, form: ReckonerForm): Partial<Record<PartName, { readonly before?: ReactNode; readonly after?: ReactNode }>> {
  const units = unitsOf(form);
  return {
    sett: { after: sett.offered && <Offered spacings={sett.offered} kind={form['loom-kind']} units={units} /> },
    shape: { before: <ShapeSum section={shape} /> },
    piece: { before: piece.made && <PieceSum made={piece.made} units={units} /> },
  };
}

export function Reckoner({ initial }: { initial: ReckonerForm }) {
  const element = useRef<HTMLFormElement>(null);
  const { form, answer, change, alive } = useReckoned(initial, element);
  const address = useAddress(form, initial);
  const units = unitsOf(form);
  const hand: FormHand = { form, errors: answer.errors, change };
  const more = extras(answer, form);
  return (
    <form ref={element} className="reckoner" method="get" action="/reckoner" noValidate>
      <input type="hidden" name="shown" value={units} />
      <div className="row between">
        <Choose name="units" legend="Units" quietLegend options={[{ value: 'cm', label: 'cm, g' }, { value: 'in', label: 'in, oz' }]} value={units} onChoose={(chosen) => { change('units', chosen); }} />
        <LinkTools address={address} alive={alive} />
      </div>
      <p className="hide" role="status">{inWords(answer, units)}</p>
      {PARTS.map((part) => (
        <Part key={part.name} words={part} alive={alive} fields={<PartFields part={part} hand={hand} />} typed={<Typed form={form} fields={part.fields} />}>
          {more[part.name]?.before}
          <Answers part={part.name} caption={part.title} section={answer[part.name]} errors={answer.errors} units={units} alive={alive} />
          {more[part.name]?.after}
        </Part>
      ))}
    </form>
  );
}
