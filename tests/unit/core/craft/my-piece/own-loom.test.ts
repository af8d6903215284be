import { describe, expect, test } from 'vitest';
import { emptyLoomForm, isThisLoom, judgeLoomForm, loomFormOf, loomFormOfFields, loomOfMine, loomTexts, ownLoomWords, type OwnLoom } from '#core/craft/my-piece/own-loom.ts';
import { judgeMine } from '#core/craft/my-piece/judge-mine.ts';
import { typeMine, withLoom } from '#core/craft/my-piece/typed-mine.ts';
import { lowTide } from '../../../../support/low-tide.ts';

const pattern = await lowTide();
const KITCHEN: OwnLoom = { kind: 'nailed-frame', insideWidthMm: 360, insideHeightMm: 700, nailPitchMm: 8, warping: 'zigzag', endsTogether: 2 };
const FIELDS: Readonly<Record<string, string>> = { loomName: 'Kitchen frame', units: 'cm', kind: 'nailed-frame', insideWidthMm: '36', insideHeightMm: '70', nailPitchMm: '8', endsTogether: '2', warping: 'zigzag', nailRows: 'both' };
const judge = (fields: Readonly<Record<string, string>>) => judgeLoomForm(loomFormOfFields((name) => ({ ...FIELDS, ...fields })[name]));
const faults = (fields: Readonly<Record<string, string>>): Record<string, string> => {
  const judged = judge(fields);
  return judged.ok ? {} : Object.fromEntries(judged.faults);
};

describe('a loom as it is typed', () => {
  test('is read with its measures and its name', () => {
    expect(judge({ loomName: '  Kitchen   frame ' })).toEqual({ ok: true, name: 'Kitchen frame', loom: KITCHEN });
  });

  test('comes back number for number, in both units', () => {
    for (const loom of [KITCHEN, { ...KITCHEN, kind: 'two-row-frame', nailRows: 'inner', insideWidthMm: 377.825 } as const]) {
      for (const units of ['cm', 'in'] as const) expect(judgeLoomForm(loomFormOf({ name: 'A', loom }, units))).toEqual({ ok: true, name: 'A', loom });
    }
  });

  test('with notches is wound in the one way they take, whatever was chosen', () => {
    expect(judge({ kind: 'notched-frame', nailRows: 'inner' })).toMatchObject({ loom: { kind: 'notched-frame', warping: 'two-nail' } });
    expect(judge({ kind: 'notched-frame', nailRows: 'inner' })).not.toHaveProperty('loom.nailRows');
  });

  test.each<[string, Readonly<Record<string, string>>, string]>([
    ['insideWidthMm', { insideWidthMm: '3 mm' }, 'Too narrow for a frame.'],
    ['insideWidthMm', { insideWidthMm: '30 m' }, 'Too wide for a frame.'],
    ['insideWidthMm', { insideWidthMm: '' }, 'Say how wide your loom is inside'],
    ['insideWidthMm', { insideWidthMm: 'wide' }, 'Write one length'],
    ['insideHeightMm', { insideHeightMm: '-70' }, ''],
    ['insideHeightMm', { insideHeightMm: '1e9' }, ''],
    ['nailPitchMm', { nailPitchMm: '0' }, 'Too close for nails.'],
    ['loomName', { loomName: ' ' }, 'Say what you call this loom'],
    ['loomName', { loomName: 'x'.repeat(61) }, '60 letters'],
  ])('is refused at %s for %o', (field, fields, says) => {
    expect(Object.keys(faults(fields))).toEqual([field]);
    expect(faults(fields)[field]).toContain(says);
    expect(faults(fields)[field]).not.toBe('');
  });

  test('asks for every measure that is missing at once', () => {
    const judged = judgeLoomForm(emptyLoomForm('cm'));
    expect(judged.ok ? [] : [...judged.faults.keys()]).toEqual(['loomName', 'insideWidthMm', 'insideHeightMm', 'nailPitchMm']);
  });
});

describe('a loom of the list', () => {
  test('chosen for a series is the loom the piece is reckoned for', () => {
    const typed = withLoom(typeMine({}, pattern, 'in'), KITCHEN);
    expect(isThisLoom(typed, KITCHEN)).toBe(true);
    expect(isThisLoom(typed, { ...KITCHEN, nailPitchMm: 10 })).toBe(false);
    const judged = judgeMine({ ...typed, texts: { ...typed.texts, widthMm: '12' } }, pattern);
    expect(judged).toMatchObject({ ok: true, mine: { loom: { insideWidthMm: 360, insideHeightMm: 700, nailPitchMm: 8 }, endsTogether: 2 } });
    expect(judged.ok && loomOfMine(pattern, judged.mine)).toEqual(KITCHEN);
  });

  test('is the pattern’s where she changed nothing; none where nobody said how wide it is', () => {
    expect(loomOfMine(pattern, {})).toEqual({ kind: 'nailed-frame', warping: 'zigzag', endsTogether: 1, insideWidthMm: pattern.loom.insideWidthMm, insideHeightMm: pattern.loom.insideHeightMm, nailPitchMm: pattern.loom.nailPitchMm });
    const { insideWidthMm: _, ...loom } = pattern.loom;
    expect(loomOfMine({ ...pattern, loom }, {})).toBeUndefined();
  });

  test('is told in a line, in her units', () => {
    expect(ownLoomWords(KITCHEN, 'cm').replaceAll('\u00a0', ' ')).toBe('36 cm wide and 70 cm high inside, nails every 8 mm, doubled ends');
    expect(loomTexts(KITCHEN, 'in')['nailPitchMm']).toBe('0.8 cm');
  });
});
