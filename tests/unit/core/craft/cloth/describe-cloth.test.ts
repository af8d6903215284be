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

  it('says how the ends of the warp are finished and what holds it, where that is said', () => {
    const finished = (finish: NonNullable<Parameters<typeof wovenPiece>[0]>['finish']): string => describeCloth(wovenPiece({ bands: [SOUMAK], ...(finish && { finish }) }));
    expect(finished({ bottom: 'knotted', fringeMm: 70, bundleEnds: 6 })).toMatch(/Estuary\. Its warp ends are knotted in bundles of 6 and hang 7\u00a0cm\.$/);
    expect(finished({ bottom: 'twisted', fringeMm: 90, bundleEnds: 8 })).toMatch(/ Its warp ends are twisted into cords of 8, 9\u00a0cm long\.$/);
    expect(finished({ bottom: 'tucked', fringeMm: 0, bundleEnds: 4 })).toMatch(/ Its warp ends are tucked back into the cloth\.$/);
    expect(finished({ bottom: 'plain', fringeMm: 30, bundleEnds: 4 })).toMatch(/ Its warp ends are left loose, 3\u00a0cm long\.$/);
    expect(finished({ bottom: 'plain', fringeMm: 0, bundleEnds: 4 })).toMatch(/ Its warp ends are cut at the edge of the cloth\.$/);
    expect(finished(undefined)).toMatch(/Estuary\.$/);
    expect(describeCloth(wovenPiece({ bands: [SOUMAK], fixing: 'lashed' }))).toMatch(/ It is lashed to its dowel\.$/);
  });

  it('counts cords', () => {
    expect(describeCloth(CORDS)).toBe('Three Knotted Cords, plant hanger, two cords, 76\u00a0cm long.');
  });
});
