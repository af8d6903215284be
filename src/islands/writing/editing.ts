/** A text being written, apart from any screen: what is kept, what was typed since, what stands in the way. */
import type { DraftKept, TextRemarks } from '#contracts/workroom.ts';

export interface Editing {
  /** Counts changes of the text on this screen; the text itself stays in its field. */
  readonly edits: number;
  /** How many of them are kept. */
  readonly keptEdits: number;
  /** Of the draft as it is kept, as far as this window knows. */
  readonly revision: number;
  /** Time of day of the last keeping from this window; null before the first. */
  readonly savedAt: string | null;
  readonly saving: boolean;
  readonly remarks: TextRemarks;
  /** The change after which the text was read for these remarks. */
  readonly readEdits: number;
  /** What went wrong with the last keeping, in words. */
  readonly trouble: string | null;
  /** The line is down: what was typed is kept on this device meanwhile. */
  readonly away: boolean;
  /** What another window kept in the meantime. Nothing more is kept by itself until the writer has decided. */
  readonly behind: { readonly revision: number; readonly source: string } | null;
}

export type EditEvent =
  | { readonly kind: 'typed' }
  | { readonly kind: 'read'; readonly edits: number; readonly remarks: TextRemarks }
  | { readonly kind: 'save-began' }
  | { readonly kind: 'kept'; readonly edits: number; readonly draft: DraftKept }
  | { readonly kind: 'failed'; readonly says: string; readonly away?: boolean }
  /** What an earlier visit left on this device was put into the field; it was written over `revision`. */
  | { readonly kind: 'brought-back'; readonly revision: number }
  | { readonly kind: 'behind'; readonly revision: number; readonly source: string }
  /** Go on from the other window's text, with one's own over it. */
  | { readonly kind: 'keep-mine' }
  /** The other window's text was put into the field. */
  | { readonly kind: 'took-other' };

export function beginEditing(revision: number, remarks: TextRemarks): Editing {
  return { edits: 0, keptEdits: 0, revision, savedAt: null, saving: false, remarks, readEdits: 0, trouble: null, away: false, behind: null };
}

/** Whether something on the screen is not kept yet. */
export function isUnsaved({ edits, keptEdits }: Editing): boolean {
  return edits > keptEdits;
}

/** Whether it may be kept by itself now. */
export function maySave(state: Editing): boolean {
  return isUnsaved(state) && !state.saving && state.behind === null;
}

export function editingAfter(state: Editing, event: EditEvent): Editing {
  switch (event.kind) {
    case 'typed':
      return { ...state, edits: state.edits + 1 };
    case 'read':
      return withRemarks(state, event.edits, event.remarks);
    case 'save-began':
      return { ...state, saving: true, trouble: null, away: false };
    case 'kept': {
      const { revision, savedAt, problems, warnings } = event.draft;
      return withRemarks({ ...state, saving: false, trouble: null, revision, savedAt, keptEdits: Math.max(state.keptEdits, event.edits) }, event.edits, { problems, warnings });
    }
    case 'failed':
      return { ...state, saving: false, trouble: event.says, away: event.away ?? false };
    case 'brought-back':
      return { ...state, edits: state.edits + 1, revision: event.revision };
    case 'behind':
      return { ...state, saving: false, trouble: null, behind: { revision: event.revision, source: event.source } };
    case 'keep-mine':
      return state.behind === null ? state : { ...state, revision: state.behind.revision, behind: null, edits: state.edits + 1 };
    case 'took-other':
      return state.behind === null ? state : { ...state, revision: state.behind.revision, behind: null, keptEdits: state.edits };
  }
}

/** Answers may come out of order: remarks on an older text never replace those on a newer one. */
function withRemarks(state: Editing, edits: number, remarks: TextRemarks): Editing {
  return edits < state.readEdits ? state : { ...state, remarks, readEdits: edits };
}

/** What is said beside the Save button. */
export function statusWords(state: Editing): string {
  if (state.behind !== null) return 'Not saved: another window was first.';
  if (state.saving) return 'Saving.';
  if (state.trouble !== null) return state.trouble;
  if (isUnsaved(state)) return 'Not saved yet.';
  return state.savedAt === null ? '' : `Saved ${state.savedAt}`;
}
