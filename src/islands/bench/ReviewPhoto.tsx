import { useEffect, useReducer, useRef, useState } from 'react';
import type { NoteInput } from '#contracts/bench.ts';
import { PinnedNotes } from '#islands/bench/PinnedNotes.tsx';
import { PhotoWithPins } from '#islands/bench/PhotoWithPins.tsx';
import { NO_PINS, pinsAfter } from '#islands/bench/pins.ts';
import { useBenchKeys } from '#islands/bench/use-bench-keys.ts';
import { TextField } from '#islands/ui/Field.tsx';
import { Glyph } from '#islands/ui/Glyph.tsx';
import { ToastRegion, useToasts } from '#islands/ui/ToastRegion.tsx';

export interface ReviewPhotoProps {
  /** Address the verdict is posted to. */
  action: string;
  photo: { publicId: string; src: string; width: number; height: number; alt: string };
  studentName: string;
  /** What was typed before, when the form came back. */
  typed: { words: string; notes: readonly NoteInput[] };
  errors: { words?: string | undefined; notes?: string | undefined };
  /** Addresses of the photo before and after in the queue. */
  before: string | null;
  after: string | null;
}

type Verdict = 'weave-on' | 'mend-first';
const WORDS: Record<Verdict, string> = { 'weave-on': 'Weave on', 'mend-first': 'Mend first' };
/** How long a verdict can be taken back before it is sent. */
const HOLD_MS = 10_000;

/** The photo at the bench: pins by mouse, finger or keys, words, and the verdict, which can be taken back for ten seconds. */
export function ReviewPhoto({ action, photo, studentName, typed, errors, before, after }: ReviewPhotoProps) {
  const [pins, change] = useReducer(pinsAfter, { ...NO_PINS, notes: typed.notes });
  const [held, setHeld] = useState<Verdict | null>(null);
  const form = useRef<HTMLFormElement>(null);
  const area = useRef<HTMLDivElement>(null);
  const toasts = useToasts();

  const choose = (verdict: Verdict) => {
    if (held !== null || form.current?.reportValidity() === false) return;
    setHeld(verdict);
    toasts.say(`${WORDS[verdict]}: goes out to ${studentName} in ten seconds.`, {
      act: { label: 'Take back', run: () => setHeld(null) },
      after: () => form.current?.requestSubmit(),
      lastsMs: HOLD_MS,
    });
  };
  useBenchKeys(area, { choose, before, after, put: () => change({ kind: 'put', xPermille: 500, yPermille: 500 }) });
  useEffect(() => { area.current?.setAttribute('data-alive', ''); }, []);

  return (
    <div ref={area} className="bench-work">
      <PhotoWithPins photo={photo} pins={pins} change={change} />
      <form ref={form} method="post" action={action} className="bench-form">
        <input type="hidden" name="photo" value={photo.publicId} />
        <input type="hidden" name="notes" value={JSON.stringify(pins.notes)} />
        {held !== null && <input type="hidden" name="verdict" value={held} />}
        <PinnedNotes pins={pins} change={change} error={errors.notes} />
        <TextField name="words" label={`To ${studentName}`} hint="Goes into the letter, above the notes." defaultValue={typed.words} error={errors.words} maxLength={2_000} optional />
        <div className="verdict">
          <VerdictButton verdict="weave-on" held={held} onChoose={choose} />
          <VerdictButton verdict="mend-first" held={held} onChoose={choose} />
        </div>
      </form>
      <ToastRegion toasts={toasts} />
    </div>
  );
}

/** Without script it sends at once; with it, the press only chooses. */
function VerdictButton({ verdict, held, onChoose }: { verdict: Verdict; held: Verdict | null; onChoose: (verdict: Verdict) => void }) {
  const weaveOn = verdict === 'weave-on';
  return (
    <button
      type="submit" name="verdict" value={verdict} className={weaveOn ? 'btn btn-on' : 'btn btn-mend full'} aria-pressed={held === verdict}
      aria-keyshortcuts={weaveOn ? 'W' : 'M'}
      onClick={(event) => { event.preventDefault(); onChoose(verdict); }}
    >
      <Glyph name={weaveOn ? 'on' : 'mend'} />{WORDS[verdict]} <span className="key only-desk" aria-hidden="true">{weaveOn ? 'W' : 'M'}</span>
    </button>
  );
}
