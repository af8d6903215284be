import { cleanup, fireEvent, render, screen } from '@testing-library/react';
import { afterEach, describe, expect, it, vi } from 'vitest';
import { Remarks } from '#islands/writing/Remarks.tsx';

afterEach(cleanup);

const problem = { line: 12, column: 4, code: 'code', reason: 'Curly braces mean code.' } as const;

describe('remarks on a text', () => {
  it('say the line, its words and the reason, and lead there', () => {
    const onGo = vi.fn();
    render(<Remarks remarks={{ problems: [problem], warnings: [] }} isEmpty={false} wordsOf={() => 'Wind {ends}.'} fieldId="f-source" onGo={onGo} />);
    expect(screen.getByText('One thing cannot be read')).toBeTruthy();
    expect(screen.getByText('Wind {ends}.')).toBeTruthy();
    expect(screen.getByText('Curly braces mean code.')).toBeTruthy();
    const link = screen.getByRole('link', { name: 'Line 12' });
    expect(link.getAttribute('href')).toBe('#f-source');
    fireEvent.click(link);
    expect(onGo).toHaveBeenCalledWith(problem);
  });

  it('say so when all can be read, and when nothing is there', () => {
    const { rerender } = render(<Remarks remarks={{ problems: [], warnings: [] }} isEmpty={false} wordsOf={() => ''} fieldId="f" onGo={() => undefined} />);
    expect(screen.getByRole('status').textContent).toBe('It can be read as it stands.');
    rerender(<Remarks remarks={{ problems: [], warnings: [] }} isEmpty wordsOf={() => ''} fieldId="f" onGo={() => undefined} />);
    expect(screen.getByRole('status').textContent).toBe('Nothing is written yet.');
  });
});
