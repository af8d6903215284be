import { cleanup, render, screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { useState } from 'react';
import { afterEach, describe, expect, it, vi } from 'vitest';
import { Button, IconButton } from '#islands/ui/Button.tsx';
import { Choose } from '#islands/ui/Choose.tsx';
import { Combo } from '#islands/ui/Combo.tsx';
import { Field, Select, UnitField } from '#islands/ui/Field.tsx';
import { TickRow } from '#islands/ui/TickRow.tsx';

afterEach(cleanup);

describe('a button', () => {
  it('does its work when pressed, and is no submit unless told', async () => {
    const onClick = vi.fn();
    render(<Button onClick={onClick}>Print</Button>);
    await userEvent.click(screen.getByRole('button', { name: 'Print' }));
    expect(onClick).toHaveBeenCalledOnce();
    expect(screen.getByRole('button').getAttribute('type')).toBe('button');
  });

  it('that is off says why, can be reached by keyboard, and does nothing', async () => {
    const onClick = vi.fn();
    render(<Button off="Part 2 has no captions." onClick={onClick}>Publish</Button>);
    await userEvent.tab();
    const button = screen.getByRole('button', { name: 'Publish', description: 'Part 2 has no captions.' });
    expect(document.activeElement).toBe(button);
    await userEvent.keyboard('{Enter}');
    await userEvent.click(button);
    expect(onClick).not.toHaveBeenCalled();
  });

  it('that is off or busy does not send the form it stands in', async () => {
    const onSubmit = vi.fn((event: { preventDefault: () => void }) => event.preventDefault());
    render(<form onSubmit={onSubmit}><Button type="submit" busy>Pay</Button><Button type="submit" off="Choose a seat first.">Pay later</Button></form>);
    for (const button of screen.getAllByRole('button')) await userEvent.click(button);
    expect(onSubmit).not.toHaveBeenCalled();
  });

  it('with a glyph alone has a name', () => {
    render(<IconButton glyph="takeOut" label="Take out band 4" />);
    expect(screen.getByRole('button', { name: 'Take out band 4' })).toBeDefined();
  });
});

describe('a field', () => {
  it('is named by its label and described by its hint and by what is wrong', () => {
    render(<UnitField name="spacing" label="Nail spacing" hint="From nail to nail" unit="mm" error="Between 2 and 25 mm works." />);
    const box = screen.getByRole('textbox', { name: 'Nail spacing', description: 'From nail to nail Between 2 and 25 mm works.' });
    expect(box.getAttribute('aria-invalid')).toBe('true');
    expect(box.getAttribute('inputmode')).toBe('decimal');
  });

  it('takes lengths as people write them', async () => {
    const seen = vi.fn<(typed: string) => void>();
    render(<UnitField name="width" label="Width" unit="in" onChange={(event) => seen(event.currentTarget.value)} />);
    await userEvent.type(screen.getByRole('textbox'), '4 7/8');
    expect(seen).toHaveBeenLastCalledWith('4 7/8');
  });

  it('says when it may stay empty', () => {
    render(<Field name="note" label="Note" optional />);
    expect(screen.getByRole('textbox', { name: 'Note (may stay empty)' })).toBeDefined();
  });

  it('offers its options', async () => {
    render(<Select name="technique" label="Technique" defaultValue="rya" options={[{ value: 'rya', label: 'Rya' }, { value: 'soumak', label: 'Soumak' }]} />);
    await userEvent.selectOptions(screen.getByRole('combobox', { name: 'Technique' }), 'Soumak');
    expect(screen.getByRole('option', { name: 'Soumak', selected: true })).toBeDefined();
  });
});

function UnitsChoice({ onChoose }: { onChoose: (value: 'cm' | 'in') => void }) {
  const [value, setValue] = useState<'cm' | 'in'>('cm');
  return <Choose name="units" legend="Units" value={value} onChoose={(chosen) => { setValue(chosen); onChoose(chosen); }} options={[{ value: 'cm', label: 'cm, g' }, { value: 'in', label: 'in, oz' }]} />;
}

describe('choosing one of a few', () => {
  it('is a named group of radios of one name, which is what lets arrow keys move through them', async () => {
    const onChoose = vi.fn();
    render(<UnitsChoice onChoose={onChoose} />);
    expect(screen.getByRole('group', { name: 'Units' })).toBeDefined();
    const names = screen.getAllByRole('radio').map((radio) => radio.getAttribute('name'));
    expect(new Set(names).size).toBe(1);
    await userEvent.click(screen.getByText('in, oz'));
    expect(onChoose).toHaveBeenLastCalledWith('in');
    expect(screen.getByRole('radio', { name: 'in, oz', checked: true })).toBeDefined();
  });
});

describe('a tick row', () => {
  it('is ticked by pressing its words or by the space bar', async () => {
    const onTick = vi.fn();
    render(<TickRow name="have" checked={false} onTick={onTick} what="Spacer card" more="A cereal box will do" />);
    await userEvent.click(screen.getByText('Spacer card'));
    expect(onTick).toHaveBeenLastCalledWith(true);
    screen.getByRole('checkbox').focus();
    await userEvent.keyboard(' ');
    expect(onTick).toHaveBeenCalledTimes(2);
  });
});

const yarns = ['Estuary', 'Foam', 'Samphire', 'Slack Water'].map((label) => ({ value: label.toLowerCase(), label }));

function YarnChoice({ onChoose }: { onChoose: (value: string) => void }) {
  const [value, setValue] = useState<string | undefined>('foam');
  return <Combo name="yarn" label="Yarn" options={yarns} value={value} onChoose={(chosen) => { setValue(chosen); onChoose(chosen); }} />;
}

describe('choosing one of many', () => {
  it('finds by typing and takes with Enter', async () => {
    const onChoose = vi.fn();
    render(<YarnChoice onChoose={onChoose} />);
    const box = screen.getByRole('combobox', { name: 'Yarn' });
    await userEvent.clear(box);
    await userEvent.type(box, 'sam');
    expect(screen.getAllByRole('option').map(({ textContent }) => textContent)).toEqual(['Samphire']);
    await userEvent.keyboard('{Enter}');
    expect(onChoose).toHaveBeenCalledWith('samphire');
    expect(box).toHaveProperty('value', 'Samphire');
  });

  it('moves with the arrows, round the ends, and tells which one is at hand', async () => {
    render(<YarnChoice onChoose={() => undefined} />);
    screen.getByRole('combobox').focus();
    await userEvent.keyboard('{ArrowDown}{ArrowUp}');
    const last = screen.getByRole('option', { name: 'Slack Water', selected: true });
    expect(screen.getByRole('combobox').getAttribute('aria-activedescendant')).toBe(last.id);
  });

  it('puts the list away with Esc and keeps what was chosen', async () => {
    const onChoose = vi.fn();
    render(<YarnChoice onChoose={onChoose} />);
    const box = screen.getByRole('combobox');
    await userEvent.type(box, 'x');
    await userEvent.keyboard('{Escape}');
    expect(box).toHaveProperty('value', 'Foam');
    expect(box.getAttribute('aria-expanded')).toBe('false');
    expect(onChoose).not.toHaveBeenCalled();
  });
});
