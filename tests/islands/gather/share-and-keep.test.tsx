// @vitest-environment jsdom
import { cleanup, render, screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, describe, expect, test, vi } from 'vitest';
import type { KeptSeries, ToWorker } from '#contracts/kept-pages.ts';
import { ShareList } from '#islands/gather/ShareList.tsx';
import { KeepSeries } from '#islands/keeping/KeepSeries.tsx';

afterEach(() => {
  cleanup();
  for (const name of ['share', 'serviceWorker', 'storage']) Reflect.deleteProperty(navigator, name);
});
const give = (name: string, value: unknown): void => { Object.defineProperty(navigator, name, { value, configurable: true }); };

describe('a list that is sent on', () => {
  const draw = () => render(<ShareList title="Gather for Low Tide" textNow={() => '[ ] Fork'} address="/series/low-tide/gather.txt" />);

  test('goes by whatever the device has for it', async () => {
    const share = vi.fn(() => Promise.resolve());
    give('share', share);
    draw();
    await userEvent.click(screen.getByRole('button', { name: 'Share as text' }));
    expect(share).toHaveBeenCalledWith({ title: 'Gather for Low Tide', text: '[ ] Fork' });
    expect(screen.getByRole('status').textContent).toBe('');
  });

  test('is copied where there is nothing for it, and can always be opened as text', async () => {
    const user = userEvent.setup();
    draw();
    await user.click(screen.getByRole('button', { name: 'Copy as text' }));
    await screen.findByText('The list is copied.');
    expect(await navigator.clipboard.readText()).toBe('[ ] Fork');
    expect(screen.getByRole('link', { name: 'Open as text' }).getAttribute('href')).toBe('/series/low-tide/gather.txt');
  });

  test('closed by herself says nothing and copies nothing', async () => {
    const user = userEvent.setup();
    give('share', () => Promise.reject(new DOMException('', 'AbortError')));
    draw();
    await user.click(screen.getByRole('button', { name: 'Share as text' }));
    expect(screen.getByRole('status').textContent).toBe('');
  });
});

describe('a series kept on the device', () => {
  function worker(answer: (said: ToWorker) => KeptSeries | null): void {
    give('serviceWorker', { ready: Promise.resolve({ active: { postMessage: (said: ToWorker, [port]: MessagePort[]) => { port?.postMessage(answer(said)); } } }) });
    give('storage', { persist: () => Promise.resolve(true) });
  }

  test('is fetched when she asks, and taken off again', async () => {
    let slugs: string[] = [];
    worker(({ kind }) => {
      if (kind === 'keep-series') slugs = ['low-tide'];
      if (kind === 'drop-series') slugs = [];
      return { slugs, missing: 0 };
    });
    render(<KeepSeries series="low-tide" />);
    await userEvent.click(await screen.findByRole('button', { name: 'Keep the whole series on this device' }));
    await screen.findByText('All open parts are on this device.');
    await userEvent.click(screen.getByRole('button', { name: 'Take it off this device' }));
    await screen.findByText('Taken off this device.');
  });

  test('that cannot be fetched now says so, and is not called kept', async () => {
    worker(({ kind }) => (kind === 'keep-series' ? null : { slugs: [], missing: 0 }));
    render(<KeepSeries series="low-tide" />);
    await userEvent.click(await screen.findByRole('button', { name: 'Keep the whole series on this device' }));
    await screen.findByText(/^The parts could not be fetched just now/);
    expect(screen.getByRole('button', { name: 'Keep the whole series on this device' })).toBeDefined();
  });

  test('is not offered where the browser keeps nothing', () => {
    render(<KeepSeries series="low-tide" />);
    expect(screen.queryByRole('button')).toBeNull();
  });
});
