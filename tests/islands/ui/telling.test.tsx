import { act, cleanup, fireEvent, render, screen } from '@testing-library/react';
import { useState } from 'react';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { Button } from '#islands/ui/Button.tsx';
import { Dialog } from '#islands/ui/Dialog.tsx';
import { Figures } from '#islands/ui/Figures.tsx';
import { Findings } from '#islands/ui/Findings.tsx';
import { Flag } from '#islands/ui/Flag.tsx';
import { Notice } from '#islands/ui/Notice.tsx';
import { Throw } from '#islands/ui/Throw.tsx';
import { ToastRegion, useToasts } from '#islands/ui/ToastRegion.tsx';

afterEach(cleanup);

function Bench({ onSent, onTakenBack }: { onSent: () => void; onTakenBack: () => void }) {
  const toasts = useToasts();
  return (
    <>
      <button type="button" onClick={() => toasts.say('Weave on.', { act: { label: 'Take back', run: onTakenBack }, after: onSent, lastsMs: 10_000 })}>Weave on</button>
      <ToastRegion toasts={toasts} />
    </>
  );
}

describe('a toast', () => {
  beforeEach(() => { vi.useFakeTimers(); });
  afterEach(() => { vi.useRealTimers(); });

  const give = () => {
    const sent = vi.fn();
    const takenBack = vi.fn();
    render(<Bench onSent={sent} onTakenBack={takenBack} />);
    fireEvent.click(screen.getByRole('button', { name: 'Weave on' }));
    return { sent, takenBack };
  };
  const pass = (ms: number) => act(() => { vi.advanceTimersByTime(ms); });

  it('is read out by the region that was there before it', () => {
    give();
    expect(screen.getByRole('status').textContent).toContain('Weave on.');
  });

  it('leaves when its time is over, and only then is sent what was held back', () => {
    const { sent } = give();
    pass(9_000);
    expect(sent).not.toHaveBeenCalled();
    pass(1_000);
    expect(sent).toHaveBeenCalledOnce();
    expect(screen.queryByText('Weave on.')).toBeNull();
  });

  it('takes back what was done, and sends nothing afterwards', () => {
    const { sent, takenBack } = give();
    fireEvent.click(screen.getByRole('button', { name: 'Take back' }));
    pass(60_000);
    expect(takenBack).toHaveBeenCalledOnce();
    expect(sent).not.toHaveBeenCalled();
  });

  it('stays under the mouse and under the focus', () => {
    const { sent } = give();
    const act1 = screen.getByRole('button', { name: 'Take back' });
    fireEvent.focus(act1);
    pass(60_000);
    expect(sent).not.toHaveBeenCalled();
    fireEvent.blur(act1);
    pass(10_000);
    expect(sent).toHaveBeenCalledOnce();
  });
});

function Refund({ onGiven }: { onGiven: () => void }) {
  const [open, setOpen] = useState(false);
  return (
    <>
      <Button onClick={() => setOpen(true)}>Give money back…</Button>
      <Dialog open={open} title="Give €68.00 back to Maud?" onClose={() => setOpen(false)} acts={<><Button onClick={() => setOpen(false)}>Keep the seat</Button><Button kind="mend" onClick={onGiven}>Give money back</Button></>}>
        <p>Her seat closes at once.</p>
      </Dialog>
    </>
  );
}

describe('a dialog', () => {
  // The surroundings of these tests have no top layer; opening and closing is all they need to know of it.
  beforeEach(() => {
    HTMLDialogElement.prototype.showModal = function showModal() { this.setAttribute('open', ''); };
    HTMLDialogElement.prototype.close = function close() { this.removeAttribute('open'); };
  });

  it('asks its question with the focus on the safe act', () => {
    render(<Refund onGiven={() => undefined} />);
    fireEvent.click(screen.getByRole('button', { name: 'Give money back…' }));
    expect(screen.getByRole('dialog', { name: 'Give €68.00 back to Maud?' })).toBeDefined();
    expect(document.activeElement?.textContent).toBe('Keep the seat');
  });

  it('is put away by Esc without doing anything', () => {
    const given = vi.fn();
    render(<Refund onGiven={given} />);
    fireEvent.click(screen.getByRole('button', { name: 'Give money back…' }));
    fireEvent(screen.getByRole('dialog'), new Event('cancel', { cancelable: true }));
    expect(screen.queryByRole('dialog')).toBeNull();
    expect(given).not.toHaveBeenCalled();
  });
});

describe('what is told', () => {
  it('says a state in a word, and its glyph to nobody', () => {
    render(<Flag kind="mend">Mend first</Flag>);
    expect(screen.getByText('Mend first')).toBeDefined();
    expect(screen.queryByRole('img')).toBeNull();
  });

  it('interrupts only when it is urgent', () => {
    render(<><Notice title="The card was not charged" kind="mend" urgent /><Notice title="The Estuary dye lot changed" /></>);
    expect(screen.getAllByRole('alert')).toHaveLength(1);
  });

  it('tells a screen reader how far an upload has come', () => {
    render(<Throw label="Loom.jpg" done={0.62} />);
    const bar = screen.getByRole('progressbar', { name: 'Loom.jpg' });
    expect(bar).toHaveProperty('value', 62);
  });

  it('never draws past the end', () => {
    render(<Throw label="Loom.jpg" done={1.4} />);
    expect(screen.getByRole('progressbar')).toHaveProperty('value', 100);
  });

  it('sets a fraction of an inch apart from its whole number, as text that copies', () => {
    const { container } = render(<Figures items={[{ label: 'Width', value: [{ kind: 'number', text: '11' }, { kind: 'text', text: '\u2009' }, { kind: 'fraction', text: '3/4' }, { kind: 'text', text: '\u00a0' }, { kind: 'unit', text: 'in' }], was: 'pattern 15\u2009¾ in' }]} />);
    expect(container.querySelector('.frac')?.textContent).toBe('3/4');
    expect(screen.getByRole('definition').textContent).toContain('11\u20093/4\u00a0in');
  });
});

describe('problems and warnings', () => {
  it('stand as their sentences, and what a kind means stands once under those of that kind', () => {
    render(<Findings found={[{ code: 'W_THICK', says: 'Wool is thick.' }, { code: 'W_SLIT', says: 'A slit.' }, { code: 'W_THICK', says: 'Rope is thick.' }, { says: 'Ask Ilse.' }]} />);
    const [thick, slit, plain] = screen.getAllByRole('listitem').map((item) => item.textContent);
    expect(thick).toMatch(/^Wool is thick\.Rope is thick\.Thick yarn for ends so close: what this means.*What to do: Take thinner yarn/);
    expect(slit).toContain('A long slit: what this means');
    expect(plain).toBe('Ask Ilse.');
  });

  it('a code nobody knows is told by its sentence alone', () => {
    render(<Findings found={[{ code: 'constructor', says: 'Something.' }]} />);
    expect(screen.getByRole('listitem').textContent).toBe('Something.');
  });
});
