import { useEffect, useId, useRef, type ReactNode } from 'react';

interface DialogProps {
  open: boolean;
  /** The question. */
  title: string;
  /** Called by Esc too. */
  onClose: () => void;
  /** The safe one first, with `autoFocus`. */
  acts: ReactNode;
  children: ReactNode;
}

/** A question that stops the work; the page behind it is out of reach until it is answered or put away. */
export function Dialog({ open, title, onClose, acts, children }: DialogProps) {
  const ref = useRef<HTMLDialogElement>(null);
  const heading = useId();
  useEffect(() => {
    const dialog = ref.current;
    if (dialog === null) return;
    if (open && !dialog.open) {
      dialog.showModal();
      dialog.querySelector<HTMLElement>('.ends > :first-child')?.focus();
    } else if (!open && dialog.open) dialog.close();
  }, [open]);
  return (
    <dialog ref={ref} className="dialog above" aria-labelledby={heading} onCancel={(event) => { event.preventDefault(); onClose(); }} onClose={() => { if (open) onClose(); }}>
      <h2 className="h3" id={heading}>{title}</h2>
      {children}
      <div className="ends">{acts}</div>
    </dialog>
  );
}
