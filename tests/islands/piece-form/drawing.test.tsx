import { readFileSync } from 'node:fs';
import { cleanup, fireEvent, render, screen } from '@testing-library/react';
import { afterEach, describe, expect, test } from 'vitest';
import { typePiece } from '#core/craft/piece-form/type-piece.ts';
import type { FrameLoomPiece } from '#core/craft/piece.ts';
import { PieceForm } from '#islands/piece-form/PieceForm.tsx';

const lowTide = JSON.parse(readFileSync('content/series/low-tide/piece.json', 'utf8')) as FrameLoomPiece;
const bands: FrameLoomPiece['bands'] = [
  { technique: 'tabby', yarn: 'foam', heightMm: 60 },
  { technique: 'soumak', yarn: 'foam', over: 4, back: 2, rows: 4, tabbyBetween: 2, tabbyYarn: 'foam' },
  { technique: 'twining', yarn: 'foam', rows: 4 },
  { technique: 'tabby', yarn: 'foam', fill: true },
];

afterEach(cleanup);

/** The drawn bands, the first one woven at first, each with its marks. */
const drawn = (): { readonly place: Element; readonly marks: readonly Element[] }[] => [...document.querySelectorAll('.stage .cloth svg > g')].slice(-bands.length).map((place) => ({ place, marks: [...place.firstElementChild?.children ?? []] }));

function show(): void {
  const typed = typePiece({ ...lowTide, yarns: { foam: { metresPer100g: 180, colour: '#e6e4d8' } }, bands }, 'cm');
  render(<PieceForm action="/piece" series={{ slug: 'low-tide', name: 'Low Tide' }} revision={1} typed={typed} isTried={false} isChanged={false} summary="" isOver={false} openBand={0} saved={{ words: '', isDraft: false, pieceWords: null, asideWords: null }} looms={[]} />);
}

describe('the drawn piece under the hands', () => {
  test('a height typed puts in that band and the one that gives way; the others keep their marks', () => {
    show();
    const before = drawn();
    const field = document.querySelector('[name="bands.0.heightMm"]');
    if (field === null) throw new Error('the band has no height');
    fireEvent.change(field, { target: { value: '9' } });
    const after = drawn();
    expect(after.map(({ place }) => place)).toEqual(before.map(({ place }) => place));
    expect(after.map(({ marks }, at) => marks.every((mark, index) => mark === before[at]?.marks[index]))).toEqual([false, true, true, false]);
    expect(after[1]?.place.getAttribute('transform')).not.toBeNull();
  });

  test('a band that is moved goes with its marks', () => {
    show();
    const before = drawn();
    fireEvent.click(screen.getByLabelText('Weave band 2 later'));
    const after = drawn();
    expect(after.map(({ place }) => before.findIndex((one) => one.place === place))).toEqual([0, 2, 1, 3]);
    expect(after[1]?.marks[0]).toBe(before[2]?.marks[0]);
  });
});
