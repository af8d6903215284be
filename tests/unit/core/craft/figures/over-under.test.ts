/** What a weaver checks in a drawing: over and under, from row to row, and where a thread turns. */
import { describe, expect, it } from 'vitest';
import { drawFigure } from '#core/craft/figures/draw-figure.ts';
import { layRuns, twinedRuns } from '#core/craft/figures/kit/lay-runs.ts';
import { handWay, measure, measureBeside, words } from '#core/craft/figures/kit/marks.ts';
import { layField, rowRuns } from '#core/craft/figures/kit/rows.ts';
import { LEVEL, Scene } from '#core/craft/figures/kit/scene.ts';
import { eased, stageOf, stages } from '#core/craft/figures/kit/stages.ts';
import { layStrand, toPath, type Run } from '#core/craft/figures/kit/strand.ts';
import { cutAt, heading, lengthOf, trail, type Point } from '#core/craft/figures/kit/trail.ts';
import { endX, type WarpLines } from '#core/craft/figures/kit/warp.ts';
import { soumakRow, tabbyRow, twillRow } from '#core/craft/interlacement/lay.ts';
import { marksOf } from '../../../../support/kept.ts';
import { INPUT } from './figure-input.ts';

/** Six ends, 20 px apart, from 100 on. */
const WARP: WarpLines = { x: 100, step: 20, count: 6, top: 0, bottom: 200 };
const ENDS = { first: 0, last: 5 };

const faces = (runs: readonly Run[]): string => runs.map(({ level }) => (level === LEVEL.front ? 'F' : level === LEVEL.behind ? 'B' : '?')).join('');
const spans = (runs: readonly Run[]): string => runs.map(({ points }) => `${String(points[0]?.x)}–${String(points.at(-1)?.x)}`).join(' ');
const ys = (points: readonly Point[] = []): number[] => points.map(({ y }) => y);

describe('a row of tabby', () => {
  it('lies over one end and under the next, and changes sides half-way between them', () => {
    const runs = layRuns(WARP, { lay: tabbyRow(ENDS, 0, 'right'), y: 50 });
    expect(faces(runs)).toBe('FBFBFB');
    expect(spans(runs)).toBe('90–110 110–130 130–150 150–170 170–190 190–210');
    for (const { points } of runs) expect(ys(points)).toEqual([50, 50]);
  });

  it('does the opposite in the next row, from the other side', () => {
    const runs = layRuns(WARP, { lay: tabbyRow(ENDS, 1, 'left'), y: 30, out: 18 });
    // From the right: over the last end, as the row below went under it.
    expect(faces(runs)).toBe('FBFBFB');
    expect(spans(runs)).toBe('218–190 190–170 170–150 150–130 130–110 110–82');
  });

  it('laid in hills rises from its line and comes down to it', () => {
    const [first] = layRuns(WARP, { lay: tabbyRow(ENDS, 0, 'right'), y: 50, rise: (x) => x - 90 });
    expect(first?.points).toHaveLength(7);
    expect(ys(first?.points)[0]).toBe(50);
    expect(ys(first?.points).at(-1)).toBe(30);
    expect(first?.points[3]).toEqual({ x: 100, y: 40 });
  });
});

describe('rows after each other', () => {
  const two = rowRuns(WARP, [{ lay: tabbyRow(ENDS, 0, 'right'), y: 50 }, { lay: tabbyRow(ENDS, 1, 'left'), y: 30 }]);

  it('are one thread: the turn lies behind, past the last end, and joins them', () => {
    expect(faces(two)).toBe('FBFBFBBFBFBFB');
    const turn = two[6]?.points ?? [];
    expect([turn[0], turn.at(-1)]).toEqual([{ x: 210, y: 50 }, { x: 210, y: 30 }]);
    // Out by nine twentieths of the way from row to row: a bow of three quarters of that.
    expect(Math.max(...turn.map(({ x }) => x))).toBeCloseTo(210 + 0.75 * 9, 0);
    expect(Math.min(...turn.map(({ x }) => x))).toBe(210);
  });

  it('turn to the left where the row below ended at the left, at least five px out', () => {
    const runs = rowRuns(WARP, [{ lay: tabbyRow(ENDS, 0, 'left'), y: 50 }, { lay: tabbyRow(ENDS, 1, 'right'), y: 46 }]);
    const xs = (runs[6]?.points ?? []).map(({ x }) => x);
    expect(Math.max(...xs)).toBe(90);
    expect(Math.min(...xs)).toBeCloseTo(90 - 0.75 * 5, 0);
  });

  it('of plain cloth are as many as were asked, as far apart as was asked, from the lowest up', () => {
    const scene = new Scene('a');
    const tip = layField(scene, WARP, { colour: '#123456', width: 8, bottom: 180, pitch: 12, rows: 4, first: 0, last: 5, out: 4 });
    // Four rows: right, left, right, left; the last one ends 36 px higher, at the left.
    expect(tip?.at).toEqual({ x: 96, y: 180 - 36 });
    expect(tip?.towards).toEqual({ x: -1, y: 0 });
    const rows = new Set(marksOf(scene.markup()).flatMap((mark) => /d=M[\d.]+ ([\d.]+)L[\d.]+ \1 stroke/u.exec(mark)?.[1] ?? []));
    expect([...rows].map(Number).sort((a, b) => a - b)).toEqual([144, 156, 168, 180]);
    // From the right end to the left one, the first row runs to the left.
    expect(layField(new Scene('b'), WARP, { colour: '#123456', width: 8, bottom: 180, pitch: 12, rows: 1, first: 5, last: 0 })?.at).toEqual({ x: 90, y: 180 });
    expect(layField(new Scene('c'), WARP, { colour: '#123456', width: 8, bottom: 180, pitch: 12, rows: 1, first: 1, last: 4, share: 0.5 })?.at).toEqual({ x: 150, y: 180 });
  });
});

