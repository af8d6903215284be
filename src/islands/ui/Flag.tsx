import type { ReactNode } from 'react';
import { flagKinds, type FlagKind } from '#islands/ui/flag-kinds.ts';
import { Glyph } from '#islands/ui/Glyph.tsx';

/** A state: its glyph, then its word. */
export function Flag({ kind, small = false, children }: { kind: FlagKind; small?: boolean | undefined; children: ReactNode }) {
  const { class: ofKind, glyph } = flagKinds[kind];
  return (
    <span className={small ? `${ofKind} flag-small` : ofKind}>
      <i><Glyph name={glyph} /></i>
      <span>{children}</span>
    </span>
  );
}
