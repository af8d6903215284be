import { fireEvent, render, screen } from '@testing-library/react';
import { afterEach, beforeEach, describe, expect, test, vi } from 'vitest';
import { DragParts } from '#islands/workroom/DragParts.tsx';
import { placeAt } from '#islands/workroom/drag-place.ts';

const rows = [0, 60, 120, 180].map((top) => ({ top, height: 60 }));

describe('where a row is let go', () => {
  test.each([[1, 10, 1], [1, 89, 1], [1, 91, 2], [1, 500, 4], [3, 150, 3], [3, 89, 2], [3, 10, 1], [3, -50, 1], [4, 149, 3], [2, 300, 4]])('part %i at %i px becomes Part %i', (from, y, to) => {
    expect(placeAt(rows, from, y)).toBe(to);
  });
});

describe('moving by keys', () => {
  let sent: { lesson: string; to: string }[];
  beforeEach(() => {
    sent = [];
    vi.spyOn(HTMLFormElement.prototype, 'submit').mockImplementation(function submit(this: HTMLFormElement) {
      const form = new FormData(this);
      sent.push({ lesson: String(form.get('lesson')), to: String(form.get('to')) });
    });
    document.body.innerHTML = '<ol id="list"><li data-part="a" data-number="1" data-title="Gather"><a href="#x">Gather</a></li><li data-part="b" data-number="2" data-title="Dress"><a href="#y">Dress</a></li></ol>';
    render(<DragParts listId="list" action="?_action=move" />, { container: document.body.appendChild(document.createElement('div')) });
  });
  afterEach(() => { document.body.innerHTML = ''; });

  test('Alt with an arrow in a row sends its new number', () => {
    fireEvent.keyDown(screen.getByText('Dress'), { key: 'ArrowUp', altKey: true });
    expect(sent).toEqual([{ lesson: 'b', to: '1' }]);
  });

  test('without Alt nothing moves', () => {
    fireEvent.keyDown(screen.getByText('Dress'), { key: 'ArrowUp' });
    expect(sent).toEqual([]);
  });

  test('at an end it is said that there is no further', () => {
    fireEvent.keyDown(screen.getByText('Dress'), { key: 'ArrowDown', altKey: true });
    expect(sent).toEqual([]);
    expect(screen.getByRole('status').textContent).toBe('Dress is last already.');
  });
});
