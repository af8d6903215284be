// @vitest-environment jsdom
import { cleanup, render, screen, waitFor } from '@testing-library/react';
import { afterEach, beforeEach, expect, test, vi } from 'vitest';
import { LiveLesson } from '#islands/lesson/LiveLesson.tsx';

const row = (id: string, ticked: boolean): string => `
  <li id="step-${id}" class="step${ticked ? ' done' : ''}"><form class="step-form" method="post">
    <input type="hidden" name="item" value="${id}"><button class="step-box" name="ticked" value="${ticked ? 'no' : 'yes'}" aria-pressed="${String(ticked)}" aria-label="Done: ${id}"></button>
  </form></li>`;
let person = 0;
beforeEach(() => {
  person += 1;
  document.documentElement.dataset['person'] = `p${String(person)}`;
  document.body.innerHTML = `<ol>${row('tie-on', true)}${row('wind', false)}${row('pluck', false)}</ol>`;
});
afterEach(() => { cleanup(); vi.unstubAllGlobals(); document.body.innerHTML = ''; });

const draw = () => render(<LiveLesson asOf={4} series="low-tide" lesson="l" />);
const here = (): (string | undefined)[] => [...document.querySelectorAll('.step.here')].map(({ id }) => id);

test('a step answers at once, the fell moves on, and the server hears of it', async () => {
  const fetched = vi.fn(() => Promise.resolve(Response.json({ revision: 5, ticks: [] })));
  vi.stubGlobal('fetch', fetched);
  draw();
  expect(here()).toEqual(['step-wind']);
  screen.getByRole('button', { name: 'Done: wind' }).click();
  expect(screen.getByRole('button', { name: 'Done: wind', pressed: true })).toBeDefined();
  expect(here()).toEqual(['step-pluck']);
  await waitFor(() => { expect(fetched).toHaveBeenCalledTimes(1); });
  const [, sent] = fetched.mock.calls[0] as unknown as [string, { body: string }];
  expect(JSON.parse(sent.body)).toMatchObject({ subject: 'step', series: 'low-tide', lesson: 'l', item: 'wind', ticked: true, seen: 4 });
});

test('a step ticked without signal is kept here and said', async () => {
  vi.stubGlobal('fetch', vi.fn(() => Promise.reject(new TypeError('no signal'))));
  draw();
  screen.getByRole('button', { name: 'Done: wind' }).click();
  await screen.findByText('Kept on this device. It goes out when there is signal.');
});

test('a tick the server will not have is taken back, and she is told', async () => {
  vi.stubGlobal('fetch', vi.fn(() => Promise.resolve(new Response('{}', { status: 404 }))));
  draw();
  screen.getByRole('button', { name: 'Done: wind' }).click();
  await screen.findByText(/was not ticked/);
  expect(screen.getByRole('button', { name: 'Done: wind', pressed: false })).toBeDefined();
});
