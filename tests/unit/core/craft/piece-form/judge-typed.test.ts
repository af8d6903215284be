import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { typeIn } from '#core/craft/piece-form/change-typed.ts';
import { fieldsOfTyped, typedOfFields } from '#core/craft/piece-form/field-names.ts';
import { judgeTyped } from '#core/craft/piece-form/judge-typed.ts';
import type { TypedPiece } from '#core/craft/piece-form/typed-piece.ts';
import { emptyForm, typePiece } from '#core/craft/piece-form/type-piece.ts';
import { pieceOf } from '../a-piece.ts';

const form = typePiece(pieceOf({ technique: 'soumak', yarn: 'ground', over: 4, back: 2, rows: 4, tabbyBetween: 2, tabbyYarn: 'ground' }), 'cm');
const typing = (typed: TypedPiece, texts: Record<string, string>): TypedPiece => Object.entries(texts).reduce((now, [field, text]) => typeIn(now, field, text), typed);
const problems = (typed: TypedPiece): [string, string][] => {
  const judged = judgeTyped(typed);
  return judged.ok ? [] : judged.problems.map(({ field, says }) => [field, says]);
};

describe('what a form comes to', () => {
  test('is a piece and its plan', () => {
    const judged = judgeTyped(form);
    expect(judged.ok && judged.plan.ends.count).toBe(62);
  });

  test.each([
    ['a comma', { 'size.widthMm': '30,5' }, 305],
    ['a point', { 'size.widthMm': '30.5' }, 305],
    ['a fraction of an inch with its unit', { 'size.widthMm': '12 1/2 in' }, 317.5],
    ['millimetres', { 'size.widthMm': '310 mm' }, 310],
  ])('takes %s', (_words, texts, widthMm) => {
    const judged = judgeTyped(typing(form, texts));
    expect(judged.ok && judged.piece.size.widthMm).toBe(widthMm);
  });

  test.each([
    ['a width that is missing', { 'size.widthMm': ' ' }, 'size.widthMm', 'Width is missing. Type it in cm.'],
    ['a width that is no length', { 'size.widthMm': 'wide' }, 'size.widthMm', 'Write one length, like 12.5 or 4 7/8.'],
    ['nails too far apart', { 'loom.nailPitchMm': '300' }, 'loom.nailPitchMm', 'From nail to nail: between 1 mm and 10 cm works.'],
    ['a yarn without its weight', { 'yarns.0.grist': '' }, 'yarns.0.grist', 'Metres in 100 g is missing.'],
    ['a count that is none', { 'yarns.0.by': 'nm', 'yarns.0.grist': 'thick' }, 'yarns.0.grist', '“thick” is not a count. Write it like 16, 8/2 or 2/16.'],
    ['wraps that were not counted', { 'yarns.0.by': 'wraps' }, 'yarns.0.wrapsPerInch', 'Wraps in an inch is missing.'],
    ['a role with a blank', { 'yarns.0.role': 'my ground' }, 'yarns.0.role', 'A yarn role begins with a letter and goes on with letters, figures or hyphens, 40 at most.'],
    ['going back too far', { 'bands.0.back': '4' }, 'bands.0.back', 'A soumak stitch goes back under fewer ends than it passed over: between 1 and 3 works.'],
    ['half a row', { 'bands.0.rows': '2.5' }, 'bands.0.rows', 'Rows must be a whole number.'],
    ['a yarn that was taken out', { 'bands.0.tabbyYarn': '7' }, 'bands.0.tabbyYarn', 'Yarn of the tabby is missing. Choose one of your yarns.'],
    ['a share that is no number', { 'allowances.drawIn': 'much' }, 'allowances.drawIn', '“much” is no number. Write it like 2 or 2.5.'],
    ['a dowel of which only the length is said', { 'dowel.lengthMm': '40' }, 'dowel.diameterMm', 'Thickness of the dowel is missing. Type it in mm.'],
    ['half a ball', { 'yarns.0.ball.metres': '150' }, 'yarns.0.ball.grams', 'Grams of a ball is missing.'],
    ['no picks counted', { 'beat.by': 'swatch' }, 'beat.picksPerCm', 'Picks in a centimetre is missing.'],
    ['an impossible beat', { 'beat.by': 'own', 'beat.picksPerWeftDiameter': '9' }, 'beat.picksPerWeftDiameter', 'Picks in one weft thickness: between 0.2 and 2 works.'],
  ])('says %s at its field', (_words, texts, field, says) => {
    expect(problems(typing(form, texts))).toContainEqual([field, says]);
  });

  test('says of bands that are too high where the filling one is typed', () => {
    const [[field, says] = ['', '']] = problems(typing(form, { 'size.heightMm': '1' }));
    expect(field).toBe('bands.1.heightMm');
    expect(says).toContain('Nothing is left to fill');
  });

  test('says of bands that do not come to the height at all of them', () => {
    expect(problems(typing(form, { 'bands.1.fill': '', 'bands.1.heightMm': '2' })).map(([field]) => field)).toEqual(['bands']);
  });

  test('tells everything at once, each thing once', () => {
    const found = problems(emptyForm('cm'));
    expect(found.map(([field]) => field).toSorted()).toEqual(['loom.insideHeightMm', 'loom.nailPitchMm', 'size.heightMm', 'size.widthMm', 'warp.yarn.grist', 'yarns.0.grist']);
  });

  test('speaks the units of the form', () => {
    expect(problems({ ...typing(form, { 'size.widthMm': '' }), units: 'in' })).toContainEqual(['size.widthMm', 'Width is missing. Type it in in.']);
    expect(problems({ ...typing(form, { 'loom.nailPitchMm': '30' }), units: 'in' })).toContainEqual(['loom.nailPitchMm', 'From nail to nail: between 1/16 in and 3 7/8 in works.']);
  });

  test('says once that no rows were counted, and nothing of a beat that was not chosen', () => {
    expect(problems(typing(form, { 'beat.by': 'swatch' }))).toEqual([['beat.picksPerCm', 'Picks in a centimetre is missing.']]);
    expect(problems(typing(form, { 'beat.by': '' }))).toEqual([['beat.by', 'How closely the rows lie: choose one.']]);
  });

  test('takes wraps for a yarn that has no label', () => {
    const judged = judgeTyped(typing(form, { 'yarns.0.by': 'wraps', 'yarns.0.wrapsPerInch': '12' }));
    if (!judged.ok) throw new RangeError(JSON.stringify(judged.problems));
    expect(judged.piece.yarns['ground']).toMatchObject({ wrapsPerInch: 12, tex: 1190 });
    expect(judged.warnings.filter(({ field }) => field.startsWith('yarns'))).toEqual([]);
  });

  test('never throws, whatever a form sends', () => {
    const names = [...fieldsOfTyped(form).keys(), 'bands.2.technique', 'bands.0.shapes.0.shape', 'yarns.1.id'];
    const texts = fc.oneof(fc.string(), fc.constantFrom('__proto__', 'constructor', '-1', '1e999', '٣', '1/0', 'tabby', 'circle'));
    fc.assert(fc.property(fc.dictionary(fc.constantFrom(...names), texts), (sent) => {
      const judged = judgeTyped(typedOfFields((name) => (Object.hasOwn(sent, name) ? sent[name] : undefined)));
      expect(judged.ok).toBe(false);
    }));
  });
});
