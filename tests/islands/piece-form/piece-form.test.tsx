import { readFileSync } from 'node:fs';
import { act, cleanup, fireEvent, render, screen } from '@testing-library/react';
import { hydrateRoot } from 'react-dom/client';
import { renderToString } from 'react-dom/server';
import { afterEach, describe, expect, test } from 'vitest';
import { judgeTyped } from '#core/craft/piece-form/judge-typed.ts';
import { emptyForm, typePiece } from '#core/craft/piece-form/type-piece.ts';
import type { FrameLoomPiece } from '#core/craft/piece.ts';
import { PieceForm, type PieceFormProps } from '#islands/piece-form/PieceForm.tsx';
import { pieceFormAfter, pieceFormBegins, placeOfField, placeWord, toldNow, type PieceFormEvent, type PieceFormState } from '#islands/piece-form/piece-form-state.ts';

const lowTide = JSON.parse(readFileSync('content/series/low-tide/piece.json', 'utf8')) as FrameLoomPiece;
const typed = typePiece(lowTide, 'cm');
const after = (...events: PieceFormEvent[]): PieceFormState => events.reduce(pieceFormAfter, pieceFormBegins(typed, false));

afterEach(cleanup);

describe('the state of the form', () => {
  const width = (text: string): PieceFormEvent => ({ kind: 'type', field: 'size.widthMm', text });
  const widthOf = ({ typed: { texts } }: PieceFormState): string | undefined => texts['size.widthMm'];

  test('what was typed into a field in one go is undone in one step, and done again', () => {
    const state = after(width('4'), width('42'));
    expect([widthOf(state), widthOf(pieceFormAfter(state, { kind: 'undo' })), widthOf(pieceFormAfter(pieceFormAfter(state, { kind: 'undo' }), { kind: 'redo' }))]).toEqual(['42', '40', '42']);
  });

  test('a field that was left and entered again is a step of its own', () => {
    const state = after(width('42'), { kind: 'leave', field: 'size.widthMm' }, width('43'));
    expect(widthOf(pieceFormAfter(state, { kind: 'undo' }))).toBe('42');
  });

  test('a row taken out is undone with everything that stood there, and moves and splits too', () => {
    for (const act of [{ do: 'take-out-band', band: 6 }, { do: 'later', band: 2 }, { do: 'copy-band', band: 0 }] as const) {
      const done = after({ kind: 'act', act });
      expect(done.typed).not.toEqual(typed);
      expect(pieceFormAfter(done, { kind: 'undo' }).typed).toEqual(typed);
    }
  });

  test('a hundred steps are remembered and no more; something new forgets what was undone', () => {
    const many = after(...Array.from({ length: 130 }, (_, step) => [width(String(step)), { kind: 'leave', field: 'size.widthMm' } as const]).flat());
    const back = Array.from({ length: 130 }).reduce<PieceFormState>((state) => pieceFormAfter(state, { kind: 'undo' }), many);
    expect(widthOf(back)).toBe('29');
    expect(back.news).toBe('Nothing to undo.');
    expect(pieceFormAfter(back, width('7')).future).toEqual([]);
  });

  test('an act that changes nothing is no step', () => {
    expect(after({ kind: 'act', act: { do: 'look' } }).past).toEqual([]);
  });

  test('a move is told in words, and the first band cannot go before itself', () => {
    expect(after({ kind: 'act', act: { do: 'sooner', band: 3 } }).news).toBe('Band 4 is now woven third.');
    expect(after({ kind: 'act', act: { do: 'later', band: 13 } }).news).toBe('');
    expect([0, 9, 10].map(placeWord)).toEqual(['first', 'tenth', 'number 11']);
  });

  test('a row that comes in takes the hands', () => {
    expect(after({ kind: 'act', act: { do: 'add-band', after: 2 } }).fresh).toBe('bands.3.technique');
    expect(after({ kind: 'act', act: { do: 'add-shape', band: 6 } }).fresh).toBe('bands.6.shapes.3.shape');
  });

  test('an empty field is no fault before saving was tried, nor a half typed length while it is typed', () => {
    const empty = pieceFormBegins(emptyForm('cm'), false);
    expect(toldNow(empty, judgeTyped(empty.typed))).toEqual([]);
    expect(toldNow(pieceFormAfter(empty, { kind: 'try' }), judgeTyped(empty.typed)).length).toBeGreaterThan(3);
    const half = after({ kind: 'enter', field: 'size.widthMm' }, { kind: 'type', field: 'size.widthMm', text: '12 1/' });
    expect(toldNow(half, judgeTyped(half.typed))).toEqual([]);
    const left = pieceFormAfter(half, { kind: 'leave', field: 'size.widthMm' });
    expect(toldNow(left, judgeTyped(left.typed)).map(({ field }) => field)).toEqual(['size.widthMm']);
  });

  test.each([['bands.2.heightMm', 'Band 3'], ['bands.6.shapes.1.baseMm', 'Band 7, shape 2'], ['yarns.1.grist', 'Yarn water'], ['warp.yarn.grist', 'Warp yarn'], ['size.widthMm', ''], ['bands', 'Bands']])('%s stands at “%s”', (field, place) => {
    expect(placeOfField(field, typed)).toBe(place);
  });
});

