import { useRef, useState, type KeyboardEvent } from 'react';
import { textOf, type TypedPiece } from '#core/craft/piece-form/typed-piece.ts';
import { Glyph } from '#islands/ui/Glyph.tsx';
import { Wrong } from '#islands/ui/Wrong.tsx';
import { ActButton } from './ActButton.tsx';
import type { BandWords } from './band-words.ts';
import { BandRow } from './BandRow.tsx';
import { useHands, useShown } from './hands.ts';
import { useSameEntries } from './keep-same.ts';
import { useRowDrag, type HeldRow } from './use-row-drag.ts';
import { YarnRow } from './YarnRow.tsx';

/** The yarns of the weft, each with what it does in the piece. */
export function YarnList({ bands, fresh }: { readonly bands: TypedPiece['bands']; readonly fresh: string | null }) {
  const { yarns, wrong } = useShown();
  const used = new Set(bands.flatMap(({ texts, shapes }) => [texts['yarn'], texts['tabbyYarn'], ...shapes.map((shape) => shape.texts['yarn'])]));
  return (
    <section aria-labelledby="yarns-title" id="yarns">
      <h2 className="h3" id="yarns-title">Yarns</h2>
      <p className="small quiet">A role says what a yarn does in the piece: ground, accent, fringe.</p>
      <div className="lined-rows">
        {yarns.map(({ id, texts }, index) => (
          <YarnRow key={id} texts={texts} prefix={`yarns.${String(index)}.`} index={index} id={id} isUsed={used.has(String(id))} isOpen={textOf(texts, 'grist') === '' || fresh === `yarns.${String(index)}.role`} />
        ))}
      </div>
      {wrong.has('yarns') && <Wrong id="f-yarns" says={wrong.get('yarns') ?? ''} />}
      <p className="mt-3"><ActButton act={{ do: 'add-yarn' }} to={`yarn-${String(yarns.length)}`} className="btn btn-sm"><Glyph name="plus" />Add a yarn</ActButton></p>
    </section>
  );
}

interface BandListProps {
  readonly bands: TypedPiece['bands'];
  /** Whether what is woven later stands further up, as it does in the picture. */
  readonly laterIsUp: boolean;
  /** By id of the band, as it was when the piece could be woven last. */
  readonly words: ReadonlyMap<number, BandWords>;
  readonly chosen: number | null;
  readonly onChoose: (id: number) => void;
  /** Band to be open from the beginning. */
  readonly open: number | null;
  readonly fresh: string | null;
}

/** The bands, running as the picture beside them does: what was woven first lies where the picture has it. */
export function BandList({ bands, laterIsUp, words, chosen, onChoose, open, fresh }: BandListProps) {
  const { units, yarns, wrong, heed } = useShown();
  const { act } = useHands();
  const list = useRef<HTMLOListElement>(null);
  const count = bands.length;
  const bandAt = (number: number): number => (laterIsUp ? count - number : number - 1);
  const [held, grip] = useRowDrag(
    () => [...list.current?.children ?? []].map((row) => row.getBoundingClientRect()),
    (from, to) => { act({ do: 'move-band', band: bandAt(from), to: bandAt(to) }); },
  );
  const onKeyDown = (event: KeyboardEvent<HTMLOListElement>) => {
    const up = event.key === 'ArrowUp' ? 1 : event.key === 'ArrowDown' ? -1 : 0;
    // With Alt an arrow opens a list to choose from.
    if (!event.altKey || up === 0 || !(event.target instanceof HTMLElement) || event.target instanceof HTMLSelectElement) return;
    const band = Number(event.target.closest<HTMLElement>('[data-band]')?.dataset['band']);
    event.preventDefault();
    const hands = event.target;
    act({ do: up === (laterIsUp ? 1 : -1) ? 'later' : 'sooner', band });
    requestAnimationFrame(() => { hands.focus(); });
  };
  const wrongOf = useSameEntries(byBand(wrong));
  const heedOf = useSameEntries(byBand(heed));
  const rows = bands.map((band, index) => (
    <BandRow
      key={band.id} units={units} yarns={yarns} band={band} index={index} count={count} laterIsUp={laterIsUp} words={words.get(band.id) ?? null}
      wrong={wrongOf.get(index) ?? NONE} heed={heedOf.get(index) ?? NONE} isChosen={chosen === band.id} drag={dragOf(held, laterIsUp ? count - index : index + 1)} grip={grip} isOpen={open === index || count === 1 || fresh === `bands.${String(index)}.technique`} onChoose={onChoose}
    />
  ));
  const add = <p className="band-add"><ActButton act={{ do: 'add-band', after: count - 1 }} to={`band-${String(count)}`} className="btn"><Glyph name="plus" />{count === 0 ? 'Add a band' : 'Add a band, woven last'}</ActButton></p>;
  return (
    <section aria-labelledby="bands-title" id="bands">
      <div className="row between">
        <h2 className="h3" id="bands-title">{laterIsUp ? 'Bands, woven from the foot up' : 'Bands, first woven on top'}</h2>
        <span className="small quiet only-desk needs-script"><kbd className="key">Alt</kbd> <kbd className="key">↑</kbd> moves a band</span>
      </div>
      {wrong.has('bands') && <div id="f-bands" tabIndex={-1}><Wrong id="f-bands-wrong" says={wrong.get('bands') ?? ''} /></div>}
      {laterIsUp && add}
      {count > 0 && <ol className="bands" reversed={laterIsUp} ref={list} onKeyDown={onKeyDown}>{laterIsUp ? rows.toReversed() : rows}</ol>}
      {!laterIsUp && add}
    </section>
  );
}

function dragOf(held: HeldRow | null, number: number): 'lifted' | 'drop-before' | 'drop-after' | null {
  if (held === null) return null;
  if (number === held.from) return 'lifted';
  return number !== held.to ? null : held.to < held.from ? 'drop-before' : 'drop-after';
}

const NONE: ReadonlyMap<string, string> = new Map();

/** Sentences by the place of the band whose fields they stand at. */
function byBand(sentences: ReadonlyMap<string, string>): ReadonlyMap<number, ReadonlyMap<string, string>> {
  const rows = new Map<number, Map<string, string>>();
  for (const [field, says] of sentences) {
    const [group, index] = field.split('.');
    if (group !== 'bands' || index === undefined) continue;
    rows.set(Number(index), (rows.get(Number(index)) ?? new Map<string, string>()).set(field, says));
  }
  return rows;
}

/** Which band is in hand: at first the one the page opens. */
export function useChosenBand(open: number | null): readonly [number | null, (id: number) => void] {
  return useState<number | null>(open === null ? null : open + 1);
}
