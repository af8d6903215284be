import { readFileSync } from 'node:fs';
import { cleanup, fireEvent, render, screen, within } from '@testing-library/react';
import { afterEach, beforeEach, describe, expect, test } from 'vitest';
import type { FrameLoomPiece } from '#core/craft/piece.ts';
import { PlanWorkings } from '#islands/piece-form/PlanWorkings.tsx';
import { ThreeLooms } from '#islands/piece-form/ThreeLooms.tsx';

const lowTide = JSON.parse(readFileSync('content/series/low-tide/piece.json', 'utf8')) as FrameLoomPiece;
const maud = { id: 'm', name: 'Maud Ellis', mine: { loom: { insideWidthMm: 480, nailPitchMm: 12 } } };

afterEach(cleanup);

describe('three looms side by side', () => {
  beforeEach(() => { render(<ThreeLooms piece={lowTide} name="Low Tide" units="cm" students={[maud]} />); });
  const loom = (place: string): HTMLElement => screen.getByLabelText(`The ${place} loom`, { selector: 'section' });
  const choose = (value: string): void => { fireEvent.change(within(loom('third')).getByLabelText('The third loom', { selector: 'select' }), { target: { value } }); };
  const type = (label: string, text: string): void => { fireEvent.change(within(loom('third')).getByLabelText(new RegExp(label)), { target: { value: text } }); };

  test('begin with two that students often have, and a student’s own', () => {
    expect(within(loom('first')).getByText('It fits')).toBeTruthy();
    expect([...loom('third').querySelectorAll('option')].map(({ text }) => text)).toEqual(['A small loom, 30 cm inside', 'A loom with nails 10 mm apart', 'Maud Ellis’s loom', 'Numbers of your own']);
    expect(loom('third').querySelector<HTMLSelectElement>('select')?.value).toBe('of-m');
  });

  test('say what is needed on each, and draw it', () => {
    const told = loom('first').textContent;
    for (const words of ['Woven', 'Warp ends', 'At the loom', 'All yarn']) expect(told).toContain(words);
    expect(loom('first').querySelector('.cloth svg')).not.toBeNull();
  });

  test('take numbers of one’s own, and say why a loom is too small and what would fit', () => {
    choose('own');
    expect(loom('third').textContent).toContain('Type the inside width');
    type('Inside width', '28');
    type('Nail to nail', '10');
    expect(loom('third').textContent).toContain('It does not fit');
    expect(loom('third').textContent).toMatch(/What would: .*woven narrower/);
    type('Inside width', '60');
    expect(within(loom('third')).getByText('It fits')).toBeTruthy();
  });

  test.each(['wide', '-4', '0', '1e9', 'NaN', '12 1/'])('“%s” is told at its field and reckoned with nowhere', (text) => {
    choose('own');
    type('Nail to nail', '10');
    type('Inside width', text);
    expect(loom('third').querySelector('[aria-invalid="true"]')).not.toBeNull();
    expect(loom('third').textContent.replace(text, '')).not.toMatch(/NaN|Infinity/);
  });
});

test('every number of the plan can be followed to what went in', () => {
  render(<PlanWorkings piece={lowTide} units="cm" />);
  expect(document.querySelectorAll('.workings > li').length).toBeGreaterThan(60);
  expect(document.body.textContent).not.toMatch(/NaN|undefined/);
  const [link] = document.querySelectorAll<HTMLAnchorElement>('.one-working a[href^="#how-pattern-"]');
  expect(link && document.querySelector(link.getAttribute('href') ?? '')).not.toBeNull();
});
