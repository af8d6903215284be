import type { QueueState } from '#islands/ticks/tick-queue.ts';
import { Glyph } from '#islands/ui/Glyph.tsx';

const WORDS: Readonly<Record<QueueState['waits'], string>> = {
  nothing: '',
  later: 'No signal. Ticks are kept here.',
  'signed-out': 'You are signed out. Ticks are kept here until you sign in.',
};

/** Says when ticks are on this device only; there from the start, so that screen readers listen. */
export function KeptHere({ queue }: { queue: QueueState }) {
  const words = queue.refused.size > 0 ? 'This list was changed by your teacher. Load the page again to tick it.' : queue.unsent.size > 0 ? WORDS[queue.waits] : '';
  return (
    <p className="kept-here small quiet" role="status">
      {words !== '' && <Glyph name="signal" />}
      {words}
    </p>
  );
}
