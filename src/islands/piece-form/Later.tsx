import { Suspense, useState, type ReactNode } from 'react';

/** Folded, and loaded when it is opened: what it holds is not needed to describe a piece. */
export function Later({ title, children, className = 'fold' }: { readonly title: string; readonly children: () => ReactNode; readonly className?: string }) {
  const [isOpen, setOpen] = useState(false);
  return (
    <details className={`${className} needs-script`} onToggle={(event) => { setOpen(event.currentTarget.open); }}>
      <summary><h2 className="h3">{title}</h2></summary>
      {isOpen && <Suspense fallback={<p className="quiet" role="status">Loading.</p>}>{children()}</Suspense>}
    </details>
  );
}
