import { describe, expect, it } from 'vitest';
import { drawFigure } from '#core/craft/figures/draw-figure.ts';
import { FIGURE_KINDS, isFigureKind } from '#core/craft/figures/figure-kinds.ts';
import { stepAt, stepsOf } from '#core/craft/figures/figure-steps.ts';
import { shapeColours } from '#core/craft/figures/yarns.ts';
import type { FrameLoomPiece } from '#core/craft/piece.ts';
import { figureWords } from '#core/craft/figures/figures.ts';
import { pieceWith, planOf, PLAIN_PIECE } from '../a-piece.ts';
import { cases } from '../../../../support/random-cases.ts';
import { INPUT, PIECE } from './figure-input.ts';

const wordsIn = (svg: string): string => [...svg.matchAll(/<text[^>]*>([^<]*)</g)].map((found) => found[1]).join(' | ');

describe.each(FIGURE_KINDS)('the figure "%s"', (kind) => {
  it('is drawn at every moment of its movement without a broken number, a style or a script', () => {
    const steps = cases(20);
    for (let step = 0; step <= steps; step++) {
      const svg = drawFigure(kind, INPUT, step / steps);
      expect(svg).not.toMatch(/NaN|undefined|Infinity|\sstyle=|<script|\son\w+=/);
      expect(svg.length).toBeLessThan(60 * 1024);
    }
  });

  it('grows: the end shows more than the beginning', () => {
    expect(drawFigure(kind, INPUT, 1).length).toBeGreaterThan(drawFigure(kind, INPUT, 0).length);
  });

  it('is told in steps that follow each other to its end, each with words and a drawing of its own', () => {
    const steps = stepsOf(kind, INPUT);
    expect(steps.at(-1)?.until).toBe(1);
    let before = 0;
    let drawn = drawFigure(kind, INPUT, 0);
    steps.forEach(({ words, until }, index) => {
      expect(words).toMatch(/^[A-Z][^]*\.$/u);
      expect(until).toBeGreaterThan(before);
      const now = drawFigure(kind, INPUT, until);
      expect(now).not.toBe(drawn);
      expect(stepAt(steps, until)).toBe(index);
      expect(stepAt(steps, (before + until) / 2)).toBe(index);
      [before, drawn] = [until, now];
    });
  });

  it('is the same every time', () => {
    expect(drawFigure(kind, INPUT, 0.6)).toBe(drawFigure(kind, INPUT, 0.6));
  });

  it('says in words what it shows', () => {
    expect(figureWords(kind, INPUT)).toMatch(/^[A-Z\d].{40,}\.$/s);
    expect(drawFigure(kind, INPUT)).toContain('role="img" aria-label="');
    expect(drawFigure(kind, INPUT, 1, { decorative: true })).toContain('aria-hidden="true"');
  });

  it('stands in this person\'s own units', () => {
    const metric = figureWords(kind, INPUT) + wordsIn(drawFigure(kind, INPUT));
    const imperial = figureWords(kind, { ...INPUT, units: 'in' }) + wordsIn(drawFigure(kind, { ...INPUT, units: 'in' }));
    expect(imperial).not.toMatch(/\d\s?(mm|cm)\b/);
    if (/\d\s?(mm|cm)\b/.test(metric)) expect(imperial).toMatch(/\d\s(in|oz)\b/);
  });

  it.each([
    ['doubled ends along two nails, no dowel and yarns without colours', { warp: { yarn: { tex: 400 }, endsTogether: 2 }, loom: { ...PLAIN_PIECE.loom, warping: 'two-nail' } }],
    ['every second nail and a dowel', { loom: { ...PLAIN_PIECE.loom, nailPitchMm: 5, everyNthNail: 2 }, dowel: { diameterMm: 12 } }],
  ] as const)('shows a piece with %s as well', (_, parts) => {
    const piece = pieceWith(parts);
    const input = { piece, plan: planOf(piece), units: 'cm' } as const;
    for (const progress of [0, 0.5, 1]) expect(drawFigure(kind, input, progress)).not.toMatch(/NaN|undefined|Infinity/);
    expect(figureWords(kind, input)).not.toMatch(/NaN|undefined|Infinity/);
    for (const { words } of stepsOf(kind, input)) expect(words).not.toMatch(/NaN|undefined|Infinity/);
  });

  it('does without a technique the piece does not use', () => {
    const bare = { ...INPUT, piece: { ...PIECE, bands: [], yarns: {} }, plan: { ...INPUT.plan, bands: [], yarns: {} } };
    expect(drawFigure(kind, bare)).not.toMatch(/NaN|undefined|Infinity/);
  });
});

