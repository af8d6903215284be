// The handbook's tables say what is printed elsewhere, and what the trade knows.
import { expect, test } from 'vitest';
import { tableNamed, type TableName } from '#components/handbook/tables.ts';

function rowOf(name: TableName, first: string): readonly string[] {
  const row = tableNamed(name).rows.find(([head]) => head === first);
  if (row === undefined) throw new Error(`no row ${first}`);
  return row.slice(1);
}

test.each<TableName>(['count-constants', 'yarn-counts', 'wraps', 'spacings', 'weft-for-spacing', 'take-up', 'soumak-yarn', 'rya-lengths'])('every row of %s fills every column', (name) => {
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
