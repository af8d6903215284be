import { act, cleanup, fireEvent, render, screen } from '@testing-library/react';
import { afterEach, beforeEach, describe, expect, test, vi } from 'vitest';
import type { OtherPiece } from '#contracts/piece.ts';
import { textsOfTyped } from '#core/craft/piece-form/field-names.ts';
import { emptyForm } from '#core/craft/piece-form/type-piece.ts';
import { PieceForm } from '#islands/piece-form/PieceForm.tsx';

const typed = emptyForm('cm');
const texts = textsOfTyped(typed);
let sent: { revision: number; over: boolean; texts: Record<string, string> }[] = [];
let answers: { status: number; body: unknown }[] = [];

beforeEach(() => {
  vi.useFakeTimers();
  sent = [];
  answers = [];
  vi.stubGlobal('fetch', async (_address: string, { body }: { body: string }) => {
    sent.push(JSON.parse(body) as (typeof sent)[number]);
    const answer = answers.shift();
    if (answer === undefined) throw new TypeError('no line');
    return new Response(JSON.stringify(answer.body), { status: answer.status });
  });
});
afterEach(() => { cleanup(); vi.useRealTimers(); vi.unstubAllGlobals(); localStorage.clear(); });

const open = (): void => {
  render(<PieceForm action="?" series={{ slug: 'weir', name: 'Weir' }} revision={3} typed={typed} isTried={false} isChanged={false} isOver={false} summary="" openBand={null} saved={{ words: 'Nothing saved yet', isDraft: false, pieceWords: null, asideWords: null }} looms={[]} />);
};
const field = (name: string): HTMLInputElement => document.querySelector<HTMLInputElement>(`[name="${name}"]`) ?? expect.fail(`no ${name}`);
const retype = (text: string): void => { fireEvent.change(field('size.widthMm'), { target: { value: text } }); };
const wait = async (ms: number): Promise<void> => { await act(() => vi.advanceTimersByTimeAsync(ms)); };
const kept = (revision: number) => ({ status: 200, body: { revision, savedAt: '14:02' } });
const other: OtherPiece = { revision: 8, texts: { ...texts, 'size.widthMm': '61' }, by: 'Wren Ashby', at: '14:05' };

describe('the form of a piece', () => {
  test('keeps itself after a pause, and says when', async () => {
    answers = [kept(4)];
    open();
    retype('30');
    await wait(500);
    retype('31');
    await wait(1_300);
    expect(sent.map((one) => [one.revision, one.texts['size.widthMm']])).toEqual([[3, '31']]);
    expect(screen.getByText('Draft saved 14:02')).toBeTruthy();
    expect(field('revision').value).toBe('4');
  });

  test('goes on being undone after it was kept', async () => {
    answers = [kept(4), kept(5)];
    open();
    retype('30');
    await wait(1_300);
    fireEvent.keyDown(document.body, { key: 'z', ctrlKey: true });
    expect(field('size.widthMm').value).toBe('');
    fireEvent.keyDown(document.body, { key: 'Z', ctrlKey: true, shiftKey: true });
    expect(field('size.widthMm').value).toBe('30');
  });

  test('without a line is kept on this device, and stands there again', async () => {
    open();
    retype('30');
    await wait(1_300);
    expect(screen.getByText(/Kept on this device/)).toBeTruthy();
    cleanup();
    answers = [kept(4)];
    open();
    expect(field('size.widthMm').value).toBe('30');
    await wait(1_300);
    expect(sent.at(-1)?.texts['size.widthMm']).toBe('30');
    expect(localStorage.length).toBe(0);
  });

  test('shows what another window wrote, and keeps this one over it', async () => {
    answers = [{ status: 409, body: { behind: other } }, kept(9)];
    open();
    retype('30');
    await wait(1_300);
    expect(screen.getByRole('alert').textContent).toContain('Wren Ashby changed this piece at 14:05');
    await wait(20_000);
    expect(sent).toHaveLength(1);
    fireEvent.click(screen.getByText('Keep mine'));
    await wait(1_300);
    expect(sent.at(-1)).toMatchObject({ revision: 8, over: true, texts: { 'size.widthMm': '30' } });
    expect(screen.queryByRole('alert')).toBeNull();
  });

  test('takes the other window’s, and undo brings one’s own back', async () => {
    answers = [{ status: 409, body: { behind: { ...other, by: null } } }, kept(9)];
    open();
    retype('30');
    await wait(1_300);
    fireEvent.click(screen.getByText('Take the other'));
    expect(field('size.widthMm').value).toBe('61');
    await wait(20_000);
    expect(sent).toHaveLength(1);
    fireEvent.keyDown(document.body, { key: 'z', ctrlKey: true });
    await wait(1_300);
    expect(sent.at(-1)).toMatchObject({ revision: 8, texts: { 'size.widthMm': '30' } });
  });

  test('says what the house says where it cannot be kept', async () => {
    answers = [{ status: 422, body: { title: 'No.', fields: { texts: 'A field holds at most 6,000 characters.' } } }];
    open();
    retype('30');
    await wait(1_300);
    expect(screen.getByText('Not saved: A field holds at most 6,000 characters.')).toBeTruthy();
  });
});
