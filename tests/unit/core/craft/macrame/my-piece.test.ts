import { describe, expect, test } from 'vitest';
import { CRAFTS } from '#core/craft/crafts.ts';
import { fitPiece } from '#core/craft/fit.ts';
import type { MyPiece } from '#core/craft/fitting/my-piece.ts';
import { EXAMPLE } from '#core/craft/macrame/example.ts';
import { cordsOfFields, judgeCords, labelField, ROD_FIELD, thicknessField, typeCords, type TypedCords } from '#core/craft/macrame/my-piece.ts';
import type { MacramePiece } from '#core/craft/macrame/piece.ts';
import type { Units } from '#core/units/units.ts';
import { planOf } from './a-hanging.ts';

/** A cord of 4 mm, and one of 2 mm that wraps it. */
const TWO: MacramePiece = { ...EXAMPLE, yarns: { ...EXAMPLE.yarns, gold: { diameterMm: 2, colour: '#c9a83a' } }, foot: [{ technique: 'plain', heightMm: 20 }, { technique: 'gathering', wraps: 8, yarn: 'gold' }] };
const NET: MacramePiece = { ...TWO, columns: TWO.columns.map((column) => ({ ...column, sections: column.sections.slice(0, 3) })) };

const typed = (texts: Readonly<Record<string, string>>, units: Units = 'cm', shown: Units = units): TypedCords => ({ units, shown, texts });
const judged = (texts: Readonly<Record<string, string>>, units?: Units): ReturnType<typeof judgeCords> => judgeCords(typed(texts, units), NET);
const faults = (texts: Readonly<Record<string, string>>): string[] => {
  const found = judged(texts);
  return found.ok ? [] : found.problems.map(({ field, says }) => `${field}: ${says}`);
};

describe('a student’s own cord in the fields of a form', () => {
  test('leaves the pattern as it is where nothing is typed', () => {
    const found = judged({});
    expect(found.ok && found.mine).toEqual({});
    expect(found.ok && found.fitted.piece).toBe(NET);
    expect(found.ok && found.fitted.changes).toEqual([]);
  });

  test('takes its thickness and its name, and the rod’s', () => {
    const found = judged({ [thicknessField('main')]: '5', [labelField('main')]: ' Dune cord ', [thicknessField('gold')]: '', [labelField('gold')]: 'never asked', [ROD_FIELD]: '25' });
    expect(found.ok && found.mine).toEqual({ cords: { main: { diameterMm: 5, label: 'Dune cord' } }, rod: { diameterMm: 25 } });
    // The pattern's colour stays, as she says none.
    expect(found.ok && found.fitted.piece.yarns['main']).toEqual({ colour: '#ddd3bb', diameterMm: 5, label: 'Dune cord' });
    expect(found.ok && found.fitted.piece.yarns['gold']).toBe(NET.yarns['gold']);
    expect(found.ok && found.fitted.piece.rod).toEqual({ kind: 'rod', diameterMm: 25 });
    expect(found.ok && found.fitted.changes.map((line) => line.replaceAll('\u00a0', ' '))).toEqual([
      'Dune cord is the main cord.', 'It hangs from a rod 25 mm thick.', expect.stringMatching(/^The piece comes out \d+ cm long instead of \d+ cm\.$/u),
    ]);
  });

  test('reads inches where the form stood in inches: 3/16 in are 4.7625 mm', () => {
    const found = judged({ [thicknessField('main')]: '3/16' }, 'in');
    expect(found.ok && found.mine.cords?.['main']?.diameterMm).toBeCloseTo(4.7625, 9);
  });

  test('says at the very field what is wrong, and all of it at once', () => {
    expect(faults({ [thicknessField('main')]: 'thick', [ROD_FIELD]: 'a branch' }).map((line) => line.split(':')[0])).toEqual([thicknessField('main'), ROD_FIELD]);
    expect(faults({ [thicknessField('gold')]: '900' })[0]).toMatch(/^cords\.gold\.diameterMm: Thickness of the cord: between 0\.5 mm and 60 mm works\.$/u);
    expect(faults({ [ROD_FIELD]: '3000' })[0]).toMatch(/^rod\.diameterMm: Thickness of the rod/u);
    // So thick a cord makes a piece longer than any: that belongs to no single field.
    expect(judgeCords(typed({ [thicknessField('main')]: '60' }), { ...NET, columns: [{ yarn: 'main', cords: 2, sections: [{ technique: 'square-knots', knots: 100 }] }] })).toMatchObject({ ok: false, problems: [{ field: '' }] });
  });

  test('comes back as it was kept, in either unit', () => {
    const mine: MyPiece = { cords: { main: { diameterMm: 6.35, label: 'Dune' } }, rod: { diameterMm: 25.4 } };
    expect(typeCords(mine, NET, 'in')).toEqual({ units: 'in', shown: 'in', texts: { [thicknessField('main')]: '1/4', [labelField('main')]: 'Dune', [thicknessField('gold')]: '', [labelField('gold')]: '', [ROD_FIELD]: '1' } });
    expect(typeCords(mine, NET, 'cm').texts).toMatchObject({ [thicknessField('main')]: '6.35', [ROD_FIELD]: '25.4' });
    expect(Object.values(typeCords({}, NET, 'cm').texts)).toEqual(['', '', '', '', '']);
    for (const units of ['cm', 'in'] as const) expect(judgeCords(typeCords(mine, NET, units), NET)).toMatchObject({ ok: true, mine });
    // A role that only every object has is none of hers.
    expect(typeCords({ cords: {} }, { ...NET, yarns: { constructor: { diameterMm: 3 } } as never }, 'cm').texts[thicknessField('constructor')]).toBe('');
  });

  test('is taken from a form as it was sent, no text longer than a label', () => {
    const sent: Readonly<Record<string, string>> = { units: 'in', shown: 'cm', [thicknessField('main')]: '5', [labelField('main')]: 'x'.repeat(200), colour: 'red' };
    expect(cordsOfFields((name) => sent[name], NET)).toEqual({
      units: 'in', shown: 'cm', texts: { [ROD_FIELD]: '', [thicknessField('main')]: '5', [labelField('main')]: 'x'.repeat(120), [thicknessField('gold')]: '', [labelField('gold')]: '' },
    });
    expect(cordsOfFields(() => undefined, NET)).toMatchObject({ units: 'cm', shown: 'cm' });
  });
});

