/**
 * The whole piece worked through twice, in millimetres and in inches. Both columns were
 * computed apart from this program; here they are held against it to seven figures, and
 * its own two paths against each other to twelve.
 */
import { describe, expect, test } from 'vitest';
import { expectClose } from './close.ts';
import { columnOf, IMPERIAL, METRIC } from './worked-piece.ts';

const inches = 25.4;
const yards = 914.4;
const same = 1;
const ounces = 28.349523125;

/** Row, metric value (mm, g, h or a plain number), what one imperial unit of it is, imperial value. */
const TABLE: readonly (readonly [string, number, number, number])[] = [
  ['1', 0.8014131, inches, 0.0315517],
  ['2', 1.011937, inches, 0.03984003],
  ['3', 2.419048, inches, 0.0952381],
  ['4', 3.386667, inches, 0.1333333],
  ['5', 306.1224, inches, 12.05206],
  ['6', 0.2, 1 / inches, 5.08],
  ['7', 61.22449, same, 61.22449],
  ['8', 62, same, 62],
  ['9 top', 32, same, 32],
  ['9 bottom', 31, same, 31],
  ['10', 5, inches, 0.1968504],
  ['11', 305, inches, 12.00787],
  ['12', 350, inches, 13.77953],
  ['13', 408.1633, inches, 16.06942],
  ['14', 23.84956, inches, 0.9389589],
  ['15', 40, inches, 1.574803],
  ['16', 508.1633, inches, 20.00643],
  ['17', 520, inches, 20.47244],
  ['18', 32240, inches, 1269.291],
  ['19', 230.1, inches, 9.059054],
  ['20', 300, inches, 11.81102],
  ['21', 32770.1, yards, 35.83782],
  ['22', 1.81335, inches, 0.07139173],
  ['23', 1.445624, inches, 0.05691433],
  ['24', 0.36267, same, 0.36267],
  ['25', 4.659588, inches, 0.1834484],
  ['26', 0.3711314, same, 0.3711314],
  ['27', 5.332579, inches, 0.2099441],
  ['28', 0.06651584, same, 0.06651584],
  ['29', 3.19425, inches, 0.1257579],
  ['30', 328.4816, inches, 12.93235],
  ['31', 22.22041, inches, 0.8748193],
  ['32', 127.7796, inches, 5.030692],
  ['33 b2', 21, same, 21],
  ['33 b4', 17, same, 17],
  ['33 b5', 6, same, 6],
  ['33 b6', 104, same, 104],
  ['33 b8', 88, same, 88],
  ['34 b2', 20.7523, same, 20.7523],
  ['34 b4', 16.6018, same, 16.6018],
  ['34 b6', 103.761, same, 103.761],
  ['34 b8', 88.3906, same, 88.3906],
  ['35', 236, same, 236],
  ['36', 69, same, 69],
  ['37', 30, same, 30],
  ['38', 7502.789, inches ** 2, 11.62935],
  ['38 true', 7500, inches ** 2, 11.62502],
  ['39', 54856.42, yards, 59.99171],
  ['40', 16986.74, yards, 18.57693],
  ['41', 71843.17, yards, 78.56864],
  ['42', 5391.949, yards, 5.896707],
  ['43', 3.220461, inches, 0.1267898],
  ['44', 33.4182, inches, 1.315677],
  ['45', 31, same, 31],
  ['46', 2071.929, yards, 2.265889],
  ['47', 73915.1, yards, 80.83453],
  ['48', 10, same, 10],
  ['49', 24, same, 24],
  ['50', 1000, yards, 1.093613],
  ['51', 74915.1, yards, 81.92815],
  ['52', 5491.949, yards, 6.006069],
  ['53', 5.865879, inches, 0.2309401],
  ['54', 6.667292, inches, 0.2624918],
  ['55', 44.2805, inches, 1.743327],
  ['56', 364.2805, inches, 14.34175],
  ['57', 31, same, 31],
  ['58', 93, same, 93],
  ['59', 33878.09, yards, 37.04953],
  ['60', 180.1402, inches, 7.092136],
  ['60 card', 185, same, 185],
  ['61', 4.18808, inches, 0.164885],
  ['62', 33.15724, inches, 1.305403],
  ['63', 3.315724, same, 3.315724],
  ['64', 30, same, 30],
  ['65', 1094.717, inches, 43.0991],
  ['66', 4378.869, yards, 4.788789],
  ['67', 20, inches, 0.7874016],
  ['68 face', 8, same, 8],
  ['68 back', 7, same, 7],
  ['68 rest', 2, same, 2],
  ['69', 32.70599, inches, 1.287637],
  ['70', 511.6479, yards, 0.559545],
  ['71 net mass', 13.108, ounces, 0.462373],
  ['71 length', 37685.6, yards, 41.2135],
  ['71 mass', 15.0742, ounces, 0.531728],
  ['72 net mass', 41.6195, ounces, 1.46808],
  ['72 length', 86152.4, yards, 94.2174],
  ['72 mass', 47.8624, ounces, 1.6883],
  ['73 net mass', 3.05108, ounces, 0.107624],
  ['73 length', 6315.74, yards, 6.90698],
  ['73 mass', 3.50875, ounces, 0.123767],
  ['74 net mass', 33.8781, ounces, 1.19501],
  ['74 length', 38959.8, yards, 42.607],
  ['74 mass', 38.9598, ounces, 1.37427],
  ['75 net mass', 4.37887, ounces, 0.15446],
  ['75 length', 5035.7, yards, 5.50711],
  ['75 mass', 5.0357, ounces, 0.177629],
  ['76 net mass', 12.7912, ounces, 0.451196],
  ['76 length', 588.395, yards, 0.643477],
  ['76 mass', 14.7099, ounces, 0.518876],
  ['77 0 of 71', 1, same, 1],
  ['77 1 of 72', 1, same, 1],
  ['77 2 of 73', 1, same, 1],
  ['77 3 of 74', 1, same, 1],
  ['77 4 of 75', 1, same, 1],
  ['78', 108.8268, ounces, 3.838751],
  ['79', 6.19475, inches, 0.243888],
  ['80', 716.173, inches, 28.19579],
  ['81', 0.925314, 4.4482216152605, 0.208019],
  ['82 width', 325, inches, 12.7953],
  ['82 height', 60, inches, 2.3622],
  ['83 row', 57.2, same, 57.2],
  ['83 rows', 3.75, same, 3.75],
  ['83 motif', 0.3722, same, 0.3722],
  ['83 rya', 0.2067, same, 0.2067],
  ['83 soumak', 0.4, same, 0.4],
  ['83 hem', 0.5167, same, 0.5167],
  ['83 warping', 0.5167, same, 0.5167],
  ['84', 6.512, same, 6.512],
  ['84 low', 3.91, same, 3.91],
  ['84 high', 11.7, same, 11.7],
];

/** Half a unit of the last figure the table gives, at least of its seventh. */
function figures(printed: number): number {
  const digits = String(printed).replace(/^[0.]+|\./gu, '').length;
  return Math.max(0.5 * 10 ** -(digits - 1), 5e-7);
}

describe('the worked piece', () => {
  const metric = columnOf(METRIC);
  const imperial = columnOf(IMPERIAL);

  test('has every row of the table', () => {
    expect(new Set(TABLE.map(([row]) => row.split(' ')[0])).size).toBe(84);
    expect([...metric.keys()]).toEqual(TABLE.map(([row]) => row));
  });

  test.each(TABLE)('row %s comes to %f, and to the same in inches', (row, value, unit, imperialValue) => {
    const reckoned = metric.get(row) ?? Number.NaN;
    const reckonedImperial = (imperial.get(row) ?? Number.NaN) / unit;
    if (Number.isInteger(value) && unit === same) expect(reckoned).toBeCloseTo(value, 9);
    else expectClose(reckoned, value, figures(value));
    expectClose(reckonedImperial, imperialValue, figures(imperialValue));
    expectClose(imperial.get(row) ?? Number.NaN, reckoned, 1e-12);
  });
});
