import type { ReactNode } from 'react';
import { noticeKinds, type NoticeKind } from '#islands/ui/notice-kinds.ts';

interface NoticeProps {
  title?: string | undefined;
  kind?: NoticeKind | undefined;
  /** Interrupts a screen reader: only for money and lost work. */
  urgent?: boolean | undefined;
  children?: ReactNode;
}

/** What a person should know here. */
export function Notice({ title, kind = 'say', urgent = false, children }: NoticeProps) {
  return (
    <div className={noticeKinds[kind]} role={urgent ? 'alert' : undefined}>
      {title !== undefined && <p className="h4">{title}</p>}
      {children}
    </div>
  );
}