describe('figures', () => {
  it('carry the amounts of the plan', () => {
    expect(wordsIn(drawFigure('warping', INPUT))).toContain('62 ends: 32 nails above, 31 below');
    expect(wordsIn(drawFigure('spacer-card', INPUT))).toContain('32.5\u00a0cm');
    expect(figureWords('card-width', INPUT)).toContain('36.5\u00a0cm');
    expect(figureWords('soumak', INPUT)).toContain('over 4 ends and back under 2');
  });

  it('tell how often a hand winds a butterfly round, in the person’s own units', () => {
    // 8 m over a hand of 16 cm, there and back: 25 eights; half of it in 13.
    expect(figureWords('butterfly', INPUT)).toContain('A hand that spans 16\u00a0cm winds 8\u00a0m in 25 of them.');
    expect(figureWords('butterfly', { ...INPUT, piece: { ...PIECE, allowances: { loadMm: 4000 } } })).toContain('winds 4\u00a0m in 13 of them.');
  });

  it('follow the loom: two neighbouring nails are wound otherwise than every nail', () => {
    const twoNail = { ...INPUT, piece: { ...PIECE, loom: { ...PIECE.loom, warping: 'two-nail' as const } } };
    expect(drawFigure('warping', twoNail)).not.toBe(drawFigure('warping', INPUT));
  });

  it('bring a ground of their own when they stand alone', () => {
    expect(drawFigure('tabby', INPUT, 1, { standalone: true })).toContain('><path d="M0 0H560V270H0z" fill="#f0f3f2"/>');
    expect(drawFigure('tabby', INPUT, 1)).not.toContain('M0 0H560V270');
  });

  it('count progress outside of 0 to 1 as its nearer end', () => {
    expect(drawFigure('tabby', INPUT, 7)).toBe(drawFigure('tabby', INPUT, 1));
    expect(drawFigure('tabby', INPUT, -1)).toBe(drawFigure('tabby', INPUT, 0));
  });

  it('take the colours of the first shapes there are, and of the yarns they are woven in', () => {
    const shaped = (...shapes: readonly string[]): FrameLoomPiece['bands'][number] => ({
      technique: 'tabby', yarn: 'ridge', heightMm: 60, ...(shapes.length === 0 ? {} : { shapes: shapes.map((yarn) => ({ shape: 'triangle', yarn, baseMm: 50, heightMm: 40 })) }),
    });
    const colours = (...bands: FrameLoomPiece['bands']): string[] => Object.values(shapeColours({ ...INPUT, piece: { ...PIECE, bands } }));
    expect(colours(shaped(), shaped('sand', 'foam'), shaped('ground'))).toEqual(['#2f5366', '#cdbb94', '#e6e4d8']);
    expect(colours(shaped('foam'))).toEqual(['#2f5366', '#e6e4d8', '#e6e4d8']);
    // Without shapes, and in yarns nobody has, in plain colours.
    expect(colours(shaped())).toEqual(['#93a8a6', '#cdbb94', '#7d854f']);
    expect(colours(shaped('toString', 'gold'))).toEqual(['#2f5366', '#cdbb94', '#7d854f']);
  });

  it('show how high the pile of loops stands by their rod, or as it is said', () => {
    const loops = (measure: object): string => {
      const band = { technique: 'loop-pile', yarn: 'foam', rows: 3, heightMm: 12, ...measure } as FrameLoomPiece['bands'][number];
      return figureWords('loop-pile', { ...INPUT, piece: { ...PIECE, bands: [band] } }) + wordsIn(drawFigure('loop-pile', { ...INPUT, piece: { ...PIECE, bands: [band] } }));
    };
    // Half round a rod of 10 mm: 15.7 mm.
    expect(loops({ rodMm: 10 })).toContain('16\u00a0mm');
    expect(loops({ loopMm: 20 })).toContain('20\u00a0mm');
  });

  it('are known by their names only', () => {
    expect(isFigureKind('rya-knot')).toBe(true);
    expect(isFigureKind('constructor')).toBe(false);
  });
});
