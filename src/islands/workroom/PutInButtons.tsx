import { Button } from '#islands/ui/Button.tsx';
import { Combo } from '#islands/ui/Combo.tsx';
import type { GlyphName } from '#islands/ui/glyphs.ts';
import type { Snippet } from '#islands/workroom/put-in.ts';

/** What a text of this series can speak of. */
export interface Sayable {
  /** Amounts of the plan: key, and words with the present value. */
  readonly amounts: readonly { readonly value: string; readonly label: string }[];
  readonly figures: readonly { readonly value: string; readonly label: string }[];
  /** Videos and pictures, as `video/<name>` and `picture/<name>`. */
  readonly media: readonly { readonly value: string; readonly label: string }[];
}

const BLOCKS: readonly { readonly kind: 'step' | 'caution' | 'tip' | 'heading'; readonly label: string; readonly glyph: GlyphName }[] = [
  { kind: 'step', label: 'Step to tick', glyph: 'gather' },
  { kind: 'caution', label: 'Caution', glyph: 'care' },
  { kind: 'tip', label: 'Tip', glyph: 'info' },
  { kind: 'heading', label: 'Heading', glyph: 'write' },
];

/** Buttons and lists that write tags for the teacher, so that she need not know them by heart. */
export function PutInButtons({ sayable, onPutIn }: { sayable: Sayable; onPutIn: (snippet: Snippet) => void }) {
  const media = (value: string): Snippet => {
    const [kind, name = ''] = value.split('/');
    return { kind: kind === 'video' ? 'video' : 'picture', name };
  };
  return (
    <fieldset className="put-in">
      <legend className="label">Put in, where the caret stands</legend>
      <div className="row">{BLOCKS.map(({ kind, label, glyph }) => <Button key={kind} small glyph={glyph} onClick={() => onPutIn({ kind })}>{label}</Button>)}</div>
      <div className="put-in-lists">
        <Combo form="put" name="amount" label="Amount from the plan" options={sayable.amounts} value={undefined} onChoose={(key) => onPutIn({ kind: 'amount', key })} hint={sayable.amounts.length === 0 ? 'Describe the piece first; then its amounts stand here.' : 'Every student sees her own.'} />
        <Combo form="put" name="figure" label="Figure" options={sayable.figures} value={undefined} onChoose={(of) => onPutIn({ kind: 'figure', of })} hint="Drawn from the piece." />
        <Combo form="put" name="media" label="Video or picture" options={sayable.media} value={undefined} onChoose={(value) => onPutIn(media(value))} hint={sayable.media.length === 0 ? 'This series has none yet.' : 'Of this series.'} />
      </div>
    </fieldset>
  );
}
