// @vitest-environment jsdom
import { act, cleanup, fireEvent, render, screen, waitFor } from '@testing-library/react';
import { afterEach, beforeEach, describe, expect, test, vi } from 'vitest';
import type { CountedBand } from '#core/following/row-count.ts';
import { LoomSide } from '#islands/lesson/LoomSide.tsx';
import { RowCounter } from '#islands/lesson/RowCounter.tsx';

const page = `
  <main class="side-work">
    <div class="side-say">${[1, 2, 3].map((n) => `<section class="side-one" data-step="${String(n)}" ${n === 2 ? 'data-figure-of="tabby"' : ''} ${n === 1 ? '' : 'hidden'}><div class="side-step">Do thing ${String(n)}</div></section>`).join('')}</div>
    <div class="side-see" data-kind="tabby" hidden>Figure</div>
    ${[1, 2, 3].map((n) => `<nav class="side-keys" data-step="${String(n)}" ${n === 1 ? '' : 'hidden'}>${n > 1 ? `<a href="?step=${String(n - 1)}" rel="prev" data-turn="${String(n - 1)}">Back</a>` : ''}${n < 3 ? `<a href="?step=${String(n + 1)}" rel="next" data-turn="${String(n + 1)}">Next step</a>` : '<a href="#end">To the end</a>'}</nav>`).join('')}
  </main>`;
const shown = (): string => document.querySelector('.side-one:not([hidden])')?.textContent ?? '';
const press = (key: string, target: Element = document.body): void => { act(() => { target.dispatchEvent(new KeyboardEvent('keydown', { key, bubbles: true, cancelable: true })); }); };
const swipe = (fromX: number, toX: number, toY = 300): void => {
  const place = document.querySelector('.side-step') ?? document.body;
  for (const [type, clientX, clientY] of [['pointerdown', fromX, 300], ['pointerup', toX, toY]] as const) {
    const event = Object.assign(new MouseEvent(type, { bubbles: true, clientX, clientY }), { pointerId: 1 });
    Object.defineProperty(event, 'pointerType', { value: 'touch' });
    act(() => { place.dispatchEvent(event); });
  }
};

let spoken: string[] = [];
beforeEach(() => {
  localStorage.clear();
  spoken = [];
  document.body.innerHTML = page;
  window.history.replaceState(null, '', '/series/low-tide/3/loomside');
  Element.prototype.scrollTo = () => undefined;
  vi.stubGlobal('SpeechSynthesisUtterance', class { constructor(readonly text: string) {} });
  vi.stubGlobal('speechSynthesis', { cancel: vi.fn(), speak: ({ text }: { text: string }) => { spoken.push(text); } });
});
afterEach(() => { cleanup(); vi.unstubAllGlobals(); document.body.innerHTML = ''; });

