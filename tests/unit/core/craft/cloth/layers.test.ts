import { describe, expect, it } from 'vitest';
import type { ClothBand, WovenPiece } from '#core/craft/cloth/cloth-piece.ts';
import { drawCloth, layerCloth, type LayeredCloth } from '#core/craft/cloth/draw-cloth.ts';
import { markupOf } from '#core/craft/cloth/layers.ts';
import { ESTUARY, RYA, SOUMAK, wovenPiece } from './pieces.ts';

const VIEW = { id: 'a', as: 'hanging', width: 390 } as const;
const marksOf = (drawn: LayeredCloth, band: number): string | undefined => drawn.layers.find(({ of }) => of === band)?.markup;
const placesOf = (drawn: LayeredCloth): number[] => drawn.layers.flatMap(({ of, y }) => (typeof of === 'number' ? [y] : []));

/** A drawing with every line where it lies. */
function writtenOut(svg: string): string {
  const kept = new Map([...svg.matchAll(/<path id="([^"]+)" d="([^"]+)"\/>/gu)].map(([, id = '', d = '']) => [id, d]));
  return svg.replace(/<defs>.*<\/defs>/u, '').replace(/<use href="#([^"]+)"/gu, (_, id: string) => `<path d="${kept.get(id) ?? ''}"`);
}

/** More rows than a picture shows, as in most pieces. */
const fine = (heightMm: number, colour = ESTUARY): ClothBand => ({ technique: 'tabby', name: undefined, heightMm, colour, yarn: 'Fine', picks: Math.round(heightMm * 2), cover: 0.7, shapes: [] });
const striped = (...heights: readonly number[]): WovenPiece => wovenPiece({ bands: heights.flatMap((heightMm) => [fine(heightMm), SOUMAK]) });

describe('a cloth in layers', () => {
  it.each(['hanging', 'loom'] as const)('is the picture that is drawn in one (%s)', (as) => {
    const { layers, width, height, words } = layerCloth(wovenPiece(), { ...VIEW, as });
    const svg = writtenOut(drawCloth(wovenPiece(), { ...VIEW, as }));
    expect(svg).toContain(layers.filter(({ markup }) => markup !== '').map(markupOf).join(''));
    expect(svg).toContain(`aria-label="${words}"`);
    expect(svg).toMatch(new RegExp(`width="${String(width)}" height="${height.toFixed(1).replace('.0', '')}"`, 'u'));
  });

  it('needs no ids, so that a layer can be put in by itself', () => {
    for (const { markup } of layerCloth(wovenPiece(), VIEW).layers) expect(markup).not.toMatch(/\sid=|href=|url\(/u);
  });

  it('only moves the other bands when one is made higher', () => {
    const [before, after] = [layerCloth(striped(40, 40, 40), VIEW), layerCloth(striped(40, 47, 40), VIEW)];
    expect([0, 1, 3, 4, 5].map((band) => marksOf(after, band) === marksOf(before, band))).toEqual([true, true, true, true, true]);
    expect(marksOf(after, 2)).not.toBe(marksOf(before, 2));
    expect(placesOf(after).filter((y, at) => y !== placesOf(before)[at]).length).toBeGreaterThan(0);
  });

  it('leaves a tall piece as it is while a row is woven on', () => {
    const tall = (last: number): LayeredCloth => layerCloth(wovenPiece({ bands: [...Array.from({ length: 8 }, (_, at) => fine(110, at % 2 === 0 ? '#93a8a6' : '#a0664a')), fine(last)] }), VIEW);
    const [before, after] = [tall(110), tall(111)];
    expect(Array.from({ length: 8 }, (_, band) => marksOf(after, band) === marksOf(before, band))).toEqual(Array.from({ length: 8 }, () => true));
  });

  it('keeps the looks of a band that is moved, and of those it passes', () => {
    const [first, soumak, rya, last] = [fine(40), SOUMAK, { ...RYA, pileMm: 20 }, fine(60, '#a0664a')];
    const laid = (bands: readonly ClothBand[]): LayeredCloth => layerCloth(wovenPiece({ bands }), VIEW);
    const [before, after] = [laid([first, soumak, rya, last]), laid([first, rya, soumak, last])];
    expect([marksOf(after, 1), marksOf(after, 2)]).toEqual([marksOf(before, 2), marksOf(before, 1)]);
  });

  it('says the same whether it goes on from the last picture or begins anew', () => {
    const [first, second] = [striped(40, 40), striped(46, 40)];
    const last = layerCloth(first, VIEW);
    expect(layerCloth(second, VIEW, last)).toEqual(layerCloth(second, VIEW));
    expect(layerCloth({ ...first, warpColour: '#000000' }, VIEW, last)).toEqual(layerCloth({ ...first, warpColour: '#000000' }, VIEW));
    expect(layerCloth(first, { ...VIEW, as: 'loom' }, last)).toEqual(layerCloth(first, { ...VIEW, as: 'loom' }));
  });

  it('varies bands that are alike', () => {
    const drawn = layerCloth(wovenPiece({ bands: [fine(60), SOUMAK, fine(60)] }), VIEW);
    expect(marksOf(drawn, 2)).not.toBe(marksOf(drawn, 0));
  });
});
