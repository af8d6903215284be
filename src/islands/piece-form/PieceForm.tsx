import { lazy, memo, useCallback, useEffect, useMemo, useReducer, useRef, type RefObject, type SyntheticEvent } from 'react';
import type { StudentLoom } from '#contracts/looms.ts';
import { clothPieceOf } from '#core/craft/cloth/cloth-piece-of.ts';
import type { WovenPiece } from '#core/craft/cloth/cloth-piece.ts';
import type { Act } from '#core/craft/piece-form/change-typed.ts';
import { withHeight, type HeldBand } from '#core/craft/piece-form/band-height.ts';
import { judgeTyped, type Judgement } from '#core/craft/piece-form/judge-typed.ts';
import { splitBand } from '#core/craft/piece-form/split-band.ts';
import { textOf, type TypedPiece } from '#core/craft/piece-form/typed-piece.ts';
import type { FrameLoomPiece } from '#core/craft/piece.ts';
import type { FrameLoomPlan } from '#core/craft/plan-types.ts';
import { fieldId } from '#islands/ui/field-id.ts';
import { ToastRegion, useToasts } from '#islands/ui/ToastRegion.tsx';
import { BandList, useChosenBand, YarnList } from './BandList.tsx';
import { bandWords, type BandWords } from './band-words.ts';
import { FormHead, type SaveState } from './FormHead.tsx';
import { HandsContext, ShownContext, type Hands, type Shown } from './hands.ts';
import { useSame, useSameEntries } from './keep-same.ts';
import { Later } from './Later.tsx';
import { AllowanceFields, BeatFields, HangingFields, SizeAndLoom, WarpFields } from './LoomFields.tsx';
import { OtherPieceNotice } from './OtherPieceNotice.tsx';
import { pieceFormAfter, pieceFormBegins, toldNow } from './piece-form-state.ts';
import { PieceDrawing } from './PieceDrawing.tsx';
import { PiecePlan } from './PiecePlan.tsx';
import { usePieceDraft } from './use-piece-draft.ts';
import { useUndoKeys } from './use-undo-keys.ts';

const ThreeLooms = lazy(async () => ({ default: (await import('./ThreeLooms.tsx')).ThreeLooms }));

