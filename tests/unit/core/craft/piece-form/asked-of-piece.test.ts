import { describe, expect, test } from 'vitest';
import { settingsOf } from '#core/craft/frame-loom/settings.ts';
import { ALLOWANCES, hasTwoRows, LOOM_KIND } from '#core/craft/piece-form/asked-of-piece.ts';
import { typeIn } from '#core/craft/piece-form/change-typed.ts';
import { typePiece } from '#core/craft/piece-form/type-piece.ts';
import { PLAIN_PIECE } from '../a-piece.ts';

const form = typePiece(PLAIN_PIECE, 'cm');

describe('an allowance left empty', () => {
  const standards = (mode: 'straight-warp' | 'balanced', by: string): unknown => {
    const { texts } = typeIn(typeIn(form, 'mode', mode), 'beat.by', by);
    return Object.fromEntries(ALLOWANCES.flatMap(({ key, standard }) => (standard === undefined ? [] : [[key.replace('allowances.', ''), standard(texts)]])));
  };

  test.each(['straight-warp', 'balanced'] as const)('says the number the plan then takes, the warp being %s', (mode) => {
    expect(standards(mode, 'comb')).toMatchObject(settingsOf({}, mode, { picksPerWeftDiameter: 1 }));
    expect(standards(mode, 'swatch')).toMatchObject(settingsOf({}, mode, { picksPerCm: 6 }));
  });
});

test('rows of nails are asked for only of a loom that has two', () => {
  const withKind = (kind: string): boolean => hasTwoRows(typeIn(form, LOOM_KIND.key, kind).texts);
  expect(withKind('two-row-frame')).toBe(true);
  expect([withKind('nailed-frame'), withKind('notched-frame'), withKind('none of these')]).toEqual([false, false, false]);
});
