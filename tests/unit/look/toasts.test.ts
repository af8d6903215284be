import { expect, it } from 'vitest';
import { toastsAfter, type Toast } from '#islands/ui/toasts.ts';

const toast = (id: number): Toast => ({ id, says: `Band ${id} taken out.`, lastsMs: 8000 });
const ids = (toasts: readonly Toast[]) => toasts.map(({ id }) => id);

it('puts the newest last', () => {
  expect(ids(toastsAfter([toast(1)], { kind: 'say', toast: toast(2) }))).toEqual([1, 2]);
});

it('keeps at most three, so that they never cover the work', () => {
  expect(ids([1, 2, 3, 4].reduce<readonly Toast[]>((all, id) => toastsAfter(all, { kind: 'say', toast: toast(id) }), []))).toEqual([2, 3, 4]);
});

it('lets one go and leaves the others', () => {
  expect(ids(toastsAfter([toast(1), toast(2)], { kind: 'gone', id: 1 }))).toEqual([2]);
});
