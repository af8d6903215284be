import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { changeField, changeUnits, readReckonerForm, RECKONER_DEFAULTS, RECKONER_FIELDS, reckonerQuery, type ReckonerForm } from '#core/reckoner/reckoner-form.ts';

const read = (query: string): ReckonerForm => readReckonerForm(new URLSearchParams(query));

describe('the form an address describes', () => {
  test('is the first one where it says nothing', () => {
    expect(read('')).toEqual(RECKONER_DEFAULTS);
  });

  test('holds what was typed, slips included', () => {
    expect(read('width=wide&yarn=8%2F2&yarn-by=ne-cotton')).toMatchObject({ width: 'wide', yarn: '8/2', 'yarn-by': 'ne-cotton', height: '40' });
  });

  test('shows what it leaves out in the units it asks for', () => {
    expect(read('units=in')).toMatchObject({ units: 'in', width: '11 13/16', nails: '3/8', yarn: '180' });
  });

  test('takes lengths as typed in the units asked for', () => {
    expect(read('units=in&width=12')).toMatchObject({ units: 'in', width: '12' });
  });

  test('turns lengths into other units chosen in the same go, by the units that were shown', () => {
    expect(read('units=in&shown=cm&width=30&nails=10&yarn=180&pile=much')).toMatchObject({ units: 'in', width: '11 13/16', nails: '3/8', yarn: '180', pile: 'much' });
    expect(read('units=cm&shown=in&width=12')).toMatchObject({ units: 'cm', width: '30.5' });
  });

  test('stands in a person’s own units where the address names none', () => {
    expect(readReckonerForm(new URLSearchParams('width=12'), 'in')).toMatchObject({ units: 'in', width: '12', height: '15 3/4' });
    expect(readReckonerForm(new URLSearchParams('units=cm'), 'in')).toEqual(RECKONER_DEFAULTS);
  });

  test('knows no units but two, and nothing longer than a field', () => {
    expect(read('units=furlong&shown=ell').units).toBe('cm');
    expect(read(`yarn=${'9'.repeat(5000)}`).yarn).toHaveLength(60);
  });
});

describe('the address of a form', () => {
  test('names its units and leaves out what stands as at first', () => {
    expect(reckonerQuery(RECKONER_DEFAULTS)).toBe('units=cm');
    expect(reckonerQuery(changeField(RECKONER_DEFAULTS, 'width', '20'))).toBe('units=cm&width=20');
    expect(reckonerQuery(changeUnits(RECKONER_DEFAULTS, 'in'))).toBe('units=in');
  });

  test('describes that very form', () => {
    fc.assert(
      fc.property(fc.constantFrom(...RECKONER_FIELDS.filter((field) => field !== 'units')), fc.string({ maxLength: 30 }), fc.constantFrom('cm' as const, 'in' as const), (field, value, units) => {
        const form = changeField(changeUnits(RECKONER_DEFAULTS, units), field, value);
        expect(read(reckonerQuery(form))).toEqual(form);
        expect(readReckonerForm(new URLSearchParams(reckonerQuery(form)), 'in')).toEqual(form);
      }),
      { numRuns: 500, seed: 1 },
    );
  });
});

describe('changing units', () => {
  test('turns weights, balls and counted rows, too', () => {
    const form = { ...RECKONER_DEFAULTS, 'ball-length': '90', 'ball-weight': '50', swatch: '6', 'rod-load': '1 3/4 kg' };
    expect(changeUnits({ ...form, 'rod-load': '600' }, 'in')).toMatchObject({ 'ball-length': '98.4', 'ball-weight': '1.76', swatch: '15.24', 'rod-load': '21.16' });
    expect(changeUnits(form, 'in')).toMatchObject({ 'rod-load': '61.73' });
  });

  test('turns every length and nothing else', () => {
    const inches = changeField(RECKONER_DEFAULTS, 'units', 'in');
    expect(inches).toMatchObject({ units: 'in', width: '11 13/16', height: '15 3/4', dowel: '1/2', 'warp-tex': '400', yarn: '180' });
    expect(changeUnits(inches, 'cm')).toMatchObject({ units: 'cm', width: '30', height: '40', dowel: '12.7' });
  });

  test('leaves what cannot be read', () => {
    expect(changeField({ ...RECKONER_DEFAULTS, width: 'wide' }, 'units', 'in').width).toBe('wide');
  });
});