describe('a knotted piece that is changed', () => {
  const told = (mine: MyPiece, pattern: MacramePiece = NET): readonly string[] => {
    const fitted = fitPiece(pattern, mine);
    return fitted.ok ? fitted.value.changes.map((line) => line.replaceAll('\u00a0', ' ')) : fitted.problems.map(({ message }) => message);
  };

  // 2.5 for the rib, 3.5 for each of five rows and eight knots: 48 mm longer for each mm of thickness, from 27.6 cm on.
  test('says nothing of a length that reads the same', () => {
    expect(told({ cords: { main: { diameterMm: 4.01, label: 'Nearly' } } })).toEqual(['Nearly is the main cord.']);
    expect(told({ cords: { main: { diameterMm: 4.2, label: 'Thicker' } } })).toEqual(['Thicker is the main cord.', 'The piece comes out 29 cm long instead of 28 cm.']);
  });

  test('says how wide a ring is, and nothing of the rod that stays', () => {
    expect(told({ rod: { diameterMm: 80 } }, { ...NET, rod: { kind: 'ring', diameterMm: 60, thickMm: 5 } })).toEqual(['It hangs from a ring 80 mm wide.']);
    expect(told({ rod: { diameterMm: 16 } })).toEqual([]);
  });

  test('may take yarn told by its grist as well, and a cord told by both is the thicker word', () => {
    expect(told({ yarns: { gold: { tex: 3000, label: 'Estuary' } } })[0]).toBe('Estuary is the gold cord.');
    const fitted = fitPiece(NET, { yarns: { gold: { tex: 3000 } }, cords: { gold: { diameterMm: 3 } } });
    expect(fitted.ok && fitted.value.piece.yarns['gold']).toEqual({ colour: '#c9a83a', diameterMm: 3 });
  });

  test('is told in one line: 6 cords on a rod', () => {
    const { summary, size, materials, roleOfKey, ownNames, leastInsideMm } = CRAFTS.macrame;
    const made = { piece: NET, plan: planOf(NET) };
    expect(summary(made, 'cm').replaceAll('\u00a0', ' ')).toMatch(/^6 cords on a rod, \d+ cm long$/u);
    expect(size(made, 'cm').replaceAll('\u00a0', ' ')).toMatch(/^\d+ cm long, about \d+(\.\d)? [cm]m wide where it is knotted$/u);
    expect(materials(made).map(({ key, role, name, label, colour }) => [key, role, name, label, colour])).toEqual([
      ['yarn.main', 'main', 'main', 'Cotton cord, 4 mm', '#ddd3bb'], ['yarn.gold', 'gold', 'gold', undefined, '#c9a83a'],
    ]);
    expect([roleOfKey('yarn.gold.mass', NET), roleOfKey('knots', NET)]).toEqual(['gold', undefined]);
    expect(ownNames(EXAMPLE)).toEqual({ role: ['main'], column: ['body'], section: ['head', 'net', 'braids', 'tips'] });
    expect(leastInsideMm(made)).toBeUndefined();
  });
});
