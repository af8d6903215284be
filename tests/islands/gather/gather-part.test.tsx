// @vitest-environment jsdom
import { cleanup, render, screen, waitFor } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, beforeEach, describe, expect, test, vi } from 'vitest';
import type { ShownLine } from '#core/gathering/rows.ts';
import type { TickNow } from '#contracts/ticks.ts';
import { outboxOf } from '#islands/keeping/outbox.ts';
import { GatherPart } from '#islands/gather/GatherPart.tsx';

function line(key: string, given: Partial<ShownLine> = {}): ShownLine {
  return { key, items: key.split('.'), kind: 'tool', name: `Thing ${key}`, ticked: false, colour: undefined, amount: '1', also: '', when: 'Part 2', note: '', standIn: '', lookOut: '', getFrom: '', ...given };
}
const lines = [line('a.b', { name: 'Blunt needle' }), line('c', { name: 'Fork', ticked: true })];
/** What the house answers to the tick of the needle, which stands on two lists. */
const NEEDLE: readonly TickNow[] = ['a', 'b'].map((key) => ({ subject: 'gather', key, ticked: true, revision: 5 }));
let person = 0;
const draw = () => render(<GatherPart asOf={4} series="low-tide" part={2} lines={lines} action="?" />);
const answer = (status: number, ticks: readonly TickNow[] = []) => vi.fn(() => Promise.resolve(Response.json({ revision: 5, ticks }, { status })));

beforeEach(() => {
  person += 1;
  document.documentElement.dataset['person'] = `p${String(person)}`;
});
afterEach(() => { cleanup(); vi.unstubAllGlobals(); });

describe('a list to tick', () => {
  test('answers at once, counts, and sends every thing the line stands for', async () => {
    const fetched = answer(200, NEEDLE);
    vi.stubGlobal('fetch', fetched);
    draw();
    expect(screen.getByText('1 of 2')).toBeDefined();
    await userEvent.click(screen.getByRole('checkbox', { name: /Blunt needle/ }));
    expect(screen.getByText('2 of 2')).toBeDefined();
    await waitFor(() => { expect(fetched).toHaveBeenCalledTimes(1); });
    const [, sent] = fetched.mock.calls[0] as unknown as [string, { body: string }];
    expect(JSON.parse(sent.body)).toMatchObject({ subject: 'gather', series: 'low-tide', items: ['a', 'b'], ticked: true, seen: 4 });
  });

  test('without signal keeps the tick here, says so, and sends it when there is signal', async () => {
    vi.stubGlobal('fetch', vi.fn(() => Promise.reject(new TypeError('no signal'))));
    draw();
    await userEvent.click(screen.getByRole('checkbox', { name: /Blunt needle/ }));
    await screen.findByText('No signal. Ticks are kept here.');
    expect(screen.getByRole('checkbox', { name: /Blunt needle/, checked: true })).toBeDefined();
    const fetched = answer(200, NEEDLE);
    vi.stubGlobal('fetch', fetched);
    // As the page's own script does when there is signal.
    await outboxOf(`p${String(person)}`).flush();
    await waitFor(() => { expect(screen.queryByText('No signal. Ticks are kept here.')).toBeNull(); });
    expect(fetched).toHaveBeenCalledTimes(1);
    expect(screen.getByRole('checkbox', { name: /Blunt needle/, checked: true })).toBeDefined();
  });

  test('shows what another device ticked meanwhile, and nothing that the page knew already', async () => {
    vi.stubGlobal('fetch', answer(200, [
      { subject: 'gather', key: 'a', ticked: true, revision: 6 }, { subject: 'gather', key: 'b', ticked: true, revision: 6 },
      { subject: 'gather', key: 'c', ticked: false, revision: 5 },
    ]));
    draw();
    await userEvent.click(screen.getByRole('checkbox', { name: /Fork/ }));
    await waitFor(() => { expect(screen.getByRole('checkbox', { name: /Blunt needle/, checked: true })).toBeDefined(); });
    expect(screen.getByRole('checkbox', { name: /Fork/, checked: false })).toBeDefined();
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
