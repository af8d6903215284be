import { useCallback, useEffect, useRef } from 'react';
import { writeCopy } from './device-copy.ts';
import { isUnsaved, maySave, type Keeping, type Kept, type Other } from './keeping.ts';

/** A pause in the writing after which it is kept on this device, and sent to be kept. */
const COPY_AFTER_MS = 300;
const KEEP_AFTER_MS = 1_200;
/** How long to wait before a keeping that failed is tried again. */
const AGAIN_AFTER_MS = 10_000;

/** What `change` is told of keeping; `K` is what the house answers. */
export type KeepEvent<K extends Kept, O extends Other> =
  | { readonly kind: 'save-began' }
  | { readonly kind: 'kept'; readonly edits: number; readonly draft: K }
  | { readonly kind: 'failed'; readonly says: string; readonly away?: boolean }
  | { readonly kind: 'behind'; readonly other: O };

interface Keeper<K extends Kept, O extends Other> {
  readonly state: Keeping<O>;
  readonly change: (event: KeepEvent<K, O>) => void;
  /** Of the copy on this device. */
  readonly name: string;
  readonly textNow: () => string;
  /** Endpoint that keeps, and what it is sent with this revision. */
  readonly address: string;
  readonly bodyNow: (revision: number) => unknown;
}

/** Keeps what is written by itself after a pause, and holds it on this device until it is kept. The answer keeps it at once. */
export function useKeeping<K extends Kept, O extends Other>({ state, change, name, textNow, address, bodyNow }: Keeper<K, O>): () => void {
  const now = useRef(state);
  now.current = state;

  const save = useCallback(() => {
    if (now.current.saving || now.current.behind !== null) return;
    const { edits, revision } = now.current;
    change({ kind: 'save-began' });
    void keep<K, O>(address, bodyNow(revision)).then((answer) => change(answer.kind === 'kept' ? { ...answer, edits } : answer));
  }, [address, bodyNow, change]);

  useDeviceCopy(state, name, textNow);

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

  return save;
}

/** Only where the browser keeps nothing is a person warned before she leaves. */
function useDeviceCopy(state: Keeping<Other>, name: string, textNow: () => string): void {
  const { edits, keptEdits, revision } = state;
  const unsaved = isUnsaved(state);
  useEffect(() => {
    if (!unsaved) {
      if (keptEdits > 0) writeCopy(name, null);
      return;
    }
    const hold = () => writeCopy(name, { revision, source: textNow() });
    const onLeave = (event: BeforeUnloadEvent) => { if (!hold()) event.preventDefault(); };
    const timer = setTimeout(hold, COPY_AFTER_MS);
    window.addEventListener('beforeunload', onLeave);
    window.addEventListener('pagehide', hold);
    return () => {
      clearTimeout(timer);
      window.removeEventListener('beforeunload', onLeave);
      window.removeEventListener('pagehide', hold);
    };
  }, [edits, keptEdits, name, revision, textNow, unsaved]);
}

type Answer<K, O> = { kind: 'kept'; draft: K } | { kind: 'failed'; says: string; away?: boolean } | { kind: 'behind'; other: O };

async function keep<K, O>(address: string, body: unknown): Promise<Answer<K, O>> {
  try {
    const answer = await fetch(address, { method: 'POST', headers: { 'content-type': 'application/json' }, body: JSON.stringify(body) });
    if (answer.ok) return { kind: 'kept', draft: (await answer.json()) as K };
    if (answer.status === 409) return { kind: 'behind', other: ((await answer.json()) as { behind: O }).behind };
    const { title, fields = {} } = (await answer.json()) as { title?: string; fields?: Record<string, string> };
    return { kind: 'failed', says: `Not saved: ${Object.values(fields)[0] ?? title ?? 'it could not be kept just now.'}` };
  } catch {
    return { kind: 'failed', says: 'Kept on this device. It goes out when there is signal.', away: true };
  }
}
