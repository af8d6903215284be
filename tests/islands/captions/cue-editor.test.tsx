// @vitest-environment jsdom
import { act, cleanup, fireEvent, render, screen, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, describe, expect, test, vi } from 'vitest';
import { CueEditor } from '#islands/captions/CueEditor.tsx';
import { beginCueEditing, cueEditingAfter, cuesOf, type CueEvent } from '#islands/captions/cue-editing.ts';
import type { KeepCues } from '#islands/captions/use-cues.ts';

afterEach(() => { cleanup(); vi.useRealTimers(); });

const CUES = [{ fromMs: 1_000, toMs: 2_000, words: 'Over one.' }, { fromMs: 3_000, toMs: 4_000, words: 'Under the next.' }];
const after = (...events: readonly CueEvent[]) => events.reduce(cueEditingAfter, beginCueEditing(CUES, 7));

describe('captions in hand', () => {
  test('a new line ends where the next one begins, and is in hand', () => {
    const state = after({ kind: 'add', atMs: 2_500 });
    expect(state.lines.map(({ fromMs, toMs }) => [fromMs, toMs])).toEqual([[1_000, 2_000], [2_500, 3_000], [3_000, 4_000]]);
    expect(state.inHand).toBe(2);
    expect(cuesOf(state)).toEqual(CUES);
  });

  test('marks move the line in hand, never its end before its beginning, and keep the order', () => {
    const state = after({ kind: 'choose', key: 0 }, { kind: 'mark-in', atMs: 3_500 }, { kind: 'mark-out', atMs: 3_600 });
    expect(state.lines.map(({ key, fromMs, toMs }) => [key, fromMs, toMs])).toEqual([[1, 3_000, 4_000], [0, 3_500, 3_800]]);
  });

  test('everything can be undone, words of one line together', () => {
    const written = after({ kind: 'choose', key: 0 }, { kind: 'write', key: 0, words: 'O' }, { kind: 'write', key: 0, words: 'Ov' }, { kind: 'shift', byMs: 500 }, { kind: 'take-out', key: 1 });
    const back = [written];
    for (let at = 0; at < 3; at += 1) back.push(cueEditingAfter(back.at(-1) ?? written, { kind: 'undo' }));
    expect(back.map((state) => cuesOf(state).map(({ words }) => words))).toEqual([['Ov'], ['Ov', 'Under the next.'], ['Ov', 'Under the next.'], ['Over one.', 'Under the next.']]);
    expect(cuesOf(back[1] ?? written)[0]?.fromMs).toBe(1_500);
    expect(cuesOf(back[2] ?? written)[0]?.fromMs).toBe(1_000);
  });

  test('what another window kept is taken, or written over knowingly', () => {
    const behind: CueEvent = { kind: 'behind', revision: 9, cues: [] };
    expect(after({ kind: 'shift', byMs: 1 }, behind, { kind: 'keep-mine' })).toMatchObject({ revision: 9, behind: null, lines: [{ fromMs: 1_001 }, {}] });
    expect(after(behind, { kind: 'take-theirs' })).toMatchObject({ revision: 9, lines: [] });
  });
});

function drawn(keep: KeepCues) {
  render(<CueEditor video="v" src="/media/v/video" title="Rya" durationMs={10_000} revision={7} cues={CUES} keep={keep} />);
  const film = screen.getByLabelText<HTMLVideoElement>('Film: Rya');
  const lines = () => within(screen.getByRole('list', { name: 'Lines of the captions' })).getAllByRole('textbox').map((box) => (box as HTMLTextAreaElement).value);
  return { film, lines, playAt: (seconds: number) => { Object.defineProperty(film, 'currentTime', { value: seconds, writable: true, configurable: true }); fireEvent.timeUpdate(film); } };
}
const kept = (revision: number): Promise<Response> => Promise.resolve(Response.json({ revision, savedAt: '14:02' }));

describe('the editor of captions', () => {
  test('is worked by keys alone: a line at the place that plays, its beginning and its end, the next one', async () => {
    const keep = vi.fn<KeepCues>(() => kept(8));
    const { playAt, lines, film } = drawn(keep);
    const user = userEvent.setup();
    playAt(5);
    act(() => { screen.getByRole('button', { name: 'Write a line here' }).focus(); });
    await user.keyboard('{Enter}');
    await user.keyboard('Beat it down.');
    playAt(6.2);
    await user.keyboard('{Alt>}]{/Alt}');
    playAt(7);
    await user.keyboard('{Enter}');
    await user.keyboard('And again.');
    expect(lines()).toEqual(['Over one.', 'Under the next.', 'Beat it down.', 'And again.']);
    await vi.waitFor(() => expect(keep).toHaveBeenCalled(), { timeout: 10_000 });
    expect(keep.mock.lastCall?.[0]).toMatchObject({ video: 'v', revision: 7, cues: [{}, {}, { fromMs: 5_000, toMs: 6_200, words: 'Beat it down.' }, { fromMs: 7_000, words: 'And again.' }] });
    expect(await screen.findByText(/Saved 14:02/)).toBeDefined();
    // A bracket outside a line marks as well.
    act(() => { film.tabIndex = 0; film.focus(); });
    playAt(5.5);
    fireEvent.keyDown(film, { key: '[' });
    expect(lines()).toHaveLength(4);
  });

  test('names the line that cannot stand, and saves nothing until it is mended', async () => {
    const keep = vi.fn<KeepCues>(() => kept(8));
    drawn(keep);
    await userEvent.click(screen.getByRole('button', { name: 'Later' }));
    const by = screen.getByLabelText('All lines by');
    await userEvent.clear(by);
    await userEvent.type(by, '9');
    await userEvent.click(screen.getByRole('button', { name: 'Later' }));
    expect(screen.getAllByText(/after the video/)).toHaveLength(2);
    expect(screen.getByText('2 lines cannot stand as they are. They are saved once you mend them.')).toBeDefined();
    await new Promise((resolve) => { setTimeout(resolve, 1_800); });
    expect(keep).not.toHaveBeenCalled();
    await userEvent.click(screen.getByRole('button', { name: 'Undo' }));
    await vi.waitFor(() => expect(keep).toHaveBeenCalledTimes(1), { timeout: 10_000 });
  });

  test('tells that another window was first, and loses nothing', async () => {
    let first = true;
    const keep: KeepCues = () => {
      if (!first) return kept(10);
      first = false;
      return Promise.resolve(Response.json({ behind: { revision: 9, cues: [] } }, { status: 409 }));
    };
    const { lines } = drawn(keep);
    await userEvent.type(screen.getByRole('textbox', { name: /Words from 0:01/ }), ' Go on.');
    await userEvent.click(await screen.findByRole('button', { name: 'Keep mine' }));
    expect(lines()[0]).toBe('Over one. Go on.');
    expect(await screen.findByText(/Saved 14:02/)).toBeDefined();
  });

  test('keeps trying while the line is down', async () => {
    drawn(() => Promise.reject(new Error('away')));
    await userEvent.type(screen.getByRole('textbox', { name: /Words from 0:01/ }), '!');
    expect(await screen.findByText(/Not saved: the line is down/)).toBeDefined();
    expect(screen.getByRole('button', { name: 'Save now' })).toBeDefined();
  });
});
