import { useState } from 'react';
import { Button } from '#islands/ui/Button.tsx';

/** Moves all lines by seconds: for captions that were written to another cut. */
export function ShiftAll({ onShift }: { onShift: (byMs: number) => void }) {
  const [typed, setTyped] = useState('0.5');
  const seconds = Number(typed.replace(',', '.'));
  const isFit = Number.isFinite(seconds) && seconds > 0 && seconds <= 3_600;
  const shift = (sign: 1 | -1) => (): void => { if (isFit) onShift(sign * Math.round(seconds * 1_000)); };
  return (
    <span className="shift-all row">
      <label htmlFor="shift-by" className="small">All lines by</label>
      <input id="shift-by" inputMode="decimal" value={typed} size={4} aria-invalid={!isFit || undefined} onChange={(event) => setTyped(event.currentTarget.value)} />
      <span className="small">s</span>
      <Button small onClick={shift(-1)}>Earlier</Button>
      <Button small onClick={shift(1)}>Later</Button>
    </span>
  );
}
