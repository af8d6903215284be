import { memo, useMemo, useState } from 'react';
import { isTechnique } from '#core/craft/piece-form/asked-of-band.ts';
import { TECHNIQUE_WORDS } from '#core/craft/techniques/technique-words.ts';
import { textOf, type TypedBand } from '#core/craft/piece-form/typed-piece.ts';
import { Glyph } from '#islands/ui/Glyph.tsx';
import { Parts } from '#islands/ui/Parts.tsx';
import { BandFields } from './BandFields.tsx';
import type { BandWords } from './band-words.ts';
import { ShownContext, type Shown } from './hands.ts';
import { Patch } from './Patch.tsx';
import type { RowGrip } from './use-row-drag.ts';
import { yarnOf, yarnWords } from './yarn-choices.ts';

export interface BandRowProps extends Pick<Shown, 'units' | 'yarns'> {
  readonly band: TypedBand;
  readonly index: number;
  readonly count: number;
  /** Whether what is woven later stands further up in the list. */
  readonly laterIsUp: boolean;
  /** What the plan says of it; null while there is none. */
  readonly words: BandWords | null;
  readonly isChosen: boolean;
  readonly isOpen: boolean;
  /** Sentences at its own fields. */
  readonly wrong: ReadonlyMap<string, string>;
  readonly heed: ReadonlyMap<string, string>;
  readonly onChoose: (id: number) => void;
  /** Pulled, or where what is pulled would go. */
  readonly drag: 'lifted' | 'drop-before' | 'drop-after' | null;
  readonly grip: RowGrip;
}

const NO_TEXTS: Shown['texts'] = {};

/**
 * A band: its patch of cloth, technique, yarn and height in one line; open, everything it is asked. It is handed what it shows:
 * a row that looked at what is shown for the whole piece would be drawn anew with every sentence at any field.
 */
export const BandRow = memo(function BandRow({ units, yarns, band, index, count, laterIsUp, words, isChosen, isOpen, wrong, heed, onChoose, drag, grip }: BandRowProps) {
  const shown = useMemo((): Shown => ({ units, yarns, texts: NO_TEXTS, wrong, heed }), [units, yarns, wrong, heed]);
  const isWrong = wrong.size > 0;
  const [beginsOpen] = useState(isOpen || isWrong);
  const yarn = yarnOf(yarns, textOf(band.texts, 'yarn'));
  return (
    <li id={`band-${String(index)}`} data-band={index} className={['band', isChosen && 'on', drag].filter(Boolean).join(' ')} onFocus={() => onChoose(band.id)}>
      <button
        type="button" className="handle needs-script" aria-label={`Pull band ${String(index + 1)}, or press Alt and an arrow key`} aria-keyshortcuts="Alt+ArrowUp Alt+ArrowDown"
        onPointerDown={(event) => { grip.down(event, laterIsUp ? count - index : index + 1); }} onPointerMove={grip.move} onPointerUp={grip.up} onPointerCancel={grip.cancel}
      >
        <Glyph name="grip" />
      </button>
      <details open={beginsOpen} onToggle={(event) => { if (event.currentTarget.open) onChoose(band.id); }}>
        <summary>
          <span className="at num" aria-hidden="true">{index + 1}</span>
          <Patch patch={words?.patch ?? null} colour={yarn === undefined ? undefined : textOf(yarn, 'colour')} id={`patch-${String(band.id)}`} />
          <span className="what"><b><span className="hide">Band {index + 1}, </span>{techniqueWords(band)}</b><span className="small quiet">{yarn === undefined ? 'no yarn yet' : yarnWords(yarn, 0)}{isWrong && <span className="wrong-here"><Glyph name="mend" />does not work yet</span>}</span></span>
          <span className="num small">{words !== null && <><b><Parts parts={words.height} /></b><span className="quiet">{words.counts}</span></>}</span>
        </summary>
        <ShownContext value={shown}><BandFields {...{ band, index, count, laterIsUp }} /></ShownContext>
      </details>
    </li>
  );
});

function techniqueWords({ texts, shapes }: TypedBand): string {
  const technique = textOf(texts, 'technique');
  if (!isTechnique(technique)) return 'Band';
  return technique === 'tabby' && shapes.length > 0 ? 'Tabby with shapes' : TECHNIQUE_WORDS[technique].label;
}
