import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { shade } from '#core/craft/cloth/colour.ts';
import type { ClothView } from '#core/craft/cloth/cloth-view.ts';
import { drawCloth } from '#core/craft/cloth/draw-cloth.ts';
import { cases } from '../../../../support/random-cases.ts';
import { CORDS, RYA, SOUMAK, WEDGES, wovenPiece } from './pieces.ts';

const VIEWS: readonly ClothView[] = [
  { id: 'card', as: 'hanging', width: 136 },
  { id: 'page', as: 'hanging', width: 456 },
  { id: 'large', as: 'hanging', width: 720 },
  { id: 'loom', as: 'loom', width: 400, woven: 0.6 },
  { id: 'strip', as: 'strip', width: 36, height: 560, woven: 0.4 },
  { id: 'lying', as: 'lying', width: 26, height: 358, woven: 0.4 },
  { id: 'swatch', as: 'swatch', width: 56, height: 44, decorative: true },
  { id: 'near', as: 'swatch', width: 920, height: 640, range: 'near', pxPerMm: 4, woven: 0.7 },
];

const size = (svg: string): { width: number; height: number } => {
  const [, width = '', height = ''] = /viewBox="0 0 ([\d.]+) ([\d.]+)"/.exec(svg) ?? [];
  return { width: Number(width), height: Number(height) };
};

describe('drawing a cloth', () => {
  it.each(VIEWS)('gives the same picture every time ($id)', (view) => {
    expect(drawCloth(wovenPiece(), view)).toBe(drawCloth(wovenPiece(), view));
  });

  it.each(VIEWS)('stays under 60 kB of markup ($id)', (view) => {
    expect(drawCloth(wovenPiece(), view).length).toBeLessThan(60 * 1024);
  });

  it.each(VIEWS)('holds no number that is not one, no style attribute and no script ($id)', (view) => {
    expect(drawCloth(wovenPiece(), view)).not.toMatch(/NaN|undefined|Infinity|\sstyle=|<script|\son\w+=/);
  });

  it.each(VIEWS)('uses only ids it defines, each once and under its own prefix ($id)', (view) => {
    const svg = drawCloth(wovenPiece(), view);
    const defined = [...svg.matchAll(/\sid="([^"]+)"/g)].map((found) => found[1]);
    const used = [...svg.matchAll(/(?:href="#|url\(#)([^")]+)/g)].map((found) => found[1]);
    expect(new Set(defined).size).toBe(defined.length);
    expect(defined.every((id) => id?.startsWith(`${view.id}-`))).toBe(true);
    expect(used.filter((id) => !defined.includes(id))).toEqual([]);
  });

  it('changes its chance with the seed, not its size', () => {
    const view: ClothView = { id: 'a', as: 'hanging', width: 300 };
    const one = drawCloth(wovenPiece({ seed: 1 }), view);
    const two = drawCloth(wovenPiece({ seed: 2 }), view);
    expect(two).not.toBe(one);
    expect(size(two)).toEqual(size(one));
  });

  it('refuses an id that could break out of its attribute', () => {
    expect(() => drawCloth(wovenPiece(), { id: 'a"><script>', as: 'swatch', width: 40 })).toThrow(RangeError);
  });

  it('refuses a picture narrower than 8 px or wider than 4000, and an id that is part of a longer word', () => {
    for (const width of [7.9, 4001, Number.NaN, -5]) expect(() => drawCloth(wovenPiece(), { id: 'a', as: 'swatch', width }), String(width)).toThrow(RangeError);
    for (const width of [8, 4000]) expect(() => drawCloth(CORDS, { id: 'a', as: 'swatch', width })).not.toThrow();
    expect(() => drawCloth(CORDS, { id: '1-a', as: 'swatch', width: 40 })).toThrow(RangeError);
  });

  it('keeps a name with signs of markup as words', () => {
    const svg = drawCloth(wovenPiece({ title: '"><script>alert(1)</script>' }), { id: 'a', as: 'hanging', width: 200 });
    expect(svg).not.toContain('<script');
    expect(svg).toContain('&#60;script&#62;');
  });
});

