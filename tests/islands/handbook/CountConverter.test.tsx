import { render, screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { expect, test } from 'vitest';
import { CountConverter } from '#islands/handbook/CountConverter.tsx';

const told = (label: string): string | undefined => screen.queryByText(label, { selector: 'th span' })?.closest('th')?.nextElementSibling?.textContent.replaceAll('\u00a0', ' ');

test('turns a count into the others while one types, and says at the field what cannot be read', async () => {
  render(<CountConverter way="nm" typed="16/2" />);
  expect(told('Tex')).toBe('125 tex');
  const field = screen.getByLabelText('The number');
  await userEvent.clear(field);
  await userEvent.type(field, '8/2');
  await userEvent.selectOptions(screen.getByLabelText('The label says'), 'ne-cotton');
  expect(told('Yards in a pound')).toBe('3360 yd');
  await userEvent.type(field, '/');
  expect(field.getAttribute('aria-invalid')).toBe('true');
  expect(screen.queryByRole('table')).toBeNull();
});
