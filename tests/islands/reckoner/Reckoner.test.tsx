import { cleanup, render, screen, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { hydrateRoot } from 'react-dom/client';
import { renderToString } from 'react-dom/server';
import { afterEach, beforeEach, describe, expect, test } from 'vitest';
import { RECKONER_DEFAULTS, RECKONER_FIELDS, type ReckonerForm } from '#core/reckoner/reckoner-form.ts';
import { PARTS } from '#islands/reckoner/parts.ts';
import { Reckoner } from '#islands/reckoner/Reckoner.tsx';

const open = (typed: Partial<ReckonerForm> = {}) => {
  render(<Reckoner initial={{ ...RECKONER_DEFAULTS, ...typed }} />);
  return userEvent.setup();
};
const partOf = (title: string): HTMLElement => screen.getByText(title, { selector: 'h2' }).closest('section') ?? document.body;
/** What a part answers under a name: a loud figure or a row. */
const told = (part: string, name: string): string => {
  const label = [...partOf(part).querySelectorAll('dt, tbody th')].find((cell) => cell.firstChild?.textContent?.trim() === name);
  const value = label?.parentElement?.querySelector('dd > span, td');
  return value?.textContent.replaceAll('\u00a0', ' ') ?? 'no such line';
};

afterEach(cleanup);
beforeEach(() => { history.replaceState(null, '', '/reckoner'); });

test('every field of the form is asked in just one part', () => {
  const asked = PARTS.flatMap(({ fields, besides = [] }) => [...fields, ...besides]);
  expect(asked.toSorted()).toEqual(RECKONER_FIELDS.filter((field) => field !== 'units').toSorted());
});

describe('the reckoner', { timeout: 30_000 }, () => {
  test('answers while one types', async () => {
    const user = open();
    expect(told('Ends and spacing', 'Warp ends')).toBe('62 ends');
    await user.clear(screen.getByLabelText('Finished width'));
    await user.type(screen.getByLabelText('Finished width'), '20');
    expect(told('Ends and spacing', 'Warp ends')).toBe('42 ends');
    expect(screen.getAllByRole('status')[1]?.textContent).toContain('42');
  });

  test('says what is wrong at the field, keeps what was typed, and goes on answering the rest', async () => {
    const user = open();
    await user.clear(screen.getByLabelText('Frame, nail to nail'));
    await user.type(screen.getByLabelText('Frame, nail to nail'), '40');
    const field = screen.getByLabelText('Frame, nail to nail');
    expect(field).toHaveProperty('value', '40');
    expect(field.getAttribute('aria-invalid')).toBe('true');
    expect(document.getElementById(field.getAttribute('aria-describedby') ?? '')?.textContent).toContain('Up to 29.4 cm of cloth fit.');
    expect(told('One yarn', 'Tex')).toBe('555.56 tex');
    const waiting = within(partOf('A whole hanging')).getByText('Frame, nail to nail', { selector: 'a' });
    expect(document.querySelector(waiting.getAttribute('href') ?? '')).toBe(field);
    expect(screen.getAllByRole('status')[1]?.textContent).toBe('One field cannot be used yet.');
  });

  test('turns what was typed into the other units', async () => {
    const user = open();
    await user.click(screen.getByLabelText('in, oz'));
    expect(screen.getByLabelText('Finished width')).toHaveProperty('value', '11 13/16');
    expect(told('A whole hanging', 'Warp, by weight')).toMatch(/oz$/);
  });

  test('asks for counted rows only where they are wanted', async () => {
    const user = open();
    expect(screen.queryByLabelText('Rows counted')).toBeNull();
    await user.selectOptions(screen.getByLabelText('How rows are beaten'), 'swatch');
    await user.type(screen.getByLabelText('Rows counted'), '6');
    await user.click(screen.getByLabelText('A rya fringe'));
    expect(told('A whole hanging', 'Knots of the fringe')).toMatch(/^3\d knots$/);
  });

  test('keeps the address in step, so that it can be sent', async () => {
    const user = open();
    await user.clear(screen.getByLabelText('Woven height'));
    await user.type(screen.getByLabelText('Woven height'), '30');
    await expect.poll(() => location.search, { timeout: 3000 }).toBe('?units=cm&height=30');
  });

  test('copies a link that brings back what is typed', async () => {
    const user = open({ width: '20' });
    await user.click(screen.getByRole('button', { name: 'Copy link' }));
    expect(await navigator.clipboard.readText()).toMatch(/\/reckoner\?units=cm&width=20$/);
    expect(screen.getAllByRole('status')[0]?.textContent).toContain('Link copied');
    expect(screen.getByRole('link', { name: 'Link to what is typed here' }).getAttribute('href')).toBe('/reckoner?units=cm&width=20');
  });

  test('asks of a shape only what belongs to it, and keeps the rest for sending', async () => {
    const user = open();
    await user.selectOptions(screen.getByLabelText('Shape'), 'slope');
    expect(screen.queryByLabelText('Base')).toBeNull();
    expect(document.querySelector('input[type=hidden][name=base]')).toHaveProperty('value', '15');
    expect(told('Shapes', 'The edge leans by')).toBe('66.55 °');
    await user.selectOptions(screen.getByLabelText('Shape'), 'circle');
    expect(screen.getByLabelText('Radius')).toHaveProperty('value', '6');
  });

  test('takes up what was typed before it woke', () => {
    const markup = renderToString(<Reckoner initial={RECKONER_DEFAULTS} />);
    const place = document.createElement('div');
    place.innerHTML = markup;
    document.body.append(place);
    const width = place.querySelector<HTMLInputElement>('[name=width]');
    if (width !== null) width.value = '20';
    const root = hydrateRoot(place, <Reckoner initial={RECKONER_DEFAULTS} />);
    return expect.poll(() => [...place.querySelectorAll('dt')].find(({ textContent }) => textContent === 'Warp ends')?.nextElementSibling?.textContent, { timeout: 5000 }).toContain('42').then(() => { root.unmount(); place.remove(); });
  });

  test('drawn on the server it is a form that sends every field by its name', () => {
    const markup = renderToString(<Reckoner initial={RECKONER_DEFAULTS} />);
    const form = new DOMParser().parseFromString(markup, 'text/html').querySelector('form');
    expect(form?.getAttribute('method')).toBe('get');
    const names = new Set([...(form?.querySelectorAll('[name]') ?? [])].map((field) => field.getAttribute('name')));
    expect([...names].sort()).toEqual([...Object.keys(RECKONER_DEFAULTS), 'shown'].sort());
    expect(markup).toContain('62');
  });
});