export interface PieceFormProps {
  /** Address the form is sent to. */
  readonly action: string;
  readonly series: { readonly slug: string; readonly name: string };
  readonly revision: number;
  readonly typed: TypedPiece;
  /** The form came back because it could not be saved. */
  readonly isTried: boolean;
  /** What belongs to no field: that another window saved meanwhile. */
  readonly summary: string;
  /** It came back with something that is not kept yet. */
  readonly isChanged: boolean;
  /** Saving puts it over what another window kept. */
  readonly isOver: boolean;
  /** Band to be open, by its place. */
  readonly openBand: number | null;
  readonly saved: SaveState;
  /** Looms of students who have a seat. */
  readonly looms: readonly StudentLoom[];
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

/** The pattern piece: fields, drawing and numbers, all of one form. Every letter is reckoned and drawn before the next frame. */
export function PieceForm({ action, series, revision, typed: first, isTried, isChanged, summary, isOver, openBand, saved, looms }: PieceFormProps) {
  const [state, tell] = useReducer(pieceFormAfter, null, () => pieceFormBegins(first, isTried));
  const { typed } = state;
  const { units, yarns, texts, bands } = typed;
  const [chosen, choose] = useChosenBand(openBand);
  const form = useRef<HTMLFormElement>(null);
  const toasts = useToasts();
  const { keeping, keepMine, takeOther, sent } = usePieceDraft({ form, series: series.slug, revision, typed, isChanged, isOver, tell });
  const judged = useMemo(() => judgeTyped(typed), [typed]);
  const made = useLastMade(judged, typed);
  const cloth = useMemo(() => (made === null ? null : clothPieceOf(made.piece, made.plan, series.name)), [made, series.name]);
  const words = useSameEntries(useMemo(() => (made === null || cloth === null ? NO_WORDS : wordsById(made, cloth)), [made, cloth]));
  const wrong = useSame(useMemo(() => new Map(toldNow(state, judged).map(({ field, says }) => [field, says])), [state.isTried, state.inHand, judged]));
  const warnings = useSame(judged.ok ? judged.warnings : NOTHING);
  const heed = useMemo(() => new Map(warnings.map(({ field, says }) => [field, says])), [warnings]);

  const undo = useCallback(() => { tell({ kind: 'undo' }); }, []);
  const redo = useCallback(() => { tell({ kind: 'redo' }); }, []);
  useUndoKeys(undo, redo);
  const onDrawing = useDrawnHands(tell, choose, typed);
  const hands = useHandsOf(tell, toasts, action, typed);
  const shown = useMemo((): Shown => ({ units, yarns, texts, wrong, heed }), [units, yarns, texts, wrong, heed]);
  useFocusOnFresh(form, state.fresh);

  const trySaving = (event: SyntheticEvent<HTMLFormElement, SubmitEvent>) => {
    const { submitter } = event.nativeEvent;
    const saves = !(submitter instanceof HTMLButtonElement) || submitter.value === 'save';
    if (!saves || judgeTyped(typed).ok) { sent(); return; }
    event.preventDefault();
    tell({ kind: 'try' });
    requestAnimationFrame(() => { document.getElementById('piece-errors')?.focus(); });
  };

  return (
    <HandsContext value={hands}><ShownContext value={shown}>
      <form ref={form} className="piece-form" method="post" action={action} noValidate aria-label={`The piece of ${series.name}`} onSubmit={trySaving} onFocus={(event) => { tell({ kind: 'enter', field: nameOf(event.target) }); }} onBlur={(event) => { tell({ kind: 'leave', field: nameOf(event.target) }); }}>
        <Sent name="series" value={series.slug} />
        <Sent name="revision" value={keeping.revision} />
        <Sent name="units" value={units} />
        {isOver && keeping.savedAt === null && <input type="hidden" name="over" value="yes" />}
        <FormHead {...{ series, saved, keeping, summary, judged }} isTried={state.isTried} undo={state.past.length === 0 ? null : undo} redo={state.future.length === 0 ? null : redo} />
        {keeping.behind !== null && <div className="other"><OtherPieceNotice other={keeping.behind} title={series.name} onKeep={keepMine} onTake={takeOther} /></div>}
        <PieceDrawing {...{ cloth, made, units, ...onDrawing }} isOld={!judged.ok && cloth !== null} chosen={bands.findIndex(({ id }) => id === chosen)} />
        <div className="fields">
          <SizeAndLoom />
          <WarpFields warpYarn={typed.warpYarn} />
          <YarnList bands={bands} fresh={state.fresh} />
          <BandList bands={bands} laterIsUp={textOf(texts, 'hangs') !== 'turned'} words={words} chosen={chosen} onChoose={choose} open={openBand} fresh={state.fresh} />
          <BeatFields />
          <HangingFields />
          <AllowanceFields />
          <p><button type="submit" name="do" value="save" className="btn">Save the piece</button></p>
        </div>
        <PiecePlan made={made} isOld={!judged.ok && made !== null} warnings={warnings} yarns={yarns} units={units} />
        <p className="hide" role="status">{state.news}</p>
      </form>
      {made !== null && <Later title="Try it on three students’ looms" className="fold try-looms">{() => <ThreeLooms piece={made.piece} name={series.name} units={units} students={looms} />}</Later>}
      <ToastRegion toasts={toasts} />
    </ShownContext></HandsContext>
  );
}

/** Goes along with the form. By itself, as an input that is drawn anew is named anew, which a form of a thousand fields feels. */
const Sent = memo(function Sent({ name, value }: { readonly name: string; readonly value: string | number }) {
  return <input type="hidden" name={name} value={value} />;
});

const NOTHING: readonly [] = [];
const nameOf = (target: EventTarget): string => (target instanceof HTMLInputElement ? target.name : '');

/** What hands do on the drawing; the same functions as long as the form lives. */
function useDrawnHands(tell: (event: Parameters<typeof pieceFormAfter>[1]) => void, choose: (id: number) => void, typed: TypedPiece) {
  const now = useRef(typed);
  now.current = typed;
  return useMemo(() => ({
    onChoose: (index: number) => {
      const id = now.current.bands[index]?.id;
      if (id !== undefined) choose(id);
    },
    onPull: (held: HeldBand, steps: number) => { tell({ kind: 'replace', typed: withHeight(now.current, held, steps), news: '', run: `pull-${String(held.band)}` }); },
    onRest: () => { tell({ kind: 'rest' }); },
  }), [tell, choose]);
}

/** The same functions as long as the form lives. */
function useHandsOf(tell: (event: Parameters<typeof pieceFormAfter>[1]) => void, { say }: ReturnType<typeof useToasts>, action: string, typed: TypedPiece): Hands {
  const now = useRef(typed);
  now.current = typed;
  return useMemo(() => ({
    action,
    type: (field, text) => { tell({ kind: 'type', field, text }); },
    act: (act) => {
      const before = now.current;
      const split = act.do === 'split-band' ? splitBand(before, act.band) : null;
      if (split?.ok === false) { say(split.says); return; }
      tell({ kind: 'act', act });
      const gone = takenOutWords(act);
      if (gone !== null) say(gone, { act: { label: 'Put it back', run: () => { tell({ kind: 'replace', typed: before, news: 'It is back.' }); } } });
    },
  }), [tell, say, action]);
}

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
  const kept = useRef<Made | null>(null);
  if (judged.ok && kept.current?.judged !== judged) kept.current = { judged, piece: judged.piece, plan: judged.plan, typed };
  return kept.current;
}

/** Hands go on in the row that was just put in. */
function useFocusOnFresh(form: RefObject<HTMLFormElement | null>, fresh: string | null): void {
  useEffect(() => {
    if (fresh === null) return;
    const field = form.current?.querySelector<HTMLElement>(`#${fieldId(fresh)}`);
    field?.closest('details')?.setAttribute('open', '');
    field?.focus();
  }, [fresh, form]);
}
