// @vitest-environment jsdom
import { act, cleanup, fireEvent, render, screen, waitFor } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, beforeEach, describe, expect, test, vi } from 'vitest';
import { PhotoUpload } from '#islands/photo/PhotoUpload.tsx';
import type { StartUpload, UploadEvents } from '#islands/photo/uploader.ts';

beforeEach(() => {
  vi.stubGlobal('URL', Object.assign(URL, { createObjectURL: () => 'blob:here', revokeObjectURL: () => undefined }));
});
afterEach(() => { cleanup(); vi.useRealTimers(); });

function drawn(given: Partial<Parameters<typeof PhotoUpload>[0]> = {}) {
  const heard: { events?: UploadEvents; fields?: Readonly<Record<string, string>> } = {};
  const upload = { again: vi.fn(), stop: vi.fn() };
  const start: StartUpload = (_file, fields, events) => {
    Object.assign(heard, { events, fields });
    return Promise.resolve(upload);
  };
  const onSent = vi.fn();
  const view = render(<PhotoUpload series="low-tide" lesson="l" part={2} teacher="Ilse" answerWords="Most answers come within 2 days." again={false} open start={start} onSent={onSent} {...given} />);
  return { ...view, heard, upload, onSent };
}
const photo = (name = 'loom.jpg', type = 'image/jpeg') => new File([new Uint8Array(2_000_000)], name, { type });
const choose = (file: File) => { fireEvent.change(screen.getByTestId('photo-chooser'), { target: { files: [file] } }); };

describe('sending a photo', () => {
  test('shows how far it has come, and says when the teacher has it', async () => {
    const { heard, onSent } = drawn();
    choose(photo());
    await userEvent.type(screen.getByRole('textbox', { name: /What should Ilse know/ }), 'Is it slack?');
    await userEvent.click(screen.getByRole('button', { name: 'Send to Ilse' }));
    expect(heard.fields).toEqual({ series: 'low-tide', lesson: 'l', words: 'Is it slack?' });
    act(() => { heard.events?.progress(1_000_000); });
    expect(screen.getByRole('progressbar', { name: 'loom.jpg' }).getAttribute('value')).toBe('50');
    expect(screen.getByText('1.0 of 2.0 MB')).toBeDefined();
    act(() => { heard.events?.done(); });
    expect(screen.getByRole('status').textContent).toBe('Ilse has your photo. Most answers come within 2 days.');
    expect(onSent).toHaveBeenCalledTimes(1);
  });

  test('when the line drops it waits, is not an error, and goes on by itself with the signal', async () => {
    const { heard, upload } = drawn();
    choose(photo());
    await userEvent.click(screen.getByRole('button', { name: 'Send to Ilse' }));
    act(() => { heard.events?.progress(1_200_000); heard.events?.dropped(); });
    expect(screen.getByRole('status').textContent).toBe('Waits for signal. The line dropped at 1.2 of 2.0\u00a0MB. It is sent again by itself.');
    expect(screen.queryByRole('alert')).toBeNull();
    await act(async () => { window.dispatchEvent(new Event('online')); await Promise.resolve(); });
    expect(upload.again).toHaveBeenCalledTimes(1);
  });

  test('stopped, it is put down and can be sent again', async () => {
    const { upload } = drawn();
    choose(photo());
    await userEvent.click(screen.getByRole('button', { name: 'Send to Ilse' }));
    await userEvent.click(await screen.findByRole('button', { name: 'Stop sending this photo' }));
    expect(upload.stop).toHaveBeenCalled();
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
    await waitFor(() => { expect(screen.getByText('dropped.jpg')).toBeDefined(); });
  });

  test('a photo that was refused without script comes back with its reason and words', () => {
    drawn({ fault: 'This photo is too small.', words: 'Look left' });
    expect(screen.getByRole('alert').textContent).toContain('This photo is too small.');
    expect(screen.getByRole('textbox', { name: /What should Ilse know/ })).toHaveProperty('value', 'Look left');
  });
});
