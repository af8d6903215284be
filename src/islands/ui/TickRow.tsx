import type { ReactNode } from 'react';
import { Glyph } from '#islands/ui/Glyph.tsx';
import { YarnDot } from '#islands/ui/YarnDot.tsx';

interface TickRowProps {
  name: string;
  value?: string | undefined;
  checked: boolean;
  onTick: (checked: boolean) => void;
  what: ReactNode;
  much?: ReactNode;
  more?: ReactNode;
  also?: ReactNode;
  /** Colour of a yarn, `#rrggbb`. */
  yarn?: string | undefined;
  /** Kept on this device, not yet on the server. */
  unsent?: boolean | undefined;
}

/** One thing to tick; the whole row is the label. */
export function TickRow({ name, value, checked, onTick, what, much, more, also, yarn, unsent = false }: TickRowProps) {
  return (
    <label className="tick" aria-busy={unsent || undefined}>
      <input type="checkbox" name={name} value={value} checked={checked} onChange={(event) => onTick(event.currentTarget.checked)} />
      <span className="box"><Glyph name="on" /></span>
      <span className="what">{yarn !== undefined && <YarnDot colour={yarn} />}{what}</span>
      {much !== undefined && <span className="much">{much}</span>}
      {more !== undefined && <span className="more">{more}</span>}
      {also !== undefined && <span className="also">{also}</span>}
    </label>
  );
}
