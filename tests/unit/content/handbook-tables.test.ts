// The handbook's tables say what is printed elsewhere, and what the trade knows.
import { expect, test } from 'vitest';
import { tableNamed, type TableName } from '#components/handbook/tables.ts';
import { planPiece } from '#core/craft/plan.ts';

function rowOf(name: TableName, first: string): readonly string[] {
  const row = tableNamed(name).rows.find(([head]) => head === first);
  if (row === undefined) throw new Error(`no row ${first}`);
  return row.slice(1);
}

test.each<TableName>(['count-constants', 'yarn-counts', 'wraps', 'spacings', 'weft-for-spacing', 'take-up', 'soumak-yarn', 'rya-lengths', 'paces', 'balanced-setts', 'setts', 'cords', 'fringe-warp', 'rods', 'cord-pull', 'slopes', 'beats', 'loops', 'roving-puff', 'twined-yarn', 'butterflies'])('every row of %s fills every column', (name) => {
  const table = tableNamed(name);
  expect(table.rows.length).toBeGreaterThan(3);
  for (const row of table.rows) {
    expect(row).toHaveLength(table.columns.length);
    for (const cell of row) expect(cell).not.toMatch(/NaN|Infinity|undefined|^$/u);
  }
});

// ASTM D2260 prints 590.541, 885.812 and 1653.52; a sheet on Ashenhurst's rule prints 3360 yards for 8/2 cotton.
test('counts agree with the printed ones', () => {
  expect(rowOf('count-constants', 'Ne, cotton')).toEqual(['590.5 ÷ count']);
  expect(rowOf('count-constants', 'Ne, worsted wool')).toEqual(['885.8 ÷ count']);
  expect(rowOf('count-constants', 'linen lea')).toEqual(['1653.5 ÷ count']);
  expect(rowOf('yarn-counts', 'cotton 8/2')).toEqual(['148', '6.77', '4.00', '677', '3360']);
});

test('the yarn of the pattern is what its label says: 300 m in 100 g', () => {
  expect(rowOf('yarn-counts', 'Fenwool 6/2').slice(0, 2)).toEqual(['333', '3.00']);
  expect(rowOf('yarn-counts', 'Fenwool 6/2')[3]).toBe('300');
});

test('a zigzag halves the pitch, pairs and two by two give it back', () => {
  expect(rowOf('spacings', '10 mm')).toEqual(['5', '10', '10', '20']);
  expect(rowOf('spacings', '1/4 in')).toEqual(['3.18', '6.35', '6.35', '31']);
});

test('a row filling four tenths of the spacing is a twelfth longer than the cloth is wide', () => {
  expect(rowOf('take-up', '0.40')).toEqual(['8.1', '17']);
});

// Common practice: three to four times the width.
test('soumak four over two back takes between three and four times the width', () => {
  const [, times = ''] = rowOf('soumak-yarn', '4/2');
  expect(Number(times)).toBeGreaterThan(3);
  expect(Number(times)).toBeLessThan(4);
});

test('a rya strand is cut longer than twice its pile, and the card is half of it', () => {
  const [, cut = '', card = ''] = rowOf('rya-lengths', '150 mm');
  expect(Number(cut)).toBe(360);
  expect(Number(card)).toBe(180);
});

// A yarn of 16 wraps is sold with 250 to 350 m in 100 g; firm and lofty must enclose that.
test('wraps give a range that encloses what shops sell', () => {
  const range = rowOf('wraps', '16').at(-1) ?? '';
  const [firm = 0, lofty = 0] = range.split(' to ').map(Number);
  expect(firm).toBeLessThan(250);
  expect(lofty).toBeGreaterThan(350);
});

// Half the wraps and two thirds of them: a hand weaver's rule. 12 wraps are 6 ends, an inch shared by 6 is 4.23 mm.
test('twelve wraps make six ends to the inch in plain weave and eight in twill', () => {
  expect(rowOf('balanced-setts', '12')).toEqual(['6', '4.2', '8.0', '3.2']);
  expect(rowOf('setts', '5')).toEqual(['19.7', '5.08']);
});

// By hand: 20 s and 60 × 0.6 s are 56 s; an hour has 64 of them.
test('an hour holds sixty-four rows over sixty ends, and the slow hand does them in nine fifths of the time', () => {
  expect(rowOf('paces', 'rows of tabby over 60 ends')).toEqual(['36', '64', '107']);
});

// Balance of forces: sin of the angle whose tangent is twice the rise over the span; 1/(2 sin 45°) is 0.71.
test('a cord that rises by half its span bears seven tenths of the weight, one that rises by a tenth two and a half times', () => {
  expect(rowOf('cord-pull', 'a half of the span')).toEqual(['0.71']);
  expect(rowOf('cord-pull', 'a tenth')).toEqual(['2.55']);
});

// Common practice: 4 mm cotton cord weighs about 9 g a metre; a square knot takes sixteen thicknesses.
test('a cord of 4 mm takes 64 mm for a square knot and weighs 90 g in ten metres', () => {
  const [knot, , , , grams] = rowOf('cords', '4 mm');
  expect([knot, grams]).toEqual(['64', '90']);
});

// Common practice cuts the strand of a twined row, which is folded, two and a half to three times the width.
test('a twined row of strands of usual thickness takes what practice cuts', () => {
  for (const strands of ['2 Fenwool', '3 Fenwool', '4 Fenwool']) {
    const times = Number(rowOf('twined-yarn', strands)[0]);
    expect(times).toBeGreaterThan(2.5);
    expect(times).toBeLessThan(3.1);
  }
});

test('a firm beat takes twice the rows of a light one, and yarn in proportion', () => {
  const [rows = '', metres = ''] = rowOf('beats', 'firm tapestry');
  const [light = '', less = ''] = rowOf('beats', 'comb, light hand');
  expect(Number(rows) / Number(light)).toBeCloseTo(1.1 / 0.7, 1);
  expect(Number(metres) / Number(less)).toBeCloseTo(1.1 / 0.7, 1);
});

// What the page on the rigid heddle reckons by hand.
test('the worked scarf of the handbook has the ends and the warp its plan has', () => {
  const planned = planPiece({
    craft: 'rigid-heddle', size: { widthMm: 250, lengthMm: 1600 }, heddle: { spacingMm: 2.54 },
    yarns: { warp: { tex: 250 }, weft: { tex: 250 } }, picksPerCm: 4, allowances: { fringeMm: 200 },
  });
  if (!planned.ok) throw new Error('it can be woven');
  const { ends, warpEndMm } = planned.value;
  expect([Math.round(ends.widthInHeddleMm), ends.count, Math.round(warpEndMm), Math.round((ends.count * warpEndMm) / 1000)]).toEqual([302, 119, 2785, 331]);
});
