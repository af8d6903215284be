import { describe, expect, it } from 'vitest';
import { shapeSpans } from '#core/craft/cloth/shape-spans.ts';

const grid = { spacingMm: 5, pickSpacingMm: 1.445624, ends: 62, picks: 104 };

describe('the ends a shape takes', () => {
  // The worked triangle: base 150 mm, height 100 mm, symmetric, even ends; its rows and widths were counted by hand.
  it('steps a symmetric triangle from 30 ends to none in 69 rows', () => {
    const spans = shapeSpans({ shape: 'triangle', yarn: 'T', baseMm: 150, heightMm: 100, symmetric: true }, grid);
    const widths = spans.map((span) => span.to - span.from);
    expect(widths.slice(0, 8)).toEqual([30, 30, 28, 28, 28, 28, 28, 26]);
    expect(widths.reduce((sum, width) => sum + width, 0)).toBe(1038);
    expect(spans.length).toBe(67);
    expect(spans.every((span) => span.from + span.to === 62)).toBe(true);
  });

  it('leans towards the right when asked', () => {
    const spans = shapeSpans({ shape: 'triangle', yarn: 'T', baseMm: 150, heightMm: 100, leanMm: 50 }, grid);
    const middle = (at: number): number => ((spans.at(at)?.from ?? 0) + (spans.at(at)?.to ?? 0)) / 2;
    expect(middle(-1) - middle(0)).toBeGreaterThan(8);
  });

  it('begins where its bottom lies and ends with the band', () => {
    const spans = shapeSpans({ shape: 'rectangle', yarn: 'T', baseMm: 50, heightMm: 500, bottomMm: 100 }, grid);
    expect(spans[0]?.row).toBe(69);
    expect(spans.at(-1)?.row).toBe(103);
  });

  it('stays between the selvedges', () => {
    const spans = shapeSpans({ shape: 'circle', yarn: 'T', radiusMm: 60, centreMm: 10 }, grid);
    expect(Math.min(...spans.map((span) => span.from))).toBe(0);
    expect(Math.max(...spans.map((span) => span.to))).toBeLessThanOrEqual(62);
  });
});
