// @vitest-environment jsdom
import { act, cleanup, fireEvent, render, screen, waitFor } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, beforeEach, describe, expect, test, vi } from 'vitest';
import { PhotoUpload } from '#islands/photo/PhotoUpload.tsx';
import type { KeepPhotos } from '#islands/photo/kept-photos.ts';
import type { PhotoTarget, Show, ShowAnswer, StartUpload } from '#islands/photo/uploader.ts';
import type { CarryEvents } from '#islands/uploading/carry.ts';

beforeEach(() => {
  vi.stubGlobal('URL', Object.assign(URL, { createObjectURL: () => 'blob:here', revokeObjectURL: () => undefined }));
});
afterEach(() => { cleanup(); vi.useRealTimers(); vi.restoreAllMocks(); });

function drawn(given: Partial<Parameters<typeof PhotoUpload>[0]> = {}, answers: ShowAnswer[] = []) {
  const heard: { events?: CarryEvents; target?: PhotoTarget & { readonly goesOn: string | null }; sent: string[] } = { sent: [] };
  const upload = { again: vi.fn(), stop: vi.fn(), leave: vi.fn() };
  const start: StartUpload = (file, { begun: _begun, ...target }, events) => {
    heard.sent.push(file.name);
    Object.assign(heard, { events, target });
    return Promise.resolve(upload);
  };
  const show = vi.fn<Show>(() => Promise.resolve(answers.shift() ?? 'shown'));
  const onSent = vi.fn();
  const view = render(<PhotoUpload series="low-tide" lesson="l" part={2} teacher="Ilse" answerWords="Most answers come within 2 days." again={false} open start={start} show={show} onSent={onSent} {...given} />);
  return { ...view, heard, upload, show, onSent };
}
const photo = (name = 'loom.jpg', type = 'image/jpeg') => new File([new Uint8Array(2_000_000)], name, { type });
const choose = (...files: readonly File[]) => { fireEvent.change(screen.getByTestId('photo-chooser'), { target: { files } }); };
const arrive = (heard: { events?: CarryEvents }, shot: string) => act(async () => { heard.events?.done(shot); await Promise.resolve(); });

