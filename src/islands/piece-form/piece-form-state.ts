/** The state of the piece's form, and what each hand movement makes of it. */
import { changeTyped, typeIn, type Act } from '#core/craft/piece-form/change-typed.ts';
import type { Found, Judgement } from '#core/craft/piece-form/judge-typed.ts';
import type { TypedPiece } from '#core/craft/piece-form/typed-piece.ts';

export interface PieceFormState {
  readonly typed: TypedPiece;
  /** Saving was tried, so what is missing is told as well. */
  readonly isTried: boolean;
  /** How the form stood before each step, the newest last; and what was undone, the next to come last. */
  readonly past: readonly TypedPiece[];
  readonly future: readonly TypedPiece[];
  /** The field of the step that is going on: what is typed into one field in one go is one step. */
  readonly run: string | null;
  /** The field the hands are in: a length half typed is not told off. */
  readonly inHand: string | null;
  /** The row that came in last, by the id of its first field. */
  readonly fresh: string | null;
  /** What to say aloud of the last move. */
  readonly news: string;
}

export type PieceFormEvent =
  | { readonly kind: 'type'; readonly field: string; readonly text: string }
  | { readonly kind: 'act'; readonly act: Act }
  /** Another form altogether: put back, brought back, or taken from another window. */
  | { readonly kind: 'replace'; readonly typed: TypedPiece; readonly news: string; readonly run?: string }
  /** The hand lets go: what it does next is a step of its own. */
  | { readonly kind: 'rest' }
  | { readonly kind: 'undo' | 'redo' }
  | { readonly kind: 'enter' | 'leave'; readonly field: string }
  | { readonly kind: 'try' };

/** Steps that can be undone. */
const MOST_STEPS = 100;

export function pieceFormBegins(typed: TypedPiece, isTried: boolean): PieceFormState {
  return { typed, isTried, past: [], future: [], run: null, inHand: null, fresh: null, news: '' };
}

/** `Band 4 is now third` */
const PLACES = ['first', 'second', 'third', 'fourth', 'fifth', 'sixth', 'seventh', 'eighth', 'ninth', 'tenth'] as const;
export const placeWord = (index: number): string => PLACES[index] ?? `number ${String(index + 1)}`;

function newsOf(act: Act, typed: TypedPiece): string {
  switch (act.do) {
    case 'sooner':
      return act.band < 1 ? '' : `Band ${String(act.band + 1)} is now woven ${placeWord(act.band - 1)}.`;
    case 'later':
      return act.band + 1 >= typed.bands.length ? '' : `Band ${String(act.band + 1)} is now woven ${placeWord(act.band + 1)}.`;
    case 'add-band':
      return `A band was put in; it is woven ${placeWord(act.after + 1)}.`;
    case 'copy-band':
      return `Band ${String(act.band + 1)} was copied; the copy is woven after it.`;
    case 'split-band':
      return `Band ${String(act.band + 1)} is now two.`;
    case 'move-band':
      return `Band ${String(act.band + 1)} is now woven ${placeWord(act.to)}.`;
    default:
      return '';
  }
}

/** Name of the first field of the row that the act puts in. */
function freshOf(act: Act, typed: TypedPiece): string | null {
  switch (act.do) {
    case 'add-band':
      return `bands.${String(act.after + 1)}.technique`;
    case 'copy-band':
    case 'split-band':
      return `bands.${String(act.band + 1)}.technique`;
    case 'add-shape':
      return `bands.${String(act.band)}.shapes.${String(typed.bands[act.band]?.shapes.length ?? 0)}.shape`;
    case 'add-yarn':
      return `yarns.${String(typed.yarns.length)}.role`;
    default:
      return null;
  }
}

/** A step to `typed`; one that changes nothing is none. */
function stepTo(state: PieceFormState, typed: TypedPiece, run: string | null): PieceFormState {
  if (typed === state.typed) return state;
  const goesOn = run !== null && run === state.run;
  return { ...state, typed, run, past: goesOn ? state.past : [...state.past, state.typed].slice(-MOST_STEPS), future: [], fresh: null, news: '' };
}

function goBack(state: PieceFormState): PieceFormState {
  const typed = state.past.at(-1);
  return typed === undefined ? { ...state, news: 'Nothing to undo.' } : { ...state, typed, past: state.past.slice(0, -1), future: [...state.future, state.typed], run: null, fresh: null, news: 'Undone.' };
}

function goForth(state: PieceFormState): PieceFormState {
  const typed = state.future.at(-1);
  return typed === undefined ? { ...state, news: 'Nothing to redo.' } : { ...state, typed, past: [...state.past, state.typed], future: state.future.slice(0, -1), run: null, fresh: null, news: 'Done again.' };
}

export function pieceFormAfter(state: PieceFormState, event: PieceFormEvent): PieceFormState {
  switch (event.kind) {
    case 'type':
      return stepTo(state, typeIn(state.typed, event.field, event.text), event.field);
    case 'act': {
      const { act } = event;
      return { ...stepTo(state, changeTyped(state.typed, act), null), inHand: null, fresh: freshOf(act, state.typed), news: newsOf(act, state.typed) };
    }
    case 'replace':
      return { ...stepTo(state, event.typed, event.run ?? null), news: event.news };
    case 'undo':
      return goBack(state);
    case 'redo':
      return goForth(state);
    case 'enter':
      return { ...state, inHand: event.field };
    case 'rest':
      return { ...state, run: null };
    case 'leave':
      return { ...state, run: null, inHand: state.inHand === event.field ? null : state.inHand };
    case 'try':
      return { ...state, isTried: true, inHand: null };
  }
}

/** What is told at the fields now. Before anybody tries to save, a field that is still empty is no fault. */
export function toldNow({ isTried, inHand }: PieceFormState, judged: Judgement): readonly Found[] {
  if (judged.ok) return [];
  return judged.problems.filter(({ kind, field }) => (kind === 'missing' ? isTried : kind !== 'unreadable' || field !== inHand));
}

/** `Band 3, Height` or `Yarn ground`: where a sentence belongs, for lists that stand apart from the fields. */
export function placeOfField(field: string, { yarns }: Pick<TypedPiece, 'yarns'>): string {
  const [group, index, kind, shape] = field.split('.');
  if (group === 'bands' && index !== undefined) {
    const band = `Band ${String(Number(index) + 1)}`;
    return kind === 'shapes' && shape !== undefined ? `${band}, shape ${String(Number(shape) + 1)}` : band;
  }
  if (group === 'yarns' && index !== undefined) {
    const role = yarns[Number(index)]?.texts['role'] ?? '';
    return role === '' ? `Yarn ${String(Number(index) + 1)}` : `Yarn ${role}`;
  }
  if (field.startsWith('warp.yarn')) return 'Warp yarn';
  return field === 'bands' ? 'Bands' : '';
}