describe('the loom side', () => {
  test('turns its steps in place by space, arrows, big keys and swipes, and the address follows', () => {
    render(<LoomSide />);
    press(' ');
    expect(shown()).toBe('Do thing 2');
    expect(window.location.search).toBe('?step=2');
    expect(document.querySelector<HTMLElement>('.side-see')?.hidden).toBe(false);
    press('ArrowLeft');
    fireEvent.click(screen.getByText('Next step', { selector: ':not([hidden]) > a' }));
    expect(shown()).toBe('Do thing 2');
    swipe(300, 180);
    expect(shown()).toBe('Do thing 3');
    press('ArrowRight');
    expect(shown()).toBe('Do thing 3');
    swipe(100, 260);
    expect(shown()).toBe('Do thing 2');
  });

  test('shows the step its address asks for, where it is a page kept at another one', () => {
    window.history.replaceState(null, '', '/series/low-tide/3/loomside?step=3');
    render(<LoomSide />);
    expect(shown()).toBe('Do thing 3');
  });

  test('space on the key with the focus goes where that key goes; on a button it is the button’s', () => {
    render(<LoomSide />);
    press(' ');
    press(' ', screen.getByText('Back', { selector: ':not([hidden]) > a' }));
    expect(shown()).toBe('Do thing 1');
    press(' ', screen.getByRole('button', { name: 'Read aloud' }));
    expect(shown()).toBe('Do thing 1');
  });

  test('a finger that scrolls, barely moves or comes from the edge of the glass turns nothing', () => {
    render(<LoomSide />);
    swipe(300, 200, 500);
    swipe(300, 270);
    swipe(4, 200);
    expect(shown()).toBe('Do thing 1');
  });

  test('is silent until it is asked to speak, and again when it is told to stop', () => {
    render(<LoomSide />);
    press(' ');
    expect(spoken).toEqual([]);
    fireEvent.click(screen.getByRole('button', { name: 'Read aloud' }));
    press(' ');
    expect(spoken).toEqual(['Do thing 2.', 'Do thing 3.']);
    fireEvent.click(screen.getByRole('button', { name: 'Read aloud', pressed: true }));
    press('ArrowLeft');
    expect(spoken).toHaveLength(2);
  });

  test('falls silent when it is left', () => {
    const { unmount } = render(<LoomSide />);
    fireEvent.click(screen.getByRole('button', { name: 'Read aloud' }));
    vi.mocked(speechSynthesis.cancel).mockClear();
    unmount();
    expect(speechSynthesis.cancel).toHaveBeenCalled();
  });

  test('says in words that the screen may go dark where it cannot be kept awake', async () => {
    render(<LoomSide />);
    await screen.findByText(/cannot keep the screen awake/);
  });

  test('keeps the screen awake, and asks anew when the page is seen again', async () => {
    const locks: { released: boolean; release: () => Promise<void>; addEventListener: (_: string, then: () => void) => void; end: () => void }[] = [];
    const request = vi.fn(() => {
      let ended = (): void => undefined;
      const lock = { released: false, release: () => Promise.resolve(), addEventListener: (_: string, then: () => void) => { ended = then; }, end: () => { lock.released = true; ended(); } };
      locks.push(lock);
      return Promise.resolve(lock);
    });
    Object.defineProperty(navigator, 'wakeLock', { configurable: true, value: { request } });
    try {
      render(<LoomSide />);
      await screen.findByRole('img', { name: 'Screen stays awake' });
      act(() => { locks[0]?.end(); });
      expect(screen.queryByRole('img', { name: 'Screen stays awake' })).toBeNull();
      document.dispatchEvent(new Event('visibilitychange'));
      await screen.findByRole('img', { name: 'Screen stays awake' });
      expect(request).toHaveBeenCalledTimes(2);
    } finally {
      Reflect.deleteProperty(navigator, 'wakeLock');
    }
  });
});