/** Small, so that looking for things in it is quick. */
const small: FrameLoomPiece = {
  craft: 'frame-loom', size: { widthMm: 300, heightMm: 400 }, loom: { nailPitchMm: 10, warping: 'zigzag', insideHeightMm: 520, insideWidthMm: 400 }, warp: { yarn: { tex: 400 }, parity: 'even' },
  beat: { picksPerWeftDiameter: 0.7 }, yarns: { ground: { metresPer100g: 180 } },
  bands: [{ technique: 'tabby', yarn: 'ground', heightMm: 60 }, { technique: 'tabby', name: 'sky', yarn: 'ground', fill: true }],
};
const props: PieceFormProps = { action: '?_action=x', series: { slug: 'low-tide', name: 'Low Tide' }, revision: 3, typed: typePiece(small, 'cm'), isTried: false, isChanged: false, isOver: false, summary: '', openBand: null, saved: { words: 'Saved today 14:02', isDraft: false, pieceWords: 'today 14:02', asideWords: null }, looms: [] };

const open = (): void => { render(<PieceForm {...props} />); };

function element<E extends Element>(selector: string, kind: abstract new () => E): E {
  const found = document.querySelector(selector);
  if (!(found instanceof kind)) throw new RangeError(`no ${selector}`);
  return found;
}

const field = (name: string): HTMLInputElement => element(`[name="${name}"]`, HTMLInputElement);
const button = (value: string): HTMLButtonElement => element(`button[name="do"][value="${value}"]`, HTMLButtonElement);
const ends = (): string => [...document.querySelectorAll('.plan-table tr')].find((line) => line.textContent.startsWith('Warp ends'))?.textContent ?? '';

const retype = (name: string, text: string): void => { fireEvent.change(field(name), { target: { value: text } }); };

/** As the server drew it, before its script wakes. */
async function wake(meanwhile: (place: HTMLElement) => void): Promise<HTMLElement> {
  const { container } = render(<div dangerouslySetInnerHTML={{ __html: renderToString(<PieceForm {...props} />) }} />);
  const place = container.querySelector('div') ?? container;
  meanwhile(place);
  await act(async () => { hydrateRoot(place, <PieceForm {...props} />); });
  return place;
}

