// @vitest-environment jsdom
import { act, cleanup, fireEvent, render, screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, describe, expect, test, vi } from 'vitest';
import type { VideoOnItsWay } from '#contracts/video.ts';
import { VIDEO_LIMITS } from '#core/video/limits.ts';
import { VideoUpload } from '#islands/video/VideoUpload.tsx';
import type { StartVideoUpload, VideoTarget, VideoUploadEvents } from '#islands/video/video-uploader.ts';
import { WatchVideo } from '#islands/video/WatchVideo.tsx';

afterEach(() => { cleanup(); vi.useRealTimers(); });

const MB = 1_000_000;
const onItsWay = (given: Partial<VideoOnItsWay> = {}): VideoOnItsWay => ({ video: 'v'.repeat(26), name: 'rya', title: 'Rya', fileName: 'rya.mp4', state: 'created', byteCount: 2 * MB, arrivedBytes: MB, permille: 0, before: null, failure: null, ...given });

function drawn(unfinished: readonly VideoOnItsWay[] = []) {
  const heard: { events?: VideoUploadEvents; target?: VideoTarget } = {};
  const upload = { pause: vi.fn(), goOn: vi.fn(), again: vi.fn(), stop: vi.fn(), leave: vi.fn() };
  const start: StartVideoUpload = (_file, target, events) => {
    Object.assign(heard, { events, target });
    return Promise.resolve(upload);
  };
  const onSent = vi.fn();
  render(<VideoUpload lesson="l" name={null} unfinished={unfinished} start={start} onSent={onSent} />);
  return { heard, upload, onSent };
}
const film = (name = 'rya.mp4', type = 'video/mp4', size = 2 * MB): File => Object.defineProperty(new File(['x'], name, { type }), 'size', { value: size });
const choose = async (file: File): Promise<void> => { await act(async () => { fireEvent.change(screen.getByTestId('video-chooser'), { target: { files: [file] } }); await Promise.resolve(); }); };

describe('sending a video', () => {
  test('shows how far it has come, and what the server has once all of it is there', async () => {
    const { heard, onSent } = drawn();
    await choose(film());
    expect(heard.target).toEqual({ lesson: 'l', name: null, goesOn: null });
    act(() => { heard.events?.progress(MB); });
    expect(screen.getByRole('progressbar', { name: 'rya.mp4' }).getAttribute('value')).toBe('50');
    act(() => { heard.events?.done('v'); });
    expect(onSent).toHaveBeenCalledTimes(1);
  });

  test('is paused and goes on where it was', async () => {
    const { heard, upload } = drawn();
    await choose(film());
    act(() => { heard.events?.progress(MB); });
    await userEvent.click(screen.getByRole('button', { name: 'Pause' }));
    expect(screen.getByRole('status').textContent).toBe('Paused. What has come stays here for a week.');
    // What was on its way when she paused is no sign that it goes on.
    act(() => { heard.events?.progress(MB + 1); });
    await userEvent.click(screen.getByRole('button', { name: 'Go on' }));
    expect([upload.pause.mock.calls.length, upload.goOn.mock.calls.length]).toEqual([1, 1]);
  });

  test('when the line drops it waits, is not an error, and goes on with the signal', async () => {
    const { heard, upload } = drawn();
    await choose(film());
    act(() => { heard.events?.progress(MB); heard.events?.dropped(); });
    expect(screen.getByRole('status').textContent).toContain('Waits for signal. The line dropped at 1\u00a0MB. It goes on by itself.');
    expect(screen.queryByRole('alert')).toBeNull();
    await act(async () => { window.dispatchEvent(new Event('online')); await Promise.resolve(); });
    expect(upload.again).toHaveBeenCalledTimes(1);
  });

  test('after the page was closed goes on with the same file, and begins anew with another', async () => {
    const { heard } = drawn([onItsWay()]);
    expect(screen.getByText(/are here. Choose the same file again/)).toBeDefined();
    await choose(film());
    expect(heard.target).toEqual({ lesson: 'l', name: 'rya', goesOn: 'v'.repeat(26) });
    expect(screen.getByRole('progressbar').getAttribute('value')).toBe('50');
    cleanup();
    const again = drawn([onItsWay()]);
    await choose(film('other.mp4'));
    expect(again.heard.target?.goesOn).toBeNull();
  });

  test.each([
    ['a photo', film('loom.jpg', 'image/jpeg'), 'MP4, MOV, MKV or WebM'],
    ['an empty file', film('rya.mp4', 'video/mp4', 0), 'empty'],
    ['more than 4 GB', film('rya.mp4', 'video/mp4', VIDEO_LIMITS.maxBytes + 1), 'At most 4 GB'],
  ])('%s is told apart before anything is sent', async (_what, file, says) => {
    const { heard } = drawn();
    await choose(file);
    expect(screen.getByRole('alert').textContent).toContain(says);
    expect(heard.target).toBeUndefined();
  });

  test('what the server refuses is said in its words', async () => {
    const { heard } = drawn();
    await choose(film());
    act(() => { heard.events?.refused('Your videos together may be 60 GB, and this one would not go in.'); });
    expect(screen.getByRole('alert').textContent).toContain('60 GB');
  });
});

describe('a video being made ready', () => {
  test('tells its place, then how much is done, then shows the page anew', async () => {
    vi.useFakeTimers();
    const answers = [onItsWay({ state: 'uploaded', before: 1 }), onItsWay({ state: 'processing', permille: 420 }), onItsWay({ state: 'ready' })];
    const onReady = vi.fn();
    render(<WatchVideo first={onItsWay({ state: 'uploaded', before: 2 })} ask={() => Promise.resolve(answers.shift() ?? null)} onReady={onReady} />);
    const words = () => screen.getByRole('status').textContent;
    expect(words()).toContain('2 videos are made ready before it');
    await act(() => vi.advanceTimersByTimeAsync(2_000));
    expect(words()).toContain('One video is made ready before it');
    await act(() => vi.advanceTimersByTimeAsync(2_000));
    expect(words()).toContain('42\u202f%');
    expect(screen.getByRole('progressbar').getAttribute('value')).toBe('42');
    await act(() => vi.advanceTimersByTimeAsync(2_000));
    expect(onReady).toHaveBeenCalledTimes(1);
  });
});
