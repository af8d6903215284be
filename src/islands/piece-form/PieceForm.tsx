/**
 * The pattern piece as a form: fields at the left, the piece drawn beside them, its numbers at the right, all of it
 * following as one types. Without script it is the same form; its buttons send it and get it back as it was typed.
 */
import { useCallback, useDeferredValue, useEffect, useMemo, useReducer, useRef, useState, type SyntheticEvent } from 'react';
import type { WovenPiece } from '#core/craft/cloth/cloth-piece.ts';
import { clothPieceOf } from '#core/craft/cloth/cloth-piece-of.ts';
import type { Act } from '#core/craft/piece-form/change-typed.ts';
import { judgeTyped, type Judgement } from '#core/craft/piece-form/judge-typed.ts';
import type { TypedPiece } from '#core/craft/piece-form/typed-piece.ts';
import type { FrameLoomPiece } from '#core/craft/piece.ts';
import type { FrameLoomPlan } from '#core/craft/plan-types.ts';
import { fieldId } from '#islands/ui/field-id.ts';
import { ToastRegion, useToasts } from '#islands/ui/ToastRegion.tsx';
import { BandList, useChosenBand, YarnList } from './BandList.tsx';
import { bandWords, type BandWords } from './band-words.ts';
import { FormHead, type SaveState } from './FormHead.tsx';
import { HandsContext, type Hands } from './hands.ts';
import { AllowanceFields, BeatFields, HangingFields, SizeAndLoom, WarpFields } from './LoomFields.tsx';
import { pieceFormAfter, pieceFormBegins, toldNow } from './piece-form-state.ts';
import { PieceDrawing } from './PieceDrawing.tsx';
import { PiecePlan } from './PiecePlan.tsx';
import { typedBefore } from '#islands/ui/typed-before.ts';
import { useUnsavedGuard } from './use-unsaved-guard.ts';

export interface PieceFormProps {
  /** Address the form is sent to. */
  readonly action: string;
  readonly series: { readonly slug: string; readonly name: string };
  readonly revision: number;
  readonly typed: TypedPiece;
  /** The form came back because it could not be saved. */
  readonly isTried: boolean;
  /** The form came back with something that is not saved yet. */
  readonly isChanged: boolean;
  /** What belongs to no field: that another window saved meanwhile. */
  readonly summary: string;
  /** Band to be open, by its place. */
  readonly openBand: number | null;
  readonly saved: SaveState;
}

/** A form that could be woven. */
interface Made {
  readonly judged: Judgement;
  readonly piece: FrameLoomPiece;
  readonly plan: FrameLoomPlan;
  readonly typed: TypedPiece;
}

const NO_WORDS: ReadonlyMap<number, BandWords> = new Map();

function wordsById({ piece, plan, typed }: Made, cloth: WovenPiece): ReadonlyMap<number, BandWords> {
  const words = bandWords(piece, plan, cloth, typed.units);
  return new Map(typed.bands.flatMap(({ id }, index) => { const own = words[index]; return own === undefined ? [] : [[id, own]]; }));
}

