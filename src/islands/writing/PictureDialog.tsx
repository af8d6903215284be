import { useEffect, useMemo, useState } from 'react';
import type { PicturePutIn } from '#contracts/media.ts';
import { photoFault } from '#islands/photo/photo-rules.ts';
import { Button } from '#islands/ui/Button.tsx';
import { Dialog } from '#islands/ui/Dialog.tsx';
import { Wrong } from '#islands/ui/Wrong.tsx';

interface PictureDialogProps {
  /** Public id of the part. */
  lesson: string;
  file: File;
  onDone: (name: string, alt: string) => void;
  onClose: () => void;
}

const LONGEST_ALT = 200;

/** Asks what a picture shows before it goes into the text. To say nothing is a choice of its own, never an oversight. */
export function PictureDialog({ lesson, file, onDone, onClose }: PictureDialogProps) {
  const [alt, setAlt] = useState('');
  const [decorates, setDecorates] = useState(false);
  const [says, setSays] = useState<string | null>(() => photoFault(file));
  const [busy, setBusy] = useState(false);
  const unfit = useMemo(() => photoFault(file) !== null, [file]);
  const [shown, setShown] = useState<string | null>(null);
  useEffect(() => {
    const address = URL.createObjectURL(file);
    setShown(address);
    return () => URL.revokeObjectURL(address);
  }, [file]);
  const put = () => {
    const words = decorates ? '' : alt.trim();
    if (words === '' && !decorates) {
      setSays('What it shows is missing. Say it in a sentence, or tick that it only decorates.');
      return;
    }
    setBusy(true);
    void send(lesson, file, words).then((answer) => {
      setBusy(false);
      if (answer.ok) onDone(answer.name, words);
      else setSays(answer.says);
    });
  };
  return (
    <Dialog
      open title="What does the picture show?" onClose={onClose}
      acts={<><Button onClick={onClose}>Leave it out</Button><Button kind="act" glyph="photo" busy={busy} off={unfit ? 'Choose another file.' : undefined} onClick={put}>Put it in</Button></>}
    >
      {!unfit && shown !== null && <img className="picture-chosen" src={shown} alt={`The chosen file, ${file.name}`} />}
      <div className={says === null ? 'field mt-3' : 'field bad mt-3'}>
        <label htmlFor="picture-alt">In words, for those who do not see it</label>
        <span className="hint" id="picture-alt-hint">What matters for the work: “The first ridge, wrapped over four ends and back under two”.</span>
        <div className="input"><textarea id="picture-alt" rows={3} maxLength={LONGEST_ALT} value={alt} readOnly={decorates} aria-describedby={`picture-alt-hint${says === null ? '' : ' picture-alt-wrong'}`} aria-invalid={says !== null || undefined} onChange={(event) => { setAlt(event.currentTarget.value); if (!unfit) setSays(null); }} /></div>
        {says !== null && <Wrong id="picture-alt-wrong" says={says} />}
      </div>
      <label className="check-row"><input type="checkbox" className="check" checked={decorates} onChange={(event) => { setDecorates(event.currentTarget.checked); if (!unfit) setSays(null); }} /><span>It only decorates: nothing is lost without it</span></label>
      <p className="small quiet">It is made smaller, and place and time in the file are taken out. Students see it when you publish.</p>
    </Dialog>
  );
}

type Sent = { ok: true; name: string } | { ok: false; says: string };

async function send(lesson: string, file: File, alt: string): Promise<Sent> {
  const form = new FormData();
  form.set('lesson', lesson);
  form.set('alt', alt);
  form.set('picture', file);
  try {
    const answer = await fetch('/api/workroom/pictures', { method: 'POST', body: form });
    if (answer.ok) return { ok: true, name: ((await answer.json()) as PicturePutIn).name };
    const { title } = (await answer.json()) as { title?: string };
    return { ok: false, says: title ?? 'It could not be taken just now. Try again.' };
  } catch {
    return { ok: false, says: 'The line is down. The picture is still here: put it in when there is signal.' };
  }
}