describe('other ways through the warp', () => {
  it('twill lies over two ends and under two, one end further to the right in each row, and begins again after four', () => {
    const front = (row: number): number[] => twillRow({ first: 0, last: 11 }, row, 'right').flatMap(({ face, from, to }) => (face === 'front' ? Array.from({ length: to - from + 1 }, (_, end) => from + end) : []));
    expect(front(0)).toEqual([0, 1, 4, 5, 8, 9]);
    expect(front(1)).toEqual([1, 2, 5, 6, 9, 10]);
    expect(front(2)).toEqual([2, 3, 6, 7, 10, 11]);
    expect(front(3)).toEqual([0, 3, 4, 7, 8, 11]);
    expect(front(4)).toEqual(front(0));
    // To the left it is the same cloth, passed from the other side.
    expect(twillRow({ first: 0, last: 11 }, 1, 'left').map(({ face, from, to }) => [face, to, from]).reverse()).toEqual(twillRow({ first: 0, last: 11 }, 1, 'right').map(({ face, from, to }) => [face, from, to]));
  });

  it('soumak lies over four ends in front and comes back under two behind', () => {
    const runs = layRuns(WARP, { lay: soumakRow(ENDS, 4, 2), y: 100, lean: 6, out: 10 });
    expect(faces(runs)).toBe('FBFB');
    // Over ends 0 to 3, round end 3, back behind 3 and 2; over 2 to 5, back behind 5 and 4.
    expect(runs.map(({ points }) => Math.round(points.at(-1)?.x ?? 0))).toEqual([170, 130, 210, 170]);
    // Each stitch begins above its row and ends below it.
    const [stitch, back] = runs;
    expect(stitch?.points[0]?.y).toBe(94);
    expect(stitch?.points.at(-1)?.y).toBe(106);
    expect(back?.points[0]).toEqual(stitch?.points.at(-1));
    expect(back?.points.at(-1)?.y).toBe(94);
    // Round the end: beyond it before it turns.
    expect(Math.max(...(back?.points ?? []).map(({ x }) => x))).toBeGreaterThan(170);
  });

  it('twining has one strand in front and one behind at every end, and both cross in every gap', () => {
    const [one, two] = twinedRuns(WARP, 60, 9);
    expect([faces(one), faces(two)]).toEqual(['FBFBFB', 'BFBFBF']);
    one.forEach(({ points }, index) => {
      const other = two[index]?.points ?? [];
      expect([points[0]?.x, points.at(-1)?.x]).toEqual([endX(WARP, index) - 10, endX(WARP, index) + 10]);
      // They begin nine px above and below, and have changed places at the other side.
      expect(((points[0]?.y ?? 0) - 60) * ((other[0]?.y ?? 0) - 60)).toBe(-81);
      expect(points.at(-1)?.y).toBeCloseTo(120 - (points[0]?.y ?? 0), 9);
      expect(points.at(-1)?.y).toBeCloseTo(index + 1 < one.length ? (one[index + 1]?.points[0]?.y ?? 0) : 120 - (points[0]?.y ?? 0), 9);
    });
  });

  it.each(['tabby', 'soumak', 'twining'] as const)('in the finished figure of %s no thread lies on the warp’s own level', (kind) => {
    const marks = marksOf(drawFigure(kind, INPUT));
    const warp = marks.findIndex((mark) => /d=(?:M[\d.]+ [\d.]+V[\d.]+){6,}/u.test(mark));
    const weft = (from: number, to: number): number => marks.slice(from, to).filter((mark) => /^path class=draw-edge d=M[\d.]+ [\d.]+L/u.test(mark)).length;
    expect(warp).toBeGreaterThan(0);
    expect(weft(0, warp)).toBeGreaterThan(5);
    expect(weft(warp + 2, marks.length)).toBeGreaterThan(5);
  });
});

