import { useCallback, useEffect, useReducer, useRef } from 'react';
import type { CuesBehind, CuesKept, KeepCuesInput } from '#contracts/video.ts';
import type { Cue } from '#core/captions/cues.ts';
import { beginCueEditing, cueEditingAfter, cuesOf, faultsOf, isUnsaved, type CueEditing, type CueEvent } from './cue-editing.ts';

/** After the last change, before it is kept. */
const KEEP_AFTER_MS = 1_500;
/** After it could not be kept, before it is tried again. */
const AGAIN_AFTER_MS = 10_000;
const AWAY = 'Not saved: the line is down. It is tried again by itself; keep this window open.';

export type KeepCues = (input: KeepCuesInput) => Promise<Response>;

export const postCues: KeepCues = (input) => fetch('/api/workroom/captions', { method: 'POST', headers: { 'content-type': 'application/json' }, body: JSON.stringify(input) });

/** Lines that keep themselves a moment after they were changed, unless one of them cannot stand. */
export function useCues(video: string, first: readonly Cue[], revision: number, durationMs: number, keep: KeepCues): { state: CueEditing; faults: ReadonlyMap<number, string>; tell: (event: CueEvent) => void; save: () => void } {
  const [state, tell] = useReducer(cueEditingAfter, null, () => beginCueEditing(first, revision));
  const faults = faultsOf(state, durationMs);
  const now = useRef(state);
  now.current = state;
  const save = useCallback(() => {
    const { edits, revision: known, behind, isSaving } = now.current;
    if (isSaving || behind !== null) return;
    tell({ kind: 'save-began' });
    void send(keep, { video, revision: known, cues: cuesOf(now.current) }).then((answer) => { tell(answer.kind === 'kept' ? { ...answer, edits } : answer); });
  }, [keep, video]);

  const maySave = isUnsaved(state) && !state.isSaving && state.behind === null && faults.size === 0;
  useEffect(() => {
    if (!maySave) return;
    const timer = setTimeout(save, state.trouble === null ? KEEP_AFTER_MS : AGAIN_AFTER_MS);
    return () => clearTimeout(timer);
  }, [maySave, save, state.edits, state.trouble]);

  const unsaved = isUnsaved(state);
  useEffect(() => {
    if (!unsaved) return;
    const onLeave = (event: BeforeUnloadEvent): void => { event.preventDefault(); };
    window.addEventListener('beforeunload', onLeave);
    return () => window.removeEventListener('beforeunload', onLeave);
  }, [unsaved]);

  // The plain forms beside the editor speak of the same draft.
  useEffect(() => {
    for (const field of document.querySelectorAll<HTMLInputElement>('input[name="revision"]')) field.value = String(state.revision);
  }, [state.revision]);
  return { state, faults, tell, save };
}

async function send(keep: KeepCues, input: KeepCuesInput): Promise<({ kind: 'kept' } & CuesKept) | { kind: 'failed'; says: string } | ({ kind: 'behind' } & CuesBehind['behind'])> {
  try {
    const answer = await keep(input);
    if (answer.ok) return { kind: 'kept', ...((await answer.json()) as CuesKept) };
    if (answer.status === 409) return { kind: 'behind', ...((await answer.json()) as CuesBehind).behind };
    const { title, fields } = (await answer.json()) as { title?: string; fields?: { cues?: string } };
    return { kind: 'failed', says: `Not saved: ${fields?.cues ?? title ?? 'it could not be kept just now.'}` };
  } catch {
    return { kind: 'failed', says: AWAY };
  }
}
