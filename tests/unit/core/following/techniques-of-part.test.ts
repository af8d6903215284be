import { describe, expect, test } from 'vitest';
import { techniquesOfPart } from '#core/following/techniques-of-part.ts';
import { lowTide } from '../../../support/low-tide.ts';

describe('the techniques a part teaches', () => {
  test('are those of the bands its text speaks of, each once', async () => {
    const piece = await lowTide();
    if (!('bands' in piece)) throw new RangeError('Low Tide has bands');
    const rya = piece.bands.find(({ technique }) => technique === 'rya');
    const keys = [`band.${rya?.name ?? ''}.knots`, `band.${rya?.name ?? ''}.rows`, 'warp.ends'];
    expect(techniquesOfPart(piece, keys)).toEqual(['rya']);
  });

  test('are none where it only plans, speaks of no band, or the piece is of a craft without bands', async () => {
    const piece = await lowTide();
    const all = 'bands' in piece ? piece.bands.map(({ name }) => `band.${name ?? ''}.rows`) : [];
    expect([techniquesOfPart(piece, all), techniquesOfPart(piece, ['warp.ends']), techniquesOfPart(null, all)]).toEqual([[], [], []]);
  });
});