describe('a cloth that is still growing', () => {
  const view: ClothView = { id: 'a', as: 'loom', width: 400, woven: 0.5 };

  it('shows its fell between two edges, in classes that follow the page', () => {
    const svg = drawCloth(wovenPiece(), view);
    expect(svg).toMatch(/class="fell-edge"[^>]*stroke="#[0-9a-f]{6}"/);
    expect(svg).toMatch(/class="fell-line"[^>]*stroke="#[0-9a-f]{6}"/);
  });

  it('has no fell when it is finished, nor when the view says so', () => {
    expect(drawCloth(wovenPiece(), { ...view, woven: 1 })).not.toContain('fell-line');
    expect(drawCloth(wovenPiece(), { ...view, fell: false })).not.toContain('fell-line');
  });

  it('does not move the rows that are woven already', () => {
    const piece = wovenPiece({ bands: [WEDGES] });
    const ground = (woven: number): string | undefined => /<path id="a-0" d="([^"]+)"/.exec(drawCloth(piece, { ...view, woven }))?.[1];
    expect(ground(0.6)).toBe(ground(0.3));
  });

  it('shows bare warp and no cloth before the first row', () => {
    const svg = drawCloth(wovenPiece({ bands: [RYA, WEDGES] }), { ...view, woven: 0 });
    expect(svg).toContain('fell-line');
    expect(svg).not.toContain('#cdbb94');
  });

  it('moves the fell from the foot up on the loom and from the head down in a strip', () => {
    const fellAt = (v: ClothView): number => Number(/class="fell-line" d="M[-\d.]+ ([-\d.]+)H/.exec(drawCloth(wovenPiece({ bands: [WEDGES] }), v))?.[1]);
    expect(fellAt({ ...view, woven: 0.75 })).toBeLessThan(fellAt({ ...view, woven: 0.25 }));
    const strip: ClothView = { id: 's', as: 'strip', width: 40, height: 400 };
    expect(fellAt({ ...strip, woven: 0.75 })).toBe(300);
  });
});

describe('a shape of several areas in a row', () => {
  it('is drawn with all of them, and turns at both selvedges', () => {
    const spans = Array.from({ length: 8 }, (_, row) => [{ row, from: 0, to: 20 }, { row, from: 46, to: 66 }]).flat();
    const band = { ...WEDGES, heightMm: 60, picks: 8, shapes: [{ colour: '#7d854f', yarn: 'Samphire', spans }] };
    const svg = drawCloth(wovenPiece({ bands: [band] }), { id: 'a', as: 'swatch', width: 660, height: 90 });
    const kept = new RegExp(`href="#([^"]+)" stroke="${shade('#7d854f', 0.6)}"`).exec(svg)?.[1] ?? '';
    const stretches = new RegExp(`id="${kept}" d="([^"]+)"`).exec(svg)?.[1] ?? '';
    expect(stretches.match(/M/g)).toHaveLength(16);
    const arcs = new RegExp(`id="([^"]+)" d="(M1 [^"]*a[^"]*)"`).exec(svg)?.[2] ?? '';
    expect(arcs.match(/M1 /g)).toHaveLength(3);
    expect(arcs.match(/M659 /g)).toHaveLength(4);
  });
});

describe('basket weave', () => {
  const view: ClothView = { id: 'a', as: 'swatch', width: 400, height: 120 };
  const band = { ...WEDGES, shapes: [], picks: 6, heightMm: 60 };
  const repeats = (svg: string): Set<number> => new Set([...svg.matchAll(/stroke-dasharray="([\d.]+) ([\d.]+)"[^>]*stroke-linecap="round"/g)].map(([, on, off]) => Math.round(Number(on) + Number(off))));

  it('goes over two ends and under two, with two threads in every row', () => {
    const plain = drawCloth(wovenPiece({ ends: 20, bands: [band] }), view);
    const basket = drawCloth(wovenPiece({ ends: 20, bands: [{ ...band, together: 2, strands: 2 }] }), view);
    const [once] = repeats(plain);
    expect([...repeats(basket)]).toEqual([2 * (once ?? 0)]);
    const rows = (svg: string): number => (/<path id="a-0" d="([^"]+)"/.exec(svg)?.[1] ?? '').split('M').length - 1;
    expect(rows(basket)).toBe(2 * rows(plain));
  });
});

