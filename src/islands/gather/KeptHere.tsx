import type { TicksHere } from '#islands/ticks/tick-outbox.ts';
import { Glyph } from '#islands/ui/Glyph.tsx';

const WORDS: Readonly<Record<TicksHere['waits'], string>> = {
  nothing: '',
  later: 'No signal. Ticks are kept here.',
  'signed-out': 'You are signed out. Ticks are kept here until you sign in.',
};

/** Says when ticks are on this device only; there from the start, so that screen readers listen. */
export function KeptHere({ here }: { here: TicksHere }) {
  const words = here.refused > 0 ? 'This list was changed by your teacher. Load the page again to tick it.' : here.unsent.size > 0 ? WORDS[here.waits] : '';
  return (
    <p className="kept-here small quiet" role="status">
      {words !== '' && <Glyph name="signal" />}
      {words}
    </p>
  );
}
