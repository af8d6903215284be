import { readFileSync } from 'node:fs';
import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { shapeFields } from '#core/craft/piece-form/asked-of-band.ts';
import type { FrameLoomPiece } from '#core/craft/piece.ts';
import { planPiece } from '#core/craft/plan.ts';
import { fieldsOfTyped, typedOfFields } from '#core/craft/piece-form/field-names.ts';
import { fieldText, fieldUnit, readText, shiftPoint } from '#core/craft/piece-form/field-text.ts';
import { judgeTyped } from '#core/craft/piece-form/judge-typed.ts';
import { readTyped } from '#core/craft/piece-form/read-typed.ts';
import { typePiece } from '#core/craft/piece-form/type-piece.ts';
import { cases } from '../../../../support/random-cases.ts';
import { arbitraryPiece } from './arbitrary-piece.ts';

const SHIPPED = ['../../../../../content/series/low-tide/piece.json', '../../../../reference/worked-piece.json'];
const shipped = (path: string): FrameLoomPiece => JSON.parse(readFileSync(new URL(path, import.meta.url), 'utf8')) as FrameLoomPiece;

/** What a browser sends for this form, read as the server reads it. */
function sent(piece: FrameLoomPiece, units: 'cm' | 'in') {
  const fields = fieldsOfTyped(typePiece(piece, units));
  return typedOfFields((name) => fields.get(name));
}

describe('a piece in a form', () => {
  test.each(['cm', 'in'] as const)('comes back the same in %s, number for number', (units) => {
    fc.assert(fc.property(arbitraryPiece, (piece) => {
      const { piece: read, faults } = readTyped(typePiece(piece, units));
      expect([...faults]).toEqual([]);
      expect(read).toEqual(piece);
    }), { numRuns: cases(120) });
  });

  test.each(['cm', 'in'] as const)('comes back the same after a browser has sent it, in %s', (units) => {
    fc.assert(fc.property(arbitraryPiece, (piece) => {
      expect(readTyped(sent(piece, units)).piece).toEqual(piece);
    }), { numRuns: cases(60) });
  });

  test.each(SHIPPED.flatMap((path) => [[path, 'cm'], [path, 'in']] as const))('keeps the plan of %s in %s', (path, units) => {
    const piece = shipped(path);
    const judged = judgeTyped(sent(piece, units));
    const planned = planPiece(piece, units);
    if (!judged.ok || !planned.ok) throw new RangeError(JSON.stringify(judged));
    expect(judged.piece).toEqual(piece);
    expect(judged.plan).toEqual(planned.value);
  });

  test('shows plain numbers where they are plain', () => {
    const { texts, yarns, bands } = typePiece(shipped(SHIPPED[0] ?? ''), 'cm');
    expect([texts['size.widthMm'], texts['loom.nailPitchMm'], texts['allowances.drawIn'], texts['beat.by']]).toEqual(['40', '10', '2', 'comb']);
    expect(yarns[0]?.texts).toMatchObject({ role: 'shore', by: 'metresPer100g', grist: '300', 'ball.grams': '50' });
    expect(bands[6]?.shapes[0]?.texts).toMatchObject({ shape: 'triangle', baseMm: '21', leanMm: '3.5' });
  });

  test('says a size typed in inches in inches to who measures in centimetres', () => {
    const piece = shipped(SHIPPED[0] ?? '');
    expect(typePiece({ ...piece, size: { ...piece.size, widthMm: 12 * 25.4 } }, 'cm').texts['size.widthMm']).toBe('12 in');
  });

  test('says a centimetre size in centimetres to who measures in inches, rather than round it', () => {
    const { texts } = typePiece(shipped(SHIPPED[0] ?? ''), 'in');
    expect(texts['size.widthMm']).toBe('40 cm');
    expect(typePiece({ ...shipped(SHIPPED[0] ?? ''), size: { widthMm: 14.875 * 25.4, heightMm: 406.4 } }, 'in').texts).toMatchObject({ 'size.widthMm': '14 7/8', 'size.heightMm': '16' });
  });
});

test.each([['0.02', 2, '2'], ['0.025', 2, '2.5'], ['1', 2, '100'], ['0', 2, '0'], ['2.5', -2, '0.025'], ['12', -2, '0.12'], ['100', -2, '1'], ['5', -2, '0.05']])('the point of %s moved by %i gives %s', (text, places, shifted) => {
  expect(shiftPoint(text, places)).toBe(shifted);
});

test.each([
  ['length', 'cm', 'in'], ['lean', 'cm', 'in'], ['fine', 'mm', 'in'], ['yarn', 'm', 'yd'], ['points', 'cm', 'in'], ['share', '%', '%'], ['role', undefined, undefined],
] as const)('a field for a %s says its unit: %s, or %s', (kind, cm, inches) => {
  const asked = { key: 'a', label: 'A', kind } as const;
  expect([fieldUnit(asked, 'cm'), fieldUnit(asked, 'in')]).toEqual([cm, inches]);
});

test('a field for a number says the unit it is given, and one for words none', () => {
  expect(fieldUnit({ key: 'a', label: 'A', kind: 'number', unit: 'tex' }, 'cm')).toBe('tex');
  expect(fieldUnit({ key: 'a', label: 'A', kind: 'text', maxLength: 9 }, 'cm')).toBeUndefined();
});

test('a value of a kind its field does not take is shown as nothing', () => {
  const lengthField = { key: 'a', label: 'A', kind: 'length' } as const;
  expect([fieldText('wide', lengthField, 'cm'), fieldText([{ xMm: 0, yMm: 0 }], lengthField, 'cm'), fieldText(undefined, lengthField, 'cm')]).toEqual(['', '', '']);
});

describe('corners of a shape in one field', () => {
  const corners = shapeFields('points').find(({ kind }) => kind === 'points');
  if (corners === undefined) throw new Error('no field for corners');

  test('are read in the form’s unit, or in the one that stands behind a length', () => {
    expect(readText('0 : 0; 12,5 : -1; 60 mm : 9;', corners, 'cm')).toEqual({ ok: true, value: [{ xMm: 0, yMm: 0 }, { xMm: 125, yMm: -10 }, { xMm: 60, yMm: 90 }] });
    expect(readText('4 7/8 : 2', corners, 'in')).toEqual({ ok: true, value: [{ xMm: 4.875 * 25.4, yMm: 50.8 }] });
  });

  test.each(['12', '12 : ', '1 : 2 : 3', 'here : there'])('“%s” is refused with what works', (text) => {
    expect(readText(text, corners, 'cm')).toMatchObject({ ok: false, says: expect.stringMatching(/12/u) as string });
  });
});
