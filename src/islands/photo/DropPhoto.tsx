import { useRef, useState, type DragEvent } from 'react';
import { Button } from '#islands/ui/Button.tsx';
import { PHOTO_ACCEPT } from './photo-rules.ts';

/** Where a photo is dropped, chosen from the device, or taken with its camera. */
export function DropPhoto({ onPhoto }: { onPhoto: (file: File | undefined) => void }) {
  const chooser = useRef<HTMLInputElement>(null);
  const camera = useRef<HTMLInputElement>(null);
  const [over, setOver] = useState(false);
  const onDrop = (event: DragEvent): void => {
    event.preventDefault();
    setOver(false);
    onPhoto(event.dataTransfer.files[0]);
  };
  const take = (input: HTMLInputElement): void => {
    onPhoto(input.files?.[0]);
    // The same file can be chosen once more.
    input.value = '';
  };
  return (
    <div className={over ? 'drop over' : 'drop'} onDragOver={(event) => { event.preventDefault(); setOver(true); }} onDragLeave={() => setOver(false)} onDrop={onDrop}>
      <input ref={chooser} type="file" accept={PHOTO_ACCEPT} className="hide" tabIndex={-1} aria-hidden onChange={(event) => take(event.currentTarget)} data-testid="photo-chooser" />
      <input ref={camera} type="file" accept="image/*" capture="environment" className="hide" tabIndex={-1} aria-hidden onChange={(event) => take(event.currentTarget)} />
      <p className="row">
        <Button glyph="photo" onClick={() => chooser.current?.click()}>Choose a photo</Button>
        <Button className="by-finger" glyph="photo" onClick={() => camera.current?.click()}>Take one now</Button>
        <span className="small quiet by-mouse">or drop it here</span>
      </p>
      <p className="small quiet">JPEG, PNG or WebP, up to 25 MB. Place and time in the file are taken out.</p>
    </div>
  );
}
