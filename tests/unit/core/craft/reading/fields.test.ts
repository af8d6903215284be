import { describe, expect, test } from 'vitest';
import { Fields, type NumberRule } from '#core/craft/reading/fields.ts';
import { below, Findings } from '#core/craft/reading/findings.ts';
import { present } from '#core/craft/reading/present.ts';

/** Reads one thing of what was sent; answers it with what was said, as `CODE /path: message`. */
function reading<T>(sent: unknown, read: (fields: Fields) => T, units: 'cm' | 'in' = 'cm'): { readonly value: T; readonly said: readonly string[] } {
  const findings = Findings.in(units);
  const value = read(Fields.of(sent, '', 'The piece', findings));
  const outcome = findings.outcome(true);
  return { value, said: outcome.ok ? [] : outcome.problems.map(({ code, path, message }) => `${code} ${path}: ${message}`) };
}
const number = (value: unknown, rule: Partial<NumberRule>, units?: 'cm' | 'in') => reading({ x: value }, (fields) => fields.number('x', { name: 'Width', min: 1, max: 10, ...rule }), units);

describe('a number', () => {
  test.each<[unknown, Partial<NumberRule>]>([[1, {}], [10, {}], [5.5, {}], [0, { min: 0 }], [0.001, { min: 'over-zero' }], [10, { min: 'over-zero' }], [9.999, { maxIsOut: true }], [3, { whole: true }]])('%s is one, by %j', (value, rule) => {
    expect(number(value, rule)).toEqual({ value, said: [] });
  });

  test('that is nothing below nothing is nothing', () => {
    expect(Object.is(number(-0, { min: 0 }).value, 0)).toBe(true);
  });

  test.each<[unknown, Partial<NumberRule>, string]>([
    [undefined, {}, 'E_NUM /x: Width is missing. Give it as a number.'],
    ['5', {}, 'E_NUM /x: Width is not a number. Give it as a plain number, such as 12.5.'], [null, {}, 'E_NUM /x: Width is not a number. Give it as a plain number, such as 12.5.'],
    [true, {}, 'E_NUM /x: Width is not a number. Give it as a plain number, such as 12.5.'], [Number.NaN, {}, 'E_NUM /x: Width is not a number. Give it as a plain number, such as 12.5.'], [Infinity, {}, 'E_NUM /x: Width is not a number. Give it as a plain number, such as 12.5.'],
    [0.999, {}, 'E_RANGE /x: Width: between 1 and 10 works.'], [10.001, {}, 'E_RANGE /x: Width: between 1 and 10 works.'],
    [0, { min: 'over-zero' }, 'E_RANGE /x: Width: anything above 0, up to 10, works.'], [11, { min: 'over-zero' }, 'E_RANGE /x: Width: anything above 0, up to 10, works.'],
    [10, { maxIsOut: true }, 'E_RANGE /x: Width: from 1 to less than 10 works.'], [0, { maxIsOut: true }, 'E_RANGE /x: Width: from 1 to less than 10 works.'],
    [2.5, { whole: true }, 'E_COUNT /x: Width must be a whole number.'], [0.5, { whole: true }, 'E_RANGE /x: Width: between 1 and 10 works.'],
    [9, { min: 0, max: 0.5, unit: 'share' }, 'E_RANGE /x: Width: between 0 % and 50 % works.'], [-1, { min: 0, max: 3000, unit: 'mm' }, 'E_RANGE /x: Width: between 0 mm and 300 cm works.'],
    [0, { unit: 'g' }, 'E_RANGE /x: Width: between 1 g and 10 g works.'],
  ])('%s is none, by %j', (value, rule, said) => {
    expect(number(value, rule)).toEqual({ value: 0, said: [said] });
  });

  test('limits are told so that what is told works, in the units one measures in', () => {
    expect(number(0, { min: 1.01, max: 10.19, unit: 'mm' }).said).toEqual(['E_RANGE /x: Width: between 1.1 mm and 10.1 mm works.']);
    expect(number(0, { min: 10, max: 1000, unit: 'mm' }, 'in').said).toEqual(['E_RANGE /x: Width: between 7/16 in and 39 5/16 in works.']);
  });

  test('may be missing where it is asked for so, but not wrong', () => {
    const optional = (sent: object) => reading(sent, (fields) => fields.optionalNumber('x', { name: 'Width', min: 1, max: 10 }));
    expect(optional({})).toEqual({ value: undefined, said: [] });
    expect(optional({ x: undefined })).toEqual({ value: undefined, said: [] });
    expect(optional({ x: 4 })).toEqual({ value: 4, said: [] });
    expect(optional({ x: 0 }).said).toHaveLength(1);
  });
});

