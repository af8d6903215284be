import { describe, expect, it } from 'vitest';
import { describeCloth } from '#core/craft/cloth/describe-cloth.ts';
import { CORDS, RYA, SOUMAK, WEDGES, wovenPiece } from './pieces.ts';

describe('a cloth in words', () => {
  const piece = wovenPiece({ bands: [RYA, WEDGES, SOUMAK] });

  it('names the piece, its width, and its bands in the order they are woven', () => {
    expect(describeCloth(piece)).toBe(
      'Low Tide, wall hanging, 40\u00a0cm wide. In the order it is woven: a rya fringe in Foam, 14\u00a0cm long, ' +
        '16\u00a0cm of wedges in Slack Water and Dry Sand, 12 rows of soumak in Estuary.',
    );
  });

  it('says how far it is, with the row of the band at the fell', () => {
    expect(describeCloth(piece, { woven: (24 + 80) / 244 })).toContain(' Woven so far: 10\u00a0cm of 24\u00a0cm, row 48 of 96 in the wedges.');
    expect(describeCloth(piece, { woven: 0 })).toContain(' Nothing woven yet, of 24\u00a0cm.');
    expect(describeCloth(piece, { woven: 1 })).not.toContain('Woven so far');
  });

  it('calls what has two horns a shape, not a wedge', () => {
    const spans = [{ row: 0, from: 0, to: 20 }, { row: 1, from: 0, to: 8 }, { row: 1, from: 12, to: 20 }, { row: 2, from: 0, to: 4 }, { row: 2, from: 16, to: 20 }];
    const horns = { ...WEDGES, shapes: [{ colour: '#cdbb94', yarn: 'Dry Sand', spans }] };
    expect(describeCloth(wovenPiece({ bands: [horns] }))).toContain('16\u00a0cm of shapes in Slack Water and Dry Sand');
  });

  it('tells basket weave and a doubled weft from plain tabby', () => {
    const plain = { ...WEDGES, shapes: [] };
    const words = describeCloth(wovenPiece({ bands: [{ ...plain, together: 2, strands: 2 }, { ...plain, strands: 2 }, plain] }));
    expect(words).toContain('16\u00a0cm of basket weave in Slack Water, 16\u00a0cm of tabby with a doubled weft in Slack Water, 16\u00a0cm of tabby in Slack Water');
  });

  it('speaks in inches with fractions when asked', () => {
    expect(describeCloth(piece, { units: 'in' })).toContain('15\u20093/4\u00a0in wide');
  });

  it('counts cords', () => {
    expect(describeCloth(CORDS)).toBe('Three Knotted Cords, plant hanger, two cords, 76\u00a0cm long.');
  });
});
