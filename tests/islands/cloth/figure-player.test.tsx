import { cleanup, fireEvent, render, screen } from '@testing-library/react';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { drawFigure } from '#core/craft/figures/draw-figure.ts';
import { stepsOf } from '#core/craft/figures/figure-steps.ts';
import { LiveFigures } from '#islands/cloth/LiveFigures.tsx';
import { INPUT } from '../../unit/core/craft/figures/figure-input.ts';

let still = false;
beforeEach(() => {
  still = false;
  vi.stubGlobal('matchMedia', () => ({ matches: still, addEventListener: () => undefined, removeEventListener: () => undefined }));
});
afterEach(() => {
  cleanup();
  document.body.innerHTML = '';
  vi.unstubAllGlobals();
});

/** A page as the server drew it: the figures whole, each with its caption. */
function page(...kinds: readonly string[]): void {
  document.body.innerHTML = kinds.map((kind) => `<figure data-figure="${kind}"><div data-drawing>${drawFigure('tabby', INPUT)}</div><figcaption>Words.</figcaption></figure>`).join('');
}

/** The figure as the browser reads its markup. */
function parsed(svg: string): string {
  const box = document.createElement('div');
  box.innerHTML = svg;
  return box.innerHTML;
}

const drawing = (): string => document.querySelector('[data-drawing]')?.innerHTML ?? '';
const at = (progress: number): string => parsed(drawFigure('tabby', INPUT, progress, { id: 'live-0' }));
const press = (name: string): void => { fireEvent.click(screen.getByRole('button', { name })); };

describe('a technique that moves', () => {
  it('stands as the server drew it until somebody asks', () => {
    page('tabby');
    render(<LiveFigures input={INPUT} />);
    expect(drawing()).toBe(parsed(drawFigure('tabby', INPUT)));
    expect(screen.getByText('Words.')).toBeTruthy();
  });

  it('gives each figure of the page keys of its own, and none to what it does not know', () => {
    page('tabby', 'tabby', 'no-such-thing');
    render(<LiveFigures input={INPUT} />);
    expect(screen.getAllByRole('group', { name: 'Movement by movement' })).toHaveLength(2);
  });

  it('is led by hand to any place', () => {
    page('tabby');
    render(<LiveFigures input={INPUT} />);
    fireEvent.change(screen.getByRole('slider', { name: 'How far' }), { target: { value: '40' } });
    expect(drawing()).toBe(at(0.4));
  });

  it('plays from the beginning, and pauses when asked', async () => {
    page('tabby');
    render(<LiveFigures input={INPUT} />);
    press('Play it slowly');
    fireEvent.click(await screen.findByRole('button', { name: 'Pause' }));
    expect(screen.getByRole('button', { name: 'Play it slowly' })).toBeTruthy();
    expect(screen.getByRole<HTMLInputElement>('slider').valueAsNumber).toBeLessThan(60);
  });

  it('goes on by steps and back again, and says each in words', () => {
    still = true;
    page('tabby');
    render(<LiveFigures input={INPUT} />);
    const steps = stepsOf('tabby', INPUT);
    press('First movement');
    expect(drawing()).toBe(at(steps[0]?.until ?? 0));
    expect(screen.getByText(`Movement 1 of 5: ${steps[0]?.words ?? ''}`)).toBeTruthy();
    press('Next movement');
    press('Next movement');
    expect(screen.getByText(/^Movement 3 of 5/)).toBeTruthy();
    press('Back');
    expect(drawing()).toBe(at(steps[1]?.until ?? 0));
    expect(screen.getByText(/^Movement 2 of 5/)).toBeTruthy();
  });

  it('takes arrows while one of its keys has the focus, and keeps them from the page', () => {
    still = true;
    page('tabby');
    render(<LiveFigures input={INPUT} />);
    const heard = vi.fn();
    document.addEventListener('keydown', heard);
    fireEvent.keyDown(screen.getByRole('button', { name: 'First movement' }), { key: 'ArrowRight' });
    expect(screen.getByText(/^Movement 1 of 5/)).toBeTruthy();
    fireEvent.keyDown(screen.getByRole('button', { name: 'Next movement' }), { key: 'ArrowRight' });
    fireEvent.keyDown(screen.getByRole('button', { name: 'Next movement' }), { key: 'ArrowLeft' });
    expect(screen.getByText(/^Movement 1 of 5/)).toBeTruthy();
    expect(heard).not.toHaveBeenCalled();
    document.removeEventListener('keydown', heard);
  });

  it('has no keys from movement to movement where there is only one', () => {
    page('slit');
    render(<LiveFigures input={INPUT} />);
    expect(screen.queryByRole('button', { name: 'First movement' })).toBeNull();
    expect(screen.getByRole('button', { name: 'Play it slowly' })).toBeTruthy();
  });

  it('shows each step at once, and does not play, for whoever wants less motion', () => {
    still = true;
    page('tabby');
    render(<LiveFigures input={INPUT} />);
    expect(screen.queryByRole('button', { name: 'Play it slowly' })).toBeNull();
  });
});
