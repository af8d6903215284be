// @vitest-environment jsdom
import { act, cleanup, render, screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { renderToString } from 'react-dom/server';
import { afterEach, beforeEach, describe, expect, test } from 'vitest';
import { PinSteps } from '#islands/photo/PinSteps.tsx';

const NOTES = ['Ends 14 and 15 change places.', 'This end is slack.', 'The nail was missed.'];

beforeEach(() => {
  // As the page draws them: links in the photo, each to its note.
  document.body.innerHTML = `<div id="photo-1"><svg>${NOTES.map((_words, index) => `<a href="#photo-1-note-${index + 1}" tabindex="0">${index + 1}</a>`).join('')}</svg></div><div id="steps"></div>`;
  render(<PinSteps photo="photo-1" notes={NOTES} />, { container: document.querySelector<HTMLElement>('#steps') ?? document.body });
});
afterEach(() => { cleanup(); document.body.innerHTML = ''; });

const pin = (number: number): Element | null => document.querySelector(`a[href="#photo-1-note-${number}"]`);
const focusOn = (number: number): void => { act(() => document.querySelector<SVGAElement>(`a[href="#photo-1-note-${number}"]`)?.focus()); };
const said = (): string | null => screen.getByRole('status').textContent;
const current = (): (string | null)[] => [...document.querySelectorAll('[aria-current]')].map(({ textContent }) => textContent);
const press = (keys: string): Promise<unknown> => userEvent.keyboard(keys);

describe('the notes on a photo', () => {
  test('are counted before one is chosen', () => {
    expect(said()).toContain('3 notes');
    expect(current()).toEqual([]);
  });

  test('are gone through by the buttons, each said and its pin marked, not beyond the last', async () => {
    for (const [number, words] of NOTES.entries()) {
      await userEvent.click(screen.getByRole('button', { name: 'Next note' }));
      expect(said()).toBe(`Note ${number + 1} of 3: ${words}`);
      expect([document.activeElement, current()]).toEqual([pin(number + 1), [String(number + 1)]]);
    }
    await userEvent.click(screen.getByRole('button', { name: 'This is the last note' }));
    expect(said()).toContain('Note 3 of 3');
  });

  test('are gone through by arrow keys on a pin, and by Home and End', async () => {
    focusOn(2);
    expect(said()).toContain('Note 2 of 3');
    await press('{ArrowRight}');
    expect(document.activeElement).toBe(pin(3));
    await press('{ArrowDown}');
    expect(document.activeElement).toBe(pin(3));
    await press('{Home}');
    expect([document.activeElement, said()]).toEqual([pin(1), `Note 1 of 3: ${NOTES[0] ?? ''}`]);
    await press('{ArrowLeft}');
    expect(document.activeElement).toBe(pin(1));
    await press('{End}');
    expect([document.activeElement, current()]).toEqual([pin(3), ['3']]);
  });

  test('are left alone by other keys, and by arrows held with another key', async () => {
    focusOn(1);
    await press('x{Control>}{ArrowRight}{/Control}{Alt>}{ArrowRight}{/Alt}');
    expect(document.activeElement).toBe(pin(1));
  });

  test('stand as links alone where no script runs', () => {
    expect(renderToString(<PinSteps photo="photo-1" notes={NOTES} />)).toBe('');
  });
});