describe('a choice, a flag and a text', () => {
  const choice = (sent: object) => reading(sent, (fields) => fields.choice('x', 'Shape', ['triangle', 'circle']));
  test('are what they say', () => {
    expect(choice({ x: 'circle' })).toEqual({ value: 'circle', said: [] });
    expect(reading({}, (fields) => fields.optionalChoice('x', 'Shape', ['triangle']))).toEqual({ value: undefined, said: [] });
    expect(reading({ x: 'triangle' }, (fields) => fields.optionalChoice('x', 'Shape', ['triangle'])).value).toBe('triangle');
    expect([true, false].map((x) => reading({ x }, (fields) => fields.flag('x', 'Symmetric')))).toEqual([{ value: true, said: [] }, { value: false, said: [] }]);
    expect(reading({}, (fields) => fields.optionalFlag('x', 'Symmetric'))).toEqual({ value: undefined, said: [] });
    expect(reading({ x: true }, (fields) => fields.optionalFlag('x', 'Symmetric')).value).toBe(true);
    expect(reading({ x: '123456' }, (fields) => fields.text('x', { name: 'Label', maxLength: 6 }))).toEqual({ value: '123456', said: [] });
    expect(reading({}, (fields) => fields.optionalText('x', { name: 'Label', maxLength: 6 }))).toEqual({ value: undefined, said: [] });
    expect(reading({ x: 'a' }, (fields) => fields.optionalText('x', { name: 'Label', maxLength: 6 })).value).toBe('a');
  });

  test('are refused with what works', () => {
    expect(choice({}).said).toEqual(['E_ENUM /x: Shape is missing. One of these works: triangle, circle.']);
    expect(choice({ x: 'square' })).toEqual({ value: 'triangle', said: ['E_ENUM /x: Shape is not one we know. One of these works: triangle, circle.'] });
    expect(reading({ x: 'yes' }, (fields) => fields.flag('x', 'Symmetric'))).toEqual({ value: false, said: ['E_ENUM /x: Symmetric is either true or false.'] });
    for (const x of ['', 7, undefined]) expect(reading({ x }, (fields) => fields.text('x', { name: 'Label', maxLength: 6 }))).toEqual({ value: '', said: ['E_ENUM /x: Label is missing. Give it as text.'] });
    expect(reading({ x: '1234567' }, (fields) => fields.text('x', { name: 'Label', maxLength: 6 })).said).toEqual(['E_RANGE /x: Label may be 6 characters long at most.']);
  });
});

describe('a list', () => {
  const list = (x: unknown) => reading({ x }, (fields) => fields.list('x', 'Bands', 2));
  test('has at least one thing and at most so many', () => {
    expect(list([1, 2])).toEqual({ value: [1, 2], said: [] });
    for (const x of [undefined, [], 'ab', { length: 1 }]) expect(list(x)).toEqual({ value: [], said: ['E_ENUM /x: Bands: at least one is needed, as a list.'] });
    expect(list([1, 2, 3])).toEqual({ value: [], said: ['E_RANGE /x: Bands: 3 are too many. Up to 2 work.'] });
  });
});

