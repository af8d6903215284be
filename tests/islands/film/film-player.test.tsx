// @vitest-environment jsdom
import { cleanup, fireEvent, render, screen, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { renderToString } from 'react-dom/server';
import { afterEach, beforeEach, describe, expect, test, vi } from 'vitest';
import { FilmPlayer } from '#islands/film/FilmPlayer.tsx';
import { stretchAt, stretchesOf, watchedWords } from '#islands/film/stretches.ts';

const CHAPTERS = [{ atMs: 0, title: 'Begin' }, { atMs: 60_000, title: 'Knot' }, { atMs: 90_000, title: 'Trim' }];
const CUES = [{ fromMs: 1_000, toMs: 2_000, words: 'Over one.' }, { fromMs: 61_000, toMs: 62_000, words: 'Under the next.' }];
const play = vi.fn(function play(this: HTMLMediaElement) { this.dispatchEvent(new Event('play')); return Promise.resolve(); });
/** Which film the browser was told to load, each time. */
const load = vi.fn(function load(this: HTMLMediaElement) { return this.querySelector('source')?.getAttribute('src'); });
const pause = vi.fn(function pause(this: HTMLMediaElement) { this.dispatchEvent(new Event('pause')); });

beforeEach(() => {
  vi.clearAllMocks();
  Object.assign(HTMLMediaElement.prototype, { play, pause, load });
  localStorage.clear();
});
afterEach(cleanup);

const KEEP = { series: 'low-tide', lesson: 'l'.repeat(26), name: 'rya' };
const player = (given: Partial<Parameters<typeof FilmPlayer>[0]> = {}) =>
  <FilmPlayer title="Rya" src="/media/v/video" type="video/mp4" durationMs={120_000} captions="/media/v/captions" chapters={CHAPTERS} cues={CUES} keep={KEEP} send={vi.fn()} {...given} />;
const film = (): HTMLVideoElement => screen.getByLabelText<HTMLVideoElement>('Rya');

describe('a film', () => {
  test('comes as the browser’s own player, with captions, chapters as links and its words', () => {
    const page = document.createElement('div');
    page.innerHTML = renderToString(player());
    expect(page.querySelector('video[controls] > track[kind=captions][default]')?.getAttribute('src')).toBe('/media/v/captions');
    expect([...page.querySelectorAll('.chapter-list a')].map((link) => link.getAttribute('href'))).toEqual(['/media/v/video#t=0', '/media/v/video#t=60', '/media/v/video#t=90']);
    expect(page.querySelector('.transcript')?.textContent).toContain('Over one.');
    expect(page.querySelector('.transcript button, input, .bar')).toBeNull();
  });

  test('goes on where she stopped, on whatever device', async () => {
    render(player({ place: { placeMs: 65_000, furthestMs: 80_000 } }));
    await userEvent.click(screen.getByRole('button', { name: 'Go on at 1:05' }));
    expect(film().currentTime).toBe(65);
    expect(play).toHaveBeenCalled();
    expect(screen.queryByRole('button', { name: /Go on at/ })).toBeNull();
  });

  test('begins a chapter in its place', async () => {
    render(player());
    await userEvent.click(screen.getByRole('link', { name: /Knot/ }));
    expect(film().currentTime).toBe(60);
    expect(screen.getByRole('link', { name: /Knot/ }).getAttribute('aria-current')).toBe('true');
  });

  test('is played small where she chooses so, at the same place, and stays small for the next', async () => {
    const small = { src: '/media/v/small', says: '12 MB instead of 48 MB' };
    const source = (): string | null | undefined => film().querySelector('source')?.getAttribute('src');
    render(player({ small }));
    expect(source()).toBe('/media/v/video');
    film().currentTime = 42;
    await userEvent.click(screen.getByRole('button', { name: 'Small film for slow lines, 12 MB instead of 48 MB' }));
    expect(source()).toBe('/media/v/small');
    film().currentTime = 0;
    fireEvent.loadedMetadata(film());
    expect(film().currentTime).toBe(42);
    cleanup();
    render(player({ small }));
    expect(source()).toBe('/media/v/small');
    expect(screen.getByRole('button', { name: /^Small film/, pressed: true })).toBeDefined();
    expect(load.mock.results.map(({ value }) => value as string)).toEqual(['/media/v/small', '/media/v/small']);
    cleanup();
    render(player());
    expect(source()).toBe('/media/v/video');
  });

  test('without script offers the small film as a link', () => {
    const page = document.createElement('div');
    page.innerHTML = renderToString(player({ small: { src: '/media/v/small', says: '12 MB instead of 48 MB' } }));
    expect(page.querySelector('a[href="/media/v/small"]')?.textContent).toBe('Small film for slow lines');
  });

  test('is worked by keys within it', () => {
    render(player());
    fireEvent.keyDown(film(), { key: ' ' });
    expect(play).toHaveBeenCalledTimes(1);
    fireEvent.keyDown(film(), { key: 'ArrowRight' });
    fireEvent.keyDown(film(), { key: 'ArrowRight' });
    fireEvent.keyDown(film(), { key: 'ArrowLeft' });
    expect(film().currentTime).toBe(5);
    fireEvent.keyDown(film(), { key: 'c' });
    expect(screen.getByRole('button', { name: 'Captions' }).getAttribute('aria-pressed')).toBe('false');
    expect(screen.getByRole('slider', { name: 'Place in Rya' }).getAttribute('aria-valuetext')).toBe('0:05 of 2:00, Begin');
  });

  test('tells where she is when she pauses, not without a seat', async () => {
    const send = vi.fn();
    render(player({ send }));
    fireEvent.keyDown(film(), { key: ' ' });
    film().currentTime = 42;
    fireEvent.timeUpdate(film());
    await userEvent.click(screen.getByRole('button', { name: 'Pause' }));
    expect(send.mock.calls).toEqual([[{ ...KEEP, placeMs: 42_000 }]]);
    cleanup();
    render(player({ send, keep: null }));
    fireEvent.keyDown(film(), { key: ' ' });
    film().currentTime = 50;
    fireEvent.timeUpdate(film());
    await userEvent.click(screen.getByRole('button', { name: 'Pause' }));
    expect(send).toHaveBeenCalledTimes(1);
  });

  test('its words are found and jumped to, and follow it', async () => {
    render(player());
    const words = within(screen.getByRole('region', { name: 'The spoken words', hidden: true }));
    fireEvent.change(screen.getByLabelText('Find a word'), { target: { value: 'UNDER' } });
    expect(words.getAllByRole('button', { hidden: true }).map((line) => line.textContent)).toEqual(['Under the next.']);
    fireEvent.click(words.getByRole('button', { hidden: true }));
    expect(film().currentTime).toBe(61);
    fireEvent.change(screen.getByLabelText('Find a word'), { target: { value: 'nothing' } });
    expect(screen.getByText('It is not said.')).toBeDefined();
  });

  test('is faster and slower', async () => {
    render(player());
    await userEvent.click(screen.getByRole('button', { name: 'Speed 1, make it 1.25' }));
    expect(film().playbackRate).toBe(1.25);
  });
});

describe('the strip of a film', () => {
  test('is woven as far as it was watched, chapter by chapter', () => {
    const stretches = stretchesOf(CHAPTERS, 120_000, 75_000);
    expect(stretches.map(({ woven }) => woven)).toEqual([1, 0.5, 0]);
    expect(watchedWords(stretches)).toBe('1 of 3 chapters watched');
    expect([0, 59_999, 60_000, 119_000].map((at) => stretchAt(stretches, at))).toEqual([0, 0, 1, 2]);
  });

  test('is one stretch without chapters', () => {
    expect(stretchesOf([], 120_000, 30_000)).toEqual([{ title: null, fromMs: 0, toMs: 120_000, woven: 0.25 }]);
    expect(watchedWords(stretchesOf([], 120_000, 30_000))).toBe('25 % watched');
  });
});