describe('a strand', () => {
  const runs: Run[] = [{ level: LEVEL.front, points: trail(0, 0).to(10, 0).points }, { level: LEVEL.behind, points: trail(10, 0).to(10, 30).points, colour: '#222222' }];
  const strand = { colour: '#aabbcc', width: 6, runs };
  const drawn = (share?: number): string[] => {
    const scene = new Scene('a');
    layStrand(scene, strand, share);
    return marksOf(scene.markup());
  };

  it('is drawn as far as it has come, and says where its tip is and where it is heading', () => {
    expect(layStrand(new Scene('a'), strand, 0.5)).toEqual({ at: { x: 10, y: 10 }, towards: { x: 0, y: 1 }, level: LEVEL.behind });
    expect(layStrand(new Scene('a'), strand, 0.25)).toEqual({ at: { x: 10, y: 0 }, towards: { x: 1, y: 0 }, level: LEVEL.front });
    expect(layStrand(new Scene('a'), strand)).toMatchObject({ at: { x: 10, y: 30 } });
    expect(layStrand(new Scene('a'), strand, 0)).toBeUndefined();
    expect(drawn(0)).toEqual([]);
  });

  it('has an outline 1.4 px wider on both sides, round ends, and a core a hair longer than its stretch', () => {
    expect(drawn(0.25)).toEqual([
      'path class=draw-edge d=M0 0h.01 stroke=#111e33 stroke-width=8.8 stroke-linecap=round', 'path d=M0 0h.01 stroke=#aabbcc stroke-width=6 stroke-linecap=round',
      'path class=draw-edge d=M10 0h.01 stroke=#111e33 stroke-width=8.8 stroke-linecap=round', 'path d=M10 0h.01 stroke=#aabbcc stroke-width=6 stroke-linecap=round',
      'path class=draw-edge d=M0 0L10 0 stroke=#111e33 stroke-width=8.8', 'path d=M-.7 0L10.7 0 stroke=#aabbcc stroke-width=6',
    ]);
    // What lies behind is drawn first, in its own colour where it has one.
    expect(drawn().filter((mark) => !mark.includes('h.01'))).toEqual([
      'path class=draw-edge d=M10 0L10 30 stroke=#111e33 stroke-width=8.8', 'path d=M10 -.7L10 30.7 stroke=#222222 stroke-width=6',
      'path class=draw-edge d=M0 0L10 0 stroke=#111e33 stroke-width=8.8', 'path d=M-.7 0L10.7 0 stroke=#aabbcc stroke-width=6',
    ]);
  });
});

describe('a way', () => {
  it('bends half-way towards what draws it, and curves between two of them', () => {
    const [bent, curved] = [trail(0, 0).bend(10, 20, 20, 0).points, trail(0, 0).curve(0, 12, 20, 12, 20, 0).points];
    expect([bent.length, curved.length]).toEqual([11, 11]);
    expect(bent[5]).toEqual({ x: 10, y: 10 });
    expect(bent[10]).toEqual({ x: 20, y: 0 });
    expect(curved[5]?.x).toBeCloseTo(10, 12);
    expect(curved[5]?.y).toBeCloseTo(9, 12);
    // A tenth of the way a curve has hardly left the way it set out on.
    expect(curved[1]?.x).toBeCloseTo(0.56, 9);
    expect(curved[1]?.y).toBeCloseTo(3.24, 9);
  });

  it('goes round in quarters: right, down, left, up', () => {
    const quarter = trail(10, 0).round(0, 0, 10, 0, 1).points;
    expect(quarter.at(-1)?.x).toBeCloseTo(0, 9);
    expect(quarter.at(-1)?.y).toBeCloseTo(10, 9);
    // Six steps to a quarter, at least four, and where it set out.
    expect([quarter.length, trail(10, 0).round(0, 0, 10, 1, 3).points.length, trail(10, 0).round(0, 0, 10, 0, 0.1).points.length]).toEqual([8, 14, 6]);
    for (const { x, y } of quarter) expect(Math.hypot(x, y)).toBeCloseTo(10, 9);
  });

  it('is measured, cut and headed by its points', () => {
    expect(lengthOf(trail(0, 0).to(3, 4).to(3, 10).points)).toBe(11);
    expect(lengthOf([])).toBe(0);
    expect(cutAt(trail(0, 0).to(0, 0).to(10, 0).points, 4)).toEqual([{ x: 0, y: 0 }, { x: 0, y: 0 }, { x: 4, y: 0 }]);
    expect(cutAt(trail(0, 0).to(10, 0).points, 0)).toEqual([{ x: 0, y: 0 }, { x: 0, y: 0 }]);
    // A step of half a pixel says nothing of the direction; the one before it does.
    expect(heading(trail(0, 0).to(10, 0).to(10, 0.4).points).x).toBeCloseTo(1, 2);
    expect(heading(trail(0, 0).to(0.2, 0.2).points)).toEqual({ x: 1, y: 0 });
    expect(toPath(trail(1, 2).to(3.04, 4.06).points)).toBe('M1 2L3 4.1');
  });
});

