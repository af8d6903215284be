import { useCallback, useEffect, useMemo, useReducer, useRef } from 'react';
import type { DraftBehind, DraftKept, TextRemarks } from '#contracts/workroom.ts';
import { writeCopy } from '#islands/writing/device-copy.ts';
import { DRAFT_KEPT, type DraftKeptDetail } from '#islands/writing/draft-kept.ts';
import { beginEditing, editingAfter, isUnsaved, maySave, type EditEvent, type Editing } from '#islands/writing/editing.ts';
import { anchorAt } from '#islands/writing/preview-anchor.ts';
import { Reader } from '#islands/writing/reader.ts';

/** A pause in the typing after which the text is read, kept on this device, and sent to be kept. */
const READ_AFTER_MS = 250;
const COPY_AFTER_MS = 300;
const KEEP_AFTER_MS = 1_200;
/** How long to wait before a keeping that failed is tried again. */
const AGAIN_AFTER_MS = 10_000;

interface Draft {
  readonly state: Editing;
  readonly change: (event: EditEvent) => void;
  /** Keeps what is on the screen now. */
  readonly save: () => void;
}

/** Follows a text on the screen: reads it after a pause, keeps it by itself, and holds it on this device until it is kept. */
export function useDraft(textNow: () => string, placeNow: () => number, lesson: string, revision: number, remarks: TextRemarks): Draft {
  const [state, change] = useReducer(editingAfter, beginEditing(revision, remarks));
  const now = useRef(state);
  now.current = state;

  const save = useCallback(() => {
    if (now.current.saving || now.current.behind !== null) return;
    const { edits, revision: known } = now.current;
    change({ kind: 'save-began' });
    void keep({ lesson, revision: known, source: textNow() }).then((answer) => change(answer.kind === 'kept' ? { ...answer, edits } : answer));
  }, [lesson, textNow]);

  useReading(textNow, state, change);
  useDeviceCopy(textNow, lesson, state);

  useEffect(() => {
    if (!maySave(state)) return;
    const timer = setTimeout(save, state.trouble === null ? KEEP_AFTER_MS : AGAIN_AFTER_MS);
    const onLine = () => { if (now.current.away) save(); };
    window.addEventListener('online', onLine);
    return () => {
      clearTimeout(timer);
      window.removeEventListener('online', onLine);
    };
  }, [save, state]);

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

/** Only where the browser keeps nothing is a person warned before she leaves. */
function useDeviceCopy(textNow: () => string, lesson: string, state: Editing): void {
  const { edits, keptEdits, revision } = state;
  const unsaved = isUnsaved(state);
  useEffect(() => {
    if (!unsaved) {
      if (keptEdits > 0) writeCopy(lesson, null);
      return;
    }
    const hold = () => writeCopy(lesson, { revision, source: textNow() });
    const onLeave = (event: BeforeUnloadEvent) => { if (!hold()) event.preventDefault(); };
    const timer = setTimeout(hold, COPY_AFTER_MS);
    window.addEventListener('beforeunload', onLeave);
    window.addEventListener('pagehide', hold);
    return () => {
      clearTimeout(timer);
      window.removeEventListener('beforeunload', onLeave);
      window.removeEventListener('pagehide', hold);
    };
  }, [edits, keptEdits, lesson, revision, textNow, unsaved]);
}

type Kept = { kind: 'kept'; draft: DraftKept } | { kind: 'failed'; says: string; away?: boolean } | { kind: 'behind'; revision: number; source: string };

async function keep(input: { lesson: string; revision: number; source: string }): Promise<Kept> {
  try {
    const answer = await fetch('/api/workroom/lesson-draft', { method: 'POST', headers: { 'content-type': 'application/json' }, body: JSON.stringify(input) });
    if (answer.ok) return { kind: 'kept', draft: (await answer.json()) as DraftKept };
    if (answer.status === 409) return { kind: 'behind', ...((await answer.json()) as DraftBehind).behind };
    const { title, fields } = (await answer.json()) as { title?: string; fields?: { source?: string } };
    return { kind: 'failed', says: `Not saved: ${fields?.source ?? title ?? 'it could not be kept just now.'}` };
  } catch {
    return { kind: 'failed', says: 'Kept on this device. It goes out when there is signal.', away: true };
  }
}
