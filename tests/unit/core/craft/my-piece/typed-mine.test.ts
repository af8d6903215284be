import { describe, expect, test } from 'vitest';
import { judgeMine } from '#core/craft/my-piece/judge-mine.ts';
import { asPattern, inOtherUnits, mineOfFields, typeMine, withTriedLoom, yarnOf } from '#core/craft/my-piece/typed-mine.ts';
import { lowTide } from '../../../../support/low-tide.ts';

const pattern = await lowTide();
const typed = (fields: Readonly<Record<string, string>>) => mineOfFields((name) => fields[name], pattern);

test('what was kept comes back as it was typed, number for number', () => {
  const mine = { loom: { insideWidthMm: 377.825, nailPitchMm: 8, warping: 'two-nail' }, widthMm: 200, endsTogether: 2, warpYarn: { count: { text: '8/2', system: 'ne-cotton' }, ball: { metres: 90, grams: 50 } }, yarns: { ridge: { label: 'Attic', tex: 250, strands: 3, colour: '#112233' } } } as const;
  for (const units of ['cm', 'in'] as const) {
    const judged = judgeMine(typeMine(mine, pattern, units), pattern);
    expect(judged.ok && judged.mine).toEqual(mine);
  }
});

test('other units keep every length, and leave alone what cannot be read', () => {
  const inches = inOtherUnits(typed({ insideWidthMm: '50,8', nailPitchMm: 'eight' }), 'in');
  expect(inches.texts).toMatchObject({ insideWidthMm: '20', nailPitchMm: 'eight' });
});

test('the same units leave every text as she typed it', () => {
  const before = typed({ insideWidthMm: '50,8', nailPitchMm: ' 8 ' });
  expect(inOtherUnits(before, 'cm').texts).toEqual(before.texts);
});

describe('a form nothing was kept of', () => {
  test('shows the pattern’s own loom, and nothing typed', () => {
    expect(typeMine({}, pattern, 'cm').texts).toEqual({
      insideWidthMm: '', insideHeightMm: '', nailPitchMm: '', widthMm: '', kind: 'nailed-frame', nailRows: 'both', warping: 'zigzag', endsTogether: '1', way: 'as-it-is',
      'woven.bandsDone': '0', 'woven.rows': '', 'woven.heightMm': '', ...Object.fromEntries(Object.keys(pattern.yarns).map((role) => [`woven.left.${role}`, ''])),
    });
    const rows = { ...pattern, loom: { ...pattern.loom, kind: 'two-row-frame', nailRows: 'inner', nailPitchMm: 5 }, warp: { ...pattern.warp, endsTogether: 2 } } as const;
    expect(typeMine({}, rows, 'cm').texts).toMatchObject({ kind: 'two-row-frame', nailRows: 'inner', endsTogether: '2' });
  });

  test('begins each of her yarns with the pattern’s colour and strands', () => {
    const { yarns } = typeMine({}, { ...pattern, yarns: { ...pattern.yarns, plain: { tex: 300 } } }, 'cm');
    expect(yarns).toMatchObject({ ridge: { by: 'pattern', colour: '#2f5366', strands: '4' }, water: { strands: '' }, plain: { by: 'pattern', colour: '', strands: '' } });
  });
});

test('all as the pattern: what is woven stays woven', () => {
  const fields = { 'woven.bandsDone': '7', 'woven.rows': '12', 'woven.heightMm': '30', 'woven.left.water': '40', insideWidthMm: '60', 'yarns.water.by': 'tex', 'yarns.water.grist': '300' };
  const { texts, yarns } = asPattern(typed(fields), pattern);
  expect(texts).toMatchObject({ insideWidthMm: '', 'woven.bandsDone': '7', 'woven.rows': '12', 'woven.heightMm': '30', 'woven.left.water': '40' });
  expect(yarns['water']).toMatchObject({ by: 'pattern' });
});

test('the loom that was tried before buying stands in the form', () => {
  const before = typeMine({}, pattern, 'cm');
  const after = withTriedLoom(before, { inside: '30', spacing: '8', ends: 2, units: 'cm', narrower: true }, pattern);
  expect(after.texts).toMatchObject({ insideWidthMm: '30', nailPitchMm: '8', endsTogether: '2' });
  expect(judgeMine(after, pattern).ok).toBe(true);
});

test('a form that was sent is cut to what a person may type, and is read in the units it was shown in', () => {
  const long = mineOfFields((name) => (name === 'insideWidthMm' ? '9'.repeat(500) : undefined), pattern);
  expect(long.texts['insideWidthMm']).toHaveLength(200);
  const shown = mineOfFields((name) => ({ shown: 'cm', units: 'in', insideWidthMm: '50.8' })[name], pattern);
  expect([shown.units, shown.texts['insideWidthMm']]).toEqual(['in', '20']);
  expect(yarnOf(shown, 'constructor')).toEqual({});
});

test('a width the whole loom was too narrow for stands in the form only when she asked for narrower', () => {
  const before = typeMine({}, pattern, 'cm');
  const tried = (narrower: boolean) => withTriedLoom(before, { inside: '30', spacing: '8', ends: 1, units: 'cm', narrower }, pattern).texts['widthMm'];
  expect(tried(false)).toBe('');
  expect(tried(true)).not.toBe('');
  const typedWidth = { ...before, texts: { ...before.texts, widthMm: '20' } };
  expect(withTriedLoom(typedWidth, { inside: '60', spacing: '8', ends: 1, units: 'cm', narrower: false }, pattern).texts).toMatchObject({ insideWidthMm: '60', widthMm: '20' });
  // A frame of six centimetres holds nothing one would weave.
  expect(withTriedLoom(before, { inside: '6', spacing: '8', ends: 1, units: 'cm', narrower: true }, pattern).texts['widthMm']).toBe('');
  const inches = withTriedLoom(before, { inside: '16', spacing: '1/2', ends: 1, units: 'in', narrower: false }, pattern);
  expect(inches).toMatchObject({ units: 'in', texts: { insideWidthMm: '16', nailPitchMm: '1/2', endsTogether: '1' } });
});
