import { describe, expect, test } from 'vitest';
import { actText, bandInHand, changeTyped, readAct, typeIn, type Act } from '#core/craft/piece-form/change-typed.ts';
import { judgeTyped } from '#core/craft/piece-form/judge-typed.ts';
import { typePiece } from '#core/craft/piece-form/type-piece.ts';
import { pieceOf } from '../a-piece.ts';

const form = typePiece(pieceOf({ technique: 'tabby', name: 'foot', yarn: 'ground', heightMm: 30 }, { technique: 'twining', yarn: 'ground', rows: 2 }), 'cm');
const techniques = (act: Act): (string | undefined)[] => changeTyped(form, act).bands.map(({ texts }) => texts['technique']);
const ids = (act: Act): number[] => changeTyped(form, act).bands.map(({ id }) => id);

describe('rows of the form', () => {
  test('a band is put in where it is woven, with the yarn of the one before it', () => {
    const { bands } = changeTyped(form, { do: 'add-band', after: 1 });
    expect(bands.map(({ id }) => id)).toEqual([1, 2, 4, 3]);
    expect(bands[2]?.texts).toEqual({ technique: 'tabby', yarn: '1' });
    expect(ids({ do: 'add-band', after: -1 })).toEqual([4, 1, 2, 3]);
    expect(ids({ do: 'add-band', after: 2 })).toEqual([1, 2, 3, 4]);
  });

  test('a copy follows its pattern and has no name', () => {
    const { bands } = changeTyped(form, { do: 'copy-band', band: 0 });
    expect(bands.slice(0, 2).map(({ texts }) => [texts['heightMm'], texts['name']])).toEqual([['3', 'foot'], ['3', '']]);
    expect(bands).toHaveLength(4);
  });

  test('a copy of the band that fills does not fill too', () => {
    expect(changeTyped(form, { do: 'copy-band', band: 2 }).bands.map(({ texts }) => texts['fill'])).toEqual(['', '', 'yes', '']);
  });

  test('bands are woven sooner or later, and no further than first and last', () => {
    expect(ids({ do: 'later', band: 0 })).toEqual([2, 1, 3]);
    expect(ids({ do: 'sooner', band: 2 })).toEqual([1, 3, 2]);
    expect(ids({ do: 'sooner', band: 0 })).toEqual([1, 2, 3]);
    expect(ids({ do: 'later', band: 2 })).toEqual([1, 2, 3]);
  });

  test('a band that is not there changes nothing', () => {
    for (const act of [{ do: 'copy-band', band: 9 }, { do: 'take-out-band', band: 9 }, { do: 'sooner', band: 9 }, { do: 'add-shape', band: 9 }] as const) expect(techniques(act)).toEqual(['tabby', 'twining', 'tabby']);
  });

  test('a shape is put in and taken out', () => {
    const one = changeTyped(form, { do: 'add-shape', band: 0 });
    expect(one.bands[0]?.shapes).toEqual([{ id: 1, texts: { shape: 'triangle', yarn: '1' } }]);
    expect(changeTyped(one, { do: 'take-out-shape', band: 0, shape: 0 }).bands[0]?.shapes).toEqual([]);
  });

  test('bands whose yarn was taken out ask for one', () => {
    const judged = judgeTyped(changeTyped(changeTyped(form, { do: 'add-yarn' }), { do: 'take-out-yarn', yarn: 0 }));
    expect(judged.ok ? [] : judged.problems.map(({ field }) => field)).toEqual(expect.arrayContaining(['bands.0.yarn', 'bands.1.yarn', 'bands.2.yarn']));
  });

  test('a role written anew is the same yarn in every band', () => {
    const judged = judgeTyped(typeIn(form, 'yarns.0.role', 'sea'));
    expect(judged.ok && judged.piece.bands.map(({ yarn }) => yarn)).toEqual(['sea', 'sea', 'sea']);
  });

  test('another technique begins with what is usual, and the old one’s words come back with it', () => {
    const soumak = typeIn(form, 'bands.0.technique', 'soumak');
    expect(soumak.bands[0]?.texts).toMatchObject({ over: '4', back: '2', rows: '4', tabbyBetween: '2', tabbyYarn: '1' });
    expect(typeIn(soumak, 'bands.0.technique', 'tabby').bands[0]?.texts).toMatchObject({ heightMm: '3', name: 'foot' });
  });
});

