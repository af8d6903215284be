import { experimental_AstroContainer as AstroContainer } from 'astro/container';
import { JSDOM } from 'jsdom';
import { beforeAll, describe, expect, test } from 'vitest';
import Cloth from '#components/cloth/Cloth.astro';
import ClothLying from '#components/cloth/ClothLying.astro';
import FellStrip from '#components/cloth/FellStrip.astro';
import Swatch from '#components/cloth/Swatch.astro';
import TechniqueFigure from '#components/cloth/TechniqueFigure.astro';
import { spreadOverParts } from '#core/craft/cloth/parts-strip.ts';
import { INPUT } from '../../unit/core/craft/figures/figure-input.ts';
import { wovenPiece } from '../../unit/core/craft/cloth/pieces.ts';

let container: AstroContainer;
beforeAll(async () => {
  container = await AstroContainer.create();
});

async function draw(component: Parameters<AstroContainer['renderToString']>[0], props: Record<string, unknown>): Promise<Document> {
  return new JSDOM(await container.renderToString(component, { props })).window.document;
}

const piece = wovenPiece();
const parts = spreadOverParts(piece, 7);

describe('the cloth in a page', () => {
  test('is a picture with words, drawn on the server', async () => {
    const page = await draw(Cloth, { piece, view: { id: 'a', as: 'hanging', width: 200 } });
    expect(page.querySelector('div.cloth > svg[role="img"]')?.getAttribute('aria-label')).toMatch(/^Low Tide, wall hanging/);
    expect(page.querySelector('script')).toBeNull();
  });

  test('stands with its caption as one figure', async () => {
    const page = await draw(Cloth, { piece, view: { id: 'a', as: 'hanging', width: 200 }, caption: "Ilse's pattern piece" });
    expect(page.querySelector('figure.cloth figcaption')?.textContent).toBe("Ilse's pattern piece");
  });

  test('runs beside its list of parts with the fell where the student is', async () => {
    const page = await draw(FellStrip, { id: 's', piece, parts, done: 3.5, height: 420 });
    expect(page.querySelector('.strip svg')?.getAttribute('aria-hidden')).toBe('true');
    expect(page.querySelector('.fell-line')?.getAttribute('d')).toMatch(/^M[-\d.]+ 210H/);
  });

  test('has no fell when all parts are done', async () => {
    expect((await draw(FellStrip, { id: 's', piece, parts, height: 420 })).querySelector('.fell-line')).toBeNull();
  });

  test('lies from left to right on a phone, with words where none stand beside it', async () => {
    const page = await draw(ClothLying, { id: 'l', piece, parts, done: 1, length: 300, label: 'Part 2 of 7' });
    expect(page.querySelector('.lying svg')?.getAttribute('viewBox')).toBe('0 0 300 26');
    expect(page.querySelector('.lying svg')?.getAttribute('aria-label')).toBe('Part 2 of 7');
  });

  test('shows a band or a yarn as a patch that screen readers pass by', async () => {
    for (const props of [{ id: 'b', piece, band: 4 }, { id: 'y', colour: '#2f5366' }]) {
      expect((await draw(Swatch, props)).querySelector('.swatch svg[aria-hidden="true"]')).not.toBeNull();
    }
  });
});

describe('a technique in a page', () => {
  test('says once what it shows: under the drawing, or in the drawing under the words of a teacher', async () => {
    const own = await draw(TechniqueFigure, { id: 't', kind: 'soumak', input: INPUT });
    expect(own.querySelector('svg')?.getAttribute('aria-hidden')).toBe('true');
    expect(own.querySelector('figcaption')?.textContent).toContain('over 4 ends and back under 2');
    const told = await draw(TechniqueFigure, { id: 't', kind: 'soumak', input: INPUT, caption: 'Four over, two back.' });
    expect(told.querySelector('svg')?.getAttribute('aria-label')).toContain('over 4 ends and back under 2');
    expect(told.querySelector('figcaption')?.textContent).toBe('Four over, two back.');
  });
});
