import { cleanup, fireEvent, render, screen } from '@testing-library/react';
import { afterEach, describe, expect, it } from 'vitest';
import { drawFigure } from '#core/craft/figures/draw-figure.ts';
import { FigurePlayer } from '#islands/cloth/FigurePlayer.tsx';
import { INPUT } from '../../unit/core/craft/figures/figure-input.ts';

afterEach(cleanup);

/** The figure as the browser reads its markup. */
function parsed(svg: string): string {
  const box = document.createElement('div');
  box.innerHTML = svg;
  return box.innerHTML;
}

const drawing = (): string => screen.getByRole('img').outerHTML;

describe('a technique that moves', () => {
  it('begins as the finished drawing', () => {
    render(<FigurePlayer id="a" kind="tabby" input={INPUT} />);
    expect(drawing()).toBe(parsed(drawFigure('tabby', INPUT, 1, { id: 'a' })));
  });

  it('is led by hand to any place', () => {
    render(<FigurePlayer id="a" kind="tabby" input={INPUT} />);
    fireEvent.change(screen.getByRole('slider', { name: 'How far' }), { target: { value: '40' } });
    expect(drawing()).toBe(parsed(drawFigure('tabby', INPUT, 0.4, { id: 'a' })));
  });

  it('plays from the beginning, and stops when asked', async () => {
    render(<FigurePlayer id="a" kind="tabby" input={INPUT} />);
    fireEvent.click(screen.getByRole('button', { name: 'Play it slowly' }));
    expect(screen.getByRole<HTMLInputElement>('slider').valueAsNumber).toBeLessThan(20);
    fireEvent.click(await screen.findByRole('button', { name: 'Stop' }));
    expect(screen.getByRole('button', { name: 'Play it slowly' })).toBeTruthy();
  });

  it('takes the words of the teacher, or its own', () => {
    render(<FigurePlayer id="a" kind="tabby" input={INPUT} caption="Over, under." />);
    expect(screen.getByText('Over, under.')).toBeTruthy();
  });
});
