import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { clothPieceOf } from '#core/craft/cloth/cloth-piece-of.ts';
import { wovenHeightMm, type WovenPiece } from '#core/craft/cloth/cloth-piece.ts';
import { NEUTRAL } from '#core/craft/cloth/colour.ts';
import { drawCloth } from '#core/craft/cloth/draw-cloth.ts';
import type { FrameLoomPiece } from '#core/craft/piece.ts';
import { planPiece } from '#core/craft/plan.ts';
import { PLAIN_PIECE, pieceOf, pieceWith, planOf } from '../a-piece.ts';

const LOW_TIDE: FrameLoomPiece = JSON.parse(readFileSync(new URL('../../../../../content/series/low-tide/piece.json', import.meta.url), 'utf8'));

function clothOf(piece: FrameLoomPiece): WovenPiece {
  const plan = planPiece(piece);
  if (!plan.ok) throw new Error(plan.problems.map((problem) => problem.message).join(' '));
  return clothPieceOf(piece, plan.value, 'Low Tide');
}

const band = (cloth: WovenPiece, name: string): WovenPiece['bands'][number] => {
  const found = cloth.bands.find((each) => each.name === name);
  if (found === undefined) throw new Error(`no band "${name}"`);
  return found;
};

describe('a cloth from a described piece and its plan', () => {
  const cloth = clothOf(LOW_TIDE);

  it('is as high as the piece, with the ends of the plan', () => {
    expect(wovenHeightMm(cloth)).toBeCloseTo(440, 6);
    expect(cloth.ends).toBe(82);
    expect(cloth.turned).toBe(false);
  });

  it('names a yarn by the last words of its label', () => {
    expect(band(cloth, 'dark-shore')).toMatchObject({ yarn: 'Estuary', colour: '#2f5366' });
  });

  it('lays the shapes on the very ends their yarn was counted for', () => {
    const dunes = band(cloth, 'dunes');
    if (dunes.technique !== 'tabby') throw new Error(dunes.technique);
    const [sand, bank, green] = dunes.shapes.map((shape) => shape.spans[0]);
    expect(sand).toMatchObject({ row: 0, from: 1 });
    expect(bank?.from).toBeGreaterThanOrEqual(sand?.to ?? 99);
    expect(green?.from).toBeGreaterThanOrEqual(bank?.to ?? 99);
    expect(green?.to).toBeLessThanOrEqual(82);
  });

  it('sets pile on the tabby beside it', () => {
    expect(band(cloth, 'fringe-under')).toMatchObject({ groundColour: '#2f5366', knotEnds: 2, strands: 8 });
  });

  it('has a weft that hides the warp, as the beat says', () => {
    expect(band(cloth, 'sky')).toMatchObject({ cover: 1 });
    const open = clothOf({ ...LOW_TIDE, beat: { picksPerCm: 3 } });
    expect(band(open, 'sky')).toMatchObject({ cover: 0 });
  });

  it('draws a yarn without a colour undyed, and follows an own loom', () => {
    const { colour: _colour, ...water } = LOW_TIDE.yarns['water'] ?? { tex: 400 };
    const own = clothOf({ ...LOW_TIDE, yarns: { ...LOW_TIDE.yarns, water } });
    expect(band(own, 'sky').colour).toBe(NEUTRAL);
    expect(own.loom).toEqual({ insideWidthMm: 500, insideHeightMm: 640, bottomMm: 90 });
  });

  it('says of soumak, roving, loops and twining what their bands say', () => {
    const own = clothOf(pieceOf(
      { technique: 'soumak', name: 'ridge', yarn: 'ground', over: 4, back: 2, rows: 4, tabbyBetween: 2, tabbyYarn: 'ground' },
      { technique: 'roving', name: 'cloud', yarn: 'ground', over: 4, bulgeMm: 12, heightMm: 40 },
      { technique: 'roving', name: 'clouds', yarn: 'ground', over: 4, bulgeMm: 12, heightMm: 40, passes: 2 },
      { technique: 'loop-pile', name: 'rod', yarn: 'ground', rodMm: 8, rows: 3, heightMm: 20 },
      { technique: 'loop-pile', name: 'loops', yarn: 'ground', loopMm: 20, rows: 3, heightMm: 20 },
      { technique: 'twining', name: 'twine', yarn: 'ground', rows: 2 },
    ));
    expect(band(own, 'ridge')).toMatchObject({ technique: 'soumak', rows: 4, over: 4, back: 2, tabbyBetween: 2 });
    expect([band(own, 'cloud'), band(own, 'clouds')]).toMatchObject([{ over: 4, passes: 1 }, { over: 4, passes: 2 }]);
    expect(band(own, 'rod')).toMatchObject({ loopMm: expect.closeTo(Math.PI * 4, 9) as number });
    expect(band(own, 'loops')).toMatchObject({ loopMm: 20, rows: 3 });
    expect(band(own, 'twine')).toMatchObject({ technique: 'twining', rows: 2 });
  });

  it('says of tabby in pairs, doubled weft and close twining what their bands say', () => {
    const own = clothOf(pieceOf(
      { technique: 'tabby', name: 'pairs', yarn: 'ground', heightMm: 40, basket: true },
      { technique: 'tabby', name: 'single', yarn: 'ground', heightMm: 40 },
      { technique: 'twining', name: 'close', yarn: 'ground', rows: 2, endsPerTwist: 2 },
    ));
    expect(band(own, 'pairs')).toMatchObject({ technique: 'tabby', together: 2 });
    expect(band(own, 'single')).not.toHaveProperty('together');
    expect(band(own, 'close')).toMatchObject({ endsPerTwist: 2 });
    expect(band(clothOf(pieceWith({ yarns: { ground: { metresPer100g: 180, strands: 2, label: 'Fenwool, ' } } })), 'sky')).toMatchObject({ strands: 2, yarn: 'ground' });
  });

  it('leaves out a band the plan does not know, and draws a role without a yarn undyed', () => {
    const plan = planOf(PLAIN_PIECE);
    expect(clothPieceOf(PLAIN_PIECE, { ...plan, bands: [] }, 'It').bands).toEqual([]);
    const bare = clothPieceOf({ ...PLAIN_PIECE, yarns: {} }, plan, 'It');
    expect(band(bare, 'sky')).toMatchObject({ colour: NEUTRAL, yarn: 'ground', cover: 0.7 });
  });

  it('gives soumak the height that its plain picks leave it', () => {
    const ridge = (tabbyBetween: number): unknown => {
      const piece = pieceOf({ technique: 'soumak', name: 'ridge', yarn: 'ground', over: 4, back: 2, rows: 4, tabbyBetween, tabbyYarn: 'ground' });
      const found = band(clothOf(piece), 'ridge');
      return found.technique === 'soumak' && found.soumakShare * (planOf(piece).bands[0]?.heightMm ?? 0);
    };
    expect(ridge(0)).toBeCloseTo(4 * 1.43 * 1.011937, 4);
    expect(ridge(1)).toBeCloseTo(4 * 1.43 * 1.011937, 4);
  });

  it('sets pile without any tabby on a ground of its own', () => {
    const colour = '#2f5366';
    const own = clothOf(pieceWith({
      size: { widthMm: 300, heightMm: 24 }, yarns: { ground: { metresPer100g: 180, colour } },
      bands: [{ technique: 'rya', name: 'fringe', yarn: 'ground', strands: 3, legEnds: 1, pileMm: 80, trimMm: 5, rows: 2, heightMm: 24 }],
    }));
    const fringe = band(own, 'fringe');
    expect(fringe.technique === 'rya' && fringe.groundColour).toMatch(/^#[0-9a-f]{6}$/);
    expect(fringe.technique === 'rya' && fringe.groundColour).not.toBe(colour);
  });

  it('knows how the ends of the warp are finished, what holds it, how colours meet and what stays plain', () => {
    const own = clothOf(pieceWith({
      size: { widthMm: 300, heightMm: 340 }, finish: { bottom: 'twisted' }, dowel: { diameterMm: 12, fixing: 'tied' },
      bands: [
        { technique: 'rya', name: 'fringe', yarn: 'ground', strands: 3, legEnds: 1, edgeEnds: 2, pileMm: 80, trimMm: 5, rows: 2, heightMm: 24 },
        { technique: 'tabby', name: 'sky', yarn: 'ground', fill: true, shapes: [{ shape: 'rectangle', yarn: 'ground', baseMm: 60, heightMm: 60, join: 'dovetail' }] },
      ],
    }));
    expect(own).toMatchObject({ finish: { bottom: 'twisted', fringeMm: 0, bundleEnds: 4 }, fixing: 'tied' });
    expect(band(own, 'fringe')).toMatchObject({ edgeEnds: 2 });
    expect(band(own, 'sky')).toMatchObject({ shapes: [{ join: 'dovetail' }] });
    expect(cloth).not.toHaveProperty('finish');
  });

  it('stays within the budget at every size it stands in a page', () => {
    for (const width of [136, 225, 456, 720]) expect(drawCloth(cloth, { id: 'low-tide', as: 'hanging', width }).length).toBeLessThan(60 * 1024);
    expect(drawCloth(cloth, { id: 'low-tide', as: 'loom', width: 400, woven: 0.6 }).length).toBeLessThan(60 * 1024);
  });
});
