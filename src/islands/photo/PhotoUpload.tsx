import { useEffect, useState, type SyntheticEvent } from 'react';
import { PHOTO_LIMITS } from '#core/photo/limits.ts';
import { Button } from '#islands/ui/Button.tsx';
import { Field, TextField } from '#islands/ui/Field.tsx';
import { Wrong } from '#islands/ui/Wrong.tsx';
import { carryPhoto, showOnServer } from './carry-photo.ts';
import { keptPhotos, type KeepPhotos } from './kept-photos.ts';
import { DropPhoto } from './DropPhoto.tsx';
import { PHOTO_ACCEPT, sentOf } from './photo-rules.ts';
import { ShotOnItsWay } from './ShotOnItsWay.tsx';
import { bytesOf, type Showing } from './showing.ts';
import type { Show, StartUpload } from './uploader.ts';
import { useKept } from './use-kept.ts';
import { useShowing } from './use-showing.ts';

export interface PhotoUploadProps {
  series: string;
  /** Public id of the lesson with the checkpoint. */
  lesson: string;
  /** Number of the part: where a form without script goes back to. */
  part: number;
  /** First name of the teacher. */
  teacher: string;
  /** When an answer comes: said once the photo is there. */
  answerWords: string;
  /** A photo was shown before. */
  again: boolean;
  /** A photo is asked for now; else another may be sent all the same. */
  open: boolean;
  /** Why the photo sent without script was not taken, and the words that came with it. */
  fault?: string | undefined;
  words?: string | undefined;
  start?: StartUpload;
  show?: Show;
  /** What waits on this device for a connection. */
  kept?: KeepPhotos;
  /** Shows what the server has now. */
  onSent?: () => void;
}

const showThread = (): void => { window.location.reload(); };

/**
 * Showing photos: dropped, chosen or taken, cut and turned. The form under it sends them without script as well; with
 * script they can be watched on their way, and go on by themselves when the line drops.
 */
export function PhotoUpload({ series, lesson, part, teacher, answerWords, again, open, fault, words = '', start = carryPhoto, show = showOnServer, kept = keptPhotos, onSent = showThread }: PhotoUploadProps) {
  const [live, setLive] = useState(false);
  useEffect(() => setLive(true), []);
  const { state, add, replace, putAway, send, stop } = useShowing({ series, lesson }, start, show, kept, fault);
  const waits = useKept(kept, lesson, onSent);
  const isShown = state.at === 'shown';
  useEffect(() => {
    if (isShown) onSent();
  }, [isShown, onSent]);
  const onSubmit = (event: SyntheticEvent<HTMLFormElement>): void => {
    if (!live) return;
    event.preventDefault();
    // Read from the page, not from state: she may have written before the script was there.
    const said = new FormData(event.currentTarget).get('words');
    if (state.at === 'choosing' || state.at === 'kept') send(typeof said === 'string' ? said : '');
  };
  const moving = state.at === 'sending' || state.at === 'waiting';
  const { length: count } = state.shots;
  const title = again ? 'Send another photo' : 'Send your photo';
  return (
    <details className="send-photo" open={open}>
      <summary className={open ? 'hide' : undefined}>{title}</summary>
      <form method="post" action="/api/photos" encType="multipart/form-data" className="upload" aria-label={title} onSubmit={onSubmit}>
        <input type="hidden" name="series" value={series} />
        <input type="hidden" name="lesson" value={lesson} />
        <input type="hidden" name="back" value={part} />
        {/* The words stand before the files: when a file is not taken, what came before it is kept. */}
        <TextField name="words" form="photo" label={`What should ${teacher} know?`} optional rows={2} maxLength={1000} defaultValue={words} />
        {live ? (
          <>
            {waits.waiting > 0 && <p role="status">Kept on this device until there is a connection. What you sent goes to {teacher} by itself then, also when you close this page.</p>}
            {waits.refused !== undefined && <div role="alert"><Wrong id="kept-wrong" says={waits.refused} /></div>}
            {count > 0 && (
              <ul className="shots-in-hand" role="list">
                {state.shots.map((shot) => <ShotOnItsWay key={shot.key} {...{ shot, moving }} onCut={(file) => replace(shot.key, file)} onPutAway={() => putAway(shot.key)} />)}
              </ul>
            )}
            {count > 0 && <p className="small quiet" role="status">{wordsOf(state, teacher, answerWords)}</p>}
            {(state.at === 'choosing' || state.at === 'kept') && count < PHOTO_LIMITS.maxShots && <DropPhoto onPhotos={add} more={count > 0} />}
            {state.fault !== undefined && <div role="alert"><Wrong id="photo-wrong" says={state.fault} /></div>}
            {(state.at === 'choosing' || state.at === 'kept') && count > 0 && <p><Button type="submit" kind="act" glyph="send">{count === 1 ? `Send to ${teacher}` : `Send ${count} photos to ${teacher}`}</Button></p>}
            {moving && <p><Button kind="quiet" glyph="close" onClick={stop}>Stop sending</Button></p>}
          </>
        ) : (
          <>
            <Field name="photo" form="photo" type="file" multiple accept={PHOTO_ACCEPT} label="Photos" hint={`One, or up to ${PHOTO_LIMITS.maxShots} together. JPEG, PNG or WebP, up to 25 MB each.`} error={fault} required />
            <p><Button type="submit" kind="act" glyph="send">Send to {teacher}</Button></p>
          </>
        )}
      </form>
    </details>
  );
}

function wordsOf(state: Showing, teacher: string, answerWords: string): string {
  switch (state.at) {
    case 'choosing':
    case 'kept':
      return 'Not sent yet.';
    case 'sending':
      return 'It goes on by itself if the line drops.';
    case 'waiting': {
      const { sent, total } = bytesOf(state);
      return `Waits for signal. The line dropped at ${sentOf(sent, total)}. It goes on from there by itself.`;
    }
    case 'shown':
      return `${teacher} has your ${state.shots.length === 1 ? 'photo' : `${state.shots.length} photos`}. ${answerWords}`;
  }
}
