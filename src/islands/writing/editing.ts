/** A text being written: what is kept of it, and what was found in it when it was read. */
import type { DraftKept, TextRemarks } from '#contracts/workroom.ts';
import { beginKeeping, keepingAfter, type Keeping, type KeepingEvent } from '#islands/keeping/keeping.ts';

export interface OtherText {
  readonly revision: number;
  readonly source: string;
}

export interface Editing extends Keeping<OtherText> {
  readonly remarks: TextRemarks;
  /** The change after which the text was read for these remarks. */
  readonly readEdits: number;
}

export type EditEvent =
  | Exclude<KeepingEvent<OtherText>, { readonly kind: 'kept' }>
  | { readonly kind: 'kept'; readonly edits: number; readonly draft: DraftKept }
  | { readonly kind: 'read'; readonly edits: number; readonly remarks: TextRemarks };

export function beginEditing(revision: number, remarks: TextRemarks): Editing {
  return { ...beginKeeping(revision), remarks, readEdits: 0 };
}

export function editingAfter(state: Editing, event: EditEvent): Editing {
  switch (event.kind) {
    case 'read':
      return withRemarks(state, event.edits, event.remarks);
    case 'kept': {
      const { problems, warnings } = event.draft;
      return withRemarks(keepingAfter(state, event), event.edits, { problems, warnings });
    }
    default:
      return keepingAfter(state, event);
  }
}

/** Answers may come out of order: remarks on an older text never replace those on a newer one. */
function withRemarks(state: Editing, edits: number, remarks: TextRemarks): Editing {
  return edits < state.readEdits ? state : { ...state, remarks, readEdits: edits };
}
