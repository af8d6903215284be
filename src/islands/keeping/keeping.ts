/** Something being written that keeps itself, apart from any screen: what is kept, what was changed since, what stands in the way. */

/** What another window kept in the meantime. */
export interface Other {
  readonly revision: number;
}

/** The answer of a keeping. `savedAt` is a time of day on the writer's clock. */
export interface Kept {
  readonly revision: number;
  readonly savedAt: string;
}

export interface Keeping<O extends Other> {
  /** Counts changes on this screen; what is written stays in its field. */
  readonly edits: number;
  /** How many of them are kept. */
  readonly keptEdits: number;
  /** Of the draft as it is kept, as far as this window knows. */
  readonly revision: number;
  /** Time of day of the last keeping from this window; null before the first. */
  readonly savedAt: string | null;
  readonly saving: boolean;
  /** What went wrong with the last keeping, in words. */
  readonly trouble: string | null;
  /** The line is down: what was typed is kept on this device meanwhile. */
  readonly away: boolean;
  /** What another window kept in the meantime. Nothing more is kept by itself until the writer has decided. */
  readonly behind: O | null;
}

export type KeepingEvent<O extends Other> =
  | { readonly kind: 'typed' }
  | { readonly kind: 'save-began' }
  | { readonly kind: 'kept'; readonly edits: number; readonly draft: Kept }
  | { readonly kind: 'failed'; readonly says: string; readonly away?: boolean }
  /** A form took it along by itself. */
  | { readonly kind: 'sent' }
  /** What an earlier visit left on this device was put into the field; it was written over `revision`. */
  | { readonly kind: 'brought-back'; readonly revision: number }
  | { readonly kind: 'behind'; readonly other: O }
  /** Go on from what the other window kept, with one's own over it. */
  | { readonly kind: 'keep-mine' }
  /** What the other window kept was put into the field. */
  | { readonly kind: 'took-other' };

export function beginKeeping(revision: number): Keeping<never> {
  return { edits: 0, keptEdits: 0, revision, savedAt: null, saving: false, trouble: null, away: false, behind: null };
}

/** Whether something on the screen is not kept yet. */
export function isUnsaved({ edits, keptEdits }: Keeping<Other>): boolean {
  return edits > keptEdits;
}

/** Whether it may be kept by itself now. */
export function maySave(state: Keeping<Other>): boolean {
  return isUnsaved(state) && !state.saving && state.behind === null;
}

export function keepingAfter<O extends Other, S extends Keeping<O>>(state: S, event: KeepingEvent<O>): S {
  switch (event.kind) {
    case 'typed':
      return { ...state, edits: state.edits + 1 };
    case 'save-began':
      return { ...state, saving: true, trouble: null, away: false };
    case 'kept': {
      const { revision, savedAt } = event.draft;
      return { ...state, saving: false, trouble: null, revision, savedAt, keptEdits: Math.max(state.keptEdits, event.edits) };
    }
    case 'failed':
      return { ...state, saving: false, trouble: event.says, away: event.away ?? false };
    case 'sent':
      return { ...state, keptEdits: state.edits };
    case 'brought-back':
      return { ...state, edits: state.edits + 1, revision: event.revision };
    case 'behind':
      return { ...state, saving: false, trouble: null, behind: event.other };
    case 'keep-mine':
      return state.behind === null ? state : { ...state, revision: state.behind.revision, behind: null, edits: state.edits + 1 };
    case 'took-other':
      return state.behind === null ? state : { ...state, revision: state.behind.revision, behind: null, keptEdits: state.edits };
  }
}

/** What is said beside the Save button. */
export function statusWords(state: Keeping<Other>): string {
  if (state.behind !== null) return 'Not saved: another window was first.';
  if (state.saving) return 'Saving.';
  if (state.trouble !== null) return state.trouble;
  if (isUnsaved(state)) return 'Not saved yet.';
  return state.savedAt === null ? '' : `Saved ${state.savedAt}`;
}
