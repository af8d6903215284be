import { cleanup, render, screen } from '@testing-library/react';
import { afterEach, expect, test, vi } from 'vitest';
import { Boundary } from '#islands/ui/Boundary.tsx';

afterEach(cleanup);

function Figure({ value }: { value: number }) {
  if (value < 0) throw new Error('our fault');
  return <p>{value}</p>;
}

test('a fault stays within its part, and goes once what is drawn changes', () => {
  const silent = vi.spyOn(console, 'error').mockImplementation(() => undefined);
  const page = (value: number) => <><p>Beside it</p><Boundary says="This could not be drawn."><Figure value={value} /></Boundary></>;
  const { rerender } = render(page(1));
  rerender(page(-1));
  expect(screen.getByText('This could not be drawn.')).toBeDefined();
  expect(screen.getByText('Beside it')).toBeDefined();
  rerender(page(2));
  expect(screen.getByText('2')).toBeDefined();
  silent.mockRestore();
});
