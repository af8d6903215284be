// @vitest-environment jsdom
import { cleanup, render, screen, waitFor } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, beforeEach, describe, expect, test, vi } from 'vitest';
import type { ShownLine } from '#core/gathering/rows.ts';
import { GatherPart } from '#islands/gather/GatherPart.tsx';

function line(key: string, given: Partial<ShownLine> = {}): ShownLine {
  return { key, items: key.split('.'), kind: 'tool', name: `Thing ${key}`, ticked: false, colour: undefined, amount: '1', also: '', when: 'Part 2', note: '', standIn: '', lookOut: '', getFrom: '', ...given };
}
const lines = [line('a.b', { name: 'Blunt needle' }), line('c', { name: 'Fork', ticked: true })];
let seat = 0;
const draw = () => render(<GatherPart seat={`seat-${String(seat)}`} series="low-tide" part={2} lines={lines} action="?" />);
const answer = (status: number) => vi.fn(() => Promise.resolve(new Response('{}', { status })));

beforeEach(() => { seat += 1; localStorage.clear(); });
afterEach(() => { cleanup(); vi.unstubAllGlobals(); });

describe('a list to tick', () => {
  test('answers at once, counts, and sends every thing the line stands for', async () => {
    const fetched = answer(200);
    vi.stubGlobal('fetch', fetched);
    draw();
    expect(screen.getByText('1 of 2')).toBeDefined();
    await userEvent.click(screen.getByRole('checkbox', { name: /Blunt needle/ }));
    expect(screen.getByText('2 of 2')).toBeDefined();
    await waitFor(() => { expect(fetched).toHaveBeenCalledTimes(1); });
    const [, sent] = fetched.mock.calls[0] as unknown as [string, { body: string }];
    expect(JSON.parse(sent.body)).toMatchObject({ subject: 'gather', series: 'low-tide', items: ['a', 'b'], ticked: true });
  });

  test('without signal keeps the tick here, says so, and sends it when there is signal', async () => {
    vi.stubGlobal('fetch', vi.fn(() => Promise.reject(new TypeError('no signal'))));
    draw();
    await userEvent.click(screen.getByRole('checkbox', { name: /Blunt needle/ }));
    await screen.findByText('No signal. Ticks are kept here.');
    expect(screen.getByRole('checkbox', { name: /Blunt needle/, checked: true })).toBeDefined();
    const fetched = answer(200);
    vi.stubGlobal('fetch', fetched);
    window.dispatchEvent(new Event('online'));
    await waitFor(() => { expect(screen.queryByText('No signal. Ticks are kept here.')).toBeNull(); });
    expect(fetched).toHaveBeenCalledTimes(1);
    expect(localStorage).toHaveLength(0);
  });

  test('takes the tick back when the server will not have it', async () => {
    vi.stubGlobal('fetch', answer(404));
    draw();
    await userEvent.click(screen.getByRole('checkbox', { name: /Blunt needle/ }));
    await waitFor(() => { expect(screen.getByRole('checkbox', { name: /Blunt needle/, checked: false })).toBeDefined(); });
    expect(screen.getByRole('status').textContent).toContain('Load the page again');
  });

  test('holds what a form without script needs to tell which ticks changed', () => {
    const { container } = draw();
    const values = (name: string): string[] => [...container.querySelectorAll<HTMLInputElement>(`input[name="${name}"]`)].map(({ value }) => value);
    expect(values('shown[]')).toEqual(['a.b', 'c']);
    expect(values('had[]')).toEqual(['c']);
    expect(values('gathered[]')).toEqual(['a.b', 'c']);
  });
});
