import { cleanup, render, screen, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { hydrateRoot } from 'react-dom/client';
import { renderToString } from 'react-dom/server';
import { afterEach, beforeAll, describe, expect, it, vi } from 'vitest';
import type { FrameLoomPiece } from '#core/craft/piece.ts';
import type { TypedLoom } from '#core/trial/typed-loom.ts';
import { madeAsPattern } from '#islands/series/trial.ts';
import { ToGather } from '#islands/series/ToGather.tsx';
import { TryOnLoom } from '#islands/series/TryOnLoom.tsx';
import { lowTide } from '../../support/low-tide.ts';

let pattern: FrameLoomPiece;
beforeAll(async () => { pattern = await lowTide(); });
afterEach(() => {
  cleanup();
  history.replaceState(null, '', '/');
});

const MAUDS: TypedLoom = { inside: '36', spacing: '8', ends: 2, units: 'cm', narrower: false };

function Trial({ typed = null, hasSeat = false }: { readonly typed?: TypedLoom | null; readonly hasSeat?: boolean }) {
  return (
    <>
      <form id="take-seat" aria-label="Take a seat" />
      <TryOnLoom slug="low-tide" name="Low Tide" teacher="Ilse" pattern={pattern} typed={typed} units="cm" seatForm="take-seat" hasSeat={hasSeat} />
    </>
  );
}

const plain = (text: string | null | undefined): string => (text ?? '').replace(/[\s\u2009]+/g, ' ').trim();
const answer = (): string => plain(screen.getByRole('status').textContent);
const figure = (label: string): string => plain(screen.getByText(label, { selector: 'dt' }).nextElementSibling?.textContent);
const carried = (): Record<string, unknown> => Object.fromEntries(new FormData(screen.getByRole<HTMLFormElement>('form', { name: 'Take a seat' })));

async function type(label: string, text: string): Promise<void> {
  const field = screen.getByLabelText(label);
  await userEvent.clear(field);
  await userEvent.type(field, text);
}

describe('a loom that is tried', () => {
  it('is at first the teacher’s own, and nothing of it goes along with a seat', () => {
    render(<Trial />);
    expect(screen.getByLabelText<HTMLInputElement>('Inside width').value).toBe('50');
    expect(answer()).toContain('This is Ilse’s own loom.');
    expect(figure('Ends')).toBe('82');
    expect(carried()).toEqual({});
  });

  it('that is too narrow is told what the piece needs and how wide it would be, and shows it so', async () => {
    render(<Trial />);
    await type('Inside width', '36');
    await type('Nail spacing', '8');
    await userEvent.click(screen.getByLabelText('Doubled'));
    expect(answer()).toBe('It does not fit yetYour loom is 36 cm inside. Low Tide needs 45.6 cm. With nails at 8 mm it would be 31 cm wide. See it so.');
    await userEvent.click(screen.getByRole('link', { name: 'See it so' }));
    expect(answer()).toBe('It fits your loom');
    expect(figure('Ends')).toBe('80 in pairspattern 82');
    expect(figure('Warp')).toMatch(/^\d+ mpattern 58 m$/);
    await userEvent.click(screen.getByRole('link', { name: 'As wide as the pattern' }));
    expect(answer()).toContain('It does not fit yet');
  });

  it('goes along with the seat and stays in the address', async () => {
    render(<Trial typed={MAUDS} />);
    await userEvent.click(screen.getByRole('link', { name: 'See it so' }));
    expect(carried()).toEqual({ inside: '36', spacing: '8', ends: '2', units: 'cm', wide: 'most' });
    expect(location.pathname + location.search).toBe('/series/low-tide?inside=36&spacing=8&ends=2&units=cm&wide=most');
  });

  it.each([
    ['Inside width', 'wide', 'Write one length, like 12.5 or 4 7/8.'],
    ['Inside width', '3 mm', 'Too narrow for a frame. Between 5 and 300 cm works.'],
    ['Inside width', '30 m', 'Too wide for a frame. Between 5 and 300 cm works.'],
    ['Nail spacing', '0,2', 'Too close for nails. Between 2 and 25 mm works.'],
  ])('%s "%s" is answered at the field, and what was typed stays', async (label, text, says) => {
    render(<Trial />);
    await type(label, text);
    const field = screen.getByLabelText<HTMLInputElement>(label);
    expect([field.value, field.getAttribute('aria-invalid')]).toEqual([text, 'true']);
    expect(document.getElementById(field.getAttribute('aria-describedby') ?? '')?.textContent).toBe(says);
  });

  it.each(['12,5', '60.5', '23 7/8 in'])('understands "%s"', async (text) => {
    render(<Trial />);
    await type('Inside width', text);
    expect(screen.getByLabelText('Inside width').getAttribute('aria-invalid')).toBeNull();
    expect(answer()).toMatch(/^It (fits your loom|does not fit yet)/);
  });

  it('turns into inches without changing, and back', async () => {
    render(<Trial typed={{ ...MAUDS, inside: '50', spacing: '10', ends: 1 }} />);
    await userEvent.click(screen.getByLabelText('in'));
    expect([screen.getByLabelText<HTMLInputElement>('Inside width').value, screen.getByLabelText<HTMLInputElement>('Nail spacing').value]).toEqual(['19 11/16', '3/8']);
    expect(figure('Warp')).toMatch(/yd/);
    await userEvent.click(screen.getByLabelText('cm'));
    expect(screen.getByLabelText<HTMLInputElement>('Inside width').value).toBe('50');
  });

  it('that fits can be put into her own piece by who has a seat', () => {
    render(<Trial typed={{ ...MAUDS, narrower: true }} hasSeat />);
    expect(screen.getByRole('link', { name: 'Use this loom for your piece' }).getAttribute('href')).toBe('/series/low-tide/piece?inside=36&spacing=8&ends=2&units=cm&wide=most');
    cleanup();
    render(<Trial typed={{ ...MAUDS, narrower: true }} />);
    expect(screen.queryByRole('link', { name: 'Use this loom for your piece' })).toBeNull();
  });

  it('has every number when asked', async () => {
    render(<Trial typed={{ ...MAUDS, narrower: true }} />);
    await userEvent.click(screen.getByText('See every number'));
    const numbers = within(screen.getByText('See every number').closest('details') ?? document.body);
    expect(plain(numbers.getByText('Length of the dowel').nextElementSibling?.textContent)).toMatch(/cm$/);
  });
});

describe('without script', () => {
  it('it is a form that asks the page again, with the loom of the address in it', () => {
    document.body.innerHTML = renderToString(<Trial typed={MAUDS} />);
    const form = screen.getByRole<HTMLFormElement>('form', { name: 'Your loom' });
    expect([form.method, form.getAttribute('action')]).toEqual(['get', '/series/low-tide#try']);
    expect(Object.fromEntries(new FormData(form))).toEqual({ inside: '36', spacing: '8', ends: '2', units: 'cm', shown: 'cm' });
    expect(screen.getByRole('button', { name: 'Reckon for this loom' })).toBeTruthy();
    expect(screen.getByRole('link', { name: 'See it so' }).getAttribute('href')).toBe('/series/low-tide?inside=36&spacing=8&ends=2&units=cm&wide=most#try');
    expect(carried()).toEqual({ inside: '36', spacing: '8', ends: '2', units: 'cm' });
    document.body.innerHTML = '';
  });

  it('what the server drew is what the browser draws', async () => {
    const place = document.createElement('div');
    document.body.append(place);
    place.innerHTML = renderToString(<Trial typed={MAUDS} />);
    const onRecoverableError = vi.fn();
    const root = hydrateRoot(place, <Trial typed={MAUDS} />, { onRecoverableError });
    await vi.waitFor(() => { expect(screen.queryByRole('button', { name: 'Reckon for this loom' })).toBeNull(); });
    expect(onRecoverableError).not.toHaveBeenCalled();
    root.unmount();
    place.remove();
  });

  it('what was typed before the script came is taken up', async () => {
    const place = document.createElement('div');
    document.body.append(place);
    place.innerHTML = renderToString(<Trial />);
    screen.getByLabelText<HTMLInputElement>('Inside width').value = '30';
    const root = hydrateRoot(place, <Trial />);
    await vi.waitFor(() => { expect(answer()).toContain('Your loom is 30 cm inside.'); });
    root.unmount();
    place.remove();
  });
});

describe('what to gather', () => {
  const lines = [
    { publicIds: ['a'], parts: [1], kind: 'tool', name: 'Shed stick', amountKey: 'wound-width', amountText: null, standIn: 'A ruler', untilPart: null, note: null, lookOut: null, getFrom: null, ticked: false },
    { publicIds: ['b'], parts: [1], kind: 'material', name: 'Corks', amountKey: null, amountText: '4', standIn: null, untilPart: null, note: null, lookOut: null, getFrom: null, ticked: false },
  ] as const;

  it('is for the pattern until a loom is tried, then for that loom', async () => {
    const made = madeAsPattern(pattern);
    if (made === null) throw new Error('the demo piece cannot be reckoned');
    render(<><ToGather made={made} units="cm" own={false} lines={lines} /><Trial typed={MAUDS} /></>);
    expect(plain(screen.getByText(/^For the pattern’s/).textContent)).toBe('For the pattern’s piece, 40 cm wide and 44 cm high, without its fringe, with a margin.');
    expect(plain(screen.getByRole('row', { name: /Slack Water/ }).textContent)).toBe('Fenwool 6/2 Slack Water119 m40 g');
    expect(plain(screen.getByText('Shed stick', { selector: 'span' }).closest('li')?.textContent)).toBe('Shed stick41 cm');
    await userEvent.click(screen.getByRole('link', { name: 'See it so' }));
    expect(plain(screen.getByText(/^For your/).textContent)).toBe('For your own piece, 31 cm wide and 44 cm high, without its fringe, with a margin.');
    expect(plain(screen.getByRole('row', { name: /Slack Water/ }).textContent)).not.toContain('119 m');
    expect(plain(screen.getByText('Corks', { selector: 'span' }).closest('li')?.textContent)).toBe('Corks4');
  });
});
