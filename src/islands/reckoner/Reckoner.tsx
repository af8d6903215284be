/**
 * The reckoner: one form of eight parts that feed each other. Drawn on the server it works
 * by sending the form; alive it answers while one types, with the same core.
 */
import { useDeferredValue, useEffect, useMemo, useReducer, useRef, useState, type ReactNode, type RefObject } from 'react';
import { answerForm, type ReckonerAnswer } from '#core/reckoner/answer-form.ts';
import { changeField, RECKONER_FIELDS, reckonerQuery, unitsOf, type ReckonerField, type ReckonerForm } from '#core/reckoner/reckoner-form.ts';
import { amountText } from '#core/units/format-amount.ts';
import type { Units } from '#core/units/units.ts';
import { Answers } from '#islands/reckoner/Answers.tsx';
import { ClothFields } from '#islands/reckoner/ClothFields.tsx';
import type { FormHand } from '#islands/reckoner/form-hand.ts';
import { LinkTools } from '#islands/reckoner/LinkTools.tsx';
import { Offered } from '#islands/reckoner/Offered.tsx';
import { Part } from '#islands/reckoner/Part.tsx';
import { PARTS, type PartName } from '#islands/reckoner/parts.ts';
import { PieceFields } from '#islands/reckoner/PieceFields.tsx';
import { PieceSum } from '#islands/reckoner/PieceSum.tsx';
import { SettFields } from '#islands/reckoner/SettFields.tsx';
import { ShapeFields } from '#islands/reckoner/ShapeFields.tsx';
import { ShapeSum } from '#islands/reckoner/ShapeSum.tsx';
import { RodFields, RyaFields, SoumakFields } from '#islands/reckoner/StitchFields.tsx';
import { Typed } from '#islands/reckoner/Typed.tsx';
import { YarnFields } from '#islands/reckoner/YarnFields.tsx';
import { Choose } from '#islands/ui/Choose.tsx';
import { typedBefore } from '#islands/ui/typed-before.ts';

const FIELDS: Readonly<Record<PartName, (props: { hand: FormHand }) => ReactNode>> = {
  yarn: YarnFields, sett: SettFields, cloth: ClothFields, soumak: SoumakFields, rya: RyaFields, shape: ShapeFields, rod: RodFields, piece: PieceFields,
};

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

function useForm(initial: ReckonerForm, element: RefObject<HTMLFormElement | null>) {
  const [form, change] = useReducer((now: ReckonerForm, [field, value]: readonly [ReckonerField, string]) => changeField(now, field, value), initial);
  const [alive, setAlive] = useState(false);
  useEffect(() => {
    setAlive(true);
    if (element.current !== null) for (const [name, text] of typedBefore(element.current)) if (isField(name)) change([name, text]);
  }, []);
  return { form, change, alive };
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
  const { form, change, alive } = useForm(initial, element);
  // A letter stands in its field at once; the answers follow in the next frame, the last letter first.
  const settled = useDeferredValue(form);
  const answer = useMemo(() => answerForm(settled), [settled]);
  const address = useAddress(form, initial);
  const units = unitsOf(form);
  const answered = unitsOf(settled);
  const hand: FormHand = { form, errors: answer.errors, change: (field, value) => { change([field, value]); } };
  const more = extras(answer, settled);
  return (
    <form ref={element} className="reckoner" method="get" action="/reckoner" noValidate>
      <input type="hidden" name="shown" value={units} />
      <div className="row between">
        <Choose name="units" legend="Units" quietLegend options={[{ value: 'cm', label: 'cm, g' }, { value: 'in', label: 'in, oz' }]} value={units} onChoose={(chosen) => { change(['units', chosen]); }} />
        <LinkTools address={address} alive={alive} />
      </div>
      <p className="hide" role="status">{inWords(answer, answered)}</p>
      {PARTS.map(({ name, title, says, fields }) => {
        const Fields = FIELDS[name];
        return (
          <Part key={name} id={name} title={title} says={says} alive={alive} fields={<Fields hand={hand} />} typed={<Typed form={form} fields={fields} />}>
            {more[name]?.before}
            <Answers part={name} caption={title} section={answer[name]} errors={answer.errors} units={answered} alive={alive} />
            {more[name]?.after}
          </Part>
        );
      })}
    </form>
  );
}
