import { useMemo, useRef, type ChangeEvent } from 'react';
import { PHOTO_ACCEPT } from '#islands/photo/photo-rules.ts';
import { Button } from '#islands/ui/Button.tsx';
import { Combo } from '#islands/ui/Combo.tsx';
import type { GlyphName } from '#islands/ui/glyphs.ts';
import { snippetOfMedia, type Snippet } from '#islands/writing/put-in.ts';
import type { Sayable } from '#islands/writing/sayable.ts';

const BLOCKS: readonly { readonly kind: 'step' | 'caution' | 'tip' | 'heading'; readonly label: string; readonly glyph: GlyphName }[] = [
  { kind: 'step', label: 'Step to tick', glyph: 'gather' },
  { kind: 'caution', label: 'Caution', glyph: 'care' },
  { kind: 'tip', label: 'Tip', glyph: 'info' },
  { kind: 'heading', label: 'Heading', glyph: 'write' },
];

interface PutInButtonsProps {
  sayable: Sayable;
  onPutIn: (snippet: Snippet) => void;
  /** A picture chosen from this device. */
  onPicture: (file: File) => void;
}

/** Buttons and lists that write tags for the teacher, so that she need not know them by heart. */
export function PutInButtons({ sayable, onPutIn, onPicture }: PutInButtonsProps) {
  const chooser = useRef<HTMLInputElement>(null);
  const amounts = useMemo(() => sayable.amounts.map(({ key, label, text }) => ({ value: key, label: `${label}: ${text}` })), [sayable.amounts]);
  const take = ({ currentTarget }: ChangeEvent<HTMLInputElement>) => {
    const file = currentTarget.files?.[0];
    if (file !== undefined) onPicture(file);
    // The same file can be chosen once more.
    currentTarget.value = '';
  };
  return (
    <fieldset className="put-in">
      <legend className="label">Put in, where the caret stands</legend>
      <div className="row">{BLOCKS.map(({ kind, label, glyph }) => <Button key={kind} small glyph={glyph} onClick={() => onPutIn({ kind })}>{label}</Button>)}
        <Button small glyph="photo" onClick={() => chooser.current?.click()}>Picture from this device</Button>
        <input ref={chooser} type="file" accept={PHOTO_ACCEPT} className="hide" tabIndex={-1} aria-hidden data-testid="picture-chooser" onChange={take} />
      </div>
      <div className="put-in-lists">
        <Combo form="put" name="amount" label="Amount from the plan" options={amounts} value={undefined} onChoose={(key) => onPutIn({ kind: 'amount', key })} hint={sayable.amounts.length === 0 ? 'Describe the piece first; then its amounts stand here.' : 'Every student sees her own.'} />
        <Combo form="put" name="figure" label="Figure" options={sayable.figures} value={undefined} onChoose={(of) => onPutIn({ kind: 'figure', of })} hint="Drawn from the piece." />
        <Combo form="put" name="media" label="Video or picture" options={sayable.media} value={undefined} onChoose={(value) => onPutIn(snippetOfMedia(value))} hint={sayable.media.length === 0 ? 'This series has none yet.' : 'Of this series.'} />
      </div>
    </fieldset>
  );
}