describe('movements', () => {
  it('never come further than done, and a hand begins and ends slowly', () => {
    expect(stages(2, [1, 1])).toEqual([1, 1]);
    expect(stages(-1, [1, 1])).toEqual([0, 0]);
    expect(stages(0.5, [1, 2, 1])).toEqual([1, 0.5, 0]);
    expect([stageOf(0.5, 3, 4), stageOf(1, 0, 4)]).toEqual([0, 1]);
    expect([0, 0.25, 0.5, 0.75, 1].map(eased)).toEqual([0, 0.15625, 0.5, 0.84375, 1]);
  });

  it('are shown by a dotted way with a head, once the hand has begun', () => {
    const shown = (share?: number): string[] => {
      const scene = new Scene('a');
      handWay(scene, trail(0, 0).to(100, 0).points, share);
      return marksOf(scene.markup());
    };
    expect(shown(0.02)).toEqual([]);
    expect(shown(0.5)[0]).toContain('d=M0 0L50 0 ');
    // The head: 12 px long, half a radian to either side.
    expect(shown()[1]).toContain('d=M89.5 -5.8L100 0L89.5 5.8 ');
  });
});

describe('a measure', () => {
  const marks = (draw: (scene: Scene) => void): string[] => {
    const scene = new Scene('a');
    draw(scene);
    return marksOf(scene.markup());
  };
  const at = (found: readonly string[], text: string): RegExpExecArray | null => /x=([-\d.]+) y=([-\d.]+)/u.exec(found.find((mark) => mark.endsWith(` ${text}`)) ?? '');

  it('has a stroke at both ends and its words in the middle, on a patch of the ground', () => {
    const lying = marks((scene) => { measure(scene, { x: 0, y: 50 }, { x: 200, y: 50 }, '20 cm'); });
    expect(lying[0]).toContain('d=M0 50L200 50M0 42v16M200 42v16 ');
    expect(at(lying, '20 cm')?.slice(1)).toEqual(['100', '56']);
    // 5 signs of 0.56 × 18 px, and 14 px of room: 64.4 px wide.
    expect(lying[1]).toContain('d=M67.8 37.6h64.4v25.9h-64.4z');
    const standing = marks((scene) => { measure(scene, { x: 50, y: 0 }, { x: 50, y: 100 }, '10 cm'); });
    expect(standing[0]).toContain('d=M50 0L50 100M42 0h16M42 100h16 ');
    expect(at(standing, '10 cm')?.slice(1)).toEqual(['50', '56']);
  });

  it('too short for its words has them above it, and one beside it has them where they were put', () => {
    expect(at(marks((scene) => { measure(scene, { x: 0, y: 50 }, { x: 72, y: 50 }, '20 cm'); }), '20 cm')?.slice(1)).toEqual(['36', '38']);
    expect(at(marks((scene) => { measure(scene, { x: 0, y: 50 }, { x: 73, y: 50 }, '20 cm'); }), '20 cm')?.slice(1)).toEqual(['36.5', '56']);
    const beside = marks((scene) => { measureBeside(scene, { x: 0, y: 0 }, { x: 0, y: 9 }, '3 mm', { x: 20, y: 8 }); });
    expect(at(beside, '3 mm')?.slice(1)).toEqual(['20', '8']);
    expect(beside[0]).toContain('M-8 0h16M-8 9h16');
    expect(marks((scene) => { measureBeside(scene, { x: 0, y: 0 }, { x: 9, y: 0 }, '3 mm', { x: 20, y: 8 }, 'end'); })[0]).toContain('M0 -8v16M9 -8v16');
  });

  it('has a patch as wide as its words, wherever they are anchored', () => {
    const left = (anchor: 'start' | 'middle' | 'end'): number => Number(/d=M([-\d.]+)/u.exec(marks((scene) => { words(scene, 100, 50, '20 cm', { anchor, patch: true }); })[0] ?? '')?.[1]);
    expect([left('start'), left('middle'), left('end')]).toEqual([93, 67.8, 42.6]);
    expect(marks((scene) => { words(scene, 100, 50, 'a < b', { quiet: true }); })).toEqual([expect.stringMatching(/font-size=18 font-weight=400 text-anchor=start .* a &#60; b$/u)]);
  });
});
