import { describe, expect, it } from 'vitest';
import { FRAME, drawFrame } from '#core/captions/draw-frame.ts';
import { INPUT } from '../craft/figures/figure-input.ts';

const scene = { from: 0, to: 1, seconds: 4, caption: 'Over one, under the next.' } as const;
const words = { title: 'First <rows>', chapter: 'Two sheds & one stick' };

describe('a frame of a film', () => {
  it('names its chapter and its title, as words', () => {
    const svg = drawFrame({ ...scene, figure: 'tabby' }, 0.5, INPUT, words);
    expect(svg).toContain('First &#60;rows&#62;');
    expect(svg).toContain('Two sheds &#38; one stick');
  });

  it('keeps the picture between the title and the captions, whatever it shows', () => {
    for (const picture of [{ figure: 'rya-knot' }, { figure: 'shed-stick' }, { cloth: 'loom' }, { cloth: 'hanging' }] as const) {
      const svg = drawFrame({ ...scene, ...picture }, 1, INPUT, words);
      const [, x, y, width, height] = (/ x="([\d.]+)" y="([\d.]+)" width="([\d.]+)" height="([\d.]+)" fill="none"/.exec(svg) ?? []).map(Number);
      expect(x).toBeGreaterThanOrEqual(40);
      expect(y).toBeGreaterThanOrEqual(60);
      expect((x ?? 0) + (width ?? 999)).toBeLessThanOrEqual(FRAME.width - 39);
      expect((y ?? 0) + (height ?? 999)).toBeLessThanOrEqual(FRAME.height - 90);
    }
  });

  it('moves with the scene', () => {
    expect(drawFrame({ ...scene, cloth: 'loom' }, 0.2, INPUT, words)).not.toBe(drawFrame({ ...scene, cloth: 'loom' }, 0.8, INPUT, words));
  });
});
