/**
 * Whether the piece fits the loom a visitor has, drawn and reckoned as she types. Without script it is a form that
 * asks the same page again; the answer is the same, because the same core gives it.
 */
import { useDeferredValue, useEffect, useMemo, useRef, useState, type SyntheticEvent } from 'react';
import type { FrameLoomPiece } from '#core/craft/piece.ts';
import { inOtherUnits, loomFields, loomFieldUnits, type TypedLoom } from '#core/trial/typed-loom.ts';
import { tryOnLoom } from '#core/trial/try-on-loom.ts';
import type { Units } from '#core/units/units.ts';
import { fittedBy, loomOfPattern, madeAsPattern, type MadeOnLoom } from '#islands/series/trial.ts';
import { setTried } from '#islands/series/trial-store.ts';
import { TrialAnswer } from '#islands/series/TrialAnswer.tsx';
import { TrialLooms } from '#islands/series/TrialLooms.tsx';
import { Choose } from '#islands/ui/Choose.tsx';
import { UnitField } from '#islands/ui/Field.tsx';

export interface TryOnLoomProps {
  readonly slug: string;
  /** How the piece is spoken of: "Low Tide". */
  readonly name: string;
  /** First name of the teacher. */
  readonly teacher: string;
  readonly pattern: FrameLoomPiece;
  /** What the address says she typed before. */
  readonly typed: TypedLoom | null;
  readonly units: Units;
  /** Id of the form that takes a seat: what is typed here goes along with it. */
  readonly seatForm: string;
  /** Who has a seat may put the loom into her own piece. */
  readonly hasSeat: boolean;
}

export function TryOnLoom(props: TryOnLoomProps) {
  const asPattern = useMemo(() => madeAsPattern(props.pattern), [props.pattern]);
  return asPattern === null ? null : <Trying {...props} asPattern={asPattern} />;
}

function Trying({ slug, name, teacher, pattern, typed: before, units, seatForm, hasSeat, asPattern }: TryOnLoomProps & { asPattern: MadeOnLoom }) {
  const [typed, setTyped] = useState<TypedLoom>(before ?? loomOfPattern(asPattern, units));
  const [own, setOwn] = useState(before !== null);
  const [alive, setAlive] = useState(false);
  const form = useRef<HTMLFormElement>(null);
  const settled = useDeferredValue(typed);
  const trial = useMemo(() => tryOnLoom(pattern, name, settled), [pattern, name, settled]);
  const fitted = fittedBy(trial);
  // While something typed cannot be read, the looms stay as they were last.
  const [drawn, setDrawn] = useState(trial);
  if (trial.ok && trial !== drawn) setDrawn(trial);

  const change = (next: TypedLoom): void => { setTyped(next); setOwn(true); };
  const query = (loom: TypedLoom): string => new URLSearchParams(loomFields(loom).map(([field, value]) => [field, value])).toString();
  const address = (loom: TypedLoom): string => `/series/${slug}?${query(loom)}#try`;

  // What was typed before the browser had read this script stands in the fields already.
  useEffect(() => {
    setAlive(true);
    const found = form.current === null ? null : readForm(form.current);
    if (found !== null) change({ ...typed, ...found });
  }, []);

  useEffect(() => {
    if (!own || !alive || !trial.ok) return;
    setTried(fitted === null ? null : { made: fitted, units: settled.units, own });
    history.replaceState(history.state, '', address(settled));
  }, [own, alive, trial]);

  useEffect(() => () => { setTried(null); }, []);

  const fields = loomFieldUnits(typed.units);
  const faults = trial.ok ? {} : trial.fields;
  return (
    <div className="trial">
      <form ref={form} className="stack" method="get" action={`/series/${slug}#try`} aria-label="Your loom" onSubmit={alive ? stay : undefined}>
        <UnitField key={`inside-${typed.units}`} form="try" name="inside" label="Inside width" unit={fields.inside} defaultValue={typed.inside} error={faults.inside} onInput={(event) => change({ ...typed, inside: event.currentTarget.value })} />
        <UnitField key={`spacing-${typed.units}`} form="try" name="spacing" label="Nail spacing" unit={fields.spacing} defaultValue={typed.spacing} error={faults.spacing} onInput={(event) => change({ ...typed, spacing: event.currentTarget.value })} />
        <Choose name="ends" legend="Ends" value={String(typed.ends)} options={ENDS} onChoose={(ends) => change({ ...typed, ends: ends === '2' ? 2 : 1 })} />
        <Choose name="units" legend="Units" value={typed.units} options={UNITS} onChoose={(other) => setTyped(inOtherUnits(typed, other))} />
        <input type="hidden" name="shown" value={typed.units} />
        {!alive && typed.narrower && <input type="hidden" name="wide" value="most" />}
        {!alive && <button className="btn" type="submit">Reckon for this loom</button>}
      </form>
      <TrialLooms name={name} teacher={teacher} asPattern={asPattern} trial={drawn} units={settled.units} own={own} />
      <TrialAnswer
        {...{ teacher, asPattern, trial, own }}
        units={settled.units}
        narrowerHref={address({ ...settled, narrower: true })}
        widerHref={address({ ...settled, narrower: false })}
        keepHref={hasSeat ? `/series/${slug}/piece?${query(settled)}` : undefined}
        onNarrower={alive ? (narrower) => change({ ...typed, narrower }) : undefined}
      />
      {own && loomFields(typed).map(([field, value]) => <input key={field} type="hidden" form={seatForm} name={field} value={value} />)}
    </div>
  );
}

const ENDS = [{ value: '1', label: 'Single' }, { value: '2', label: 'Doubled' }] as const;
const UNITS = [{ value: 'cm', label: 'cm' }, { value: 'in', label: 'in' }] as const;

const stay = (event: SyntheticEvent): void => { event.preventDefault(); };

/** The two texts, where they are no longer those the page came with. */
function readForm(form: HTMLFormElement): Pick<TypedLoom, 'inside' | 'spacing'> | null {
  const texts = ['inside', 'spacing'].map((name) => form.elements.namedItem(name)).filter((field) => field instanceof HTMLInputElement);
  const [inside, spacing] = texts;
  if (inside === undefined || spacing === undefined || texts.every(({ value, defaultValue }) => value === defaultValue)) return null;
  return { inside: inside.value, spacing: spacing.value };
}
