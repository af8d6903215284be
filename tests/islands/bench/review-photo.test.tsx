// @vitest-environment jsdom
import { cleanup, fireEvent, render, screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { renderToString } from 'react-dom/server';
import { afterEach, beforeEach, describe, expect, test, vi } from 'vitest';
import { ReviewPhoto, type ReviewPhotoProps } from '#islands/bench/ReviewPhoto.tsx';

/** jsdom knows no pointers. */
class Pointer extends MouseEvent {
  readonly pointerId: number;
  readonly pointerType: string;
  constructor(type: string, given: PointerEventInit = {}) {
    super(type, given);
    this.pointerId = given.pointerId ?? 1;
    this.pointerType = given.pointerType ?? 'mouse';
  }
}

let sent: Record<string, string>[] = [];
beforeEach(() => {
  sent = [];
  vi.stubGlobal('PointerEvent', Pointer);
  Element.prototype.setPointerCapture = () => undefined;
  HTMLDialogElement.prototype.showModal = function show(this: HTMLDialogElement) { this.open = true; };
  HTMLDialogElement.prototype.close = function close(this: HTMLDialogElement) { this.open = false; };
  vi.spyOn(Element.prototype, 'getBoundingClientRect').mockReturnValue({ left: 0, top: 0, width: 600, height: 400, right: 600, bottom: 400, x: 0, y: 0, toJSON: () => '' });
  document.addEventListener('submit', keep);
});
afterEach(() => { document.removeEventListener('submit', keep); cleanup(); localStorage.clear(); vi.restoreAllMocks(); vi.unstubAllGlobals(); });

function keep(event: SubmitEvent): void {
  if (event.defaultPrevented || !(event.target instanceof HTMLFormElement)) return;
  event.preventDefault();
  sent.push(Object.fromEntries([...new FormData(event.target, event.submitter)].map(([name, value]) => [name, String(value)])));
}

const EARLIER = [{ src: '/e.webp', width: 3, height: 2, alt: 'Earlier photo', says: 'Part 1, Sunday 19:12: mend first' }];

function bench(given: Partial<ReviewPhotoProps> = {}) {
  return render(<main><ReviewPhoto
    action="?_action=bench.giveVerdict" publicId="one" shots={[{ src: '/p.webp', width: 600, height: 400, alt: 'Photo by Maud' }]} earlier={EARLIER} studentName="Maud"
    sees={[{ value: 'fault:slack-end', label: 'Handbook: An end is slack' }]} phrases={['Tension is even', 'Card sits too high']} typed={{ words: '', notes: [], see: '' }} errors={{}} next="two" before={null} after={null} {...given}
  /></main>);
}
const words = () => screen.getByRole<HTMLTextAreaElement>('textbox', { name: /^To Maud/ });
const pins = () => screen.queryAllByRole('button', { name: /^Note \d: move/ });
const press = (keys: string) => userEvent.keyboard(keys);

describe('where it says how to mend it', () => {
  const many = Array.from({ length: 20 }, (_, index) => ({ value: `fault:f${index}`, label: index === 7 ? 'Handbook: A slit gapes' : `Handbook: Fault ${index}` }));

  test('stands chosen from the start, and is found by typing where there are many', async () => {
    bench({ sees: many, typed: { words: '', notes: [], see: 'fault:f3' } });
    const combo = screen.getByRole<HTMLInputElement>('combobox', { name: /^Where it says/ });
    expect(combo.value).toBe('Handbook: Fault 3');
    await userEvent.click(combo);
    await press('slit{Enter}');
    await userEvent.click(screen.getByRole('button', { name: /^Mend first/ }));
    expect(sent[0]).toMatchObject({ see: 'fault:f7', verdict: 'mend-first' });
  });

  test('is a list where no script runs, however many there are', () => {
    const drawn = renderToString(<ReviewPhoto action="" publicId="one" shots={[{ src: '/p.webp', width: 600, height: 400, alt: 'Photo by Maud' }]} earlier={[]} studentName="Maud" sees={many} phrases={[]} typed={{ words: '', notes: [], see: 'fault:f3' }} errors={{}} next={null} before={null} after={null} />);
    expect(drawn).toContain('<option value="fault:f3" selected="">');
    expect(drawn).not.toContain('combobox');
  });
});

describe('by keys alone', () => {
  test('W says weave on of this photo, with the phrases put in, and names the one that comes next', async () => {
    bench();
    await press('12w');
    expect(sent).toEqual([{ photo: 'one', next: 'two', notes: '[]', words: 'Tension is even. Card sits too high', see: '', verdict: 'weave-on' }]);
  });

  test('N takes the next of several photos shown together, and pins belong to the one they were put in', async () => {
    bench({ shots: [{ src: '/p.webp', width: 600, height: 400, alt: 'Photo 1' }, { src: '/q.webp', width: 400, height: 600, alt: 'Photo 2' }] });
    await press('n');
    expect(screen.getByRole('img', { name: 'Photo 2' })).toBeDefined();
    await press('p{Enter}Slack here');
    expect(screen.getByRole('button', { name: 'Photo 2, one pin', pressed: true })).toBeDefined();
    expect(screen.getByRole('textbox', { name: 'Note 1, on photo 2' })).toBeDefined();
    await userEvent.click(screen.getByRole('button', { name: 'Photo 1' }));
    expect(pins()).toHaveLength(0);
    await press('{Escape}m');
    expect(JSON.parse(sent[0]?.['notes'] ?? '')).toMatchObject([{ words: 'Slack here', shot: 2 }]);
  });

  test('a second press sends nothing more', async () => {
    bench();
    await press('wwm');
    expect(sent).toHaveLength(1);
  });

  test('P puts a pin that arrows move, Enter goes to its words, Escape back, M says mend first', async () => {
    bench();
    await press('p{ArrowRight}{ArrowRight}{Shift>}{ArrowDown}{/Shift}{Enter}');
    await press('Lift end 15{Escape}m');
    expect(sent[0]).toMatchObject({ verdict: 'mend-first', notes: JSON.stringify([{ words: 'Lift end 15', xPermille: 510, yPermille: 550 }]) });
  });

  test('a pin without words is not sent: its words are asked for', async () => {
    bench();
    await press('pm');
    expect(sent).toEqual([]);
  });

  test('with a pin in hand a phrase goes into its note', async () => {
    bench();
    await press('p2{Enter}');
    expect(screen.getByRole<HTMLTextAreaElement>('textbox', { name: 'Note 1' }).value).toBe('Card sits too high');
    expect(words().value).toBe('');
  });

  test('letters typed into a field are words', async () => {
    bench();
    await press('t');
    await press('warp 1 m');
    expect([words().value, sent.length]).toEqual(['warp 1 m', 0]);
  });

  test('C lays an earlier photo beside it and puts it away again', async () => {
    bench();
    await press('c');
    expect(screen.getByText('Part 1, Sunday 19:12: mend first')).toBeDefined();
    await press('c');
    expect(screen.queryByText('Part 1, Sunday 19:12: mend first')).toBeNull();
  });

  test('both photos are shown from as close and turned alike', async () => {
    bench();
    await press('c+r');
    const views = [...document.querySelectorAll<HTMLElement>('.photo-frame')].map(({ style }) => [style.getPropertyValue('--turn'), style.getPropertyValue('--scale')]);
    expect(views).toEqual([['90deg', String(2 / 3)], ['90deg', String(2 / 3)]]);
  });

  test('? lists every key, and there they can be turned off', async () => {
    bench();
    await press('?');
    expect(screen.getByRole('dialog', { name: 'Keys of the bench' }).textContent).toContain('Put in a phrase');
    await userEvent.click(screen.getByRole('checkbox', { name: 'Keys pressed alone work in this browser' }));
    await userEvent.click(screen.getByRole('button', { name: 'Close' }));
    await press('w');
    expect(sent).toEqual([]);
  });

  test('Z takes back the newest verdict', async () => {
    bench();
    const form = document.createElement('form');
    form.dataset['takeBack'] = '';
    document.body.append(form);
    form.innerHTML = '<input name="photo" value="before">';
    await press('z');
    expect(sent).toEqual([{ photo: 'before' }]);
    form.remove();
  });
});

describe('by mouse and finger', () => {
  const at = (clientX: number, clientY: number, pointerType = 'mouse') => ({ clientX, clientY, pointerType, pointerId: 1, button: 0, isPrimary: true });
  const frame = () => document.querySelector('.photo-frame') ?? document.body;

  test('a press puts a pin where it was', () => {
    bench();
    fireEvent.pointerDown(frame(), at(150, 100));
    fireEvent.pointerUp(frame(), at(152, 101));
    expect(document.querySelector('.pins > svg')?.getAttribute('x')).toMatch(/^25(\.3)?%$/);
    expect(document.activeElement?.id).toBe('note-1');
  });

  test('a drag puts none', () => {
    bench();
    fireEvent.pointerDown(frame(), at(150, 100));
    fireEvent.pointerMove(frame(), at(250, 100));
    fireEvent.pointerUp(frame(), at(250, 100));
    expect(pins()).toEqual([]);
  });

  test('a pin is dragged by a finger', () => {
    bench({ typed: { words: '', notes: [{ words: 'Slack', xPermille: 100, yPermille: 100 }], see: '' } });
    const pin = pins()[0] ?? document.body;
    fireEvent.pointerDown(pin, at(60, 40, 'touch'));
    fireEvent.pointerMove(pin, at(300, 200, 'touch'));
    fireEvent.pointerUp(pin, at(300, 200, 'touch'));
    const [place] = document.querySelectorAll('.pins > svg');
    expect([place?.getAttribute('x'), place?.getAttribute('y')]).toEqual(['50%', '50%']);
    expect(pins()).toHaveLength(1);
  });

  test('two fingers go closer', () => {
    bench();
    fireEvent.pointerDown(frame(), at(200, 200, 'touch'));
    fireEvent.pointerDown(frame(), { ...at(400, 200, 'touch'), pointerId: 2 });
    fireEvent.pointerMove(frame(), { ...at(600, 200, 'touch'), pointerId: 2 });
    expect(document.querySelector<HTMLElement>('.photo-frame')?.style.getPropertyValue('--scale')).toBe('2');
    fireEvent.pointerUp(frame(), at(200, 200, 'touch'));
    fireEvent.pointerUp(frame(), { ...at(600, 200, 'touch'), pointerId: 2 });
    expect(pins()).toEqual([]);
  });

  test('a phrase is pressed', async () => {
    bench();
    await userEvent.click(screen.getByRole('button', { name: /Card sits too high/ }));
    expect(words().value).toBe('Card sits too high');
  });
});

test('words typed before the script woke stay', () => {
  const view = bench({ typed: { words: 'From the server', notes: [], see: '' } });
  expect(view.container.querySelector('textarea')?.value).toBe('From the server');
});
