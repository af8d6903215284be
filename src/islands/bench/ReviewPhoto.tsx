import { useEffect, useReducer, useRef, useState } from 'react';
import type { NoteInput } from '#contracts/bench.ts';
import { answerAfter, newAnswer } from '#islands/bench/answer.ts';
import { KeyList } from '#islands/bench/KeyList.tsx';
import { PhotoFrame, type Shown } from '#islands/bench/PhotoFrame.tsx';
import { Phrases } from '#islands/bench/Phrases.tsx';
import { PinnedNotes } from '#islands/bench/PinnedNotes.tsx';
import { Pins } from '#islands/bench/Pins.tsx';
import { SeeChoice } from '#islands/bench/SeeChoice.tsx';
import { ShotStrip } from '#islands/bench/ShotStrip.tsx';
import { useBenchKeys } from '#islands/bench/use-bench-keys.ts';
import { closer, moved, onPhoto, STEP, turned, WHOLE } from '#islands/bench/view.ts';
import { ViewBar } from '#islands/bench/ViewBar.tsx';
import { TextField } from '#islands/ui/Field.tsx';
import { Glyph } from '#islands/ui/Glyph.tsx';
import { typedBefore } from '#islands/ui/typed-before.ts';

export interface ReviewPhotoProps {
  /** Address the verdict is posted to. */
  action: string;
  publicId: string;
  /** The photos shown together, at least one. */
  shots: readonly Shown[];
  /** What she has shown before, the newest first, each with the words it is called by. */
  earlier: readonly (Shown & { says: string })[];
  studentName: string;
  /** What a *mend first* can lead to: steps of the part, common faults in the handbook. */
  sees: readonly { readonly value: string; readonly label: string }[];
  phrases: readonly string[];
  /** What was typed before, when the form came back or a verdict was taken back. */
  typed: { words: string; notes: readonly NoteInput[]; see: string };
  errors: { words?: string | undefined; notes?: string | undefined };
  /** Public id of the photo that is taken in hand after the verdict. */
  next: string | null;
  /** Addresses of the photo before and after in the queue. */
  before: string | null;
  after: string | null;
}

type Verdict = 'weave-on' | 'mend-first';
/** How far one press of an arrow key moves a photo that is closer than its frame, as a share of it. */
const PAN = 0.12;

const NOTHING_SHOWN: Shown = { src: '', width: 4, height: 3, alt: '' };

const goTo = (address: string | null): void => { if (address !== null) location.assign(address); };