describe('a group', () => {
  test('is an object, and what is in it lies below it', () => {
    expect(reading({ loom: { x: 0 } }, (fields) => fields.group('loom', 'Loom').number('x', { name: 'Width', min: 1, max: 2 })).said).toEqual(['E_RANGE /loom/x: Width: between 1 and 2 works.']);
    for (const loom of [null, [], 'a', 3]) expect(reading({ loom }, (fields) => fields.group('loom', 'Loom').path)).toEqual({ value: '/loom', said: ['E_ENUM /loom: Loom must be a group of named values.'] });
    expect(reading({}, (fields) => fields.group('loom', 'Loom').path).said).toEqual(['E_ENUM /loom: Loom is missing.']);
    expect(reading({}, (fields) => fields.optionalGroup('loom', 'Loom'))).toEqual({ value: undefined, said: [] });
    expect(reading({ loom: {} }, (fields) => fields.optionalGroup('loom', 'Loom')?.path).value).toBe('/loom');
  });

  test('that is none is told once, whatever is asked of it', () => {
    const { said } = reading({ loom: 5 }, (fields) => {
      const loom = fields.group('loom', 'Loom');
      loom.number('x', { name: 'Width', min: 1, max: 2 });
      loom.choice('kind', 'Kind', ['a']);
      loom.group('nails', 'Nails').number('n', { name: 'Nails', min: 1, max: 2 });
      loom.rejectWhole('E_FIT', 'Does not fit.');
      loom.reject('E_FIT', 'x', 'Does not fit.');
      loom.end();
    });
    expect(said).toEqual(['E_ENUM /loom: Loom must be a group of named values.']);
  });

  test('may be refused as a whole, and at a key', () => {
    expect(reading({ loom: {} }, (fields) => { fields.group('loom', 'Loom').rejectWhole('E_FIT', 'Does not fit.'); }).said).toEqual(['E_FIT /loom: Does not fit.']);
    expect(reading({}, (fields) => { fields.reject('E_FIT', 'a/b', 'Does not fit.'); }).said).toEqual(['E_FIT /a~1b: Does not fit.']);
  });

  test('keeps no key that nobody asked for, and knows what is its own', () => {
    const long = 'x'.repeat(50);
    const { said } = reading({ a: 1, b: 2, [long]: 3 }, (fields) => { fields.take('a'); fields.take('c'); fields.end(); });
    expect(said).toEqual(['E_ENUM /b: “b” is not known here. Known are: a, c.', `E_ENUM /${long}: “${'x'.repeat(40)}” is not known here. Known are: a, c.`]);
    expect(reading({ a: 1, b: 2 }, (fields) => { const all = fields.entries(); fields.end(); return all; })).toEqual({ value: [['a', 1], ['b', 2]], said: [] });
    expect(reading({ a: undefined, b: null }, (fields) => [fields.has('a'), fields.has('b'), fields.has('c'), fields.has('toString'), fields.take('toString'), fields.take('b')]).value).toEqual([false, true, false, false, undefined, null]);
  });
});

describe('what was found', () => {
  test('is one problem for each place, the first', () => {
    const findings = Findings.in('cm');
    const part = findings.within('/piece').within('/loom');
    part.reject('E_FIT', '/x', 'First.');
    part.reject('E_NUM', '/x', 'Second.');
    part.warn('W_A', '/y', 'Mind this.');
    part.warn('W_A', '/y', 'Mind this.');
    expect([findings.count, findings.warnings.length]).toEqual([1, 2]);
    expect(findings.outcome(5)).toEqual({ ok: false, problems: [{ code: 'E_FIT', path: '/piece/loom/x', message: 'First.' }] });
    expect(findings.warnings[0]).toEqual({ code: 'W_A', path: '/piece/loom/y', message: 'Mind this.' });
  });

  test('comes with the answer, which is missing where something was wrong on the way', () => {
    const findings = Findings.in('cm');
    findings.warn('W_A', '', 'Mind this.');
    expect(findings.soundly(() => 5)).toBe(5);
    expect(findings.outcome(5)).toEqual({ ok: true, value: 5, warnings: [{ code: 'W_A', path: '', message: 'Mind this.' }] });
    expect(findings.soundly(() => { findings.reject('E_NUM', '', 'None.'); return 5; })).toBeUndefined();
    expect(findings.soundly(() => 6)).toBe(6);
  });

  test.each<[number, 'nearest' | 'up' | 'down', string, string]>([
    [12.34, 'nearest', '12.3 mm', '1/2 in'], [12.34, 'up', '12.4 mm', '1/2 in'], [12.36, 'down', '12.3 mm', '7/16 in'], [99.94, 'nearest', '99.9 mm', '3 15/16 in'], [100, 'nearest', '10 cm', '3 15/16 in'], [123.4, 'up', '12.4 cm', '4 7/8 in'], [123.4, 'down', '12.3 cm', '4 13/16 in'],
    [4999, 'nearest', '499.9 cm', '196 13/16 in'], [5000, 'nearest', '5 m', '196 7/8 in'], [12_345, 'up', '12.35 m', '486 1/16 in'], [12_345, 'down', '12.34 m', '486 in'], [12.7, 'up', '12.7 mm', '1/2 in'], [12.7, 'down', '12.7 mm', '1/2 in'], [20.1, 'up', '20.1 mm', '13/16 in'],
  ])('%f mm, %s, is said as %s or %s', (mm, round, cm, inches) => {
    expect([Findings.in('cm').length(mm, round), Findings.in('in').length(mm, round)]).toEqual([cm, inches]);
  });

  test('lies at a JSON pointer', () => {
    expect([below('', 'a'), below('/a', 0), below('/a', '~/')]).toEqual(['/a', '/a/0', '/a/~0~1']);
  });
});

test('what is missing is truly missing', () => {
  expect(Object.keys(present({ a: 1, b: undefined, c: null }))).toEqual(['a', 'c']);
});
