import { useCallback, useEffect, useReducer, useRef, type RefObject } from 'react';
import type { DraftBehind, DraftKept, TextRemarks } from '#contracts/workroom.ts';
import { beginEditing, editingAfter, isUnsaved, maySave, type EditEvent, type Editing } from '#islands/workroom/editing.ts';
import { DRAFT_KEPT } from '#islands/workroom/draft-kept.ts';

/** A pause in the typing after which the text is read, and after which it is kept. */
const READ_AFTER_MS = 500;
const KEEP_AFTER_MS = 2_000;
/** How long to wait before a keeping that failed is tried again. */
const AGAIN_AFTER_MS = 10_000;

const AWAY = 'Not saved: the line is down. It is tried again by itself; keep this window open.';

interface Draft {
  readonly state: Editing;
  readonly change: (event: EditEvent) => void;
  /** Keeps what is on the screen now. */
  readonly save: () => void;
}

async function post(path: string, body: unknown): Promise<Response> {
  return fetch(path, { method: 'POST', headers: { 'content-type': 'application/json' }, body: JSON.stringify(body) });
}

/** Follows a text field: reads the text after a pause, keeps it by itself, and warns before it would be lost. */
export function useDraft(field: RefObject<HTMLTextAreaElement | null>, lesson: string, revision: number, remarks: TextRemarks): Draft {
  const [state, change] = useReducer(editingAfter, beginEditing(revision, remarks));
  const now = useRef(state);
  now.current = state;

  const save = useCallback(() => {
    const text = field.current;
    if (text === null || now.current.saving || now.current.behind !== null) return;
    const { edits, revision: known } = now.current;
    change({ kind: 'save-began' });
    void keep({ lesson, revision: known, source: text.value }).then((answer) => change(answer.kind === 'kept' ? { ...answer, edits } : answer));
  }, [field, lesson]);

  useEffect(() => {
    const text = field.current;
    const onInput = () => change({ kind: 'typed' });
    text?.addEventListener('input', onInput);
    // Typed before the script woke, or put back by the browser after going back and forth.
    if (text !== null && text.value !== text.defaultValue) change({ kind: 'typed' });
    return () => text?.removeEventListener('input', onInput);
  }, [field]);

  useEffect(() => {
    if (state.edits === state.readEdits) return;
    const timer = setTimeout(() => {
      const { edits } = now.current;
      void read(field.current?.value ?? '').then((answer) => { if (answer !== null) change({ kind: 'read', edits, remarks: answer }); });
    }, READ_AFTER_MS);
    return () => clearTimeout(timer);
  }, [field, state.edits, state.readEdits]);

  useEffect(() => {
    if (!maySave(state)) return;
    const timer = setTimeout(save, state.trouble === null ? KEEP_AFTER_MS : AGAIN_AFTER_MS);
    return () => clearTimeout(timer);
  }, [save, state]);

  useEffect(() => {
    if (!isUnsaved(state)) return;
    const onLeave = (event: BeforeUnloadEvent) => event.preventDefault();
    window.addEventListener('beforeunload', onLeave);
    return () => window.removeEventListener('beforeunload', onLeave);
  }, [state]);

  const { keptEdits, remarks: { problems } } = state;
  useEffect(() => {
    if (keptEdits > 0 && problems.length === 0) document.dispatchEvent(new Event(DRAFT_KEPT));
  }, [keptEdits, problems.length]);

  return { state, change, save };
}

type Kept = { kind: 'kept'; draft: DraftKept } | { kind: 'failed'; says: string } | { kind: 'behind'; revision: number; source: string };

async function keep(input: { lesson: string; revision: number; source: string }): Promise<Kept> {
  try {
    const answer = await post('/api/workroom/lesson-draft', input);
    if (answer.ok) return { kind: 'kept', draft: (await answer.json()) as DraftKept };
    if (answer.status === 409) return { kind: 'behind', ...((await answer.json()) as DraftBehind).behind };
    const { title, fields } = (await answer.json()) as { title?: string; fields?: { source?: string } };
    return { kind: 'failed', says: `Not saved: ${fields?.source ?? title ?? 'it could not be kept just now.'}` };
  } catch {
    return { kind: 'failed', says: AWAY };
  }
}

/** Null when it could not be read just now; the next pause tries again. */
async function read(source: string): Promise<TextRemarks | null> {
  try {
    const answer = await post('/api/workroom/lesson-check', { source });
    return answer.ok ? ((await answer.json()) as TextRemarks) : null;
  } catch {
    return null;
  }
}