/** The photo at the bench: how it is looked at, pins by mouse, finger or keys, words and phrases, and the verdict. */
export function ReviewPhoto({ action, publicId, shots, earlier, studentName, sees, phrases, typed, errors, next, before, after }: ReviewPhotoProps) {
  const [answer, change] = useReducer(answerAfter, newAnswer(typed.words, typed.notes));
  const [view, look] = useState(WHOLE);
  const [at, setAt] = useState(0);
  const [beside, setBeside] = useState(-1);
  const [keysShown, showKeys] = useState(false);
  const [alive, setAlive] = useState(false);
  const form = useRef<HTMLFormElement>(null);
  const sent = useRef(false);
  const photo = shots[at] ?? NOTHING_SHOWN;
  const shot = at + 1;
  const onShot = at === 0 ? {} : { shot };
  const aspect = photo.width / photo.height;
  const laid = earlier[beside];

  useEffect(() => {
    for (const [name, text] of form.current === null ? [] : typedBefore(form.current)) if (name === 'words') change({ kind: 'write', words: text });
    setAlive(true);
  }, []);

  const put = () => change({ kind: 'put', by: 'key', ...onShot, ...(onPhoto(view, aspect, { x: 0, y: 0 }) ?? { xPermille: 500, yPermille: 500 }) });
  const lookAt = (index: number) => { setAt(index); look(WHOLE); };
  const layNext = () => setBeside((at) => (at + 1 < earlier.length ? at + 1 : -1));
  const say = (verdict: Verdict) => form.current?.requestSubmit(form.current.querySelector<HTMLElement>(`button[value="${verdict}"]`));
  useBenchKeys({
    'w': () => say('weave-on'),
    'm': () => say('mend-first'),
    'z': () => document.querySelector<HTMLFormElement>('form[data-take-back]')?.requestSubmit(),
    'j': () => goTo(after),
    'k': () => goTo(before),
    'n': () => lookAt((at + 1) % shots.length),
    'p': put,
    't': () => form.current?.querySelector<HTMLElement>('textarea[name="words"]')?.focus(),
    'c': layNext,
    'r': () => look(turned),
    '+': () => look((was) => closer(was, aspect, STEP)),
    '-': () => look((was) => closer(was, aspect, 1 / STEP)),
    '0': () => look((was) => ({ ...WHOLE, turns: was.turns })),
    '?': () => showKeys(true),
    phrase: (number) => { const phrase = phrases[number - 1]; if (phrase !== undefined) change({ kind: 'insert', phrase }); },
    pan: view.zoom > 1 ? (dx, dy) => look((was) => moved(was, aspect, dx * PAN, dy * PAN)) : null,
  });

  return (
    <div className="bench-work" data-alive={alive || undefined}>
      <div className={laid === undefined ? 'panes' : 'panes is-beside'}>
        <figure>
          <PhotoFrame {...{ photo, view, look }} onPress={(pressed, by) => { const place = onPhoto(view, aspect, pressed); if (place !== null) change({ kind: 'put', by, ...onShot, ...place }); }}>
            <Pins {...{ answer, change, view, aspect, shot }} />
          </PhotoFrame>
          {laid !== undefined && <figcaption className="small">In hand</figcaption>}
        </figure>
        {laid !== undefined && <figure><PhotoFrame photo={laid} view={view} look={look} /><figcaption className="small">{laid.says}</figcaption></figure>}
      </div>
      {shots.length > 1 && <ShotStrip {...{ shots, at, lookAt, answer }} />}
      {alive && <ViewBar {...{ view, look, aspect }} onPin={put} onKeys={() => showKeys(true)} beside={earlier.length === 0 ? null : { says: besideWords(beside, earlier.length), next: layNext }} />}
      <form ref={form} method="post" action={action} className="bench-form" onSubmit={(event) => { if (sent.current) event.preventDefault(); sent.current = true; }}>
        <input type="hidden" name="photo" value={publicId} />
        {next !== null && <input type="hidden" name="next" value={next} />}
        <input type="hidden" name="notes" value={JSON.stringify(answer.notes)} />
        <PinnedNotes {...{ answer, change }} error={errors.notes} shotCount={shots.length} />
        <TextField
          name="words" label={`To ${studentName}`} hint="Goes into the letter, above the notes." error={errors.words} maxLength={2_000} optional
          value={answer.words} onChange={(event) => change({ kind: 'write', words: event.target.value })} onFocus={() => change({ kind: 'choose', index: -1 })}
        />
        <SeeChoice {...{ sees, alive }} first={typed.see} />
        <Phrases {...{ phrases, answer, change, studentName }} />
        <div className="verdict">
          <button type="submit" name="verdict" value="weave-on" className="btn btn-on" aria-keyshortcuts="W"><Glyph name="on" />Weave on <span className="key only-desk" aria-hidden="true">W</span></button>
          <button type="submit" name="verdict" value="mend-first" className="btn btn-mend full" aria-keyshortcuts="M"><Glyph name="mend" />Mend first <span className="key only-desk" aria-hidden="true">M</span></button>
        </div>
      </form>
      {keysShown && <KeyList open onClose={() => showKeys(false)} />}
    </div>
  );
}

function besideWords(beside: number, count: number): string {
  if (beside < 0) return count === 1 ? 'Lay her earlier photo beside it' : 'Lay earlier photos beside it';
  return beside + 1 < count ? 'The one before that' : 'Put it away';
}
