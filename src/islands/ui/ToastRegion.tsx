import { useCallback, useEffect, useReducer, useRef, useState } from 'react';
import { toastsAfter, usualMs, type Toast } from '#islands/ui/toasts.ts';

interface Said {
  /** The act it offers, such as taking back what was done. */
  act?: { label: string; run: () => void } | undefined;
  /** Called when it left without its act: what was held back can be sent now. */
  after?: (() => void) | undefined;
  lastsMs?: number | undefined;
}

export interface Toasts {
  readonly list: readonly Toast[];
  say: (says: string, said?: Said) => void;
  /** A toast left: by its act, or because its time was over. */
  leave: (id: number, byAct: boolean) => void;
}

/** Toasts of one island. Errors are never toasts: they stand where they belong. */
export function useToasts(): Toasts {
  const [list, send] = useReducer(toastsAfter, []);
  const next = useRef(1);
  const waiting = useRef(new Map<number, Said>());
  const say = useCallback((says: string, said: Said = {}) => {
    const id = next.current;
    next.current += 1;
    waiting.current.set(id, said);
    send({ kind: 'say', toast: { id, says, act: said.act?.label, lastsMs: said.lastsMs ?? usualMs } });
  }, []);
  const leave = useCallback((id: number, byAct: boolean) => {
    const said = waiting.current.get(id);
    if (!waiting.current.delete(id)) return;
    send({ kind: 'gone', id });
    if (byAct) said?.act?.run();
    else said?.after?.();
  }, []);
  return { list, say, leave };
}

/** Where toasts appear. Stands on the page from the start, so that screen readers listen to it. */
export function ToastRegion({ toasts: { list, leave } }: { toasts: Toasts }) {
  return (
    <div className="toasts" role="status">
      {list.map((toast) => <OneToast key={toast.id} toast={toast} onLeave={leave} />)}
    </div>
  );
}

function OneToast({ toast, onLeave }: { toast: Toast; onLeave: Toasts['leave'] }) {
  const [held, setHeld] = useState(false);
  useEffect(() => {
    if (held) return;
    const timer = setTimeout(() => onLeave(toast.id, false), toast.lastsMs);
    return () => clearTimeout(timer);
  }, [held, toast.id, toast.lastsMs, onLeave]);
  return (
    <div className="toast" onMouseEnter={() => setHeld(true)} onMouseLeave={() => setHeld(false)} onFocus={() => setHeld(true)} onBlur={() => setHeld(false)}>
      <span>{toast.says}</span>
      {toast.act !== undefined && <button type="button" onClick={() => onLeave(toast.id, true)}>{toast.act}</button>}
    </div>
  );
}