export function PieceForm({ action, series, revision, typed: first, isTried, isChanged, summary, openBand, saved }: PieceFormProps) {
  const [state, tell] = useReducer(pieceFormAfter, null, () => pieceFormBegins(first, isTried, isChanged));
  const { typed } = state;
  const [chosen, choose] = useChosenBand(openBand);
  const form = useRef<HTMLFormElement>(null);
  const toasts = useToasts();
  // Letters stand at once; picture and numbers follow as soon as the browser has drawn them.
  const settled = useDeferredValue(typed);
  const judged = useMemo(() => judgeTyped(settled), [settled]);
  const made = useLastMade(judged, settled);
  const cloth = useMemo(() => (made === null ? null : clothPieceOf(made.piece, made.plan, series.name)), [made, series.name]);
  const words = useMemo(() => (made === null || cloth === null ? NO_WORDS : wordsById(made, cloth)), [made, cloth]);
  const told = useMemo(() => toldNow(state, judged), [state.isTried, state.inHand, judged]);
  const sending = useUnsavedGuard(state.isChanged);

  const type = useCallback((field: string, text: string) => { tell({ kind: 'type', field, text }); }, []);
  const act = useCallback((done: Act) => {
    tell({ kind: 'act', act: done });
    const gone = takenOutWords(done);
    if (gone !== null) toasts.say(gone, { act: { label: 'Put it back', run: () => { tell({ kind: 'put-back' }); } } });
  }, [toasts.say]);
  const hands = useMemo((): Hands => ({
    typed, type, act, action,
    wrong: new Map(told.map(({ field, says }) => [field, says])),
    heed: new Map(judged.ok ? judged.warnings.map(({ field, says }) => [field, says]) : []),
  }), [typed, told, judged, type, act, action]);

  useEffect(() => { if (form.current !== null) for (const [field, text] of typedBefore(form.current)) type(field, text); }, [type]);
  useFocusOnFresh(form, state.fresh);

  const trySaving = (event: SyntheticEvent) => {
    if (judgeTyped(typed).ok) { sending(); return; }
    event.preventDefault();
    tell({ kind: 'try' });
    requestAnimationFrame(() => { document.getElementById('piece-errors')?.focus(); });
  };

  return (
    <HandsContext value={hands}>
      <form ref={form} className="piece-form" method="post" action={action} noValidate aria-label={`The piece of ${series.name}`} onSubmit={trySaving} onFocus={(event) => { tell({ kind: 'enter', field: nameOf(event.target) }); }} onBlur={(event) => { tell({ kind: 'leave', field: nameOf(event.target) }); }}>
        <input type="hidden" name="series" value={series.slug} />
        <input type="hidden" name="revision" value={revision} />
        <input type="hidden" name="units" value={typed.units} />
        <FormHead {...{ series, saved, summary, judged }} isTried={state.isTried} isChanged={state.isChanged} />
        <PieceDrawing cloth={cloth} isOld={!judged.ok && cloth !== null} chosen={typed.bands.findIndex(({ id }) => id === chosen)} units={typed.units} />
        <div className="fields">
          <SizeAndLoom />
          <WarpFields />
          <YarnList fresh={state.fresh} />
          <BandList words={words} chosen={chosen} onChoose={choose} open={openBand} fresh={state.fresh} />
          <BeatFields />
          <HangingFields />
          <AllowanceFields />
          <p><button type="submit" name="do" value="save" className="btn">Save the piece</button></p>
        </div>
        <PiecePlan made={made} isOld={!judged.ok && made !== null} warnings={judged.ok ? judged.warnings : []} typed={typed} />
        <p className="hide" role="status">{state.news}</p>
      </form>
      <ToastRegion toasts={toasts} />
    </HandsContext>
  );
}

const nameOf = (target: EventTarget): string => (target instanceof HTMLInputElement ? target.name : '');

function takenOutWords(act: Act): string | null {
  switch (act.do) {
    case 'take-out-band':
      return `Band ${String(act.band + 1)} taken out.`;
    case 'take-out-shape':
      return `Shape ${String(act.shape + 1)} taken out.`;
    case 'take-out-yarn':
      return 'Yarn taken out.';
    default:
      return null;
  }
}

/** The last form that could be woven: what is drawn while something typed does not work. */
function useLastMade(judged: Judgement, typed: TypedPiece): Made | null {
  const [kept, keep] = useState<Made | null>(null);
  if (!judged.ok || kept?.judged === judged) return kept;
  const { piece, plan } = judged;
  const made = { judged, piece, plan, typed };
  keep(made);
  return made;
}

/** Hands go on in the row that was just put in. */
function useFocusOnFresh(form: React.RefObject<HTMLFormElement | null>, fresh: string | null): void {
  useEffect(() => {
    if (fresh === null) return;
    const field = form.current?.querySelector<HTMLElement>(`#${fieldId(fresh)}`);
    field?.closest('details')?.setAttribute('open', '');
    field?.focus();
  }, [fresh, form]);
}