describe('the ways up of a cloth', () => {
  const hanging: ClothView = { id: 'a', as: 'hanging', width: 400 };
  const px = (400 - 24) / 400;

  it('makes room below for pile that hangs past the foot', () => {
    const short = size(drawCloth(wovenPiece({ bands: [{ ...RYA, pileMm: 60 }, WEDGES] }), hanging));
    const long = size(drawCloth(wovenPiece({ bands: [{ ...RYA, pileMm: 160 }, WEDGES] }), hanging));
    expect(long.height - short.height).toBeCloseTo(100 * px * 1.04, 0);
  });

  it('knots the ends of the warp below a foot without pile, once the piece is woven', () => {
    const bare = wovenPiece({ bands: [WEDGES] });
    const warp = new RegExp(`stroke="${shade('#d8d2c1', 0.5)}"`);
    expect(drawCloth(bare, hanging)).toMatch(warp);
    expect(drawCloth(bare, { ...hanging, woven: 0.5 })).not.toMatch(warp);
    expect(drawCloth(wovenPiece({ bands: [RYA, WEDGES] }), hanging)).not.toMatch(warp);
  });

  it('turns a turned piece through half a circle: what was left is right', () => {
    const view: ClothView = { id: 'a', as: 'hanging', width: 400 };
    const first = (turned: boolean): string => {
      const spans = Array.from({ length: 8 }, (_, row) => ({ row, from: 0, to: 20 }));
      const band = { ...WEDGES, heightMm: 30, picks: 8, shapes: [{ colour: '#7d854f', yarn: 'Samphire', spans }] };
      const svg = drawCloth(wovenPiece({ bands: [band], turned }), view);
      const kept = new RegExp(`href="#([^"]+)" stroke="${shade('#7d854f', 0.6)}"`).exec(svg)?.[1] ?? '';
      return new RegExp(`id="${kept}" d="([^"]+)"`).exec(svg)?.[1] ?? '';
    };
    expect(first(false)).toMatch(/^M0 /);
    expect(first(true)).toMatch(/^M2\d\d/);
  });

  it('gives a lying strip the length of its height', () => {
    expect(size(drawCloth(wovenPiece(), { id: 'a', as: 'lying', width: 26, height: 358 }))).toEqual({ width: 358, height: 26 });
  });

  it('draws the loom in its own proportions', () => {
    const { width, height } = size(drawCloth(wovenPiece({ bands: [SOUMAK] }), { id: 'a', as: 'loom', width: 400 }));
    expect(height / width).toBeCloseTo((700 * 360) / 480 / 400 + 0.07, 1);
  });

  it('draws a loom of which no measures are known about its cloth, with nails above and below', () => {
    const { width, height } = size(drawCloth(wovenPiece({ loom: undefined, bands: [SOUMAK] }), { id: 'a', as: 'loom', width: 400 }));
    expect(width).toBe(400);
    expect(height).toBeGreaterThan((60 / 400) * 400 * 0.83);
    expect(height).toBeLessThan(400);
  });

  it('draws pile without a broken number for rows that are lower than they can be seen', () => {
    const low = drawCloth(wovenPiece({ bands: [{ ...RYA, heightMm: 1, rows: 9 }, SOUMAK] }), { id: 'a', as: 'hanging', width: 136 });
    expect(low).not.toMatch(/NaN|Infinity|undefined/);
  });

  it('hangs knotted cords from the same dowel', () => {
    const svg = drawCloth(CORDS, { id: 'a', as: 'hanging', width: 150 });
    expect(svg).toContain('class="cord"');
    expect(svg.length).toBeLessThan(60 * 1024);
  });
});

describe('any piece a person may describe', () => {
  it('is drawn within the budget, whatever its numbers', () => {
    const number = (min: number, max: number) => fc.integer({ min, max });
    fc.assert(
      fc.property(number(4, 2000), number(20, 3000), number(1, 900), number(60, 720), fc.double({ min: 0, max: 1, noNaN: true }), (ends, widthMm, picks, width, woven) => {
        const bands = [{ ...WEDGES, picks, heightMm: picks * 1.5 }, RYA, SOUMAK];
        const piece = wovenPiece({ ends, widthMm, bands, loom: { insideWidthMm: widthMm + 60, insideHeightMm: picks * 1.5 + 300, bottomMm: 60 } });
        for (const as of ['hanging', 'loom', 'strip'] as const) {
          const height = as === 'strip' ? 400 : undefined;
          const svg = drawCloth(piece, { id: 'a', as, width: as === 'strip' ? 40 : width, woven, ...(height === undefined ? {} : { height }) });
          expect(svg).not.toMatch(/NaN|Infinity/);
          expect(svg.length).toBeLessThan(60 * 1024);
        }
      }),
      { numRuns: cases(60) },
    );
  });
});
