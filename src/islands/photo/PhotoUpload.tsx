import { useEffect, useState, type SyntheticEvent } from 'react';
import { Button } from '#islands/ui/Button.tsx';
import { Field, TextField } from '#islands/ui/Field.tsx';
import { Wrong } from '#islands/ui/Wrong.tsx';
import { DropPhoto } from './DropPhoto.tsx';
import { PHOTO_ACCEPT } from './photo-rules.ts';
import { ShotOnItsWay } from './ShotOnItsWay.tsx';
import type { StartUpload } from './uploader.ts';
import { startUppyUpload } from './uppy-uploader.ts';
import { useUpload } from './use-upload.ts';

interface PhotoUploadProps {
  series: string;
  /** Public id of the lesson. */
  lesson: string;
  part: number;
  /** Who looks at it, by first name. */
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
  /** Shows what the server has now. */
  onSent?: () => void;
}

const showThread = (): void => { window.location.reload(); };

/**
 * Showing a photo: dropped, chosen or taken. The form under it sends it without script as well; with script it can be
 * watched on its way, and goes on by itself when the line drops.
 */
export function PhotoUpload({ series, lesson, part, teacher, answerWords, again, open, fault, words = '', start = startUppyUpload, onSent = showThread }: PhotoUploadProps) {
  const [live, setLive] = useState(false);
  useEffect(() => setLive(true), []);
  const { state, choose, send, stop, putAway } = useUpload(start, fault);
  const isSent = state.at === 'sent';
  useEffect(() => {
    if (isSent) onSent();
  }, [isSent, onSent]);
  const onSubmit = (event: SyntheticEvent<HTMLFormElement>): void => {
    if (!live) return;
    event.preventDefault();
    // Read from the page, not from state: she may have written before the script was there.
    const said = new FormData(event.currentTarget).get('words');
    if (state.at === 'chosen') send({ series, lesson, words: typeof said === 'string' ? said : '' });
  };
  const faultNow = state.at === 'choosing' ? state.fault : undefined;
  const title = again ? 'Send another photo' : 'Send your photo';
  return (
    <details className="send-photo" open={open}>
      <summary className={open ? 'hide' : undefined}>{title}</summary>
      <form method="post" action="/api/photos" encType="multipart/form-data" className="upload" aria-label={title} onSubmit={onSubmit}>
        <input type="hidden" name="series" value={series} />
        <input type="hidden" name="lesson" value={lesson} />
        <input type="hidden" name="back" value={part} />
        {/* The words stand before the file: when the file is not taken, what came before it is kept. */}
        <TextField name="words" form="photo" label={`What should ${teacher} know?`} optional rows={2} maxLength={1000} defaultValue={words} />
        {live ? (
          <>
            {state.at === 'choosing' && <DropPhoto onPhoto={choose} />}
            {'file' in state && <ShotOnItsWay state={state} teacher={teacher} answerWords={answerWords} onStop={stop} />}
            {faultNow !== undefined && <div role="alert"><Wrong id="photo-wrong" says={faultNow} /></div>}
            {state.at === 'chosen' && (
              <p className="row">
                <Button type="submit" kind="act" glyph="send">Send to {teacher}</Button>
                <Button kind="quiet" glyph="photo" onClick={putAway}>Take another</Button>
              </p>
            )}
          </>
        ) : (
          <>
            <Field name="photo" form="photo" type="file" accept={PHOTO_ACCEPT} label="Photo" hint="JPEG, PNG or WebP, up to 25 MB." error={fault} required />
            <p><Button type="submit" kind="act" glyph="send">Send to {teacher}</Button></p>
          </>
        )}
      </form>
    </details>
  );
}
