import { useCallback, useEffect, useMemo, useReducer } from 'react';
import type { DraftKept, TextRemarks } from '#contracts/workroom.ts';
import { useKeeping } from '#islands/keeping/use-keeping.ts';
import { DRAFT_KEPT, type DraftKeptDetail } from '#islands/writing/draft-kept.ts';
import { beginEditing, editingAfter, type EditEvent, type Editing, type OtherText } from '#islands/writing/editing.ts';
import { anchorAt } from '#islands/writing/preview-anchor.ts';
import { Reader } from '#islands/writing/reader.ts';

/** A pause in the typing after which the text is read. */
const READ_AFTER_MS = 250;

interface Draft {
  readonly state: Editing;
  readonly change: (event: EditEvent) => void;
  /** Keeps what is on the screen now. */
  readonly save: () => void;
}

/** Follows a text on the screen: reads it after a pause, keeps it by itself, and holds it on this device until it is kept. */
export function useDraft(textNow: () => string, placeNow: () => number, lesson: string, revision: number, remarks: TextRemarks): Draft {
  const [state, change] = useReducer(editingAfter, beginEditing(revision, remarks));
  const bodyNow = useCallback((known: number) => ({ lesson, revision: known, source: textNow() }), [lesson, textNow]);
  const save = useKeeping<DraftKept, OtherText>({ state, change, name: lesson, textNow, address: '/api/workroom/lesson-draft', bodyNow });

  useReading(textNow, state, change);

  const { keptEdits, remarks: { problems } } = state;
  useEffect(() => {
    if (keptEdits > 0 && problems.length === 0) {
      const detail: DraftKeptDetail = { anchor: anchorAt(textNow(), placeNow()) };
      document.dispatchEvent(new CustomEvent(DRAFT_KEPT, { detail }));
    }
  }, [keptEdits, placeNow, problems.length, textNow]);

  return { state, change, save };
}

function useReading(textNow: () => string, { edits, readEdits }: Editing, change: (event: EditEvent) => void): void {
  const reader = useMemo(() => new Reader(), []);
  useEffect(() => () => reader.close(), [reader]);
  useEffect(() => {
    if (edits === readEdits) return;
    const timer = setTimeout(() => {
      void reader.read(textNow()).then((remarks) => { if (remarks !== null) change({ kind: 'read', edits, remarks }); });
    }, READ_AFTER_MS);
    return () => clearTimeout(timer);
  }, [change, edits, readEdits, reader, textNow]);
}
