/** The state of the piece's form, and what each hand movement makes of it. */
import { changeTyped, typeIn, type Act } from '#core/craft/piece-form/change-typed.ts';
import type { Found, Judgement } from '#core/craft/piece-form/judge-typed.ts';
import type { TypedPiece } from '#core/craft/piece-form/typed-piece.ts';

export interface PieceFormState {
  readonly typed: TypedPiece;
  /** Something differs from what was saved. */
  readonly isChanged: boolean;
  /** Saving was tried, so what is missing is told as well. */
  readonly isTried: boolean;
  /** What there was before the last row was taken out. */
  readonly before: TypedPiece | null;
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
  | { readonly kind: 'put-back' }
  | { readonly kind: 'enter' | 'leave'; readonly field: string }
  | { readonly kind: 'try' };

export function pieceFormBegins(typed: TypedPiece, isTried: boolean, isChanged: boolean): PieceFormState {
  return { typed, isChanged, isTried, before: null, inHand: null, fresh: null, news: '' };
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
      return `bands.${String(act.band + 1)}.technique`;
    case 'add-shape':
      return `bands.${String(act.band)}.shapes.${String(typed.bands[act.band]?.shapes.length ?? 0)}.shape`;
    case 'add-yarn':
      return `yarns.${String(typed.yarns.length)}.role`;
    default:
      return null;
  }
}

const takesOut = ({ do: what }: Act): boolean => what.startsWith('take-out');

export function pieceFormAfter(state: PieceFormState, event: PieceFormEvent): PieceFormState {
  switch (event.kind) {
    case 'type':
      return { ...state, typed: typeIn(state.typed, event.field, event.text), isChanged: true, fresh: null };
    case 'act': {
      const before = takesOut(event.act) ? state.typed : state.before;
      return { ...state, typed: changeTyped(state.typed, event.act), isChanged: true, before, inHand: null, fresh: freshOf(event.act, state.typed), news: newsOf(event.act, state.typed) };
    }
    case 'put-back':
      return state.before === null ? state : { ...state, typed: state.before, before: null, news: 'It is back.' };
    case 'enter':
      return { ...state, inHand: event.field };
    case 'leave':
      return state.inHand === event.field ? { ...state, inHand: null } : state;
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
export function placeOfField(field: string, typed: TypedPiece): string {
  const [group, index, kind, shape] = field.split('.');
  if (group === 'bands' && index !== undefined) {
    const band = `Band ${String(Number(index) + 1)}`;
    return kind === 'shapes' && shape !== undefined ? `${band}, shape ${String(Number(shape) + 1)}` : band;
  }
  if (group === 'yarns' && index !== undefined) {
    const role = typed.yarns[Number(index)]?.texts['role'] ?? '';
    return role === '' ? `Yarn ${String(Number(index) + 1)}` : `Yarn ${role}`;
  }
  if (field.startsWith('warp.yarn')) return 'Warp yarn';
  return field === 'bands' ? 'Bands' : '';
}