describe('the form on the page', () => {
  test('just drawn it is as it was saved, whatever its choices stand at', async () => {
    await wake(() => undefined);
    expect(screen.getByText('Saved today 14:02')).toBeTruthy();
  });

  test('takes up what was typed before its script woke', async () => {
    await wake(() => { field('size.widthMm').value = '31,5'; });
    expect(ends()).toBe('Warp ends64\u00a0ends');
    expect(screen.getByText('Not saved yet.')).toBeTruthy();
  });

  test('numbers follow what is typed', () => {
    open();
    expect(ends()).toBe('Warp ends62\u00a0ends');
    retype('size.widthMm', '31,5');
    expect(ends()).toBe('Warp ends64\u00a0ends');
    expect(screen.getByText('Not saved yet.')).toBeTruthy();
  });

  test('what cannot be woven is said at its field, the picture stays, and nothing is sent', () => {
    open();
    let sent = 0;
    // Above React's own listener, so that what it prevents is known here.
    document.addEventListener('submit', (event) => { if (!event.defaultPrevented) sent += 1; }, { once: true });
    retype('loom.insideWidthMm', '20');
    expect(field('loom.insideWidthMm').getAttribute('aria-invalid')).toBe('true');
    expect(screen.getByText(/Drawn as it was before/)).toBeTruthy();
    fireEvent.click(button('save'));
    expect(element('#piece-errors', HTMLDivElement).textContent).toContain('Nothing typed is lost');
    expect(sent).toBe(0);
  });

  test('a band taken out comes back by the toast', () => {
    open();
    fireEvent.click(button('take-out-band:0'));
    expect(document.querySelectorAll('.bands > li')).toHaveLength(1);
    fireEvent.click(screen.getByText('Put it back'));
    expect(document.querySelectorAll('.bands > li')).toHaveLength(2);
    expect(field('bands.0.heightMm').value).toBe('6');
  });

  test('a new band is open, and the hands are in it', () => {
    open();
    fireEvent.click(button('add-band:1'));
    expect(document.activeElement?.getAttribute('name')).toBe('bands.2.technique');
    expect(document.activeElement?.closest('details')?.hasAttribute('open')).toBe(true);
  });

  const rowOf = (index: number): Element => document.querySelector(`[data-band="${String(index)}"] .handle`) ?? expect.fail('no such row');
  const slider = (): Element => document.querySelector('[role="slider"]') ?? expect.fail('no square');
  const chooseDrawn = (index: number): void => { fireEvent.click(document.querySelectorAll('.band-hit')[index] ?? expect.fail('no such band')); };

  test('Alt and an arrow moves the band in hand, as the picture runs, and says so', () => {
    open();
    fireEvent.keyDown(rowOf(0), { key: 'ArrowUp', altKey: true });
    expect(field('bands.1.heightMm').value).toBe('6');
    expect(screen.getByText('Band 1 is now woven second.')).toBeTruthy();
    fireEvent.keyDown(rowOf(1), { key: 'ArrowUp', altKey: true });
    expect(field('bands.1.heightMm').value).toBe('6');
    fireEvent.keyDown(rowOf(1), { key: 'ArrowDown', altKey: true });
    expect(field('bands.0.heightMm').value).toBe('6');
  });

  test('on the drawing a band is chosen by a press, and made higher row by row by keys', () => {
    open();
    chooseDrawn(0);
    const rows = Number(slider().getAttribute('aria-valuenow'));
    expect(slider().getAttribute('aria-valuetext')).toBe(`6\u00a0cm, ${String(rows)} rows`);
    fireEvent.keyDown(slider(), { key: 'ArrowUp' });
    fireEvent.keyDown(slider(), { key: 'ArrowUp', shiftKey: true });
    expect(slider().getAttribute('aria-valuenow')).toBe(String(rows + 11));
    fireEvent.keyDown(slider(), { key: 'Home' });
    expect(slider().getAttribute('aria-valuetext')).toMatch(/, 1 row$/);
    fireEvent.keyDown(document.body, { key: 'z', ctrlKey: true });
    expect(field('bands.0.heightMm').value).toBe('6');
  });

  test('a pull at the square snaps to whole rows, and is one step to undo', () => {
    open();
    chooseDrawn(0);
    const rows = Number(slider().getAttribute('aria-valuenow'));
    Object.assign(slider(), { setPointerCapture: () => undefined });
    // The test's browser knows no pointers: what the form reads of one, a mouse has too.
    for (const [kind, clientY] of [['pointerdown', 300], ['pointermove', 299], ['pointermove', 280], ['pointermove', 250], ['pointerup', 250]] as const) fireEvent(slider(), new MouseEvent(kind, { bubbles: true, clientY }));
    expect(Number(slider().getAttribute('aria-valuenow'))).toBeGreaterThan(rows);
    expect(field('bands.0.heightMm').value).not.toBe('6');
    fireEvent.click(screen.getByLabelText('Undo'));
    expect(field('bands.0.heightMm').value).toBe('6');
  });

  test('the band that fills has no square, and says why', () => {
    open();
    chooseDrawn(1);
    expect(document.querySelector('[role="slider"]')).toBeNull();
    expect(screen.getByText(/This band fills what the others leave/)).toBeTruthy();
  });

  test('a band is split at its row, and one that cannot be says why', () => {
    open();
    fireEvent.click(button('split-band:0'));
    expect([field('bands.0.heightMm').value, field('bands.1.heightMm').value].map(Number).reduce((sum, cm) => sum + cm, 0)).toBeCloseTo(6, 6);
    retype('bands.0.heightMm', '0,1');
    fireEvent.click(button('split-band:0'));
    expect(screen.getByText('It has one row only.')).toBeTruthy();
    expect(document.querySelectorAll('.bands > li')).toHaveLength(3);
  });

  test('without script it holds every field, each of its buttons sends it, and the first of them saves', () => {
    const page = new DOMParser().parseFromString(renderToString(<PieceForm {...props} typed={typed} />), 'text/html');
    const names = [...page.querySelectorAll('input[name], select[name]')].map((one) => one.getAttribute('name'));
    expect(names).toEqual(expect.arrayContaining(['series', 'revision', 'units', 'size.widthMm', 'warp.yarn.grist', 'yarns.5.id', 'bands.13.technique', 'bands.6.shapes.2.leanMm', 'allowances.drawIn']));
    const buttons = [...page.querySelectorAll('button[name="do"]')].map((one) => one.getAttribute('value'));
    expect(buttons[0]).toBe('save');
    expect(buttons).toEqual(expect.arrayContaining(['add-band:13', 'copy-band:0', 'sooner:3', 'take-out-yarn:0', 'add-shape:6']));
  });
});
