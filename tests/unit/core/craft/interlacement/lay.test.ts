import { describe, expect, test } from 'vitest';
import { basketRow, colourEnds, endsShown, hemStitch, loopRow, onFace, rovingRow, ryaKnot, soumakRow, tabbyFace, tabbyRow, twinedRow, type Lay } from '#core/craft/interlacement/lay.ts';
import { repeatWords } from '#core/craft/interlacement/lay-words.ts';

const TEN = { first: 0, last: 9 };

/** As one would write it down: F over these ends, B behind those, in the order of the hand. */
const written = (lay: Lay): string => lay.map(({ face, from, to }) => `${face === 'front' ? 'F' : 'B'}${String(from)}${from === to ? '' : `-${String(to)}`}`).join(' ');

describe('tabby', () => {
  test('goes over one end and under the next, and the row after it does the opposite', () => {
    expect(written(tabbyRow({ first: 0, last: 4 }, 0))).toBe('F0 B1 F2 B3 F4');
    expect(written(tabbyRow({ first: 0, last: 4 }, 1))).toBe('B4 F3 B2 F1 B0');
  });

  test('keeps step over colours that share a row: what one begins the next goes on', () => {
    const whole = tabbyRow(TEN, 3, 'right');
    expect([...tabbyRow({ first: 0, last: 3 }, 3, 'right'), ...tabbyRow({ first: 4, last: 9 }, 3, 'right')]).toEqual(whole);
  });

  test('the row below the first, where the spacer card lies, goes opposite to it at every end', () => {
    for (let end = 0; end < 10; end++) expect(tabbyFace(end, -1)).not.toBe(tabbyFace(end, 0));
  });
});

describe('the other techniques', () => {
  test('basket takes two ends as one, and a last single one by itself', () => {
    expect(written(basketRow({ first: 0, last: 4 }, 0))).toBe('F0-1 B2-3 F4');
    expect(written(basketRow({ first: 0, last: 3 }, 1, 2, 'right'))).toBe('B0-1 F2-3');
  });

  test('soumak goes forward over four and back under two, and gains two each time', () => {
    expect(written(soumakRow({ first: 0, last: 7 }, 4, 2))).toBe('F0-3 B3-2 F2-5 B5-4 F4-7 B7-6');
  });

  test('soumak to the left is the same in a mirror', () => {
    expect(written(soumakRow({ first: 0, last: 7 }, 4, 2, 'left'))).toBe('F7-4 B4-5 F5-2 B2-3 F3-0 B0-1');
  });

  test('soumak over an end too few makes its last stitch shorter', () => {
    expect(written(soumakRow({ first: 0, last: 6 }, 4, 2))).toBe('F0-3 B3-2 F2-5 B5-4 F4-6 B6-5');
    expect(() => soumakRow(TEN, 2, 2)).toThrow(RangeError);
  });

  test('a rya knot goes behind one leg, over both, behind the other, and out between them', () => {
    expect(written(ryaKnot(4, 1))).toBe('B4 F4-5 B5');
    expect(written(ryaKnot(0, 2))).toBe('B1-0 F0-3 B3-2');
  });

  test('twining has one strand in front and one behind at every end', () => {
    const [one, two] = twinedRow(TEN);
    one.forEach((pass, index) => expect([pass.face, two[index]?.face].sort()).toEqual(['back', 'front']));
  });

  test('twined in pairs the strands change places after every second end', () => {
    expect(twinedRow({ first: 0, last: 4 }, 2).map(written)).toEqual(['F0-1 B2-3 F4', 'B0-1 F2-3 B4']);
  });

  test('loops stand on the face only, never at a selvedge', () => {
    const raised = loopRow(TEN, 0).filter((pass) => pass.raised === 'loop');
    expect(raised.map(({ from }) => from)).toEqual([2, 4, 6, 8]);
    expect(loopRow(TEN, 1, 'right').filter((pass) => pass.raised === 'loop').map(({ from }) => from)).toEqual([1, 3, 5, 7]);
  });

  test('roving is puffed where it lies in front over its full number of ends', () => {
    expect(rovingRow(TEN, 4).map(({ raised }) => raised)).toEqual(['puff', undefined, undefined]);
    expect(written(rovingRow(TEN, 4))).toBe('F0-3 B4-7 F8-9');
  });

  test('a hem-stitch goes behind its bundle, round it and behind it again', () => {
    expect(written(hemStitch({ first: 2, last: 3 }))).toBe('B3-2 F2-3 B3-2');
  });

  test('dovetailed colours share the end they meet at; slit and interlocked ones do not', () => {
    expect(colourEnds(TEN, 5, 'slit').map(({ last }) => last)).toEqual([4, 9]);
    expect(colourEnds(TEN, 5, 'dovetail')).toEqual([{ first: 0, last: 5 }, { first: 5, last: 9 }]);
    expect(colourEnds(TEN, 5, 'interlock')[0]).toEqual({ first: 0, last: 4 });
  });

  test('of a shared end each row shows one colour, there and back in turns; together they always cover the row', () => {
    const shared = [0, 1, 2, 3, 4, 5, -1].map((row) => endsShown(TEN, 5, 'dovetail', row));
    expect(shared.map(([left]) => left.last)).toEqual([5, 5, 4, 4, 5, 5, 4]);
    expect(shared.map(([left, right]) => right.first - left.last)).toEqual(shared.map(() => 1));
    expect(endsShown(TEN, 5, 'slit', 0)).toEqual(colourEnds(TEN, 5, 'slit'));
  });

  test('what lies on one face is found in the order of the hand', () => {
    expect(written(onFace(soumakRow({ first: 0, last: 5 }, 4, 2), 'front'))).toBe('F0-3 F2-5');
  });
});

describe('a lay in words', () => {
  test.each([
    [tabbyRow(TEN, 0), 'over 1, under 1'],
    [tabbyRow(TEN, 1), 'over 1, under 1'],
    [basketRow(TEN, 0), 'over 2, under 2'],
    [soumakRow({ first: 0, last: 13 }, 4, 2), 'over 4, back under 2'],
    [soumakRow({ first: 0, last: 12 }, 4, 2), 'over 4, back under 2'],
    [rovingRow({ first: 0, last: 11 }, 3), 'over 3, under 3'],
    [ryaKnot(0, 1), 'under 1, back over 2, under 1'],
    [hemStitch({ first: 0, last: 1 }), 'under 2, back over 2, under 2'],
  ])('says what is repeated once', (lay, words) => {
    expect(repeatWords(lay)).toBe(words);
  });
});