describe('the row counter', () => {
  const band = (index: number, key: string, rows: number): CountedBand => ({ index, key, words: key.replace('-', ' '), technique: 'tabby', rows });
  const bands = [band(1, 'foot', 3), band(2, 'dark-shore', 20)];
  let seat = 0;
  const sent = vi.fn<(body: { device: string; tallies: Record<string, { rows: number; version: number }> }) => Response>();
  beforeEach(() => {
    seat += 1;
    sent.mockReset().mockImplementation(({ tallies }) => new Response(JSON.stringify({ own: tallies, others: {} })));
    vi.stubGlobal('fetch', vi.fn((_: string, { body }: { body: string }) => Promise.resolve().then(() => sent(JSON.parse(body) as Parameters<typeof sent>[0]))));
  });
  const draw = (counts: Record<string, number> = {}) => render(<><LoomSide /><RowCounter seat={`s${String(seat)}`} series="low-tide" part={3} step={1} bands={bands} own={['foot', 'dark-shore']} counts={counts} action="?_action=x" /></>);
  const open = (): void => { fireEvent.click(screen.getByRole('button', { name: 'Count rows' })); };
  const number = (): string => document.querySelector('.rows-number')?.textContent ?? '';

  test('leaves the space bar to the steps until it is in hand; then every press is a row, on this device at once', () => {
    draw();
    press(' ');
    expect(shown()).toBe('Do thing 2');
    open();
    press(' ');
    press(' ', document.querySelector('a') ?? document.body);
    expect(shown()).toBe('Do thing 2');
    expect(number()).toBe('2 of 3 rows');
    expect(localStorage.getItem(`fellmark-rows-s${String(seat)}`)).toContain('"rows":2');
    fireEvent.click(screen.getByRole('button', { name: 'Stop counting' }));
    press(' ');
    expect(shown()).toBe('Do thing 3');
  });

  test('leads on to the next band when the last row is counted, and back again by undoing', () => {
    draw({ foot: 2 });
    open();
    press(' ');
    expect(number()).toBe('3 of 3 rows');
    expect(screen.getByText(/By the plan this band is woven/)).toBeDefined();
    press(' ');
    expect(number()).toBe('0 of 20 rows');
    press(' ');
    expect(number()).toBe('1 of 20 rows');
    fireEvent.click(screen.getByRole('button', { name: 'Undo' }));
    fireEvent.click(screen.getByRole('button', { name: 'Undo' }));
    expect(number()).toBe('2 of 3 rows');
    expect(screen.getByRole('button', { name: 'Undo' }).getAttribute('aria-disabled')).toBe('true');
  });

  test('jumps to any band, and takes a number said outright', () => {
    draw();
    open();
    fireEvent.change(screen.getByRole('combobox', { name: 'Band' }), { target: { value: 'dark-shore' } });
    expect(number()).toBe('0 of 20 rows');
    const field = screen.getByLabelText('Rows you count on the cloth');
    fireEvent.change(field, { target: { value: 'many' } });
    expect(screen.getByText('Give the rows as a number, such as 0.')).toBeDefined();
    fireEvent.change(field, { target: { value: '17' } });
    fireEvent.click(screen.getByRole('button', { name: 'Set' }));
    expect(number()).toBe('17 of 20 rows');
  });

  test('says each number aloud while the voice is on', () => {
    draw();
    open();
    fireEvent.click(screen.getByRole('button', { name: 'Read aloud' }));
    press(' ');
    expect(spoken.at(-1)).toBe('1');
  });

  test('keeps its rows without signal and says so, and has them sent later with nothing lost', async () => {
    sent.mockImplementation(() => { throw new TypeError('no signal'); });
    draw({ foot: 1 });
    open();
    press(' ');
    await screen.findByText('Kept on this device. It goes out when there is signal.');
    sent.mockImplementation(({ tallies }) => new Response(JSON.stringify({ own: tallies, others: { foot: 1 } })));
    window.dispatchEvent(new Event('online'));
    await waitFor(() => { expect(screen.queryByText(/goes out when/)).toBeNull(); });
    expect(number()).toBe('2 of 3 rows');
    expect(sent.mock.lastCall?.[0].tallies).toEqual({ foot: { rows: 1, version: 1 } });
  });

  test('is a form before its script: a number to say, and a refusal with what was typed', async () => {
    const { renderToString } = await import('react-dom/server');
    const html = renderToString(<RowCounter seat="s" series="low-tide" part={3} step={4} bands={bands} own={['foot']} counts={{ foot: 2 }} action="?_action=x" refused={{ typed: 'lots', says: 'Give the rows as a number, from 0 to 20000.' }} />);
    document.body.innerHTML = html;
    expect(screen.getByLabelText(/Rows woven of foot/)).toHaveProperty('value', 'lots');
    expect(screen.getByText('Give the rows as a number, from 0 to 20000.')).toBeDefined();
    expect(screen.getByRole('button', { name: 'One row more' })).toHaveProperty('value', '3');
    expect(document.querySelector<HTMLInputElement>('[name=step]')?.value).toBe('4');
  });
});
