import { useEffect, useRef, useState, useSyncExternalStore } from 'react';
import { bandForPart, countIn, type CountedBand, type RowCounts } from '#core/following/row-count.ts';
import { Button } from '#islands/ui/Button.tsx';
import { Field } from '#islands/ui/Field.tsx';
import { Glyph } from '#islands/ui/Glyph.tsx';
import { rowStore } from './browser-rows.ts';
import { hasOwnKeys, pressesByItself } from './own-keys.ts';
import { RowForm, type RefusedRows } from './RowForm.tsx';
import type { RowState, RowStore } from './row-store.ts';
import { RowStrip } from './RowStrip.tsx';
import { say } from './voice.ts';

export interface RowCounterProps {
  /** Public id of the seat, slug of the series. */
  seat: string;
  series: string;
  /** The loom side it stands at. */
  part: number;
  step: number;
  /** All that are counted in her piece, in the order they are woven. */
  bands: readonly CountedBand[];
  /** Keys of those this part weaves. */
  own: readonly string[];
  counts: RowCounts;
  /** Where the form without script is sent; what it refused, with its sentence. */
  action: string;
  refused?: RefusedRows | undefined;
}

const WAITS: Readonly<Record<RowState['waits'], string>> = {
  nothing: '',
  later: 'Kept on this device. It goes out when there is signal.',
  'signed-out': 'Kept on this device. Sign in again, and it goes out.',
  refused: 'Kept on this device only: the series is not open to you any more. Load the page again.',
};

/**
 * Counts the rows of the band in hand against her plan: one press of a big key or of the space bar is one row. The
 * server draws a form that does the same; once alive, every row is on the device before anything is sent.
 */
export function RowCounter(props: RowCounterProps) {
  const { seat, series, part, bands, own, counts: drawn } = props;
  const [store, setStore] = useState<RowStore | null>(null);
  // What the page was drawn with; later counts come from the store.
  const first = useRef(drawn);
  useEffect(() => {
    const mine = rowStore(seat, series, first.current);
    setStore(mine);
    void mine.flush();
  }, [seat, series]);
  const state = useSyncExternalStore(store?.subscribe ?? never, store?.current ?? (() => null), () => null);
  const counts = state?.counts ?? drawn;
  const chosen = state?.chosen?.part === part ? bands.find(({ key }) => key === state.chosen?.band) : undefined;
  const band = chosen ?? bandForPart(bands, own, counts);
  if (band === undefined) return null;
  if (store === null || state === null) return <RowForm {...props} band={band} rows={countIn(counts, band)} />;
  return state.isOpen ? <Counting {...{ store, state, part, bands, band }} /> : (
    <section className="rows" id="rows" aria-label="Row counter">
      <p className="rows-closed"><span>{band.words}: {rowWords(countIn(counts, band), band)}</span><Button onClick={() => store.open(true)}>Count rows</Button></p>
      <Waits {...state} />
    </section>
  );
}

const never = (): (() => void) => () => undefined;

/** `12 of 48 rows` */
export function rowWords(rows: number, band: Pick<CountedBand, 'rows'>): string {
  return `${String(rows)} of ${band.rows === 1 ? '1 row' : `${String(band.rows)} rows`}`;
}

interface CountingProps {
  store: RowStore;
  state: RowState;
  part: number;
  bands: readonly CountedBand[];
  band: CountedBand;
}

function Counting({ store, state, part, bands, band }: CountingProps) {
  const rows = countIn(state.counts, band);
  const isFull = rows >= band.rows;
  const after = bands[bands.indexOf(band) + 1];
  const goOn = (to: CountedBand): void => {
    store.choose(part, to.key);
    say(`${to.words}, ${rowWords(countIn(state.counts, to), to)}`);
  };
  const one = (): void => {
    store.add(part, band.key, 1);
    say(rows + 1 === band.rows ? `${String(rows + 1)}. All rows of this band are woven.` : String(rows + 1));
  };
  const press = isFull && after !== undefined ? (): void => goOn(after) : one;
  const choose = (list: HTMLSelectElement): void => {
    const to = bands.find(({ key }) => key === list.value);
    if (to !== undefined) goOn(to);
    // The space bar counts again, instead of opening the list.
    list.blur();
  };
  const undo = (): void => {
    const undone = store.undo(part);
    const back = bands.find(({ key }) => key === undone);
    if (back !== undefined) say(`Back to ${String(countIn(store.current().counts, back))}`);
  };
  useSpace(press);
  return (
    <section className="rows open" id="rows" aria-label="Row counter">
      <div className="rows-head">
        <span className="input"><select aria-label="Band" value={band.key} onChange={(event) => choose(event.currentTarget)}>
          {bands.map((each) => <option key={each.key} value={each.key}>{each.words}, {each.technique}: {rowWords(countIn(state.counts, each), each)}</option>)}
        </select></span>
        <Button small kind="quiet" onClick={() => store.open(false)}>Stop counting</Button>
      </div>
      <p className="rows-number" role="status"><b>{rows}</b> of {band.rows === 1 ? '1 row' : `${String(band.rows)} rows`}</p>
      <RowStrip rows={rows} of={band.rows} />
      {isFull && <p className="small">By the plan this band is woven. {after === undefined ? 'It is the last one with rows.' : `If your cloth is still too low, count on: it may take a row or two more.`}</p>}
      <div className="rows-keys">
        <button type="button" aria-disabled={!state.canUndo || undefined} onClick={state.canUndo ? undo : undefined}><Glyph name="undo" size={32} />Undo</button>
        {isFull && after !== undefined && <button type="button" onClick={one}><Glyph name="plus" size={32} />Row</button>}
        <button type="button" className="on" onClick={press}>{isFull && after !== undefined ? <>On to {after.words}</> : <><Glyph name="plus" size={40} />One row</>}<kbd className="key" aria-hidden="true">space</kbd></button>
      </div>
      <SetRows key={band.key} rows={rows} onSet={(to) => store.set(part, band.key, to)} />
      <Waits {...state} />
    </section>
  );
}

/** The number said outright, when she has counted the cloth. */
function SetRows({ rows, onSet }: { rows: number; onSet: (rows: number) => void }) {
  const [typed, setTyped] = useState('');
  const isNumber = /^\s*\d{1,5}\s*$/u.test(typed);
  return (
    <details className="rows-set small">
      <summary>The number is wrong</summary>
      <form className="rows-form" onSubmit={(event) => { event.preventDefault(); if (isNumber) { onSet(Number(typed)); setTyped(''); } }}>
        <Field name="rows-said" label="Rows you count on the cloth" inputMode="numeric" maxLength={7} value={typed} error={typed === '' || isNumber ? undefined : `Give the rows as a number, such as ${String(rows)}.`} onChange={(event) => setTyped(event.currentTarget.value)} />
        <Button type="submit">Set</Button>
      </form>
    </details>
  );
}

function Waits({ waits }: Pick<RowState, 'waits'>) {
  return <p className="rows-kept small" role="status">{WAITS[waits]}</p>;
}

/** Before the loom side turns a step by it. */
function useSpace(press: () => void): void {
  useEffect(() => {
    const onKey = (event: KeyboardEvent): void => {
      if (event.key !== ' ' || event.altKey || event.ctrlKey || event.metaKey || event.shiftKey || pressesByItself(event.target) || hasOwnKeys(event.target)) return;
      event.preventDefault();
      // A key held down is one row.
      if (!event.repeat) press();
    };
    document.addEventListener('keydown', onKey, { capture: true });
    return () => document.removeEventListener('keydown', onKey, { capture: true });
  }, [press]);
}
