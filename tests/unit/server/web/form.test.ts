import { describe, expect, test } from 'vitest';
import { z } from 'astro/zod';
import { AppError, fieldError } from '#server/errors.ts';
import { answerForm, formState, typedValues } from '#server/web/form.ts';

const Schema = z.object({ width: z.string({ required_error: 'Width is missing. Type it in cm.' }).min(1, 'Width is missing. Type it in cm.'), password: z.string().optional(), bands: z.array(z.string()).optional() });

function form(entries: readonly (readonly [string, string])[]): FormData {
  const data = new FormData();
  for (const [name, value] of entries) data.append(name, value);
  return data;
}

const answer = (entries: readonly (readonly [string, string])[], work: () => Promise<{ to: string; said?: string }> = async () => ({ to: '/loom' })) => answerForm(Schema, form(entries), work);

describe('a form', () => {
  test('that is in order is done, and leads on', async () => {
    expect(await answer([['width', '40']], async () => ({ to: '/loom', said: 'Saved.' }))).toEqual({ ok: true, to: '/loom', said: 'Saved.' });
  });

  test('that is not in order is not done; it comes back with a sentence at the field and with what was typed', async () => {
    let done = false;
    const result = await answer([['width', ''], ['note', ' as typed ']], async () => { done = true; return { to: '/' }; });
    expect(done).toBe(false);
    expect(result).toEqual({ ok: false, status: 422, summary: '', fields: { width: 'Width is missing. Type it in cm.' }, values: { width: '', note: ' as typed ' } });
  });

  test.each(['password', 'oldPassword', 'token', 'clientSecret', 'code', 'backupCode'])('never sends back what was typed as %s', async (name) => {
    const result = await answer([['width', ''], [name, 'a secret']]);
    expect(JSON.stringify(result)).not.toContain('a secret');
  });

  test('that its work refuses comes back with the sentence of the refusal, its status, and the seconds to wait', async () => {
    const typed = [['width', '40']] as const;
    expect(await answer(typed, async () => { throw fieldError('width', 'Between 2 and 25 mm works.'); })).toMatchObject({ ok: false, status: 422, summary: '', fields: { width: 'Between 2 and 25 mm works.' }, values: { width: '40' } });
    expect(await answer(typed, async () => { throw new AppError('CONFLICT', { says: 'Wren changed this.' }); })).toMatchObject({ ok: false, status: 409, summary: 'Wren changed this.' });
    expect(await answer(typed, async () => { throw new AppError('RATE_LIMITED', { retryAfterSeconds: 8 }); })).toMatchObject({ ok: false, status: 429, retryAfterSeconds: 8 });
  });

  test('that no change would cure is refused as a whole, and a mistake of ours passes through', async () => {
    expect(await answer([['width', '1']], async () => { throw new AppError('NOT_FOUND'); })).toMatchObject({ ok: 'refused', code: 'NOT_FOUND' });
    await expect(answer([['width', '1']], async () => { throw new TypeError('ours'); })).rejects.toThrow('ours');
    await expect(answer([['width', '1']], async () => { throw new AppError('BUG'); })).rejects.toThrow();
  });

  test('gives a list for a name that ends in [] or comes more than once, and leaves files out', () => {
    const data = form([['a', '1'], ['b', '1'], ['b', '2'], ['c[]', '1']]);
    data.append('photo', new File(['x'], 'x.jpg'));
    expect(typedValues(data)).toEqual({ a: '1', b: ['1', '2'], c: ['1'] });
  });
});

describe('drawing a form again', () => {
  const failed = { ok: false, status: 422, summary: '', fields: { width: 'No.', height: 'No.' }, values: { width: '', names: ['a', 'b'], name: 'Maud' } } as const;

  test('shows what was typed, even when it was emptied, and what stood there where nothing was sent', () => {
    const state = formState(failed);
    expect([state.value('width', '40'), state.value('name', 'x'), state.value('not-sent', '7')]).toEqual(['', 'Maud', '7']);
    expect([state.values('names'), state.values('not-sent', ['z'])]).toEqual([['a', 'b'], []]);
    expect(formState(undefined).value('width', '40')).toBe('40');
  });

  test('marks each field that does not work, and the first of them', () => {
    const state = formState(failed);
    expect(state.problems).toEqual([{ field: 'width', says: 'No.' }, { field: 'height', says: 'No.' }]);
    expect([state.error('width'), state.error('name')]).toEqual(['No.', undefined]);
    expect(['width', 'height', 'name'].map((name) => state.isFirst(name))).toEqual([true, false, false]);
    expect(formState({ ok: true, to: '/' }).problems).toEqual([]);
  });
});