describe('sending a photo', () => {
  test('shows how far it has come, and says when the teacher has it', async () => {
    const { heard, show, onSent } = drawn();
    choose(photo());
    await userEvent.type(screen.getByRole('textbox', { name: /What should Ilse know/ }), 'Is it slack?');
    await userEvent.click(screen.getByRole('button', { name: 'Send to Ilse' }));
    expect(heard.target).toEqual({ series: 'low-tide', lesson: 'l', goesOn: null });
    act(() => { heard.events?.progress(1_000_000); });
    expect(screen.getByRole('progressbar', { name: 'loom.jpg' }).getAttribute('value')).toBe('50');
    expect(screen.getByText('1.0 of 2.0 MB')).toBeDefined();
    await arrive(heard, 'shot-1');
    expect(show).toHaveBeenCalledWith({ series: 'low-tide', lesson: 'l', words: 'Is it slack?', shots: ['shot-1'] });
    expect(screen.getByRole('status').textContent).toBe('Ilse has your photo. Most answers come within 2 days.');
    expect(onSent).toHaveBeenCalledTimes(1);
  });

  test('when the line drops it waits, is not an error, and goes on by itself with the signal', async () => {
    const { heard, upload } = drawn();
    choose(photo());
    await userEvent.click(screen.getByRole('button', { name: 'Send to Ilse' }));
    act(() => { heard.events?.progress(1_200_000); heard.events?.dropped(); });
    expect(screen.getByRole('status').textContent).toBe('Waits for signal. The line dropped at 1.2 of 2.0\u00a0MB. It goes on from there by itself.');
    expect(screen.queryByRole('alert')).toBeNull();
    await act(async () => { window.dispatchEvent(new Event('online')); await Promise.resolve(); });
    expect(upload.again).toHaveBeenCalledTimes(1);
  });

  test('several go one after the other and are shown together; a dropped line between the last byte and the answer asks again', async () => {
    const { heard, show, onSent } = drawn({}, ['later', 'shown']);
    choose(photo('front.jpg'), photo('side.jpg'));
    await userEvent.click(screen.getByRole('button', { name: 'Send 2 photos to Ilse' }));
    await arrive(heard, 'a');
    await arrive(heard, 'b');
    expect([heard.sent, show.mock.calls.length]).toEqual([['front.jpg', 'side.jpg'], 1]);
    expect(screen.getByRole('status').textContent).toContain('Waits for signal');
    await act(async () => { window.dispatchEvent(new Event('online')); await Promise.resolve(); });
    expect(show).toHaveBeenLastCalledWith({ series: 'low-tide', lesson: 'l', words: '', shots: ['a', 'b'] });
    expect(onSent).toHaveBeenCalledTimes(1);
  });

  test('without any connection is kept on the device with its words, and the thread is shown once it was sent from there', async () => {
    let waiting = 0;
    let hear = (): void => undefined;
    const put = vi.fn<KeepPhotos['put']>(() => { waiting = 1; hear(); return Promise.resolve(true); });
    const kept: KeepPhotos = { put, current: () => ({ waiting, refused: undefined }), subscribe: (heard) => { hear = heard; return () => undefined; } };
    vi.spyOn(navigator, 'onLine', 'get').mockReturnValue(false);
    const { heard, upload, onSent } = drawn({ kept });
    await userEvent.type(screen.getByRole('textbox', { name: /What should Ilse know/ }), 'Is it slack?');
    choose(photo());
    await userEvent.click(screen.getByRole('button', { name: 'Send to Ilse' }));
    await act(async () => { heard.events?.dropped(); await Promise.resolve(); });
    expect(put).toHaveBeenCalledWith({ series: 'low-tide', lesson: 'l' }, 'Is it slack?', [expect.objectContaining({ name: 'loom.jpg' })]);
    expect(upload.leave).toHaveBeenCalled();
    expect(screen.getByRole('status').textContent).toContain('Kept on this device');
    act(() => { waiting = 0; hear(); });
    expect(onSent).toHaveBeenCalledTimes(1);
  });

  test('what ended meanwhile is told in the words of the server', async () => {
    const { heard } = drawn({}, [{ says: 'Your seat ended while the photo was on its way. It was not kept.' }]);
    choose(photo());
    await userEvent.click(screen.getByRole('button', { name: 'Send to Ilse' }));
    await arrive(heard, 'a');
    expect(screen.getByRole('alert').textContent).toContain('Your seat ended');
  });

  test('is cut and turned before it is sent, by keys alone', async () => {
    vi.stubGlobal('createImageBitmap', () => Promise.resolve({ width: 4_000, height: 3_000, close: () => undefined }));
    const pen = { scale: vi.fn(), translate: vi.fn(), rotate: vi.fn(), drawImage: vi.fn() };
    HTMLCanvasElement.prototype.getContext = (() => pen) as never;
    HTMLCanvasElement.prototype.toBlob = function toBlob(this: HTMLCanvasElement, hear: BlobCallback) { hear(new Blob([`${this.width} by ${this.height}`])); };
    HTMLDialogElement.prototype.showModal = function showModal(this: HTMLDialogElement) { this.open = true; };
    const { heard } = drawn();
    choose(photo('loom.png', 'image/png'));
    await userEvent.click(screen.getByRole('button', { name: 'Cut and turn loom.png' }));
    await userEvent.click(await screen.findByRole('button', { name: 'Turn by a quarter' }));
    screen.getByRole('button', { name: /upper left corner/ }).focus();
    await userEvent.keyboard('{Shift>}{ArrowDown}{ArrowDown}{/Shift}{ArrowRight}{ArrowLeft}');
    expect(screen.getByText('Keeps 100 % of the width and 80 % of the height.')).toBeDefined();
    await userEvent.click(screen.getByRole('button', { name: 'Use this' }));
    await userEvent.click(await screen.findByRole('button', { name: 'Send to Ilse' }));
    expect(heard.sent).toEqual(['loom.jpg']);
    expect(screen.getByText('loom.jpg')).toBeDefined();
  });

  test('stopped, it is put down and can be sent again', async () => {
    const { upload } = drawn();
    choose(photo());
    await userEvent.click(screen.getByRole('button', { name: 'Send to Ilse' }));
    await userEvent.click(await screen.findByRole('button', { name: 'Stop sending' }));
    expect(upload.leave).toHaveBeenCalled();
    expect(screen.getByRole('button', { name: 'Send to Ilse' })).toBeDefined();
  });

  test('a file that is no photo is told at once, and nothing is sent', () => {
    const { heard } = drawn();
    choose(photo('notes.pdf', 'application/pdf'));
    expect(screen.getByRole('alert').textContent).toContain('Use JPEG, PNG or WebP, up to 25 MB.');
    expect(heard.events).toBeUndefined();
  });

  test('what the server says against it stands there, and the words typed are kept', async () => {
    const { heard } = drawn();
    await userEvent.type(screen.getByRole('textbox', { name: /What should Ilse know/ }), 'Look left');
    choose(photo());
    await userEvent.click(screen.getByRole('button', { name: 'Send to Ilse' }));
    act(() => { heard.events?.refused('This photo is damaged.'); });
    expect(screen.getByRole('alert').textContent).toContain('This photo is damaged.');
    expect(screen.getByRole('textbox', { name: /What should Ilse know/ })).toHaveProperty('value', 'Look left');
  });

  test('is dropped on its place', async () => {
    const { container } = drawn();
    const place = container.querySelector('.drop');
    if (place === null) throw new Error('nowhere to drop');
    fireEvent.drop(place, { dataTransfer: { files: [photo('dropped.jpg')] } });
    await waitFor(() => { expect(screen.getByRole('button', { name: 'Put dropped.jpg away' })).toBeDefined(); });
  });

  test('a photo that was refused without script comes back with its reason and words', () => {
    drawn({ fault: 'This photo is too small.', words: 'Look left' });
    expect(screen.getByRole('alert').textContent).toContain('This photo is too small.');
    expect(screen.getByRole('textbox', { name: /What should Ilse know/ })).toHaveProperty('value', 'Look left');
  });
});
