import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { clothPieceOf } from '#core/craft/cloth/cloth-piece-of.ts';
import { wovenHeightMm, type WovenPiece } from '#core/craft/cloth/cloth-piece.ts';
import { NEUTRAL } from '#core/craft/cloth/colour.ts';
import { drawCloth } from '#core/craft/cloth/draw-cloth.ts';
import type { FrameLoomPiece } from '#core/craft/piece.ts';
import { planPiece } from '#core/craft/plan.ts';

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

  it('stays within the budget at every size it stands in a page', () => {
    for (const width of [136, 225, 456, 720]) expect(drawCloth(cloth, { id: 'low-tide', as: 'hanging', width }).length).toBeLessThan(60 * 1024);
    expect(drawCloth(cloth, { id: 'low-tide', as: 'loom', width: 400, woven: 0.6 }).length).toBeLessThan(60 * 1024);
  });
});
