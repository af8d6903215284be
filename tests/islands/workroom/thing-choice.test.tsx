// @vitest-environment jsdom
import { cleanup, render, screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { renderToString } from 'react-dom/server';
import { afterEach, expect, test } from 'vitest';
import type { ThingKept } from '#contracts/workroom.ts';
import { ThingChoice } from '#islands/workroom/ThingChoice.tsx';

const things: ThingKept[] = [
  { publicId: 'a', kind: 'yarn', name: 'Fenwool 6/2', lookOut: 'Two plies', getFrom: null, standIn: 'Any wool of 300 tex' },
  { publicId: 'b', kind: 'tool', name: 'Shed stick', lookOut: null, getFrom: 'A hardware shop', standIn: null },
];

function drawBesideForm() {
  return render(
    <>
      <ThingChoice things={things} formId="add" chosen={null} />
      <form id="add">
        <input type="radio" name="kind" value="tool" defaultChecked /><input type="radio" name="kind" value="yarn" />
        {['name', 'standIn', 'getFrom', 'lookOut', 'amountText'].map((name) => <input key={name} name={name} defaultValue="old" />)}
      </form>
    </>,
  );
}
const typed = () => Object.fromEntries(new FormData(document.querySelector<HTMLFormElement>('#add') ?? undefined));

afterEach(cleanup);

test('by keyboard a thing fills the form with its words, leaves the amount, and says so', async () => {
  drawBesideForm();
  await userEvent.tab();
  await userEvent.keyboard('fen{Enter}');
  expect(typed()).toEqual({ kind: 'yarn', name: 'Fenwool 6/2', standIn: 'Any wool of 300 tex', getFrom: '', lookOut: 'Two plies', amountText: 'old' });
  expect(screen.getByRole('status').textContent).toContain('“Fenwool 6/2” is filled in below');
});

test('the form is known to be changed, so that leaving it is asked about', async () => {
  drawBesideForm();
  let heard = 0;
  document.querySelector('#add')?.addEventListener('input', () => { heard += 1; });
  await userEvent.type(screen.getByRole('combobox'), 'shed{Enter}');
  expect(heard).toBe(1);
});

test('without script it is a plain choice that comes back with the page', () => {
  const drawn = new DOMParser().parseFromString(renderToString(<ThingChoice things={things} formId="add" chosen="b" />), 'text/html');
  expect(drawn.querySelector('form')?.getAttribute('method')).toBe('get');
  expect(drawn.querySelector<HTMLSelectElement>('select[name="thing"]')?.value).toBe('b');
});
