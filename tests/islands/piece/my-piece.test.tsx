// @vitest-environment jsdom
import { act, cleanup, fireEvent, render, screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { hydrateRoot } from 'react-dom/client';
import { renderToString } from 'react-dom/server';
import { afterEach, describe, expect, test } from 'vitest';
import { typeMine } from '#core/craft/my-piece/typed-mine.ts';
import { MyPiece, type MyPieceProps } from '#islands/piece/MyPiece.tsx';
import { lowTide } from '../../support/low-tide.ts';

const pattern = await lowTide();
/** The whole text at once: each change draws the cloth anew. */
const type = (name: RegExp | string, text: string): void => { fireEvent.change(screen.getByRole('textbox', { name }), { target: { value: text } }); };
const describing = (field: HTMLElement): string => (field.getAttribute('aria-describedby') ?? '').split(' ').map((id) => document.getElementById(id)?.textContent ?? '').join(' ');
const props: MyPieceProps = { slug: 'low-tide', name: 'Low Tide', teacher: 'Ilse', pattern, typed: typeMine({}, pattern, 'cm'), kept: { mine: {}, woven: { bandsDone: 0 } }, revision: 3, errors: {}, looms: [], action: '?save' };
afterEach(cleanup);

describe('my piece', () => {
  test('follows the hand: ends, figures and the picture change as she types', () => {
    render(<MyPiece {...props} />);
    expect(screen.queryByText(/^pattern 82/)).toBeNull();
    type('Width of your piece', '30,5');
    expect(screen.getByText('pattern 82 ends')).toBeDefined();
    expect(screen.getByText(/The piece is .* wide instead of/)).toBeDefined();
  });

  test('takes up what was typed before its script woke, in the units that were shown', async () => {
    const { container } = render(<div dangerouslySetInnerHTML={{ __html: renderToString(<MyPiece {...props} />) }} />);
    const place = container.querySelector('div') ?? container;
    const width = screen.getByRole<HTMLInputElement>('textbox', { name: 'Inside width' });
    width.value = '50,8';
    await act(async () => { hydrateRoot(place, <MyPiece {...props} />); });
    type('Nail spacing', '8');
    expect(width.value).toBe('50,8');
  });

  test('an impossible loom is told at its field and in the status, with what works', () => {
    render(<MyPiece {...props} />);
    const field = screen.getByRole('textbox', { name: 'Inside width' });
    type('Inside width', '3 mm');
    expect(field.getAttribute('aria-invalid')).toBe('true');
    expect(describing(field)).toContain('Too narrow for a frame.');
    expect(screen.getByRole('status').textContent).toBe('One thing does not work yet');
  });

  test('a loom that is too narrow offers the ways to fit the piece, and takes one in one press', async () => {
    render(<MyPiece {...props} />);
    expect(screen.queryByRole('group', { name: 'How to fit it to your loom' })).toBeNull();
    type('Inside width', '30');
    await userEvent.click(screen.getByRole('radio', { name: /^Narrower/ }));
    expect(screen.getByRole('status').textContent).toBe('It fits your loom');
    expect(screen.getByText(/The piece is .* wide instead of/)).toBeDefined();
  });

  test('on a loom that is too low she may tick the bands to leave out', async () => {
    render(<MyPiece {...props} />);
    type('Inside height', '45');
    expect(screen.getByRole('status').textContent).toContain('does not work yet');
    await userEvent.click(screen.getByRole('checkbox', { name: /^dunes/ }));
    expect(screen.getByRole('radio', { name: /^Lower, without bands you choose/ })).toHaveProperty('checked', true);
    expect(screen.getByRole('status').textContent).toBe('It fits your loom');
    expect(screen.getAllByText(/^Left out: dunes\./).length).toBeGreaterThan(0);
  });

  test('takes one of her looms in one press, and shows which one stands there', async () => {
    const loom = { kind: 'nailed-frame', insideWidthMm: 360, insideHeightMm: 700, nailPitchMm: 8, warping: 'zigzag', endsTogether: 2 } as const;
    render(<MyPiece {...props} looms={[{ publicId: 'a'.repeat(26), name: 'Kitchen frame', loom }]} />);
    const kitchen = screen.getByRole('button', { name: /^Kitchen frame/ });
    expect(kitchen.getAttribute('aria-pressed')).toBe('false');
    await userEvent.click(kitchen);
    expect(kitchen.getAttribute('aria-pressed')).toBe('true');
    expect(screen.getByRole<HTMLInputElement>('textbox', { name: 'Inside width' }).value).toBe('36');
    expect(screen.getByRole('radio', { name: 'Doubled' })).toHaveProperty('checked', true);
  });

  test('a warp yarn of her own takes the place of the pattern’s', () => {
    const { container } = render(<MyPiece {...props} />);
    const by = container.querySelector<HTMLSelectElement>('[name="warp.yarn.by"]');
    if (by === null) throw new Error('no field for the warp');
    fireEvent.change(by, { target: { value: 'tex' } });
    fireEvent.change(container.querySelector('[name="warp.yarn.grist"]') ?? by, { target: { value: '200' } });
    expect(screen.getByText('Your own yarn is the warp.')).toBeDefined();
  });

  test('without script the ways stand in the form, with what each comes to', () => {
    const markup = renderToString(<MyPiece {...props} typed={typeMine({ loom: { insideHeightMm: 450 } }, pattern, 'cm')} />);
    for (const way of ['as-it-is', 'leave-last', 'scaled']) expect(markup).toContain(`value="${way}"`);
    expect(markup).toContain('name="leaveOut.dunes"');
  });

  test('half way it says what is still to weave, by the rows she measured, and whether her yarn suffices', async () => {
    render(<MyPiece {...props} />);
    expect(screen.queryByRole('heading', { name: 'Still to weave' })).toBeNull();
    await userEvent.click(screen.getByText('I have already woven some of it'));
    await userEvent.selectOptions(screen.getByRole('combobox', { name: 'Bands that are finished' }), '7 of 14, up to dunes');
    type(/^Height of the cloth so far/, '26');
    type(/\(water\)$/, '5');
    expect(screen.getByRole('heading', { name: 'Still to weave' })).toBeDefined();
    expect(screen.getByText('as you measured')).toBeDefined();
    expect(screen.getByText('Not enough')).toBeDefined();
    expect(screen.getByText(/of Fenwool 6\/2, .* with its margin, and .* are left\. That does not suffice/)).toBeDefined();
  });

  test('what is woven cannot change any more: the sentence stands at the field', () => {
    const woven = { bandsDone: 6 };
    render(<MyPiece {...props} typed={typeMine({}, pattern, 'cm', woven)} kept={{ mine: {}, woven }} />);
    type('Width of your piece', '30');
    const field = screen.getByRole('textbox', { name: 'Width of your piece' });
    expect(describing(field)).toContain('The warp is on the loom, so the piece keeps its width and its 82 ends.');
    expect(screen.getByRole('combobox', { name: 'Bands that are finished' })).toHaveProperty('value', '6');
  });

  test('what may still change half way is reckoned anew for the rest, and it says so', () => {
    const woven = { bandsDone: 6 };
    render(<MyPiece {...props} typed={typeMine({}, pattern, 'cm', woven)} kept={{ mine: {}, woven }} />);
    expect(screen.queryByText(/Only the rest is reckoned anew/)).toBeNull();
    fireEvent.change(screen.getByRole('textbox', { name: 'Inside height' }), { target: { value: '45' } });
    fireEvent.click(screen.getByRole('radio', { name: /^Lower, from the end/ }));
    expect(screen.getByText('What is woven stays as it is. Only the rest is reckoned anew.')).toBeDefined();
    expect(screen.getAllByText(/before /).length).toBeGreaterThan(0);
  });

  test('a problem can be unfolded: what it means, what to do', () => {
    render(<MyPiece {...props} />);
    type('Inside width', '30');
    expect(screen.getAllByText('It does not fit: what this means')).toHaveLength(1);
    expect(screen.getByText(/^Make the one smaller or the other larger\./)).toBeDefined();
  });

  test('her own yarn changes how much is needed', async () => {
    render(<MyPiece {...props} />);
    await userEvent.click(screen.getByText(/\(water\), as in the pattern/));
    const way = screen.getAllByRole('combobox', { name: 'How thick, by' }).find((one) => one.getAttribute('name') === 'yarns.water.by');
    if (way === undefined) throw new Error('no way to say how thick');
    await userEvent.selectOptions(way, 'metresPer100g');
    type(/^Metres in 100 g/, '150');
    expect(screen.getByText('Your own yarn is the water yarn.')).toBeDefined();
  });

  test('without script every field can be filled in, and what the server said stands at its field', () => {
    const markup = renderToString(<MyPiece {...props} errors={{ insideWidthMm: 'Too wide for a frame.' }} />);
    for (const name of ['series', 'revision', 'shown', 'units', 'insideWidthMm', 'widthMm', 'yarns.shore.grist', 'yarns.ridge.strands', 'woven.bandsDone', 'woven.rows', 'woven.heightMm', 'woven.left.water']) expect(markup).toContain(`name="${name}"`);
    expect(markup).toContain('Too wide for a frame.');
    expect(markup).toContain('action="?save"');
    expect(markup).not.toContain(' style=');
  });
});
