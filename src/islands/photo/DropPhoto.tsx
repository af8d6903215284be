import { useRef, useState, type DragEvent } from 'react';
import { PHOTO_LIMITS } from '#core/photo/limits.ts';
import { Button } from '#islands/ui/Button.tsx';
import { PHOTO_ACCEPT } from './photo-rules.ts';

interface DropPhotoProps {
  onPhotos: (files: readonly File[]) => void;
  /** Some are chosen already. */
  more: boolean;
}

/** Where photos are dropped, chosen from the device, or taken with its camera. */
export function DropPhoto({ onPhotos, more }: DropPhotoProps) {
  const chooser = useRef<HTMLInputElement>(null);
  const camera = useRef<HTMLInputElement>(null);
  const [over, setOver] = useState(false);
  const onDrop = (event: DragEvent): void => {
    event.preventDefault();
    setOver(false);
    onPhotos([...event.dataTransfer.files]);
  };
  const take = (input: HTMLInputElement): void => {
    onPhotos([...(input.files ?? [])]);
    // The same file can be chosen once more.
    input.value = '';
  };
  return (
    <div className={over ? 'drop over' : 'drop'} onDragOver={(event) => { event.preventDefault(); setOver(true); }} onDragLeave={() => setOver(false)} onDrop={onDrop}>
      <input ref={chooser} type="file" multiple accept={PHOTO_ACCEPT} className="hide" tabIndex={-1} aria-hidden onChange={(event) => take(event.currentTarget)} data-testid="photo-chooser" />
      <input ref={camera} type="file" accept="image/*" capture="environment" className="hide" tabIndex={-1} aria-hidden onChange={(event) => take(event.currentTarget)} />
      <p className="row">
        <Button glyph="photo" onClick={() => chooser.current?.click()}>{more ? 'Choose another' : 'Choose photos'}</Button>
        <Button className="by-finger" glyph="photo" onClick={() => camera.current?.click()}>{more ? 'Take another' : 'Take one now'}</Button>
        <span className="small quiet by-mouse">or drop {more ? 'it' : 'them'} here</span>
      </p>
      {!more && <p className="small quiet">One, or up to {PHOTO_LIMITS.maxShots} together: from the front, from the side, from close. JPEG, PNG or WebP, up to 25 MB each. Place and time in the file are taken out.</p>}
    </div>
  );
}