describe('what is typed goes to its field', () => {
  test('of the warp, a yarn, a shape and the piece', () => {
    const shaped = changeTyped(form, { do: 'add-shape', band: 0 });
    expect(typeIn(form, 'warp.yarn.label', 'Fenwool').warpYarn['label']).toBe('Fenwool');
    expect(typeIn(form, 'yarns.0.label', 'Fenwool').yarns[0]?.texts['label']).toBe('Fenwool');
    expect(typeIn(shaped, 'bands.0.shapes.0.baseMm', '12').bands[0]?.shapes[0]?.texts['baseMm']).toBe('12');
    expect(typeIn(shaped, 'bands.0.shapes.3.baseMm', '12')).toEqual(shaped);
    expect(typeIn(form, 'size.widthMm', '31').texts['size.widthMm']).toBe('31');
  });

  test('and looking changes nothing', () => {
    expect(changeTyped(form, { do: 'look' })).toBe(form);
  });
});

test('yarns are put in with a dye of their own and told as the last one is, and taken out', () => {
  const two = changeTyped(form, { do: 'add-yarn' });
  expect(two.yarns.map(({ id }) => id)).toEqual([1, 2]);
  expect(two.yarns[1]?.texts).toMatchObject({ role: '', by: 'metresPer100g' });
  // A new shape shows on the ground it lies in, so it takes the other yarn.
  expect(changeTyped(two, { do: 'add-shape', band: 0 }).bands[0]?.shapes[0]?.texts['yarn']).toBe('2');
  const none = changeTyped(form, { do: 'take-out-yarn', yarn: 0 });
  expect(none.yarns).toEqual([]);
  const again = changeTyped(typeIn(two, 'yarns.1.by', 'nm'), { do: 'add-yarn' });
  expect(again.yarns[2]?.texts['by']).toBe('nm');
  expect(again.yarns[2]?.texts['colour']).not.toBe(again.yarns[1]?.texts['colour']);
  expect(changeTyped(none, { do: 'add-yarn' }).yarns[0]?.texts['by']).toBe('metresPer100g');
  expect(changeTyped({ ...none, bands: [] }, { do: 'add-band', after: -1 }).bands[0]?.texts).toEqual({ technique: 'tabby', yarn: '' });
  expect(changeTyped({ ...two, bands: [] }, { do: 'add-band', after: -1 }).bands[0]?.texts['yarn']).toBe('1');
});

describe('the band that hands go on with', () => {
  test.each<[Act, number | null]>([
    [{ do: 'add-band', after: -1 }, 0], [{ do: 'add-band', after: 2 }, 3], [{ do: 'copy-band', band: 1 }, 2], [{ do: 'later', band: 1 }, 2],
    [{ do: 'sooner', band: 2 }, 1], [{ do: 'sooner', band: 0 }, 0], [{ do: 'add-shape', band: 1 }, 1], [{ do: 'take-out-shape', band: 1, shape: 0 }, 1],
    [{ do: 'take-out-band', band: 1 }, null], [{ do: 'add-yarn' }, null], [{ do: 'look' }, null],
  ])('after %o is %s', (act, band) => {
    expect(bandInHand(act)).toBe(band);
  });
});

describe('a button’s act', () => {
  test.each([
    [{ do: 'look' }, 'look'], [{ do: 'add-band', after: -1 }, 'add-band:-1'], [{ do: 'copy-band', band: 3 }, 'copy-band:3'],
    [{ do: 'take-out-shape', band: 2, shape: 0 }, 'take-out-shape:2:0'], [{ do: 'take-out-yarn', yarn: 1 }, 'take-out-yarn:1'], [{ do: 'add-yarn' }, 'add-yarn'],
  ] as const)('%o is sent as %s and read again', (act, text) => {
    expect(actText(act)).toBe(text);
    expect(readAct(text)).toEqual(act);
  });

  test.each(['', 'save', 'copy-band', 'copy-band:x', 'copy-band:1.5', 'copy-band:99999', 'take-out-shape:1', 'constructor:1'])('“%s” is none', (text) => {
    expect(readAct(text)).toBeNull();
  });
});
