import { useEffect, useState, type ReactNode } from 'react';

interface FoldProps {
  summary: ReactNode;
  /** Something in it must be seen: it opens, and stays open until the person closes it. */
  needed: boolean;
  className?: string | undefined;
  summaryClass?: string | undefined;
  children: ReactNode;
}

/** What is folded away until it is asked for. It never closes under the hand that types in it. */
export function Fold({ summary, needed, className, summaryClass, children }: FoldProps) {
  const [isOpen, setOpen] = useState(needed);
  useEffect(() => { if (needed) setOpen(true); }, [needed]);
  return (
    <details className={className} open={isOpen} onToggle={(event) => { setOpen(event.currentTarget.open); }}>
      <summary className={summaryClass}>{summary}</summary>
      {children}
    </details>
  );
}
